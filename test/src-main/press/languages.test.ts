import ExcelJS from 'exceljs';
import { afterEach, describe, expect, it } from 'vitest';
import { say, wordsOf } from '../../../shared-core/languages/phrases.ts';
import { printedColumns } from '../../../shared-core/norms/table-columns.ts';
import { sheetTitle } from '../../../shared-core/pages/sheet-texts.ts';
import { headInOneLine } from '../../../shared-core/pages/spoken-text.ts';
import { bookletPdf } from '../../../src-main/press/booklet-pdf.ts';
import type { FileReadBack } from '../../../src-main/press/read-back/cell-differences.ts';
import { readBack } from '../../../src-main/press/read-back/read-back.ts';
import { tablesCsv } from '../../../src-main/press/tables-csv.ts';
import { tablesWorkbook } from '../../../src-main/press/workbook.ts';
import { withEveryColumn, wordlessSet } from '../../shared-core/languages/booklets-in-languages.ts';
import { readPdf } from './pdf-text.ts';

const zone = process.env['TZ'];

afterEach(() => {
  if (zone === undefined) delete process.env['TZ'];
  else process.env['TZ'] = zone;
});

describe.each(['de', 'es', 'fr'] as const)('pressed in %s', (words) => {
  const normSet = wordlessSet(words, withEveryColumn);

  async function readOne(file: string, bytes: Uint8Array): Promise<FileReadBack> {
    const read = await readBack([{ file, bytes }], normSet);
    if (!read.ok || read.value[0] === undefined) throw new Error(read.ok ? 'nothing read' : read.problem);
    return read.value[0];
  }

  it('a booklet is marked with its language', async () => {
    expect((await readPdf((await bookletPdf(normSet)).pdf)).language).toBe(words);
  });

  it('a booklet has the same bytes in another time zone', async () => {
    const { pdf } = await bookletPdf(normSet);
    process.env['TZ'] = 'Pacific/Kiritimati';
    expect(Buffer.compare((await bookletPdf(normSet)).pdf, pdf)).toBe(0);
  });

  it('a workbook has its words in the language, its figures as machines read them, and is read back', async () => {
    const bytes = await tablesWorkbook(normSet);
    const read = await readOne('tables.xlsx', bytes);
    expect(read.differences).toEqual([]);
    const workbook = new ExcelJS.Workbook();
    await workbook.xlsx.load(Uint8Array.from(bytes).buffer);
    const [norms] = normSet.groups;
    if (norms === undefined) throw new Error('no group');
    const sheet = workbook.worksheets.find((each) => each.getCell('A1').value === sheetTitle(normSet.project, norms));
    const texts: unknown[] = [];
    sheet?.eachRow((row) => row.eachCell(({ value }) => texts.push(value)));
    const heads = printedColumns(normSet.project).map(({ heading }) => headInOneLine(heading));
    expect(texts).toEqual(expect.arrayContaining(heads));
    expect(texts).toContain(norms.rows[3]?.score);
    const about = workbook.getWorksheet('About');
    expect(about?.getCell('A1').value).toBe(say(wordsOf(normSet.project), 'about.title'));
  });

  it('a csv is the English one', () => {
    const english = wordlessSet('en', withEveryColumn);
    const withoutCheck = (bytes: Uint8Array): string =>
      Buffer.from(bytes)
        .toString('utf8')
        .replace(/[0-9A-F]{4}-[0-9A-F]{4}/g, '');
    expect(withoutCheck(tablesCsv(normSet))).toBe(withoutCheck(tablesCsv(english)));
  });
});
