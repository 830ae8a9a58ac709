/** Characters that no file name may hold on one of the systems Normloom runs on; control and direction marks too. */
const FORBIDDEN = /[\u0000-\u001f\u007f-\u009f\u200e\u200f\u202a-\u202e\u2066-\u2069<>:"/\\|?*]+/g;
/** Names that Windows keeps for devices, whatever their extension. */
const RESERVED = /^(con|prn|aux|nul|conin\$|conout\$|com[0-9¹²³]|lpt[0-9¹²³])(?=\.|$)/i;
const MAX_BYTES = 120;

/**
 * Turns any text into the name of one file or folder that every system accepts: no separators, no control characters,
 * no device names, no dot or blank at either end, at most 120 bytes in UTF-8, never empty. The extension is the caller's.
 */
export function cleanFileName(text: string, whenEmpty: string): string {
  const plain = text.normalize('NFC').toWellFormed().replace(FORBIDDEN, '-').replace(/\s+/g, ' ');
  const name = withinBytes(trimEnds(plain), MAX_BYTES);
  if (/^-*$/.test(name)) return whenEmpty;
  return RESERVED.test(name) ? `_${name}` : name;
}

/**
 * The plain name of a file that a page handed over, kept as it was apart from separators and control characters, so
 * that the project can say which file was read. At most 400 characters, as the project allows.
 */
export function shownFileName(text: string, whenEmpty: string): string {
  const last = text.toWellFormed().split(/[/\\]/).at(-1) ?? '';
  const name = last.replace(/[\u0000-\u001f\u007f-\u009f]+/g, '').trim();
  return name === '' ? whenEmpty : [...name].slice(0, 200).join('');
}

function trimEnds(text: string): string {
  return text.replace(/^[\s.]+|[\s.]+$/g, '');
}

function withinBytes(text: string, limit: number): string {
  let kept = '';
  let bytes = 0;
  for (const character of text) {
    bytes += Buffer.byteLength(character);
    if (bytes > limit) break;
    kept += character;
  }
  return trimEnds(kept);
}
