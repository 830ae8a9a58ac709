import type { SheetChoices } from '../norms/norm-project.ts';
import { printNumber } from '../scores/printed-number.ts';
import { ROW, TABLE_HEAD, type TypeSize } from './type-sizes.ts';

/** How the rows of a table are set, in points. */
export interface TableType {
  /** Figures, and from one row to the next. */
  readonly row: TypeSize;
  readonly head: TypeSize;
  /** Extra room between two fives; 0 where rows stand evenly. */
  readonly gap: number;
}

/** Extra room between two fives of usual rows. */
const FIVE_GAP = 5;
/** Rows are at least so many times as high as their figures are large: lines set solid run into each other. */
const LEAST_LEADING = 1.15;
/** Heads are not chosen smaller than this. */
const LEAST_HEAD = 6;

/** The type that the sheet asks for, in whole tenths of a point where rows must be higher than asked. */
export function chosenType({ rowType, rowHeight, fives }: SheetChoices): TableType {
  const leading = Math.max(rowHeight, leastHeight(rowType));
  const headScale = Math.max(rowType / ROW.size, LEAST_HEAD / TABLE_HEAD.size);
  return {
    row: { size: rowType, leading },
    head: { size: TABLE_HEAD.size * headScale, leading: TABLE_HEAD.leading * headScale },
    gap: fives ? (FIVE_GAP * leading) / ROW.leading : 0,
  };
}

/** The same, smaller or larger as a whole. */
export function scaledType({ row, head, gap }: TableType, scale: number): TableType {
  const scaled = ({ size, leading }: TypeSize): TypeSize => ({ size: size * scale, leading: leading * scale });
  return { row: scaled(row), head: scaled(head), gap: gap * scale };
}

/** What could not be set as the sheet asks, as a sentence that tells what to do; null where all could. */
export function rowHeightRemark({ rowType, rowHeight }: SheetChoices): string | null {
  const least = leastHeight(rowType);
  if (rowHeight >= least) return null;
  return (
    `Rows of ${printNumber(rowHeight, 1)} points are too low for figures of ${printNumber(rowType, 1)} points; ` +
    `they are set ${printNumber(least, 1)} points high. Choose higher rows or smaller figures.`
  );
}

function leastHeight(rowType: number): number {
  const tenths = rowType * LEAST_LEADING * 10;
  return Math.ceil(tenths - 1e-9) / 10;
}
