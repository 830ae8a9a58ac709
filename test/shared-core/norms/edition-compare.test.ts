import fc from 'fast-check';
import { withBlock } from '../../../shared-core/norms/booklet-choice.ts';
import { describe, expect, it } from 'vitest';
import { comparisonText } from '../../../shared-core/norms/edition-compare-words.ts';
import {
  compareEditions,
  printsTheSame,
  type EditionComparison,
  type GroupChange,
  type RowChange,
} from '../../../shared-core/norms/edition-compare.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { groupedProject } from './edition-projects.ts';
import { builtSet, projectOf, settledProject, TEN_COUNTS } from './small-projects.ts';

const BASE = projectOf(TEN_COUNTS);

function withTable(project: NormProject, table: Partial<NormProject['table']>): NormProject {
  return { ...project, table: { ...project.table, ...table } };
}

function compared(before: NormProject, after: NormProject): EditionComparison {
  return compareEditions(builtSet(before), builtSet(after));
}

function changedGroup(comparison: EditionComparison): Extract<GroupChange, { readonly kind: 'changed' }> {
  const [group] = comparison.groups;
  if (group?.kind !== 'changed') throw new Error('no changed group');
  return group;
}

describe('two editions', () => {
  it('of one project do not differ', () => {
    const same = compared(BASE, BASE);
    expect(printsTheSame(same)).toBe(true);
    expect([same.choices, same.columns, same.groups]).toEqual([[], [], []]);
    expect(same.counts).toMatchObject({ groupsCompared: 1, rowsCompared: 5, cellsCompared: 15, cellsChanged: 0 });
    expect(comparisonText(same)).toContain('No printed cell differs. 15 printed cells of 1 group compared.');
  });

  it('differ in exactly the cells that one moved pupil changes', () => {
    // Midpoint ranks of 1, 2, 3, 0, 4 of 10: 5, 20, 45, 60, 80; of 1, 3, 2, 0, 4: 5, 25, 50, 60, 80.
    const project = withTable(BASE, { columns: ['count'] });
    const comparison = compared(project, withTable(projectOf([1, 3, 2, 0, 4]), { columns: ['count'] }));
    const { rows, facts } = changedGroup(comparison);
    const rank = { column: 'rank', name: 'percentile rank' };
    const count = { column: 'count', name: 'number of pupils' };
    expect(rows).toEqual([
      {
        kind: 'changed',
        score: 1,
        scoreText: '1',
        cells: [
          { ...rank, before: '20', after: '25' },
          { ...count, before: '2', after: '3' },
        ],
      },
      {
        kind: 'changed',
        score: 2,
        scoreText: '2',
        cells: [
          { ...rank, before: '45', after: '50' },
          { ...count, before: '3', after: '2' },
        ],
      },
    ]);
    expect(facts).toContainEqual({ what: 'mean', before: '2.4', after: '2.3' });
    expect(comparison.choices).toEqual([]);
    expect(comparison.counts).toMatchObject({ rowsChanged: 2, cellsChanged: 4, groupsWithChangedRows: 1 });
    expect(comparisonText(comparison)).toContain('  raw score 1: percentile rank 20 → 25; number of pupils 2 → 3\n');
  });

  it('tell a rank adjusted by hand by its mark', () => {
    const before = settledProject();
    const adjustment = { values: ['4'], score: 3, to: '18', reason: 'Agreed with the board', by: 'M. Orr' };
    const after = { ...before, adjustments: [adjustment] };
    const comparison = compared(before, after);
    expect(comparison.counts.cellsChanged).toBe(1);
    expect(comparisonText(comparison)).toContain('18†');
  });

  it('tell another rounding as a choice and the halves that it moves', () => {
    // Midpoint ranks of 1, 0, 3 of 4: 12.5, 25 and 62.5; the rule for halves decides two of them.
    const project = withTable(projectOf([1, 0, 3]), { columns: [] });
    const comparison = compared(project, withTable(project, { rounding: 'half-even' }));
    expect(comparison.choices).toEqual([
      { what: 'rounding', before: 'halves rounded up', after: 'halves rounded to even' },
    ]);
    const { rows } = changedGroup(comparison);
    expect(rows.map(({ scoreText, cells }) => [scoreText, cells])).toEqual([
      ['0', [{ column: 'rank', name: 'percentile rank', before: '13', after: '12' }]],
      ['2', [{ column: 'rank', name: 'percentile rank', before: '63', after: '62' }]],
    ]);
  });

  it('match a group by its values, so that another title is one changed fact', () => {
    const project = settledProject();
    const choices = [{ values: ['4'], title: 'Juniors', printed: true }];
    const comparison = compared(project, { ...project, groups: { ...project.groups, choices } });
    expect(comparison.groups).toEqual([
      {
        kind: 'changed',
        title: 'Juniors',
        facts: [{ what: 'title', before: 'Grade 4', after: 'Juniors' }],
        rows: [],
        inverse: [],
      },
    ]);
    expect(printsTheSame(comparison)).toBe(true);
  });

  it('match a group by its title where the values were written anew', () => {
    const project = settledProject();
    const { tally } = project;
    if (tally === null) throw new Error('no tally');
    const cells = tally.cells.map((cell) => ({ ...cell, values: cell.values.map((text) => text.replace('4', '04')) }));
    const choices = [{ values: ['04'], title: 'Grade 4', printed: true }];
    const renamed = { ...project, tally: { ...tally, cells }, groups: { ...project.groups, choices } };
    const comparison = compared(project, renamed);
    expect(comparison.counts).toMatchObject({ groupsCompared: 2, groupsCame: 0, groupsWent: 0 });
    expect(comparison.groups).toEqual([]);
  });

  it('do not take equal values of other columns for the same group', () => {
    const project = settledProject();
    const byForm = { ...project, groups: { ...project.groups, by: ['form'] } };
    const comparison = compared(project, byForm);
    expect(comparison.groups).toEqual([
      { kind: 'went', title: 'Grade 4', rows: 21 },
      { kind: 'went', title: 'Grade 10', rows: 21 },
      { kind: 'came', title: 'Form A', rows: 21 },
      { kind: 'came', title: 'Form B', rows: 21 },
    ]);
    expect(comparison.choices).toContainEqual({
      what: 'tables',
      before: 'one table for each grade',
      after: 'one table for each form',
    });
    expect(printsTheSame(comparison)).toBe(false);
  });

  it('tell the rows that a wider scale brings', () => {
    const comparison = compared(
      withTable(BASE, { columns: [] }),
      withTable(projectOf([...TEN_COUNTS, 0]), { columns: [] }),
    );
    expect(comparison.choices).toEqual([{ what: 'scale', before: '0 to 4', after: '0 to 5' }]);
    expect(changedGroup(comparison).rows).toEqual([
      {
        kind: 'came',
        score: 5,
        scoreText: '5',
        cells: [{ column: 'rank', name: 'percentile rank', text: '>99' }],
      },
    ]);
    expect(comparison.counts).toMatchObject({ rowsCame: 1, rowsChanged: 0, rowsCompared: 5 });
  });

  it('tell columns that came or went, and compare the ones that both have', () => {
    const comparison = compared(withTable(BASE, { columns: ['t', 'z'] }), withTable(BASE, { columns: ['z', 'count'] }));
    expect(comparison.columns).toEqual([
      { kind: 'went', column: 't', name: 'T score' },
      { kind: 'came', column: 'count', name: 'number of pupils' },
    ]);
    expect(comparison.counts).toMatchObject({ cellsCompared: 10, cellsChanged: 0, columnsCame: 1, columnsWent: 1 });
    expect(printsTheSame(comparison)).toBe(false);
  });

  it('tell cuts, one at no score of the scale too, and the blocks of the booklet with their words', () => {
    const project = projectOf(TEN_COUNTS);
    const cut = { name: 'Support', score: 2, values: null };
    const sheet = withBlock(project.sheet, 'cautions', { printed: true, heading: 'Take care', text: 'Ask first.' });
    const { choices } = compared({ ...project, cuts: [cut] }, { ...project, sheet, cuts: [{ ...cut, score: 2.5 }] });
    expect(choices).toEqual([
      { what: 'booklet', before: 'a sheet for each table', after: '2 blocks of your own choice' },
      { what: 'blocks of the booklet', before: 'tables', after: 'tables, cautions' },
      { what: 'heading of the block “Cautions”', before: null, after: 'Take care' },
      { what: 'text of the block “Cautions”', before: null, after: 'Ask first.' },
      { what: 'cut score Support', before: '2', after: '2.5' },
    ]);
  });

  it('tell another cohort by its fingerprint, other words only by their name, and lines of inverse tables', () => {
    const project = settledProject();
    const { source, sheet, tally } = project;
    if (source === null || tally === null) throw new Error('no cohort');
    const moved = tally.cells.map((cell) => ({
      ...cell,
      counts: cell.counts.map((n, i) => n + (i === 0 ? 3 : i === 20 ? -3 : 0)),
    }));
    const comparison = compared(project, {
      ...project,
      tally: { ...tally, cells: moved },
      source: { ...source, sha256: 'c'.repeat(64) },
      sheet: { ...sheet, cautions: `${sheet.cautions} Ask.` },
    });
    expect(comparison.choices.map(({ what }) => what)).toEqual(['SHA-256 of the cohort', 'cautions']);
    expect(comparison.counts.inverseChanged).toBeGreaterThan(0);
    expect(comparisonText(comparison)).toContain('  cautions: rewritten\n');
    expect(comparisonText(comparison)).toMatch(/ {2}score that reaches percentile \d+: \d+ → \d+\n/);
  });
});

