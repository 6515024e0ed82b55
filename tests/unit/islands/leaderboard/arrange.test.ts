import { describe, expect, it } from 'vitest';
import { firstLook, type LeaderboardLook } from '../../../../src/islands/leaderboard/address';
import {
  arrange as arrangeRanked,
  type LeaderboardLine,
} from '../../../../src/islands/leaderboard/arrange';
import { rankSentence, rankSpan } from '../../../../src/islands/leaderboard/RankMark';
import type { LeaderboardRow } from '../../../../src/contracts/leaderboard';
import { estimate, leaderboardRow, withRanks } from '../../../fixtures/views';

const look = (more: Partial<LeaderboardLook> = {}): LeaderboardLook => ({ ...firstLook, ...more });

const arrange = (rows: readonly LeaderboardRow[], how: LeaderboardLook) =>
  arrangeRanked(withRanks(rows), how);

const read = (lines: LeaderboardLine[]) =>
  lines.map((line) => (line.kind === 'heading' ? `# ${line.title}` : line.row.code));

const ranks = (lines: LeaderboardLine[]) =>
  lines.map((line) =>
    line.kind === 'row' && line.rank ? (line.rank.tied ? '=1' : line.rank.place) : null,
  );

const fast = leaderboardRow('Fast', { rateRef: estimate(8e-6, 0.02) });
const nearly = leaderboardRow('Nearly', { rateRef: estimate(7.8e-6, 0.03) });
const slow = leaderboardRow('Slow', { rateRef: estimate(1e-6, 0.02) });
const open = leaderboardRow('Open', {
  verdict: 'undetermined',
  order: null,
  kRef: null,
  kUnit: null,
  bracket: true,
  rateRef: { value: 9e-6, se: null, low: 4e-6, high: 2e-5 },
});
const dead = leaderboardRow('Dead', {
  verdict: 'no-reaction',
  order: null,
  kRef: null,
  kUnit: null,
  rateRef: null,
  timeToTarget: null,
});

describe('sorting by a rate', () => {
  const rows = [slow, dead, open, nearly, fast];

  it('ranks figures with an interval, then shows brackets, then those without a figure', () => {
    expect(read(arrange(rows, look()))).toEqual([
      'Fast',
      'Nearly',
      'Slow',
      '# Order undetermined',
      'Open',
      '# Without a figure',
      'Dead',
    ]);
  });

  it('ties what cannot be told from the best and counts on behind', () => {
    expect(ranks(arrange(rows, look()))).toEqual(['=1', '=1', 3, null, null, null, null]);
  });

  it('leaves a best row that stands alone untied', () => {
    expect(ranks(arrange([slow, fast], look()))).toEqual([1, 2]);
  });

  it('turned round keeps the ranks, and the sections in their order', () => {
    const lines = arrange(rows, look({ direction: 'asc' }));
    expect(read(lines).slice(0, 3)).toEqual(['Slow', 'Nearly', 'Fast']);
    expect(ranks(lines).slice(0, 3)).toEqual([3, '=1', '=1']);
    expect(read(lines).at(-1)).toBe('Dead');
  });

  it('does not promote anybody under a filter', () => {
    const lines = arrange(rows, look({ search: 'slow' }));
    expect(read(lines)).toEqual(['Slow']);
    expect(ranks(lines)).toEqual([3]);
  });
});

describe('what a rank says', () => {
  it('gives the interval beside the place and says it in a sentence', () => {
    const rank = { place: 2, low: 1, high: 4, tied: true, chanceAmongFirst: 0.874 };
    expect(rankSpan(rank)).toBe('(1–4)');
    expect(rankSentence(rank)).toBe(
      'Rank 2; between 1 and 4 in 95 % of cases. Cannot be told from the best. Chance to be among the first 3: 87 %.',
    );
  });

  it('says nothing of an interval that is one rank, or that is not known', () => {
    expect(rankSpan({ low: 3, high: 3 })).toBe('');
    expect(rankSpan({ low: null, high: null })).toBe('');
    expect(
      rankSentence({ place: 9, low: null, high: null, tied: false, chanceAmongFirst: null }),
    ).toContain('has no interval');
  });

  it('spans the ranks of neighbours that cannot be told apart, and no further', () => {
    const spans = arrange([slow, nearly, fast], look()).map((line) =>
      line.kind === 'row' && line.rank ? [line.rank.low, line.rank.high] : null,
    );
    expect(spans).toEqual([
      [1, 2],
      [1, 2],
      [3, 3],
    ]);
  });
});

describe('sorting by time', () => {
  it('takes the shortest time for the best and ties by its interval', () => {
    const rows = [
      leaderboardRow('Long', { timeToTarget: estimate(9000, 0.02) }),
      leaderboardRow('Short', { timeToTarget: estimate(900, 0.02) }),
      leaderboardRow('Shortish', { timeToTarget: estimate(920, 0.02) }),
    ];
    const lines = arrange(rows, look({ sort: 'time', direction: 'asc' }));
    expect(read(lines)).toEqual(['Short', 'Shortish', 'Long']);
    expect(ranks(lines)).toEqual(['=1', '=1', 3]);
  });
});

