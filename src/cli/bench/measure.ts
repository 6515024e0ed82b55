/** Milliseconds that one call takes. */
export function timeOf(work: () => unknown): number {
  const start = performance.now();
  work();
  return performance.now() - start;
}

export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[middle]! : (sorted[middle - 1]! + sorted[middle]!) / 2;
}

/** One line: what was compared, the ratio, what is wanted of it. */
export function line(what: string, value: string, wanted: string, reached: boolean): string {
  return `${what.padEnd(58)} ${value.padStart(12)}   ${wanted.padEnd(16)} ${reached ? 'reached' : 'MISSED'}`;
}
