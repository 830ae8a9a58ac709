import { createHash } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import JSZip from 'jszip';
import type { Reply } from '../../shared-core/desk.ts';
import type { Reading } from '../../shared-core/norms/reading.ts';
import { unreadable, type KnownFile } from './file-kind.ts';
import { NOTHING_IN_FILE, RowNumbering } from './row-numbering.ts';
import { CANCELLED, throwMistake, type PassEnd, type ReadHooks, type RowTaker } from './row-taker.ts';
import { evenWidth } from './sheet-width.ts';
import { SheetRecords } from './sheet-records.ts';
import { dateStyles, partTexts, sharedTexts, workbookContents, type WorkbookContents } from './workbook-parts.ts';
import { XmlScanner } from './xml-scanner.ts';

interface OpenWorkbook {
  readonly zip: JSZip;
  readonly bytes: Buffer;
  readonly contents: WorkbookContents;
}

/** Names of the sheets of an xlsx workbook. */
export async function xlsxSheets(known: KnownFile): Promise<Reply<readonly string[]>> {
  const opened = await openWorkbook(known);
  return opened.ok ? { ok: true, value: opened.value.contents.sheets.map(({ name }) => name) } : opened;
}

/** Reads one sheet of an xlsx workbook; the packed file is held in memory, its rows are not. */
export async function readXlsx(
  known: KnownFile,
  reading: Reading,
  taker: RowTaker,
  { onProgress, signal }: ReadHooks,
): Promise<PassEnd> {
  const opened = await openWorkbook(known);
  if (!opened.ok) return opened;
  const { zip, bytes, contents } = opened.value;
  const sheet =
    reading.sheet === null ? contents.sheets[0] : contents.sheets.find(({ name }) => name === reading.sheet);
  if (sheet === undefined) return { ok: false, problem: noSuchSheet(known.file, reading.sheet) };
  try {
    const records = new SheetRecords({
      mark: reading.decimalMark,
      from1904: contents.from1904,
      sharedTexts: await sharedTexts(zip),
      dateStyles: await dateStyles(zip),
    });
    const scanner = new XmlScanner(records);
    const numbering = new RowNumbering(reading, evenWidth(taker));
    for await (const text of partTexts(zip, sheet.path, onProgress)) {
      scanner.write(text);
      if (signal.aborted) return { ok: false, problem: CANCELLED };
      if (!numbering.take(records.take())) return { ok: true, value: { sha256: null } };
    }
    if (!numbering.foundColumns) return { ok: false, problem: NOTHING_IN_FILE };
    return { ok: true, value: { sha256: createHash('sha256').update(bytes).digest('hex') } };
  } catch (error) {
    throwMistake(error);
    return { ok: false, problem: damagedWorkbook(known.file) };
  }
}

async function openWorkbook(known: KnownFile): Promise<Reply<OpenWorkbook>> {
  let bytes: Buffer;
  try {
    bytes = await readFile(known.path);
  } catch (error) {
    return { ok: false, problem: unreadable(error, known.file) };
  }
  try {
    const zip = await JSZip.loadAsync(bytes);
    const contents = await workbookContents(zip);
    return contents.sheets.length === 0
      ? { ok: false, problem: `${known.file} has no sheet with cells. Choose the workbook that holds the scores.` }
      : { ok: true, value: { zip, bytes, contents } };
  } catch (error) {
    throwMistake(error);
    return { ok: false, problem: damagedWorkbook(known.file) };
  }
}

export function noSuchSheet(file: string, sheet: string | null): string {
  return `${file} has no sheet "${sheet ?? ''}". Choose one of its sheets.`;
}

export function damagedWorkbook(file: string): string {
  return `${file} is damaged or not a whole workbook. Open it in a spreadsheet and save it again as xlsx or csv.`;
}
