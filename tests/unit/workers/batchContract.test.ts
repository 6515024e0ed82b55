import { describe, expect, it } from 'vitest';
import type { BatchResponse } from '../../../src/contracts/batchResponse';
import { answerBatch } from '../../../src/workers/analyseBatch';
import { batchSeries } from '../../fixtures/batch';

const answered = (document: unknown) => {
  const { status, body } = answerBatch(new TextEncoder().encode(JSON.stringify(document)));
  expect(status).toBe(200);
  return JSON.parse(new TextDecoder().decode(body)) as BatchResponse;
};
const one = (given: object) => answered({ series: [{ ...batchSeries(), ...given }] });
const withValues = (values: (number | null)[], given: object = {}) => ({
  reading: { values, unit: 'mmol/L', ...given },
});

describe('roles', () => {
  it.each([
    ['sample', ['MB-07']],
    ['benchmark', ['MB-07']],
    ['control', []],
    ['blank', []],
    ['support-blank', []],
  ])('%s appears in catalysts: %j', (role, expected) => {
    expect(one({ role }).catalysts.map((result) => result.catalyst)).toEqual(expected);
  });
  it.each(['benchmark', 'control', 'blank', 'support-blank'])(
    '%s may lack its catalyst',
    (role) => {
      const { catalyst: _, ...rest } = batchSeries();
      const { series, catalysts } = answered({ series: [{ ...rest, role }] });
      expect(series[0]!.verdict).toBe('first');
      expect(catalysts).toEqual([]);
    },
  );
});

describe('order of results', () => {
  it('is that of the request: series as sent, catalysts as they first appear', () => {
    const sent = [
      ['z', 'B'],
      ['a', 'A'],
      ['m', 'B'],
      ['b', 'C'],
    ].map(([id, catalyst]) => ({ ...batchSeries(), id, catalyst }));
    const { series, catalysts } = answered({ series: sent });
    expect(series.map(({ id }) => id)).toEqual(['z', 'a', 'm', 'b']);
    expect(catalysts.map(({ catalyst }) => catalyst)).toEqual(['B', 'A', 'C']);
  });
});

describe('units of the answer', () => {
  it.each([
    ['ms', 1e-3],
    ['s', 1],
    ['min', 60],
    ['h', 3600],
    ['d', 86_400],
  ])('times in %s', (unit, seconds) => {
    const { values } = batchSeries().time;
    const k = one({ time: { values, unit }, law: 'first' }).series[0]!.k!;
    const inMinutes = one({ law: 'first' }).series[0]!.k!;
    expect((k.value * seconds) / (inMinutes.value * 60)).toBeCloseTo(1, 9);
  });
  it.each([
    ['mol/L', 'mol/L', 1],
    ['umol/L', 'mol/L', 1e-6],
    ['Pa', 'Pa', 1],
    ['kPa', 'Pa', 1e3],
    ['bar', 'Pa', 1e5],
    ['mbar', 'Pa', 100],
  ])('readings in %s are answered in %s', (unit, base, factor) => {
    const { values } = batchSeries().reading;
    const { c0 } = one({ ...withValues(values, { unit }), law: 'first' }).series[0]!;
    const inMillimolar = one({ law: 'first' }).series[0]!.c0!;
    expect(c0!.unit).toBe(base);
    expect(c0!.value / (inMillimolar.value * 1e3 * factor)).toBeCloseTo(1, 9);
  });
  it.each([
    ['zero', 'mmol/L', 'mol L^-1 s^-1'],
    ['second', 'mmol/L', 'L mol^-1 s^-1'],
    [{ order: 0 }, 'mmol/L', 'mol L^-1 s^-1'],
    [{ order: 1 }, 'mmol/L', 's^-1'],
    [{ order: 1.1 }, 'mmol/L', '(mol/L)^(-0.1) s^-1'],
    [{ order: -1 }, 'mmol/L', '(mol/L)^(2) s^-1'],
    [{ order: 4 }, 'mmol/L', '(mol/L)^(-3) s^-1'],
    ['zero', 'bar', 'Pa s^-1'],
    ['second', 'bar', 'Pa^-1 s^-1'],
  ])('k of %j in %s: %s', (law, unit, expected) => {
    const { values } = batchSeries().reading;
    const { series, catalysts } = one({ ...withValues(values, { unit }), law });
    expect(series[0]!.law).toEqual(law);
    expect(series[0]!.k!.unit).toBe(expected);
    expect(catalysts[0]!.verdict).toBe('forced');
    expect(catalysts[0]!.kRef!.unit).toBe(expected);
  });
});

