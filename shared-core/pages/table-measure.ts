import { figure, wordsOf } from '../languages/phrases.ts';
import { ADJUSTED_MARK } from '../norms/adjustment-words.ts';
import type { NormSet } from '../norms/norm-set.ts';
import type { SheetChoices } from '../norms/norm-project.ts';
import { printedRows } from '../norms/printed-rows.ts';
import { tableColumns } from '../norms/table-columns.ts';
import type { TableHead } from './booklet.ts';
import {
  figureFace,
  headRoom,
  leastWidth,
  roomOf,
  scaledColumns,
  sharedWidth,
  type NaturalColumn,
} from './column-widths.ts';
import { isRangeColumn } from './range-cell.ts';
import { cellText } from './sheet-texts.ts';
import { spokenHead } from './spoken-text.ts';
import { chosenType, rowHeightRemark, scaledType, type TableType } from './table-type.ts';
import { textWidth } from './text-width.ts';
import { GUTTER } from './type-sizes.ts';

/** How tables of one kind are set: the same on every page. */
export interface TableMeasure {
  /** Columns of rows side by side. */
  readonly columns: number;
  /** Width of one of them, in points. */
  readonly width: number;
  readonly type: TableType;
  /** Places from the left edge of a column of rows. */
  readonly heads: readonly TableHead[];
}

/** Tried in turn where even one column of rows is too wide. */
const TYPE_SCALES = [1, 0.92, 0.85, 0.78, 0.71, 0.64, 0.57] as const;

/**
 * Sets the columns of the conversion tables in the width of the page, the same for every group, and says in sentences
 * what could not be done as asked.
 */
export function measureTables(
  normSet: NormSet,
  pageWidth: number,
): { readonly measure: TableMeasure; readonly remarks: readonly string[] } {
  const { sheet } = normSet.project;
  const type = chosenType(sheet);
  const natural = naturalColumns(normSet, type);
  const behind = roomBehind(normSet, type);
  const needed = leastWidth(natural, type, behind);
  const columnWidth = (columns: number): number => (pageWidth - (columns - 1) * GUTTER) / columns;
  const most = [4, 3, 2, 1].filter((columns) => columns <= sheet.tableColumns);
  const columns = most.find((count) => needed <= columnWidth(count)) ?? 1;
  const scale = TYPE_SCALES.find((each) => needed * each <= columnWidth(columns)) ?? Math.min(...TYPE_SCALES);
  const scaled = scaledType(type, scale);
  return {
    measure: {
      columns,
      type: scaled,
      ...sharedWidth(scaledColumns(natural, scale), columnWidth(columns), scaled, {
        alone: columns === 1,
        behind: behind * scale,
      }),
    },
    remarks: remarksOn(sheet, columns, scale),
  };
}

function naturalColumns(normSet: NormSet, type: TableType): readonly NaturalColumn[] {
  const rows = normSet.groups.flatMap((norms) => printedRows(normSet.project, norms));
  const words = wordsOf(normSet.project);
  return tableColumns(normSet.project, words).map((column, index) => {
    const texts = rows.map(({ scoreText, shown }) =>
      figure(words, column.key === 'score' ? scoreText : cellText(shown, column)),
    );
    const ranges = isRangeColumn(column.key) || column.key === 'score';
    const { width, range } = roomOf(texts, figureFace(index), type.row.size, ranges);
    return {
      width: Math.max(width, headRoom(column.heading, '', type)),
      head: {
        column: index,
        lines: column.heading,
        note: '',
        said: spokenHead(column.heading),
        repeated: 'nothing',
        align: 'right',
        range,
      },
    };
  });
}

/** The mark of a rank adjusted by hand hangs behind it, which needs room where ranks stand last. */
function roomBehind({ project, groups }: NormSet, { row }: TableType): number {
  const last = tableColumns(project).at(-1)?.key;
  const marked = groups.some(({ rows }) => rows.some(({ adjusted }) => adjusted !== null));
  return last === 'rank' && marked ? textWidth(ADJUSTED_MARK, 'sans', row.size) : 0;
}

const COUNT_WORDS = ['no', 'one', 'two', 'three', 'four'] as const;
const PAPER_NAMES = { a4: 'A4', letter: 'Letter', a5: 'A5' } as const;

function remarksOn(sheet: SheetChoices, columns: number, scale: number): readonly string[] {
  const paper = `${PAPER_NAMES[sheet.paper]} ${sheet.orientation}`;
  const remarks: string[] = [];
  if (columns < sheet.tableColumns) {
    remarks.push(
      `The chosen figures are too wide to stand ${COUNT_WORDS[sheet.tableColumns]} times across ${paper}; the tables ` +
        `are set in ${COUNT_WORDS[columns]} ${columns === 1 ? 'column' : 'columns'}. ` +
        'Choose fewer or smaller figures, or turn or enlarge the paper.',
    );
  }
  if (scale < 1) {
    remarks.push(
      `The chosen figures are too wide for ${paper} at the chosen size of type; they are set smaller. ` +
        'Choose fewer or smaller figures, or turn or enlarge the paper.',
    );
  }
  const height = rowHeightRemark(sheet);
  return height === null ? remarks : [...remarks, height];
}
