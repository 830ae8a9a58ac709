import { ADJUSTED_MARK } from '../norms/adjustment-words.ts';
import type { Block, TextLine } from './booklet.ts';
import type { PictureSize } from './ogive-picture.ts';
import type { MeasuredRowTable, PlacedColumn } from './row-table-measure.ts';
import type { SheetFlow } from './sheet-flow.ts';
import { REPEATED, type CellRole, type TextRole } from './text-role.ts';
import { textWidth } from './text-width.ts';
import { FINE_RULE, ROW, STRONG_RULE, TABLE_HEAD } from './type-sizes.ts';

/** A table with a row for each of many people or things, over as many pages as it takes. */
export interface RowTable {
  /** Unique among the tables of a sheet. */
  readonly name: string;
  /** The first heads the rows. */
  readonly columns: readonly RowTableColumn[];
  /** True where rows stand in fives. */
  readonly fives: boolean;
  /** A picture that goes along the rows behind the last column. */
  readonly chart: RowChart | null;
}

export interface RowTableColumn {
  readonly heading: readonly string[];
  /** Words begin at the left and go on in further lines; figures end at the right. */
  readonly kind: 'words' | 'figures';
  readonly bold: boolean;
  readonly cells: readonly RowTableCell[];
}

export interface RowTableCell {
  readonly text: string;
  /** How it is read aloud where its signs would not say it. */
  readonly said: string | null;
}

export interface RowChart {
  /** Least width that shows something, points. */
  readonly leastWidth: number;
  /** The picture of some rows: where the middle of each is, from the top of the picture, and where the rule of the heads. */
  readonly draw: (
    rows: readonly { readonly row: number; readonly middle: number }[],
    size: PictureSize,
    headRule: number,
  ) => { readonly svg: string; readonly alt: string };
}

const ROWS_IN_FIVE = 5;
const FIVE_GAP = 5;
const HEAD_PADDING = 4;
const ABOVE_ROWS = 3;
const BELOW_ROWS = 4;
const ABOVE_BASELINE = 0.72;
/** Middle of small letters and figures above the baseline, in type sizes. */
const MIDDLE = 0.32;

/** The table from where the pen stands, with its heads on every page; rows stand in fives, and no row is divided. */
export function layRowTable(flow: SheetFlow, table: RowTable, measure: MeasuredRowTable): void {
  const overhead = headHeight(measure) + ABOVE_ROWS + BELOW_ROWS;
  let rest = fives(table, measure);
  let continued = false;
  while (rest.length > 0) {
    flow.need(overhead + heightOf(measure, rest[0] ?? []));
    const taken = takenFrom(rest, flow.room - overhead, measure);
    const { blocks, height } = placePart(table, measure, taken, { x: flow.left, top: flow.y }, continued);
    flow.place(blocks, height);
    rest = withoutRows(rest, taken.flat());
    continued = true;
    if (rest.length > 0) flow.turn();
  }
}

/** The whole table in one piece, wherever it is wanted. */
export function placeRowTable(
  table: RowTable,
  measure: MeasuredRowTable,
  place: { readonly x: number; readonly top: number },
): { readonly blocks: readonly Block[]; readonly height: number } {
  return placePart(table, measure, fives(table, measure), place, false);
}

/** Places of rows that stand together. */
type Five = readonly number[];

function fives(table: RowTable, { rowLines }: MeasuredRowTable): readonly Five[] {
  const all = rowLines.map((_, row) => row);
  if (!table.fives) return all.length === 0 ? [] : [all];
  return Array.from({ length: Math.ceil(all.length / ROWS_IN_FIVE) }, (_, five) =>
    all.slice(five * ROWS_IN_FIVE, (five + 1) * ROWS_IN_FIVE),
  );
}

/** The fives that find room; where not even the first does, the rows of it that do, one at least. */
function takenFrom(rest: readonly Five[], room: number, measure: MeasuredRowTable): readonly Five[] {
  const taken: Five[] = [];
  const used = (): number => allFives(measure, taken);
  for (const five of rest) {
    if (used() + (taken.length > 0 ? FIVE_GAP * measure.scale : 0) + heightOf(measure, five) > room) break;
    taken.push(five);
  }
  if (taken.length > 0) return taken;
  const [first = []] = rest;
  let count = 1;
  while (count < first.length && heightOf(measure, first.slice(0, count + 1)) <= room) count += 1;
  return [first.slice(0, count)];
}

function withoutRows(rest: readonly Five[], gone: readonly number[]): readonly Five[] {
  return rest.map((five) => five.filter((row) => !gone.includes(row))).filter((five) => five.length > 0);
}

function heightOf({ rowLines, scale }: MeasuredRowTable, rows: Five): number {
  return rows.reduce((sum, row) => sum + (rowLines[row] ?? 1), 0) * ROW.leading * scale;
}

