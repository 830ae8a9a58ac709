import type { Worksheet } from 'exceljs';
import { scaleInWords } from '../../shared-core/scale/score-scale.ts';
import { ENGLISH_WORDS } from '../../shared-core/languages/phrases.ts';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { tableColumns } from '../../shared-core/norms/table-columns.ts';
import { cautionsOf } from '../../shared-core/pages/group-method.ts';
import { draftTitle, markedText, surveyName } from '../../shared-core/pages/sheet-texts.ts';
import { printCount } from '../../shared-core/scores/printed-number.ts';
import { distinctTitles } from './sheet-names.ts';
import { asBold, asHead, asLabel, asTitle, linesIn, proseRow, ruleBelow } from './workbook-look.ts';
import { colophonRow, editionFoot, setUpPages } from './workbook-pages.ts';

export const LOOK_UP = 'Look-up';
export const LOOK_UP_ROWS = 'Look-up rows';
/** Cells of the look-up sheet into which the user writes. */
export const GROUP_CELL = 'B4';
export const SCORE_CELL = 'B5';
/** Row of the first result, the percentile rank; the texts of further columns stand below it. */
export const FIRST_RESULT_ROW = 7;

const WIDTHS = [30, 34] as const;
/** Of the two columns of titles in the list: they widen with the titles, but not without end. */
const TITLE_WIDTHS = [24, 60] as const;
const HEAD_HEIGHT = 40;
const CHOICE_FILL = { type: 'pattern', pattern: 'solid', fgColor: { argb: 'FFF1EEE7' } } as const;

/**
 * Fills two sheets: one where a group and a raw score give the printed row, and one that lists every printed row for it.
 * A formula finds the row by the exact title of the group and the number of the score; the results it gives for the
 * example that stands there are written beside it, as spreadsheet programs show them before they compute.
 */
export function fillLookUp(sheet: Worksheet, list: Worksheet, normSet: NormSet): void {
  const { project, groups } = normSet;
  const titles = distinctTitles(groups.map(({ group }) => group.title));
  const columns = tableColumns(project).filter(({ key }) => key !== 'score');
  const example = groups[0];
  if (example === undefined) throw new RangeError('a norm set without groups');
  const exampleAt = Math.floor(example.rows.length / 2);
  const exampleRow = example.rows[exampleAt];
  if (exampleRow === undefined) throw new RangeError('a table without rows');
  const perGroup = example.rows.length;
  const places = fillList(list, normSet, titles);
  list.getCell(places.position).value = {
    formula: positionFormula(titles.length, perGroup, places),
    result: exampleAt + 1,
  };

  sheet.columns = WIDTHS.map((width) => ({ width }));
  sheet.getCell('A1').value = draftTitle(normSet, 'Look up a raw score');
  asTitle(sheet.getCell('A1'));
  proseRow(sheet, 2, surveyName(project), 2, WIDTHS[0] + WIDTHS[1]);
  sheet.getCell('A4').value = 'Group';
  sheet.getCell('A4').alignment = { vertical: 'top' };
  sheet.getCell('A5').value = 'Raw score';
  const group = sheet.getCell(GROUP_CELL);
  group.value = titles[0] ?? '';
  group.dataValidation = {
    type: 'list',
    allowBlank: false,
    formulae: [places.titles],
    showErrorMessage: true,
    errorTitle: 'Group',
    error: 'Choose a group from the list.',
  };
  const score = sheet.getCell(SCORE_CELL);
  score.value = exampleRow.score;
  score.dataValidation = {
    type: 'decimal',
    operator: 'between',
    allowBlank: false,
    formulae: [example.rows[0]?.score ?? 0, example.rows.at(-1)?.score ?? 0],
    showErrorMessage: true,
    errorTitle: 'Raw score',
    error: 'Type a raw score of the scale.',
  };
  for (const cell of [group, score]) {
    cell.fill = CHOICE_FILL;
    asBold(cell);
    cell.alignment = { horizontal: 'right', vertical: 'top', wrapText: true };
    ruleBelow(cell, 'strong');
  }
  sheet.getRow(4).height = 15 * Math.max(...titles.map((title) => linesIn(title, WIDTHS[1] - 4)));
  columns.forEach((column, index) => {
    const row = FIRST_RESULT_ROW + index;
    const name = sheet.getCell(row, 1);
    name.value = asLabel(column.name);
    const cell = sheet.getCell(row, 2);
    const letter = list.getColumn(3 + index).letter;
    const found = `INDEX(${range(letter, 2, 1 + groups.length * perGroup)},${onList(places.position)})`;
    const otherwise = index === 0 ? textInFormula(notFound(normSet)) : '""';
    cell.value = { formula: `IFERROR(${found},${otherwise})`, result: markedText(ENGLISH_WORDS, exampleRow, column) };
    cell.alignment = { horizontal: 'right', wrapText: true };
    if (index === 0) for (const part of [name, cell]) asBold(part);
    for (const part of [name, cell]) ruleBelow(part, index === columns.length - 1 ? 'strong' : 'fine');
  });
  const people = FIRST_RESULT_ROW + columns.length;
  sheet.getCell(people, 1).value = `Number of ${project.people} in the group`;
  sheet.getCell(people, 2).value = {
    formula: `IFERROR(INDEX(${places.counts},${groupFormula(titles.length, places)}),"")`,
    result: printCount(example.summary.n),
  };
  sheet.getCell(people, 2).alignment = { horizontal: 'right' };
  proseRow(sheet, people + 2, cautionsOf(project), 2, WIDTHS[0] + WIDTHS[1]);
  colophonRow(sheet, people + 4, normSet, 2, WIDTHS[0] + WIDTHS[1]);
  setUpPages(sheet, project.sheet, editionFoot(normSet), WIDTHS[0] + WIDTHS[1]);
  setUpPages(list, project.sheet, editionFoot(normSet), titleWidth(titles) * 2 + 9 * (columns.length + 4));
  list.pageSetup.printTitlesRow = '1:1';
}

