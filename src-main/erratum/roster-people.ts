import type { Reply } from '../../shared-core/desk.ts';
import type { Roster, RosterPerson } from '../../shared-core/norms/erratum-roster.ts';
import type { Reading } from '../../shared-core/norms/reading.ts';
import { knowFile } from '../cohort-file/file-kind.ts';
import { readRows } from '../cohort-file/read-rows.ts';

/** The columns of a roster by the work they do. */
export interface RosterColumns {
  readonly score: string;
  /** Names or codes; null where people are told by their row. */
  readonly person: string | null;
  /** The values of the group, one column for each grouping column of the editions, in their order. */
  readonly by: readonly string[];
}

/** Nobody watches, and an interrupt ends the program or the thread. */
const HOOKS = { onProgress: () => undefined, signal: new AbortController().signal } as const;

/**
 * The people of a roster, one a row, in the order of the file. Empty rows hold nobody; all others are kept. `file` is the
 * name that sentences say.
 */
export async function rosterPeople(
  path: string,
  file: string,
  reading: Reading,
  { score, person, by }: RosterColumns,
): Promise<Reply<Roster>> {
  const known = await knowFile(path, file);
  if (!known.ok) return known;
  const people: RosterPerson[] = [];
  let columns: readonly string[] = [];
  const end: Reply<unknown> = await readRows(
    known.value,
    reading,
    {
      columns: (names) => {
        columns = names;
        return true;
      },
      rows: (rows, firstNumber) => {
        const cellOf = (row: readonly string[], name: string): string => (row[columns.indexOf(name)] ?? '').trim();
        rows.forEach((row, index) => {
          if (row.every((cell) => cell.trim() === '')) return;
          people.push({
            row: firstNumber + index,
            person: person === null ? '' : cellOf(row, person),
            values: by.map((name) => cellOf(row, name)),
            score: cellOf(row, score),
          });
        });
        return true;
      },
    },
    HOOKS,
  );
  return end.ok ? { ok: true, value: { people, decimalMark: reading.decimalMark } } : end;
}
