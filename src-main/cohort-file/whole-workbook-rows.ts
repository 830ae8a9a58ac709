import { read, type CellObject, type WorkBook } from '@e965/xlsx';
import { createHash } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import type { Reply } from '../../shared-core/desk.ts';
import type { Reading } from '../../shared-core/norms/reading.ts';
import { booleanText, dateText, isDateFormat, numberText, type CellStyleFacts } from './cell-text.ts';
import { lockedWorkbook, unreadable, type KnownFile } from './file-kind.ts';
import { NOTHING_IN_FILE, RowNumbering } from './row-numbering.ts';
import { CANCELLED, type PassEnd, type ReadHooks, type RowTaker } from './row-taker.ts';
import { evenWidth } from './sheet-width.ts';
import { damagedWorkbook, noSuchSheet } from './workbook-rows.ts';

const ROWS_AT_ONCE = 1000;

interface WholeWorkbook {
  readonly book: WorkBook;
  readonly bytes: Buffer;
}

/** Names of the sheets of an ods, xls or xlsb workbook. */
export async function wholeWorkbookSheets(known: KnownFile): Promise<Reply<readonly string[]>> {
  const opened = await openWhole(known, { bookSheets: true });
  return opened.ok ? { ok: true, value: opened.value.book.SheetNames } : opened;
}

/** Reads one sheet of an ods, xls or xlsb workbook, which is held in memory whole. */
export async function readWholeWorkbook(
  known: KnownFile,
  reading: Reading,
  taker: RowTaker,
  { onProgress, signal }: ReadHooks,
): Promise<PassEnd> {
  const opened = await openWhole(known, {});
  if (!opened.ok) return opened;
  const { book, bytes } = opened.value;
  const name = reading.sheet ?? book.SheetNames[0] ?? null;
  const sheet = name === null ? undefined : book.Sheets[name];
  if (sheet === undefined) return { ok: false, problem: noSuchSheet(known.file, name) };
  const facts = { mark: reading.decimalMark, from1904: book.Workbook?.WBProps?.date1904 === true };
  const records = withoutEnd(Array.from((sheet['!data'] ?? []) as SheetCells, (cells) => recordOf(cells, facts)));
  const numbering = new RowNumbering(reading, evenWidth(taker));
  for (let start = 0; start < records.length; start += ROWS_AT_ONCE) {
    if (signal.aborted) return { ok: false, problem: CANCELLED };
    if (!numbering.take(records.slice(start, start + ROWS_AT_ONCE))) return { ok: true, value: { sha256: null } };
    onProgress(Math.min(1, (start + ROWS_AT_ONCE) / records.length));
  }
  if (!numbering.foundColumns) return { ok: false, problem: NOTHING_IN_FILE };
  return { ok: true, value: { sha256: createHash('sha256').update(bytes).digest('hex') } };
}

type SheetCells = readonly (readonly (CellObject | undefined)[] | undefined)[];

async function openWhole(known: KnownFile, only: { readonly bookSheets?: boolean }): Promise<Reply<WholeWorkbook>> {
  let bytes: Buffer;
  try {
    bytes = await readFile(known.path);
  } catch (error) {
    return { ok: false, problem: unreadable(error, known.file) };
  }
  try {
    const book = readQuietly(bytes, only);
    return book.SheetNames.length === 0
      ? { ok: false, problem: damagedWorkbook(known.file) }
      : { ok: true, value: { book, bytes } };
  } catch (error) {
    const locked = error instanceof Error && /password|ODS Encryption|Encryption scheme/i.test(error.message);
    return { ok: false, problem: locked ? lockedWorkbook(known.file) : damagedWorkbook(known.file) };
  }
}

/** The package tells the console about number formats that it cannot show; the numbers themselves are whole. */
function readQuietly(bytes: Buffer, only: { readonly bookSheets?: boolean }): WorkBook {
  const { error } = console;
  console.error = () => undefined;
  try {
    return read(bytes, { ...only, type: 'buffer', dense: true, cellNF: true, cellText: false, cellHTML: false });
  } finally {
    console.error = error;
  }
}

function recordOf(cells: readonly (CellObject | undefined)[] | undefined, facts: CellStyleFacts): readonly string[] {
  const record = Array.from(cells ?? [], (cell) => (cell === undefined ? '' : cellText(cell, facts)));
  while (record.length > 0 && (record.at(-1) ?? '').trim() === '') record.pop();
  return record.length === 0 ? [''] : record;
}

function withoutEnd(records: readonly (readonly string[])[]): readonly (readonly string[])[] {
  const last = records.findLastIndex((record) => record.length > 1 || record[0] !== '');
  return records.slice(0, last + 1);
}

const ERRORS: Readonly<Record<number, string>> = {
  0: '#NULL!',
  7: '#DIV/0!',
  15: '#VALUE!',
  23: '#REF!',
  29: '#NAME?',
  36: '#NUM!',
  42: '#N/A',
};

function cellText({ t, v, z }: CellObject, facts: CellStyleFacts): string {
  if (v === undefined || t === 'z') return '';
  if (t === 'e') return ERRORS[Number(v)] ?? '#ERROR!';
  if (typeof v === 'boolean') return booleanText(v);
  if (typeof v === 'number') {
    return typeof z === 'string' && isDateFormat(z) ? dateText(v, facts) : numberText(v, facts.mark);
  }
  return typeof v === 'string' ? v : v.toISOString().slice(0, 10);
}
