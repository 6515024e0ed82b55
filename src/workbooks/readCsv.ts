import Papa from 'papaparse';
import { a1 } from './a1';
import { decodeText } from './decodeText';
import type { IssueList } from './issueList';
import type { WorkbookLimits } from './limits';
import { decimalEvidence } from './parseNumber';
import { unguardedText } from './safeCell';
import { EMPTY_CELL, textCell, type Sheet } from './sheet';
import { findTable } from './table';

/** The sheet name of every csv file. */
export const CSV_SHEET = 'csv';

const DELIMITER_NAMES: Record<string, string> = { ',': 'comma', ';': 'semicolon', '\t': 'tab' };

/** Reads a delimited text file as one sheet of text cells; empty with a stop when it cannot be. */
export function readCsv(bytes: Uint8Array, limits: WorkbookLimits, issues: IssueList): Sheet[] {
  const decoded = decodeText(bytes);
  if (!decoded) {
    issues.stop({
      code: 'not-text',
      sheet: CSV_SHEET,
      expected: 'text in UTF-8',
      message: 'The file could not be read as text. Save it as .csv in UTF-8 and upload it again.',
    });
    return [];
  }
  if (!decoded.certain) {
    issues.caution({
      code: 'encoding-guessed',
      sheet: CSV_SHEET,
      found: decoded.encoding,
      expected: 'text in UTF-8',
      message:
        'The text is not UTF-8 and was read as Western European. Check names with special letters, or save the file as UTF-8.',
    });
  }
  const { text, declared } = withoutSeparatorLine(decoded.text);
  const delimiter = declared ?? detectDelimiter(text);
  const parsed = Papa.parse<string[]>(text, { delimiter, preview: limits.rows + 2 });
  const rows = parsed.data;
  while (rows.length > 0 && rows.at(-1)!.every((field) => field.trim() === '')) rows.pop();
  if (declared !== null) rows.unshift([]);
  if (rows.length > limits.rows) {
    issues.stop({
      code: 'beyond-limit',
      sheet: CSV_SHEET,
      found: `more than ${limits.rows} rows`,
      expected: `at most ${limits.rows} rows`,
      message: `The file has more than ${limits.rows} rows. Split the screen over several files.`,
    });
    return [];
  }
  const quotes = parsed.errors.find((error) => error.type === 'Quotes');
  if (quotes) {
    issues.stop({
      code: 'open-quote',
      sheet: CSV_SHEET,
      cell: quotes.row === undefined ? null : a1(quotes.row, 0),
      expected: 'every quotation mark closed',
      message: `A quotation mark is not closed properly${quotes.row === undefined ? '' : ` in row ${quotes.row + 1}`}. Correct it and upload the file again.`,
    });
  }
  // Prose is no table with ragged rows; it is refused for having no header row.
  if (!findTable(asSheet(rows, '.', limits))) return [asSheet(rows, '.', limits)];
  stopRagged(rows, issues);
  const decimalSign = findDecimalSign(rows, delimiter, issues);
  if (delimiter !== ',' || decimalSign === ',') {
    issues.caution({
      code: 'delimiter',
      sheet: CSV_SHEET,
      found: DELIMITER_NAMES[delimiter] ?? delimiter,
      expected: 'comma, semicolon or tab between the fields',
      message: `Read with the ${DELIMITER_NAMES[delimiter] ?? delimiter} between fields and the decimal ${decimalSign === ',' ? 'comma' : 'point'}.`,
    });
  }
  return [asSheet(rows, decimalSign, limits)];
}

function asSheet(rows: string[][], decimalSign: '.' | ',', limits: WorkbookLimits): Sheet {
  const widest = rows.reduce((width, row) => Math.max(width, row.length), 0);
  return {
    name: CSV_SHEET,
    origin: 'csv',
    hidden: false,
    rowCount: rows.length,
    columnCount: Math.min(widest, limits.columns),
    hiddenRows: [],
    merges: [],
    decimalSign,
    cell: (row, column) => {
      const field = rows[row]?.[column];
      return field === undefined ? EMPTY_CELL : textCell(unguardedText(field));
    },
  };
}

/** A first line `sep=;` declares the delimiter. */
function withoutSeparatorLine(text: string): { text: string; declared: string | null } {
  const match = /^\s*"?sep=([,;\t])"?\r?\n/iu.exec(text);
  return match
    ? { text: text.slice(match[0].length), declared: match[1]! }
    : { text, declared: null };
}

/** The delimiter that cuts the first lines into most fields, the same number in most of them. */
function detectDelimiter(text: string): string {
  const lines = text
    .slice(0, 20_000)
    .split(/\r?\n|\r/u)
    .filter((line) => line.trim() !== '');
  const sample = lines.slice(0, 20);
  let best = { delimiter: ',', score: 0 };
  for (const delimiter of ['\t', ';', ',']) {
    const widths = sample.map(
      (line) => Papa.parse<string[]>(line, { delimiter }).data[0]?.length ?? 1,
    );
    const widest = Math.max(...widths, 1);
    const score = widest < 2 ? 0 : widths.filter((width) => width === widest).length * 100 + widest;
    if (score > best.score) best = { delimiter, score };
  }
  return best.delimiter;
}

function stopRagged(rows: string[][], issues: IssueList): void {
  const width = commonWidth(rows);
  for (const [index, row] of rows.entries()) {
    if (row.length === width || row.every((field) => field.trim() === '') || row.length === 1)
      continue;
    if (row.slice(width).every((field) => field.trim() === '') && row.length > width) continue;
    issues.stop({
      code: 'ragged-row',
      sheet: CSV_SHEET,
      cell: a1(index, Math.min(row.length, width)),
      found: `${row.length} fields`,
      expected: `${width} fields`,
      message: `Row ${index + 1} has ${row.length} fields where the table has ${width}. A delimiter is missing, or one too many stands inside a text without quotation marks.`,
    });
  }
}

/** The number of fields most rows have. */
function commonWidth(rows: string[][]): number {
  const counts = new Map<number, number>();
  for (const row of rows) counts.set(row.length, (counts.get(row.length) ?? 0) + 1);
  return [...counts].reduce((best, entry) => (entry[1] > best[1] ? entry : best), [0, 0])[0];
}

/** In a comma file the point; else what the numbers themselves say, and a stop when they do not. */
function findDecimalSign(rows: string[][], delimiter: string, issues: IssueList): '.' | ',' {
  if (delimiter === ',') return '.';
  const counts = { comma: 0, point: 0, either: 0 };
  let ambiguous: { cell: string; found: string } | null = null;
  let commaStyle = false;
  for (const [index, row] of rows.entries()) {
    for (const [column, field] of row.entries()) {
      const evidence = decimalEvidence(field);
      if (!evidence) continue;
      counts[evidence] += 1;
      if (evidence === 'either' && !ambiguous) {
        ambiguous = { cell: a1(index, column), found: field.trim() };
        commaStyle = field.includes(',');
      }
    }
  }
  if (ambiguous && counts.comma + counts.point === 0) {
    issues.stop({
      code: 'decimal-sign-unclear',
      sheet: CSV_SHEET,
      ...ambiguous,
      expected: 'numbers whose decimal sign is certain',
      message: `${ambiguous.cell}: “${ambiguous.found}” may be a thousand or a fraction, and no other number of the file says which. Write one number with another count of decimals.`,
    });
    return commaStyle ? ',' : '.';
  }
  return counts.comma > counts.point ? ',' : '.';
}
