import { describe, expect, it } from 'vitest';
import {
  buildArrheniusOption,
  celsius,
  temperatureTicks,
  type ArrheniusPlotPoint,
} from '@/islands/charts/buildArrheniusOption';
import { buildResidualOption } from '@/islands/charts/buildResidualOption';
import { buildStraightenedOption } from '@/islands/charts/buildStraightenedOption';
import { axisOf, frame, seriesOf, theme, valuesOf, wellPlot } from './plot';

const minutes = { unit: 'min', factor: 1 / 60 };
const micromolar = { unit: 'µmol/L', factor: 1e6 };

describe('the residual chart', () => {
  const plot = {
    points: [
      { timeS: 0, residual: 4e-5, outlier: false, place: 'Readings, D2' },
      { timeS: 600, residual: -9e-5, outlier: true, place: 'Readings, D3' },
    ],
    residualSd: 5e-5,
    timeUnit: minutes,
    readingUnit: micromolar,
  };

  it('shows both signs alike, with guides at one standard deviation', () => {
    const option = buildResidualOption(plot, theme, frame);
    const { min, max, name } = axisOf(option.yAxis);
    expect(name).toBe('Reading − curve, µmol/L');
    expect(min).toBe(-max);
    const heightOf = (id: string) => (seriesOf(option, id).data as [number, number][])[0]?.[1];
    expect(heightOf('sd-high')).toBeCloseTo(50, 9);
    expect(heightOf('sd-low')).toBeCloseTo(-50, 9);
  });

  it('has no guides when the spread is unknown', () => {
    const option = buildResidualOption({ ...plot, residualSd: null }, theme, frame);
    expect(() => seriesOf(option, 'sd-high')).toThrow();
  });

  it('says which reading stands out, and where it is', () => {
    const rows = seriesOf(buildResidualOption(plot, theme, frame), 'residuals').data as {
      note: string;
    }[];
    expect(rows[1]?.note).toContain('stands out');
    expect(rows[1]?.note).toContain('D3');
    expect(rows[0]?.note).not.toContain('stands out');
  });
});

describe('a straightened plot', () => {
  it.each([
    ['zero', 'C, mmol/L', 10],
    ['first', 'ln (C / mmol/L)', Math.log(10)],
    ['second', '1/C, (mmol/L)⁻¹', 0.1],
  ] as const)('of %s order shows its own coordinate', (law, name, first) => {
    const option = buildStraightenedOption(wellPlot(), law, theme, frame);
    expect(axisOf(option.yAxis).name).toBe(name);
    expect(valuesOf(seriesOf(option, 'readings'))[0]?.[1]).toBeCloseTo(first, 12);
  });

  it('leaves out readings that have no logarithm', () => {
    const readings = [
      { timeS: 0, value: 0.01, excluded: false, place: '' },
      { timeS: 60, value: 0, excluded: false, place: '' },
      { timeS: 120, value: -0.0001, excluded: false, place: '' },
    ];
    const option = buildStraightenedOption(wellPlot({ readings }), 'first', theme, frame);
    expect(valuesOf(seriesOf(option, 'readings'))).toHaveLength(1);
  });
});

describe('the Arrhenius plot', () => {
  const point = (temperatureK: number, replicate: number | null): ArrheniusPlotPoint => ({
    x: 1000 / temperatureK,
    y: -7,
    se: 0.1,
    temperatureK,
    replicate,
    colour: '#883344',
    wellId: `w-${temperatureK}-${replicate}`,
    well: 'Plate 1, A01',
  });
  const plot = {
    points: [point(333.15, 1), point(333.15, 2), point(313.15, 1)],
    line: { x: [3, 3.2], y: [-6.8, -8], low: [-6.9, -8.2], high: [-6.7, -7.8] },
    yName: 'ln (k / s⁻¹)',
    selectedWellId: 'w-333.15-2',
  };
  const option = buildArrheniusOption(plot, theme, frame);

  it('has ln k against 1000/T, and the same axis in °C along the top', () => {
    const [bottom, top] = (option.xAxis as unknown[]).map(axisOf);
    expect(bottom?.name).toBe('1000/T, K⁻¹');
    expect(axisOf(option.yAxis).name).toBe('ln (k / s⁻¹)');
    expect([top?.min, top?.max]).toEqual([bottom?.min, bottom?.max]);
    expect(top?.axisLabel.customValues.map(top.axisLabel.formatter)).toEqual(['60 °C', '40 °C']);
  });

  it('draws whiskers two standard errors either way', () => {
    const [, low, high] = seriesOf(option, 'whiskers').data[0] as [number, number, number];
    expect(low).toBeCloseTo(-7.2, 12);
    expect(high).toBeCloseTo(-6.8, 12);
  });

  it('tells replicates apart by shape and marks the chosen well', () => {
    const points = seriesOf(option, 'points').data as {
      symbol: string;
      symbolSize: number;
      name: string;
    }[];
    expect(points[0]?.symbol).not.toBe(points[1]?.symbol);
    expect(points[1]?.symbolSize).toBeGreaterThan(points[0]!.symbolSize);
    expect(points[1]?.name).toBe('w-333.15-2');
  });

  it('has no band when there is none', () => {
    const line = { ...plot.line, low: null, high: null };
    expect(() => seriesOf(buildArrheniusOption({ ...plot, line }, theme, frame), 'band')).toThrow();
  });

  it('leaves out temperature labels that would run into each other', () => {
    expect(
      temperatureTicks([point(333.15, 1), point(333.65, 1), point(313.15, 1)], 0.02),
    ).toHaveLength(2);
    expect(celsius(298.15)).toBe('25 °C');
  });
});
