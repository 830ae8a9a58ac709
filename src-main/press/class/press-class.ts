import type { ClassFile } from '../../../shared-core/class/class-file.ts';
import type { DrawnPages, Reply } from '../../../shared-core/desk.ts';
import type { PlacedPages } from '../../../shared-core/pages/booklet.ts';
import {
  classSheets,
  standingSheets,
  summarySheets,
  type ClassSheets,
} from '../../../shared-core/pages/class-sheets.ts';
import { printOfClass, reportPages, type PrintOfClass } from '../../../shared-core/pages/print-of-class.ts';
import { composeSlips } from '../../../shared-core/pages/slip-pages.ts';
import { programVersion } from '../../program-version.ts';
import { csvFile } from '../csv-records.ts';
import { placedPdf } from '../placed-pdf.ts';
import type { PressProgress } from '../press-files.ts';
import type { FileReadBack } from '../read-back/cell-differences.ts';
import { readBackProblem } from '../read-back/read-back.ts';
import type { FileToWrite } from '../write-pressed.ts';
import { classCertificateJson, type CertifiedClass } from './class-certificate.ts';
import { classRecords, standingRecords, summaryRecords, type CsvRecords } from './class-csv.ts';
import { classWorkbook } from './class-workbook.ts';
import { pupilKeyCsv } from './pupil-key-csv.ts';
import { readClassCsv } from './read-back/read-class-csv.ts';
import { readClassReport, readClassStanding, readClassSummary } from './read-back/read-class-report.ts';
import { readClassWorkbook } from './read-back/read-class-workbook.ts';
import { readSlips } from './read-back/read-slips.ts';

export const REPORT_FILE = 'class-report.pdf';
export const SLIPS_FILE = 'slips.pdf';
export const CLASS_WORKBOOK_FILE = 'class.xlsx';
export const CLASS_CSV_FILE = 'class.csv';
export const CLASS_CERTIFICATE_FILE = 'class-certificate.json';
/** Who has which code: the only file that holds both. */
export const KEY_FILE = 'key-to-codes.csv';

export interface ClassPressChoices {
  readonly slips: boolean;
}

/** Pages of a class for the screen; it has no blocks to turn to. */
export type DrawnClassPages = Omit<DrawnPages, 'sections'>;

/** Files of a class, made in memory and read back. */
export interface PressedClass {
  /** The certificate last; the key to codes is not among them. */
  readonly files: readonly FileToWrite[];
  /** Null where pupils are not printed under codes. */
  readonly key: FileToWrite | null;
  /** Cells of the files that were read back and agree. */
  readonly cells: number;
  /** What had to be done otherwise than asked, in sentences. */
  readonly remarks: readonly string[];
}

const silent: PressProgress = () => {};
/** Shares of the time that the parts of a press take. */
const AFTER_REPORT = 0.2;
const AFTER_SLIPS = 0.55;
const AFTER_TABLES = 0.65;

const NO_SLIPS_OF_SUMMARY = 'A summary names nobody, so it has no slips.';
const NO_SLIPS_OF_STANDING = 'Slips tell what a table says; this class has none, so there are no slips.';

/**
 * Makes report, slips, workbook and csv of a class, reads them back cell by cell, and adds the certificate. Nothing but
 * the pages that the sharing chosen allows holds a name. The problem is a sentence that tells what to do.
 */
export async function pressClass(
  file: ClassFile,
  choices: ClassPressChoices,
  onProgress: PressProgress = silent,
): Promise<Reply<PressedClass>> {
  onProgress(0, 'Looking up the class');
  const made = printOfClass(file);
  if (!made.ok) return made;
  const printed = made.value;
  const day = classDay(file);
  const report = reportPages(printed);
  const pdf = await placedPdf(report, day, (share) => onProgress(share * AFTER_REPORT, 'Drawing the report'));
  const slips = slipsOf(printed, choices);
  if (!slips.ok) return slips;
  const slipPages = slips.value.pages;
  const drawnSlips =
    slipPages === null
      ? null
      : await placedPdf(slipPages, day, (share) =>
          onProgress(AFTER_REPORT + share * (AFTER_SLIPS - AFTER_REPORT), 'Drawing the slips'),
        );
  onProgress(AFTER_SLIPS, 'Filling workbook and csv');
  const [sheets, records] = [sheetsOf(printed), recordsOf(printed)];
  const workbook = await classWorkbook(sheets, file.report, day);
  const csv = csvFile([records.heads, ...records.rows]);
  const withTable = printed.kind === 'report' ? printed.print : null;
  onProgress(AFTER_TABLES, 'Reading the files back');
  const read: FileReadBack[] = [await readReport(pdf.pdf, report, printed)];
  const files: FileToWrite[] = [{ file: REPORT_FILE, bytes: pdf.pdf }];
  if (drawnSlips !== null && slipPages !== null && withTable !== null) {
    files.push({ file: SLIPS_FILE, bytes: drawnSlips.pdf });
    read.push(await readSlips(SLIPS_FILE, drawnSlips.pdf, slipPages, withTable));
  }
  files.push({ file: CLASS_WORKBOOK_FILE, bytes: workbook }, { file: CLASS_CSV_FILE, bytes: csv });
  read.push(await readClassWorkbook(CLASS_WORKBOOK_FILE, workbook, sheets, withTable));
  read.push(readClassCsv(CLASS_CSV_FILE, csv, records, withTable));
  const differs = readBackProblem(read);
  if (differs !== null) return { ok: false, problem: differs };
  const certificate = classCertificateJson(certifiedOf(file, sheets), files, read, programVersion());
  return {
    ok: true,
    value: {
      files: [...files, { file: CLASS_CERTIFICATE_FILE, bytes: certificate }],
      key: keyOf(file, printed),
      cells: read.reduce((sum, { cells }) => sum + cells, 0),
      remarks: [...report.remarks, ...slips.value.remarks],
    },
  };
}

