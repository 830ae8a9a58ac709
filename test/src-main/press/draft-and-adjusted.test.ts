import ExcelJS from 'exceljs';
import Papa from 'papaparse';
import { describe, expect, it } from 'vitest';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { composeBooklet } from '../../../shared-core/pages/booklet-pages.ts';
import type { Block, TextLine } from '../../../shared-core/pages/booklet.ts';
import { tableMarks } from '../../../shared-core/pages/table-blocks.ts';
import { normSetJson } from '../../../src-main/press/norm-set-json.ts';
import { pressFiles } from '../../../src-main/press/press-files.ts';
import { tablesCsv } from '../../../src-main/press/tables-csv.ts';
import { tablesWorkbook } from '../../../src-main/press/workbook.ts';
import { sampleNormSet, sampleProject, WHOLE_SCALE } from '../../shared-core/pages/sample-norm-set.ts';

const cohort = { scale: WHOLE_SCALE } as const;
const released = sampleNormSet(cohort);
const draft = sampleNormSet(cohort, (project) => ({ ...project, sheet: { ...project.sheet, cautions: '' } }));

/** Raw 20 of grade 4 one point up. */
function adjust(project: NormProject): NormProject {
  const row = released.groups[0]?.rows[20];
  const to = String(Number(row?.printed) + 1);
  return { ...project, adjustments: [{ values: ['4'], score: 20, to, reason: 'Board, 3 June', by: 'M. Orr' }] };
}

const adjusted = sampleNormSet(cohort, adjust);
const [from, to] = [released, adjusted].map(({ groups }) => groups[0]?.rows[20]?.printed ?? '');

function textsOf(blocks: readonly Block[]): readonly TextLine[] {
  return blocks.flatMap((block) => {
    if (block.kind === 'table-column') return tableMarks(block).filter((mark) => mark.kind === 'text');
    return block.kind === 'text' ? [block] : [];
  });
}

function written(line: TextLine): string {
  return line.runs.map(({ text }) => text).join('');
}

async function workbookOf(set: NormSet): Promise<ExcelJS.Workbook> {
  const bytes = await tablesWorkbook(set);
  const whole = new ArrayBuffer(bytes.length);
  new Uint8Array(whole).set(bytes);
  const workbook = new ExcelJS.Workbook();
  await workbook.xlsx.load(whole);
  return workbook;
}

/** The foot of a sheet; empty where it was given none. */
function footOf(sheet: ExcelJS.Worksheet): string {
  const read: { readonly headerFooter: Partial<ExcelJS.HeaderFooter> | null } = sheet;
  return read.headerFooter?.oddFooter ?? '';
}

function csvOf(set: NormSet): readonly Record<string, string>[] {
  const text = new TextDecoder().decode(tablesCsv(set));
  return Papa.parse<Record<string, string>>(text, { header: true, skipEmptyLines: true }).data;
}

describe('a draft', () => {
  it('says so in the running head of every page, above the table, and nowhere once it is released', () => {
    const { pages, title } = composeBooklet(draft);
    expect([draft.status, released.status]).toEqual(['draft', 'released']);
    for (const { blocks } of pages) {
      const tables = blocks.flatMap((block) => (block.kind === 'table-column' ? [block.top] : []));
      const [head] = textsOf(blocks).filter((line) => line.runs.some(({ text }) => text === 'DRAFT'));
      expect(head?.runs[0]?.face).toBe('sans-bold');
      expect(head?.baseline).toBeLessThan(Math.min(...tables, 100));
    }
    expect(title).toMatch(/^DRAFT · /);
    const all = composeBooklet(released).pages.flatMap(({ blocks }) => textsOf(blocks).map(written));
    expect(all.filter((text) => text.includes('DRAFT'))).toEqual([]);
  });

  it('says so however long the survey is called, and where it has no name', () => {
    for (const name of ['Ostrey '.repeat(50), '']) {
      const set = sampleNormSet(cohort, (project) => ({
        ...project,
        title: name,
        subtitle: '',
        sheet: { ...project.sheet, cautions: '' },
      }));
      for (const { blocks } of composeBooklet(set).pages) {
        expect(textsOf(blocks).some((line) => line.runs[0]?.text === 'DRAFT')).toBe(true);
      }
    }
  });

  it('says so in titles and feet of the workbook', async () => {
    const workbook = await workbookOf(draft);
    expect(workbook.title).toMatch(/^DRAFT · /);
    const feet = workbook.worksheets.map(footOf).filter((foot) => foot !== '');
    expect(feet.length).toBeGreaterThanOrEqual(4);
    expect(feet.filter((foot) => !foot.includes('DRAFT'))).toEqual([]);
    for (const name of ['Look-up', 'Grade 4', 'About']) {
      expect(workbook.getWorksheet(name)?.getCell('A1').value).toMatch(/^DRAFT · /);
    }
    const clean = await workbookOf(released);
    expect(clean.worksheets.map(footOf).filter((foot) => foot.includes('DRAFT'))).toEqual([]);
    expect(clean.title).not.toContain('DRAFT');
  });

  it('says so in csv and JSON', () => {
    expect(new Set(csvOf(draft).map((row) => row['status']))).toEqual(new Set(['draft']));
    expect(new Set(csvOf(released).map((row) => row['status']))).toEqual(new Set(['released']));
    const status = (set: NormSet): unknown => JSON.parse(new TextDecoder().decode(normSetJson(set))).status;
    expect([status(draft), status(released)]).toEqual(['draft', 'released']);
  });

  it('has another check code than the same set released', () => {
    const answers = [{ query: 'no-cautions', reason: 'On the cover.' }];
    const answered = sampleNormSet(cohort, (project) => ({
      ...project,
      sheet: { ...project.sheet, cautions: '' },
      release: { ...project.release, answers },
    }));
    expect(answered.status).toBe('released');
    expect(answered.check).not.toBe(draft.check);
  });
});

