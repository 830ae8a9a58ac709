import type { SheetChoices } from '../norms/norm-project.ts';
import type { ScoreScale } from '../scale/score-scale.ts';
import type { ColumnTable, PlacedCell } from './booklet.ts';
import { rowBlocks, type Five } from './table-rows.ts';

/** A table with the groups across. */
export interface AcrossTable {
  readonly table: ColumnTable;
  /** Lines above the heads of the rows. */
  readonly rowHead: readonly string[];
  readonly groups: readonly AcrossGroup[];
  readonly rows: readonly AcrossRow[];
  /** The scale of the raw scores that head the rows; null where something else does. */
  readonly scale: ScoreScale | null;
}

export interface AcrossGroup {
  readonly title: string;
  /** How many people it has, as it is printed under the title. */
  readonly note: string;
}

export interface AcrossRow {
  readonly row: number;
  readonly scores: readonly number[];
  readonly head: PlacedCell;
  /** One for each group. */
  readonly cells: readonly PlacedCell[];
}

/** Groups that stand side by side, and whether the heads of the rows stand at the right edge once more. */
export interface AcrossSpan {
  /** Position of the first group, and how many there are. */
  readonly first: number;
  readonly count: number;
  readonly bothEdges: boolean;
}

/** The rows of some groups as the sheet asks for. */
export function acrossRows(
  { rows, scale }: AcrossTable,
  { first, count, bothEdges }: AcrossSpan,
  { fives }: SheetChoices,
): readonly Five[] {
  const loose = rows.map(({ row, scores, head, cells }) => ({
    row,
    scores,
    cells: [head, ...cells.slice(first, first + count), ...(bothEdges ? [head] : [])],
    cut: null,
  }));
  return rowBlocks(loose, { fives, rangeRows: false }, scale);
}
