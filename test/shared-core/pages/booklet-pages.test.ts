import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { COLUMN_KEYS } from '../../../shared-core/norms/column-keys.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import type { Booklet, BookletPage, TableColumnBlock, TextLine } from '../../../shared-core/pages/booklet.ts';
import { composeBooklet } from '../../../shared-core/pages/booklet-pages.ts';
import { tableMarks } from '../../../shared-core/pages/table-blocks.ts';
import { textWidth } from '../../../shared-core/pages/text-width.ts';
import { sampleNormSet, WHOLE_SCALE, type SampleCohort } from './sample-norm-set.ts';

type Sheet = Partial<NormProject['sheet']>;

function normSetWith(cohort: SampleCohort, sheet: Sheet, columns?: NormProject['table']['columns']): NormSet {
  return sampleNormSet(cohort, (project) => ({
    ...project,
    sheet: { ...project.sheet, ...sheet },
    table: { ...project.table, columns: columns ?? project.table.columns },
  }));
}

const tablesOn = (page: BookletPage): TableColumnBlock[] =>
  page.blocks.filter((block) => block.kind === 'table-column');

const linesOn = (page: BookletPage): TextLine[] =>
  page.blocks.flatMap((block) =>
    block.kind === 'text'
      ? [block]
      : block.kind === 'table-column'
        ? tableMarks(block).filter((mark) => mark.kind === 'text')
        : [],
  );

const textOf = ({ runs }: TextLine): string => runs.map(({ text }) => text).join('');
const widthOf = ({ runs, size }: TextLine): number =>
  runs.reduce((sum, { text, face }) => sum + textWidth(text, face, size), 0);

/** What must hold for every booklet. */
function check(normSet: NormSet, booklet: Booklet): void {
  const { width, height, margin } = booklet.paper;
  const printed = booklet.pages.flatMap((page) =>
    tablesOn(page).flatMap(({ rows }) => rows.map(({ score, texts }) => [page.group, score, texts[0], texts[1]])),
  );
  const expected = normSet.groups.flatMap(({ rows }, group) =>
    rows.map((row) => [group, row.score, row.scoreText, row.printed]),
  );
  expect(printed).toEqual(expected);
  for (const [index, page] of booklet.pages.entries()) {
    expect(page.number).toBe(index + 1);
    expect(page.blocks.length).toBeGreaterThan(8);
    const texts = linesOn(page).map(textOf);
    expect(texts).toContain(`page ${index + 1} of ${booklet.pages.length}`);
    expect(texts.join(' ')).toContain(`check ${normSet.check}`);
    const tables = tablesOn(page);
    expect(new Set(tables.map(({ top, headRule, bottom }) => `${top} ${headRule} ${bottom}`)).size).toBeLessThan(2);
    for (const table of tables) {
      for (const row of table.rows) expect(row.baseline).toBeLessThan(table.bottom);
      expect(table.x + table.width).toBeLessThanOrEqual(width - margin + 0.01);
      expect(table.heads.at(-1)?.right).toBeCloseTo(table.width, 6);
    }
    for (const line of linesOn(page)) {
      expect(widthOf(line)).toBeLessThanOrEqual(line.width + 1e-6);
      expect(line.x).toBeGreaterThanOrEqual(margin - 0.01);
      expect(line.x + line.width).toBeLessThanOrEqual(width - margin + 0.01);
      expect(line.baseline).toBeGreaterThan(margin / 2);
      expect(line.baseline).toBeLessThan(height - margin / 2);
    }
    const body = bodyEnds(page);
    for (const block of page.blocks) {
      if (block.kind === 'picture') expect(block.y + block.height).toBeLessThanOrEqual(body.bottom);
      if (block.kind === 'table-column') expect(block.bottom).toBeLessThanOrEqual(body.bottom);
    }
  }
}

/** The rules at head and foot: the only two that reach from margin to margin and are placed before the body. */
function bodyEnds(page: BookletPage): { readonly top: number; readonly bottom: number } {
  const [head, foot] = page.blocks.filter((block) => block.kind === 'rule');
  return { top: head?.y ?? 0, bottom: foot?.y ?? 0 };
}

