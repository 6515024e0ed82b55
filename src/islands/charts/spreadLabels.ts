/**
 * Moves labels apart so that no two stand closer than `gap`, keeping their order and staying as
 * near to where they belong as they can.
 *
 * @param wanted where each label belongs, any order
 * @param gap least distance, above 0
 * @param low @param high ends that labels stay within, as long as all fit
 * @returns the place of each label, aligned with `wanted`
 */
export function spreadLabels(
  wanted: readonly number[],
  gap: number,
  low: number,
  high: number,
): number[] {
  const order = wanted.map((_, index) => index).sort((a, b) => wanted[a]! - wanted[b]!);
  const placed = order.map((index) => Math.min(Math.max(wanted[index]!, low), high));
  // Clusters that touch are merged and centred on the mean of what they want.
  interface Cluster {
    sum: number;
    count: number;
  }
  const clusters: Cluster[] = [];
  const startOf = ({ sum, count }: Cluster) => {
    const centred = sum / count - ((count - 1) * gap) / 2;
    return Math.max(low, Math.min(centred, high - (count - 1) * gap));
  };
  for (const place of placed) {
    clusters.push({ sum: place, count: 1 });
    for (;;) {
      const last = clusters.at(-1);
      const before = clusters.at(-2);
      if (!last || !before || startOf(before) + before.count * gap <= startOf(last)) break;
      clusters.splice(-2, 2, { sum: before.sum + last.sum, count: before.count + last.count });
    }
  }
  const result = new Array<number>(wanted.length);
  let next = 0;
  for (const cluster of clusters) {
    const start = startOf(cluster);
    for (let step = 0; step < cluster.count; step += 1) {
      result[order[next]!] = start + step * gap;
      next += 1;
    }
  }
  return result;
}
