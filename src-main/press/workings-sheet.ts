import type { Cell, Worksheet } from 'exceljs';
import type { GroupNorms } from '../../shared-core/norms/group-norms.ts';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { draftTitle, editionLine, sheetSubtitle, surveyName } from '../../shared-core/pages/sheet-texts.ts';
import { inFives } from '../../shared-core/pages/row-blocks.ts';
import type { TablePlaces } from './table-layout.ts';
import { factCell, SAME, workingsCell, type WorkingsBasis, type WorkingsCell } from './workings-cells.ts';
import { AGREEMENT_COLUMNS, workingsPlaces } from './workings-places.ts';
import { workingsPlan } from './workings-plan.ts';
import { factWords, workingsStatement, workingsWords } from './workings-words.ts';
import { asBold, asHead, asNote, proseRow, ruleBelow, titleRow } from './workbook-look.ts';
import { colophonRow, setUpPages } from './workbook-pages.ts';

/** Characters of the usual type. */
const NARROWEST = 12;
/** What a number needs beside its digits: bold type and the space at its right. */
const BESIDE_DIGITS = 4;
const NOTE_LINES = 5;
const RIGHT = { horizontal: 'right', indent: 1 } as const;
const DIFFERENCE_FILL = { type: 'pattern', pattern: 'solid', bgColor: { argb: 'FFF6C9BE' } } as const;

/** Cells of the sheet that have names in the workbook. */
export interface WorkingsCells {
  readonly people: string;
  readonly agreement: string;
}

/**
 * How each printed rank of a group follows from its counts, weights or smoothed shares, in formulas, and whether it is
 * the one on the table sheet; the number of rows that agree stands above.
 */
export function fillWorkingsSheet(
  sheet: Worksheet,
  normSet: NormSet,
  norms: GroupNorms,
  table: TablePlaces,
): WorkingsCells {
  const { project } = normSet;
  const plan = workingsPlan(project, norms);
  const width = plan.keys.length;
  const prose = [
    [surveyName(project), `${sheetSubtitle(project)}.`].filter((text) => text !== '').join('. '),
    workingsStatement(plan),
  ];
  const places = workingsPlaces(plan, prose.length + 4);
  const basis: WorkingsBasis = { plan, places, table };
  const contents = plan.keys.map((key) => norms.rows.map((_, position) => workingsCell(basis, key, position)));
  const widths = contents.map((column, index) => {
    const fact = plan.facts.find((each) => places.factColumnOf(each) === index + 1);
    return widthFor(fact === undefined ? column : [...column, factCell(basis, fact)]);
  });
  const across = widths.reduce((sum, each) => sum + each, 0);
  sheet.columns = widths.map((each) => ({ width: each }));
  titleRow(sheet, draftTitle(normSet, `Workings: ${norms.group.title}`), width, across);
  prose.forEach((text, index) => proseRow(sheet, index + 2, text, width, across));
  fillFacts(sheet, basis);
  const { headRow, firstRow } = places;
  const lastRow = firstRow + norms.rows.length - 1;
  const endsFive = new Set(
    inFives(norms.rows, norms.group.table.scale, ({ score }) => score).map((five) => five.at(-1)?.score),
  );
  sheet.getRow(headRow).height = 28;
  sheet.getRow(headRow + 1).height = 11 * NOTE_LINES;
  plan.keys.forEach((key, index) => {
    const { head, note, format } = workingsWords(plan, key);
    const [headCell, noteCell] = [sheet.getCell(headRow, index + 1), sheet.getCell(headRow + 1, index + 1)];
    headCell.value = head;
    asHead(headCell);
    noteCell.value = note;
    asNote(noteCell);
    headCell.alignment = { ...headCell.alignment, ...RIGHT };
    noteCell.alignment = { ...noteCell.alignment, ...RIGHT };
    norms.rows.forEach(({ score }, position) => {
      const cell = sheet.getCell(firstRow + position, index + 1);
      const content = contents[index]?.[position];
      if (content !== undefined) fill(cell, content, format);
      if (key === 'score' || key === 'printed') asBold(cell);
      if (endsFive.has(score)) ruleBelow(cell, firstRow + position === lastRow ? 'strong' : 'fine');
    });
  });
  sheet.addConditionalFormatting({
    ref: places.span('same', 0, norms.rows.length - 1).replaceAll('$', ''),
    rules: [
      {
        type: 'expression',
        priority: 1,
        formulae: [`${places.cell('same', 0)}<>"${SAME}"`],
        style: { fill: DIFFERENCE_FILL },
      },
    ],
  });
  colophonRow(sheet, lastRow + 2, normSet, width, across);
  sheet.views = [{ state: 'frozen', xSplit: 1, ySplit: firstRow - 1, topLeftCell: `B${firstRow}`, activeCell: 'A1' }];
  setUpPages(sheet, project.sheet, editionLine(normSet, norms), across);
  sheet.pageSetup.printArea = `A$1:${sheet.getColumn(width).letter}$${lastRow + 2}`;
  sheet.pageSetup.printTitlesRow = `${headRow}:${headRow + 1}`;
  return { people: places.fact('people').replaceAll('$', ''), agreement: `A${places.factRow}` };
}

/** The numbers of the whole group, named above and standing below; before them, how many rows agree. */
function fillFacts(sheet: Worksheet, basis: WorkingsBasis): void {
  const { plan, places } = basis;
  const { factRow } = places;
  const rows = plan.norms.rows.length;
  const span = places.span('same', 0, rows - 1);
  sheet.mergeCells(factRow - 1, 1, factRow - 1, AGREEMENT_COLUMNS);
  sheet.mergeCells(factRow, 1, factRow, AGREEMENT_COLUMNS);
  const [name, agreement] = [sheet.getCell(factRow - 1, 1), sheet.getCell(factRow, 1)];
  name.value = 'Against the table';
  asNote(name);
  name.alignment = { horizontal: 'left', vertical: 'bottom' };
  const byHand = plan.norms.rows.filter(({ adjusted }) => adjusted !== null).length;
  const adjusted = byHand === 0 ? '' : `, ${byHand} by hand`;
  agreement.value = {
    formula: `COUNTIF(${span},"${SAME}")&" of "&ROWS(${span})&" rows agree${adjusted}"`,
    result: `${rows - byHand} of ${rows} rows agree${adjusted}`,
  };
  asBold(agreement);
  plan.facts.forEach((key) => {
    const column = places.factColumnOf(key);
    const [label, cell] = [sheet.getCell(factRow - 1, column), sheet.getCell(factRow, column)];
    label.value = factWords(plan, key);
    asNote(label);
    label.alignment = { ...RIGHT, vertical: 'bottom' };
    fill(cell, factCell(basis, key), '0');
    asBold(cell);
  });
}

function fill(cell: Cell, content: WorkingsCell, format: string): void {
  cell.value = content.kind === 'value' ? content.value : { formula: content.formula, result: content.result };
  cell.numFmt = format;
  cell.alignment = RIGHT;
}

/** A width that holds the largest whole number of a column and of the fact above it. */
function widthFor(contents: readonly WorkingsCell[]): number {
  const longest = contents.reduce((most, content) => {
    const shown = content.kind === 'value' ? content.value : content.result;
    return Number.isInteger(shown) ? Math.max(most, String(shown).length) : most;
  }, 0);
  return Math.max(NARROWEST, longest + BESIDE_DIGITS);
}
