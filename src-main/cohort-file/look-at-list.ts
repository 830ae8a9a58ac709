import { MOST_CLASS_ROWS } from '../../shared-core/class/class-list.ts';
import { listedRows, type ListedRow } from '../../shared-core/class/pasted-rows.ts';
import type { ListedFile, Reply } from '../../shared-core/desk.ts';
import { knowFile, type KnownFile } from './file-kind.ts';
import { plainReading } from './guess-reading.ts';
import { guessSplit } from './look-at-cohort.ts';
import { readRows, sheetsOf } from './read-rows.ts';
import { NOTHING_IN_FILE } from './row-numbering.ts';

/** Rows that are read: as many as a class may have, and room for headings, blanks and a sentence about more. */
const MOST_ROWS = 2 * MOST_CLASS_ROWS;

/**
 * The rows of a class list in a file of any kind that cohorts are read from, all of them as data: which of them is a
 * heading is asked later. `file` is the name that sentences say; without a sheet, the first is read that holds anything.
 */
export async function lookAtList(path: string, file: string, sheet: string | null): Promise<Reply<ListedFile>> {
  const known = await knowFile(path, file);
  if (!known.ok) return known;
  const found = await sheetsOf(known.value);
  if (!found.ok) return found;
  const sheets = found.value;
  if (sheet !== null && !sheets.includes(sheet)) {
    return { ok: false, problem: `${file} has no sheet “${sheet}”. Choose one of those it has.` };
  }
  const asked = sheets.length === 0 || sheet !== null ? [sheet] : sheets;
  for (const one of asked) {
    const read = await rowsOf(known.value, one);
    if (!read.ok) return read;
    const { rows, more } = read.value;
    if (rows.length > 0) {
      return { ok: true, value: { file, sheets, sheet: one, rows, remarks: remarks(sheets, one, more) } };
    }
  }
  return { ok: false, problem: `There is nothing in ${file}. Choose the file that holds the class list.` };
}

interface RowsRead {
  /** Empty where there is nothing but blanks. */
  readonly rows: readonly ListedRow[];
  /** True where the file goes on. */
  readonly more: boolean;
}

async function rowsOf(known: KnownFile, sheet: string | null): Promise<Reply<RowsRead>> {
  const split =
    known.kind === 'text'
      ? await guessSplit(known)
      : { ok: true as const, value: { encoding: 'utf-8' as const, separator: ',' as const, sheet } };
  if (!split.ok) return split;
  const rows: ListedRow[] = [];
  let more = false;
  const end = await readRows(
    known,
    plainReading(split.value),
    {
      columns: () => true,
      rows: (read, first) => {
        const room = MOST_ROWS - rows.length;
        rows.push(...listedRows(read.slice(0, room), first));
        more = read.length > room;
        return !more;
      },
    },
    { onProgress: () => undefined, signal: new AbortController().signal },
  );
  if (end.ok) return { ok: true, value: { rows, more } };
  return end.problem === NOTHING_IN_FILE ? { ok: true, value: { rows: [], more: false } } : end;
}

function remarks(sheets: readonly string[], sheet: string | null, more: boolean): readonly string[] {
  return [
    ...(sheets.length > 1 ? [`The workbook has ${sheets.length} sheets; “${sheet ?? ''}” is read.`] : []),
    ...(more ? [`Only the first ${MOST_ROWS} rows were read. Choose a file that holds one class.`] : []),
  ];
}
