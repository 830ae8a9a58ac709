import type { PrintWords } from '../languages/phrases.ts';
import type { Block, TextLine } from './booklet.ts';
import { firstLines } from './prose.ts';
import type { SheetFlow } from './sheet-flow.ts';
import { spokenFigure, spokenHead } from './spoken-text.ts';
import { REPEATED, type CellRole, type TextRole } from './text-role.ts';
import { textWidth, type FontFace } from './text-width.ts';
import { FINE_RULE, PROSE, STRONG_RULE, TABLE_HEAD } from './type-sizes.ts';

/** A table of facts: words in its first column, figures in the others, as many rows as there are. */
export interface FactTable {
  /** Unique in its block. */
  readonly name: string;
  /** Each of one line or more. */
  readonly heads: readonly (readonly string[])[];
  readonly rows: readonly FactRow[];
}

export interface FactRow {
  readonly cells: readonly string[];
  /** Set in bold, like a sum. */
  readonly strong: boolean;
}

/** Tried in turn before a table is set in two. */
const SCALES = [1, 0.92, 0.85] as const;
const ROW_LEADING = 11.6;
const BETWEEN_ROWS = 1.6;
const LEAST_GAP = 9;
const WIDEST_GAP = 26;
/** Room that the words have before figures are set smaller or in two tables, points. */
const LEAST_WORDS = 84;
const HEAD_PADDING = 3;
const AROUND_ROWS = 2.5;
const ABOVE_BASELINE = 0.74;
const BELOW_TABLE = 6;
/** Longer words are cut. */
const MOST_LINES = 8;
/** Points by which sums of widths may differ in their last digits. */
const TRACE = 1e-9;
/** A page is not turned before or behind fewer rows. */
const ROWS_TOGETHER = 2;
/** A table of at most this share of a page is not divided. */
const WHOLE_ON_PAGE = 0.6;

/** The table over as many pages as it takes; columns that do not find room stand in a second table below. */
export function layFactTable(flow: SheetFlow, table: FactTable, words: PrintWords): void {
  const setting = settingOf(table, flow.width);
  if (setting === null) {
    for (const half of halves(table)) layFactTable(flow, half, words);
    return;
  }
  layRows(flow, table, setting, words);
}

/**
 * Height of what stands at least on the page where a table begins, for a heading above it: a table of a part of a page
 * whole, a longer one with its head and first rows.
 */
export function factTableStart(table: FactTable, { width, freshRoom }: SheetFlow): number {
  const setting = settingOf(table, width) ?? settingOf(halves(table)[0], width);
  if (setting === null) return 0;
  const whole = startHeight(table, setting, setting.rows.length);
  return whole <= freshRoom * WHOLE_ON_PAGE ? whole : startHeight(table, setting, ROWS_TOGETHER);
}

function startHeight(table: FactTable, setting: Setting, count: number): number {
  const rows = setting.rows.slice(0, count);
  return headHeight(table, setting) + 2 * AROUND_ROWS + rows.reduce((sum, row) => sum + rowHeight(row, setting), 0);
}

/** How the table stands in a width. */
interface Setting {
  readonly scale: number;
  readonly width: number;
  /** Of the first column, and right edges of the others from the left of the table. */
  readonly words: number;
  readonly rights: readonly number[];
  readonly widths: readonly number[];
  /** Lines of words of each row. */
  readonly rows: readonly (readonly string[])[];
}

function settingOf(table: FactTable, room: number): Setting | null {
  const scale = SCALES.find((each) => fits(table, room, each)) ?? (table.heads.length <= 2 ? SCALES.at(-1) : undefined);
  if (scale === undefined) return null;
  const figures = figureWidths(table, scale);
  const sum = figures.reduce((total, width) => total + width, 0);
  const words = Math.min(wordsWidth(table, scale), room - sum - figures.length * LEAST_GAP * scale);
  const gap = Math.min(WIDEST_GAP, (room - words - sum) / Math.max(1, figures.length));
  let right = words;
  const rights = figures.map((width) => {
    right += gap + width;
    return right;
  });
  const rows = table.rows.map(({ cells: [text = ''], strong }) => linesIn(text, strong, words, scale));
  return { scale, width: right, words, rights, widths: figures, rows };
}

function fits(table: FactTable, room: number, scale: number): boolean {
  const figures = figureWidths(table, scale);
  const words = Math.min(wordsWidth(table, scale), LEAST_WORDS);
  return figures.reduce((sum, width) => sum + width + LEAST_GAP * scale, words) <= room;
}

const faceOf = (strong: boolean): FontFace => (strong ? 'sans-bold' : 'sans');

function wordsWidth({ heads, rows }: FactTable, scale: number): number {
  const head = Math.max(...(heads[0] ?? []).map((line) => textWidth(line, 'sans-bold', TABLE_HEAD.size * scale)));
  return Math.max(
    head,
    ...rows.map(({ cells: [text = ''], strong }) => textWidth(text, faceOf(strong), PROSE.size * scale)),
  );
}

function figureWidths({ heads, rows }: FactTable, scale: number): readonly number[] {
  return heads
    .slice(1)
    .map((lines, index) =>
      Math.max(
        ...lines.map((line) => textWidth(line, 'sans-bold', TABLE_HEAD.size * scale)),
        ...rows.map(({ cells, strong }) => textWidth(cells[index + 1] ?? '', faceOf(strong), PROSE.size * scale)),
      ),
    );
}

