import { fromBufferPromise, type Entry, type ZipFile } from 'yauzl';
import { columnIndex } from './a1';
import type { WorkbookLimits } from './limits';

/** Why a zip container is refused. */
export interface ZipRefusal {
  code:
    | 'broken-zip'
    | 'encrypted'
    | 'too-many-parts'
    | 'odd-part-name'
    | 'inflates-too-far'
    | 'document-type'
    | 'unreadable-part'
    | 'beyond-limit';
  found: string;
  expected: string;
  message: string;
}

export interface ZipScan {
  refusal: ZipRefusal | null;
  names: Set<string>;
}

const OVERLAP = 16;
const TAIL = 64 * 1024;

/**
 * Inflates every part once, counting real bytes and keeping none, before anything else opens the
 * file: sizes in a zip's directory are claims. Refuses encryption, odd names, bombs, document type
 * declarations and cells beyond the row or column limit.
 */
export async function scanZip(bytes: Uint8Array, limits: WorkbookLimits): Promise<ZipScan> {
  const names = new Set<string>();
  const buffer = Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  let total = 0;
  try {
    const zip = await fromBufferPromise(buffer, { lazyEntries: true });
    if (zip.entryCount > limits.zipEntries) return { names, refusal: tooMany(limits) };
    for await (const entry of zip.eachEntry()) {
      if (names.size >= limits.zipEntries) return { names, refusal: tooMany(limits) };
      const odd = oddEntry(entry, names);
      if (odd) return { names, refusal: odd };
      names.add(entry.fileName);
      const part = await scanPart(zip, entry, limits, limits.totalBytes - total);
      if (part.refusal) return { names, refusal: part.refusal };
      total += part.bytes;
    }
    return { names, refusal: null };
  } catch (error) {
    return { names, refusal: refusalFor(error) };
  }
}

function oddEntry(entry: Entry, names: Set<string>): ZipRefusal | null {
  if (entry.isEncrypted()) return encrypted();
  const { fileName } = entry;
  return names.has(fileName) || /(?:^|[\\/])\.\.(?:[\\/]|$)|^[\\/]|\\|\0/u.test(fileName)
    ? oddName(fileName)
    : null;
}

async function scanPart(
  zip: ZipFile,
  entry: Entry,
  limits: WorkbookLimits,
  left: number,
): Promise<{ refusal: ZipRefusal | null; bytes: number }> {
  const isXml = /\.(?:xml|rels|vml)$/iu.test(entry.fileName);
  const isSheet = /^xl\/worksheets\/[^/]+\.xml$/iu.test(entry.fileName);
  const stream = await zip.openReadStreamPromise(entry);
  let bytes = 0;
  let tail = Buffer.alloc(0);
  try {
    for await (const chunk of stream as AsyncIterable<Buffer>) {
      const first = bytes === 0;
      bytes += chunk.length;
      const ratio = bytes / Math.max(entry.compressedSize, 1);
      const bomb =
        bytes > limits.entryBytes ||
        bytes > left ||
        (bytes > limits.ratioFloorBytes && ratio > limits.ratio);
      if (bomb) return { refusal: inflates(entry.fileName), bytes };
      if (!isXml) continue;
      if (first && (chunk[0] === 0xfe || chunk[0] === 0xff || chunk[0] === 0 || chunk[1] === 0)) {
        return { refusal: unreadablePart(entry.fileName), bytes };
      }
      const seam = Buffer.concat([tail.subarray(-OVERLAP), chunk]);
      if (seam.includes('<!DOCTYPE') || seam.includes('<!ENTITY')) {
        return { refusal: documentType(entry.fileName), bytes };
      }
      tail = isSheet ? Buffer.concat([tail, chunk]).subarray(-TAIL) : Buffer.from(seam);
    }
  } finally {
    stream.destroy();
  }
  const far = isSheet ? lastCellBeyond(tail.toString('latin1'), limits) : null;
  return { refusal: far === null ? null : beyond(far, entry.fileName, limits), bytes };
}

/** The last cell with content, when it lies beyond the limits; styled empty cells do not count. */
function lastCellBeyond(xml: string, limits: WorkbookLimits): string | null {
  let last: RegExpExecArray | null = null;
  for (const match of xml.matchAll(/<c r="([A-Z]{1,3})(\d{1,7})"(?:[^>]*[^/>])?>/gu)) last = match;
  if (!last) return null;
  const tooFar = Number(last[2]) > limits.rows || columnIndex(last[1]!) >= limits.columns;
  return tooFar ? `${last[1]}${last[2]}` : null;
}

function refusalFor(error: unknown): ZipRefusal {
  const reason = error instanceof Error ? error.message : '';
  if (/relative path|absolute path|invalid characters|backslash/iu.test(reason)) return oddName('');
  if (/encrypt/iu.test(reason)) return encrypted();
  return {
    code: 'broken-zip',
    found: 'a damaged zip container',
    expected: 'a complete .xlsx file',
    message:
      'The file is damaged or was cut off on its way. Save it again and upload the new copy.',
  };
}

const encrypted = (): ZipRefusal => ({
  code: 'encrypted',
  found: 'an encrypted file',
  expected: 'a workbook without a password',
  message: 'The workbook is protected by a password. Remove the password and upload it again.',
});
const tooMany = (limits: WorkbookLimits): ZipRefusal => ({
  code: 'too-many-parts',
  found: `more than ${limits.zipEntries} parts`,
  expected: `at most ${limits.zipEntries} parts`,
  message: `The file is made of more than ${limits.zipEntries} parts. Copy the layout and the readings into a new workbook and upload that.`,
});
const oddName = (name: string): ZipRefusal => ({
  code: 'odd-part-name',
  found: name,
  expected: 'the parts of an ordinary workbook',
  message:
    'The file holds parts with names no workbook has. Save it again from a spreadsheet program.',
});
const inflates = (name: string): ZipRefusal => ({
  code: 'inflates-too-far',
  found: name,
  expected: 'a workbook of at most 400,000 readings',
  message: `The part ${name} unpacks to far more than a screen can hold. Copy the layout and the readings into a new workbook and upload that.`,
});
const documentType = (name: string): ZipRefusal => ({
  code: 'document-type',
  found: name,
  expected: 'XML without a document type or entities',
  message: `The part ${name} declares a document type, which a workbook never does. Save the file again from a spreadsheet program.`,
});
const unreadablePart = (name: string): ZipRefusal => ({
  code: 'unreadable-part',
  found: name,
  expected: 'XML in UTF-8',
  message: `The part ${name} is not written in UTF-8. Save the file again from a spreadsheet program.`,
});
const beyond = (cell: string, part: string, limits: WorkbookLimits): ZipRefusal => ({
  code: 'beyond-limit',
  found: `${cell} in ${part}`,
  expected: `at most ${limits.rows} rows and ${limits.columns} columns`,
  message: `A sheet (${part}) has data in cell ${cell}, beyond ${limits.rows} rows or ${limits.columns} columns. Delete what is there, or split the screen over several files.`,
});
