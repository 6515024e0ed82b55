import type { CellPlace, WorkbookIssue } from './types';

/** What a reader reports; `found` is shortened here, `cell` and `found` may be left out. */
export interface IssueInput {
  severity: 'stop' | 'caution';
  code: string;
  sheet: string;
  cell?: string | null;
  found?: string | null;
  expected: string;
  message: string;
}

const FOUND_LENGTH = 60;

/** Shortens to 60 characters and makes control characters visible as `�`. */
export function shorten(text: string): string {
  const visible = text.slice(0, FOUND_LENGTH + 1).replace(/\p{Cc}/gu, '�');
  return visible.length > FOUND_LENGTH ? `${visible.slice(0, FOUND_LENGTH - 1)}…` : visible;
}

/**
 * Collects every issue of one file. Stops and cautions are capped apart, so that a flood of
 * cautions never hides a stop; what is beyond the cap is counted in a last entry.
 */
export class IssueList {
  readonly #cap: number;
  readonly #kept = { stop: [] as WorkbookIssue[], caution: [] as WorkbookIssue[] };
  readonly #count = { stop: 0, caution: 0 };

  constructor(cap: number) {
    this.#cap = cap;
  }

  add(input: IssueInput): void {
    const { severity } = input;
    this.#count[severity] += 1;
    if (this.#kept[severity].length >= this.#cap) return;
    this.#kept[severity].push({
      severity,
      code: input.code,
      sheet: input.sheet,
      cell: input.cell ?? null,
      found: input.found == null || input.found === '' ? null : shorten(input.found),
      expected: input.expected,
      message: input.message,
    });
  }

  stop(input: Omit<IssueInput, 'severity'>): void {
    this.add({ severity: 'stop', ...input });
  }

  caution(input: Omit<IssueInput, 'severity'>): void {
    this.add({ severity: 'caution', ...input });
  }

  get stopped(): boolean {
    return this.#count.stop > 0;
  }

  /** Stops first, then cautions; at most the cap in all, with a last entry that counts the rest. */
  list(): WorkbookIssue[] {
    const all = [...this.#kept.stop, ...this.#kept.caution];
    const total = this.#count.stop + this.#count.caution;
    if (total <= this.#cap) return all;
    const listed = all.slice(0, this.#cap);
    const place: CellPlace = listed[0] ?? { sheet: 'csv', cell: null };
    listed.push({
      severity: this.stopped ? 'stop' : 'caution',
      code: 'more-issues',
      sheet: place.sheet,
      cell: null,
      found: `${total - this.#cap}`,
      expected: `at most ${this.#cap} faults in one file`,
      message: `${total - this.#cap} further faults are not listed; correct those above and upload the file again.`,
    });
    return listed;
  }
}
