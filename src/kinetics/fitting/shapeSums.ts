/**
 * Sums over the readings at one kRel, f being the shape that the amplitude multiplies and f', f'' its
 * derivatives by kRel: Σfy, Σf'y, Σf''y, Σff, and the first and second derivative of Σff.
 */
export type ShapeSums = (
  kRel: number,
  t: Float64Array,
  y: Float64Array,
  sums: Float64Array,
) => void;

/** Fills in f and f' = ∂f/∂kRel at every reading. */
export type ShapeFill = (
  kRel: number,
  t: Float64Array,
  f: Float64Array,
  byRate: Float64Array,
) => void;

/** What of a law a shape is made of. */
interface Shape {
  relative(u: number): number;
  converted(u: number): number;
  slope(u: number): number;
  bend(u: number): number;
}

/** Sums of any smooth law, from its relative form; `growing` for the shape 1 − g. */
export function shapeSumsOf(law: Shape, growing: boolean): ShapeSums {
  const sign = growing ? -1 : 1;
  return (kRel, t, y, sums) => {
    sums.fill(0);
    for (let i = 0; i < t.length; i += 1) {
      const ti = t[i]!;
      const u = kRel * ti;
      const f = growing ? law.converted(u) : law.relative(u);
      const first = sign * ti * law.slope(u);
      const second = sign * ti * ti * law.bend(u);
      sums[0]! += f * y[i]!;
      sums[1]! += first * y[i]!;
      sums[2]! += second * y[i]!;
      sums[3]! += f * f;
      sums[4]! += 2 * f * first;
      sums[5]! += 2 * (first * first + f * second);
    }
  };
}

/** Values and slopes of any law, from its relative form; `growing` for the shape 1 − g. */
export function shapeFillOf(law: Shape, growing: boolean): ShapeFill {
  const sign = growing ? -1 : 1;
  return (kRel, t, f, byRate) => {
    for (let i = 0; i < t.length; i += 1) {
      const u = kRel * t[i]!;
      f[i] = growing ? law.converted(u) : law.relative(u);
      byRate[i] = sign * t[i]! * law.slope(u);
    }
  };
}