function allFives(measure: MeasuredRowTable, taken: readonly Five[]): number {
  const gaps = Math.max(0, taken.length - 1) * FIVE_GAP * measure.scale;
  return taken.reduce((sum, five) => sum + heightOf(measure, five), gaps);
}

function headHeight({ columns, scale }: MeasuredRowTable): number {
  return Math.max(...columns.map(({ heading }) => heading.length)) * TABLE_HEAD.leading * scale + 2 * HEAD_PADDING;
}

function placePart(
  table: RowTable,
  measure: MeasuredRowTable,
  taken: readonly Five[],
  { x: left, top }: { readonly x: number; readonly top: number },
  continued: boolean,
): { readonly blocks: readonly Block[]; readonly height: number } {
  const { scale, columns, width, chart } = measure;
  const headRule = top + headHeight(measure);
  const bottom = headRule + ABOVE_ROWS + allFives(measure, taken) + BELOW_ROWS;
  const rule = (y: number, weight: number): Block => ({ kind: 'rule', x: left, y, width, weight });
  const place: CellPlace = { table: table.name, left, scale };
  const middles: { readonly row: number; readonly middle: number }[] = [];
  let y = headRule + ABOVE_ROWS;
  const rows = taken.flatMap((five, index) => {
    if (index > 0) y += FIVE_GAP * scale;
    return five.flatMap((row) => {
      const baseline = y + ROW.leading * scale * ABOVE_BASELINE;
      middles.push({ row, middle: baseline - MIDDLE * ROW.size * scale });
      y += heightOf(measure, [row]);
      return columns.flatMap((column, at) => cellLines(place, column, at, row, baseline));
    });
  });
  return {
    blocks: [
      rule(top, STRONG_RULE),
      rule(headRule, FINE_RULE),
      rule(bottom, STRONG_RULE),
      ...columns.flatMap((column, at) => headLines(place, column, at, headRule, continued)),
      ...rows,
      ...(chart === null || table.chart === null
        ? []
        : [chartOf(table.chart, { x: left + chart.x, width: chart.width, top, headRule, bottom }, middles)]),
    ],
    height: bottom - top,
  };
}

interface ChartPlace {
  readonly x: number;
  readonly width: number;
  readonly top: number;
  readonly headRule: number;
  readonly bottom: number;
}

function chartOf(
  chart: RowChart,
  { x, width, top, headRule, bottom }: ChartPlace,
  middles: readonly { readonly row: number; readonly middle: number }[],
): Block {
  const y = top + 1;
  const height = bottom - 1 - y;
  const rows = middles.map(({ row, middle }) => ({ row, middle: middle - y }));
  return { kind: 'picture', x, y, width, height, ...chart.draw(rows, { width, height }, headRule - y) };
}

interface CellPlace {
  readonly table: string;
  readonly left: number;
  readonly scale: number;
}

function headLines(
  { table, left, scale }: CellPlace,
  { heading, said, x, width, kind }: PlacedColumn,
  column: number,
  headRule: number,
  continued: boolean,
): readonly TextLine[] {
  const role: TextRole = continued ? REPEATED : { kind: 'cell', table, row: 'head', column, headOf: 'column', said };
  return heading.map((text, place) => ({
    kind: 'text',
    x: left + x,
    baseline: headRule - HEAD_PADDING - 1.5 - (heading.length - 1 - place) * TABLE_HEAD.leading * scale,
    width,
    align: kind === 'words' ? 'left' : 'right',
    size: TABLE_HEAD.size * scale,
    colour: 'ink',
    runs: [{ text, face: 'sans-bold' }],
    role,
  }));
}

function cellLines(
  { table, left, scale }: CellPlace,
  { x, width, kind, bold, cells }: PlacedColumn,
  column: number,
  row: number,
  baseline: number,
): readonly TextLine[] {
  const cell = cells[row];
  if (cell === undefined) throw new RangeError('a row without a cell');
  const role: CellRole = { kind: 'cell', table, row, column, headOf: column === 0 ? 'row' : null, said: cell.said };
  const face = bold ? 'sans-bold' : 'sans';
  const size = ROW.size * scale;
  const line = (text: string, place: number, behind: number): TextLine => ({
    kind: 'text',
    x: left + x,
    baseline: baseline + place * ROW.leading * scale,
    width: width - behind,
    align: kind === 'words' ? 'left' : 'right',
    size,
    colour: 'ink',
    runs: [{ text, face }],
    role,
  });
  const lines = cell.lines.map((text, place) => line(text, place, cell.behind));
  if (!cell.marked) return lines;
  const mark: TextLine = {
    ...line(ADJUSTED_MARK, 0, 0),
    x: left + x + width,
    width: textWidth(ADJUSTED_MARK, face, size),
    align: 'left',
  };
  return [...lines, mark];
}
