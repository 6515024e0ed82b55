import { describe, expect, it } from 'vitest';
import type { Estimate, LawFit, SeriesAnalysis, Verdict } from '../../../src/kinetics/types';
import { heatmapCells, type HeatmapWell } from '../../../src/screening/heatmap';

const exact = (value: number): Estimate => ({ value, se: null, low: null, high: null });

function well(
  id: string,
  temperatureK: number,
  verdict: Verdict,
  k: number,
  more: Partial<SeriesAnalysis> = {},
): HeatmapWell {
  return {
    setTemperatureK: temperatureK,
    analysis: {
      id,
      temperatureK,
      verdict,
      order: verdict === 'first' ? 1 : null,
      fits: { first: { k } as LawFit },
      initialRate: exact(k * 0.01),
      conversion: 0.5,
      c0: exact(0.01),
      residualSd: 1e-4,
      lackOfFit: { runsP: 0.4, significant: false },
      loadingGPerL: 2,
      ...more,
    } as SeriesAnalysis,
  };
}

describe('heatmap cells', () => {
  it('bring k of each well to the reference loading before the mean is taken', () => {
    // 1e-3 at 2 g/L is 2e-3 at 4 g/L; 4e-3 at 8 g/L is 2e-3 at 4 g/L: the same catalyst.
    const [cell] = heatmapCells(
      [well('a', 330, 'first', 1e-3), well('b', 330, 'first', 4e-3, { loadingGPerL: 8 })],
      [330],
      'first',
      's^-1',
      4,
    );
    expect(cell?.k).toBeCloseTo(2e-3, 12);
    expect(cell?.kUnit).toBe('s^-1');
    expect(cell?.wells).toBe(2);
    expect(cell?.wellIds).toEqual(['a', 'b']);
  });

  it('take the mean of rates over decades on a log scale', () => {
    const [cell] = heatmapCells(
      [well('a', 330, 'first', 1e-4), well('b', 330, 'first', 1e-2)],
      [330],
      'first',
      's^-1',
      null,
    );
    expect(cell?.k).toBeCloseTo(1e-3, 12);
    expect(cell?.initialRate).toBeCloseTo(1e-5, 14);
  });

  it('say undetermined where replicates disagree, and leave an unmeasured temperature empty', () => {
    const cells = heatmapCells(
      [well('a', 330, 'first', 1e-3), well('b', 330, 'zero', 1e-3)],
      [320, 330],
      'first',
      's^-1',
      null,
    );
    expect(cells[0]).toBeNull();
    expect(cells[1]?.verdict).toBe('undetermined');
    expect(cells[1]?.order).toBeNull();
  });

  it('give no k to a catalyst without a law', () => {
    const [cell] = heatmapCells([well('a', 330, 'undetermined', 1e-3)], [330], null, null, 2);
    expect(cell?.k).toBeNull();
    expect(cell?.kUnit).toBeNull();
    expect(cell?.initialRate).not.toBeNull();
  });
});
