/** Exponentials of the floor for a series of 40 readings, by the number of laws. */
export const FLOOR_EXPONENTIALS = { 3: 180, 4: 662 } as const;

/** Calls Math.exp so often for each series; the sum keeps the calls from being left out. */
export function floor(series: number, exponentials: number): number {
  let sum = 0;
  let x = 0.01;
  for (let i = 0; i < series * exponentials; i += 1) {
    sum += Math.exp(-x);
    x = x > 4 ? 0.01 : x + 0.031;
  }
  return sum;
}
