import type { TableHead } from './booklet.ts';
import { RANGE_DASH, rangeSides } from './range-cell.ts';
import type { TableType } from './table-type.ts';
import { textWidth, type FontFace } from './text-width.ts';
import { ROW } from './type-sizes.ts';

/** A column of a table with the room that its own figures and head take, in points. */
export interface NaturalColumn {
  readonly head: Omit<TableHead, 'right' | 'width'>;
  readonly width: number;
}

/** Least room between two columns of usual figures, and the most that the eye can cross in a table that stands alone. */
const LEAST_GAP = 8;
const WIDEST_GAP = 42;

/** Heads of rows are set in bold. */
export function figureFace(column: number): FontFace {
  return column === 0 ? 'sans-bold' : 'sans';
}

/** Room for texts of one column, and where they are ranges, for what stands at and behind their dashes. */
export function roomOf(
  texts: Iterable<string>,
  face: FontFace,
  size: number,
  ranges: boolean,
): { readonly width: number; readonly range: TableHead['range'] } {
  const all = [...new Set(texts)];
  const sides = all.map(rangeSides);
  if (!ranges || sides.every(({ after }) => after === null)) {
    return { width: Math.max(0, ...all.map((text) => textWidth(text, face, size))), range: null };
  }
  const dash = textWidth(RANGE_DASH, face, size);
  const before = sides.map(({ upToDash, after }) => textWidth(upToDash, face, size) - (after === null ? 0 : dash));
  const after = Math.max(...sides.map((side) => textWidth(side.after ?? '', face, size)));
  return { width: Math.max(...before) + dash + after, range: { dash, after } };
}

/** Room for the lines of a head. */
export function headRoom(lines: readonly string[], note: string, { head }: TableType): number {
  return Math.max(textWidth(note, 'sans', head.size), ...lines.map((line) => textWidth(line, 'sans-bold', head.size)));
}

/** The same columns in a type that is smaller or larger as a whole. */
export function scaledColumns(natural: readonly NaturalColumn[], scale: number): readonly NaturalColumn[] {
  return natural.map(({ head, width }) => ({
    width: width * scale,
    head:
      head.range === null
        ? head
        : { ...head, range: { dash: head.range.dash * scale, after: head.range.after * scale } },
  }));
}

/** The least width that the columns can be set in; `behind` is kept free behind the last. */
export function leastWidth(natural: readonly NaturalColumn[], type: TableType, behind: number): number {
  return sumOf(natural) + natural.length * gapIn(type, LEAST_GAP) + behind;
}

/** Shares the room left between the columns of figures, half a share before the first. */
export function sharedWidth(
  natural: readonly NaturalColumn[],
  width: number,
  type: TableType,
  { alone, behind }: { readonly alone: boolean; readonly behind: number },
): { readonly width: number; readonly heads: readonly TableHead[] } {
  const share = (width - behind - sumOf(natural)) / (natural.length - 0.5);
  const gap = alone ? Math.min(share, gapIn(type, WIDEST_GAP)) : share;
  let right = -gap / 2;
  const heads = natural.map((column, index) => {
    const before = index === 0 ? gap / 2 : gap;
    right += gap + column.width;
    return { ...column.head, right, width: column.width + before };
  });
  return { width: right + behind, heads };
}

function gapIn({ row }: TableType, usual: number): number {
  return (usual * row.size) / ROW.size;
}

function sumOf(natural: readonly NaturalColumn[]): number {
  return natural.reduce((sum, { width }) => sum + width, 0);
}
