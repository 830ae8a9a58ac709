import { readFile } from 'node:fs/promises';
import { basename } from 'node:path';
import type { Reply } from '../../shared-core/desk.ts';
import { buildNormSet, pressProblem, type NormSet } from '../../shared-core/norms/norm-set.ts';
import { projectFromText } from '../../shared-core/norms/project-text.ts';
import { diskTrouble } from '../project-file/disk-trouble.ts';

/** The paths of two projects, the earlier edition first. */
export interface EditionPaths {
  readonly before: string;
  readonly after: string;
}

export interface EditionPair {
  readonly before: NormSet;
  readonly after: NormSet;
}

/** The norm sets of two projects, both fit to be printed; the problem names the file that stands in the way. */
export async function readEditions(paths: EditionPaths): Promise<Reply<EditionPair>> {
  const before = await readEdition(paths.before);
  if (!before.ok) return before;
  const after = await readEdition(paths.after);
  return after.ok ? { ok: true, value: { before: before.value, after: after.value } } : after;
}

async function readEdition(path: string): Promise<Reply<NormSet>> {
  const refused = (problem: string): Reply<NormSet> => ({ ok: false, problem: `${basename(path)}: ${problem}` });
  let text: string;
  try {
    text = await readFile(path, 'utf8');
  } catch (error) {
    return { ok: false, problem: diskTrouble(basename(path), 'read', error) };
  }
  const read = projectFromText(text);
  if (!read.ok) return refused(read.problem);
  const built = buildNormSet(read.project);
  if (!built.ok) return refused(built.problem);
  const unfit = pressProblem(built.normSet);
  return unfit === null ? { ok: true, value: built.normSet } : refused(unfit);
}
