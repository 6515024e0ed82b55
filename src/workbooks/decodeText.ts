export type DecodedText = { text: string; encoding: string; certain: boolean } | null;

/**
 * Decodes a text file: byte order marks first, then UTF-16 by its zero bytes, strict UTF-8, and
 * Western European single bytes as the last guess (`certain` is false then). Null for binary.
 */
export function decodeText(bytes: Uint8Array): DecodedText {
  if (bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf) {
    return strict('utf-8', bytes.subarray(3), true);
  }
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return strict('utf-16le', bytes.subarray(2), true);
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return strict('utf-16be', bytes.subarray(2), true);
  const utf16 = utf16ByZeros(bytes);
  if (utf16) return strict(utf16, bytes, true);
  const utf8 = strict('utf-8', bytes, true);
  if (utf8) return utf8;
  const latin = new TextDecoder('windows-1252').decode(bytes);
  return hasBinary(latin) ? null : { text: latin, encoding: 'windows-1252', certain: false };
}

function strict(encoding: string, bytes: Uint8Array, certain: boolean): DecodedText {
  try {
    const text = new TextDecoder(encoding, { fatal: true }).decode(bytes);
    return hasBinary(text) && bytes.length > 0 && manyControls(text)
      ? null
      : { text, encoding, certain };
  } catch {
    return null;
  }
}

/** Text of Latin letters in UTF-16 has a zero in nearly every other byte. */
function utf16ByZeros(bytes: Uint8Array): 'utf-16le' | 'utf-16be' | null {
  const length = Math.min(bytes.length, 400) & ~1;
  if (length < 8) return null;
  let even = 0;
  let odd = 0;
  for (let index = 0; index < length; index += 2) {
    if (bytes[index] === 0) even += 1;
    if (bytes[index + 1] === 0) odd += 1;
  }
  if (odd > 0.35 * length && even < 0.05 * length) return 'utf-16le';
  if (even > 0.35 * length && odd < 0.05 * length) return 'utf-16be';
  return null;
}

/* eslint-disable-next-line no-control-regex -- control characters are what is looked for */
const CONTROL = /[\u0000-\u0008\u000e-\u001f]/gu;

function hasBinary(text: string): boolean {
  return text.slice(0, 4000).search(CONTROL) >= 0;
}

/** A stray control character is a fault of its cell; many of them are another kind of file. */
function manyControls(text: string): boolean {
  const start = text.slice(0, 4000);
  return (start.match(CONTROL)?.length ?? 0) > start.length / 50;
}
