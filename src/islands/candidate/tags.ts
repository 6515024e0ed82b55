/** The same limits as the server's contract. */
export const longestTag = 40;
export const mostTags = 20;

export type TagChange = { tags: string[] } | { refusal: string };

/** The tags with one more, or why it cannot be added. */
export function addTag(tags: readonly string[], typed: string): TagChange {
  const tag = typed.trim().replace(/\s+/g, ' ');
  if (tag === '') return { refusal: 'Write a tag first.' };
  if (tag.length > longestTag) return { refusal: `A tag has at most ${longestTag} characters.` };
  const known = tags.find((one) => one.toLowerCase() === tag.toLowerCase());
  if (known !== undefined) return { refusal: `“${known}” is there already.` };
  if (tags.length >= mostTags) return { refusal: `At most ${mostTags} tags; remove one first.` };
  return { tags: [...tags, tag] };
}

export function removeTag(tags: readonly string[], tag: string): string[] {
  return tags.filter((one) => one !== tag);
}
