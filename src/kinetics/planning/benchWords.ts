import { formatWithUncertainty, superscript } from '../significantFigures';

const ICE_POINT_K = 273.15;

/** How far a value may lie above a round number and still be that number. */
const ROUNDING = 1e-6;

const SPANS = [
  { unit: 'd', least: 259_200, seconds: 86_400 },
  { unit: 'h', least: 7200, seconds: 3600 },
  { unit: 'min', least: 180, seconds: 60 },
  { unit: 's', least: 0, seconds: 1 },
] as const;

const minus = (text: string) => text.replace('-', '−');

/** A measured temperature as it is said at the bench: `60 °C`, `62.5 °C`. */
export function celsius(temperatureK: number): string {
  return minus(`${Number((temperatureK - ICE_POINT_K).toFixed(1))} °C`);
}

/** A temperature to set, to the degree; rounded up where hotter is the safe side. */
export function celsiusToSet(temperatureK: number, hotter = false): string {
  const value = temperatureK - ICE_POINT_K;
  // −0 would be written with its sign.
  return minus(`${(hotter ? Math.ceil(value - 0.05) : Math.round(value)) + 0} °C`);
}

/** s in two figures, rounded up, so that the time said is long enough: `2.1 h`. */
export function durationUp(seconds: number): string {
  return duration(seconds, (value) => Math.ceil(value - ROUNDING));
}

/** s to the nearest two figures. */
export function durationNear(seconds: number): string {
  return seconds > 0 ? duration(seconds, Math.round) : 'the start';
}

function duration(seconds: number, round: (value: number) => number): string {
  const span = SPANS.find(({ least }) => seconds >= least) ?? SPANS[3];
  const value = seconds / span.seconds;
  if (!(value > 0)) return `0 ${span.unit}`;
  const place = 10 ** (Math.floor(Math.log10(value)) - 1);
  return `${Number((round(value / place) * place).toPrecision(3))} ${span.unit}`;
}

/** A share as whole percent, at least 1 where there is any. */
export function percent(share: number): string {
  return `${Math.max(Math.round(share * 100), share > 0 ? 1 : 0)} %`;
}

/** J/mol as kJ/mol in two figures. */
export function kilojoules(joules: number): string {
  return String(Number((joules / 1000).toPrecision(2)));
}

/** A rate in two figures with its unit, exponents raised: `2.3 × 10⁻⁷ mol L⁻¹ s⁻¹`. */
export function rateText(rate: number, unit: string): string {
  const { text } = formatWithUncertainty(Number(rate.toPrecision(2)), null);
  const trimmed = text.replace(/(\.\d)0(?= |$)/, '$1');
  return `${trimmed} ${unit.replace(/\^(-?\d+)/g, (_, power: string) => superscript(Number(power)))}`;
}

/** "a, b and c". */
export function listed(words: readonly string[]): string {
  return words.length < 2
    ? (words[0] ?? '')
    : `${words.slice(0, -1).join(', ')} and ${words[words.length - 1]!}`;
}
