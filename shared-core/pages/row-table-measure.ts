import { ADJUSTED_MARK } from '../norms/adjustment-words.ts';
import { breakLines } from './prose.ts';
import { RANGE_DASH, rangeSides } from './range-cell.ts';
import type { RowTable, RowTableColumn } from './row-table.ts';
import { spokenHead } from './spoken-text.ts';
import { textWidth, type FontFace } from './text-width.ts';
import { ROW, TABLE_HEAD } from './type-sizes.ts';

/** A table of rows fitted to a width. */
export interface MeasuredRowTable {
  /** Scale of the type against the usual size. */
  readonly scale: number;
  readonly width: number;
  readonly columns: readonly PlacedColumn[];
  /** Lines that each row takes, one at least. */
  readonly rowLines: readonly number[];
  /** Places from the left edge of the table; null where the chart was left out. */
  readonly chart: { readonly x: number; readonly width: number } | null;
}

export interface PlacedColumn {
  readonly heading: readonly string[];
  readonly said: string | null;
  readonly kind: RowTableColumn['kind'];
  readonly bold: boolean;
  readonly x: number;
  readonly width: number;
  readonly cells: readonly PlacedText[];
}

export interface PlacedText {
  readonly lines: readonly string[];
  readonly said: string | null;
  /** Room behind its end, so that ranges are aligned on their dashes. */
  readonly behind: number;
  /** True where the mark of a rank adjusted by hand hangs behind it. */
  readonly marked: boolean;
}

/** Least room between two columns; the most where no chart takes what is left. */
const GAP = 11;
const WIDEST_GAP = 34;
/** Words are broken into lines at this share of the table, beside a chart or alone, and never made narrower than so many points. */
const WORDS_SHARE = { beside: 0.34, alone: 0.6 } as const;
const LEAST_WORDS = 58;
/** A column of figures wider than this is set as words. */
const WIDEST_FIGURES = 86;
/** Tried in turn. */
const SCALES = [1, 0.92, 0.85, 0.78, 0.71, 0.64, 0.57] as const;

/** The table in a width; null where it cannot be set in it, even in small type and without its chart. */
export function measureRowTable(table: RowTable, width: number): MeasuredRowTable | null {
  const natural = table.columns.map(naturalColumn);
  for (const chart of table.chart === null ? [0] : [table.chart.leastWidth, 0]) {
    for (const scale of SCALES) {
      const measured = fitted(natural, width, scale, chart);
      if (measured !== null) return measured;
    }
  }
  return null;
}

interface NaturalColumn extends RowTableColumn {
  /** At the usual size, points. */
  readonly width: number;
  readonly headWidth: number;
  readonly range: RangeRoom | null;
}

interface RangeRoom {
  readonly before: number;
  readonly dash: number;
  readonly after: number;
}

function naturalColumn(column: RowTableColumn): NaturalColumn {
  const { kind, heading, cells } = column;
  const face = faceOf(column);
  const headWidth = Math.max(...heading.map((line) => textWidth(line, 'sans-bold', TABLE_HEAD.size)));
  const texts = [...new Set(cells.map(({ text }) => unmarked(text)))];
  const range = kind === 'figures' ? rangeRoom(texts, face) : null;
  const widest = Math.max(0, ...texts.map((text) => textWidth(text, face, ROW.size)));
  const figures = range === null ? widest : range.before + range.dash + range.after;
  if (kind === 'words' || figures > WIDEST_FIGURES) {
    return { ...column, kind: 'words', width: Math.max(widest, headWidth), headWidth, range: null };
  }
  return { ...column, width: Math.max(figures, headWidth), headWidth, range };
}

function rangeRoom(texts: readonly string[], face: FontFace): RangeRoom | null {
  const sides = texts.map(rangeSides);
  if (sides.every(({ after }) => after === null)) return null;
  const dash = textWidth(RANGE_DASH, face, ROW.size);
  const before = sides.map(({ upToDash, after }) => textWidth(upToDash, face, ROW.size) - (after === null ? 0 : dash));
  const after = sides.map((side) => textWidth(side.after ?? '', face, ROW.size));
  return { dash, before: Math.max(...before), after: Math.max(...after) };
}

