import { concentrationUnits, pressureUnits, ratioUnits, toKelvin } from '../kinetics/units';
import { pointerOf, type BatchFault } from './batchProblem';

/** A JSON object, not a list. */
export function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** A member inside nested objects; undefined where the way there does not exist. */
export function fieldOf(value: unknown, ...keys: readonly string[]): unknown {
  let at = value;
  for (const key of keys) {
    if (!isRecord(at)) return undefined;
    at = at[key];
  }
  return at;
}

/** A temperature in K; null where it is not well-formed. */
export function kelvinOf(temperature: unknown): number | null {
  const value = fieldOf(temperature, 'value');
  const unit = fieldOf(temperature, 'unit');
  if (typeof value !== 'number' || (unit !== 'K' && unit !== 'degC')) return null;
  return toKelvin(value, unit);
}

const unitsOfKind: Record<string, readonly string[]> = {
  reactant: [...concentrationUnits, ...pressureUnits],
  product: [...concentrationUnits, ...pressureUnits],
  conversion: ratioUnits,
  signal: ['1'],
};

const options = ['productPerReactant', 'initialConcentration', 'baseline'] as const;

/** Faults between the parts of one series, each of which may be well-formed by itself. */
export function findSeriesFaults(entry: unknown, index: number): BatchFault[] {
  if (!isRecord(entry)) return [];
  const faults: BatchFault[] = [];
  const fault = (message: string, ...keys: string[]) =>
    faults.push({ path: pointerOf(['series', index, ...keys]), message });

  const role = entry.role ?? 'sample';
  if (role === 'sample' && !('catalyst' in entry)) {
    fault(
      'A sample needs its catalyst; only blanks, controls and benchmarks go without',
      'catalyst',
    );
  }
  const times = fieldOf(entry, 'time', 'values');
  const values = fieldOf(entry, 'reading', 'values');
  if (Array.isArray(times) && Array.isArray(values) && times.length !== values.length) {
    fault(
      `Times and readings must be equally many, got ${times.length} times and ${values.length} readings`,
      'reading',
      'values',
    );
  }
  const kind = fieldOf(entry, 'reading', 'kind') ?? 'reactant';
  const unit = fieldOf(entry, 'reading', 'unit');
  const allowed = typeof kind === 'string' ? unitsOfKind[kind] : undefined;
  const known = Object.values(unitsOfKind).flat();
  if (
    allowed !== undefined &&
    typeof kind === 'string' &&
    typeof unit === 'string' &&
    known.includes(unit) &&
    !allowed.includes(unit)
  ) {
    fault(
      `Unit ${unit} does not fit kind ${kind}; use one of ${allowed.join(', ')}, or another kind`,
      'reading',
      'unit',
    );
  }
  if (entry.residual === true && entry.law === 'saturating') {
    fault(
      'A level that stays is fitted beside laws that have an order, not beside saturation',
      'residual',
    );
  }
  const baseline = fieldOf(entry, 'reading', 'baseline') ?? entry.baseline;
  if (baseline === true && kind !== 'signal') {
    const keys = 'baseline' in entry ? ['baseline'] : ['reading', 'baseline'];
    fault('Only a signal has a baseline; use residual for a level that stays', ...keys);
  }
  if (baseline === true && entry.law === 'saturating') {
    fault('A baseline is fitted beside laws that have an order, not beside saturation', 'law');
  }
  for (const option of options) {
    const inside = fieldOf(entry, 'reading', option);
    if (option in entry && inside !== undefined) {
      fault('Given twice, here and inside the reading; give it once', option);
    }
  }
  return faults;
}
