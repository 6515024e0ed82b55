import { formatWithUncertainty } from '../kinetics/significantFigures';

/** K as it is said at the bench: `60 °C`, `62.5 °C`. */
export function formatKelvinAsCelsius(temperatureK: number): string {
  const celsius = Number((temperatureK - 273.15).toFixed(1));
  return `${minus(String(celsius))} °C`;
}

const spans = [
  { unit: 'd', least: 259_200, seconds: 86_400 },
  { unit: 'h', least: 10_800, seconds: 3600 },
  { unit: 'min', least: 180, seconds: 60 },
  { unit: 's', least: 0, seconds: 1 },
];

/** s as a person would say it, three figures: `26.7 min`. */
export function formatDuration(seconds: number): string {
  const span = spans.find(({ least }) => seconds >= least) ?? spans[3]!;
  return `${threeFigures(seconds / span.seconds)} ${span.unit}`;
}

/** Three significant figures, with a true minus and powers of ten where they are needed. */
export function threeFigures(value: number): string {
  return formatWithUncertainty(value, null).text;
}

/** A share as percent, one decimal below 10 %. */
export function formatPercent(share: number): string {
  const value = share * 100;
  return `${minus(value.toFixed(Math.abs(value) < 9.95 ? 1 : 0))} %`;
}

function minus(text: string): string {
  return text.replace('-', '−');
}
