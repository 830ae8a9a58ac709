import { utils, write, type BookType } from '@e965/xlsx';
import ExcelJS from 'exceljs';
import JSZip from 'jszip';
import { createHash } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import { beforeAll, describe, expect, it, vi } from 'vitest';
import { readingWith } from '../../shared-core/tally/readings.ts';
import { cohortFolder, leftOut, look, lookProblem, tally } from './cohorts-at-hand.ts';

const folder = cohortFolder();

const EXPECTED = [
  ['007', '12', '1.25', '2024-01-03', 'TRUE'],
  ['Überlingen & Co', '0.1', '2', '2024-01-03T06:00:00', 'FALSE'],
  ['', '', '', '', ''],
  ['rich text', '15', '3', '', ''],
  ['99', 'text', '1', '', ''],
];

describe('an xlsx workbook', () => {
  let path = '';

  beforeAll(async () => {
    const book = new ExcelJS.Workbook();
    book.addWorksheet('Notes').addRow(['nothing here']);
    const sheet = book.addWorksheet('Scores <5 & more');
    sheet.addRow(['id', 'score', 'weight', 'tested', 'present']);
    sheet.addRow(['007', 12, 1.25, new Date(Date.UTC(2024, 0, 3)), true]);
    sheet.addRow(['Überlingen & Co', 0.1, { formula: 'C2+0.75', result: 2 }, new Date(Date.UTC(2024, 0, 3, 6)), false]);
    sheet.getCell('A5').value = { richText: [{ text: 'rich ' }, { text: 'text', font: { bold: true } }] };
    sheet.getCell('B5').value = { formula: 'CONCAT("1","5")', result: '15' };
    sheet.getCell('C5').value = 3;
    sheet.getCell('A6').value = '99';
    sheet.getCell('B6').value = 'text';
    sheet.getCell('C6').value = 1;
    sheet.getCell('A400').style = { font: { bold: true } };
    path = await folder.write('book.xlsx', new Uint8Array(await book.xlsx.writeBuffer()));
  });

  it('shows its sheets and the cells of the one that is asked for as texts', async () => {
    const first = await look(path);
    expect(first.sheets).toEqual(['Notes', 'Scores <5 & more']);
    expect(first.reading.sheet).toBe('Notes');
    expect(first.remarks[0]).toBe('The workbook has 2 sheets; "Notes" is read.');
    const second = await look(path, { ...first.reading, sheet: 'Scores <5 & more', header: true });
    expect(second.columns).toEqual(['id', 'score', 'weight', 'tested', 'present']);
    expect(second.rows).toEqual(EXPECTED);
    expect(second.reading.roles).toContainEqual({ column: 'score', role: 'score' });
  });

  it('is tallied with its row numbers', async () => {
    const reading = readingWith(
      { id: 'id', score: 'score', weight: 'weight' },
      { sheet: 'Scores <5 & more', scale: { min: 0, max: 20, step: 0.1, direction: 'high-is-good' } },
    );
    const tallied = await tally(path, reading);
    expect(leftOut(tallied)).toEqual({ 'blank-row': [4], 'not-a-number': [6] });
    expect(tallied.source.rowsKept).toBe(3);
    expect(tallied.tally.cells[0]?.weights?.[1]).toBe('200');
    expect(tallied.source.sha256).toBe(
      createHash('sha256')
        .update(await readFile(path))
        .digest('hex'),
    );
  });

  it('writes its numbers with the decimal mark of the reading', async () => {
    const reading = readingWith({ score: 'score' }, { sheet: 'Scores <5 & more', decimalMark: ',' });
    expect((await look(path, reading)).rows[1]?.[1]).toBe('0,1');
  });

  it('has no other sheets', async () => {
    expect(await lookProblem(path, readingWith({}, { sheet: 'Elsewhere' }))).toMatch(/no sheet "Elsewhere"/);
  });

  it('that is broken is refused', async () => {
    const whole = await readFile(path);
    const broken = Buffer.concat([whole.subarray(0, 600), Buffer.alloc(400), whole.subarray(1000)]);
    expect(await lookProblem(await folder.write('broken.xlsx', broken))).toMatch(/damaged/);
  });
});

