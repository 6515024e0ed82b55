/** What a piece of text is, read as a number with a known decimal sign. */
export type NumberText =
  | { kind: 'number'; value: number }
  | { kind: 'missing' }
  | { kind: 'censored' }
  | { kind: 'wrong-decimal-sign' }
  | { kind: 'thousands' }
  | { kind: 'with-unit' }
  | { kind: 'out-of-range' }
  | { kind: 'date' }
  | { kind: 'error' }
  | { kind: 'not-a-number' };

/** Largest magnitude accepted in any column; beyond it a number is a fault of the file. */
export const LARGEST_NUMBER = 1e15;

const MISSING = new Set(
  '|-|–|—|.|n.d.|nd|n.d|n/a|n.a.|na|nan|inf|+inf|-inf|infinity|-infinity|missing|none|null|void'.split(
    '|',
  ),
);
const CENSORED = /^(?:[<≤]|below\b|under\b|bdl$|bql$|blq$|b\.?d\.?l\.?$|lod$|loq$)/iu;
const ERROR_NAME = /^#(?:N\/A|DIV\/0!|VALUE!|REF!|NAME\?|NUM!|NULL!|SPILL!|CALC!)$/iu;

/**
 * Reads text strictly: digits, one decimal sign, an exponent. Thousands separators, units and the
 * other decimal sign are named, never guessed at.
 */
export function parseNumberText(text: string, decimalSign: '.' | ','): NumberText {
  const trimmed = text.normalize('NFKC').replace(/−/gu, '-').trim();
  if (MISSING.has(trimmed.toLowerCase())) return { kind: 'missing' };
  if (CENSORED.test(trimmed)) return { kind: 'censored' };
  if (ERROR_NAME.test(trimmed)) return { kind: 'error' };
  const plain = decimalSign === ',' ? /^[+-]?(?:\d+,?\d*|,\d+)(?:e[+-]?\d+)?$/iu : PLAIN_DOT;
  if (plain.test(trimmed)) {
    const value = Number(trimmed.replace(',', '.'));
    return Math.abs(value) <= LARGEST_NUMBER ? { kind: 'number', value } : { kind: 'out-of-range' };
  }
  return { kind: whyNot(trimmed, decimalSign) };
}

const PLAIN_DOT = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?$/iu;

function whyNot(
  text: string,
  decimalSign: '.' | ',',
): Exclude<NumberText['kind'], 'number' | 'missing' | 'censored'> {
  if (/^\d{1,4}[-/.]\d{1,2}[-/.]\d{1,4}$/u.test(text) || /^\d{1,2}:\d{2}(:\d{2})?$/u.test(text)) {
    return 'date';
  }
  if (/^[+-]?\d{1,3}(?:[ '’]\d{3})+(?:[.,]\d+)?$/u.test(text)) return 'thousands';
  if (/^[+-]?\d{1,3}(?:,\d{3})+\.\d+$/u.test(text)) return 'thousands';
  if (/^[+-]?\d{1,3}(?:\.\d{3})+,\d+$/u.test(text)) return 'thousands';
  const other = decimalSign === ',' ? '.' : ',';
  if (/^[+-]?[\d.,]+(?:e[+-]?\d+)?$/iu.test(text) && text.includes(other)) {
    return text.split(other).length > 2 ? 'thousands' : 'wrong-decimal-sign';
  }
  if (/^[+-]?[\d.,]+(?:e[+-]?\d+)?\s*[%°µa-z][\wµ°%/().^-]*$/iu.test(text)) return 'with-unit';
  return 'not-a-number';
}

/**
 * What a number written as text says about the decimal sign of its file: a certain comma, a
 * certain point, either (`1.234` may be a thousand or a fraction), or nothing.
 */
export function decimalEvidence(text: string): 'comma' | 'point' | 'either' | null {
  const trimmed = text.trim();
  const comma = /^[+-]?\d*,\d+(?:e[+-]?\d+)?$/iu.test(trimmed);
  const point = /^[+-]?\d*\.\d+(?:e[+-]?\d+)?$/iu.test(trimmed);
  if (!comma && !point) return null;
  if (/^[+-]?[1-9]\d{0,2}[.,]\d{3}$/u.test(trimmed)) return 'either';
  return comma ? 'comma' : 'point';
}
