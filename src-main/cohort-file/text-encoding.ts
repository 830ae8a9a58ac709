import type { Reading } from '../../shared-core/norms/reading.ts';

export type Encoding = Reading['encoding'];

/** Windows-1252 at 0x80–0x9F; the five unassigned bytes stand for the control characters of the same number. */
const WINDOWS_HIGH =
  '\u20ac\u0081\u201a\u0192\u201e\u2026\u2020\u2021\u02c6\u2030\u0160\u2039\u0152\u008d\u017d\u008f' +
  '\u0090\u2018\u2019\u201c\u201d\u2022\u2013\u2014\u02dc\u2122\u0161\u203a\u0153\u009d\u017e\u0178';

/** Decodes a file block by block. `decode` throws a TypeError on bytes that the encoding does not have. */
export interface TextBlocks {
  decode(block: Uint8Array): string;
  /** What is left after the last block. */
  end(): string;
}

/** A byte order mark at the start is taken off. */
export function textBlocks(encoding: Encoding): TextBlocks {
  if (encoding === 'windows-1252') return { decode: windowsText, end: () => '' };
  const decoder = new TextDecoder(encoding, { fatal: true });
  return { decode: (block) => decoder.decode(block, { stream: true }), end: () => decoder.decode() };
}

/** The start of a text as it looks in an encoding, with signs in place of bytes that the encoding does not have. */
export function textStart(encoding: Encoding, start: Uint8Array): string {
  return encoding === 'windows-1252' ? windowsText(start) : new TextDecoder(encoding).decode(start, { stream: true });
}

/** Written out, because some releases of Node decode Windows-1252 as Latin-1. */
function windowsText(block: Uint8Array): string {
  return Buffer.from(block.buffer, block.byteOffset, block.byteLength)
    .toString('latin1')
    .replace(/[\u0080-\u009f]/g, (character) => WINDOWS_HIGH[character.charCodeAt(0) - 0x80] ?? character);
}

/**
 * The encoding of a text from its first bytes: a byte order mark; else every second byte 0 as in UTF-16; else UTF-8
 * where the bytes are valid, else Windows-1252. `whole` tells that the bytes are the whole file.
 */
export function guessEncoding(start: Uint8Array, whole: boolean): Encoding {
  const mark = markOf(start);
  if (mark !== null) return mark;
  const zeros = [0, 0];
  const looked = Math.min(start.length, 4096);
  for (let index = 0; index < looked; index += 1) {
    if (start[index] === 0) zeros[index % 2] = (zeros[index % 2] ?? 0) + 1;
  }
  const [even = 0, odd = 0] = zeros;
  if (odd > looked / 8 && even * 8 < odd) return 'utf-16le';
  if (even > looked / 8 && odd * 8 < even) return 'utf-16be';
  return isUtf8(start, whole) ? 'utf-8' : 'windows-1252';
}

export const ENCODING_WORDS: Readonly<Record<Encoding, string>> = {
  'utf-8': 'UTF-8',
  'utf-16le': 'UTF-16 (little-endian)',
  'utf-16be': 'UTF-16 (big-endian)',
  'windows-1252': 'Windows-1252',
};

function markOf(start: Uint8Array): Encoding | null {
  const [first, second, third] = start;
  if (first === 0xef && second === 0xbb && third === 0xbf) return 'utf-8';
  if (first === 0xff && second === 0xfe) return 'utf-16le';
  if (first === 0xfe && second === 0xff) return 'utf-16be';
  return null;
}

function isUtf8(bytes: Uint8Array, whole: boolean): boolean {
  const decoder = new TextDecoder('utf-8', { fatal: true });
  try {
    decoder.decode(bytes, { stream: !whole });
    return true;
  } catch {
    return false;
  }
}
