import type { NormSet } from '../norms/norm-set.ts';
import type { SheetChoices } from '../norms/norm-project.ts';
import { tableColumns } from '../norms/table-columns.ts';
import type { TableHead } from './booklet.ts';
import { isRangeColumn, RANGE_DASH, rangeSides } from './range-cell.ts';
import { cellText } from './sheet-texts.ts';
import { textWidth } from './text-width.ts';
import { GUTTER, ROW, TABLE_HEAD } from './type-sizes.ts';

/** How the tables of a booklet are set: the same for every group. */
export interface TableMeasure {
  /** Columns of rows side by side. */
  readonly columns: number;
  /** Width of one of them, in points. */
  readonly width: number;
  /** Scale of the type against the usual size; below 1 where the figures would not fit otherwise. */
  readonly typeScale: number;
  /** Places from the left edge of a column of rows. */
  readonly heads: readonly TableHead[];
}

/** Least room between two columns of figures, and the most that the eye can cross in a table of one column. */
const LEAST_GAP = 8;
const WIDEST_GAP = 42;
/** Tried in turn where even one column of rows is too wide. */
const TYPE_SCALES = [1, 0.92, 0.85, 0.78, 0.71, 0.64, 0.57] as const;

/** Sets the columns of figures in the width of the page, and says in sentences what could not be done as asked. */
export function measureTables(
  normSet: NormSet,
  pageWidth: number,
): { readonly measure: TableMeasure; readonly remarks: readonly string[] } {
  const { sheet } = normSet.project;
  const natural = naturalColumns(normSet);
  const fits = (columns: number, typeScale: number): boolean => {
    const figures = natural.reduce((sum, column) => sum + column.width * typeScale, 0);
    return figures + natural.length * LEAST_GAP * typeScale <= columnWidth(columns);
  };
  const columnWidth = (columns: number): number => (pageWidth - (columns - 1) * GUTTER) / columns;
  const most = [4, 3, 2, 1].filter((columns) => columns <= sheet.tableColumns);
  const columns = most.find((count) => fits(count, 1)) ?? 1;
  const typeScale = TYPE_SCALES.find((scale) => fits(columns, scale)) ?? Math.min(...TYPE_SCALES);
  return {
    measure: { columns, typeScale, ...placed(natural, columnWidth(columns), typeScale, columns === 1) },
    remarks: remarksOn(sheet, columns, typeScale),
  };
}

interface NaturalColumn {
  readonly key: TableHead['key'];
  readonly lines: readonly string[];
  readonly width: number;
  readonly range: TableHead['range'];
}

function naturalColumns(normSet: NormSet): readonly NaturalColumn[] {
  return tableColumns(normSet.project).map((column) => {
    const face = column.key === 'score' ? 'sans-bold' : 'sans';
    const texts = new Set(normSet.groups.flatMap(({ rows }) => rows.map((row) => cellText(row, column))));
    const range = isRangeColumn(column.key) ? rangeRoom(texts) : null;
    const figures = range?.width ?? Math.max(...[...texts].map((text) => textWidth(text, face, ROW.size)));
    const head = Math.max(...column.heading.map((line) => textWidth(line, 'sans-bold', TABLE_HEAD.size)));
    return { key: column.key, lines: column.heading, width: Math.max(figures, head), range };
  });
}

/** Widths of ranges aligned on their dashes; without any dash they are figures like others. */
function rangeRoom(texts: ReadonlySet<string>): (NonNullable<TableHead['range']> & { readonly width: number }) | null {
  const sides = [...texts].map(rangeSides);
  if (sides.every(({ after }) => after === null)) return null;
  const dash = textWidth(RANGE_DASH, 'sans', ROW.size);
  const before = sides.map(
    ({ upToDash, after }) => textWidth(upToDash, 'sans', ROW.size) - (after === null ? 0 : dash),
  );
  const after = Math.max(...sides.map((side) => textWidth(side.after ?? '', 'sans', ROW.size)));
  return { dash, after, width: Math.max(...before) + dash + after };
}

/** Shares the room left between the columns of figures, half a share before the first. */
function placed(
  natural: readonly NaturalColumn[],
  width: number,
  typeScale: number,
  alone: boolean,
): { readonly width: number; readonly heads: readonly TableHead[] } {
  const figures = natural.reduce((sum, column) => sum + column.width * typeScale, 0);
  const share = (width - figures) / (natural.length - 0.5);
  const gap = alone ? Math.min(share, WIDEST_GAP) : share;
  let right = -gap / 2;
  const heads = natural.map((column, index) => {
    const before = index === 0 ? gap / 2 : gap;
    right += gap + column.width * typeScale;
    const range =
      column.range === null ? null : { dash: column.range.dash * typeScale, after: column.range.after * typeScale };
    return { key: column.key, lines: column.lines, right, width: column.width * typeScale + before, range };
  });
  return { width: right, heads };
}

const COUNT_WORDS = ['no', 'one', 'two', 'three', 'four'] as const;
const PAPER_NAMES = { a4: 'A4', letter: 'Letter', a5: 'A5' } as const;

function remarksOn(sheet: SheetChoices, columns: number, typeScale: number): readonly string[] {
  const paper = `${PAPER_NAMES[sheet.paper]} ${sheet.orientation}`;
  const remarks: string[] = [];
  if (columns < sheet.tableColumns) {
    remarks.push(
      `The chosen figures are too wide to stand ${COUNT_WORDS[sheet.tableColumns]} times across ${paper}; the tables ` +
        `are set in ${COUNT_WORDS[columns]} ${columns === 1 ? 'column' : 'columns'}. ` +
        'Choose fewer figures, or turn or enlarge the paper.',
    );
  }
  if (typeScale < 1) {
    remarks.push(
      `The chosen figures are too wide for ${paper} at the usual size of type; they are set smaller. ` +
        'Choose fewer figures, or turn or enlarge the paper.',
    );
  }
  return remarks;
}
