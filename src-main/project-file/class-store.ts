import type { ClassFile } from '../../shared-core/class/class-file.ts';
import { classFromText, classToText } from '../../shared-core/class/class-file-text.ts';
import type { Reply } from '../../shared-core/desk.ts';
import { CLASS_ENDING } from '../../shared-core/norms/file-endings.ts';
import { megabytes, readStored } from './stored-text.ts';

/** Largest class file, in bytes of UTF-8: 2000 pupils and a table with thousands of rows stay far below. */
const MAX_CLASS_BYTES = 32 * 1024 * 1024;

export interface StoredClass {
  readonly class: ClassFile;
  /** SHA-256 of the file's bytes, lower-case hexadecimal. */
  readonly fingerprint: string;
}

/** Reads a class file. Whatever is wrong with it comes back as a sentence; the file is never touched. */
export async function readClass(path: string): Promise<Reply<StoredClass>> {
  const stored = await readStored(path, { name: 'class', ending: CLASS_ENDING, most: MAX_CLASS_BYTES });
  if (!stored.ok) return stored;
  const read = classFromText(stored.value.text);
  return read.ok ? { ok: true, value: { class: read.file, fingerprint: stored.value.fingerprint } } : read;
}

/** The text of a class file, or why it cannot be written. */
export function classText(file: ClassFile): Reply<string> {
  const text = classToText(file);
  if (Buffer.byteLength(text) <= MAX_CLASS_BYTES) return { ok: true, value: text };
  const problem = `The class takes more than ${megabytes(MAX_CLASS_BYTES)} MB. Choose a table with fewer groups.`;
  return { ok: false, problem };
}
