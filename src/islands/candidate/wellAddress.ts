const key = 'well';

/** The well that an address names; null when it names none. */
export function wellInAddress(search: string): string | null {
  return new URLSearchParams(search).get(key);
}

/** The same address with another well; everything else in it stays. */
export function withWell(search: string, wellId: string): string {
  const parameters = new URLSearchParams(search);
  parameters.set(key, wellId);
  return `?${parameters.toString()}`;
}
