import type ExcelJS from 'exceljs';
import JSZip from 'jszip';
import { withNamedRanges, type NamedRange } from './workbook-names.ts';

/** Zip archives cannot hold an earlier day. */
const FIRST_ZIP_DAY = new Date('1980-01-01T00:00:00Z');
const WORKBOOK_PART = 'xl/workbook.xml';

/** The bytes of a workbook with named ranges, and with one date on every part, so that it does not tell when it was made. */
export async function workbookBytes(
  workbook: ExcelJS.Workbook,
  ranges: readonly NamedRange[],
  day: Date,
): Promise<Uint8Array> {
  const archive = await JSZip.loadAsync(await workbook.xlsx.writeBuffer());
  const sheets = await archive.file(WORKBOOK_PART)?.async('string');
  if (sheets === undefined) throw new RangeError('a workbook without its list of sheets');
  archive.file(WORKBOOK_PART, withNamedRanges(sheets, ranges), { createFolders: false });
  for (const part of Object.values(archive.files)) part.date = day < FIRST_ZIP_DAY ? FIRST_ZIP_DAY : day;
  return archive.generateAsync({ type: 'uint8array', compression: 'DEFLATE', platform: 'DOS' });
}
