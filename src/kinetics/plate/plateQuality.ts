import { randomStream } from '../statistics/randomStream';
import type { WellRole } from '../types';
import { medianPolish } from './medianPolish';
import { zPrime } from './zPrime';

/** A well where it lies on its plate. */
export interface PlateWell {
  /** From 0. */
  row: number;
  column: number;
  role: WellRole;
  catalyst: string | null;
  temperatureK: number;
  /** −dC/dt at the first reading, base unit s⁻¹, per volume; null where there is none. */
  rate: number | null;
}

/** How good a plate is. */
export interface PlateQuality {
  /** From the benchmark's and the blanks' rates; null below 2 of either. */
  zPrime: number | null;
  /** Standard deviation of ln rate between replicates of one catalyst and temperature. */
  replicateSd: number | null;
  replicateDof: number;
  /** Effect on ln rate of each row and column, against what the catalysts are elsewhere. */
  rowEffects: number[];
  columnEffects: number[];
  /** Chance of row or column effects so large without any; null where nothing can be said. */
  rowP: number | null;
  columnP: number | null;
}

const PERMUTATIONS = 200;
/** Wells that row and column effects need at least. */
const FEWEST_WELLS = 12;

/** Pooled variance Σ(n−1)s²/Σ(n−1). */
export function pooledVariance(groups: readonly { variance: number; n: number }[]): number {
  const dof = groups.reduce((sum, { n }) => sum + n - 1, 0);
  return groups.reduce((sum, { variance, n }) => sum + (n - 1) * variance, 0) / dof;
}

/**
 * Quality of one plate. Wells hold different catalysts, so trends are sought in what a well's ln rate
 * is above the mean of its catalyst and temperature; whether they are more than chance is told by
 * shuffling the wells (Fisher 1935).
 *
 * @param seed of the shuffles
 */
export function plateQuality(wells: readonly PlateWell[], seed: number): PlateQuality {
  const rates = (role: WellRole) =>
    wells.flatMap((well) => (well.role === role && well.rate !== null ? [well.rate] : []));
  const groups = new Map<string, { well: PlateWell; ln: number }[]>();
  for (const well of wells) {
    if (well.rate === null || !(well.rate > 0) || well.catalyst === null) continue;
    const key = `${well.catalyst}\u0000${well.temperatureK.toFixed(1)}`;
    const group = groups.get(key) ?? [];
    group.push({ well, ln: Math.log(well.rate) });
    groups.set(key, group);
  }
  const repeated = [...groups.values()].filter((group) => group.length > 1);
  const deviations = repeated.flatMap((group) => {
    const mean = group.reduce((sum, { ln }) => sum + ln, 0) / group.length;
    // What a mean of few wells takes from each of them.
    const scale = Math.sqrt(group.length / (group.length - 1));
    return group.map(({ well, ln }) => ({ well, value: (ln - mean) * scale }));
  });
  const replicateDof = repeated.reduce((sum, group) => sum + group.length - 1, 0);
  const variance =
    replicateDof === 0
      ? null
      : deviations.reduce((sum, { value }) => sum + value ** 2, 0) / deviations.length;
  const trend = findTrend(deviations, seed);
  return {
    zPrime: zPrime(rates('benchmark'), [...rates('blank'), ...rates('support-blank')]),
    replicateSd: variance === null ? null : Math.sqrt(variance),
    replicateDof,
    ...trend,
  };
}

type Trend = Pick<PlateQuality, 'rowEffects' | 'columnEffects' | 'rowP' | 'columnP'>;

function findTrend(deviations: readonly { well: PlateWell; value: number }[], seed: number): Trend {
  const rows = Math.max(-1, ...deviations.map(({ well }) => well.row)) + 1;
  const columns = Math.max(-1, ...deviations.map(({ well }) => well.column)) + 1;
  const effectsOf = (values: readonly number[]) => {
    const plate = Array.from({ length: rows }, () => new Array<number | null>(columns).fill(null));
    deviations.forEach(({ well }, i) => {
      plate[well.row]![well.column] = values[i]!;
    });
    return medianPolish(plate);
  };
  const observed = effectsOf(deviations.map(({ value }) => value));
  if (deviations.length < FEWEST_WELLS) {
    return {
      rowEffects: observed.rows,
      columnEffects: observed.columns,
      rowP: null,
      columnP: null,
    };
  }
  const size = (effects: readonly number[]) => effects.reduce((sum, one) => sum + one ** 2, 0);
  const random = randomStream(seed);
  const values = deviations.map(({ value }) => value);
  let [rowHits, columnHits] = [1, 1];
  for (let i = 0; i < PERMUTATIONS; i += 1) {
    const shuffled = effectsOf(random.shuffle(values));
    if (size(shuffled.rows) >= size(observed.rows)) rowHits += 1;
    if (size(shuffled.columns) >= size(observed.columns)) columnHits += 1;
  }
  return {
    rowEffects: observed.rows,
    columnEffects: observed.columns,
    rowP: rowHits / (PERMUTATIONS + 1),
    columnP: columnHits / (PERMUTATIONS + 1),
  };
}
