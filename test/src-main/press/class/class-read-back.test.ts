import ExcelJS from 'exceljs';
import { describe, expect, it } from 'vitest';
import type { Block, PlacedPages, TextLine } from '../../../../shared-core/pages/booklet.ts';
import { classSheets } from '../../../../shared-core/pages/class-sheets.ts';
import { composeClassReport } from '../../../../shared-core/pages/class-report-pages.ts';
import { composeSlips } from '../../../../shared-core/pages/slip-pages.ts';
import { classRecords } from '../../../../src-main/press/class/class-csv.ts';
import { classWorkbook, HEAD_ROW } from '../../../../src-main/press/class/class-workbook.ts';
import { readClassCsv } from '../../../../src-main/press/class/read-back/read-class-csv.ts';
import { readClassReport } from '../../../../src-main/press/class/read-back/read-class-report.ts';
import { readClassWorkbook } from '../../../../src-main/press/class/read-back/read-class-workbook.ts';
import { readSlips } from '../../../../src-main/press/class/read-back/read-slips.ts';
import { csvFile } from '../../../../src-main/press/csv-records.ts';
import { placedPdf } from '../../../../src-main/press/placed-pdf.ts';
import { differenceLine, type FileReadBack } from '../../../../src-main/press/read-back/cell-differences.ts';
import { printOf, sampleFile, spreadScores } from '../../../shared-core/pages/sample-class.ts';

const PRINT = printOf(sampleFile({ entries: spreadScores(28), groups: ['a', 'b'] }));
const REPORT = composeClassReport(PRINT);
const SLIPS = slips();
const DAY = new Date(0);

function slips(): PlacedPages {
  const made = composeSlips(PRINT);
  if (!made.ok) throw new Error(made.problem);
  return made.value;
}

/** The pages with another text in the first line that the test asks for. */
function changed(placed: PlacedPages, wanted: (line: TextLine) => boolean, to: (text: string) => string): PlacedPages {
  const found: Block[] = [];
  const change = (block: Block): Block => {
    if (found.length > 0 || block.kind !== 'text' || !wanted(block)) return block;
    found.push(block);
    return { ...block, runs: block.runs.map((run) => ({ ...run, text: to(run.text) })) };
  };
  const pages = placed.pages.map((page) => ({ ...page, blocks: page.blocks.map(change) }));
  if (found.length === 0) throw new Error('nothing was changed');
  return { ...placed, pages };
}

const cell =
  (table: RegExp, row: number, column: number) =>
  ({ role }: TextLine): boolean =>
    role.kind === 'cell' && table.test(role.table) && role.row === row && role.column === column;
const prose =
  (name: string) =>
  ({ role }: TextLine): boolean =>
    'name' in role && role.name === name;

const otherDigit = (text: string): string => text.replace(/\d/, (digit) => String((Number(digit) + 1) % 10));
const told = ({ differences }: FileReadBack): readonly string[] => differences.map(differenceLine);

/** Draws the first pages and reads them as if they were the second. */
async function readReport(drawn: PlacedPages, meant: PlacedPages): Promise<readonly string[]> {
  const { pdf } = await placedPdf(drawn, DAY);
  return told(await readClassReport('class-report.pdf', pdf, meant, PRINT));
}

async function readDrawnSlips(drawn: PlacedPages, meant: PlacedPages): Promise<readonly string[]> {
  const { pdf } = await placedPdf(drawn, DAY);
  return told(await readSlips('slips.pdf', pdf, meant, PRINT));
}

describe('reading a class report back', () => {
  it('finds nothing in what was pressed', async () => {
    expect(await readReport(REPORT, REPORT)).toEqual([]);
    expect(await readDrawnSlips(SLIPS, SLIPS)).toEqual([]);
  });

  it.each([
    ['a raw score', cell(/^pupils$/, 7, 2)],
    ['a percentile rank', cell(/^pupils$/, 7, 3)],
    ['a band', cell(/^pupils$/, 20, 4)],
    ['a stanine', cell(/^pupils$/, 27, 5)],
    ['a number of the class', cell(/^counts$/, 1, 1)],
    ['a quarter', cell(/^quarters$/, 2, 1)],
    ['a check code', ({ role }: TextLine) => role.kind === 'running' && role.edge === 'bottom'],
    ['a sentence', prose('about 0')],
  ] as const)('finds one wrong glyph in %s', async (_, wanted) => {
    const wrong = changed(REPORT, wanted, otherDigit);
    expect((await readReport(wrong, REPORT)).length).toBeGreaterThan(0);
  });

  it('finds one wrong letter of a name, and a text that nobody placed', async () => {
    const wrong = changed(REPORT, cell(/^pupils$/, 3, 0), (text) => text.replace('o', 'ò'));
    expect((await readReport(wrong, REPORT)).join(' ')).toContain('table pupils, row 4, column 1');
    const page = REPORT.pages[0];
    const line = page?.blocks.find((block) => block.kind === 'text');
    if (page === undefined || line?.kind !== 'text') throw new Error('no line');
    const more = { ...line, x: 200, baseline: 700, runs: [{ text: '7', face: 'sans' as const }] };
    const pages = [{ ...page, blocks: [...page.blocks, more] }, ...REPORT.pages.slice(1)];
    expect(await readReport({ ...REPORT, pages }, REPORT)).toEqual([
      'class-report.pdf, page 1: text: expected nothing, found "7"',
    ]);
  });

  it('finds a page that is missing, and a row that was left out', async () => {
    expect((await readReport({ ...REPORT, pages: REPORT.pages.slice(0, 1) }, REPORT)).length).toBeGreaterThan(20);
    const without = REPORT.pages.map((page) => ({
      ...page,
      blocks: page.blocks.filter(
        (block) => block.kind !== 'text' || block.role.kind !== 'cell' || block.role.row !== 12,
      ),
    }));
    expect((await readReport({ ...REPORT, pages: without }, REPORT)).length).toBeGreaterThan(4);
  });

  it('finds a number that was placed wrongly from the start, against the row of the table', async () => {
    for (const column of [2, 3, 4, 5]) {
      const wrong = changed(REPORT, cell(/^pupils$/, 11, column), otherDigit);
      const differences = await readReport(wrong, wrong);
      expect(differences.length).toBeGreaterThan(0);
      expect(differences.every((line) => line.includes('pupil 12'))).toBe(true);
    }
  });

  it('finds one wrong glyph on a slip, drawn or placed wrongly', async () => {
    for (const column of [0, 1, 2]) {
      const wrong = changed(SLIPS, cell(/^slip 9 figures$/, 0, column), otherDigit);
      expect((await readDrawnSlips(wrong, SLIPS)).length).toBeGreaterThan(0);
      expect((await readDrawnSlips(wrong, wrong)).join(' ')).toContain('slip 10');
    }
    const sentence = changed(
      SLIPS,
      ({ role, runs }) =>
        'name' in role && role.name.startsWith('slip 4 means') && runs.some(({ text }) => /\d/.test(text)),
      otherDigit,
    );
    expect((await readDrawnSlips(sentence, SLIPS)).length).toBeGreaterThan(0);
  });
});

