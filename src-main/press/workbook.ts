import ExcelJS from 'exceljs';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { draftTitle, printedTitle, surveyName } from '../../shared-core/pages/sheet-texts.ts';
import { ABOUT, fillAboutSheet } from './about-sheet.ts';
import { CUTS, fillCutsSheet } from './cuts-sheet.ts';
import { fillLookUp, LOOK_UP, LOOK_UP_ROWS } from './look-up-sheet.ts';
import { releaseDay } from './release-day.ts';
import { sheetNames } from './sheet-names.ts';
import { tablePlaces, tableSheetLayout } from './table-layout.ts';
import { fillTableSheet } from './table-sheet.ts';
import { workbookBytes } from './workbook-bytes.ts';
import { nameStems, type NamedRange } from './workbook-names.ts';
import { fillWorkingsSheet } from './workings-sheet.ts';

/** Names of the sheets of each group, in the order of the norm set's groups. */
export interface GroupSheets {
  readonly table: string;
  readonly workings: string;
}

export function groupSheets({ groups, project }: NormSet): readonly GroupSheets[] {
  const titles = groups.map(({ group }) => printedTitle(project, group));
  const standing = [LOOK_UP, LOOK_UP_ROWS, ABOUT, CUTS];
  const tables = sheetNames(titles, standing);
  const workings = sheetNames(
    tables.map((table) => `Workings ${table}`),
    [...standing, ...tables],
  );
  return tables.map((table, index) => ({ table, workings: workings[index] ?? '' }));
}

/**
 * A workbook (xlsx): a look-up sheet, a table for each group, its workings in formulas, the cuts where there are any,
 * where they come from, and the rows behind the look-up. A group's table, its number of people and its count of agreeing rows have names.
 */
export async function tablesWorkbook(normSet: NormSet): Promise<Uint8Array> {
  const day = releaseDay(normSet.project);
  const workbook = new ExcelJS.Workbook();
  workbook.creator = 'Normloom';
  workbook.lastModifiedBy = 'Normloom';
  workbook.created = day;
  workbook.modified = day;
  workbook.title = draftTitle(normSet, surveyName(normSet.project));
  workbook.calcProperties.fullCalcOnLoad = true;
  const lookUp = workbook.addWorksheet(LOOK_UP);
  const sheets = groupSheets(normSet);
  const stems = nameStems(normSet.groups.map(({ group }) => group.title));
  const printed = normSet.groups.map((norms, index) => {
    const layout = tableSheetLayout(normSet, norms);
    const names = sheets[index] ?? { table: '', workings: '' };
    return { norms, layout, names, stem: stems[index] ?? '' };
  });
  for (const { norms, layout, names } of printed) {
    fillTableSheet(workbook.addWorksheet(names.table), normSet, norms, layout);
  }
  const ranges = printed.flatMap(({ norms, layout, names, stem }): readonly NamedRange[] => {
    const sheet = workbook.addWorksheet(names.workings);
    const cells = fillWorkingsSheet(sheet, normSet, norms, tablePlaces(names.table, layout));
    const lastColumn = sheet.getColumn(layout.width).letter;
    const table = `A${layout.headRow}:${lastColumn}${layout.lastRow}`;
    return [
      { name: `Table_${stem}`, sheetName: names.table, address: table },
      { name: `People_${stem}`, sheetName: names.workings, address: cells.people },
      { name: `Agreement_${stem}`, sheetName: names.workings, address: cells.agreement },
    ];
  });
  if (normSet.project.cuts.length > 0) fillCutsSheet(workbook.addWorksheet(CUTS), normSet);
  fillAboutSheet(workbook.addWorksheet(ABOUT), normSet, ranges);
  fillLookUp(lookUp, workbook.addWorksheet(LOOK_UP_ROWS), normSet);
  return workbookBytes(workbook, ranges, day);
}