/** The report alone, for the pages on screen. */
export async function drawClassReport(
  file: ClassFile,
  onProgress: PressProgress = silent,
): Promise<Reply<DrawnClassPages>> {
  const made = printOfClass(file);
  if (!made.ok) return made;
  return drawn(reportPages(made.value), classDay(file), onProgress);
}

/** The slips alone, for the pages on screen. */
export async function drawSlips(file: ClassFile, onProgress: PressProgress = silent): Promise<Reply<DrawnClassPages>> {
  const made = printOfClass(file);
  if (!made.ok) return made;
  const slips = slipsOf(made.value, { slips: true });
  if (!slips.ok) return slips;
  const { pages, remarks } = slips.value;
  if (pages === null) return { ok: false, problem: remarks.join(' ') };
  return drawn(pages, classDay(file), onProgress);
}

async function drawn(placed: PlacedPages, day: Date, onProgress: PressProgress): Promise<Reply<DrawnClassPages>> {
  const { pdf, pages, remarks } = await placedPdf(placed, day, (share) => onProgress(share, 'Drawing the pages'));
  return { ok: true, value: { pdf: Buffer.from(pdf).toString('base64'), pages, remarks } };
}

interface SlipsMade {
  /** Null where there are none. */
  readonly pages: PlacedPages | null;
  readonly remarks: readonly string[];
}

function slipsOf(printed: PrintOfClass, choices: ClassPressChoices): Reply<SlipsMade> {
  const none = (remark: string): Reply<SlipsMade> => ({ ok: true, value: { pages: null, remarks: [remark] } });
  if (!choices.slips) return { ok: true, value: { pages: null, remarks: [] } };
  switch (printed.kind) {
    case 'standing':
      return none(NO_SLIPS_OF_STANDING);
    case 'summary':
      return none(NO_SLIPS_OF_SUMMARY);
    case 'report': {
      if (printed.print.results.pupils.length === 0) return none('Nobody has a result, so there are no slips.');
      const made = composeSlips(printed.print);
      return made.ok ? { ok: true, value: { pages: made.value, remarks: made.value.remarks } } : made;
    }
  }
}

function sheetsOf(printed: PrintOfClass): ClassSheets {
  switch (printed.kind) {
    case 'report':
      return classSheets(printed.print);
    case 'summary':
      return summarySheets(printed.print);
    case 'standing':
      return standingSheets(printed.print);
  }
}

function recordsOf(printed: PrintOfClass): CsvRecords {
  switch (printed.kind) {
    case 'report':
      return classRecords(printed.print);
    case 'summary':
      return summaryRecords(printed.print);
    case 'standing':
      return standingRecords(printed.print);
  }
}

function readReport(pdf: Uint8Array, placed: PlacedPages, printed: PrintOfClass): Promise<FileReadBack> {
  switch (printed.kind) {
    case 'report':
      return readClassReport(REPORT_FILE, pdf, placed, printed.print);
    case 'summary':
      return readClassSummary(REPORT_FILE, pdf, placed);
    case 'standing':
      return readClassStanding(REPORT_FILE, pdf, placed, printed.print);
  }
}

function certifiedOf({ title, date, sharing, table }: ClassFile, { check }: ClassSheets): CertifiedClass {
  return {
    title,
    date,
    check,
    sharing: sharing.as,
    table: table === null ? null : { title: table.title, edition: table.edition, check: table.check },
  };
}

/** Everybody of the list with the code, in the order of the list. */
function keyOf({ sharing, list }: ClassFile, printed: PrintOfClass): FileToWrite | null {
  if (sharing.as !== 'codes') return null;
  const { pupils, missed, leftOut, open } =
    printed.kind === 'standing' ? printed.print.standing : printed.print.results;
  const names = new Map([...pupils, ...missed, ...leftOut, ...open].map(({ index, name }) => [index, name]));
  const lines = list.rows.map(({ group }, index) => ({
    code: printed.print.codes[index] ?? '',
    name: names.get(index) ?? '',
    group,
  }));
  return { file: KEY_FILE, bytes: pupilKeyCsv(lines) };
}

/**
 * The moment that the files of a class carry as theirs: the start of the day of testing in universal time, or of 1970
 * where none is given, so that one class gives the same bytes whenever and wherever it is pressed.
 */
function classDay({ date }: ClassFile): Date {
  const day = new Date(`${date}T00:00:00Z`);
  return Number.isNaN(day.getTime()) ? new Date(0) : day;
}
