import { createHash } from 'node:crypto';
import { open } from 'node:fs/promises';
import { basename } from 'node:path';
import type { Reply } from '../../shared-core/desk.ts';
import { codeOf, diskTrouble } from './disk-trouble.ts';

/** A kind of file of the user's own, as sentences about it need it. */
export interface StoredKind {
  /** "project". */
  readonly name: string;
  /** ".normloom". */
  readonly ending: string;
  /** Largest file, in bytes of UTF-8. */
  readonly most: number;
}

export interface StoredText {
  readonly text: string;
  /** SHA-256 of the bytes, lower-case hexadecimal. */
  readonly fingerprint: string;
}

/** The text of a file of the user's. Whatever is wrong with it comes back as a sentence; the file is never touched. */
export async function readStored(path: string, kind: StoredKind): Promise<Reply<StoredText>> {
  const bytes = await readBytes(path, basename(path), kind);
  if (!bytes.ok) return bytes;
  try {
    const text = new TextDecoder('utf-8', { fatal: true }).decode(bytes.value);
    return { ok: true, value: { text, fingerprint: fingerprintOf(bytes.value) } };
  } catch {
    return refused(
      `The ${kind.name} file is damaged (it is not text in UTF-8). Open a backup; the file was not touched.`,
    );
  }
}

/** SHA-256 of bytes, or of a text in UTF-8, in lower-case hexadecimal. */
export function fingerprintOf(content: string | Uint8Array): string {
  return createHash('sha256').update(content).digest('hex');
}

/** Fingerprint of the file at a path; null when there is none. Rejects when it is there and cannot be read. */
export async function fingerprintAt(path: string): Promise<string | null> {
  let file;
  try {
    file = await open(path, 'r');
  } catch (error) {
    if (codeOf(error) === 'ENOENT') return null;
    throw error;
  }
  try {
    const hash = createHash('sha256');
    for await (const chunk of file.createReadStream({ autoClose: false }) as AsyncIterable<Buffer>) hash.update(chunk);
    return hash.digest('hex');
  } finally {
    await file.close();
  }
}

async function readBytes(path: string, file: string, { name, ending, most }: StoredKind): Promise<Reply<Uint8Array>> {
  try {
    const opened = await open(path, 'r');
    try {
      const found = await opened.stat();
      if (!found.isFile()) return refused(`${file} is not a file. Choose a ${name} file (*${ending}).`);
      if (found.size > most) {
        return refused(`${file} is larger than ${megabytes(most)} MB, more than any ${name}. Choose another file.`);
      }
      return { ok: true, value: await opened.readFile() };
    } finally {
      await opened.close();
    }
  } catch (error) {
    return refused(diskTrouble(file, 'read', error));
  }
}

export function megabytes(bytes: number): number {
  return bytes / 1024 / 1024;
}

function refused(problem: string): { readonly ok: false; readonly problem: string } {
  return { ok: false, problem };
}
