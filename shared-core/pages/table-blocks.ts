import { ADJUSTED_MARK } from '../norms/adjustment-words.ts';
import type { TableColumn } from '../norms/table-columns.ts';
import type { Rule, TableColumnBlock, TableHead, TextLine } from './booklet.ts';
import { rangeSides } from './range-cell.ts';
import { spokenFigure, spokenHead } from './spoken-text.ts';
import { cellText } from './sheet-texts.ts';
import type { TableMeasure } from './table-measure.ts';
import { columnHeight, type RowColumn, type RowMeasure } from './table-rows.ts';
import { REPEATED, type CellRole, type TextRole } from './text-role.ts';
import { textWidth } from './text-width.ts';
import { FINE_RULE, GUTTER, ROW, STRONG_RULE, TABLE_HEAD } from './type-sizes.ts';

/** Extra room between two fives. */
const FIVE_GAP = 5;
const HEAD_PADDING = 4;
const ABOVE_ROWS = 3;
const BELOW_ROWS = 4;
/** Share of a line of rows above its baseline. */
const ABOVE_BASELINE = 0.72;
/** How the mark behind a rank is read aloud. */
const ADJUSTED_IN_WORDS = 'adjusted by hand';

export function rowMeasure({ typeScale }: TableMeasure): RowMeasure {
  return { pitch: ROW.leading * typeScale, gap: FIVE_GAP * typeScale };
}

/** Height of heads, rules and the room around the rows, in points. */
export function tableOverhead({ heads, typeScale }: TableMeasure): number {
  return (
    headHeight(
      heads.map(({ lines }) => lines.length),
      typeScale,
    ) +
    ABOVE_ROWS +
    BELOW_ROWS
  );
}

function headHeight(lineCounts: readonly number[], typeScale: number): number {
  return Math.max(...lineCounts) * TABLE_HEAD.leading * typeScale + 2 * HEAD_PADDING;
}

/** Columns of rows side by side, all between the same lines; `continued` where the table began on an earlier page. */
export function placeTable(
  columns: readonly RowColumn[],
  tableColumns: readonly TableColumn[],
  measure: TableMeasure,
  place: { readonly x: number; readonly top: number; readonly continued: boolean },
): { readonly blocks: readonly TableColumnBlock[]; readonly height: number } {
  const rows = rowMeasure(measure);
  const { typeScale } = measure;
  const headRule =
    place.top +
    headHeight(
      measure.heads.map(({ lines }) => lines.length),
      typeScale,
    );
  const deepest = Math.max(...columns.map((column) => columnHeight(column, rows)));
  const bottom = headRule + ABOVE_ROWS + deepest + BELOW_ROWS;
  const blocks = columns.map((column, index): TableColumnBlock => {
    let y = headRule + ABOVE_ROWS;
    return {
      kind: 'table-column',
      x: place.x + index * (measure.width + GUTTER),
      width: measure.width,
      top: place.top,
      headRule,
      bottom,
      size: ROW.size * typeScale,
      continued: place.continued || index > 0,
      heads: measure.heads,
      rows: column.flatMap((five, block) => {
        if (block > 0) y += rows.gap;
        return five.map((row) => {
          const baseline = y + rows.pitch * ABOVE_BASELINE;
          y += rows.pitch;
          return {
            score: row.score,
            baseline,
            texts: tableColumns.map((head) => cellText(row, head)),
            adjusted: row.adjusted !== null,
          };
        });
      }),
    };
  });
  return { blocks, height: bottom - place.top };
}

/** A column of rows as lines of text and rules: what is drawn of it. */
export function tableMarks(block: TableColumnBlock): readonly (TextLine | Rule)[] {
  const typeScale = block.size / ROW.size;
  const rule = (y: number, weight: number): Rule => ({ kind: 'rule', x: block.x, y, width: block.width, weight });
  const headOf = (index: number): TableHead => {
    const head = block.heads[index];
    if (head === undefined) throw new RangeError('a cell without a head');
    return head;
  };
  const figure = (
    index: number,
    text: string,
    role: TextRole,
    baseline: number,
    size: number,
    bold: boolean,
    left = 0,
  ): TextLine => {
    const head = headOf(index);
    return {
      kind: 'text',
      x: block.x + head.right - head.width,
      baseline,
      width: head.width - left,
      align: 'right',
      size,
      colour: 'ink',
      runs: [{ text, face: bold ? 'sans-bold' : 'sans' }],
      role,
    };
  };
  return [
    rule(block.top, STRONG_RULE),
    rule(block.headRule, FINE_RULE),
    rule(block.bottom, STRONG_RULE),
    ...block.heads.flatMap(({ lines }, index) =>
      lines.map((line, place) => {
        const up = (lines.length - 1 - place) * TABLE_HEAD.leading * typeScale;
        const role = block.continued ? REPEATED : cell('head', index, spokenHead(lines));
        return figure(index, line, role, block.headRule - HEAD_PADDING - 1.5 - up, TABLE_HEAD.size * typeScale, true);
      }),
    ),
    ...block.rows.flatMap(({ score, baseline, texts, adjusted }) =>
      texts.flatMap((text, index) => {
        const marked = adjusted && headOf(index).key === 'rank';
        const figureSaid = spokenFigure(text);
        const role = cell(score, index, marked ? `${figureSaid ?? text}, ${ADJUSTED_IN_WORDS}` : figureSaid);
        const left = leftBehind(text, headOf(index), block.size);
        const printed = figure(index, text, role, baseline, block.size, index === 0, left);
        return marked ? [printed, adjustedMark(block, baseline, role)] : [printed];
      }),
    ),
  ];
}

/** A cell of the conversion table of a sheet: the raw score heads its row. */
function cell(row: CellRole['row'], column: number, said: string | null): CellRole {
  const headOf = row === 'head' ? 'column' : column === 0 ? 'row' : null;
  return { kind: 'cell', table: 'conversion', row, column, headOf, said };
}

/** The mark hangs behind the rank, so that figures stay under figures. */
function adjustedMark({ x, heads, size }: TableColumnBlock, baseline: number, role: TextRole): TextLine {
  const head = heads.find(({ key }) => key === 'rank');
  if (head === undefined) throw new RangeError('a table without ranks');
  return {
    kind: 'text',
    x: x + head.right,
    baseline,
    width: textWidth(ADJUSTED_MARK, 'sans', size),
    align: 'left',
    size,
    colour: 'ink',
    runs: [{ text: ADJUSTED_MARK, face: 'sans' }],
    role,
  };
}

/** Points between the end of a cell's text and the end of its column. */
function leftBehind(text: string, { range }: TableHead, size: number): number {
  if (range === null) return 0;
  const { after } = rangeSides(text);
  return after === null ? range.after + range.dash : range.after - textWidth(after, 'sans', size);
}
