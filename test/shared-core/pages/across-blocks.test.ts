import { describe, expect, it } from 'vitest';
import { BLOCK_KINDS, type BlockKind } from '../../../shared-core/norms/booklet-blocks.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import type { Booklet, BookletPage } from '../../../shared-core/pages/booklet.ts';
import { composeBooklet } from '../../../shared-core/pages/booklet-pages.ts';
import { columnsOf, columnsOn, linesOn, textOf } from './placed-laws.ts';
import { LOG_LINEAR, sampleNormSet, WHOLE_SCALE, type SampleCohort } from './sample-norm-set.ts';

type Sheet = Partial<NormProject['sheet']>;

const grades = (count: number): readonly string[] => Array.from({ length: count }, (_, index) => String(index + 1));

function setOf(
  kind: BlockKind,
  cohort: Partial<SampleCohort>,
  sheet: Sheet = {},
  change: (project: NormProject) => NormProject = (project) => project,
): NormSet {
  return sampleNormSet({ scale: WHOLE_SCALE, ...cohort }, (project) =>
    change({
      ...project,
      sheet: {
        ...project.sheet,
        blocks: BLOCK_KINDS.map((each) => ({ kind: each, printed: each === kind, heading: '', text: '' })),
        ...sheet,
      },
    }),
  );
}

const textsOn = (page: BookletPage | undefined): readonly string[] =>
  page === undefined ? [] : linesOn(page).map(textOf);
const wordsOf = ({ pages }: Booklet): string => pages.flatMap(textsOn).join(' ');