describe('a workbook as other programs write it', () => {
  /** Prefixes, absolute targets, no references, inline runs, phonetic aids, days from 1904, cells past the heading. */
  async function foreignBook(): Promise<string> {
    const zip = new JSZip();
    zip.file(
      'xl/worksheets/data.xml',
      '<?xml version="1.0"?><!-- > --><x:worksheet xmlns:x="m"><x:sheetData>' +
        '<x:row><x:c t="inlineStr"><x:is><x:r><x:t>sc</x:t></x:r><x:r><x:t xml:space="preserve">ore </x:t></x:r></x:is></x:c>' +
        '<x:c t="s"><x:v>0</x:v></x:c></x:row>' +
        '<x:row><x:c><x:v>1.0E1</x:v></x:c><x:c s="1"><x:v>0</x:v></x:c></x:row>' +
        '<x:row r="4"><x:c r="A4" t="b"><x:v>1</x:v></x:c><x:c r="C4" t="str"><x:f>A1&gt;"&lt;"</x:f><x:v><![CDATA[a<b]]>_x0041_</x:v></x:c></x:row>' +
        '<x:row r="5"><x:c r="A5" t="e"><x:v>#N/A</x:v></x:c><x:c r="B5" s="1"/></x:row>' +
        '</x:sheetData></x:worksheet>',
    );
    zip.file('xl/sharedStrings.xml', '<sst><si><t>田中</t><rPh sb="0" eb="2"><t>タナカ</t></rPh></si></sst>');
    zip.file(
      'xl/styles.xml',
      '<styleSheet><numFmts><numFmt numFmtId="170" formatCode="[$-409]d\\-mmm&quot;y&quot;"/></numFmts>' +
        '<cellStyleXfs><xf numFmtId="14"/></cellStyleXfs><cellXfs><xf numFmtId="0"/><xf numFmtId="170"/></cellXfs></styleSheet>',
    );
    zip.file(
      'xl/_rels/workbook.xml.rels',
      '<Relationships><Relationship Id="r9" Type="http://x/worksheet" Target="/xl/worksheets/data.xml"/></Relationships>',
    );
    zip.file(
      'xl/workbook.xml',
      `<workbook><workbookPr date1904='1'/><sheets><sheet name="A &amp; B" r:id="r9"/></sheets></workbook>`,
    );
    return folder.write('foreign.xlsx', await zip.generateAsync({ type: 'uint8array' }));
  }

  it('is read the same', async () => {
    const { sheets, columns, rows } = await look(await foreignBook(), readingWith({}));
    expect(sheets).toEqual(['A & B']);
    expect(columns).toEqual(['score', '田中']);
    expect(rows).toEqual([
      ['10', '00:00:00'],
      ['', ''],
      ['TRUE', '', 'a<bA'],
      ['#N/A', ''],
    ]);
  });

  it('has ragged rows only where cells stand past the heading', async () => {
    const tallied = await tally(await foreignBook(), readingWith({ score: 'score' }));
    expect(leftOut(tallied)).toEqual({ 'blank-row': [3], 'ragged-row': [4], 'not-a-number': [5] });
  });
});

describe.each(['ods', 'biff8', 'xlsb'] as const satisfies readonly BookType[])(
  'a workbook in the format %s',
  (bookType) => {
    async function written(): Promise<string> {
      const sheet = utils.aoa_to_sheet(
        [
          ['id', 'score', 'weight', 'tested', 'present'],
          ['007', 12, 1.25, new Date(Date.UTC(2024, 0, 3)), true],
          [],
          ['8', 0.1, 2, '', false],
          ['9', 'text', 1],
        ],
        { cellDates: true, UTC: true },
      );
      const book = {
        SheetNames: ['Empty', 'Scores'],
        Sheets: { Empty: utils.aoa_to_sheet([['x'], ['y']]), Scores: sheet },
      };
      return folder.write(`old.${bookType}`, new Uint8Array(write(book, { type: 'buffer', bookType }) as Buffer));
    }

    it('is read', async () => {
      const path = await written();
      const reading = readingWith(
        { id: 'id', score: 'score', weight: 'weight' },
        { sheet: 'Scores', scale: { min: 0, max: 20, step: 0.1, direction: 'high-is-good' } },
      );
      const seen = await look(path, reading);
      expect(seen.sheets).toEqual(['Empty', 'Scores']);
      expect(seen.columns).toEqual(['id', 'score', 'weight', 'tested', 'present']);
      expect(seen.rows).toEqual([
        ['007', '12', '1.25', '2024-01-03', 'TRUE'],
        ['', '', '', '', ''],
        ['8', '0.1', '2', '', 'FALSE'],
        ['9', 'text', '1', '', ''],
      ]);
      const tallied = await tally(path, reading);
      expect(leftOut(tallied)).toEqual({ 'blank-row': [3], 'not-a-number': [5] });
      expect(tallied.source.rowsRead).toBe(4);
      expect(await lookProblem(path, { ...reading, sheet: 'Elsewhere' })).toMatch(/no sheet "Elsewhere"/);
    });
  },
);

describe('an ods workbook with number formats that the reader does not know', () => {
  it('is read without a word on the console', async () => {
    const book = { SheetNames: ['S'], Sheets: { S: utils.aoa_to_sheet([['score'], [5], [6]]) } };
    const zip = await JSZip.loadAsync(write(book, { type: 'buffer', bookType: 'ods' }) as Buffer);
    const styles = '<office:automatic-styles>';
    const content = (await zip.file('content.xml')?.async('string')) ?? '';
    const map = '<style:map style:condition="value()&lt;0" style:apply-style-name="N1"/>';
    const format = `<number:number-style style:name="N9"><number:number/>${map}</number:number-style>`;
    expect(content).toContain(styles);
    zip.file('content.xml', content.replace(styles, `${styles}${format}`));
    const path = await folder.write('formats.ods', await zip.generateAsync({ type: 'uint8array' }));
    const console = vi.spyOn(globalThis.console, 'error').mockReturnValue();
    expect((await look(path)).rows).toEqual([['5'], ['6']]);
    expect(console).not.toHaveBeenCalled();
    console.mockRestore();
  });
});
