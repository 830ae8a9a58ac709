import { readFile, stat } from 'node:fs/promises';
import { basename, extname } from 'node:path';
import { projectClassTable } from '../../shared-core/class/class-table-of-set.ts';
import type { ClassTable } from '../../shared-core/class/class-table.ts';
import { readPublishedTable } from '../../shared-core/class/published-table.ts';
import { opensAsClass, opensAsProject } from '../../shared-core/norms/file-endings.ts';
import { guessEncoding, textStart } from '../cohort-file/text-encoding.ts';
import { diskTrouble } from '../project-file/disk-trouble.ts';
import { readProject } from '../project-file/project-store.ts';

/** Far more than any printed table takes. */
const MOST_BYTES = 4_000_000;

export type TableFileRead =
  | { readonly ok: true; readonly table: ClassTable }
  /** `remarks` are sentences about single lines. */
  | { readonly ok: false; readonly problem: string; readonly remarks: readonly string[] };

/** The tables that a class is looked up in: of a project, a released edition, or a published table in a text file. */
export async function readTableFile(path: string, lowIsGood: boolean): Promise<TableFileRead> {
  const file = basename(path);
  if (opensAsClass(path)) return refused(`${file} is a class. Put it in place of the list: it holds its own table.`);
  if (!opensAsProject(path)) return readPublished(path, file, lowIsGood);
  if (lowIsGood) return refused(`${file} tells itself which scores are the good ones. Leave out --low-is-good.`);
  const read = await readProject(path);
  if (!read.ok) return refused(read.problem.includes(file) ? read.problem : `${file}: ${read.problem}`);
  const table = projectClassTable(read.project, read.edition === null ? 'project' : 'edition');
  return table.ok ? { ok: true, table: table.value } : refused(`${file}: ${table.problem}`);
}

async function readPublished(path: string, file: string, lowIsGood: boolean): Promise<TableFileRead> {
  let bytes: Uint8Array;
  try {
    const { size } = await stat(path);
    if (size > MOST_BYTES) return refused(`${file} is too large for a published table.`);
    bytes = await readFile(path);
  } catch (error) {
    return refused(diskTrouble(file, 'read', error));
  }
  const text = textStart(guessEncoding(bytes, true), bytes);
  if (text.includes('\0')) {
    return refused(`${file} is neither a project, a released edition nor a text with a published table.`);
  }
  const { table, problems } = readPublishedTable(text, {
    title: basename(file, extname(file)),
    form: '',
    edition: '',
    date: '',
    cited: '',
    definition: 'unknown',
    population: '',
    n: null,
    direction: lowIsGood ? 'low-is-good' : null,
    step: null,
    peopleNoun: 'pupils',
  });
  if (table !== null) return { ok: true, table };
  return {
    ok: false,
    problem: `${file} cannot be read as a published table. Correct it, and try again.`,
    remarks: problems.map(({ line, problem }) => (line === 0 ? problem : `${file}, line ${line}: ${problem}`)),
  };
}

function refused(problem: string): TableFileRead {
  return { ok: false, problem, remarks: [] };
}
