import type { IssueInput, IssueList } from './issueList';

type CountedIssue = Omit<IssueInput, 'severity' | 'message'> & {
  /** Makes the sentence from the number of cells. */
  message: (count: number) => string;
};

/** Counts cautions that can come once per cell and reports each once, at its first cell. */
export class Tally {
  readonly #seen = new Map<string, { issue: CountedIssue; count: number }>();

  /** `group` keeps counts of one code apart, by column for instance. */
  count(group: string, issue: CountedIssue): void {
    const key = `${issue.code}\u0000${issue.sheet}\u0000${group}`;
    const seen = this.#seen.get(key);
    if (seen) seen.count += 1;
    else this.#seen.set(key, { issue, count: 1 });
  }

  report(issues: IssueList): void {
    for (const { issue, count } of this.#seen.values()) {
      issues.caution({ ...issue, message: issue.message(count) });
    }
    this.#seen.clear();
  }
}

/** `1 cell`, `3 cells`. */
export function counted(count: number, noun: string): string {
  return `${count} ${noun}${count === 1 ? '' : 's'}`;
}
