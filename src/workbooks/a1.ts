/** Column letters of a 0-based column: 0 → `A`, 26 → `AA`. */
export function columnLetters(column: number): string {
  let letters = '';
  for (let rest = column + 1; rest > 0; rest = Math.floor((rest - 1) / 26)) {
    letters = String.fromCharCode(65 + ((rest - 1) % 26)) + letters;
  }
  return letters;
}

/** A1 address of a 0-based row and column. */
export function a1(row: number, column: number): string {
  return `${columnLetters(column)}${row + 1}`;
}

/** 0-based column of column letters: `A` → 0, `AA` → 26. */
export function columnIndex(letters: string): number {
  let index = 0;
  for (const letter of letters) index = index * 26 + (letter.charCodeAt(0) - 64);
  return index - 1;
}