const drawnSet: fc.Arbitrary<NormSet> = fc
  .record({
    max: fc.integer({ min: 1, max: 6 }),
    counts: fc.array(fc.nat(9), { minLength: 21, maxLength: 21 }),
    groups: fc.subarray(['A', 'B', 'C'], { minLength: 1 }),
    columns: fc.shuffledSubarray(['count', 'z', 't', 'stanine'] as const),
    rounding: fc.constantFrom('half-up' as const, 'half-even' as const),
    definition: fc.constantFrom({ kind: 'midpoint' as const }, { kind: 'at-or-below' as const }),
    inverse: fc.boolean(),
    notes: fc.string(),
  })
  .map(({ max, counts, groups, columns, rounding, definition, inverse, notes }) => {
    const drawn = groups.map((group, index): readonly [string, readonly number[]] => [
      group,
      counts.slice(index * (max + 1), (index + 1) * (max + 1)).map((n, i) => (i === 0 ? n + 1 : n)),
    ]);
    const bare = withTable(groupedProject('form', Object.fromEntries(drawn)), { columns, rounding });
    return builtSet({
      ...bare,
      curve: { ...bare.curve, definition },
      sheet: { ...bare.sheet, inverse, notes },
    });
  });

const OTHER = { came: 'went', went: 'came' } as const;

