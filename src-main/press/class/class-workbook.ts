import ExcelJS, { type Worksheet } from 'exceljs';
import type { ReportChoices } from '../../../shared-core/class/class-file.ts';
import type { ClassSheet, ClassSheets } from '../../../shared-core/pages/class-sheets.ts';
import { sheetNames } from '../sheet-names.ts';
import { typedCell } from '../typed-cell.ts';
import { workbookBytes } from '../workbook-bytes.ts';
import { asBold, asHead, asProse, asTitle, fillCell, linesIn, ruleBelow, titleRow } from '../workbook-look.ts';
import { setUpPages } from '../workbook-pages.ts';

export const SUBTITLE_ROW = 2;
export const HEAD_ROW = 4;
const NARROWEST = 10;
const WIDEST = 44;
const PROSE_WIDTHS = [24, 90] as const;
const ROWS_IN_FIVE = 5;

/**
 * A workbook (xlsx) of a class: texts as texts, also those that look like formulas, and figures as numbers that show
 * what the report prints. The same class gives the same bytes.
 */
export async function classWorkbook(content: ClassSheets, report: ReportChoices, day: Date): Promise<Uint8Array> {
  const workbook = new ExcelJS.Workbook();
  workbook.creator = 'Normloom';
  workbook.lastModifiedBy = 'Normloom';
  workbook.created = day;
  workbook.modified = day;
  const { draft } = content;
  workbook.title = marked(draft, content.title);
  const names = sheetNames(
    content.sheets.map(({ name }) => name),
    [],
  );
  const foot = [marked(draft, content.title), content.subtitle, content.check].join(' \u00b7 ');
  content.sheets.forEach((sheet, index) => {
    const worksheet = workbook.addWorksheet(names[index] ?? '');
    const across = sheet.heads.length === 0 ? fillProse(worksheet, sheet) : fillTable(worksheet, sheet);
    worksheet.getCell(SUBTITLE_ROW, 1).value = subtitleOf(sheet, content);
    setUpPages(worksheet, { paper: report.paper, orientation: 'portrait', language: report.language }, foot, across);
  });
  return workbookBytes(workbook, [], day);
}

/** The line below the title of a sheet: what the table is, and whether it is a draft. */
export function subtitleOf({ heads }: ClassSheet, { draft, subtitle }: ClassSheets): string {
  return heads.length === 0 ? draft : marked(draft, subtitle);
}

function marked(draft: string, text: string): string {
  return [draft, text].filter((part) => part !== '').join(' \u00b7 ');
}

/** Leads and paragraphs; returns the width in characters. */
function fillProse(worksheet: Worksheet, { title, rows }: ClassSheet): number {
  worksheet.columns = PROSE_WIDTHS.map((width) => ({ width }));
  worksheet.getCell(1, 1).value = title;
  asTitle(worksheet.getCell(1, 1));
  rows.forEach(([lead = '', text = ''], index) => {
    const [left, right] = [worksheet.getCell(index + 3, 1), worksheet.getCell(index + 3, 2)];
    left.value = lead;
    right.value = text;
    asBold(left);
    asProse(left);
    asProse(right);
    worksheet.getRow(index + 3).height = 15 * Math.max(linesIn(lead, PROSE_WIDTHS[0]), linesIn(text, PROSE_WIDTHS[1]));
    for (const cell of [left, right]) ruleBelow(cell, 'fine');
  });
  return PROSE_WIDTHS[0] + PROSE_WIDTHS[1];
}

const WORDS = { horizontal: 'left', wrapText: true } as const;

/** Words behind figures stand off them: the figures end where the words begin. */
function indentAt(kinds: ClassSheet['kinds'], place: number): number {
  return kinds[place - 1] === 'figures' ? 1 : 0;
}

/** Title, subtitle, heads and rows in fives; returns the width in characters. */
function fillTable(worksheet: Worksheet, { title, heads, kinds, rows }: ClassSheet): number {
  const widths = heads.map((head, place) =>
    Math.min(
      WIDEST,
      Math.max(NARROWEST, Math.ceil(head.length / 2), ...rows.map((row) => (row[place] ?? '').length + 2)),
    ),
  );
  const across = widths.reduce((sum, width) => sum + width, 0);
  worksheet.columns = widths.map((width) => ({ width }));
  titleRow(worksheet, title, heads.length, across);
  heads.forEach((head, place) => {
    const cell = worksheet.getCell(HEAD_ROW, place + 1);
    cell.value = head;
    asHead(cell);
    if (kinds[place] === 'words') cell.alignment = { ...WORDS, indent: indentAt(kinds, place), vertical: 'bottom' };
  });
  worksheet.getRow(HEAD_ROW).height = 30;
  rows.forEach((row, index) => {
    row.forEach((text, place) => {
      const cell = worksheet.getCell(HEAD_ROW + 1 + index, place + 1);
      if (text !== '') {
        fillCell(cell, kinds[place] === 'figures' ? typedCell(text) : { kind: 'text', value: text });
        if (kinds[place] === 'words') cell.alignment = { ...WORDS, indent: indentAt(kinds, place), vertical: 'top' };
      }
      const last = index === rows.length - 1;
      if (last || (index + 1) % ROWS_IN_FIVE === 0) ruleBelow(cell, last ? 'strong' : 'fine');
    });
  });
  worksheet.views = [
    { state: 'frozen', xSplit: 1, ySplit: HEAD_ROW, topLeftCell: `B${HEAD_ROW + 1}`, activeCell: 'A1' },
  ];
  worksheet.pageSetup.printTitlesRow = `${HEAD_ROW}:${HEAD_ROW}`;
  return across;
}
