import type { SheetChoices } from '../norms/norm-project.ts';
import type { ScoreScale } from '../scale/score-scale.ts';
import type { PlacedRow } from './booklet.ts';
import { inCountedFives, inFives } from './row-blocks.ts';

/** A row that has yet to be placed. */
export interface LooseRow extends Omit<PlacedRow, 'baseline'> {
  /** On which side of the row a rule marks a cut; null for none. */
  readonly cut: 'above' | 'below' | null;
}

/** Rows that stand together. */
export type Five = readonly LooseRow[];

/** Blocks of rows, one below the other. */
export type RowColumn = readonly Five[];

export interface RowMeasure {
  /** From one row to the next, in points. */
  readonly pitch: number;
  /** Extra room between two fives, in points. */
  readonly gap: number;
}

/**
 * Rows as the sheet asks for: in fives of the scale, in fives of printed rows where some stand for several scores or for
 * none, or each by itself, so that rows stand evenly.
 */
export function rowBlocks(
  rows: readonly LooseRow[],
  { fives, rangeRows }: Pick<SheetChoices, 'fives' | 'rangeRows'>,
  scale: ScoreScale | null,
): readonly Five[] {
  if (!fives) return rows.map((row) => [row]);
  return rangeRows || scale === null ? inCountedFives(rows) : inFives(rows, scale, ({ row }) => row);
}

/** Height of a column of rows, in points. */
export function columnHeight(column: RowColumn, { pitch, gap }: RowMeasure): number {
  const rows = column.reduce((sum, five) => sum + five.length, 0);
  return rows * pitch + Math.max(0, column.length - 1) * gap;
}

/**
 * As many rows as stand in `columns` columns of `height` points, in order, and the rows left over. Fives stay together
 * except where one is taller than a whole column. When nothing is left over, the columns are made as even as whole fives
 * allow, so that the table is no deeper than it must be.
 */
export function fillColumns(
  fives: readonly Five[],
  columns: number,
  height: number,
  measure: RowMeasure,
): { readonly columns: readonly RowColumn[]; readonly rest: readonly Five[] } {
  const full = filled(fives, columns, height, measure);
  if (full.rest.length > 0) return full;
  const heights = depths(full.columns, fives, measure).filter((depth) => depth <= height);
  const even = heights.map((depth) => filled(fives, columns, depth, measure)).find(({ rest }) => rest.length === 0);
  return even ?? full;
}

/** Depths that a column of whole fives can have, least first; none where a five had to be split. */
function depths(columns: readonly RowColumn[], fives: readonly Five[], measure: RowMeasure): readonly number[] {
  if (columns.reduce((sum, column) => sum + column.length, 0) !== fives.length) return [];
  const tallest = Math.max(...fives.map((five) => columnHeight([five], measure)));
  const limit = Math.max(...columns.map((column) => columnHeight(column, measure)));
  const found = new Set<number>();
  fives.forEach((_, start) => {
    for (let end = start + 1; end <= fives.length; end += 1) {
      const depth = columnHeight(fives.slice(start, end), measure);
      if (depth > limit) break;
      if (depth >= tallest) found.add(depth);
    }
  });
  return [...found].sort((left, right) => left - right);
}

/** Points by which sums of heights may differ in their last digits. */
const TRACE = 1e-6;

function filled(
  fives: readonly Five[],
  columns: number,
  height: number,
  measure: RowMeasure,
): { readonly columns: readonly RowColumn[]; readonly rest: readonly Five[] } {
  const done: Five[][] = [];
  let rest: readonly Five[] = fives;
  while (done.length < columns && rest.length > 0) {
    const column: Five[] = [];
    let [next] = rest;
    while (next !== undefined && columnHeight([...column, next], measure) <= height + TRACE) {
      column.push(next);
      rest = rest.slice(1);
      next = rest[0];
    }
    if (column.length === 0 && next !== undefined) {
      const rows = Math.max(1, Math.floor((height + TRACE) / measure.pitch));
      column.push(next.slice(0, rows));
      rest = [next.slice(rows), ...rest.slice(1)];
    }
    done.push(column);
  }
  return { columns: done, rest };
}
