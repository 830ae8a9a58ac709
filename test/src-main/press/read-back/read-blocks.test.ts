import fc from 'fast-check';
import { beforeAll, describe, expect, it } from 'vitest';
import { BLOCK_KINDS, WHOLE_BOOKLET, type BlockKind } from '../../../../shared-core/norms/booklet-blocks.ts';
import type { NormProject } from '../../../../shared-core/norms/norm-project.ts';
import type { NormSet } from '../../../../shared-core/norms/norm-set.ts';
import type { Booklet, TableColumnBlock } from '../../../../shared-core/pages/booklet.ts';
import { composeBooklet } from '../../../../shared-core/pages/booklet-pages.ts';
import { programVersion } from '../../../../src-main/program-version.ts';
import { bookletPdf } from '../../../../src-main/press/booklet-pdf.ts';
import { differenceLine } from '../../../../src-main/press/read-back/cell-differences.ts';
import { readPdf } from '../../../../src-main/press/read-back/pdf-text.ts';
import { readBooklet } from '../../../../src-main/press/read-back/read-booklet.ts';
import { columnsOf } from '../../../shared-core/pages/placed-laws.ts';
import {
  LOG_LINEAR,
  sampleNormSet,
  WHOLE_SCALE,
  type SampleCohort,
} from '../../../shared-core/pages/sample-norm-set.ts';
import { misprinter, misprintsOf, withBlocks, withColumns, type Misprinter } from './misprint.ts';
import { tries } from '../../../thoroughness.ts';

type Sheet = Partial<NormProject['sheet']>;

const printing = (...kinds: readonly BlockKind[]): NormProject['sheet']['blocks'] =>
  BLOCK_KINDS.map((kind) => ({ kind, printed: kinds.includes(kind), heading: '', text: '' }));

const CUTS: NormProject['cuts'] = [
  { name: 'Reading support', score: 18, values: null },
  { name: 'Extension', score: 31, values: ['5'] },
];

function setOf(
  cohort: Partial<SampleCohort>,
  sheet: Sheet,
  change: (project: NormProject) => NormProject = (project) => project,
): NormSet {
  return sampleNormSet({ scale: WHOLE_SCALE, ...cohort }, (project) =>
    change({ ...project, cuts: CUTS, sheet: { ...project.sheet, ...sheet } }),
  );
}

const grades = (count: number): readonly string[] => Array.from({ length: count }, (_, index) => String(index + 1));

const GERMAN: NormProject['sheet']['language'] = {
  tag: 'de',
  words: 'de',
  numbers: { decimalMark: ',', thousands: 'point', minus: 'hyphen', dateOrder: 'dd.mm.yyyy' },
  phrases: [],
};

const CASES: readonly (readonly [string, NormSet])[] = [
  ['every block', setOf({}, { blocks: WHOLE_BOOKLET })],
  [
    'rows for ranges of negative scores, parted by cuts, set evenly in four columns',
    setOf({ scale: { min: -60, max: 40, step: 1 } }, { rangeRows: true, fives: false, tableColumns: 4 }, (project) => ({
      ...project,
      table: { ...project.table, columns: ['stanine'] },
    })),
  ],
  [
    'large high rows, a gutter and wide margins on a small sheet',
    setOf(
      {},
      {
        blocks: printing('tables', 'groups-across', 'inverse', 'cut-scores'),
        paper: 'a5',
        rowType: 14,
        rowHeight: 36,
        gutterMm: 12,
        marginMm: 18,
        inverse: true,
      },
    ),
  ],
  [
    'rows in the size of the prose, low and narrow',
    setOf({}, { blocks: WHOLE_BOOKLET, rowType: 7.2, rowHeight: 8, tableColumns: 3 }, (project) => ({
      ...project,
      table: { ...project.table, columns: [] },
      curve: { ...project.curve, smoothing: LOG_LINEAR },
    })),
  ],
  [
    'rows in the size of other prose, in one column, without a picture',
    setOf({}, { rowType: 8.3, rowHeight: 24, tableColumns: 1, ogive: false, notes: 'A note. '.repeat(60) }),
  ],
  [
    'fourteen groups with long titles, whose tables go on in parts',
    setOf(
      {
        groups: [...grades(13), 'A group of the schools in the upper Ostrey Vale that begin after noon'],
        weighted: true,
      },
      { blocks: printing('groups-across', 'inverse', 'cut-scores'), paper: 'a5' },
    ),
  ],
  [
    'fourteen groups side by side, low scores good, thousands of people',
    setOf(
      { groups: grades(14), direction: 'low-is-good' },
      { blocks: printing('groups-across', 'inverse', 'cut-scores'), orientation: 'landscape' },
    ),
  ],
  [
    'columns of rows side by side with the groups across',
    setOf(
      { scale: { min: -20, max: 120, step: 0.5 }, groups: ['4', '5'] },
      { blocks: printing('groups-across', 'inverse', 'cut-scores') },
    ),
  ],
  [
    'German words and numbers, ranks to one decimal',
    setOf(
      { scale: { min: -5, max: 20, step: 0.5 } },
      { blocks: WHOLE_BOOKLET, language: GERMAN, inverse: true },
      (project) => ({
        ...project,
        table: { ...project.table, decimals: 1, columns: ['count', 'cumulative', 'interval', 'z'] },
      }),
    ),
  ],
  [
    'signs that the typefaces lack',
    setOf({ groups: ['4', '五年级'] }, { blocks: WHOLE_BOOKLET }, (project) => ({ ...project, title: 'شرح אב 五 ok' })),
  ],
  [
    'ranks adjusted by hand, a draft',
    setOf({}, { blocks: WHOLE_BOOKLET, cautions: '', rangeRows: true }, (project) => ({
      ...project,
      adjustments: ['4', '5'].map((grade) => ({ values: [grade], score: 40, to: '99', reason: 'order', by: 'A. B.' })),
      table: { ...project.table, columns: [] },
    })),
  ],
];

