const superscripts = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** A whole number in raised digits. */
export function raised(exponent: number): string {
  const digits = String(Math.abs(exponent)).replace(
    /\d/g,
    (digit) => superscripts[Number(digit)] ?? '',
  );
  return exponent < 0 ? `⁻${digits}` : digits;
}

/**
 * A number for a tick or a tooltip: at most `digits` significant figures, a true minus, powers of
 * ten outside 0.001 to 100,000.
 */
export function plotNumber(value: number, digits = 4): string {
  if (value === 0) return '0';
  const size = Math.abs(value);
  if (size >= 1e5 || size < 1e-3) {
    const exponent = Math.floor(Math.log10(size));
    const mantissa = Number((value / 10 ** exponent).toPrecision(digits));
    return `${minus(String(mantissa))} × 10${raised(exponent)}`;
  }
  return minus(String(Number(value.toPrecision(digits))));
}

/** Writes the ticks of one axis with the same number of decimals: `2.90`, `2.95`, `3.00`. */
export function tickWriter(ticks: readonly number[]): (tick: number) => string {
  const written = ticks.map((tick) => plotNumber(tick));
  if (written.some((text) => text.includes('×'))) return (tick) => plotNumber(tick);
  const decimals = Math.max(0, ...written.map((text) => text.split('.')[1]?.length ?? 0));
  return (tick) => (tick === 0 ? '0' : minus(tick.toFixed(decimals)));
}

function minus(text: string): string {
  return text.replace('-', '−');
}
