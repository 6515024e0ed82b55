import { describe, expect, it } from 'vitest';
import { buildDecayCurveOption } from '@/islands/charts/buildDecayCurveOption';
import { axisOf, frame, seriesOf, theme, valuesOf, wellPlot } from './plot';

const build = (change = {}, overlay = {}) =>
  buildDecayCurveOption(
    wellPlot(change),
    theme,
    frame,
    Array.isArray(overlay) ? overlay : undefined,
  );

describe('the decay chart', () => {
  it('names both axes with their units', () => {
    const option = build();
    expect(axisOf(option.xAxis).name).toBe('Time, min');
    expect(axisOf(option.yAxis).name).toBe('Bromate, mmol/L');
  });

  it('draws readings as open circles in the units of the axes', () => {
    const readings = seriesOf(build(), 'readings');
    expect(valuesOf(readings)).toEqual([
      [0, 10],
      [20, 5],
    ]);
    expect(readings.symbol).toBe('circle');
    expect(readings.itemStyle).toMatchObject({ color: theme.sheet, borderColor: theme.ink });
  });

  it('keeps an excluded reading at its value, crossed, and says so', () => {
    const excluded = seriesOf(build(), 'excluded');
    const rows = excluded.data as { value: [number, number]; note: string }[];
    expect(rows[0]?.value).toEqual([10, 4]);
    expect(rows[0]?.note).toContain('excluded');
    expect(String(excluded.symbol)).toMatch(/^path:/);
  });

  it('marks a reading without a number on the time axis and not as zero', () => {
    const rows = seriesOf(build(), 'excluded').data as { value: [number, number]; note: string }[];
    expect(rows[1]?.value[0]).toBe(15);
    expect(rows[1]?.note).toContain('no number');
    expect(rows[1]?.note).not.toContain('mmol/L');
  });

  it('keeps the lower edge of the band at or below the upper one', () => {
    const rows = seriesOf(build(), 'band').data as [number, number, number][];
    expect(rows).toHaveLength(3);
    for (const [, low, high] of rows) expect(low).toBeLessThanOrEqual(high);
  });

  it('draws the asserted law in full and its rivals thin and dashed', () => {
    const option = build();
    expect(seriesOf(option, 'law-first').lineStyle).toMatchObject({ type: 'solid', width: 2 });
    expect(seriesOf(option, 'law-zero').lineStyle).toMatchObject({ type: [5, 4], width: 1 });
  });

  it('draws every law dashed when the data do not decide', () => {
    const option = build({ curves: { ...wellPlot().curves, asserted: false } });
    for (const id of ['law-first', 'law-zero']) {
      expect(seriesOf(option, id).lineStyle).toMatchObject({ type: [5, 4] });
    }
  });

  it('names each law at the end of its curve, apart even where curves end together', () => {
    const labels = seriesOf(build(), 'law-labels').data as {
      value: [number, number];
      label: { formatter: string };
    }[];
    expect(labels.map(({ label }) => label.formatter)).toEqual(['zero', 'first']);
    const [a, b] = labels.map(({ value }) => value[1]);
    const { min, max } = axisOf(build().yAxis);
    const pxPerUnit = (frame.height - 82) / (max - min);
    expect(Math.abs(a! - b!) * pxPerUnit).toBeGreaterThanOrEqual(16.9);
  });

  it('has zero on the paper and every reading inside the axes', () => {
    const { min, max } = axisOf(build().yAxis);
    expect(min).toBeLessThanOrEqual(0);
    expect(max).toBeGreaterThanOrEqual(10);
  });

  it('makes room for readings below zero', () => {
    const readings = [{ timeS: 0, value: -0.001, excluded: false, place: '' }];
    expect(axisOf(build({ readings }).yAxis).min).toBeLessThan(-1);
  });

  it('has ticks only on round numbers', () => {
    expect(axisOf(build().xAxis).axisTick.customValues).toEqual([
      0, 2, 4, 6, 8, 10, 12, 14, 16, 18, 20,
    ]);
  });

  it('lays other replicates behind, without their missing readings', () => {
    const option = build({}, [
      { label: 'B03', symbol: 'rect', timesS: [0, 600], values: [0.01, null] },
    ]);
    expect(seriesOf(option, 'overlay-0').data).toEqual([[0, 10]]);
  });

  it('stands without readings or curves', () => {
    const curves = { timesS: [], laws: [], band: null, shownLaw: null, asserted: false };
    const option = build({ readings: [], curves });
    expect(Number.isFinite(axisOf(option.yAxis).max)).toBe(true);
    expect(axisOf(option.xAxis).max).toBeGreaterThan(0);
  });
});
