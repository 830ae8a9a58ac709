import { readFile } from 'node:fs/promises';
import { basename } from 'node:path';
import type { Reply } from '../../shared-core/desk.ts';
import { buildNormSet, type NormSet } from '../../shared-core/norms/norm-set.ts';
import { projectFromText } from '../../shared-core/norms/project-text.ts';
import { diskTrouble } from '../project-file/disk-trouble.ts';

/** Reads a project file and works its norm set out; what stands in the way is a sentence that names the file. */
export async function readProject(path: string): Promise<Reply<NormSet>> {
  let text: string;
  try {
    text = await readFile(path, 'utf8');
  } catch (error) {
    return { ok: false, problem: diskTrouble(basename(path), 'read', error) };
  }
  const read = projectFromText(text);
  if (!read.ok) return { ok: false, problem: `${basename(path)}: ${read.problem}` };
  const built = buildNormSet(read.project);
  return built.ok ? { ok: true, value: built.normSet } : { ok: false, problem: `${basename(path)}: ${built.problem}` };
}
