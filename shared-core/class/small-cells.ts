import { cellBounds, type CountLimits } from './cell-bounds.ts';
import {
  mapCells,
  rowTogether,
  withTotals,
  type CountRow,
  type TotalledRow,
  type TotalledTable,
} from './class-counts.ts';
import { withComplementaryCells } from './complementary-cells.ts';
import { countNetwork, isStandingAt, linkAt } from './count-network.ts';
import { smallCells } from './small-counts.ts';

/**
 * What is told of a count. A page prints one and the same sign for every hidden cell: `why` is for the person who makes
 * it. The bounds are those of the audit: what a reader can work out from the page, and what an insider can, who also
 * knows the rule, guesses rightly why each cell is hidden and, for a standing, knows of each group how many were tested
 * and how many had each status. `most` is Infinity where nothing limits the count.
 */
export type SuppressedCell =
  | { readonly kind: 'told'; readonly count: number }
  | {
      readonly kind: 'hidden';
      readonly why: 'small' | 'complementary';
      readonly byReader: CountLimits;
      readonly byInsider: CountLimits;
    };

/** Counts as they may be shared: the table; the class without its groups; or nothing, with the sentence that says why. */
export type SuppressedTable =
  | ({ readonly kind: 'table'; readonly below: number } & TotalledTable<SuppressedCell>)
  | {
      readonly kind: 'class-only';
      readonly below: number;
      readonly together: TotalledRow<SuppressedCell>;
      readonly sentence: string;
    }
  | { readonly kind: 'nothing'; readonly below: number; readonly sentence: string };

/** Stands wherever shared counts are made. */
export const SHARED_AGAIN_CAUTION =
  'Share these counts once. If they are shared again after a pupil has joined, left or been tested later, the difference between the two pages can tell that pupil’s standing.';

/**
 * The smallest count that is told where the policy's smallest cell is this many people. With 0 or 1 every count is told.
 * A smallest cell of 2 hides counts below 3: the sign for a hidden sum could otherwise only mean 1.
 */
export function smallestToldCount(smallestCell: number): number {
  if (!Number.isSafeInteger(smallestCell) || smallestCell < 0)
    throw new RangeError('a smallest cell is a whole number');
  return smallestCell === 2 ? 3 : Math.max(1, smallestCell);
}

/** How many must have been tested, in times the smallest count that is told, where any count is small. */
const LEAST_OF_A_CLASS = 2;
const LEAST_FOR_EACH_STANDING_OF_A_GROUP = 1.5;

/**
 * A table of counts of pupils, made fit to be shared. Small counts are hidden (`smallCells`), and so many others that no
 * hidden one can be worked out (`withComplementaryCells`); an audit proves it by the exact bounds of every hidden cell:
 * - a reader of the page, for whom a hidden count is 0 or more, is left with at least `below` possible counts;
 * - an insider, as `SuppressedCell` describes one, is left with at least two.
 * The pattern follows from which cells are small, and every table that the insider thinks possible for the standings has
 * the same ones: all of them lead to the same page, and running this program on guesses rules out none.
 *
 * Where no count is small, all are told. Otherwise what is told follows, but for the audit, from how many were tested:
 * counts of the class where nobody was, or at least 2 × `below`; counts by group where each group has nobody, or at least
 * 1.5 × `below` for each standing. In smaller groups nearly all would be hidden, and many counts of the class with them.
 * Where the audit fails, nothing is told: fewer cells told because it failed would themselves tell something. That bounds are audited is common practice in statistical
 * disclosure control; the thresholds are this program's own.
 *
 * To be kept by who calls: no other number on the page tells a hidden count (an n beside a mean, a list that can be
 * counted), and the same class is not shared twice (`SHARED_AGAIN_CAUTION`).
 */
export function suppressed(rows: readonly CountRow[], smallestCell: number): SuppressedTable {
  const below = smallestToldCount(smallestCell);
  const undivided = rowTogether(rows);
  if (rows.length > 1 && isTold(rows, below, LEAST_FOR_EACH_STANDING_OF_A_GROUP * undivided.standings.length)) {
    const whole = auditedTable(rows, below);
    if (whole !== null) return { kind: 'table', below, ...whole };
    return nothing(below, 'Share the class without its groups, or with fewer of them.');
  }
  const whole = isTold([undivided], below, LEAST_OF_A_CLASS) ? auditedTable([undivided], below) : null;
  if (whole === null) return nothing(below, 'Share the pages with names or codes with those who may see them.');
  if (rows.length === 1) return { kind: 'table', below, ...whole };
  return {
    kind: 'class-only',
    below,
    together: whole.together,
    sentence: `Counts by group are left out: not all groups are large enough to hide counts below ${below} in them.`,
  };
}

/** No row has too few tested to be told, or no count is small. `least` is in times `below`. */
function isTold(rows: readonly CountRow[], below: number, least: number): boolean {
  const table = withTotals(rows);
  const areLarge = table.rows.every(({ tested }) => tested === 0 || tested >= least * below);
  return areLarge || smallCells(table, below).every((small) => small === null);
}

function nothing(below: number, instead: string): SuppressedTable {
  const sentence = `No counts are told: counts below ${below} could be worked out from the others. ${instead}`;
  return { kind: 'nothing', below, sentence };
}

/** The table with what may be told of it, or null where the audit fails. */
function auditedTable(rows: readonly CountRow[], below: number): TotalledTable<SuppressedCell> | null {
  const table = withTotals(rows);
  const network = countNetwork(table);
  const small = smallCells(table, below);
  const isSmall = (cell: number): boolean => (small[cell] ?? null) !== null;
  const hidden = withComplementaryCells(network, isSmall, rows.length > 1 ? 2 : 1);
  const exactly = (cell: number): CountLimits => {
    const { count } = linkAt(network, cell);
    return { least: count, most: count };
  };
  const limits = (ofHidden: (cell: number) => CountLimits): readonly CountLimits[] =>
    network.links.map((_, cell) => (hidden.has(cell) ? ofHidden(cell) : exactly(cell)));
  const byReader = limits(() => ({ least: 0, most: Infinity }));
  const knowingWhy = limits((cell) => small[cell] ?? { least: below, most: Infinity });
  const knowingSums = knowingWhy.map((limit, cell) => (isStandingAt(network, cell) ? limit : exactly(cell)));
  const byInsider = (cell: number): readonly CountLimits[] => (isStandingAt(network, cell) ? knowingSums : knowingWhy);
  const isProtected = (cell: number): boolean =>
    hasWidth(cellBounds(network, byReader, cell, below - 1), below - 1) &&
    hasWidth(cellBounds(network, byInsider(cell), cell, 1), 1);
  if (![...hidden].every(isProtected)) return null;
  let visited = -1;
  return mapCells(table, (count): SuppressedCell => {
    visited += 1;
    if (!hidden.has(visited)) return { kind: 'told', count };
    return {
      kind: 'hidden',
      why: isSmall(visited) ? 'small' : 'complementary',
      byReader: cellBounds(network, byReader, visited),
      byInsider: cellBounds(network, byInsider(visited), visited),
    };
  });
}

function hasWidth({ least, most }: CountLimits, width: number): boolean {
  return most - least >= width;
}
