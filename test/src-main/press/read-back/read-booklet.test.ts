import { describe, expect, it, vi } from 'vitest';
import { COLUMN_KEYS } from '../../../../shared-core/norms/column-keys.ts';
import type { ConversionRow } from '../../../../shared-core/norms/conversion-table.ts';
import type { NormProject } from '../../../../shared-core/norms/norm-project.ts';
import type { NormSet } from '../../../../shared-core/norms/norm-set.ts';
import type { Booklet } from '../../../../shared-core/pages/booklet.ts';
import { composeBooklet } from '../../../../shared-core/pages/booklet-pages.ts';
import { bookletPdf } from '../../../../src-main/press/booklet-pdf.ts';
import { differenceLine } from '../../../../src-main/press/read-back/cell-differences.ts';
import { pdfPages } from '../../../../src-main/press/read-back/pdf-text.ts';
import { readBooklet } from '../../../../src-main/press/read-back/read-booklet.ts';
import {
  KERNEL,
  LOG_LINEAR,
  sampleNormSet,
  WHOLE_SCALE,
  type SampleCohort,
} from '../../../shared-core/pages/sample-norm-set.ts';

const allColumns = (project: NormProject): NormProject => ({
  ...project,
  curve: { ...project.curve, smoothing: LOG_LINEAR, exceptions: [{ values: ['5'], smoothing: KERNEL }] },
  precision: { ...project.precision, reliability: 0.9 },
  table: { ...project.table, columns: COLUMN_KEYS, decimals: 1 },
  sheet: { ...project.sheet, orientation: 'landscape', inverse: true },
});

async function differences(printed: NormSet, against: NormSet): Promise<readonly string[]> {
  const { bookletPdf: draw } = await import('../../../../src-main/press/booklet-pdf.ts');
  const { pdf } = await draw(printed);
  return readBooklet('booklet.pdf', await pdfPages(pdf), against).differences.map(differenceLine);
}

/** With a booklet that was composed wrongly in the place of the right one. */
async function withBooklet<T>(booklet: Booklet, work: () => Promise<T>): Promise<T> {
  vi.resetModules();
  vi.doMock('../../../../shared-core/pages/booklet-pages.ts', () => ({ composeBooklet: () => booklet }));
  try {
    return await work();
  } finally {
    vi.doUnmock('../../../../shared-core/pages/booklet-pages.ts');
    vi.resetModules();
  }
}

const CASES: readonly (readonly [string, SampleCohort, (project: NormProject) => NormProject])[] = [
  ['the usual columns', { scale: WHOLE_SCALE }, (project) => project],
  ['every column', { scale: WHOLE_SCALE }, allColumns],
  [
    'many rows over many pages',
    { scale: { min: -20, max: 200, step: 1 }, groups: ['4', '5', '6'] },
    (project) => project,
  ],
  [
    'a small sheet, weights, low scores good, an inverse table',
    { scale: { min: 0, max: 30, step: 0.5 }, direction: 'low-is-good', weighted: true },
    (project) => ({
      ...project,
      table: { ...project.table, columns: ['count', 'cumulative', 'stanine'] },
      sheet: { ...project.sheet, paper: 'a5', tableColumns: 3, inverse: true, ogive: false },
    }),
  ],
  [
    'long titles that the running head cuts or breaks',
    { scale: WHOLE_SCALE, groups: ['4', 'a very long name of a group that takes more than one line '.repeat(6)] },
    (project) => ({ ...project, title: 'The reading survey of the whole of Ostrey Vale, invented from end to end' }),
  ],
  [
    'one column of rows and thousands of people',
    { scale: { min: 0, max: 9, step: 1 }, groups: ['4'] },
    (project) => ({
      ...project,
      tally:
        project.tally === null
          ? null
          : {
              ...project.tally,
              cells: project.tally.cells.map((cell) => ({ ...cell, counts: cell.counts.map((count) => count * 1000) })),
            },
      table: { ...project.table, columns: ['count', 'cumulative'] },
      sheet: { ...project.sheet, tableColumns: 1 },
    }),
  ],
];

