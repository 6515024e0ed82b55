import { describe, expect, it } from 'vitest';
import { addTag, longestTag, removeTag } from '@/islands/candidate/tags';

describe('tags', () => {
  it('are trimmed and put at the end', () => {
    expect(addTag(['cheap metal'], '  second lot ')).toEqual({
      tags: ['cheap metal', 'second lot'],
    });
  });

  it.each([
    ['nothing', '   '],
    ['one that is there, in any case', 'Cheap Metal'],
    ['one that is too long', 'x'.repeat(longestTag + 1)],
  ])('refuse %s with a sentence', (_, typed) => {
    expect(addTag(['cheap metal'], typed)).toHaveProperty('refusal');
  });

  it('go one at a time', () => {
    expect(removeTag(['a', 'b'], 'a')).toEqual(['b']);
  });
});
