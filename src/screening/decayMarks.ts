import type { Verdict } from '../kinetics/types';

/** Drawing area of a decay mark, px. */
export const markWidth = 20;
export const markHeight = 14;

/** One stroke of a mark: an SVG path in the drawing area. */
export interface MarkStroke {
  path: string;
  dashed: boolean;
}

/** The verdict in words. */
export const verdictWords: Record<Verdict, string> = {
  zero: 'zero order',
  first: 'first order',
  second: 'second order',
  saturating: 'saturating',
  other: 'another order',
  undetermined: 'undetermined',
  'no-reaction': 'no reaction',
  unusable: 'unusable',
  forced: 'forced order',
};

/** The verdict in words, with the number of a forced order. */
export function verdictWord(verdict: Verdict, order: number | null = null): string {
  return verdict === 'forced' && order !== null
    ? `order ${Number(order.toPrecision(3))}, forced`
    : verdictWords[verdict];
}

type Course = (share: number) => number;

const left = 1.5;
const right = 18.5;
const top = 2;
const floor = 12;

const place = (share: number, level: number) =>
  `${(left + (right - left) * share).toFixed(1)} ${(floor - (floor - top) * level).toFixed(1)}`;

function draw(course: Course, from = 0, to = 1, points = 12): string {
  const at = Array.from({ length: points + 1 }, (_, i) => from + ((to - from) * i) / points);
  return `M${at.map((share) => place(share, course(share))).join('L')}`;
}

const straight: Course = (share) => Math.max(0, 1 - 1.25 * share);
const bending: Course = (share) => Math.exp(-3 * share);
const trailing: Course = (share) => 1 / (1 + 14 * share) ** 0.85;

/** Straight while the surface is full, then an exponential that leaves the line smoothly. */
const saturating: Course = (share) => {
  const turn = 0.5;
  const atTurn = 1 - 1.5 * turn;
  return share <= turn ? 1 - 1.5 * share : atTurn * Math.exp((-1.5 / atTurn) * (share - turn));
};

function ofOrder(order: number | null): string {
  if (order === null) return draw(bending);
  if (order < 0.25) return zeroPath;
  return draw(order < 1.5 ? bending : trailing);
}

const zeroPath = `M${place(0, 1)}L${place(0.96, 0)}`;
const solid = (...paths: string[]): MarkStroke[] => paths.map((path) => ({ path, dashed: false }));

/**
 * The mark that stands for a verdict everywhere: how such a decay runs, 20 × 14 px.
 *
 * @param order order of a forced law; not used otherwise
 * @returns strokes in drawing order
 */
export function decayMark(verdict: Verdict, order: number | null = null): MarkStroke[] {
  switch (verdict) {
    case 'zero':
      return solid(zeroPath);
    case 'first':
      return solid(draw(bending));
    case 'second':
      return solid(draw(trailing, 0, 1, 20));
    case 'saturating':
      return solid(draw(saturating));
    case 'other':
      return solid(`M${place(0, 1)}L${place(0.28, 0.5)}L${place(0.64, 0.42)}L${place(1, 0)}`);
    case 'undetermined':
      return [draw(straight, 0, 0.8, 4), draw((x) => 1 - 0.55 * x), draw((x) => 1 - 0.18 * x)].map(
        (path) => ({ path, dashed: true }),
      );
    case 'no-reaction':
      return solid(`M${place(0, 0.72)}L${place(1, 0.72)}`);
    case 'unusable':
      return solid(
        `M${place(0.28, 0.9)}L${place(0.72, 0.1)}`,
        `M${place(0.28, 0.1)}L${place(0.72, 0.9)}`,
      );
    case 'forced':
      return solid(ofOrder(order), `M${place(0, -0.12)}L${place(1, -0.12)}`);
  }
}
