import type { Worksheet } from 'exceljs';
import { say, wordsOf } from '../../shared-core/languages/phrases.ts';
import { cutTables, type CutRow, type CutTable } from '../../shared-core/norms/cut-table.ts';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { columnOf, rankColumn, scoreColumn } from '../../shared-core/norms/table-columns.ts';
import { headInOneLine } from '../../shared-core/pages/spoken-text.ts';
import { draftTitle, printedTitle } from '../../shared-core/pages/sheet-texts.ts';
import { rankCell, typedCell, type TypedCell } from './typed-cell.ts';
import { asBold, asHead, asProse, fillCell, proseRow, ruleBelow, titleRow } from './workbook-look.ts';
import { colophonRow, editionFoot, setUpPages } from './workbook-pages.ts';

export const CUTS = 'Cuts';
/** Where the heads stand; the rows follow. */
export const CUTS_HEAD_ROW = 4;

/** Widths in characters of the usual type: words, and figures. */
const WORDS_WIDTH = 28;
const FIGURES_WIDTH = 13;
const HEAD_HEIGHT = 28;

/** A column of the sheet. */
interface CutSheetColumn {
  readonly head: string;
  readonly width: number;
  /** Words stay a text, whatever they look like. */
  readonly words: boolean;
  readonly cellOf: (table: CutTable, row: CutRow) => TypedCell;
}

/** The cuts of the project with what they mean in each of their groups: one row for each cut and group. */
export function fillCutsSheet(sheet: Worksheet, normSet: NormSet): void {
  const { project, groups } = normSet;
  const words = wordsOf(project);
  const tables = cutTables(project, groups);
  const columns = cutSheetColumns(normSet);
  const across = columns.reduce((sum, { width }) => sum + width, 0);
  sheet.columns = columns.map(({ width }) => ({ width }));
  titleRow(sheet, draftTitle(normSet, say(words, 'block.cut-scores')), columns.length, across);
  const weighted = groups.some(({ group }) => group.table.weighted);
  const people = say(words, `people.${project.people}`);
  const prose = say(words, weighted ? 'cuts.how-to-read-weighted' : 'cuts.how-to-read', { people });
  proseRow(sheet, 2, prose, columns.length, across);
  columns.forEach(({ head, words: inWords }, index) => {
    const cell = sheet.getCell(CUTS_HEAD_ROW, index + 1);
    cell.value = head;
    asHead(cell);
    if (inWords) cell.alignment = { horizontal: 'left', vertical: 'bottom', wrapText: true };
  });
  sheet.getRow(CUTS_HEAD_ROW).height = HEAD_HEIGHT;
  let at = CUTS_HEAD_ROW;
  for (const table of tables) {
    for (const row of table.rows) {
      at += 1;
      columns.forEach(({ words: inWords, cellOf }, index) => {
        const cell = sheet.getCell(at, index + 1);
        fillCell(cell, cellOf(table, row));
        if (inWords) asProse(cell);
        if (index === 0) asBold(cell);
      });
    }
    if (table.rows.length === 0) continue;
    for (let place = 1; place <= columns.length; place += 1) ruleBelow(sheet.getCell(at, place), 'fine');
  }
  colophonRow(sheet, at + 2, normSet, columns.length, across);
  sheet.views = [{ state: 'frozen', xSplit: 0, ySplit: CUTS_HEAD_ROW, activeCell: 'A1' }];
  setUpPages(sheet, project.sheet, editionFoot(normSet), across);
  sheet.pageSetup.printTitlesRow = `${CUTS_HEAD_ROW}:${CUTS_HEAD_ROW}`;
}

/** The columns of the sheet: cut, raw score, group, n, percentile rank, its interval where there is one, and share. */
export function cutSheetColumns({ project, groups }: NormSet): readonly CutSheetColumn[] {
  const words = wordsOf(project);
  const titles = groups.map(({ group }) => printedTitle(project, group));
  const intervals = cutTables(project, groups).some(({ rows }) => rows.some(({ interval }) => interval !== null));
  const inWords = (head: string, textOf: (table: CutTable, row: CutRow) => string): CutSheetColumn => ({
    head,
    width: WORDS_WIDTH,
    words: true,
    cellOf: (table, row) => ({ kind: 'text', value: textOf(table, row) }),
  });
  const figures = (head: readonly string[], cellOf: CutSheetColumn['cellOf']): CutSheetColumn => ({
    head: headInOneLine(head),
    width: FIGURES_WIDTH,
    words: false,
    cellOf,
  });
  return [
    inWords(say(words, 'cuts.name'), ({ cut }) => cut.name.trim()),
    figures(scoreColumn(words).heading, ({ scoreText }) => typedCell(scoreText)),
    inWords(say(words, 'cuts.group'), (_, { group }) => titles[group] ?? ''),
    figures([say(words, 'cuts.n')], (_, { n }) => typedCell(n)),
    figures(rankColumn(words).heading, (_, { row, rank }) => (row === null ? typedCell(rank) : rankCell(row))),
    ...(intervals
      ? [figures(columnOf('interval', project, words).heading, (_, { interval }) => typedCell(interval ?? ''))]
      : []),
    figures(say(words, 'cuts.share').split('\n'), (_, { shareText }) => typedCell(shareText)),
  ];
}
