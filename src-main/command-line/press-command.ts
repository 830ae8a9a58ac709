import { basename } from 'node:path';
import type { PressedFile } from '../../shared-core/desk.ts';
import type { FrozenEdition } from '../../shared-core/norms/edition-file.ts';
import { openMustQueries, type Query } from '../../shared-core/norms/queries.ts';
import { joined } from '../../shared-core/norms/statements.ts';
import { filesUnlike } from '../press/released-editions.ts';
import { programVersion } from '../program-version.ts';
import { refused, type Outcome } from './outcome.ts';
import { readPrintable } from './read-project.ts';

/**
 * Presses a project or a released edition into a folder, which is made where it is missing; the result names each file
 * with its SHA-256. The files of an edition are held against those that were released.
 */
export async function pressCommand(path: string, into: string): Promise<Outcome> {
  const read = await readPrintable(path);
  if (!read.ok) return refused(read.problem);
  const { normSet, edition } = read.value;
  const open = openMustQueries(normSet.queries).map(queryLine);
  // The press brings fonts and writers of PDF and workbooks, which no other command waits for.
  const { pressInto } = await import('../press/press-files.ts');
  const pressed = await pressInto(normSet.project, into);
  if (!pressed.ok) return refused(pressed.problem, open);
  const { files } = pressed.value;
  const result = fingerprintLines(files);
  if (edition === null) return { kind: 'done', result, remarks: open };
  const unlike = filesUnlike(edition, files);
  if (unlike.length > 0) return { kind: 'differs', result, problem: unlikeRelease(path, edition, unlike), remarks: [] };
  return { kind: 'done', result, remarks: [`Edition ${edition.edition}: the same bytes as released.`] };
}

/** One line a file, as `sha256sum` prints it. */
export function fingerprintLines(files: readonly PressedFile[]): string {
  return files.map(({ file, sha256 }) => `${sha256}  ${file}\n`).join('');
}

function unlikeRelease(path: string, { edition, program }: FrozenEdition, unlike: readonly string[]): string {
  const version = programVersion();
  const by =
    program.version === version
      ? `though both are of Normloom ${version}`
      : `which Normloom ${program.version} pressed; this is Normloom ${version}`;
  const [first = ''] = unlike;
  const are = unlike.length === 1 ? 'is' : 'are';
  return (
    `${joined(unlike)} ${are} not, byte for byte, as released with edition ${edition}, ${by}. Whether a printed cell ` +
    `differs is told by: normloom read-back ${first} --against ${basename(path)}.`
  );
}

function queryLine({ lead, why, whatToDo }: Query): string {
  return `Still open: ${lead} ${why} ${whatToDo}`;
}