describe('sorting by k', () => {
  const zero = { verdict: 'zero' as const, order: 0, kUnit: 'mol L^-1 s^-1' };
  const rows = [
    leaderboardRow('F1', { kRef: estimate(1e-4) }),
    leaderboardRow('Z1', { ...zero, kRef: estimate(3e-6) }),
    open,
    leaderboardRow('F2', { kRef: estimate(9e-4) }),
    leaderboardRow('Z2', { ...zero, kRef: estimate(5e-6) }),
    leaderboardRow('S1', {
      verdict: 'second',
      order: 2,
      kUnit: 'L mol^-1 s^-1',
      kRef: estimate(0.4),
    }),
  ];

  it('never ranks k of different units together', () => {
    expect(read(arrange(rows, look({ sort: 'k' })))).toEqual([
      '# Zero order',
      'Z2',
      'Z1',
      '# First order',
      'F2',
      'F1',
      '# Second order',
      'S1',
      '# Without a rate constant',
      'Open',
    ]);
  });

  it('names the unit of each group', () => {
    const notes = arrange(rows, look({ sort: 'k' })).flatMap((line) =>
      line.kind === 'heading' ? [line.note] : [],
    );
    expect(notes.slice(0, 3)).toEqual(['k in mol L⁻¹ s⁻¹', 'k in s⁻¹', 'k in L mol⁻¹ s⁻¹']);
  });

  it('begins the ranking anew in each order', () => {
    expect(ranks(arrange(rows, look({ sort: 'k' })))).toEqual([
      null,
      1,
      2,
      null,
      1,
      2,
      null,
      1,
      null,
      null,
    ]);
  });

  it('keeps apart one order measured in two units', () => {
    const two = [
      leaderboardRow('A', { order: 0, verdict: 'zero', kUnit: 'Pa s^-1' }),
      leaderboardRow('B', { order: 0, verdict: 'zero', kUnit: 'mol L^-1 s^-1' }),
    ];
    expect(
      read(arrange(two, look({ sort: 'k' }))).filter((one) => one === '# Zero order'),
    ).toHaveLength(2);
  });
});

describe('sorting by what has no better end', () => {
  it('gives activation energies no rank', () => {
    const rows = [
      leaderboardRow('High', { activationEnergy: estimate(70_000) }),
      leaderboardRow('Low', { activationEnergy: estimate(30_000) }),
    ];
    const lines = arrange(rows, look({ sort: 'ea', direction: 'asc' }));
    expect(read(lines)).toEqual(['Low', 'High']);
    expect(ranks(lines)).toEqual([null, null]);
  });

  it('orders codes as people count', () => {
    const rows = ['MB-10', 'MB-9', 'MB-2'].map((code) => leaderboardRow(code));
    const lines = arrange(rows, look({ sort: 'candidate', direction: 'asc' }));
    expect(read(lines)).toEqual(['MB-2', 'MB-9', 'MB-10']);
  });

  it('puts rows without a value last whichever way', () => {
    const rows = [
      leaderboardRow('None', { conversion: null }),
      leaderboardRow('Half', { conversion: 0.5 }),
      leaderboardRow('Full', { conversion: 1 }),
    ];
    const up = arrange(rows, look({ sort: 'conversion', direction: 'asc' }));
    const down = arrange(rows, look({ sort: 'conversion', direction: 'desc' }));
    expect(read(up)).toEqual(['Half', 'Full', 'None']);
    expect(read(down)).toEqual(['Full', 'Half', 'None']);
  });
});

describe('narrowing', () => {
  const rows = [
    leaderboardRow('A', { tags: ['low metal'], decision: { state: 'nominated', version: 1 } }),
    leaderboardRow('B', { composition: '2 % Pt/TiO2', support: 'TiO2' }),
    leaderboardRow('C', { verdict: 'zero', order: 0, kUnit: 'mol L^-1 s^-1' }),
  ];
  const kept = (more: Partial<LeaderboardLook>) =>
    read(arrange(rows, look({ sort: 'candidate', direction: 'asc', ...more })));

  it('keeps rows with every word of the search', () => {
    expect(kept({ search: 'pt tio2' })).toEqual(['B']);
    expect(kept({ search: 'LOW' })).toEqual(['A']);
    expect(kept({ search: 'pt low' })).toEqual([]);
  });

  it('keeps one of the chosen verdicts, states and tags', () => {
    expect(kept({ verdicts: ['zero'] })).toEqual(['C']);
    expect(kept({ states: ['nominated'] })).toEqual(['A']);
    expect(kept({ tags: ['low metal'], verdicts: ['zero'] })).toEqual([]);
  });
});