function swappedSides<T extends { readonly before: unknown; readonly after: unknown }>(change: T): T {
  return { ...change, before: change.after, after: change.before };
}

function swappedRow(row: RowChange): RowChange {
  return row.kind === 'changed'
    ? { ...row, cells: row.cells.map(swappedSides).toSorted(byColumn) }
    : { ...row, kind: OTHER[row.kind], cells: row.cells.toSorted(byColumn) };
}

function byColumn(left: { readonly column: string }, right: { readonly column: string }): number {
  return left.column < right.column ? -1 : 1;
}

function swappedGroup(group: GroupChange): GroupChange {
  if (group.kind !== 'changed') return { ...group, kind: OTHER[group.kind] };
  const { facts, rows, inverse } = group;
  return {
    ...group,
    facts: facts.map(swappedSides),
    rows: rows.map(swappedRow),
    inverse: inverse.map(swappedSides),
  };
}

/** A comparison without the order of columns and groups, which is that of the earlier edition. */
function unordered({ groups, columns, ...rest }: EditionComparison) {
  const inOrder = groups
    .map((group) => swappedGroup(swappedGroup(group)))
    .toSorted((left, right) => (left.title < right.title ? -1 : 1));
  return { ...rest, columns: columns.toSorted(byColumn), groups: inOrder };
}

function swapped({ before, after, choices, columns, groups, counts }: EditionComparison): EditionComparison {
  return {
    before: after,
    after: before,
    choices: choices.map(swappedSides),
    columns: columns.map((column) => ({ ...column, kind: OTHER[column.kind] })),
    groups: groups.map(swappedGroup),
    counts: {
      ...counts,
      groupsCame: counts.groupsWent,
      groupsWent: counts.groupsCame,
      rowsCame: counts.rowsWent,
      rowsWent: counts.rowsCame,
      columnsCame: counts.columnsWent,
      columnsWent: counts.columnsCame,
    },
  };
}

describe('laws of comparison', () => {
  it('a set beside itself shows no difference', () => {
    fc.assert(
      fc.property(drawnSet, (set) => {
        const { choices, columns, groups } = compareEditions(set, set);
        expect([choices, columns, groups]).toEqual([[], [], []]);
      }),
      { numRuns: 60 },
    );
  });

  it('the other way round, old and new change places and nothing else', () => {
    fc.assert(
      fc.property(drawnSet, drawnSet, (left, right) => {
        const there = compareEditions(left, right);
        expect(unordered(swapped(there))).toEqual(unordered(compareEditions(right, left)));
        expect(compareEditions(left, right)).toEqual(there);
      }),
      { numRuns: 100 },
    );
  });

  it('sets that print the same cells have no row in their comparison, others have', () => {
    fc.assert(
      fc.property(drawnSet, drawnSet, fc.boolean(), (left, other, again) => {
        const { sheet } = left.project;
        const right = again ? builtSet({ ...left.project, sheet: { ...sheet, notes: 'Another note.' } }) : other;
        const printed = ({ groups, project }: NormSet) =>
          groups.map(({ group, rows, inverse }) => [
            group.key,
            rows.map((row) => [
              row.scoreText,
              row.printed,
              ...project.table.columns.toSorted().map((key) => row.texts[key]),
            ]),
            left.project.sheet.inverse && right.project.sheet.inverse ? inverse : [],
          ]);
        const sameColumns = (set: NormSet) => set.project.table.columns.toSorted();
        const alike =
          JSON.stringify([printed(left), sameColumns(left)]) === JSON.stringify([printed(right), sameColumns(right)]);
        expect(printsTheSame(compareEditions(left, right))).toBe(alike);
      }),
      { numRuns: 100 },
    );
  });
});