describe('composeBooklet', () => {
  it('sets a sheet of 41 scores on one page in three columns between the same lines', () => {
    const normSet = sampleNormSet({ scale: WHOLE_SCALE, groups: ['4', '5', '6'] });
    const booklet = composeBooklet(normSet);
    check(normSet, booklet);
    expect(booklet.remarks).toEqual([]);
    expect(booklet.pages.map(({ opens }) => opens)).toEqual([
      'Table 1 · Grade 4',
      'Table 2 · Grade 5',
      'Table 3 · Grade 6',
    ]);
    const page = booklet.pages[1];
    expect(page === undefined ? [] : tablesOn(page).map(({ rows }) => rows.length)).toEqual([15, 15, 11]);
    const texts = page === undefined ? [] : linesOn(page).map(textOf);
    expect(texts).toContain('Raw score to percentile rank, grade 5');
    expect(texts).toContain('The share of the sample scoring below, plus half of those at the same score');
    expect(texts).toContain('Ostrey Vale reading survey (invented) · Form A');
    expect(texts.some((text) => text.startsWith('Figure 2. '))).toBe(true);
    expect(texts.some((text) => /^Edition 1\.0 · 2026-06-01 · check .* · definition: midpoint · /.test(text))).toBe(
      true,
    );
  });

  it('calls it a norm group once its documentation is complete', () => {
    const said = 'given';
    const documentation = {
      population: said,
      sampling: said,
      participation: said,
      testDates: 'May 2026',
      weighting: said,
    };
    const normSet = sampleNormSet({ scale: WHOLE_SCALE }, (project) => ({
      ...project,
      groups: { ...project.groups, documentation },
    }));
    const texts = composeBooklet(normSet).pages.flatMap(linesOn).map(textOf).join(' ');
    expect(texts).toContain('Norm group. ');
    expect(texts).toContain('Tested: May 2026.');
    expect(texts).not.toContain('Sample.');
  });

  it('keeps every score once, in all papers, widths and lengths', () => {
    fc.assert(
      fc.property(
        fc.record({
          paper: fc.constantFrom('a4', 'letter', 'a5'),
          orientation: fc.constantFrom('portrait', 'landscape'),
          tableColumns: fc.constantFrom(1, 2, 3),
          ogive: fc.boolean(),
          inverse: fc.boolean(),
          notes: fc.constantFrom('', 'A note of some length. '.repeat(20), 'A long note. '.repeat(600)),
          cautions: fc.constantFrom('', 'Careful. ', 'Be careful with this. '.repeat(300)),
        }),
        fc.record({
          scores: fc.oneof(fc.integer({ min: 2, max: 60 }), fc.constantFrom(2, 121, 501)),
          min: fc.integer({ min: -30, max: 30 }),
          step: fc.constantFrom(1, 0.5, 10),
          direction: fc.constantFrom('high-is-good', 'low-is-good'),
          weighted: fc.boolean(),
        }),
        fc.subarray([...COLUMN_KEYS]),
        (sheet, { scores, min, step, direction, weighted }, columns) => {
          const scale = { min, max: min + (scores - 1) * step, step };
          const normSet = normSetWith({ scale, direction, weighted }, sheet, columns);
          check(normSet, composeBooklet(normSet));
        },
      ),
      { numRuns: 60, seed: 20260601 },
    );
  });

  it('says so when the figures are too wide for the columns asked for', () => {
    const normSet = normSetWith({ scale: WHOLE_SCALE }, { paper: 'a5' }, COLUMN_KEYS);
    const booklet = composeBooklet(normSet);
    check(normSet, booklet);
    expect(booklet.remarks.some((remark) => remark.includes('in one column'))).toBe(true);
  });

  it('sets long titles in other alphabets, and says which signs are missing', () => {
    const title = 'Пятый класс, Ωμέγα: '.repeat(6).slice(0, 120);
    const set = (name: string): NormSet =>
      sampleNormSet({ scale: WHOLE_SCALE, groups: ['5'] }, (project) => ({
        ...project,
        sheet: { ...project.sheet, paper: 'a5' },
        groups: { ...project.groups, choices: [{ values: ['5'], title: name, printed: true }] },
      }));
    const booklet = composeBooklet(set(title));
    check(set(title), booklet);
    expect(booklet.remarks).toEqual([]);
    expect(composeBooklet(set('五年级')).remarks.join(' ')).toContain('五 年 级');
    const long = composeBooklet(set('word '.repeat(80)));
    check(set('word '.repeat(80)), long);
    expect(long.remarks.join(' ')).toContain('too long');
  });

  it('prints true minus signs and one table column for two scores', () => {
    const normSet = sampleNormSet({ scale: { min: -1, max: 0, step: 1 }, groups: ['4'] });
    const booklet = composeBooklet(normSet);
    check(normSet, booklet);
    const texts = booklet.pages.flatMap(linesOn).map(textOf);
    expect(texts).toContain('−1');
    expect(texts).not.toContain('-1');
  });

  it('repeats title, definition and cautions on further pages', () => {
    const booklet = composeBooklet(sampleNormSet({ scale: { min: 0, max: 300, step: 1 }, groups: ['4'] }));
    expect(booklet.pages.length).toBeGreaterThan(1);
    for (const page of booklet.pages.slice(1)) {
      const texts = linesOn(page).map(textOf).join(' ');
      expect(texts).toContain('Raw score to percentile rank, grade 4 (continued)');
      expect(texts).toContain('The share of the sample scoring');
      expect(texts).toContain('do not add, subtract or average');
    }
  });
});
