import { readFile } from 'node:fs/promises';
import { basename } from 'node:path';
import { buildNormSet, pressProblem } from '../../shared-core/norms/norm-set.ts';
import { projectFromText } from '../../shared-core/norms/project-text.ts';
import type { FileReadBack } from '../press/read-back/cell-differences.ts';
import { diskTrouble } from '../project-file/disk-trouble.ts';
import { refused, type Outcome } from './outcome.ts';
import type { ReadBackOptions } from './read-back-options.ts';
import { readBackJson, readBackLines } from './read-back-result.ts';

/** Opens pressed files again and compares every cell with what the project prints. */
export async function readBackCommand(paths: readonly string[], options: ReadBackOptions): Promise<Outcome> {
  const { against } = options;
  const files: { file: string; bytes: Uint8Array }[] = [];
  let text: string;
  let reading = against;
  try {
    text = await readFile(against, 'utf8');
    for (const path of paths) {
      reading = path;
      files.push({ file: basename(path), bytes: await readFile(path) });
    }
  } catch (error) {
    return refused(diskTrouble(basename(reading), 'read', error));
  }
  const project = projectFromText(text);
  if (!project.ok) return refused(`${basename(against)}: ${project.problem}`);
  const built = buildNormSet(project.project);
  if (!built.ok) return refused(`${basename(against)}: ${built.problem}`);
  const unfit = pressProblem(built.normSet);
  if (unfit !== null) return refused(`${basename(against)}: ${unfit}`);
  // The readers of PDF and workbooks are brought along by no other command but press.
  const { readBack } = await import('../press/read-back/read-back.ts');
  const read = await readBack(files, built.normSet);
  return read.ok ? outcomeOf(read.value, options) : refused(read.problem);
}

function outcomeOf(read: readonly FileReadBack[], { format }: ReadBackOptions): Outcome {
  const result = format === 'json' ? readBackJson(read) : readBackLines(read);
  const count = read.reduce((sum, { differences }) => sum + differences.length, 0);
  if (count === 0) return { kind: 'done', result, remarks: [] };
  const problem = count === 1 ? 'one cell differs from the project.' : `${count} cells differ from the project.`;
  return { kind: 'differs', result, problem, remarks: [] };
}
