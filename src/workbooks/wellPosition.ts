/** Standard plate formats, smallest first. */
export const PLATE_FORMATS = [24, 48, 96, 384] as const;
export type PlateFormat = (typeof PLATE_FORMATS)[number];

const SIZES: Record<PlateFormat, { rows: number; columns: number }> = {
  24: { rows: 4, columns: 6 },
  48: { rows: 6, columns: 8 },
  96: { rows: 8, columns: 12 },
  384: { rows: 16, columns: 24 },
};

/** Normalises `a1`, `A01`, `A 1` to `A01`; null when it is no well of any standard plate. */
export function normalisePosition(text: string): string | null {
  const match = /^([A-Z])\s*0*([1-9]\d?)$/iu.exec(text.trim().normalize('NFKC'));
  if (!match) return null;
  const position = `${match[1]!.toUpperCase()}${match[2]!.padStart(2, '0')}`;
  return fitsOn(position, 384) ? position : null;
}

/** True when a normalised position lies on a plate of that format. */
export function fitsOn(position: string, format: PlateFormat): boolean {
  const { rows, columns } = SIZES[format];
  return position.charCodeAt(0) - 64 <= rows && Number(position.slice(1)) <= columns;
}

/** Last well of a format, such as `H12` of 96. */
export function lastWell(format: PlateFormat): string {
  const { rows, columns } = SIZES[format];
  return `${String.fromCharCode(64 + rows)}${columns}`;
}

/**
 * The smallest format that holds nearly all positions: up to one in ten, and at most two, may
 * lie outside when there are ten or more, because a slip of the hand is likelier than a plate
 * four times the size with one more well used.
 */
export function guessFormat(positions: readonly string[]): PlateFormat {
  const slips = positions.length >= 10 ? Math.min(2, Math.floor(positions.length / 10)) : 0;
  for (const format of PLATE_FORMATS) {
    const outside = positions.filter((position) => !fitsOn(position, format)).length;
    if (outside <= slips) return format;
  }
  return 384;
}
