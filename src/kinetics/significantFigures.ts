/** A value and its uncertainty as strings that share their digits and their power of ten. */
export interface FormattedValue {
  /** Mantissa, for example `3.42`. */
  value: string;
  /** Uncertainty in the same power, for example `0.08`; null when there is none. */
  uncertainty: string | null;
  /** Power of ten that both are multiplied by; 0 when written out. */
  exponent: number;
  /** All together, for example `(3.42 ± 0.08) × 10⁻³`. */
  text: string;
}

/** Figures of a value without uncertainty. */
const PLAIN_FIGURES = 3;
/** Values between these powers of ten are written out. */
const LOWEST_PLAIN = -2;
const HIGHEST_PLAIN = 4;

const RAISED: Record<string, string> = { '-': '⁻' };
'⁰¹²³⁴⁵⁶⁷⁸⁹'.split('').forEach((digit, i) => (RAISED[String(i)] = digit));

/** A whole number as superscript digits. */
export function superscript(power: number): string {
  return [...String(power)].map((character) => RAISED[character] ?? character).join('');
}

const minus = (text: string) => text.replace('-', '−');

function magnitude(value: number): number {
  return value === 0 ? 0 : Number(value.toExponential().split('e')[1]);
}

/**
 * Writes a value to the figures that its standard error allows: two where the error starts with 1
 * or 2, else one; three figures where there is no error.
 *
 * @param value finite
 * @param se at least 0, or null
 * @throws RangeError when the value is not finite
 */
export function formatWithUncertainty(value: number, se: number | null): FormattedValue {
  if (!Number.isFinite(value)) throw new RangeError(`value must be finite, got ${value}`);
  const error = se !== null && Number.isFinite(se) && se > 0 ? se : null;
  const lastPlace = error === null ? magnitude(value) - (PLAIN_FIGURES - 1) : lastPlaceOf(error);
  // Where the error is larger than the value, its power of ten serves both.
  const top = Math.max(
    magnitude(roundAt(value, lastPlace)),
    error === null ? -Infinity : magnitude(roundAt(error, lastPlace)),
  );
  const exponent = top < LOWEST_PLAIN || top >= HIGHEST_PLAIN ? top : 0;
  const decimals = Math.min(Math.max(exponent - lastPlace, 0), 20);
  const write = (number: number) =>
    minus((roundAt(number, lastPlace) / 10 ** exponent).toFixed(decimals));
  const mantissa = write(value);
  const uncertainty = error === null ? null : write(error);
  const power = exponent === 0 ? '' : ` × 10${superscript(exponent)}`;
  const both = uncertainty === null ? mantissa : `${mantissa} ± ${uncertainty}`;
  const text = power !== '' && uncertainty !== null ? `(${both})${power}` : `${both}${power}`;
  return { value: mantissa, uncertainty, exponent, text };
}

function lastPlaceOf(error: number): number {
  const place = magnitude(Number(error.toPrecision(2)));
  const leading = Number(error.toExponential(1).split('e')[0]);
  return leading < 3 ? place - 1 : place;
}

function roundAt(value: number, place: number): number {
  // Through the decimal string: 10 ** −place is not exact for large negative places.
  const shifted = Math.round(
    Number(`${value.toExponential().split('e')[0]}e${magnitude(value) - place}`),
  );
  return Number(`${shifted}e${place}`);
}