describe('reading the workbook and the csv of a class back', () => {
  const content = classSheets(PRINT);
  const { report } = PRINT.file;

  async function readChanged(change: (workbook: ExcelJS.Workbook) => void): Promise<readonly string[]> {
    const workbook = new ExcelJS.Workbook();
    await workbook.xlsx.load(Uint8Array.from(await classWorkbook(content, report, new Date(0))).buffer);
    change(workbook);
    const bytes = new Uint8Array(await workbook.xlsx.writeBuffer());
    return told(await readClassWorkbook('class.xlsx', bytes, content, PRINT));
  }

  const peopleCell = (workbook: ExcelJS.Workbook, row: number, column: number): ExcelJS.Cell => {
    const [sheet] = workbook.worksheets;
    if (sheet === undefined) throw new Error('no sheet');
    return sheet.getCell(HEAD_ROW + row, column);
  };

  it('finds nothing in what was pressed', async () => {
    expect(await readChanged(() => {})).toEqual([]);
  });

  it('finds a number stored as a text, a wrong number, a wrong name, and a row too many', async () => {
    const asText = await readChanged((workbook) => {
      peopleCell(workbook, 3, 3).value = String(Number(peopleCell(workbook, 3, 3).value));
    });
    expect(asText.join(' ')).toContain('not held as a number');
    const wrong = await readChanged((workbook) => {
      peopleCell(workbook, 3, 4).value = Number(peopleCell(workbook, 3, 4).value) + 1;
    });
    expect(wrong.length).toBeGreaterThan(1);
    const named = await readChanged((workbook) => {
      peopleCell(workbook, 5, 1).value = 'Somebody Else';
    });
    expect(named).toHaveLength(1);
    const more = await readChanged((workbook) => {
      peopleCell(workbook, 29, 1).value = 'One More';
    });
    expect(more).toHaveLength(1);
  });

  it('finds a wrong number of the sheets themselves, against the row of the table', async () => {
    const [people, ...others] = content.sheets;
    if (people === undefined) throw new Error('no sheet');
    const rows = people.rows.map((row, index) =>
      index === 6 ? row.map((text, place) => (place === 3 ? otherDigit(text) : text)) : row,
    );
    const wrong = { ...content, sheets: [{ ...people, rows }, ...others] };
    const bytes = await classWorkbook(wrong, report, new Date(0));
    const differences = told(await readClassWorkbook('class.xlsx', bytes, wrong, PRINT));
    expect(differences).toHaveLength(1);
    expect(differences[0]).toContain('percentile-rank');
  });

  const records = classRecords(PRINT);
  const readRecords = (rows: readonly (readonly string[])[]): readonly string[] =>
    told(readClassCsv('class.csv', csvFile([records.heads, ...rows]), records, PRINT));

  it('finds two lines that changed places, a line too few and a wrong number in the csv', () => {
    expect(readRecords(records.rows)).toEqual([]);
    const [first, second, ...rest] = records.rows;
    if (first === undefined || second === undefined) throw new Error('no lines');
    expect(readRecords([second, first, ...rest]).length).toBeGreaterThan(3);
    expect(readRecords([first, ...rest]).length).toBeGreaterThan(3);
    const wrong = first.map((text, place) => (records.heads[place] === 'printed' ? '98' : text));
    expect(readRecords([wrong, second, ...rest])).toHaveLength(2);
  });

  it('finds a number that was recorded wrongly, against the row of the table', () => {
    const at = records.heads.indexOf('printed-measurement-band');
    const rows = records.rows.map((row, index) => (index === 4 ? row.with(at, '1–2') : row));
    const wrong = { ...records, rows };
    const differences = told(readClassCsv('class.csv', csvFile([wrong.heads, ...rows]), wrong, PRINT));
    expect(differences).toHaveLength(1);
    expect(differences[0]).toContain('line 6');
  });
});