function linesIn(text: string, strong: boolean, width: number, scale: number): readonly string[] {
  const runs = [{ text, face: faceOf(strong) }];
  const { lines } = firstLines(runs, PROSE.size * scale, width + TRACE, MOST_LINES);
  return lines.map((line) => line.map((run) => run.text).join(''));
}

/** The same rows with the first half of the columns of figures, and with the second. */
function halves({ name, heads, rows }: FactTable): readonly [FactTable, FactTable] {
  const middle = 1 + Math.ceil((heads.length - 1) / 2);
  const pick = <T>(cells: readonly T[], from: number, to: number): readonly T[] => [
    ...cells.slice(0, 1),
    ...cells.slice(from, to),
  ];
  const part = (ending: string, from: number, to: number): FactTable => ({
    name: `${name} ${ending}`,
    heads: pick(heads, from, to),
    rows: rows.map(({ cells, strong }) => ({ cells: pick(cells, from, to), strong })),
  });
  return [part('left', 1, middle), part('right', middle, heads.length)];
}

function headHeight({ heads }: FactTable, { scale }: Setting): number {
  return Math.max(...heads.map((lines) => lines.length)) * TABLE_HEAD.leading * scale + 2 * HEAD_PADDING;
}

function rowHeight(lines: readonly string[], { scale }: Setting): number {
  return Math.max(1, lines.length) * ROW_LEADING * scale + BETWEEN_ROWS;
}

function layRows(flow: SheetFlow, table: FactTable, setting: Setting, words: PrintWords): void {
  const overhead = headHeight(table, setting) + 2 * AROUND_ROWS;
  let first = 0;
  while (first < table.rows.length) {
    const left = table.rows.length - first;
    flow.need(overhead + heightBetween(setting, first, first + ROWS_TOGETHER));
    let count = 1;
    while (count < left && overhead + heightBetween(setting, first, first + count + 1) <= flow.room) count += 1;
    if (left - count > 0 && left - count < ROWS_TOGETHER && count > ROWS_TOGETHER) count -= 1;
    const height = overhead + heightBetween(setting, first, first + count);
    flow.place(rowBlocks(flow, table, setting, words, first, count), height);
    first += count;
    if (first < table.rows.length) flow.turn();
  }
  flow.skip(BELOW_TABLE);
}

function heightBetween(setting: Setting, from: number, to: number): number {
  return setting.rows.slice(from, to).reduce((sum, lines) => sum + rowHeight(lines, setting), 0);
}

function rowBlocks(
  flow: SheetFlow,
  table: FactTable,
  setting: Setting,
  language: PrintWords,
  first: number,
  count: number,
): readonly Block[] {
  const { left: x, y: top } = flow;
  const { scale, width } = setting;
  const headRule = top + headHeight(table, setting);
  const rule = (y: number, weight: number): Block => ({ kind: 'rule', x, y, width, weight });
  const headLines = table.heads.flatMap((lines, column) =>
    lines.map((text, place) => {
      const up = (lines.length - 1 - place) * TABLE_HEAD.leading * scale;
      const role = first > 0 ? REPEATED : cellOf(table, 'head', column, spokenHead(lines));
      const baseline = headRule - HEAD_PADDING - 1.5 - up;
      return cellLine(setting, column, text, { x, baseline, size: TABLE_HEAD.size * scale, face: 'sans-bold', role });
    }),
  );
  let y = headRule + AROUND_ROWS;
  const rows = table.rows.slice(first, first + count).flatMap(({ cells, strong }, index) => {
    const words = setting.rows[first + index] ?? [];
    const place = { x, size: PROSE.size * scale, face: faceOf(strong) };
    const baseline = y + ROW_LEADING * scale * ABOVE_BASELINE;
    y += rowHeight(words, setting);
    return cells.flatMap((text, column) => {
      const lines = column === 0 ? words : [text];
      const said = lines.length > 1 ? text : spokenFigure(language, text);
      const role = cellOf(table, first + index, column, said);
      return lines.map((line, down) =>
        cellLine(setting, column, line, { ...place, baseline: baseline + down * ROW_LEADING * scale, role }),
      );
    });
  });
  return [rule(top, STRONG_RULE), ...headLines, rule(headRule, FINE_RULE), ...rows, rule(y + AROUND_ROWS, STRONG_RULE)];
}

function cellOf({ name }: FactTable, row: CellRole['row'], column: number, said: string | null): CellRole {
  return {
    kind: 'cell',
    table: name,
    row,
    column,
    headOf: row === 'head' ? 'column' : column === 0 ? 'row' : null,
    said,
  };
}

function cellLine(
  { words, rights, widths }: Setting,
  column: number,
  text: string,
  place: {
    readonly x: number;
    readonly baseline: number;
    readonly size: number;
    readonly face: FontFace;
    readonly role: TextRole;
  },
): TextLine {
  const { x, baseline, size, face, role } = place;
  const width = column === 0 ? words : (widths[column - 1] ?? 0);
  return {
    kind: 'text',
    x: column === 0 ? x : x + (rights[column - 1] ?? 0) - width,
    baseline,
    width,
    align: column === 0 ? 'left' : 'right',
    size,
    colour: 'ink',
    runs: [{ text, face }],
    role,
  };
}
