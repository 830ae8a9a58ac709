import { basename } from 'node:path';
import type { Reply } from '../../shared-core/desk.ts';
import type { Roster, RosterPerson } from '../../shared-core/norms/erratum-roster.ts';
import { knowFile } from '../cohort-file/file-kind.ts';
import { readRows } from '../cohort-file/read-rows.ts';
import { chosenReading } from './chosen-reading.ts';
import type { CohortOptions } from './cohort-options.ts';

export type RosterRead =
  | { readonly kind: 'read'; readonly roster: Roster }
  | { readonly kind: 'no-such-column'; readonly problem: string }
  | { readonly kind: 'unreadable'; readonly problem: string };

/** Nobody watches, and an interrupt from the keyboard ends the program. */
const HOOKS = { onProgress: () => undefined, signal: new AbortController().signal } as const;

/** The people of a roster, one a row, in the order of the file. Empty rows hold nobody; all others are kept. */
export async function readRoster(path: string, options: CohortOptions): Promise<RosterRead> {
  const file = basename(path);
  const { score, id, by } = options.named;
  const chosen = await chosenReading(path, file, options);
  if (chosen.kind !== 'chosen') return chosen;
  const known = await knowFile(path, file);
  if (!known.ok) return { kind: 'unreadable', problem: known.problem };
  const people: RosterPerson[] = [];
  let columns: readonly string[] = [];
  const end: Reply<unknown> = await readRows(
    known.value,
    chosen.reading,
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
            person: id === null ? '' : cellOf(row, id),
            values: by.map((name) => cellOf(row, name)),
            score: cellOf(row, score),
          });
        });
        return true;
      },
    },
    HOOKS,
  );
  if (!end.ok) return { kind: 'unreadable', problem: end.problem };
  return { kind: 'read', roster: { people, decimalMark: chosen.reading.decimalMark } };
}
