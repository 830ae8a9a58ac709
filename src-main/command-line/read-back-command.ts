import { readFile } from 'node:fs/promises';
import { basename } from 'node:path';
import type { FileReadBack } from '../press/read-back/cell-differences.ts';
import { diskTrouble } from '../project-file/disk-trouble.ts';
import { refused, type Outcome } from './outcome.ts';
import type { ReadBackOptions } from './read-back-options.ts';
import { readPrintable } from './read-project.ts';
import { readBackJson, readBackLines } from './read-back-result.ts';

/** Opens pressed files again and compares every cell with what the project, or the edition, prints. */
export async function readBackCommand(paths: readonly string[], options: ReadBackOptions): Promise<Outcome> {
  const files: { file: string; bytes: Uint8Array }[] = [];
  for (const path of paths) {
    try {
      files.push({ file: basename(path), bytes: await readFile(path) });
    } catch (error) {
      return refused(diskTrouble(basename(path), 'read', error));
    }
  }
  const against = await readPrintable(options.against);
  if (!against.ok) return refused(against.problem);
  // The readers of PDF and workbooks are brought along by no other command but press.
  const { readBack } = await import('../press/read-back/read-back.ts');
  const read = await readBack(files, against.value.normSet);
  return read.ok ? outcomeOf(read.value, options) : refused(read.problem);
}

function outcomeOf(read: readonly FileReadBack[], { format }: ReadBackOptions): Outcome {
  const result = format === 'json' ? readBackJson(read) : readBackLines(read);
  const count = read.reduce((sum, { differences }) => sum + differences.length, 0);
  if (count === 0) return { kind: 'done', result, remarks: [] };
  const problem = count === 1 ? 'one cell differs from the project.' : `${count} cells differ from the project.`;
  return { kind: 'differs', result, problem, remarks: [] };
}
