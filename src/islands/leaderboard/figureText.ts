import { formatWithUncertainty } from '../../kinetics/significantFigures';
import type { Estimate } from '../../kinetics/types';
import { threeFigures } from '../numbers';

/** A figure as it stands beside its drawing. */
export type FigureText =
  | { kind: 'value'; value: string; uncertainty: string | null; power: string }
  | { kind: 'bracket'; low: string; high: string }
  | { kind: 'below'; high: string };

/**
 * The words of a figure.
 *
 * @param estimate in the unit that stands beside it
 * @param bracket true when low and high are bounds between laws
 * @param log true where only values above 0 mean something
 */
export function figureText(
  estimate: Estimate,
  { bracket, log }: { bracket: boolean; log: boolean },
): FigureText {
  const { value, se, low, high } = estimate;
  if (bracket && low !== null && high !== null) {
    return { kind: 'bracket', low: twoFigures(low), high: twoFigures(high) };
  }
  if (log && value <= 0 && high !== null && high > 0) {
    return { kind: 'below', high: twoFigures(high) };
  }
  const written = formatWithUncertainty(value, se);
  const { exponent } = written;
  return {
    kind: 'value',
    value: written.value,
    uncertainty: written.uncertainty,
    power: exponent === 0 ? '' : (/ × 10\S+$/.exec(written.text)?.[0] ?? ''),
  };
}

/** A bound is no measurement: two figures are enough. */
function twoFigures(value: number): string {
  return threeFigures(Number(value.toPrecision(2)))
    .replace(/(\.\d*?)0+(?=$| )/, '$1')
    .replace(/\.(?=$| )/, '');
}

/** The same in one line, for a screen reader, a list or a copy. */
export function spokenFigure(text: FigureText, unit: string): string {
  switch (text.kind) {
    case 'bracket':
      return `between ${text.low} and ${text.high} ${unit}`;
    case 'below':
      return `below ${text.high} ${unit}`;
    case 'value': {
      const both = text.uncertainty === null ? text.value : `${text.value} ± ${text.uncertainty}`;
      const grouped = text.power && text.uncertainty !== null ? `(${both})` : both;
      return `${grouped}${text.power} ${unit}`;
    }
  }
}