describe('what does not exist', () => {
  it('readings that never change: no reaction, rss 0 without AICc', () => {
    const [series] = one(withValues([10, 10, 10, 10, 10, 10])).series;
    expect(series!.verdict).toBe('no-reaction');
    expect([series!.order, series!.k, series!.kRel]).toEqual([null, null, null]);
    expect(series!.fits.first!.rss).toBe(0);
    expect(series!.fits.first!.aicc).toBeNull();
  });
  it('fewer than five readings have neither AICc nor weights nor an order', () => {
    const [series] = one(withValues([10, null, 6.7, null, 4.5, 3])).series;
    expect(series!.points).toEqual({ used: 4, excluded: 2 });
    expect(series!.verdict).toBe('undetermined');
    for (const fit of Object.values(series!.fits))
      expect([fit.aicc, fit.weight]).toEqual([null, null]);
    expect(series!.initialRate).not.toBeNull();
  });
  it('a dead well stays dead under a forced law', () => {
    const [series] = one({ ...withValues([10, 10.1, 9.9, 10, 10.05, 9.98]), law: 'first' }).series;
    expect(series).toMatchObject({ verdict: 'no-reaction', order: null, law: 'first', k: null });
    expect(series!.initialRate!.low).toBeLessThan(0);
  });
  it('an unusable series keeps every key, empty', () => {
    const [series] = one(withValues([null, null, 6.7, 5.5, null, null])).series;
    expect(series).toMatchObject({
      verdict: 'unusable',
      order: null,
      k: null,
      kRel: null,
      c0: null,
      conversion: null,
      initialRate: null,
      apparentOrder: null,
      points: { used: 2, excluded: 4 },
      warnings: ['too-few-readings'],
    });
  });
  it('all times equal name distinct times as the reason, for the catalyst too', () => {
    const time = { values: [5, 5, 5, 5, 5, 5], unit: 'min' };
    const { series, catalysts } = one({ time });
    expect(series[0]!.warnings).toEqual(['too-few-distinct-times']);
    expect(catalysts[0]!.warnings).toEqual(['too-few-distinct-times']);
  });
  it('relative readings give k of first order only', () => {
    const signal = { kind: 'signal', unit: '1' };
    const { values } = batchSeries().reading;
    const [first] = one({ ...withValues(values, signal), law: 'first' }).series;
    const [second] = one({ ...withValues(values, signal), law: 'second' }).series;
    expect(first!.k!.unit).toBe('s^-1');
    expect(second!.k).toBeNull();
    expect(second!.kRel!.unit).toBe('s^-1');
    expect(second!.warnings).toContain('initial-concentration-needed');
  });
});

describe('catalysts', () => {
  it('without a reference: k at the harmonic mean temperature, neither rate nor time', () => {
    const at = (celsius: number, id: string) => ({
      ...batchSeries(),
      id,
      law: 'first',
      temperature: { value: celsius, unit: 'degC' },
    });
    const [result] = answered({ series: [at(40, 'a'), at(60, 'b')] }).catalysts;
    const harmonic = 2 / (1 / 313.15 + 1 / 333.15);
    expect(result!.kRef!.temperature.unit).toBe('K');
    expect(result!.kRef!.temperature.value).toBeCloseTo(harmonic, 6);
    expect([result!.rateRef, result!.timeToTarget]).toEqual([null, null]);
    expect(result!.warnings).toContain('loading-unknown');
  });
  it('laws that differ are named, one law by two names is not', () => {
    const forced = (law: unknown, id: string) => ({ ...batchSeries(), id, law });
    const differ = answered({ series: [forced('first', 'a'), forced('auto', 'b')] }).catalysts[0]!;
    expect(differ.warnings).toContain('mixed-forced-laws');
    expect(differ.verdict).not.toBe('forced');
    const same = answered({ series: [forced('first', 'a'), forced({ order: 1 }, 'b')] });
    expect(same.catalysts[0]).toMatchObject({ verdict: 'forced', order: 1 });
    expect(same.catalysts[0]!.warnings).not.toContain('mixed-forced-laws');
  });
});
