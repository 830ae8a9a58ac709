import { readFile } from 'node:fs/promises';
import { basename } from 'node:path';
import { buildNormSet, pressProblem } from '../../shared-core/norms/norm-set.ts';
import { projectFromText } from '../../shared-core/norms/project-text.ts';
import { openQueries, type Query } from '../../shared-core/norms/queries.ts';
import { diskTrouble } from '../project-file/disk-trouble.ts';
import { refused, type Outcome } from './outcome.ts';

/** Presses a project into a folder, which is made where it is missing; the result names each file with its SHA-256. */
export async function pressCommand(path: string, into: string): Promise<Outcome> {
  let text: string;
  try {
    text = await readFile(path, 'utf8');
  } catch (error) {
    return refused(diskTrouble(basename(path), 'read', error));
  }
  const read = projectFromText(text);
  if (!read.ok) return refused(`${basename(path)}: ${read.problem}`);
  const built = buildNormSet(read.project);
  if (!built.ok) return refused(`${basename(path)}: ${built.problem}`);
  const unfit = pressProblem(built.normSet);
  if (unfit !== null) return refused(`${basename(path)}: ${unfit}`);
  const remarks = openQueries(built.normSet.queries)
    .filter(({ weight }) => weight === 'must')
    .map(queryLine);
  // The press brings fonts and writers of PDF and workbooks, which no other command waits for.
  const { pressInto } = await import('../press/press-files.ts');
  const pressed = await pressInto(read.project, into);
  if (!pressed.ok) return refused(pressed.problem, remarks);
  return {
    kind: 'done',
    result: pressed.value.files.map(({ file, sha256 }) => `${sha256}  ${file}\n`).join(''),
    remarks,
  };
}

function queryLine({ lead, why, whatToDo }: Query): string {
  return `Still open: ${lead} ${why} ${whatToDo}`;
}
