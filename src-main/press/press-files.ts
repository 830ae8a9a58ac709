import type { DrawnPages, Pressed, Reply } from '../../shared-core/desk.ts';
import { editionToText, type FrozenEdition } from '../../shared-core/norms/edition-file.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import { buildNormSet, pressProblem, type NormSet, type NormSetBuilt } from '../../shared-core/norms/norm-set.ts';
import { releaseProblem } from '../../shared-core/norms/release-gaps.ts';
import { compareEngines, engineProblem } from '../../shared-core/second-engine/compare-engines.ts';
import { programVersion } from '../program-version.ts';
import { bookletPdf } from './booklet-pdf.ts';
import { normSetJson } from './norm-set-json.ts';
import { certificateJson, certificateOf } from './read-back/certificate.ts';
import { certificatePdf } from './read-back/certificate-page.ts';
import { readBack, readBackProblem } from './read-back/read-back.ts';
import { editionFileName } from './released-editions.ts';
import { tablesCsv } from './tables-csv.ts';
import { tablesWorkbook } from './workbook.ts';
import { named, writePressed, type FileToWrite } from './write-pressed.ts';

/** Told how far the work is, 0–1, and what is being done, in a few words. */
export type PressProgress = (progress: number, doing: string) => void;

const CERTIFICATE_FILE = 'certificate.json';

const silent: PressProgress = () => {};
/** Shares of the time that the parts of a press take, as measured on tables of 41 and of 121 scores. */
const AFTER_BOOKLET = 0.45;
const AFTER_WORKBOOK = 0.55;
const AFTER_CSV = 0.6;
const AFTER_READ_BACK = 0.95;

/** What a press made: the files, and what was found when they were read back. */
interface PressedSet {
  readonly files: readonly FileToWrite[];
  readonly readBack: Pressed['readBack'];
}

/**
 * Makes booklet, workbook, csv and norm set of a project in memory, reads them back cell by cell, and adds the
 * certificate. What stands in the way comes back as a sentence: also tables that the second engine works out otherwise,
 * and files that do not say what the tables say.
 */
export async function pressFiles(project: NormProject, onProgress: PressProgress = silent): Promise<Reply<PressedSet>> {
  onProgress(0, 'Working out the tables');
  const built = printableNormSet(project);
  return built.ok ? filesOf(built.normSet, onProgress) : built;
}

async function filesOf(normSet: NormSet, onProgress: PressProgress): Promise<Reply<PressedSet>> {
  const atOdds = engineProblem(compareEngines(normSet));
  if (atOdds !== null) return { ok: false, problem: atOdds };
  const { pdf } = await bookletPdf(normSet, (share) => onProgress(share * AFTER_BOOKLET, 'Drawing the booklet'));
  onProgress(AFTER_BOOKLET, 'Filling the workbook');
  const workbook = await tablesWorkbook(normSet);
  onProgress(AFTER_WORKBOOK, 'Writing csv and norm set');
  const files: readonly FileToWrite[] = [
    { file: 'booklet.pdf', bytes: pdf },
    { file: 'tables.xlsx', bytes: workbook },
    { file: 'tables.csv', bytes: tablesCsv(normSet) },
    { file: 'norm-set.json', bytes: normSetJson(normSet) },
  ];
  let begun = 0;
  const read = await readBack(files, normSet, (file) => {
    onProgress(AFTER_CSV + ((AFTER_READ_BACK - AFTER_CSV) * begun) / files.length, `Reading ${file} back`);
    begun += 1;
  });
  if (!read.ok) return read;
  const differs = readBackProblem(read.value);
  if (differs !== null) return { ok: false, problem: differs };
  onProgress(AFTER_READ_BACK, 'Writing the certificate');
  const certificate = certificateOf(normSet, files, read.value, programVersion());
  return {
    ok: true,
    value: {
      files: [
        ...files,
        { file: CERTIFICATE_FILE, bytes: certificateJson(certificate) },
        { file: 'certificate.pdf', bytes: await certificatePdf(certificate, normSet) },
      ],
      readBack: { cells: certificate.cells, recomputed: certificate.recomputed.cells },
    },
  };
}

/**
 * Presses a project into a folder, which is made where it is missing. Each file is replaced whole or not at all, and
 * only after all of them were made and read back; then the disk is asked whether it holds the same bytes. A certificate
 * of an earlier press is taken away first, so that none stands beside files it does not speak of. A folder that holds a
 * released edition takes no other files.
 */
export async function pressInto(
  project: NormProject,
  folder: string,
  onProgress: PressProgress = silent,
): Promise<Reply<Pressed>> {
  const made = await pressFiles(project, onProgress);
  if (!made.ok) return made;
  const problem = await writePressed(made.value.files, folder, CERTIFICATE_FILE);
  if (problem !== null) return { ok: false, problem };
  onProgress(1, 'Done');
  return { ok: true, value: pressedInto(folder, made.value, null) };
}

/**
 * Presses a project and freezes it: the same files, and beside them, written last, the edition file. Refused while
 * something is missing that a release needs.
 */
export async function releaseInto(
  project: NormProject,
  folder: string,
  onProgress: PressProgress = silent,
): Promise<Reply<Pressed>> {
  onProgress(0, 'Working out the tables');
  const built = printableNormSet(project);
  if (!built.ok) return built;
  const missing = releaseProblem(built.normSet);
  if (missing !== null) return { ok: false, problem: missing };
  const made = await filesOf(built.normSet, onProgress);
  if (!made.ok) return made;
  const { edition } = project.release;
  const text = editionToText(frozenEdition(built.normSet, made.value));
  const file = { file: editionFileName(edition), bytes: new TextEncoder().encode(text) };
  const released = { ...made.value, files: [...made.value.files, file] };
  const problem = await writePressed(released.files, folder, CERTIFICATE_FILE);
  if (problem !== null) return { ok: false, problem };
  onProgress(1, 'Done');
  return { ok: true, value: pressedInto(folder, released, file.file) };
}

function pressedInto(folder: string, { files, readBack }: PressedSet, editionFile: string | null): Pressed {
  return { folder, files: files.map(named), readBack, editionFile };
}

function frozenEdition({ project, check }: NormSet, { files, readBack }: PressedSet): FrozenEdition {
  const { edition, date, analyst, checker } = project.release;
  return {
    program: { name: 'Normloom', version: programVersion() },
    edition,
    date,
    check,
    analyst,
    checker,
    files: files.map(named),
    readBack: { cellsCompared: readBack.cells, cellsRecomputed: readBack.recomputed },
    project,
  };
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
  const { pdf, ...told } = await bookletPdf(built.normSet, (share) => onProgress(share, 'Drawing the pages'));
  return { ok: true, value: { pdf: Buffer.from(pdf).toString('base64'), ...told } };
}
