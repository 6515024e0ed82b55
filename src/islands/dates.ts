const months = 'Jan Feb Mar Apr May Jun Jul Aug Sep Oct Nov Dec'.split(' ');

/** An instant as the pages write it, the same on server and in every browser: `27 Nov 2026, 11:02 UTC`. */
export function formatInstant(iso: string): string {
  const date = new Date(iso);
  if (Number.isNaN(date.getTime())) return iso;
  const two = (part: number) => String(part).padStart(2, '0');
  return `${formatDay(iso)}, ${two(date.getUTCHours())}:${two(date.getUTCMinutes())} UTC`;
}

/** Its day alone: `27 Nov 2026`. */
export function formatDay(iso: string): string {
  const date = new Date(iso);
  if (Number.isNaN(date.getTime())) return iso;
  return `${date.getUTCDate()} ${months[date.getUTCMonth()] ?? ''} ${date.getUTCFullYear()}`;
}