describe('a rank adjusted by hand', () => {
  it('is marked in print behind its figures, with a note under the table', () => {
    const pages = composeBooklet(adjusted).pages;
    const lines = pages.flatMap(({ group, blocks }) => textsOf(blocks).map((line) => ({ group, line })));
    const marks = lines.filter(({ line }) => written(line) === '†');
    expect(marks).toHaveLength(1);
    const [mark] = marks;
    const rank = lines.find(
      ({ group, line }) => group === 0 && line.baseline === mark?.line.baseline && written(line) === to,
    );
    expect(mark?.line.x).toBeCloseTo((rank?.line.x ?? 0) + (rank?.line.width ?? 0), 9);
    const first = pages.filter(({ group }) => group === 0).flatMap(({ blocks }) => textsOf(blocks));
    const start = first.findIndex((line) => written(line).startsWith('† Adjusted by hand'));
    const note = first
      .slice(start, start + 4)
      .map(written)
      .join(' ');
    expect(note).toContain(`raw 20 from ${from} to ${to} (Board, 3 June; M. Orr)`);
    const tableEnds = Math.max(
      ...pages.flatMap(({ group, blocks }) =>
        group === 0 ? blocks.flatMap((block) => (block.kind === 'table-column' ? [block.bottom] : [])) : [],
      ),
    );
    expect(first[start]?.baseline).toBeGreaterThan(tableEnds);
    const others = pages.filter(({ group }) => group === 1).flatMap(({ blocks }) => textsOf(blocks).map(written));
    expect(others.filter((text) => text.includes('†'))).toEqual([]);
  });

  it('is a marked number in the workbook, and told on its sheet and among what is about it', async () => {
    const workbook = await workbookOf(adjusted);
    const sheet = workbook.getWorksheet('Grade 4');
    const texts: string[] = [];
    let cell: ExcelJS.Cell | null = null;
    sheet?.eachRow((row) => {
      texts.push(row.getCell(1).text);
      if (row.getCell(1).value === 20) cell = row.getCell(2);
    });
    expect(cell).toMatchObject({ value: Number(to), numFmt: '0"†"' });
    const note = `raw 20 from ${from} to ${to} (Board, 3 June; M. Orr)`;
    expect(texts.some((text) => text.startsWith('† Adjusted by hand') && text.includes(note))).toBe(true);
    const about = new Map<unknown, unknown>();
    workbook.getWorksheet('About')?.eachRow((row) => about.set(row.getCell(1).value, row.getCell(2).value));
    expect(about.get('Adjusted: Grade 4')).toContain(note);
    expect(about.has('Adjusted: Grade 5')).toBe(false);
    const list: string[] = [];
    workbook.getWorksheet('Look-up rows')?.eachRow((row) => list.push(row.getCell(3).text));
    expect(list.filter((text) => text.includes('†'))).toEqual([`${to}†`]);
  });

  it('is told in csv and JSON, and nowhere else', () => {
    const rows = csvOf(adjusted).filter((row) => row['adjusted'] !== '');
    expect(rows).toMatchObject([
      { grade: '4', 'raw-score': '20', printed: to, adjusted: `from ${from} to ${to}: Board, 3 June (M. Orr)` },
    ]);
    expect(csvOf(released).every((row) => row['adjusted'] === '')).toBe(true);
    const [group] = JSON.parse(new TextDecoder().decode(normSetJson(adjusted))).groups;
    expect(group.rows[20]).toMatchObject({ printed: to, adjusted: { from, reason: 'Board, 3 June', by: 'M. Orr' } });
    expect(group.rows[20].provenance.printed).toEqual({ from: 'adjusted', end: null });
  });

  it('keeps anything from being pressed while it cannot stand', async () => {
    const broken = sampleProject(cohort, (project) => ({
      ...adjust(project),
      adjustments: [{ values: ['4'], score: 20, to: '99', reason: 'Board', by: 'M. Orr' }],
    }));
    const pressed = await pressFiles(broken);
    expect(pressed.ok ? '' : pressed.problem).toContain('a better score may not print a lower rank');
  });
});
