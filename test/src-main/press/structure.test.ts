import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { BLOCK_KINDS, WHOLE_BOOKLET, type BlockKind } from '../../../shared-core/norms/booklet-blocks.ts';
import { cutTables } from '../../../shared-core/norms/cut-table.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { tableColumns } from '../../../shared-core/norms/table-columns.ts';
import { composeBooklet } from '../../../shared-core/pages/booklet-pages.ts';
import { bookletPdf } from '../../../src-main/press/booklet-pdf.ts';
import { KERNEL, LOG_LINEAR, sampleNormSet, WHOLE_SCALE } from '../../shared-core/pages/sample-norm-set.ts';
import { readStructure, type ReadElement, type ReadStructure } from './structure-reader.ts';
import { cellsHeard, type HeardCell, elementsIn, findAll, findOne, printed, spoken } from './structure-speech.ts';

const folder = mkdtempSync(join(tmpdir(), 'normloom-structure-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

/** The tree of the pressed booklet, of which qpdf has found no fault. */
async function pressedTree(normSet: NormSet): Promise<ReadStructure & { readonly sheets: readonly ReadElement[] }> {
  const { pdf } = await bookletPdf(normSet);
  const file = join(folder, `${normSet.check}.pdf`);
  writeFileSync(file, pdf);
  expect(execFileSync('qpdf', ['--check', file], { encoding: 'utf8' })).toContain(
    'No syntax or stream encoding errors',
  );
  const tree = await readStructure(file, pdf);
  expect(tree.faults).toEqual([]);
  expect(tree.loose).toEqual([]);
  expect(tree.root.type).toBe('Document');
  return { ...tree, sheets: elementsIn(tree.root) };
}

type Sheet = Partial<NormProject['sheet']>;

const withSheet =
  (sheet: Sheet, columns?: NormProject['table']['columns']) =>
  (project: NormProject): NormProject => ({
    ...project,
    sheet: { ...project.sheet, ...sheet },
    precision: { ...project.precision, reliability: 0.9 },
    table: { ...project.table, columns: columns ?? project.table.columns },
  });

const smoothed =
  (change: (project: NormProject) => NormProject) =>
  (project: NormProject): NormProject => ({
    ...change(project),
    curve: { ...project.curve, smoothing: LOG_LINEAR, exceptions: [{ values: ['5'], smoothing: KERNEL }] },
  });

/** Spoken texts as a person would write them down, sign by sign. */
function saidOf(text: string): string {
  if (text === '–') return 'no value';
  const words: Readonly<Record<string, string>> = {
    '<': 'below ',
    '>': 'above ',
    '−': 'minus ',
    '–': ' to ',
    '\u202f': '',
  };
  return [...text].map((sign) => words[sign] ?? sign).join('');
}

/** The heads as they would be written in one line. */
const HEADS: Readonly<Record<string, string>> = { 'Sta- nine': 'Stanine', 'Measure- ment band': 'Measurement band' };

function checkConversion(normSet: NormSet, sheets: readonly ReadElement[]): void {
  const columns = tableColumns(normSet.project);
  expect(sheets.map(({ type }) => type)).toEqual(normSet.groups.map(() => 'Sect'));
  normSet.groups.forEach(({ rows }, group) => {
    const sheet = sheets[group];
    const table = sheet === undefined ? undefined : findAll(sheet, 'Table')[0];
    if (table === undefined) throw new Error('no table');
    const expected = rows.flatMap((row) =>
      columns.slice(1).map((column) => {
        const text = column.key === 'rank' ? row.printed : column.key === 'score' ? '' : row.texts[column.key];
        const head = column.heading.join(' ');
        return {
          rowHead: saidOf(row.scoreText),
          columnHead: HEADS[head] ?? head,
          spoken: saidOf(text),
          printed: text,
        };
      }),
    );
    expect(cellsHeard(table)).toEqual(expected);
    const [first] = findAll(findOne(table, 'THead'), 'TH');
    expect(first === undefined ? '' : spoken(first).trim()).toBe('Raw score');
  });
}

describe('the structure tree of a pressed booklet', () => {
  it('gives every cell its raw score and the head of its column, whatever the paper and however many pages', async () => {
    const long = { scale: { min: -40, max: 260, step: 1 }, groups: ['4', '5'] };
    for (const normSet of [
      sampleNormSet({ scale: WHOLE_SCALE, groups: ['4', '5', '6'] }, withSheet({ tableColumns: 3 })),
      sampleNormSet(long, withSheet({ tableColumns: 3 }, ['z', 'stanine'])),
      sampleNormSet({ ...long, weighted: true }, withSheet({ paper: 'a5', tableColumns: 2 }, ['count', 'cumulative'])),
      sampleNormSet(
        { scale: { min: 0, max: 60, step: 0.5 }, direction: 'low-is-good' },
        smoothed(
          withSheet({ orientation: 'landscape', inverse: true, notes: 'A note. '.repeat(500) }, [
            'interval',
            'standard-error',
            'measurement-band',
            'print-range',
          ]),
        ),
      ),
    ]) {
      checkConversion(normSet, (await pressedTree(normSet)).sheets);
    }
  }, 120_000);

  it('reads title, subtitle, how to read, cautions, tables, figure and notes, in this order', async () => {
    const texts = { howToRead: 'How to read it.', cautions: 'Take care.', notes: 'As noted.' };
    const normSet = sampleNormSet({ scale: WHOLE_SCALE }, smoothed(withSheet({ ...texts, inverse: true })));
    const { sheets } = await pressedTree(normSet);
    const [sheet] = sheets;
    if (sheet === undefined) throw new Error('no sheet');
    expect(sheet.title).toBe('Table 1 · Grade 4');
    const order = elementsIn(sheet).map((part) => `${part.type} ${part.type === 'Table' ? '' : printed(part)}`);
    const starts = [
      'H1 Raw score to percentile rank, grade 4',
      'P The share of the sample scoring',
      'P How to read it.',
      'P Take care.',
      'Table ',
      'Table ',
      'Figure ',
      'P Figure 1. Cumulative per cent',
      'P Sample. ',
      'P Method. ',
      'P Notes. As noted.',
      'H2 Technical notes on the smoothing',
      'Table ',
      'Table ',
      'P Degrees. ',
      'P Fit. ',
    ];
    expect(order.map((part, index) => part.slice(0, starts[index]?.length))).toEqual(starts);
  });

  it('states the numbers of the group in the words for the figure', async () => {
    const normSet = sampleNormSet({ scale: WHOLE_SCALE, groups: ['4', '5'] }, withSheet({}));
    const { sheets } = await pressedTree(normSet);
    normSet.groups.forEach(({ summary }, group) => {
      const sheet = sheets[group];
      if (sheet === undefined) throw new Error('no sheet');
      const { alt, children } = findOne(sheet, 'Figure');
      const [lowest, lower, median, upper, highest] = summary.fiveNumbers.map(String);
      expect(alt.replaceAll('\u202f', '')).toContain(`${summary.n} pupils`);
      expect(alt).toContain(
        `Lowest score ${lowest}, lower hinge ${lower}, median ${median}, upper hinge ${upper}, highest score ${highest}.`,
      );
      expect(children).toHaveLength(1);
    });
  });

  it('gives the inverse table and the tables of the fit their heads', async () => {
    const normSet = sampleNormSet({ scale: WHOLE_SCALE }, smoothed(withSheet({ paper: 'a5', inverse: true })));
    const { sheets } = await pressedTree(normSet);
    normSet.groups.forEach(({ inverse, smoothing }, group) => {
      const sheet = sheets[group];
      if (sheet === undefined || smoothing.state !== 'smoothed') throw new Error('no sheet');
      const tables = findAll(sheet, 'Table');
      const { degrees, momentsObserved } = smoothing.curve;
      expect(tables).toHaveLength(degrees.length > 0 ? 4 : 3);
      const [, strip] = tables;
      expect(strip === undefined ? [] : cellsHeard(strip)).toEqual(
        inverse.map(({ percentile, scoreText }) => ({
          rowHead: 'Lowest raw score',
          columnHead: String(percentile),
          spoken: saidOf(scoreText),
          printed: scoreText,
        })),
      );
      const moments = tables.at(-1);
      const heard = moments === undefined ? [] : cellsHeard(moments);
      const mean = heard.find(({ rowHead, columnHead }) => rowHead === 'Mean' && columnHead === 'Observed');
      expect(Number(mean?.printed)).toBeCloseTo(momentsObserved.mean, 3);
      if (degrees.length === 0) return;
      const [fits] = tables.slice(2);
      const figures = fits === undefined ? [] : cellsHeard(fits);
      expect(figures).toHaveLength(degrees.length * 6);
      for (const { degree, df } of degrees) {
        const cell = figures.find(({ rowHead, columnHead }) => rowHead === String(degree) && columnHead === 'df');
        expect(cell?.printed).toBe(String(df));
      }
    });
  });

  it('gives every cell of all groups side by side, of the inverse table and of the cuts its heads, part by part', async () => {
    const kinds: readonly BlockKind[] = ['groups-across', 'inverse', 'cut-scores'];
    const long = 'of the schools in the upper Ostrey Vale that begin after noon';
    const normSet = sampleNormSet(
      { scale: WHOLE_SCALE, groups: ['1', '2', '3', '4', '5', '6', '7', '8', long] },
      (project) => ({
        ...project,
        cuts: [{ name: 'Reading support', score: 18, values: null }],
        sheet: {
          ...project.sheet,
          paper: 'a5',
          rangeRows: true,
          blocks: BLOCK_KINDS.map((kind) => ({ kind, printed: kinds.includes(kind), heading: '', text: '' })),
        },
      }),
    );
    const { groups, project } = normSet;
    const { sheets } = await pressedTree(normSet);
    const [across = [], inverse = [], cuts = []] = sheets.map((sheet) => cellsHeard(findOne(sheet, 'Table')));
    const heads = groups.map(({ group, summary }) => `${group.title}, n ${summary.n}`);
    const cell = (rowHead: string, columnHead: string, text: string) => ({
      rowHead,
      columnHead,
      spoken: saidOf(text),
      printed: text,
    });
    expect(across).toEqual(
      (groups[0]?.rows ?? []).flatMap(({ scoreText }, position) =>
        groups.map(({ rows }, group) => cell(scoreText, heads[group] ?? '', rows[position]?.printed ?? '')),
      ),
    );
    expect(inverse).toEqual(
      (groups[0]?.inverse ?? []).flatMap(({ percentile }, position) =>
        groups.map((norms, group) =>
          cell(String(percentile), heads[group] ?? '', norms.inverse[position]?.scoreText ?? ''),
        ),
      ),
    );
    const [table] = cutTables(project, groups);
    const plain = ({ columnHead, printed: text, ...others }: HeardCell): HeardCell => ({
      ...others,
      columnHead: columnHead.replace(/\s/g, ' '),
      printed: text.replace(/\s/g, ' '),
    });
    expect(cuts.map(plain)).toEqual(
      (table?.rows ?? []).flatMap(({ title, n, rank, interval, shareText }) =>
        [
          cell(title, 'n', n),
          cell(title, 'Percentile rank', rank),
          cell(title, '95 % interval', interval ?? ''),
          cell(title, 'Per cent at or better', shareText),
        ].map(plain),
      ),
    );
  });

  it('leaves out heads, feet and whatever is printed again on further pages', async () => {
    const normSet = sampleNormSet(
      { scale: { min: 0, max: 300, step: 1 }, groups: ['4'] },
      withSheet({ tableColumns: 3 }),
    );
    const { root, artifacts, pages } = await pressedTree(normSet);
    const read = printed(root);
    expect(pages.length).toBeGreaterThan(2);
    artifacts.forEach((texts, index) => {
      expect(texts).toContain(`page ${index + 1} of ${pages.length}`);
      expect(texts.join(' ')).toContain(`check ${normSet.check}`);
      expect(texts.join(' ').includes('(continued)')).toBe(index > 0);
    });
    // The heads of the table stand once in the tree, and as artifacts over all its other columns.
    const headings = artifacts.map((texts) => texts.filter((text) => text.trim() === 'Percentile').length);
    expect(headings.slice(0, 2)).toEqual([2, 3]);
    for (const out of ['page 1', normSet.check, '(continued)', 'Ostrey Vale']) expect(read).not.toContain(out);
    expect(findAll(root, 'TH').filter((head) => printed(head) === 'Percentile rank')).toHaveLength(1);
  });

  it('keeps words apart where lines end, and together where a word goes on', async () => {
    const cautions = 'Take care with the half-hearted and the well-read pupils. '.repeat(6).trim();
    const normSet = sampleNormSet({ scale: WHOLE_SCALE, groups: ['4'] }, withSheet({ cautions }));
    const file = join(folder, 'words.pdf');
    writeFileSync(file, (await bookletPdf(normSet)).pdf);
    const read = execFileSync('pdfinfo', ['-struct-text', file], { encoding: 'utf8' });
    for (const paragraph of [cautions, normSet.project.sheet.howToRead, 'Raw score', 'Percentile rank']) {
      expect(read).toContain(`"${paragraph} "`);
    }
  });

  it('has a section for each block and each table of a whole booklet, under its heading', async () => {
    const normSet = sampleNormSet({ scale: WHOLE_SCALE, groups: ['4', '5'] }, (project) => ({
      ...project,
      cuts: [{ name: 'Goal', score: 12, values: null }],
      curve: { ...project.curve, smoothing: LOG_LINEAR, exceptions: [{ values: ['5'], smoothing: { kind: 'none' } }] },
      sheet: { ...project.sheet, blocks: WHOLE_BOOKLET, fillToFours: true, gutterMm: 5 },
    }));
    const { sheets, pages, root } = await pressedTree(normSet);
    const opened = composeBooklet(normSet).pages.flatMap(({ opens }) => (opens === null ? [] : [opens]));
    expect(opened).toHaveLength(14);
    expect(pages.length % 4).toBe(0);
    expect(sheets.map(({ type, title }) => [type, title])).toEqual(opened.map((title) => ['Sect', title]));
    const sectionOf = (title: string): ReadElement => {
      const found = sheets.find((sheet) => sheet.title === title);
      if (found === undefined) throw new Error(`no section ${title}`);
      return found;
    };
    for (const sheet of sheets) {
      const [first] = elementsIn(sheet);
      expect(first?.type).toBe('H1');
      expect(findAll(sheet, 'H1')).toHaveLength(1);
      if (!sheet.title.startsWith('Table ')) expect(printed(findOne(sheet, 'H1')).trim()).toBe(sheet.title);
    }
    const entries = elementsIn(sectionOf('Contents')).filter(({ type }) => type === 'P');
    expect(
      entries.map((entry) =>
        printed(entry)
          .trim()
          .replace(/ +\d+$/, ''),
      ),
    ).toEqual([...opened.slice(2, 4), 'Conversion tables', ...opened.slice(4)]);
    const counts = cellsHeard(findOne(sectionOf('The sample'), 'Table')).filter(({ columnHead }) => columnHead === 'n');
    expect(counts.map(({ rowHead, spoken: heard }) => [rowHead, heard])).toEqual(
      normSet.groups.map(({ group, summary }) => [group.title, String(summary.n)]),
    );
    const pictures = sectionOf('Pictures');
    expect(findAll(pictures, 'Figure')).toHaveLength(3);
    expect(cellsHeard(findOne(pictures, 'Table'))).toHaveLength(10);
    const notes = findAll(sectionOf('Technical notes'), 'H2').map((heading) => printed(heading).trim());
    expect(notes).toEqual([
      'Method',
      'Scale',
      'Rounding and ends',
      'Smoothing',
      'Sampling design',
      'Precision',
      'Fit of the smoothing: Grade 4',
      'One row worked out by hand',
    ]);
    const cautions = elementsIn(sectionOf('Cautions')).filter(({ type }) => type === 'P');
    expect(cautions.map((caution) => printed(caution).slice(0, 2))).toEqual(
      Array.from({ length: 9 }, (_, index) => `${index + 1} `),
    );
    expect(printed(root)).not.toContain('left blank');
  }, 60_000);

  it('says in the catalogue that it is tagged, in which language, by what title and with which page numbers', async () => {
    const { catalogue, pages } = await pressedTree(sampleNormSet({ scale: WHOLE_SCALE, groups: ['4'] }));
    expect(catalogue['/Lang']).toBe('u:en');
    const named = JSON.stringify(catalogue);
    expect(named).toContain('"/PageLabels":{"/Nums":[0,{"/S":"/D"}]}');
    for (const key of ['/MarkInfo', '/StructTreeRoot', '/Outlines', '/ViewerPreferences', '/Metadata']) {
      expect(catalogue).toHaveProperty([key]);
    }
    for (const page of pages) expect(page['/Tabs']).toBe('/S');
  });
});
