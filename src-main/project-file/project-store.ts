import { projectOrEditionFromText, type FrozenEdition } from '../../shared-core/norms/edition-file.ts';
import { EDITION_ENDING, PROJECT_ENDING } from '../../shared-core/norms/file-endings.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import { projectToText } from '../../shared-core/norms/project-text.ts';
import { megabytes, readStored } from './stored-text.ts';

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
  const most = path.toLowerCase().endsWith(EDITION_ENDING) ? MAX_EDITION_BYTES : MAX_PROJECT_BYTES;
  const stored = await readStored(path, { name: 'project', ending: PROJECT_ENDING, most });
  if (!stored.ok) return stored;
  const { text, fingerprint } = stored.value;
  const read = projectOrEditionFromText(text);
  return read.ok ? { ...read, fingerprint } : read;
}

/** The text of a project, or why it cannot be written. */
export function projectText(
  project: NormProject,
): { readonly ok: true; readonly text: string } | { readonly ok: false; readonly problem: string } {
  const text = projectToText(project);
  return Buffer.byteLength(text) <= MAX_PROJECT_BYTES
    ? { ok: true, text }
    : {
        ok: false,
        problem: `The project takes more than ${megabytes(MAX_PROJECT_BYTES)} MB. Group by fewer columns, or use a larger step of the scale.`,
      };
}
