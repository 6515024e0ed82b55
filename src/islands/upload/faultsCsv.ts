import type { WorkbookIssue } from './workbookIssue';

/** What a spreadsheet program may take for a formula, full-width forms included. */
const formulaStart = /^[\s]*[=+\-@\t\r\n\uFF1D\uFF0B\uFF0D\uFF20]/;
const plainNumber = /^[+-]?\d+(\.\d+)?([eE][+-]?\d+)?$/;

/** One cell of a csv file: always quoted, and never run as a formula. */
export function csvCell(text: string): string {
  const safe = formulaStart.test(text) && !plainNumber.test(text) ? `'${text}` : text;
  return `"${safe.replaceAll('"', '""')}"`;
}

/** The list of faults as csv text, with a byte order mark so that it opens as UTF-8. */
export function faultsCsv(issues: readonly WorkbookIssue[]): string {
  const header = ['Sheet', 'Cell', 'Found', 'Expected', 'What to do'];
  const rows = issues.map((issue) => [
    issue.sheet,
    issue.cell ?? '',
    issue.found ?? '',
    issue.expected,
    issue.message,
  ]);
  const lines = [header, ...rows].map((row) => row.map(csvCell).join(','));
  return `\uFEFF${lines.join('\r\n')}\r\n`;
}
