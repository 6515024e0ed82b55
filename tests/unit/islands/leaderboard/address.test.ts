import { describe, expect, it } from 'vitest';
import {
  firstLook,
  readLook,
  sortedBy,
  writeLook,
} from '../../../../src/islands/leaderboard/address';

describe('the address of the leaderboard', () => {
  it('is bare for the first look', () => {
    expect(writeLook(firstLook)).toBe('');
    expect(readLook('')).toEqual(firstLook);
  });

  it('gives a colleague the same look', () => {
    const look = {
      ...firstLook,
      sort: 'time' as const,
      direction: 'desc' as const,
      search: 'Pd/C & co',
      verdicts: ['zero' as const, 'undetermined' as const],
      states: ['nominated' as const],
      tags: ['low metal', 'a,b'],
      hidden: ['decay' as const, 'turnover' as const],
    };
    expect(readLook(writeLook(look))).toEqual(look);
  });

  it('passes over what it does not know', () => {
    const look = readLook(
      '?sort=price&dir=up&verdict=third,zero&state=sold&hide=candidate,nothing',
    );
    expect(look).toEqual({ ...firstLook, verdicts: ['zero'] });
  });

  it('begins a column in its useful direction and keeps an odd one', () => {
    expect(readLook('?sort=time').direction).toBe('asc');
    expect(readLook('?sort=rate&dir=asc').direction).toBe('asc');
  });

  it('keeps parameters of others', () => {
    expect(writeLook({ ...firstLook, sort: 'k' }, '?from=mail&q=old')).toBe('?from=mail&sort=k');
  });

  it('shows a column that hides at first only when asked', () => {
    expect(readLook('').hidden).toContain('turnover');
    expect(readLook('?show=turnover').hidden).not.toContain('turnover');
    expect(writeLook({ ...firstLook, hidden: [] })).toBe('?show=turnover');
  });

  it('turns the direction when the same column is chosen again', () => {
    const byTime = sortedBy(firstLook, 'time');
    expect(byTime).toMatchObject({ sort: 'time', direction: 'asc' });
    expect(sortedBy(byTime, 'time').direction).toBe('desc');
    expect(sortedBy(byTime, 'rate').direction).toBe('desc');
  });
});
