import ExcelJS from 'exceljs';
import JSZip from 'jszip';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { draftTitle, surveyName } from '../../shared-core/pages/sheet-texts.ts';
import { ABOUT, fillAboutSheet } from './about-sheet.ts';
import { fillLookUp, LOOK_UP, LOOK_UP_ROWS } from './look-up-sheet.ts';
import { releaseDay } from './release-day.ts';
import { sheetNames } from './sheet-names.ts';
import { fillTableSheet } from './table-sheet.ts';

/** Zip archives cannot hold an earlier day. */
const FIRST_ZIP_DAY = new Date('1980-01-01T00:00:00Z');

/** A workbook (xlsx): a look-up sheet, one sheet for each group, where they come from, and the rows behind the look-up. */
export async function tablesWorkbook(normSet: NormSet): Promise<Uint8Array> {
  const day = releaseDay(normSet.project);
  const workbook = new ExcelJS.Workbook();
  workbook.creator = 'Normloom';
  workbook.lastModifiedBy = 'Normloom';
  workbook.created = day;
  workbook.modified = day;
  workbook.title = draftTitle(normSet, surveyName(normSet.project));
  workbook.calcProperties.fullCalcOnLoad = true;
  const titles = normSet.groups.map(({ group }) => group.title);
  const names = sheetNames(titles, [LOOK_UP, LOOK_UP_ROWS, ABOUT]);
  const lookUp = workbook.addWorksheet(LOOK_UP);
  normSet.groups.forEach((norms, index) => {
    fillTableSheet(workbook.addWorksheet(names[index] ?? ''), normSet, norms);
  });
  fillAboutSheet(workbook.addWorksheet(ABOUT), normSet);
  fillLookUp(lookUp, workbook.addWorksheet(LOOK_UP_ROWS), normSet);
  return withFixedDates(await workbook.xlsx.writeBuffer(), day < FIRST_ZIP_DAY ? FIRST_ZIP_DAY : day);
}

/** The same archive with one date on every part, so that it does not tell when it was made. */
async function withFixedDates(bytes: ExcelJS.Buffer, day: Date): Promise<Uint8Array> {
  const archive = await JSZip.loadAsync(bytes);
  for (const part of Object.values(archive.files)) part.date = day;
  return archive.generateAsync({ type: 'uint8array', compression: 'DEFLATE', platform: 'DOS' });
}
