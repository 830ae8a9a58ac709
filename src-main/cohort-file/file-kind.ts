import { open, stat } from 'node:fs/promises';
import type { Reply } from '../../shared-core/desk.ts';

/** How a cohort file is read: as delimited text, as a streamed workbook, or as a workbook read whole. */
export type FileKind = 'text' | 'xlsx' | 'whole-workbook';

export interface KnownFile {
  readonly path: string;
  /** Name without the folder, as it is shown. */
  readonly file: string;
  readonly bytes: number;
  readonly kind: FileKind;
}

const HEAD_BYTES = 64 * 1024;
/** Enough for the table of contents of a workbook, which stands at the end of a zip. */
const TAIL_BYTES = 1024 * 1024;
/** Old workbooks and OpenDocument are held in memory whole. */
export const MAX_WHOLE_WORKBOOK = 60 * 1024 * 1024;

const SAVE_AS = 'Save the scores as csv or xlsx and choose that file.';

/** Tells what a file is by its contents, not its name; the problem says how to get a file that can be read. */
export async function knowFile(path: string, file: string): Promise<Reply<KnownFile>> {
  const found = await readEnds(path, file);
  if (!found.ok) return found;
  const { bytes, head, tail } = found.value;
  const kind = kindOf(head, tail, file);
  if (!kind.ok) return kind;
  if (kind.value === 'whole-workbook' && bytes > MAX_WHOLE_WORKBOOK) {
    return refused(`${file} is too large for its format (${Math.ceil(bytes / 2 ** 20)} MB). ${SAVE_AS}`);
  }
  return { ok: true, value: { path, file, bytes, kind: kind.value } };
}

/** The sentence for a file that the system does not let be read. */
export function unreadable(error: unknown, file: string): string {
  const code = error instanceof Error && 'code' in error ? error.code : '';
  if (code === 'ENOENT') return `${file} is not there any more. Choose the file again.`;
  if (code === 'EACCES' || code === 'EPERM')
    return `${file} may not be read by this user. Ask for the right to read it.`;
  if (code === 'EISDIR') return `${file} is a folder. Choose a file in it.`;
  return `${file} could not be read (${error instanceof Error ? error.message : String(error)}). Try again.`;
}

interface FileEnds {
  readonly bytes: number;
  readonly head: Buffer;
  readonly tail: Buffer;
}

async function readEnds(path: string, file: string): Promise<Reply<FileEnds>> {
  try {
    const facts = await stat(path);
    if (facts.isDirectory()) return refused(`${file} is a folder. Choose a file in it.`);
    if (!facts.isFile()) return refused(`${file} is not a file. Choose the file that holds the scores.`);
    if (facts.size === 0) return refused(`${file} is empty. Choose the file that holds the scores.`);
    const handle = await open(path, 'r');
    try {
      const part = async (length: number, position: number): Promise<Buffer> => {
        const { buffer, bytesRead } = await handle.read(Buffer.alloc(length), 0, length, position);
        return buffer.subarray(0, bytesRead);
      };
      const head = await part(Math.min(HEAD_BYTES, facts.size), 0);
      const tailLength = Math.min(TAIL_BYTES, facts.size);
      const tail = isZip(head) || isCompound(head) ? await part(tailLength, facts.size - tailLength) : Buffer.alloc(0);
      return { ok: true, value: { bytes: facts.size, head, tail } };
    } finally {
      await handle.close();
    }
  } catch (error) {
    return refused(unreadable(error, file));
  }
}

function isZip(head: Buffer): boolean {
  return head.subarray(0, 4).equals(Buffer.from([0x50, 0x4b, 3, 4]));
}

function isCompound(head: Buffer): boolean {
  return head.subarray(0, 8).equals(Buffer.from([0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1]));
}

