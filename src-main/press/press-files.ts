import { createHash } from 'node:crypto';
import { mkdir } from 'node:fs/promises';
import { join } from 'node:path';
import writeFileAtomic from 'write-file-atomic';
import type { DrawnPages, Pressed, Reply } from '../../shared-core/desk.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import { buildNormSet, pressProblem, type NormSetBuilt } from '../../shared-core/norms/norm-set.ts';
import { diskTrouble } from '../project-file/disk-trouble.ts';
import { bookletPdf } from './booklet-pdf.ts';
import { normSetJson } from './norm-set-json.ts';
import { tablesCsv } from './tables-csv.ts';
import { tablesWorkbook } from './workbook.ts';

/** Told how far the work is, 0–1, and what is being done, in a few words. */
export type PressProgress = (progress: number, doing: string) => void;

export interface FileToWrite {
  readonly file: string;
  readonly bytes: Uint8Array;
}

const silent: PressProgress = () => {};
/** Shares of the time that the parts of a press take, as measured on tables of 41 and of 121 scores. */
const AFTER_BOOKLET = 0.7;
const AFTER_WORKBOOK = 0.95;

/** Makes booklet, workbook, csv and norm set of a project in memory. What stands in the way comes back as a sentence. */
export async function pressFiles(
  project: NormProject,
  onProgress: PressProgress = silent,
): Promise<Reply<readonly FileToWrite[]>> {
  onProgress(0, 'Working out the tables');
  const built = printableNormSet(project);
  if (!built.ok) return built;
  const { normSet } = built;
  const { pdf } = await bookletPdf(normSet, (share) => onProgress(share * AFTER_BOOKLET, 'Drawing the booklet'));
  onProgress(AFTER_BOOKLET, 'Filling the workbook');
  const workbook = await tablesWorkbook(normSet);
  onProgress(AFTER_WORKBOOK, 'Writing csv and norm set');
  return {
    ok: true,
    value: [
      { file: 'booklet.pdf', bytes: pdf },
      { file: 'tables.xlsx', bytes: workbook },
      { file: 'tables.csv', bytes: tablesCsv(normSet) },
      { file: 'norm-set.json', bytes: normSetJson(normSet) },
    ],
  };
}

/**
 * Presses a project into a folder, which is made where it is missing. Each file is replaced whole or not at all, and
 * only after all of them were made.
 */
export async function pressInto(
  project: NormProject,
  folder: string,
  onProgress: PressProgress = silent,
): Promise<Reply<Pressed>> {
  const made = await pressFiles(project, onProgress);
  if (!made.ok) return made;
  try {
    await mkdir(folder, { recursive: true });
    for (const { file, bytes } of made.value) {
      await writeFileAtomic(join(folder, file), Buffer.from(bytes), { fsync: true });
    }
  } catch (error) {
    return { ok: false, problem: diskTrouble('The pressed files', 'written', error) };
  }
  onProgress(1, 'Done');
  const files = made.value.map(({ file, bytes }) => ({
    file,
    bytes: bytes.length,
    sha256: createHash('sha256').update(bytes).digest('hex'),
  }));
  return { ok: true, value: { folder, files } };
}

/** The set of a project, unless one of its groups would be printed as something it is not. */
function printableNormSet(project: NormProject): NormSetBuilt {
  const built = buildNormSet(project);
  if (!built.ok) return built;
  const problem = pressProblem(built.normSet);
  return problem === null ? built : { ok: false, problem };
}

/** The booklet alone, for the pages on screen. */
export async function drawPages(project: NormProject, onProgress: PressProgress = silent): Promise<Reply<DrawnPages>> {
  const built = printableNormSet(project);
  if (!built.ok) return built;
  const { pdf, pages, remarks } = await bookletPdf(built.normSet, (share) => onProgress(share, 'Drawing the pages'));
  return { ok: true, value: { pdf: Buffer.from(pdf).toString('base64'), pages, remarks } };
}
