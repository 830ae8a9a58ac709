import { createHash } from 'node:crypto';
import { open } from 'node:fs/promises';
import { basename } from 'node:path';
import { projectOrEditionFromText, type FrozenEdition } from '../../shared-core/norms/edition-file.ts';
import { EDITION_ENDING, PROJECT_ENDING } from '../../shared-core/norms/file-endings.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import { projectToText } from '../../shared-core/norms/project-text.ts';
import { codeOf, diskTrouble } from './disk-trouble.ts';

/** Largest project file, in bytes of UTF-8. */
export const MAX_PROJECT_BYTES = 64 * 1024 * 1024;
/** The same for an edition file: the project in it is set one blank deeper. */
const MAX_EDITION_BYTES = 2 * MAX_PROJECT_BYTES;

/** A file as it was read: its project, and the fingerprint (SHA-256, hexadecimal) of its bytes. */
export type StoredProject =
  | {
      readonly ok: true;
      readonly project: NormProject;
      readonly fingerprint: string;
      /** The released edition that the file holds; null for a project file. */
      readonly edition: FrozenEdition | null;
    }
  | { readonly ok: false; readonly problem: string };

/** Reads a project or edition file. Whatever is wrong with it comes back as a sentence; the file is never touched. */
export async function readProject(path: string): Promise<StoredProject> {
  const bytes = await readBytes(path, basename(path));
  if (!bytes.ok) return bytes;
  let text: string;
  try {
    text = new TextDecoder('utf-8', { fatal: true }).decode(bytes.value);
  } catch {
    return refused('The project file is damaged (it is not text in UTF-8). Open a backup; the file was not touched.');
  }
  const read = projectOrEditionFromText(text);
  return read.ok ? { ...read, fingerprint: fingerprintOf(bytes.value) } : read;
}

/** The text of a project, or why it cannot be written. */
export function projectText(
  project: NormProject,
): { readonly ok: true; readonly text: string } | { readonly ok: false; readonly problem: string } {
  const text = projectToText(project);
  return Buffer.byteLength(text) <= MAX_PROJECT_BYTES
    ? { ok: true, text }
    : refused(
        `The project takes more than ${megabytes(MAX_PROJECT_BYTES)} MB. Group by fewer columns, or use a larger step of the scale.`,
      );
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

async function readBytes(
  path: string,
  name: string,
): Promise<{ readonly ok: true; readonly value: Uint8Array } | { readonly ok: false; readonly problem: string }> {
  try {
    const file = await open(path, 'r');
    try {
      const found = await file.stat();
      if (!found.isFile()) return refused(`${name} is not a file. Choose a project file (*${PROJECT_ENDING}).`);
      const most = path.toLowerCase().endsWith(EDITION_ENDING) ? MAX_EDITION_BYTES : MAX_PROJECT_BYTES;
      if (found.size > most) {
        return refused(`${name} is larger than ${megabytes(most)} MB, more than any project. Choose another file.`);
      }
      return { ok: true, value: await file.readFile() };
    } finally {
      await file.close();
    }
  } catch (error) {
    return refused(diskTrouble(name, 'read', error));
  }
}

function refused(problem: string): { readonly ok: false; readonly problem: string } {
  return { ok: false, problem };
}

function megabytes(bytes: number): number {
  return bytes / 1024 / 1024;
}
