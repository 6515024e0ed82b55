/** A colour in OKLCH (B. Ottosson, 2020): lightness 0 to 1, chroma, hue in degrees. */
export interface Oklch {
  lightness: number;
  chroma: number;
  hue: number;
}

/** A colour for every share from 0 to 1, as `#rrggbb`. */
export type Ramp = (share: number) => string;

/** OKLCH to linear sRGB; parts outside 0 to 1 are outside the gamut. */
function linearRgb({ lightness, chroma, hue }: Oklch): [number, number, number] {
  const angle = (hue * Math.PI) / 180;
  const a = chroma * Math.cos(angle);
  const b = chroma * Math.sin(angle);
  const l = (lightness + 0.3963377774 * a + 0.2158037573 * b) ** 3;
  const m = (lightness - 0.1055613458 * a - 0.0638541728 * b) ** 3;
  const s = (lightness - 0.0894841775 * a - 1.291485548 * b) ** 3;
  return [
    4.0767416621 * l - 3.3077115913 * m + 0.2309699292 * s,
    -1.2684380046 * l + 2.6097574011 * m - 0.3413193965 * s,
    -0.0041960863 * l - 0.7034186147 * m + 1.707614701 * s,
  ];
}

const inGamut = (parts: readonly number[]) =>
  parts.every((part) => part >= -1e-6 && part <= 1 + 1e-6);

function encode(part: number): string {
  const clipped = Math.min(1, Math.max(0, part));
  const gamma = clipped <= 0.0031308 ? 12.92 * clipped : 1.055 * clipped ** (1 / 2.4) - 0.055;
  return Math.round(gamma * 255)
    .toString(16)
    .padStart(2, '0');
}

/**
 * The colour as `#rrggbb`. Where sRGB cannot show it, chroma gives way and lightness stays, so that
 * a ramp's steps stay even.
 *
 * @param colour lightness 0 to 1, chroma at least 0
 */
export function hexOfOklch(colour: Oklch): string {
  let low = 0;
  let high = colour.chroma;
  if (!inGamut(linearRgb(colour))) {
    for (let step = 0; step < 24; step += 1) {
      const chroma = (low + high) / 2;
      if (inGamut(linearRgb({ ...colour, chroma }))) low = chroma;
      else high = chroma;
    }
    high = low;
  }
  return `#${linearRgb({ ...colour, chroma: high })
    .map(encode)
    .join('')}`;
}

const clampShare = (share: number) => Math.min(1, Math.max(0, share));

function ramp(from: Oklch, to: Oklch, midChroma: number): Ramp {
  return (share) => {
    const t = clampShare(share);
    // A parabola through both ends' chroma and the middle's keeps the middle from going grey.
    const straight = from.chroma + (to.chroma - from.chroma) * t;
    const lift = midChroma - (from.chroma + to.chroma) / 2;
    return hexOfOklch({
      lightness: from.lightness + (to.lightness - from.lightness) * t,
      chroma: straight + lift * 4 * t * (1 - t),
      hue: from.hue + (to.hue - from.hue) * t,
    });
  };
}

/** Rates: deep sea (slow) to pale lichen (fast). */
export const rateRamp = ramp(
  { lightness: 0.3, chroma: 0.07, hue: 230 },
  { lightness: 0.92, chroma: 0.09, hue: 130 },
  0.1,
);

/** Temperatures: plum (cold) over rust to straw (hot). */
export const temperatureRamp = ramp(
  { lightness: 0.3, chroma: 0.1, hue: -20 },
  { lightness: 0.9, chroma: 0.1, hue: 85 },
  0.15,
);

/** Amounts that are neither rate nor temperature, such as scatter: pale (little) to graphite. */
export const amountRamp = ramp(
  { lightness: 0.94, chroma: 0.012, hue: 85 },
  { lightness: 0.34, chroma: 0.03, hue: 40 },
  0.045,
);

/**
 * Residuals from −1 to 1: verdigris below, rust above, pale at 0; equally dark at both ends.
 *
 * @param share −1 to 1
 */
export function residualRamp(share: number): string {
  const size = clampShare(Math.abs(share));
  return hexOfOklch({
    lightness: 0.93 - 0.45 * size,
    chroma: 0.005 + 0.115 * size,
    hue: share < 0 ? 195 : 40,
  });
}

/**
 * Where a value lies between two others, for a ramp.
 *
 * @param scale `log` takes values above 0
 * @returns 0 to 1; 0.5 when both ends are the same
 */
export function shareOf(
  value: number,
  [low, high]: readonly [number, number],
  scale: 'linear' | 'log',
): number {
  const along = scale === 'log' ? Math.log : (number: number) => number;
  const span = along(high) - along(low);
  return span === 0 ? 0.5 : clampShare((along(value) - along(low)) / span);
}

/** Relative luminance of `#rrggbb` (WCAG 2.2). */
export function luminanceOf(hex: string): number {
  const [r, g, b] = [1, 3, 5].map((at) => {
    const part = parseInt(hex.slice(at, at + 2), 16) / 255;
    return part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4;
  }) as [number, number, number];
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

/** Black or white, whichever is read better on the colour. */
export function inkOn(hex: string): string {
  const luminance = luminanceOf(hex);
  const [dark, light] = ['#000000', '#ffffff'];
  const onDark = (luminance + 0.05) / (luminanceOf(dark) + 0.05);
  return onDark >= 1.05 / (luminance + 0.05) ? dark : light;
}
