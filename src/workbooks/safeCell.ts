/** A value that may be written to an exported file. */
export type CellValue = string | number | boolean | null;

/** First characters with which a spreadsheet program starts to calculate, full-width ones too. */
const CALCULATES = /^[=+\-@\t\r\n＝＋－＠]/u;
const PLAIN_NUMBER = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?$/iu;

/**
 * Text that no spreadsheet program takes for a formula when it opens a csv file: an apostrophe is
 * put before it, unless all of it is a plain number. Reading such a file takes it off again.
 */
export function guardedText(text: string): string {
  return CALCULATES.test(text) && !PLAIN_NUMBER.test(text) ? `'${text}` : text;
}

/** Takes off the apostrophe that {@link guardedText} put on. */
export function unguardedText(text: string): string {
  return text.startsWith("'") && CALCULATES.test(text.slice(1)) ? text.slice(1) : text;
}

/** What is stored for a value: numbers that are not finite become empty. */
export function storable(value: CellValue): CellValue {
  return typeof value === 'number' && !Number.isFinite(value) ? null : value;
}
