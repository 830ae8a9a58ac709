import { basename } from 'node:path';
import { pressProblem } from '../../shared-core/norms/norm-set.ts';
import { openMustQueries, type Query } from '../../shared-core/norms/queries.ts';
import { refused, type Outcome } from './outcome.ts';
import { readProject } from './read-project.ts';

/** Presses a project into a folder, which is made where it is missing; the result names each file with its SHA-256. */
export async function pressCommand(path: string, into: string): Promise<Outcome> {
  const read = await readProject(path);
  if (!read.ok) return refused(read.problem);
  const normSet = read.value;
  const unfit = pressProblem(normSet);
  if (unfit !== null) return refused(`${basename(path)}: ${unfit}`);
  const remarks = openMustQueries(normSet.queries).map(queryLine);
  // The press brings fonts and writers of PDF and workbooks, which no other command waits for.
  const { pressInto } = await import('../press/press-files.ts');
  const pressed = await pressInto(normSet.project, into);
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