function kindOf(head: Buffer, tail: Buffer, file: string): Reply<FileKind> {
  if (isZip(head)) return zipKind(head.toString('latin1'), tail.toString('latin1'), file);
  if (isCompound(head)) return compoundKind(head, tail, file);
  const start = head.toString('latin1');
  for (const [signature, what] of SIGNATURES) {
    if (signature.test(start)) return refused(`${file} is ${what}, which holds no rows to read. ${SAVE_AS}`);
  }
  if (/^[\s\u00ef\u00bb\u00bf]*<(!doctype html|html|table|\?xml|workbook)/i.test(start)) {
    return refused(`${file} is a web page or XML, whatever its name says. Open it in a spreadsheet. ${SAVE_AS}`);
  }
  return isBinary(head) ? refused(`${file} is not a text or a workbook that can be read. ${SAVE_AS}`) : text;
}

const text: Reply<FileKind> = { ok: true, value: 'text' };

const SIGNATURES: readonly (readonly [RegExp, string])[] = [
  [/^%PDF-/, 'a PDF'],
  [/^\$FL[23]/, 'an SPSS data file'],
  [/^<stata_dta>/, 'a Stata data file'],
  [/^SAS|^\0{12}\u00c2\u00ea\u0081/, 'a SAS data file'],
  [/^\{\\rtf/, 'a word-processor document'],
  [/^\u001f\u008b|^7z\u00bc\u00af|^Rar!|^BZh|^\u00fd7zXZ/, 'a compressed file'],
  [/^SQLite format 3/, 'a database'],
  [/^PAR1/, 'a Parquet file'],
  [/^\u0089PNG|^\u00ff\u00d8\u00ff|^GIF8/, 'a picture'],
];

function zipKind(head: string, contents: string, file: string): Reply<FileKind> {
  if (contents.includes('xl/workbook.xml')) return { ok: true, value: 'xlsx' };
  if (contents.includes('xl/workbook.bin')) return { ok: true, value: 'whole-workbook' };
  if (head.includes('application/vnd.oasis.opendocument.spreadsheet')) return { ok: true, value: 'whole-workbook' };
  if (/word\/document\.xml|ppt\/presentation\.xml/.test(contents) || head.includes('application/vnd.oasis')) {
    return refused(`${file} is a document or a presentation, not a workbook. ${SAVE_AS}`);
  }
  if (contents.includes('Index/Document.iwa')) return refused(`${file} is a Numbers or Pages document. ${SAVE_AS}`);
  // The table of contents stands at the end of a zip.
  if (!contents.includes('PK\u0005\u0006')) {
    return refused(`${file} is not whole: its end is missing, as after a copy that broke off. Copy it once more.`);
  }
  return refused(`${file} is a compressed folder. Unpack it and choose the file with the scores in it.`);
}

/** The container of old office files and of workbooks locked with a password; names in it are UTF-16. */
function compoundKind(head: Buffer, tail: Buffer, file: string): Reply<FileKind> {
  const holds = (name: string): boolean => {
    const bytes = Buffer.from(name, 'utf16le');
    return head.includes(bytes) || tail.includes(bytes);
  };
  if (holds('EncryptedPackage')) return refused(lockedWorkbook(file));
  if (holds('WordDocument') || holds('PowerPoint Document')) {
    return refused(`${file} is a document or a presentation, not a workbook. ${SAVE_AS}`);
  }
  return { ok: true, value: 'whole-workbook' };
}

export function lockedWorkbook(file: string): string {
  return `${file} is locked with a password. Open it in a spreadsheet, take the password off, and save it under a new name.`;
}

/** Zero bytes that are not UTF-16, or many control characters. */
function isBinary(head: Buffer): boolean {
  if ((head[0] === 0xff && head[1] === 0xfe) || (head[0] === 0xfe && head[1] === 0xff)) return false;
  const zeros = [0, 0];
  let controls = 0;
  for (const [index, byte] of head.entries()) {
    if (byte === 0) zeros[index % 2] = (zeros[index % 2] ?? 0) + 1;
    else if (byte < 32 && byte !== 9 && byte !== 10 && byte !== 13 && byte !== 12 && byte !== 26) controls += 1;
  }
  const [even = 0, odd = 0] = zeros;
  const utf16 = Math.max(even, odd) > head.length / 8 && Math.min(even, odd) * 8 < Math.max(even, odd);
  return (even + odd > 0 && !utf16) || controls > head.length / 50;
}

function refused<T>(problem: string): Reply<T> {
  return { ok: false, problem };
}