async function differencesIn(pdf: Uint8Array, set: NormSet): Promise<readonly string[]> {
  return readBooklet('booklet.pdf', await readPdf(pdf), set).differences.map(differenceLine);
}

describe('a booklet as it was pressed', () => {
  it.each(CASES)('reads back without a difference: %s', async (_, set) => {
    const { pdf } = await bookletPdf(set);
    const read = readBooklet('booklet.pdf', await readPdf(pdf), set);
    expect(read.differences.map(differenceLine)).toEqual([]);
    expect(read.remarks).toEqual([]);
    const scores = set.groups.reduce((sum, { rows }) => sum + rows.length, 0);
    expect(read.cells).toBeGreaterThan(scores);
  });

  it('that another version of the program made is read without its prose, and that is said', async () => {
    const set = setOf({}, { blocks: printing('tables') });
    const { pages } = await readPdf((await bookletPdf(set)).pdf);
    const read = readBooklet('old.pdf', { pages, producer: 'Normloom 0.0.9' }, set);
    expect(read.differences).toEqual([]);
    expect(read.lines).toBe(0);
    expect(read.remarks).toEqual([expect.stringMatching(/^old\.pdf was not made by this version of the program/)]);
  });
});

describe('a fault planted in a booklet', () => {
  const set = setOf(
    { groups: ['4', '5', '6'], scale: { min: 0, max: 90, step: 1 } },
    { blocks: WHOLE_BOOKLET, tableColumns: 1, rangeRows: true },
    (project) => ({ ...project, table: { ...project.table, columns: [] } }),
  );
  let booklet: Booklet;
  let press: Misprinter;

  beforeAll(async () => {
    booklet = composeBooklet(set, programVersion());
    press = await misprinter();
  });

  const found = async (misprinted: Booklet): Promise<readonly string[]> =>
    differencesIn(await press(misprinted, set), set);

  const withCell = (column: TableColumnBlock, row: number, cell: number, text: string): TableColumnBlock => ({
    ...column,
    rows: column.rows.map((each) =>
      each.row === row
        ? { ...each, cells: each.cells.map((old, index) => (index === cell ? { ...old, text } : old)) }
        : each,
    ),
  });

  it('is none where nothing was planted', async () => {
    expect(await found(booklet)).toEqual([]);
  });

  it('in a cell of all groups side by side is found, by group and score', async () => {
    const printed = set.groups[1]?.rows[50]?.printed ?? '';
    const misprinted = withColumns(booklet, 'groups-across', (column) => withCell(column, 50, 2, '0'));
    expect(await found(misprinted)).toEqual([
      expect.stringMatching(
        new RegExp(
          `^booklet\\.pdf, page \\d+: Grade 5, raw score 50, percentile rank beside other groups: expected "${printed}", found "0"$`,
        ),
      ),
    ]);
  });

  it('in the inverse table of all groups is found, by group and percentile', async () => {
    const misprinted = withColumns(booklet, 'inverse-across', (column) => withCell(column, 75, 3, '1'));
    expect(await found(misprinted)).toEqual([
      expect.stringMatching(
        /^booklet\.pdf, page \d+: Grade 6, percentile 75 beside other groups: expected "\d+", found "1"$/,
      ),
    ]);
  });

  it('in the table of a cut is found, by cut and group', async () => {
    const misprinted = withColumns(booklet, 'cuts 0', (column) => withCell(column, 1, 4, '12.3'));
    expect(await found(misprinted)).toEqual([
      expect.stringMatching(
        /^booklet\.pdf, page \d+: Grade 5, raw score 18, per cent at or better at the cut “Reading support”: expected "[\d.]+", found "12\.3"$/,
      ),
    ]);
  });

  it('at a page break of all groups side by side is found: the row that was lost', async () => {
    const columns = columnsOf(booklet, 'groups-across');
    expect(columns.length).toBeGreaterThan(1);
    const [first] = columns;
    const last = first?.rows.at(-1)?.row;
    const misprinted = withColumns(booklet, 'groups-across', (column) =>
      column === first ? { ...column, rows: column.rows.slice(0, -1) } : column,
    );
    const lines = await found(misprinted);
    for (const [group, title] of ['Grade 4', 'Grade 5', 'Grade 6'].entries()) {
      expect(lines).toContain(
        `booklet.pdf, no page: ${title}, raw score ${last}, percentile rank beside other groups: expected "${
          set.groups[group]?.rows[last ?? 0]?.printed
        }", found nothing`,
      );
    }
    expect(lines.filter((line) => /page \d+: line: expected/.test(line))).toHaveLength(1);
  });

  it('in a row that swallows a score is found, and one that is parted by a cut is not joined unseen', async () => {
    const range = booklet.pages
      .flatMap(({ blocks }) => blocks)
      .flatMap((block) => (block.kind === 'table-column' && block.table === 'conversion' ? block.rows : []))
      .find(({ scores }) => scores.length > 2);
    if (range === undefined) throw new Error('no row for several scores');
    const next = (range.scores.at(-1) ?? 0) + 1;
    let done = false;
    const misprinted = withColumns(booklet, 'conversion', (column) => {
      if (done || !column.rows.includes(range)) return column;
      done = true;
      const rows = column.rows.filter(({ scores }) => scores[0] !== next);
      return withCell({ ...column, rows }, range.row, 0, `${range.row}–${next}`);
    });
    const lines = await found(misprinted);
    const row = set.groups[0]?.rows[next];
    expect(lines).toContainEqual(
      expect.stringMatching(
        new RegExp(
          `Grade 4, raw score ${next}, percentile rank: expected "${row?.printed}", found "${range.cells[1]?.text}"$`,
        ),
      ),
    );

    const parted: NormSet = {
      ...set,
      project: { ...set.project, cuts: [{ name: 'Late', score: range.scores[1] ?? 0, values: null }] },
    };
    const joined = await differencesIn(await press(booklet, set), parted);
    expect(joined).toContainEqual(
      expect.stringMatching(
        new RegExp(`Grade 4, raw score ${range.cells[0]?.text}, raw score: expected "${range.row}", found`),
      ),
    );
  });

  it('in the prose of a page without a group is found, and named by its line', async () => {
    const misprinted = withBlocks(booklet, (block) =>
      block.kind === 'text' &&
      block.runs.some(({ text }) => text.includes('A percentile rank is a place in a named group. It'))
        ? [{ ...block, runs: block.runs.map((run) => ({ ...run, text: run.text.replace('named', 'nomed') })) }]
        : [block],
    );
    expect(await found(misprinted)).toEqual([
      expect.stringMatching(/^booklet\.pdf, page \d+: line: expected ".*named group.*", found ".*nomed group.*"$/),
    ]);
  });

  it('of a page that is missing or stands twice is found, and only that', async () => {
    const title = booklet.pages.findIndex(({ group, block }) => group === null && block === 'cautions');
    const missing = { ...booklet, pages: booklet.pages.filter((_, index) => index !== title) };
    const lost = await found(missing);
    expect(lost.some((line) => line.startsWith(`booklet.pdf, no page: page ${title + 1}: expected "`))).toBe(true);
    expect(lost.some((line) => line.includes(': line: '))).toBe(false);
    const twice = {
      ...booklet,
      pages: booklet.pages.flatMap((page, index) => (index === title ? [page, page] : [page])),
    };
    expect((await found(twice)).some((line) => /page \d+: page: expected nothing, found "/.test(line))).toBe(true);
  });

  it('is found whichever glyph of the booklet was changed', async () => {
    const small = setOf(
      { groups: ['4'], scale: { min: 0, max: 12, step: 1 } },
      { blocks: WHOLE_BOOKLET, inverse: true },
    );
    const right = composeBooklet(small, programVersion());
    const places = right.pages.flatMap((page, number) =>
      page.blocks.flatMap((block, at) => (block.kind === 'rule' ? [] : [{ number, at, block }])),
    );
    await fc.assert(
      fc.asyncProperty(
        fc.constantFrom(...places),
        fc.nat(),
        fc.constantFrom('8', 'x'),
        async ({ number, at, block }, which, glyph) => {
          const wrong = misprintsOf(block, glyph);
          const misprint = wrong[which % wrong.length];
          fc.pre(misprint !== undefined);
          const pages = right.pages.map((page, each) =>
            each === number ? { ...page, blocks: page.blocks.with(at, misprint) } : page,
          );
          const lines = await differencesIn(await press({ ...right, pages }, small), small);
          expect(lines.length).toBeGreaterThan(0);
        },
      ),
      { numRuns: tries(15, 150), seed: 20260615 },
    );
  }, 120_000);
});
