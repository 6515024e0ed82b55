import type { Estimate } from '../../kinetics/types';
import { raised } from '../charts/plotNumber';

/** A number as its parts, so that the page can set the interval quieter than the value. */
export interface Figure {
  /** Value with the digits that its uncertainty leaves, such as `(1.049 ± 0.021) × 10⁻³`. */
  text: string;
  /** With typographic signs, such as `L mol⁻¹ s⁻¹`; empty for plain numbers. */
  unit: string;
  /** The 95 % interval, such as `49.0 to 55.6`; null when there is none. */
  interval: string | null;
}

/** `L mol^-1 s^-1` as it is printed: `L mol⁻¹ s⁻¹`. */
export function printedUnit(unit: string): string {
  return unit.replace(/\^\(?(-?[\d.]+)\)?/g, (_, exponent: string) => {
    const number = Number(exponent);
    return Number.isInteger(number) ? raised(number) : `^(${exponent.replace('-', '−')})`;
  });
}

/** Decimals that leave two significant figures of an uncertainty. */
function decimalsFor(uncertainty: number): number {
  return Math.min(12, Math.max(0, 1 - Math.floor(Math.log10(uncertainty) + 1e-9)));
}

const grouped = (body: string, power: string) => (power ? `(${body})${power}` : body);

const sign = (text: string) => text.replace(/-/g, '−');

/**
 * A value with its standard error and interval, digits set by the uncertainty and one shared power
 * of ten outside 0.01 to 10,000.
 *
 * @param factor brings the base unit to the printed one
 */
export function figureOf(estimate: Estimate, unit: string, factor = 1): Figure {
  const value = estimate.value * factor;
  const se = estimate.se === null ? null : estimate.se * factor;
  const size = Math.abs(value);
  const exponent = size > 0 && (size < 0.01 || size >= 1e4) ? Math.floor(Math.log10(size)) : 0;
  const scale = 10 ** exponent;
  const width =
    estimate.low !== null && estimate.high !== null
      ? ((estimate.high - estimate.low) * factor) / 4
      : null;
  const uncertainty = se ?? width;
  const show = (number: number) =>
    uncertainty && uncertainty > 0
      ? (number / scale).toFixed(decimalsFor(uncertainty / scale))
      : String(Number((number / scale).toPrecision(3)));
  const body = se === null || se <= 0 ? show(value) : `${show(value)} ± ${show(se)}`;
  const power = exponent === 0 ? '' : ` × 10${raised(exponent)}`;
  const text = sign(body.includes('±') ? grouped(body, power) : `${body}${power}`);
  const interval =
    estimate.low === null || estimate.high === null
      ? null
      : sign(grouped(`${show(estimate.low * factor)} to ${show(estimate.high * factor)}`, power));
  return { text, unit: printedUnit(unit), interval };
}

/** A figure that is known only between two bounds: the bounds stand in the value's place. */
export function bracketFigure(figure: Figure): Figure {
  return figure.interval === null ? figure : { ...figure, text: figure.interval, interval: null };
}

const spans = [
  { unit: 's', least: 0, factor: 1 },
  { unit: 'min', least: 180, factor: 1 / 60 },
  { unit: 'h', least: 10_800, factor: 1 / 3600 },
  { unit: 'd', least: 259_200, factor: 1 / 86_400 },
];

/** A time in s, in the unit in which a person would say it. */
export function durationFigure(estimate: Estimate): Figure {
  const span = spans.findLast(({ least }) => Math.abs(estimate.value) >= least) ?? spans[0]!;
  return figureOf(estimate, span.unit, span.factor);
}

/** A share as percent, one decimal below 10 %. */
export function percent(share: number): string {
  const value = share * 100;
  return `${sign(value.toFixed(Math.abs(value) < 9.95 ? 1 : 0))} %`;
}
