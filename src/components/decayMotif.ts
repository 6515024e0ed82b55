import type { Verdict } from '../kinetics/types';

/** One decay of the drawing on the sign-in page. */
export interface MotifDecay {
  verdict: Verdict;
  /** SVG path of the curve. */
  curve: string;
  /** Centres of the readings. */
  readings: { x: number; y: number }[];
  /** Where its name stands. */
  label: { x: number; y: number };
}

export const motifBox = { width: 460, height: 340, left: 34, right: 352, top: 40, bottom: 300 };

/** Time axis of the drawing, min. */
export const motifMinutes = 120;

interface Course {
  verdict: Verdict;
  /** C/C0 at a time in min. */
  at: (minutes: number) => number;
}

const courses: readonly Course[] = [
  { verdict: 'no-reaction', at: (t) => 0.985 - t * 0.00009 },
  { verdict: 'saturating', at: (t) => saturating(t / 118, 2) },
  { verdict: 'first', at: (t) => Math.exp(-t / 82) },
  { verdict: 'second', at: (t) => 1 / (1 + t / 14) },
  { verdict: 'zero', at: (t) => Math.max(0, 1 - t / 88) },
];

/** C of a surface that is full at first: solves c + ln(c)/b = 1 − t by Newton's method. */
function saturating(time: number, b: number): number {
  let logC = 0;
  for (let step = 0; step < 40; step += 1) {
    const c = Math.exp(logC);
    logC -= (c + logC / b - 1 + time) / (c + 1 / b);
  }
  return Math.exp(logC);
}

/** Small departures that look measured and are the same at every visit. */
function departure(series: number, index: number): number {
  const turn = Math.sin((series + 1) * 12.9898 + (index + 1) * 78.233) * 43758.5453;
  return (turn - Math.floor(turn) - 0.5) * 0.045;
}

const x = (minutes: number) =>
  motifBox.left + ((motifBox.right - motifBox.left) * minutes) / motifMinutes;
const y = (share: number) => motifBox.bottom - (motifBox.bottom - motifBox.top) * share;
const tidy = (value: number) => Number(value.toFixed(1));

/** The decays with their readings. */
export function motifDecays(): MotifDecay[] {
  const grid = Array.from({ length: 97 }, (_, index) => (index * motifMinutes) / 96);
  const times = [2, 5, 8, 12, 17, 23, 30, 38, 47, 57, 68, 80, 93, 106, 119];
  return courses.map(({ verdict, at }, series) => ({
    verdict,
    curve: `M${grid.map((time) => `${tidy(x(time))} ${tidy(y(at(time)))}`).join('L')}`,
    readings: times.map((time, index) => ({
      x: tidy(x(time)),
      y: tidy(y(Math.max(0.004, at(time) + departure(series, index)))),
    })),
    label: { x: motifBox.right + 14, y: tidy(y(at(motifMinutes)) + 4) },
  }));
}