describe('the table of all groups', () => {
  it('stands on one page where its groups and scores find room, each group with its n', () => {
    const normSet = setOf('groups-across', { groups: grades(3) });
    const { pages, remarks } = composeBooklet(normSet);
    expect(remarks).toEqual([]);
    expect(pages).toHaveLength(1);
    expect(pages[0]).toMatchObject({ block: 'groups-across', group: null, opens: 'All groups side by side' });
    const [column, ...others] = columnsOf({ ...composeBooklet(normSet) }, 'groups-across');
    expect(others).toEqual([]);
    expect(column?.heads.map(({ lines, note }) => [...lines, note].join(' ').trim())).toEqual([
      'Raw score',
      ...normSet.groups.map(
        ({ group, summary }) => `${group.title} n ${String(summary.n).replace(/(?=\d{3}$)/, '\u202f')}`,
      ),
    ]);
    expect(textsOn(pages[0])).toContain('The share of the sample scoring below, plus half of those at the same score');
  });

  it('goes on in parts of about equal size, each telling its groups on every page, raw scores repeated', () => {
    const normSet = setOf('groups-across', { groups: grades(12) }, { paper: 'a5' });
    const booklet = composeBooklet(normSet);
    const captions = booklet.pages.map((page) => textsOn(page).find((text) => text.startsWith('Groups ')));
    expect(captions).toEqual([
      'Groups 1 to 6 of 12',
      'Groups 1 to 6 of 12',
      'Groups 7 to 12 of 12',
      'Groups 7 to 12 of 12',
    ]);
    const columns = booklet.pages.flatMap(columnsOn);
    expect(columns.map(({ heads }) => heads.map((head) => head.column))).toEqual([
      [0, 1, 2, 3, 4, 5, 6],
      [0, 1, 2, 3, 4, 5, 6],
      [0, 7, 8, 9, 10, 11, 12],
      [0, 7, 8, 9, 10, 11, 12],
    ]);
    expect(columns.map(({ heads }) => heads.map(({ repeated }) => repeated).slice(0, 2))).toEqual([
      ['nothing', 'nothing'],
      ['head', 'head'],
      ['column', 'nothing'],
      ['column', 'head'],
    ]);
    const rights = columns.map(({ heads }) => heads.map(({ right }) => right.toFixed(6)).join(' '));
    expect(new Set(rights).size).toBe(1);
    const cells = booklet.pages
      .flatMap(linesOn)
      .flatMap(({ role }) => (role.kind === 'cell' && role.row !== 'head' ? [`${role.row} ${role.column}`] : []));
    expect(new Set(cells).size).toBe(cells.length);
    expect(cells).toHaveLength(41 * 13);
  });

  it('repeats the raw scores at the right edge of a wide table, for the eye alone', () => {
    const booklet = composeBooklet(setOf('groups-across', { groups: grades(10) }, { orientation: 'landscape' }));
    const [column] = columnsOf(booklet, 'groups-across');
    expect(column?.heads.map((head) => head.column)).toEqual([0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 0]);
    expect(column?.heads.at(-1)?.repeated).toBe('column');
    for (const { cells } of column?.rows ?? []) expect(cells.at(-1)).toEqual(cells[0]);
  });

  it('stands in columns side by side where it is deeper than the page and narrow enough', () => {
    const long = { scale: { min: 0, max: 120, step: 1 }, groups: grades(3) };
    const side = composeBooklet(setOf('groups-across', long));
    expect(side.pages.map((page) => columnsOn(page).length)).toEqual([3]);
    const alone = composeBooklet(setOf('groups-across', long, { tableColumns: 1 }));
    expect(alone.pages.map((page) => columnsOn(page).length)).toEqual([1, 1, 1]);
  });

  it('marks ranks adjusted by hand and tells why under the table, and which groups are smoothed', () => {
    const plain = setOf('groups-across', {});
    const next = plain.groups[1]?.rows[21]?.printed ?? '';
    const normSet = setOf('groups-across', {}, {}, (project) => ({
      ...project,
      adjustments: [{ values: ['5'], score: 20, to: next, reason: 'order', by: 'A. B.' }],
      curve: { ...project.curve, exceptions: [{ values: ['4'], smoothing: LOG_LINEAR }] },
    }));
    expect(normSet.groups[1]?.rows[20]?.adjusted).not.toBeNull();
    const booklet = composeBooklet(normSet);
    const marked = columnsOf(booklet, 'groups-across').flatMap(({ rows }) =>
      rows.flatMap(({ row, cells }) =>
        cells.flatMap(({ marked: has, said }, column) => (has ? [[row, column, said]] : [])),
      ),
    );
    expect(marked).toEqual([[20, 2, `${next}, adjusted by hand`]]);
    expect(wordsOf(booklet)).toContain(`Grade 5: † Adjusted by hand: raw 20 from `);
    expect(wordsOf(booklet)).toContain('Smoothed are the percentile ranks of Grade 4.');
  });

  it('ends titles that are too long in an ellipsis, and says so', () => {
    const booklet = composeBooklet(setOf('groups-across', { groups: ['4', 'a very long name of a group '.repeat(8)] }));
    expect(booklet.remarks).toEqual([
      'Titles of groups are too long for “All groups side by side” and end in “…”. Shorten them.',
    ]);
  });
});

describe('the table from percentile rank to raw score', () => {
  it('prints for each group the scores of its inverse table, and a dash where none reaches the rank', () => {
    const normSet = setOf('inverse', { groups: ['4', '5'] }, {}, (project) => ({
      ...project,
      curve: { ...project.curve, definition: { kind: 'below' } },
      tally:
        project.tally === null
          ? null
          : {
              ...project.tally,
              cells: project.tally.cells.map((cell, group) =>
                group === 0
                  ? cell
                  : { ...cell, counts: cell.counts.map((_, score) => (score === 40 ? 90 : score === 0 ? 10 : 0)) },
              ),
            },
    }));
    const booklet = composeBooklet(normSet);
    const [column] = columnsOf(booklet, 'inverse-across');
    const printed = column?.rows.map(({ cells }) => cells.map(({ text }) => text));
    const [four, five] = normSet.groups;
    expect(printed).toEqual(
      four?.inverse.map(({ percentile, scoreText }, index) => [
        String(percentile),
        scoreText,
        five?.inverse[index]?.scoreText,
      ]),
    );
    expect(printed?.at(-1)).toEqual(['99', four?.inverse.at(-1)?.scoreText, '–']);
    expect(column?.rows.at(-1)?.cells[2]?.said).toBe('no value');
    expect(wordsOf(booklet)).toContain('stands the lowest raw score');
  });

  it('speaks of the highest score where low is good, and keeps short parts on one page', () => {
    const booklet = composeBooklet(setOf('inverse', { groups: grades(24), direction: 'low-is-good' }));
    expect(wordsOf(booklet)).toContain('stands the highest raw score');
    expect(booklet.pages).toHaveLength(1);
    const tops = columnsOf(booklet, 'inverse-across').map(({ top }) => top);
    expect(tops).toHaveLength(2);
    expect(tops[0]).toBeLessThan(tops[1] ?? 0);
  });
});

