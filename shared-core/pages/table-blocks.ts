import { ADJUSTED_MARK } from '../norms/adjustment-words.ts';
import type { ColumnTable, PlacedCell, Rule, TableColumnBlock, TableHead, TextLine } from './booklet.ts';
import { figureFace } from './column-widths.ts';
import { rangeSides } from './range-cell.ts';
import type { TableMeasure } from './table-measure.ts';
import { columnHeight, type RowColumn, type RowMeasure } from './table-rows.ts';
import { REPEATED, type CellRole, type TextRole } from './text-role.ts';
import { textWidth, type FontFace } from './text-width.ts';
import { FINE_RULE, GUTTER, STRONG_RULE, type TypeSize } from './type-sizes.ts';

const HEAD_PADDING = 4;
const ABOVE_ROWS = 3;
const BELOW_ROWS = 4;
/** Share of a line of rows above its baseline. */
const ABOVE_BASELINE = 0.72;

export function rowMeasure({ type }: TableMeasure): RowMeasure {
  return { pitch: type.row.leading, gap: type.gap };
}

/** Height of heads, rules and the room around the rows, in points. */
export function tableOverhead({ heads, type }: TableMeasure): number {
  return headHeight(heads, type.head) + ABOVE_ROWS + BELOW_ROWS;
}

function headHeight(heads: readonly TableHead[], { leading }: TypeSize): number {
  return Math.max(...heads.map((head) => linesIn(head).length)) * leading + 2 * HEAD_PADDING;
}

function linesIn({ lines, note }: TableHead): readonly string[] {
  return note === '' ? lines : [...lines, note];
}

/** Columns of rows side by side, all between the same lines; `continued` where the table began on an earlier page. */
export function placeTable(
  table: ColumnTable,
  columns: readonly RowColumn[],
  measure: TableMeasure,
  place: { readonly x: number; readonly top: number; readonly continued: boolean },
): { readonly blocks: readonly TableColumnBlock[]; readonly height: number } {
  const { type, heads } = measure;
  const rows = rowMeasure(measure);
  const headRule = place.top + headHeight(heads, type.head);
  const deepest = Math.max(...columns.map((column) => columnHeight(column, rows)));
  const bottom = headRule + ABOVE_ROWS + deepest + BELOW_ROWS;
  const blocks = columns.map((column, index): TableColumnBlock => {
    const again = place.continued || index > 0;
    return {
      kind: 'table-column',
      table,
      x: place.x + index * (measure.width + GUTTER),
      width: measure.width,
      top: place.top,
      headRule,
      bottom,
      size: type.row.size,
      headType: type.head,
      heads: again ? heads.map(printedAgain) : heads,
      ...placeRows(column, headRule + ABOVE_ROWS, rows),
    };
  });
  return { blocks, height: bottom - place.top };
}

function printedAgain(head: TableHead): TableHead {
  return head.repeated === 'nothing' ? { ...head, repeated: 'head' } : head;
}

function placeRows(
  column: RowColumn,
  top: number,
  { pitch, gap }: RowMeasure,
): Pick<TableColumnBlock, 'rows' | 'cutRules'> {
  let y = top;
  const cutRules: number[] = [];
  const rows = column.flatMap((five, block) => {
    if (block > 0) y += gap;
    return five.map(({ cut, ...row }, index) => {
      const [above, below] = [index === 0 && block > 0, index === five.length - 1 && block < column.length - 1];
      if (cut === 'above') cutRules.push(y - (above ? gap / 2 : 0));
      const baseline = y + pitch * ABOVE_BASELINE;
      y += pitch;
      if (cut === 'below') cutRules.push(y + (below ? gap / 2 : 0));
      return { ...row, baseline };
    });
  });
  return { rows, cutRules };
}

/** A column of rows as lines of text and rules: what is drawn of it. */
export function tableMarks(block: TableColumnBlock): readonly (TextLine | Rule)[] {
  const rule = (y: number, weight: number): Rule => ({ kind: 'rule', x: block.x, y, width: block.width, weight });
  return [
    rule(block.top, STRONG_RULE),
    rule(block.headRule, FINE_RULE),
    rule(block.bottom, STRONG_RULE),
    ...block.cutRules.map((y) => rule(y, FINE_RULE)),
    ...block.heads.flatMap((head) => headLines(block, head)),
    ...block.rows.flatMap(({ row, baseline, cells }) =>
      cells.flatMap((cell, index) => {
        const head = block.heads[index];
        if (head === undefined) throw new RangeError('a cell without a head');
        return cell.text === '' ? [] : cellLines(block, head, cell, row, baseline);
      }),
    ),
  ];
}

function headLines(block: TableColumnBlock, head: TableHead): readonly TextLine[] {
  const { size, leading } = block.headType;
  const role = head.repeated === 'nothing' ? roleOf(block, 'head', head, head.said) : REPEATED;
  const lines = linesIn(head);
  return lines.map((line, place) => {
    const baseline = block.headRule - HEAD_PADDING - 1.5 - (lines.length - 1 - place) * leading;
    return lineIn(block, head, line, { baseline, size, role, face: place < head.lines.length ? 'sans-bold' : 'sans' });
  });
}

/** The text of a cell, and its mark, which hangs behind so that figures stay under figures. */
function cellLines(
  block: TableColumnBlock,
  head: TableHead,
  { text, said, marked }: PlacedCell,
  row: number,
  baseline: number,
): readonly TextLine[] {
  const role = head.repeated === 'column' ? REPEATED : roleOf(block, row, head, said);
  const face = figureFace(head.column);
  const printed = lineIn(block, head, text, { baseline, size: block.size, role, face });
  const aligned = { ...printed, width: printed.width - leftBehind(text, head, face, block.size) };
  if (!marked) return [aligned];
  const mark: TextLine = {
    ...printed,
    x: block.x + head.right,
    width: textWidth(ADJUSTED_MARK, 'sans', block.size),
    align: 'left',
    runs: [{ text: ADJUSTED_MARK, face: 'sans' }],
  };
  return [aligned, mark];
}

function lineIn(
  { x }: TableColumnBlock,
  { right, width, align }: TableHead,
  text: string,
  set: { readonly baseline: number; readonly size: number; readonly role: TextRole; readonly face: FontFace },
): TextLine {
  const { baseline, size, role, face } = set;
  const runs = [{ text, face }];
  return { kind: 'text', x: x + right - width, baseline, width, align, size, colour: 'ink', runs, role };
}

/** A cell of the whole table: its first column heads the rows. */
function roleOf(
  { table }: TableColumnBlock,
  row: CellRole['row'],
  { column }: TableHead,
  said: string | null,
): CellRole {
  const headOf = row === 'head' ? 'column' : column === 0 ? 'row' : null;
  return { kind: 'cell', table, row, column, headOf, said };
}

/** Points between the end of a cell's text and the end of its column. */
function leftBehind(text: string, { range }: TableHead, face: FontFace, size: number): number {
  if (range === null) return 0;
  const { after } = rangeSides(text);
  return after === null ? range.after + range.dash : range.after - textWidth(after, face, size);
}