function fitted(
  natural: readonly NaturalColumn[],
  width: number,
  scale: number,
  leastChart: number,
): MeasuredRowTable | null {
  const isWords = ({ kind }: NaturalColumn): boolean => kind === 'words';
  const figures = natural.filter((column) => !isWords(column)).reduce((sum, column) => sum + column.width * scale, 0);
  const gaps = (natural.length - (leastChart > 0 ? 0 : 1)) * GAP * scale;
  const room = width - figures - gaps - leastChart;
  const share = width * (leastChart > 0 ? WORDS_SHARE.beside : WORDS_SHARE.alone);
  const wanted = natural.filter(isWords).map((column) => Math.min(column.width * scale, share));
  const words = shared(wanted, room);
  const least = natural
    .filter(isWords)
    .map((column) => Math.max(column.headWidth * scale, Math.min(column.width * scale, LEAST_WORDS * scale)));
  if (words.some((wide, index) => wide < (least[index] ?? 0) - 1e-6) || room < 0) return null;
  const widths = natural.map((column) => (isWords(column) ? (words.shift() ?? 0) : column.width * scale));
  const used = widths.reduce((sum, wide) => sum + wide, 0);
  const gap =
    leastChart > 0 || natural.length < 2 ? GAP * scale : Math.min(WIDEST_GAP, (width - used) / (natural.length - 1));
  let x = 0;
  const columns = natural.map((column, index): PlacedColumn => {
    const wide = widths[index] ?? 0;
    const placed = { ...placedColumn(column, wide, scale), x };
    x += wide + gap;
    return placed;
  });
  const rows = natural[0]?.cells.length ?? 0;
  const rowLines = Array.from({ length: rows }, (_, row) =>
    Math.max(1, ...columns.map(({ cells }) => cells[row]?.lines.length ?? 0)),
  );
  return {
    scale,
    width: leastChart > 0 ? width : x - gap,
    columns,
    rowLines,
    chart: leastChart > 0 ? { x, width: width - x } : null,
  };
}

/** Widths as wanted, or, where the room is too small for all, the widest made narrower until they fit. */
function shared(wanted: readonly number[], room: number): number[] {
  let [left, open] = [room, wanted.length];
  const given = wanted.map(() => 0);
  const narrowFirst = wanted.map((wide, index) => ({ wide, index })).toSorted((a, b) => a.wide - b.wide);
  for (const { wide, index } of narrowFirst) {
    const width = Math.min(wide, left / open);
    given[index] = width;
    left -= width;
    open -= 1;
  }
  return given;
}

function placedColumn(column: NaturalColumn, width: number, scale: number): Omit<PlacedColumn, 'x'> {
  const { heading, kind, bold, cells, range } = column;
  const face = faceOf(column);
  const size = ROW.size * scale;
  return {
    heading,
    said: spokenHead(heading),
    kind,
    bold,
    width,
    cells: cells.map(({ text, said }) => {
      const plain = unmarked(text);
      const marked = kind === 'figures' && plain !== text;
      const lines =
        kind === 'figures'
          ? [plain]
          : breakLines([{ text, face }], size, width).map((runs) => runs.map((run) => run.text).join(''));
      return { lines, said, marked, behind: range === null ? 0 : behind(plain, range, face, scale) };
    }),
  };
}

/** A range has the longest high end behind its dash; a single text stands where low ends do. */
function behind(text: string, range: RangeRoom, face: FontFace, scale: number): number {
  const { after } = rangeSides(text);
  if (after === null) return (range.after + range.dash) * scale;
  return range.after * scale - textWidth(after, face, ROW.size * scale);
}

function unmarked(text: string): string {
  return text.endsWith(ADJUSTED_MARK) ? text.slice(0, -ADJUSTED_MARK.length) : text;
}

function faceOf({ bold }: Pick<RowTableColumn, 'bold'>): FontFace {
  return bold ? 'sans-bold' : 'sans';
}
