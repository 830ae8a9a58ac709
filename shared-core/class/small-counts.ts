import type { CountLimits } from './cell-bounds.ts';
import { mapCells, type TotalledTable } from './class-counts.ts';

/**
 * Which cells are hidden because of their own count, in the order of `mapCells`: for each of these the counts that the
 * rule alone leaves open, for the others null. `below` is the smallest count that is told, 1 where all are.
 *
 * A standing is small from 0 to `below` − 1, a sum or a status from 1: that nobody of a group stands in a quarter tells
 * something of each of its pupils, and all but a few in one quarter tell of nearly all; that nobody is absent tells
 * nothing of a score. The parts of a small sum are small with it. A 0 is told all the same where it follows from one that
 * is told: nobody was tested, or nobody of the class has the status.
 *
 * Tables in which the cells found here keep within their limits, and the others are at `below` or above, or 0 as before,
 * have the same small cells.
 */
export function smallCells(table: TotalledTable<number>, below: number): readonly (CountLimits | null)[] {
  const isSmall = (count: number): boolean => count > 0 && count < below;
  const { together } = table;
  const found: (CountLimits | null)[] = [];
  mapCells(table, (count, { row, kind, column }) => {
    const own = row === null ? together : (table.rows[row] ?? together);
    const wholes = {
      standing: [own.tested, own.total, together.standings[column] ?? 0, together.tested, together.total],
      tested: [own.total, together.tested, together.total],
      status: [own.total, together.statuses[column] ?? 0, together.total],
      total: [together.total],
    }[kind];
    const followsFromNone = {
      standing: own.tested === 0 && ![own.total, together.tested, together.total].some(isSmall),
      tested: together.tested === 0,
      status: together.statuses[column] === 0,
      total: false,
    }[kind];
    const isCountedFrom0 = kind === 'standing' && own.standings.length > 1;
    if (below <= 1 || followsFromNone || (kind === 'standing' && together.tested === 0)) found.push(null);
    else if (isCountedFrom0 ? count < below || wholes.some(isSmall) : isSmall(count) || wholes.some(isSmall)) {
      // Were the sum of a status or of the tested 0, their parts would be told.
      const isAtLeast1 = row === null ? kind !== 'standing' : !isCountedFrom0 && !wholes.some(isSmall);
      found.push({ least: isAtLeast1 ? 1 : 0, most: below - 1 });
    } else found.push(null);
  });
  return found;
}
