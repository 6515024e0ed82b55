/** Gradient of a model's response by its two parameters at a time. */
export type ResponseGradient = (time: number) => readonly [number, number];

const GRID = 160;
const ROUNDS = 8;

/**
 * The two times that determine two parameters best: they make the area that the confidence region
 * has smallest, |det J| = |f₁(t₁) f₂(t₂) − f₂(t₁) f₁(t₂)| largest (D-optimality; Box & Lucas,
 * Biometrika 1959, 46, 77). By a grid over both times, refined around its best.
 *
 * @param gradient ∂η/∂θ₁, ∂η/∂θ₂, noise constant
 * @param range of times, both ends allowed
 * @returns ascending; null when no two times determine both parameters
 */
export function dOptimalPair(
  gradient: ResponseGradient,
  range: readonly [low: number, high: number],
): [number, number] | null {
  let spans = [range, range];
  let best = { area: 0, times: [range[0], range[1]] };
  let step = (range[1] - range[0]) / GRID;
  for (let round = 0; round < ROUNDS; round += 1) {
    const [early, late] = spans.map(([low, high]) => pointsBetween(low, high, gradient));
    for (const one of early!) {
      for (const two of late!) {
        const area = Math.abs(one.f[0] * two.f[1] - one.f[1] * two.f[0]);
        if (area > best.area) best = { area, times: [one.time, two.time] };
      }
    }
    if (!(best.area > 0)) return null;
    spans = best.times.map((time) => [
      Math.max(time - step, range[0]),
      Math.min(time + step, range[1]),
    ]);
    step *= 2 / GRID;
  }
  const [a, b] = best.times as [number, number];
  return a < b ? [a, b] : [b, a];
}

function pointsBetween(low: number, high: number, gradient: ResponseGradient) {
  return Array.from({ length: GRID + 1 }, (_, i) => {
    const time = low + ((high - low) * i) / GRID;
    return { time, f: gradient(time) };
  });
}