/** Ranges of the list as formulas name them; the position is a single cell, without its sheet. */
interface ListPlaces {
  readonly titles: string;
  readonly counts: string;
  readonly scores: string;
  readonly position: string;
}

function fillList(list: Worksheet, normSet: NormSet, titles: readonly string[]): ListPlaces {
  const { groups } = normSet;
  const columns = tableColumns(normSet.project).filter(({ key }) => key !== 'score');
  const heads = ['Group', 'Raw score', ...columns.map(({ name }) => name), '', 'Groups', 'n', 'Row found'];
  heads.forEach((head, index) => {
    list.getCell(1, index + 1).value = head;
    if (head !== '') asHead(list.getCell(1, index + 1));
  });
  groups.forEach(({ rows }, group) => {
    rows.forEach((row, index) => {
      const at = 2 + group * rows.length + index;
      const cells = [
        titles[group] ?? '',
        row.score,
        ...columns.map((column) => markedText(ENGLISH_WORDS, row, column)),
      ];
      cells.forEach((value, place) => {
        list.getCell(at, place + 1).value = value;
        if (place > 1) list.getCell(at, place + 1).alignment = { horizontal: 'right' };
      });
    });
  });
  const titleColumn = columns.length + 4;
  groups.forEach(({ summary }, group) => {
    list.getCell(2 + group, titleColumn).value = titles[group] ?? '';
    list.getCell(2 + group, titleColumn + 1).value = printCount(summary.n);
    list.getCell(2 + group, titleColumn + 1).alignment = { horizontal: 'right' };
  });
  list.getColumn(1).width = titleWidth(titles);
  list.getColumn(titleColumn).width = titleWidth(titles);
  list.getRow(1).height = HEAD_HEIGHT;
  list.views = [{ state: 'frozen', ySplit: 1 }];
  const letter = (column: number): string => list.getColumn(column).letter;
  return {
    titles: range(letter(titleColumn), 2, 1 + groups.length),
    counts: range(letter(titleColumn + 1), 2, 1 + groups.length),
    scores: range('B', 2, 1 + (groups[0]?.rows.length ?? 0)),
    position: `${letter(titleColumn + 2)}2`,
  };
}

function titleWidth(titles: readonly string[]): number {
  const longest = Math.max(...titles.map((title) => Math.ceil(title.length * 1.15) + 2));
  return Math.min(TITLE_WIDTHS[1], Math.max(TITLE_WIDTHS[0], longest));
}

/** Number of the chosen group in the list, compared letter by letter (MATCH would read * and ? as wildcards). */
function groupFormula(groups: number, { titles }: ListPlaces): string {
  const chosen = `'${LOOK_UP}'!$B$4`;
  const numbers = `(ROW(${titles})-1)`;
  return groups === 1
    ? `IF(EXACT(${titles},${chosen}),1,NA())`
    : `1/(1/SUMPRODUCT(EXACT(${titles},${chosen})*${numbers}))`;
}

function positionFormula(groups: number, perGroup: number, places: ListPlaces): string {
  const score = `MATCH('${LOOK_UP}'!$B$5,${places.scores},0)`;
  return `(${groupFormula(groups, places)}-1)*${perGroup}+${score}`;
}

function range(letter: string, first: number, last: number): string {
  return `'${LOOK_UP_ROWS}'!$${letter}$${first}:$${letter}$${last}`;
}

function onList(cell: string): string {
  return `'${LOOK_UP_ROWS}'!${cell}`;
}

function notFound({ project }: NormSet): string {
  const scores = project.tally === null ? '' : ` from ${scaleInWords(project.tally.scale)}`;
  return `Not in the table. Choose a group from the list and type a raw score${scores}.`;
}

function textInFormula(text: string): string {
  return `"${text.replaceAll('"', '""')}"`;
}
