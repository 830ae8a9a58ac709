import { open } from 'node:fs/promises';
import type { CohortPreview, Reply } from '../../shared-core/desk.ts';
import type { Reading } from '../../shared-core/norms/reading.ts';
import { guessSeparator } from '../../shared-core/tally/guess-separator.ts';
import { knowFile, unreadable, type KnownFile } from './file-kind.ts';
import { guessReading, plainReading, refitReading } from './guess-reading.ts';
import { readRows, sheetsOf } from './read-rows.ts';
import { guessEncoding, textStart } from './text-encoding.ts';

const PREVIEW_ROWS = 200;
/** Rows that guesses are made from. */
const GUESS_ROWS = 5000;
const SAMPLE_BYTES = 4 * 1024 * 1024;

/**
 * The first rows of a cohort file with the reading asked for, fitted to the columns that are there, or with a guessed
 * one; `remarks` says why it was guessed and what looks odd. Files that cannot be read come back with what to do.
 */
export async function lookAtCohort(path: string, file: string, reading: Reading | null): Promise<Reply<CohortPreview>> {
  const known = await knowFile(path, file);
  if (!known.ok) return known;
  const sheets = await sheetsOf(known.value);
  if (!sheets.ok) return sheets;
  const firstSheet = sheets.value[0] ?? null;
  const asked =
    reading === null ? await guess(known.value, firstSheet) : await refit(known.value, atSheet(reading, firstSheet));
  if (!asked.ok) return asked;
  const first = await firstRows(known.value, asked.value.reading, PREVIEW_ROWS);
  if (!first.ok) return first;
  const { columns, rows } = first.value;
  return {
    ok: true,
    value: {
      file,
      bytes: known.value.bytes,
      sheets: sheets.value,
      columns,
      rows,
      reading: asked.value.reading,
      remarks: [...sheetRemarks(sheets.value, asked.value.reading), ...asked.value.remarks, ...oddities(columns, rows)],
    },
  };
}

/** Texts have no sheets; a workbook read without naming one is read at its first. */
function atSheet(reading: Reading, firstSheet: string | null): Reading {
  return { ...reading, sheet: firstSheet === null ? null : (reading.sheet ?? firstSheet) };
}

type Asked = Reply<ReturnType<typeof guessReading>>;

async function guess(known: KnownFile, sheet: string | null): Promise<Asked> {
  const split =
    known.kind === 'text'
      ? await guessSplit(known)
      : { ok: true as const, value: { encoding: 'utf-8' as const, separator: ',' as const, sheet } };
  if (!split.ok) return split;
  const first = await firstRows(known, plainReading(split.value), GUESS_ROWS);
  return first.ok ? { ok: true, value: guessReading(first.value.rows, split.value) } : first;
}

async function refit(known: KnownFile, reading: Reading): Promise<Asked> {
  const first = await firstRows(known, reading, GUESS_ROWS);
  return first.ok ? { ok: true, value: refitReading(reading, first.value.columns, first.value.rows) } : first;
}

/** Encoding and separator of a text, guessed from its beginning. */
export async function guessSplit(known: KnownFile): Promise<Reply<Pick<Reading, 'encoding' | 'separator' | 'sheet'>>> {
  let sample: Buffer;
  try {
    const handle = await open(known.path, 'r');
    try {
      const length = Math.min(SAMPLE_BYTES, known.bytes);
      const { buffer, bytesRead } = await handle.read(Buffer.alloc(length), 0, length, 0);
      sample = buffer.subarray(0, bytesRead);
    } finally {
      await handle.close();
    }
  } catch (error) {
    return { ok: false, problem: unreadable(error, known.file) };
  }
  const encoding = guessEncoding(sample, sample.length === known.bytes);
  const text = textStart(encoding, sample.subarray(0, 256 * 1024));
  return { ok: true, value: { encoding, separator: guessSeparator(text), sheet: null } };
}

interface FirstRows {
  readonly columns: readonly string[];
  readonly rows: readonly (readonly string[])[];
}

async function firstRows(known: KnownFile, reading: Reading, most: number): Promise<Reply<FirstRows>> {
  let columns: readonly string[] = [];
  const rows: (readonly string[])[] = [];
  const end = await readRows(
    known,
    reading,
    {
      columns: (names) => {
        columns = names;
        return true;
      },
      rows: (more) => {
        rows.push(...more.slice(0, most - rows.length));
        return rows.length < most;
      },
    },
    { onProgress: () => undefined, signal: new AbortController().signal },
  );
  return end.ok ? { ok: true, value: { columns, rows } } : end;
}

function sheetRemarks(sheets: readonly string[], reading: Reading): readonly string[] {
  return sheets.length > 1 ? [`The workbook has ${sheets.length} sheets; "${reading.sheet ?? ''}" is read.`] : [];
}

function oddities(columns: readonly string[], rows: readonly (readonly string[])[]): readonly string[] {
  const ragged = rows.filter((row) => row.length !== columns.length && row.some((cell) => cell.trim() !== '')).length;
  const renamed = columns.filter((column) => /^(column \d+|.* \(\d+\))$/.test(column));
  return [
    ...(columns.length === 1 ? ['Only one column was found. If there should be more, change the separator.'] : []),
    ...(ragged > rows.length / 2
      ? [
          'Most rows differ from the heading in their number of cells. Take out what stands above it, or change the separator.',
        ]
      : []),
    ...(ragged > 0 ? [`${ragged} of the first ${rows.length} rows have more or fewer cells than the heading.`] : []),
    ...(renamed.length > 0 ? [`Columns without a name of their own are called ${renamed.join(', ')}.`] : []),
  ];
}
