import { describe, expect, it } from 'vitest';
import type { HeatmapCell, HeatmapRow } from '../../../../src/contracts/leaderboard';
import {
  firstHeatmapLook,
  heatmapSortedBy,
  readHeatmapLook,
  writeHeatmapLook,
} from '../../../../src/islands/heatmap/address';
import {
  comparedRows,
  lawsWithK,
  metricScale,
  tintOf,
} from '../../../../src/islands/heatmap/metrics';
import { sortHeatmapRows } from '../../../../src/islands/heatmap/sortRows';
import { cellValue, heatmapSummary } from '../../../../src/islands/heatmap/summary';
import { rateRamp } from '../../../../src/screening/ramps';

const temperaturesK = [313.15, 333.15];

function cell(override: Partial<HeatmapCell> = {}): HeatmapCell {
  return {
    temperatureK: 313.15,
    wells: 2,
    verdict: 'first',
    order: 1,
    k: 3e-4,
    kUnit: 's^-1',
    initialRate: 1.2e-6,
    conversion: 0.8,
    relativeResidualSd: 0.02,
    wellsWithLackOfFit: 0,
    wellIds: ['w1', 'w2'],
    ...override,
  };
}

function row(code: string, cells: (HeatmapCell | null)[], law: HeatmapRow['law'] = 'first') {
  return { catalystId: code, code, verdict: 'first' as const, law, cells };
}

describe('the address of the heatmap', () => {
  it('is bare for the first look and gives back any other', () => {
    expect(writeHeatmapLook(firstHeatmapLook)).toBe('');
    const look = {
      metric: 'k' as const,
      law: 'second' as const,
      sort: 60,
      direction: 'asc' as const,
      cells: 'discs' as const,
    };
    expect(readHeatmapLook(writeHeatmapLook(look))).toEqual(look);
  });

  it('passes over what it does not know', () => {
    expect(readHeatmapLook('?metric=beauty&law=third&sort=warm&dir=left&cells=stars')).toEqual(
      firstHeatmapLook,
    );
    expect(readHeatmapLook('?sort=').sort).toBe('code');
  });

  it('sorts a temperature from its highest value first', () => {
    const look = heatmapSortedBy(firstHeatmapLook, 60);
    expect(look).toMatchObject({ sort: 60, direction: 'desc' });
    expect(heatmapSortedBy(look, 60).direction).toBe('asc');
  });
});

describe('a metric', () => {
  const rows = [
    row('A', [cell({ initialRate: 1e-7 }), cell({ initialRate: 1e-5 })]),
    row('B', [cell({ initialRate: 1e-6 }), null]),
  ];

  it('leaves cells without a misfit uncoloured, so that the others stand out', () => {
    const misfit = [row('A', [cell({ wellsWithLackOfFit: 1 }), cell()])];
    const scale = metricScale('misfit', misfit, 'concentration');
    expect(tintOf(scale, 0)).toBeNull();
    expect(tintOf(scale, 0.5)).not.toBeNull();
    expect(scale.format(0.5)).toBe('50 %');
  });

  it('has no rate where there was no reaction, whatever sign the scatter gave it', () => {
    const idle = cell({ verdict: 'no-reaction', initialRate: 3e-10, k: null });
    const scale = metricScale('rate', [...rows, row('C', [idle, null])], 'concentration');
    expect(scale.valueOf(idle)).toBeNull();
    expect(scale.domain?.[0]).toBeCloseTo(0.1, 9);
  });

  it('spreads rates over the whole ramp by their ratios', () => {
    const scale = metricScale('rate', rows, 'concentration');
    expect(scale.unit).toBe('µmol L⁻¹ s⁻¹');
    expect(tintOf(scale, 0.1)).toBe(rateRamp(0));
    expect(tintOf(scale, 10)).toBe(rateRamp(1));
    expect(tintOf(scale, 1)).toBe(rateRamp(0.5));
  });

  it('writes a value with its unit', () => {
    const scale = metricScale('rate', rows, 'concentration');
    expect(cellValue(cell({ initialRate: 1.234e-6 }), scale)).toBe('1.23 µmol L⁻¹ s⁻¹');
    expect(cellValue(cell({ initialRate: null }), scale)).toBeNull();
  });

  it('keeps the power of ten of k in its unit', () => {
    const scale = metricScale('k', rows, 'concentration');
    expect(scale.unit).toBe('10⁻⁴ s⁻¹');
    expect(cellValue(cell({ k: 3.456e-4 }), scale)).toBe('3.46 × 10⁻⁴ s⁻¹');
  });

  it('compares k only within one law', () => {
    const mixed = [
      ...rows,
      row('Z', [cell({ k: 2e-6, kUnit: 'mol L^-1 s^-1' }), null], 'zero'),
      row('N', [cell({ k: null, kUnit: null }), null], null),
    ];
    expect(lawsWithK(mixed)).toEqual(['zero', 'first']);
    expect(comparedRows(mixed, 'k', 'first').map(({ code }) => code)).toEqual(['A', 'B']);
    expect(comparedRows(mixed, 'rate', 'first')).toHaveLength(4);
  });

  it('gives a share of the wells for lack of fit', () => {
    const scale = metricScale('misfit', rows, 'concentration');
    expect(cellValue(cell({ wellsWithLackOfFit: 1 }), scale)).toBe('50 % of the wells');
  });
});

describe('the rows', () => {
  const rows = [
    row('MB-10', [cell({ initialRate: 2e-6 }), cell({ initialRate: 3e-6 })]),
    row('MB-9', [null, cell({ initialRate: 9e-6 })]),
    row('MB-2', [cell({ initialRate: 5e-6 }), cell({ initialRate: 1e-6 })]),
  ];
  const scale = metricScale('rate', rows, 'concentration');
  const sorted = (sort: 'code' | number, direction: 'asc' | 'desc') =>
    sortHeatmapRows(rows, temperaturesK, { sort, direction }, scale).map(({ code }) => code);

  it('stand in the order of their codes, or of a column, gaps last', () => {
    expect(sorted('code', 'asc')).toEqual(['MB-2', 'MB-9', 'MB-10']);
    expect(sorted(60, 'desc')).toEqual(['MB-9', 'MB-10', 'MB-2']);
    expect(sorted(40, 'desc')).toEqual(['MB-2', 'MB-10', 'MB-9']);
    expect(sorted(40, 'asc')).toEqual(['MB-10', 'MB-2', 'MB-9']);
  });

  it('fall back to codes for a temperature that is not there', () => {
    expect(sorted(99, 'asc')).toEqual(['MB-2', 'MB-9', 'MB-10']);
  });

  it('are summed up for a reader who does not see the colours', () => {
    const placed = rows.map((one) => ({
      ...one,
      cells: one.cells.map((it, index) => it && { ...it, temperatureK: temperaturesK[index]! }),
    }));
    expect(heatmapSummary(placed, temperaturesK, scale)).toBe(
      'Initial rate of 3 candidates at 2 temperatures: highest MB-9 at 60 °C (9.00 µmol L⁻¹ s⁻¹), ' +
        'lowest MB-2 at 60 °C (1.00 µmol L⁻¹ s⁻¹). 1 of 6 places were not measured.',
    );
  });
});
