import { readFile } from 'node:fs/promises';
import { describe, expect, it } from 'vitest';
import { buildSamples } from '@/demo/samples';
import { issuesOf, screenOf, summary } from '../../fixtures/workbooks';

const sample = (name: string) => readFile(new URL(`../../../samples/${name}`, import.meta.url));

describe('the files of samples/', () => {
  it('are what the generator writes, byte for byte', async () => {
    for (const { name, bytes } of buildSamples()) {
      expect(Buffer.compare(Buffer.from(bytes), await sample(name)), name).toBe(0);
    }
  });

  it('hold the same wells and readings as workbook and as csv', async () => {
    const xlsx = await screenOf(await sample('marlbeck-screen.xlsx'));
    const csv = await screenOf(await sample('marlbeck-screen.csv'), 'marlbeck-screen.csv');
    const content = ({ wells }: typeof xlsx) =>
      wells.map((well) => ({
        ...well,
        source: null,
        readings: { timesS: well.readings.timesS, values: well.readings.values },
      }));
    expect(content(csv)).toEqual(content(xlsx));
    expect(xlsx.wells).toHaveLength(112);
    expect(xlsx.plates).toHaveLength(4);
    expect(xlsx.cautions.map((caution) => caution.code)).toEqual(['negative-kept']);
  });

  it('trace every reading to its cell', async () => {
    const { wells } = await screenOf(await sample('marlbeck-screen.xlsx'));
    const second = wells[1]!;
    expect(second.source).toEqual({ sheet: 'Wells', cell: 'B3' });
    expect(second.readings).toMatchObject({ sheet: 'Readings', column: 'D' });
    expect(second.readings.rows[0]).toBe(22);
  });

  it('name each of the ten faults at its cell, and no other', async () => {
    const issues = await issuesOf(await sample('ten-faults.xlsx'));
    expect(issues.filter((issue) => issue.severity === 'stop').map(summary)).toEqual([
      'stop unknown-role Wells!H2',
      'stop mass-not-positive Wells!F3',
      'stop temperature-impossible Wells!D4',
      'stop well-without-catalyst Wells!C5',
      'stop unknown-well Wells!B8',
      'stop well-twice Wells!B9',
      'stop unit-in-cell Readings!C4',
      'stop error-cell Readings!D6',
      'stop reading-twice Readings!C23',
      'stop readings-without-well Readings!D122',
    ]);
  });
});
