/** Wells closer than this, in K, were set to one temperature. */
export const SAME_TEMPERATURE_K = 1.5;

/**
 * Sorts temperatures into those that were set: a new one begins where the next lies more than
 * 1.5 K above the first of the last.
 *
 * @returns for each temperature given, the number of its set temperature from 0
 */
export function setTemperatures(temperaturesK: readonly number[]): number[] {
  const order = temperaturesK
    .map((_, i) => i)
    .sort((a, b) => temperaturesK[a]! - temperaturesK[b]!);
  const numbers = new Array<number>(temperaturesK.length).fill(0);
  let start = -Infinity;
  let number = -1;
  for (const i of order) {
    if (temperaturesK[i]! - start > SAME_TEMPERATURE_K) {
      start = temperaturesK[i]!;
      number += 1;
    }
    numbers[i] = number;
  }
  return numbers;
}

/** How many temperatures were set. */
export function countTemperatures(temperaturesK: readonly number[]): number {
  return temperaturesK.length === 0 ? 0 : Math.max(...setTemperatures(temperaturesK)) + 1;
}