describe('the cut scores', () => {
  const cut = (score: number, name = 'Reading support', values: readonly string[] | null = null) => ({
    name,
    score,
    values,
  });
  const withCuts =
    (...cuts: NormProject['cuts']) =>
    (project: NormProject): NormProject => ({ ...project, cuts });

  it('are told in a table each, for the groups that they hold for', () => {
    const booklet = composeBooklet(
      setOf('cut-scores', {}, {}, withCuts(cut(18), cut(31, '', ['5']), cut(7, 'X', ['9']))),
    );
    const tables = booklet.pages.flatMap(columnsOn);
    expect(tables.map(({ table, rows }) => [table, rows.map(({ cells }) => cells[0]?.text)])).toEqual([
      ['cuts 0', ['Grade 4', 'Grade 5']],
      ['cuts 1', ['Grade 5']],
    ]);
    const headings = booklet.pages.flatMap(linesOn).filter(({ role }) => role.kind === 'heading' && role.level === 2);
    expect(headings.map(textOf)).toEqual(['Reading support: raw score 18', 'Raw score 31']);
  });

  it('are left out where there are none', () => {
    const booklet = composeBooklet(
      setOf('cut-scores', {}, {}, (project) => ({
        ...project,
        sheet: {
          ...project.sheet,
          blocks: project.sheet.blocks.map((block) => ({
            ...block,
            printed: block.printed || block.kind === 'tables',
          })),
        },
      })),
    );
    expect(new Set(booklet.pages.map(({ block }) => block))).toEqual(new Set(['tables']));
  });

  it('set long titles in lines that are one head of a row, smaller where figures leave no room', () => {
    const title = '5, of those schools in the upper Ostrey Vale that begin after noon';
    const narrow = { paper: 'a5', marginMm: 45, rowType: 14 } as const;
    const booklet = composeBooklet(setOf('cut-scores', { groups: ['4', title] }, narrow, withCuts(cut(18))));
    const [table] = booklet.pages.flatMap(columnsOn);
    const own = table?.rows.filter(({ row }) => row === 0 || row === 1) ?? [];
    const long = own.filter(({ cells }) => cells[0]?.said === `Grade ${title}`);
    expect(long.length).toBeGreaterThan(1);
    expect(long.map(({ cells }) => cells[1]?.text === '')).toEqual(long.map((_, index) => index > 0));
    expect(booklet.remarks.some((remark) => remark.includes('they are set smaller'))).toBe(true);
  });
});

describe('rules at cuts', () => {
  const marked = (direction: SampleCohort['direction'], score: number, change: Sheet = {}): Booklet =>
    composeBooklet(
      setOf('tables', { groups: ['4'], ...(direction === undefined ? {} : { direction }) }, change, (project) => ({
        ...project,
        cuts: [{ name: 'Reading support', score, values: null }],
      })),
    );

  /** The scores on both sides of each rule, within its column. */
  const beside = (booklet: Booklet): readonly (readonly (number | undefined)[])[] =>
    columnsOf(booklet, 'conversion').flatMap(({ cutRules, rows }) =>
      cutRules.map((y) => [
        rows.findLast(({ baseline }) => baseline < y)?.scores.at(-1),
        rows.find(({ baseline }) => baseline > y)?.scores[0],
      ]),
    );

  it('stand above the first score that reaches the cut, or below the last where low is good', () => {
    expect(beside(marked('high-is-good', 18))).toEqual([[17, 18]]);
    expect(beside(marked('high-is-good', 17.5))).toEqual([[17, 18]]);
    expect(beside(marked('low-is-good', 18))).toEqual([[18, 19]]);
    expect(beside(marked('high-is-good', 15))).toEqual([[undefined, 15]]);
    expect(beside(marked('high-is-good', 18, { rangeRows: true }))).toEqual([[17, 18]]);
    expect(beside(marked('high-is-good', 99))).toEqual([]);
  });

  it('are explained under the table', () => {
    expect(wordsOf(marked('high-is-good', 18))).toContain('A rule marks the cut “Reading support” at 18.');
    expect(wordsOf(marked('high-is-good', 99))).not.toContain('cut');
    const two = setOf('tables', { groups: ['4', '5'] }, {}, (project) => ({
      ...project,
      cuts: [
        { name: 'Reading support', score: 18, values: null },
        { name: '', score: 31, values: ['5'] },
      ],
    }));
    const [four = '', five = ''] = composeBooklet(two).pages.map((page) => textsOn(page).join(' '));
    expect(four).toContain('A rule marks the cut “Reading support” at 18.');
    expect(five).toContain('Rules mark the cuts “Reading support” at 18, at 31.');
  });
});

