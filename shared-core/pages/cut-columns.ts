import { type PrintWords, say } from '../languages/phrases.ts';
import type { CutRow } from '../norms/cut-table.ts';
import type { NormProject } from '../norms/norm-project.ts';
import { columnOf, rankColumn } from '../norms/table-columns.ts';
import type { PlacedCell, TableHead } from './booklet.ts';
import {
  headRoom,
  leastGap,
  leastWidth,
  roomOf,
  scaledColumns,
  sharedWidth,
  type NaturalColumn,
} from './column-widths.ts';
import { breakLines } from './prose.ts';
import { figureCell, rankCell } from './table-cells.ts';
import { TYPE_SCALES, type TableMeasure } from './table-measure.ts';
import { scaledType, type TableType } from './table-type.ts';
import { textWidth, type FontFace } from './text-width.ts';
import { TABLE_HEAD } from './type-sizes.ts';

/** A column of figures of the table of a cut. */
export interface CutColumn {
  readonly lines: readonly string[];
  readonly ranges: boolean;
  readonly cellOf: (row: CutRow) => PlacedCell;
}

/** Room of the longest head in type of the usual size, and the least that titles of groups have, points. */
const HEAD_ROOM = 48;
const LEAST_TITLE = 70;

/** The figures of each group at a cut: n, percentile rank, its interval where there is one, and the share. */
export function cutColumns(project: NormProject, rows: readonly CutRow[], words: PrintWords): readonly CutColumn[] {
  const share = brokenLines(say(words, 'cuts.share'), 'sans-bold', TABLE_HEAD.size, HEAD_ROOM);
  const figures = (lines: readonly string[], textOf: (row: CutRow) => string, ranges = false): CutColumn => ({
    lines,
    ranges,
    cellOf: (row) => figureCell(words, textOf(row)),
  });
  return [
    figures([say(words, 'cuts.n')], ({ n }) => n),
    {
      lines: rankColumn(words).heading,
      ranges: false,
      cellOf: ({ rank, row }) => rankCell(words, rank, row !== null && row.adjusted !== null),
    },
    ...(rows.some(({ interval }) => interval !== null)
      ? [figures(columnOf('interval', project, words).heading, ({ interval }) => interval ?? '', true)]
      : []),
    figures(share, ({ shareText }) => shareText),
  ];
}

export interface CutMeasure {
  readonly measure: TableMeasure;
  /** Room for titles of groups in bold figures of the rows, points. */
  readonly titleRoom: number;
  /** True where the chosen type was too large. */
  readonly smaller: boolean;
}

/** Sets the tables of all cuts alike: titles of groups in what the figures leave of the width, at most in their own. */
export function measureCuts(
  columns: readonly CutColumn[],
  rows: readonly CutRow[],
  titleHead: string,
  type: TableType,
  width: number,
): CutMeasure {
  const figures = columns.map(({ lines, ranges, cellOf }, index): NaturalColumn => {
    const texts = rows.map((row) => cellOf(row).text);
    const { width: room, range } = roomOf(texts, 'sans', type.row.size, ranges);
    return {
      width: Math.max(room, headRoom(lines, '', type)),
      head: { ...plainHead(lines), column: 1 + index, align: 'right', range },
    };
  });
  const needed = leastWidth(figures, type, 0) + leastGap(type);
  const scale = TYPE_SCALES.find((each) => width - needed * each >= LEAST_TITLE) ?? Math.min(...TYPE_SCALES);
  const scaled = scaledType(type, scale);
  const own = Math.max(
    headRoom([titleHead], '', scaled),
    ...rows.map(({ title }) => textWidth(title, 'sans-bold', scaled.row.size)),
  );
  const titleRoom = Math.min(own, width - needed * scale);
  const titles: NaturalColumn = {
    width: titleRoom,
    head: { ...plainHead([titleHead]), column: 0, align: 'left', range: null },
  };
  const natural = [titles, ...scaledColumns(figures, scale)];
  const shared = sharedWidth(natural, scaled, { width, alone: true, behind: 0 });
  return { measure: { columns: 1, type: scaled, ...shared }, titleRoom, smaller: scale < 1 };
}

/** A text in lines of so many points. */
export function brokenLines(text: string, face: FontFace, size: number, width: number): readonly string[] {
  return breakLines([{ text, face }], size, width).map((runs) => runs.map((run) => run.text).join(''));
}

function plainHead(lines: readonly string[]): Pick<TableHead, 'lines' | 'note' | 'said' | 'repeated'> {
  return { lines, note: '', said: null, repeated: 'nothing' };
}
