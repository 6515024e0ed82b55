import { decodeText } from './decodeText';

export type SniffedFormat =
  'empty' | 'zip' | 'encrypted' | 'legacy-workbook' | 'markup' | 'binary' | 'text';

const OLE = [0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1];

/** What a file is by its content; its name and declared type are not looked at. */
export function sniffFormat(bytes: Uint8Array): SniffedFormat {
  if (bytes.length === 0) return 'empty';
  if (startsWith(bytes, [0x50, 0x4b])) return 'zip';
  if (startsWith(bytes, OLE)) return holdsEncryptedPackage(bytes) ? 'encrypted' : 'legacy-workbook';
  if (startsWith(bytes, [0x25, 0x50, 0x44, 0x46])) return 'binary';
  const decoded = decodeText(bytes.subarray(0, 4096 + (bytes.length > 4096 ? cutBack(bytes) : 0)));
  if (!decoded) return 'binary';
  if (decoded.text.trim() === '') return 'empty';
  return /^\s*<(?:!doctype|html|\?xml|table|svg|head|body)/iu.test(decoded.text)
    ? 'markup'
    : 'text';
}

function startsWith(bytes: Uint8Array, magic: number[]): boolean {
  return magic.every((byte, index) => bytes[index] === byte);
}

/** Moves a cut at 4096 bytes back to the start of a UTF-8 character. */
function cutBack(bytes: Uint8Array): number {
  let back = 0;
  while (back > -4 && (bytes[4096 + back]! & 0xc0) === 0x80) back -= 1;
  return back;
}

/** Office keeps an encrypted workbook as a stream of this name, in UTF-16. */
function holdsEncryptedPackage(bytes: Uint8Array): boolean {
  const name = Buffer.from('EncryptedPackage', 'utf16le');
  return Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength).includes(name);
}