describe('the type of the rows', () => {
  it('is that of the sheet, with heads in proportion, and is said to be too low where it is', () => {
    const set = (sheet: Sheet): Booklet => composeBooklet(setOf('tables', { groups: ['4'] }, sheet));
    const [column] = columnsOf(set({ rowType: 12, rowHeight: 20, fives: false, tableColumns: 2 }), 'conversion');
    expect(column?.size).toBe(12);
    const pitch = (column?.rows[1]?.baseline ?? 0) - (column?.rows[0]?.baseline ?? 0);
    expect(pitch).toBeCloseTo(20, 9);
    expect(column?.headType.size).toBeCloseTo((6.8 * 12) / 8.7, 9);
    const steps = column?.rows.slice(1).map(({ baseline }, index) => baseline - (column.rows[index]?.baseline ?? 0));
    expect(new Set(steps?.map((step) => step.toFixed(6))).size).toBe(1);
    const low = set({ rowType: 10, rowHeight: 9 });
    expect(low.remarks).toEqual([
      'Rows of 9.0 points are too low for figures of 10.0 points; they are set 11.5 points high. Choose higher rows or smaller figures.',
    ]);
    expect(set({ rowType: 10, rowHeight: 11.5 }).remarks).toEqual([]);
  });

  it('counts printed rows in fives where rows are ranges', () => {
    const booklet = composeBooklet(
      setOf(
        'tables',
        { groups: ['4'], scale: { min: 3, max: 40, step: 1 } },
        { rangeRows: true, tableColumns: 1 },
        (project) => ({
          ...project,
          table: { ...project.table, columns: [] },
        }),
      ),
    );
    const [column] = columnsOf(booklet, 'conversion');
    const gaps = column?.rows
      .slice(1)
      .flatMap(({ baseline }, index) => (baseline - (column.rows[index]?.baseline ?? 0) > 13 ? [index + 1] : []));
    expect(column?.rows.some(({ scores }) => scores.length > 1)).toBe(true);
    expect(gaps?.every((gap) => gap % 5 === 0)).toBe(true);
  });

  it('reads ranges of scores aloud as such, also of negative ones', () => {
    const negative = { groups: ['4'], scale: { min: -60, max: 40, step: 1 } };
    const booklet = composeBooklet(
      setOf('tables', negative, { rangeRows: true }, (project) => ({
        ...project,
        table: { ...project.table, columns: [] },
      })),
    );
    const heads = columnsOf(booklet, 'conversion').flatMap(({ rows }) => rows.map(({ cells }) => cells[0]));
    const range = heads.find((head) => head?.text.includes('–'));
    const [, low, high] = /^−(\d+)–−(\d+)$/.exec(range?.text ?? '') ?? [];
    expect(range?.said).toBe(`minus ${low} to minus ${high}`);
  });

  it('stands in four columns where the figures fit', () => {
    const booklet = composeBooklet(setOf('tables', { groups: ['4'] }, { tableColumns: 4 }));
    expect(columnsOf(booklet, 'conversion').map(({ rows }) => rows.length)).toEqual([10, 10, 10, 11]);
  });
});
