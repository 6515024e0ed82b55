const lowered = '₀₁₂₃₄₅₆₇₈₉';

/** Letters and brackets of a formula, with at least one number after a letter or a bracket. */
const formula = /(?<![\w-])(?:[A-Z][a-z]?\d*|[()]\d*)+(?![\w-])/g;

/** One letter with a longer number is a maker's grade, such as P25. */
const grade = /^[A-Z][a-z]?\d{2,}$/;

/** Chemical formulas in running text with their numbers lowered: `2 % Ru/Al₂O₃`. */
export function formulaText(text: string): string {
  return text.replace(formula, (found) =>
    grade.test(found) ? found : found.replace(/\d/g, (digit) => lowered[Number(digit)] ?? digit),
  );
}
