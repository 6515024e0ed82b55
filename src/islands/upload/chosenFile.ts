/** The server's own limit, bytes. */
export const largestUpload = 32 * 1024 * 1024;
export const acceptedEndings = ['.xlsx', '.xlsm', '.csv'] as const;

/** What is wrong with a file before it is sent; null when nothing is. */
export function faultOfFile(file: { name: string; size: number }): string | null {
  const name = file.name.toLowerCase();
  if (!acceptedEndings.some((ending) => name.endsWith(ending))) {
    return `“${file.name}” is not an .xlsx, .xlsm or .csv file. Save it as one of these.`;
  }
  if (file.size === 0) return `“${file.name}” is empty. Choose the file that holds the readings.`;
  if (file.size > largestUpload) {
    return `“${file.name}” has ${formatBytes(file.size)}; at most 32 MB are taken. Split it by plate.`;
  }
  return null;
}

/** A screen's name from its file: the ending goes, signs between words become spaces. */
export function screenNameFrom(fileName: string): string {
  return fileName
    .replace(/\.[^.]+$/, '')
    .replace(/[_\s]+/g, ' ')
    .trim()
    .slice(0, 160);
}

export function formatBytes(bytes: number): string {
  if (bytes < 1000) return `${bytes} B`;
  const [size, unit] = bytes < 1e6 ? [bytes / 1e3, 'kB'] : [bytes / 1e6, 'MB'];
  return `${size < 9.95 ? size.toFixed(1) : Math.round(size)} ${unit}`;
}
