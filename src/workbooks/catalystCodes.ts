/** Letters of other alphabets, and digits, that look like a Latin capital or a digit. */
const LOOK_ALIKES = new Map(
  Object.entries({
    А: 'A',
    В: 'B',
    Е: 'E',
    К: 'K',
    М: 'M',
    Н: 'H',
    О: '0',
    Р: 'P',
    С: 'C',
    Т: 'T',
    Х: 'X',
    Α: 'A',
    Β: 'B',
    Ε: 'E',
    Ζ: 'Z',
    Η: 'H',
    Ι: '1',
    Κ: 'K',
    Μ: 'M',
    Ν: 'N',
    Ο: '0',
    Ρ: 'P',
    Τ: 'T',
    Υ: 'Y',
    Χ: 'X',
    а: 'a',
    е: 'e',
    о: 'o',
    р: 'p',
    с: 'c',
    х: 'x',
    O: '0',
    I: '1',
    l: '1',
  }),
);

/**
 * What a code looks like at a glance: without spaces and dashes, look-alike letters folded. Case
 * is kept where it can be chemistry (Co, CO) and folded in codes with a digit (mb-07, MB-07).
 */
function glance(code: string): string {
  const folded = [...code.normalize('NFKC').replace(/[\s_\p{Pd}−]+/gu, '')]
    .map((letter) => LOOK_ALIKES.get(letter) ?? letter)
    .join('');
  return /\d/u.test(code) ? folded.toUpperCase() : folded;
}

/** Groups of two or more different codes that look the same. */
export function findLookAlikes(codes: Iterable<string>): string[][] {
  const groups = new Map<string, Set<string>>();
  for (const code of codes) {
    const key = glance(code);
    const group = groups.get(key) ?? new Set<string>();
    groups.set(key, group.add(code));
  }
  return [...groups.values()].filter((group) => group.size > 1).map((group) => [...group]);
}
