import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { COLUMN_KEYS } from '../../../shared-core/norms/column-keys.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import type { Booklet, BookletPage, TableColumnBlock, TextLine } from '../../../shared-core/pages/booklet.ts';
import { composeBooklet } from '../../../shared-core/pages/booklet-pages.ts';
import { tableMarks } from '../../../shared-core/pages/table-blocks.ts';
import { textWidth } from '../../../shared-core/pages/text-width.ts';
import { printNumber } from '../../../shared-core/scores/printed-number.ts';
import { KERNEL, LOG_LINEAR, sampleNormSet, WHOLE_SCALE, type SampleCohort } from './sample-norm-set.ts';
import { tries } from '../../thoroughness.ts';

type Sheet = Partial<NormProject['sheet']>;

interface Choices {
  readonly columns?: NormProject['table']['columns'];
  readonly decimals?: 0 | 1;
  readonly smoothing?: NormProject['curve']['smoothing'];
  readonly exceptions?: NormProject['curve']['exceptions'];
  readonly reliability?: number | null;
}

function normSetWith(cohort: SampleCohort, sheet: Sheet, choices: Choices = {}): NormSet {
  return sampleNormSet(cohort, (project) => ({
    ...project,
    sheet: { ...project.sheet, ...sheet },
    curve: {
      ...project.curve,
      smoothing: choices.smoothing ?? project.curve.smoothing,
      exceptions: choices.exceptions ?? [],
    },
    precision: { ...project.precision, reliability: choices.reliability ?? null },
    table: {
      ...project.table,
      columns: choices.columns ?? project.table.columns,
      decimals: choices.decimals ?? project.table.decimals,
    },
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
  const { columns } = normSet.project.table;
  const printed = booklet.pages.flatMap((page) =>
    tablesOn(page).flatMap(({ rows }) =>
      rows.map(({ scores, cells }) => [page.group, ...scores, ...cells.map(({ text }) => text)]),
    ),
  );
  const expected = normSet.groups.flatMap(({ rows }, group) =>
    rows.map((row) => [group, row.score, row.scoreText, row.printed, ...columns.map((key) => row.texts[key])]),
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
      checkCells(table);
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
      if (block.kind === 'rule') expect(block.y).toBeLessThanOrEqual(body.bottom);
    }
  }
}

/** Every text stands between the end of the column before it and the end of its own. */
function checkCells(table: TableColumnBlock): void {
  for (const mark of tableMarks(table)) {
    if (mark.kind !== 'text') continue;
    const end = mark.x + mark.width - table.x;
    const at = table.heads.findIndex((head) => end <= head.right + 1e-6);
    expect(end - widthOf(mark)).toBeGreaterThanOrEqual((table.heads[at - 1]?.right ?? 0) - 1e-6);
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
        fc.record({
          columns: fc.subarray([...COLUMN_KEYS]),
          decimals: fc.constantFrom(0, 1),
          smoothing: fc.constantFrom({ kind: 'none' } as const, LOG_LINEAR, KERNEL, { ...KERNEL, after: LOG_LINEAR }),
          reliability: fc.constantFrom(null, 0.9),
        }),
        (sheet, { scores, min, step, direction, weighted }, choices) => {
          const scale = { min, max: min + (scores - 1) * step, step };
          const normSet = normSetWith({ scale, direction, weighted }, sheet, choices);
          check(normSet, composeBooklet(normSet));
        },
      ),
      { numRuns: tries(20, 200), seed: 20260601 },
    );
  }, 60_000);

  it('says so when the figures are too wide for the columns asked for', () => {
    const normSet = normSetWith(
      { scale: WHOLE_SCALE },
      { paper: 'a5' },
      { columns: COLUMN_KEYS, smoothing: LOG_LINEAR },
    );
    const booklet = composeBooklet(normSet);
    check(normSet, booklet);
    expect(booklet.remarks.some((remark) => remark.includes('in one column'))).toBe(true);
  });

  it('aligns ranges on their dashes, single texts where low ends stand', () => {
    const normSet = normSetWith({ scale: WHOLE_SCALE, groups: ['4'] }, {}, { columns: ['interval', 't'] });
    const dashes = new Set<string>();
    for (const table of composeBooklet(normSet).pages.flatMap(tablesOn)) {
      const head = table.heads[2];
      const cells = tableMarks(table)
        .filter((mark) => mark.kind === 'text')
        .filter(
          (mark) =>
            /^[<>\d.]+(–[<>\d.]+)?$/.test(textOf(mark)) && mark.x === table.x + (head?.right ?? 0) - (head?.width ?? 0),
        );
      expect(cells).toHaveLength(table.rows.length);
      for (const cell of cells) {
        const [low = '', high = null] = textOf(cell).split('–');
        const start = cell.x + cell.width - widthOf(cell) - table.x;
        dashes.add((start + textWidth(low, 'sans', cell.size)).toFixed(6));
        expect(high === null || high !== '').toBe(true);
      }
    }
    expect(dashes.size).toBe(1);
  });

  it('tells of sampling and measurement as different things where a column of errors is printed', () => {
    const textsWith = (columns: NormProject['table']['columns'], reliability: number | null = null): string =>
      composeBooklet(normSetWith({ scale: WHOLE_SCALE, groups: ['4'] }, {}, { columns, reliability }))
        .pages.flatMap(linesOn)
        .map(textOf)
        .join(' ');
    expect(textsWith(['t'])).not.toMatch(/different thing|error of measurement/i);
    expect(textsWith(['interval'])).toContain('Error of measurement in one pupil’s score is a different thing');
    expect(textsWith(['interval'])).toContain('The interval is that of the observed rank, as if pupils were drawn');
    expect(textsWith(['measurement-band'], 0.9)).toContain('leaves out error of sampling, which is a different thing');
    expect(textsWith(['interval', 'measurement-band'], 0.9)).toContain('They are different things');
  });

  it('prints the technical notes of each smoothed group, and of no other', () => {
    const normSet = normSetWith(
      { scale: WHOLE_SCALE, groups: ['4', '5', '6'] },
      {},
      {
        columns: ['interval', 'stanine', 't'],
        smoothing: LOG_LINEAR,
        exceptions: [
          { values: ['5'], smoothing: { kind: 'none' } },
          { values: ['6'], smoothing: KERNEL },
        ],
      },
    );
    const booklet = composeBooklet(normSet);
    check(normSet, booklet);
    expect(booklet.pages).toHaveLength(3);
    const [four = '', five = '', six = ''] = booklet.pages.map((page) => linesOn(page).map(textOf).join(' '));
    const TITLE = 'Technical notes on the smoothing';
    expect([four, five, six].map((texts) => texts.includes(TITLE))).toEqual([true, false, true]);
    expect(four).toContain('Log- linear smoothing of degree 2');
    expect(four).toContain('definition: midpoint, smoothed');
    expect(five).toContain('The distribution of this group is not smoothed.');
    expect(five).not.toContain('smoothed ·');
    expect(six).toContain('The bandwidth of the kernel is');
    expect([four, six].map((texts) => texts.includes('Degree G² X² df AIC BIC p'))).toEqual([true, false]);
    const { evidence } = normSet.groups[0] ?? {};
    expect(four).toContain(`Smoothing changes ${evidence?.changed} of 41 printed ranks.`);
  });

  it('marks the degree taken by a rule under it', () => {
    const normSet = normSetWith({ scale: WHOLE_SCALE, groups: ['4'] }, {}, { smoothing: { ...LOG_LINEAR, degree: 4 } });
    const page = composeBooklet(normSet).pages.at(-1);
    if (page === undefined) throw new Error('no page');
    const head = page.blocks.findIndex((block) => block.kind === 'text' && textOf(block) === 'Degree');
    const after = page.blocks.slice(head);
    const numbers = after.filter(
      (block): block is TextLine =>
        block.kind === 'text' && /^\d+$/.test(textOf(block)) && block.x === page.blocks[head]?.x,
    );
    expect(numbers.map(textOf)).toEqual(['1', '2', '3', '4', '5', '6', '7', '8', '9', '10']);
    const [taken, next] = [numbers[3], numbers[4]];
    if (taken === undefined || next === undefined) throw new Error('no row');
    const between = after.filter(
      (block) => block.kind === 'rule' && block.x === taken.x && block.y > taken.baseline && block.y < next.baseline,
    );
    expect(between).toHaveLength(1);
    expect(taken.runs[0]?.face).toBe('sans-bold');
    const { smoothing } = normSet.groups[0] ?? {};
    if (smoothing?.state !== 'smoothed') throw new Error('not smoothed');
    expect(linesOn(page).map(textOf)).toContain(printNumber(smoothing.curve.bic ?? NaN, 1));
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