describe('readBooklet', () => {
  it.each(CASES)('finds no difference with %s', async (_, cohort, change) => {
    const set = sampleNormSet(cohort, change);
    const { pdf } = await bookletPdf(set);
    const read = readBooklet('booklet.pdf', await pdfPages(pdf), set);
    expect(read.differences.map(differenceLine)).toEqual([]);
    const columns = set.project.table.columns.length + 2;
    const cells = set.groups.reduce((sum, { rows }) => sum + rows.length * columns, 0);
    expect(read.cells).toBeGreaterThan(cells);
  });

  it('finds one changed glyph in the table of the pdf, in a rank, a score or a further column', async () => {
    const set = sampleNormSet({ scale: WHOLE_SCALE });
    const [, five] = set.groups;
    const row = five?.rows[23];
    if (five === undefined || row === undefined) throw new Error('no such row');
    const printing = (changed: Partial<ConversionRow>): NormSet => ({
      ...set,
      groups: set.groups.map((norms) =>
        norms === five
          ? { ...norms, rows: norms.rows.map((each) => (each === row ? { ...row, ...changed } : each)) }
          : norms,
      ),
    });
    expect(await differences(printing({ printed: '99' }), set)).toEqual([
      `booklet.pdf, page 2: Grade 5, raw score 23, percentile rank: expected "${row.printed}", found "99"`,
    ]);
    expect(await differences(printing({ texts: { ...row.texts, t: '5O' } }), set)).toEqual([
      `booklet.pdf, page 2: Grade 5, raw score 23, T score: expected "${row.texts.t}", found "5O"`,
    ]);
    expect(await differences(printing({ scoreText: '2E' }), set)).toEqual([
      'booklet.pdf, page 2: Grade 5, raw score 2E, raw score: expected nothing, found "2E"',
      'booklet.pdf, no page: Grade 5, raw score 23, raw score: expected "23", found nothing',
    ]);
    expect(await differences(printing({ scoreText: '22' }), set)).toEqual([
      'booklet.pdf, page 2: Grade 5, raw score 22, raw score: expected nothing, found "22, a second time"',
      'booklet.pdf, no page: Grade 5, raw score 23, raw score: expected "23", found nothing',
    ]);
  });

  it('finds a misprinted heading, head, foot and inverse table', async () => {
    const inverse = (project: NormProject): NormProject => ({
      ...project,
      sheet: { ...project.sheet, inverse: true },
    });
    const set = sampleNormSet({ scale: WHOLE_SCALE, groups: ['4'] }, inverse);
    const [four] = set.groups;
    if (four === undefined) throw new Error('no group');
    const { table } = set.project;
    const otherColumns = { ...set, project: { ...set.project, table: { ...table, columns: ['nce', 't'] as const } } };
    expect((await differences(otherColumns, set))[0]).toBe(
      'booklet.pdf, page 1: Grade 4, heading of stanine: expected "Sta- nine", found "NCE"',
    );
    const title = { ...set, groups: [{ ...four, group: { ...four.group, title: 'Grade A' } }] };
    expect((await differences(title, set))[0]).toBe(
      'booklet.pdf, page 1: Grade 4, running head: expected "Table 1 · Grade 4", found "Table 1 · Grade A"',
    );
    expect(await differences({ ...set, check: '0000-0000' }, set)).toEqual([
      `booklet.pdf, page 1: Grade 4, check code: expected "${set.check}", found "0000-0000"`,
    ]);
    const edition = { ...set, project: { ...set.project, release: { ...set.project.release, edition: '2.0' } } };
    expect((await differences(edition, set))[0]).toMatch(/, foot: expected "Edition 1\.0 .*, found "Edition 2\.0 /);
    const strip = four.inverse.map((each) => (each.percentile === 50 ? { ...each, scoreText: '7' } : each));
    expect(await differences({ ...set, groups: [{ ...four, inverse: strip }] }, set)).toEqual([
      `booklet.pdf, page 1: Grade 4, percentile 50: expected "${four.inverse.find(({ percentile }) => percentile === 50)?.scoreText}", found "7"`,
    ]);
  });

  it('finds a page that is missing and a row that was lost at a page break', async () => {
    const set = sampleNormSet({ scale: { min: 0, max: 300, step: 1 }, groups: ['4'] });
    const booklet = composeBooklet(set);
    expect(booklet.pages.length).toBeGreaterThan(2);
    const missing = { ...booklet, pages: booklet.pages.filter(({ number }) => number !== 2) };
    const lostPage = await withBooklet(missing, () => differences(set, set));
    const total = booklet.pages.length;
    expect(lostPage[0]).toBe(
      `booklet.pdf, page 2: Grade 4, page number: expected "page 2 of ${total}", found "page 3 of ${total}"`,
    );
    expect(lostPage).toContain(`booklet.pdf, page 2: page: expected "page 2 of ${total}", found nothing`);
    const onSecond = (booklet.pages[1]?.blocks ?? []).flatMap((block) =>
      block.kind === 'table-column' ? block.rows.flatMap(({ scores }) => scores) : [],
    );
    expect(onSecond.length).toBeGreaterThan(20);
    for (const score of onSecond) {
      expect(lostPage).toContain(
        `booklet.pdf, no page: Grade 4, raw score ${score}, raw score: expected "${score}", found nothing`,
      );
    }

    const atBreak = booklet.pages[0]?.blocks.findLast((block) => block.kind === 'table-column');
    if (atBreak?.kind !== 'table-column') throw new Error('no table on the first page');
    const last = atBreak.rows.at(-1)?.scores[0];
    const shortened = { ...atBreak, rows: atBreak.rows.slice(0, -1) };
    const pages = booklet.pages.map((page) => ({
      ...page,
      blocks: page.blocks.map((block) => (block === atBreak ? shortened : block)),
    }));
    expect(await withBooklet({ ...booklet, pages }, () => differences(set, set))).toEqual([
      `booklet.pdf, no page: Grade 4, raw score ${last}, raw score: expected "${last}", found nothing`,
    ]);
  });
});
