import type { WarningCode } from '../types';

/** How wells of different catalyst mass are brought to one loading. */
export interface PooledLoading {
  /** g/L that rates and constants are brought to; null where they stay as measured. */
  loadingGPerL: number | null;
  /** Factor on k and rates of each well; null where the well cannot be pooled. */
  factors: (number | null)[];
  warnings: WarningCode[];
}

/** Loadings closer than this are one loading. */
const SAME_LOADING = 0.01;

/**
 * Brings k to one loading, k · (V/m) · (m/V)_ref: the reference loading, else the middle one of
 * the wells. Wells of unknown loading are not pooled with wells of a known one; where no loading
 * is known everything stays as measured, with a warning.
 *
 * Holds in the kinetic regime, where the rate is proportional to the catalyst mass.
 */
export function poolLoading(
  loadings: readonly (number | null)[],
  referenceGPerL: number | null,
): PooledLoading {
  const known = loadings.filter((loading): loading is number => loading !== null && loading > 0);
  if (known.length === 0) {
    return {
      loadingGPerL: null,
      factors: loadings.map(() => 1),
      warnings: ['loading-unknown'],
    };
  }
  const warnings: WarningCode[] = [];
  if (referenceGPerL === null) warnings.push('loading-unknown');
  const sorted = [...known].sort((a, b) => a - b);
  const middle = sorted[Math.floor((sorted.length - 1) / 2)]!;
  const target = referenceGPerL ?? middle;
  const differ = sorted[sorted.length - 1]! > sorted[0]! * (1 + SAME_LOADING);
  if (known.length < loadings.length || (differ && referenceGPerL === null)) {
    warnings.push('loading-mixed');
  }
  return {
    loadingGPerL: target,
    factors: loadings.map((loading) => (loading !== null && loading > 0 ? target / loading : null)),
    warnings,
  };
}
