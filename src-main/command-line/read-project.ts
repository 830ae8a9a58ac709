import { readFile } from 'node:fs/promises';
import { basename } from 'node:path';
import type { Reply } from '../../shared-core/desk.ts';
import { projectOrEditionFromText, type FrozenEdition } from '../../shared-core/norms/edition-file.ts';
import { buildNormSet, pressProblem, type NormSet } from '../../shared-core/norms/norm-set.ts';
import { diskTrouble } from '../project-file/disk-trouble.ts';

/** A project as a command works on it. */
export interface ProjectRead {
  readonly normSet: NormSet;
  /** The released edition that its file holds; null for a project file. */
  readonly edition: FrozenEdition | null;
}

/**
 * Reads a project file or a released edition and works its norm set out; what stands in the way is a sentence that names
 * the file.
 */
export async function readProject(path: string): Promise<Reply<ProjectRead>> {
  const file = basename(path);
  let text: string;
  try {
    text = await readFile(path, 'utf8');
  } catch (error) {
    return { ok: false, problem: diskTrouble(file, 'read', error) };
  }
  const read = projectOrEditionFromText(text);
  if (!read.ok) return { ok: false, problem: `${file}: ${read.problem}` };
  const built = buildNormSet(read.project);
  if (!built.ok) return { ok: false, problem: `${file}: ${built.problem}` };
  return { ok: true, value: { normSet: built.normSet, edition: read.edition } };
}

/** The same, where the tables are to be printed or compared with print: each of them must be what it says it is. */
export async function readPrintable(path: string): Promise<Reply<ProjectRead>> {
  const read = await readProject(path);
  if (!read.ok) return read;
  const unfit = pressProblem(read.value.normSet);
  return unfit === null ? read : { ok: false, problem: `${basename(path)}: ${unfit}` };
}
