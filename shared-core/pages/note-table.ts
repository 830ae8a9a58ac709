import type { PrintWords } from '../languages/phrases.ts';
import type { Block } from './booklet.ts';
import { spokenFigure } from './spoken-text.ts';
import type { CellRole } from './text-role.ts';
import type { FontFace } from './text-width.ts';
import { textWidth } from './text-width.ts';
import { FINE_RULE, SMALL_PROSE, STRONG_RULE } from './type-sizes.ts';

/** A small table of the technical notes. */
export interface NoteTable {
  /** Unique among the tables of a sheet. */
  readonly name: string;
  readonly heads: readonly string[];
  /** Words begin at the left edge, figures end at the right of their column, like those of all further columns. */
  readonly firstColumn: 'words' | 'figures';
  readonly rows: readonly NoteRow[];
}

export interface NoteRow {
  readonly cells: readonly string[];
  /** Set in bold, with a rule under it. */
  readonly marked: boolean;
}

const { size: SIZE, leading: LEADING } = SMALL_PROSE;
const ROW_LEADING = LEADING + 0.8;
const LEAST_GAP = 7;
const HEAD_PADDING = 3;
const AROUND_ROWS = 2;
const UNDER_MARKED = 2.5;
const ABOVE_BASELINE = 0.74;

const face = (bold: boolean): FontFace => (bold ? 'sans-bold' : 'sans');

function columnWidths({ heads, rows }: NoteTable): readonly number[] {
  return heads.map((head, index) =>
    Math.max(
      textWidth(head, 'sans-bold', SIZE),
      ...rows.map(({ cells, marked }) => textWidth(cells[index] ?? '', face(marked), SIZE)),
    ),
  );
}

/** The least width the table can be set in, in points. */
export function noteTableWidth(table: NoteTable): number {
  const widths = columnWidths(table);
  return widths.reduce((sum, width) => sum + width, 0) + (widths.length - 1) * LEAST_GAP;
}

export function noteTableHeight({ rows }: NoteTable): number {
  const marked = rows.filter((row) => row.marked).length;
  return LEADING + 2 * HEAD_PADDING + rows.length * ROW_LEADING + 2 * AROUND_ROWS + marked * UNDER_MARKED;
}

/** The table in a width that is at least its own; room left over is shared between its columns. */
export function placeNoteTable(
  table: NoteTable,
  { x, top, width }: { readonly x: number; readonly top: number; readonly width: number },
  words: PrintWords,
): readonly Block[] {
  const widths = columnWidths(table);
  const figures = widths.reduce((sum, wide) => sum + wide, 0);
  const gap = (width - figures) / (widths.length - 1);
  const rule = (y: number, weight: number): Block => ({ kind: 'rule', x, y, width, weight });
  const line = (cells: readonly string[], baseline: number, bold: boolean, row: CellRole['row']): readonly Block[] => {
    let left = x;
    return cells.map((text, index): Block => {
      const wide = widths[index] ?? 0;
      const block: Block = {
        kind: 'text',
        x: left,
        baseline,
        width: wide,
        align: index === 0 && table.firstColumn === 'words' ? 'left' : 'right',
        size: SIZE,
        colour: 'ink',
        runs: [{ text, face: face(bold) }],
        role: {
          kind: 'cell',
          table: table.name,
          row,
          column: index,
          headOf: row === 'head' ? 'column' : index === 0 ? 'row' : null,
          said: row === 'head' ? null : spokenFigure(words, text),
        },
      };
      left += wide + gap;
      return block;
    });
  };
  const headRule = top + LEADING + 2 * HEAD_PADDING;
  let y = headRule + AROUND_ROWS;
  const rows = table.rows.flatMap(({ cells, marked }, index) => {
    const blocks = line(cells, y + ROW_LEADING * ABOVE_BASELINE, marked, index);
    y += ROW_LEADING;
    if (!marked) return blocks;
    y += UNDER_MARKED;
    return [...blocks, rule(y - UNDER_MARKED / 2, STRONG_RULE)];
  });
  return [
    rule(top, STRONG_RULE),
    ...line(table.heads, top + HEAD_PADDING + LEADING * ABOVE_BASELINE, true, 'head'),
    rule(headRule, FINE_RULE),
    ...rows,
    rule(y + AROUND_ROWS, STRONG_RULE),
  ];
}
