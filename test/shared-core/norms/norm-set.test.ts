import { describe, expect, it } from 'vitest';
import { buildNormSet } from '../../../shared-core/norms/norm-set.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { RankDefinition } from '../../../shared-core/percentile/percentile-rank.ts';
import {
  curveOf,
  builtSet,
  firstNorms,
  projectOf,
  scaleTo,
  settledProject,
  TEN_COUNTS,
  weightedProject,
} from './small-projects.ts';

function ranksBy(project: NormProject, definition: RankDefinition): readonly number[] {
  return firstNorms({ ...project, curve: curveOf(definition) }).rows.map((row) => row.percentileRank);
}

function close(found: readonly number[], wanted: readonly number[]): void {
  expect(found).toHaveLength(wanted.length);
  found.forEach((value, index) => expect(value).toBeCloseTo(wanted[index] ?? NaN, 9));
}

describe('ten people, by hand', () => {
  const ten = projectOf(TEN_COUNTS);

  it('have the ranks of each definition', () => {
    close(ranksBy(ten, { kind: 'midpoint' }), [5, 20, 45, 60, 80]);
    close(ranksBy(ten, { kind: 'at-or-below' }), [10, 30, 60, 60, 100]);
    close(ranksBy(ten, { kind: 'below' }), [0, 10, 30, 60, 60]);
    const positions = [1, 2.5, 5, 6.5, 8.5];
    close(
      ranksBy(ten, { kind: 'plotting-position', offset: '0' }),
      positions.map((r) => (100 * r) / 11),
    );
    close(
      ranksBy(ten, { kind: 'plotting-position', offset: '3/8' }),
      positions.map((r) => (100 * (r - 0.375)) / 10.25),
    );
    close(ranksBy(ten, { kind: 'grouped', width: 2 }), [7.5, 22.5, 37.5, 52.5, 70]);
  });

  it('have the ranks of the mirrored table where low scores are good', () => {
    const seconds = projectOf(TEN_COUNTS, scaleTo(4, 'low-is-good'));
    close(ranksBy(seconds, { kind: 'midpoint' }), [95, 80, 55, 40, 20]);
    close(ranksBy(seconds, { kind: 'at-or-below' }), [100, 90, 70, 40, 40]);
    close(ranksBy(seconds, { kind: 'below' }), [90, 70, 40, 40, 0]);
    // Classes from the poor end: {4, 3} holds 4 people, {2, 1} 5, {0} 1.
    close(ranksBy(seconds, { kind: 'grouped', width: 2 }), [92.5, 77.5, 52.5, 30, 10]);
  });

  it('are described', () => {
    const { summary } = firstNorms(ten);
    expect(summary.n).toBe(10);
    expect(summary.mean).toBeCloseTo(2.4, 12);
    expect(summary.sd).toBeCloseTo(Math.sqrt(20.4 / 9), 12);
    expect(summary.fiveNumbers).toEqual([0, 1, 2, 4, 4]);
    expect(summary.unobserved).toEqual([3]);
  });

  it('count by weight where they have weights', () => {
    // W = 9.2; below 0, 1, 2, 5.6, 5.6; at 1, 1, 3.6, 0, 3.6.
    close(
      ranksBy(weightedProject(), { kind: 'midpoint' }),
      [0.5, 1.5, 3.8, 5.6, 7.4].map((height) => (100 * height) / 9.2),
    );
    const { rows, summary } = firstNorms(weightedProject());
    expect(summary.weightSum).toBeCloseTo(9.2, 12);
    expect(summary.effectiveN).toBeCloseTo(9.2 ** 2 / 9.06, 12);
    expect(rows.map((row) => row.cumulative)).toEqual([1, 2, 5.6, 5.6, 9.2]);
    expect(rows.map((row) => row.provenance.percentileRank.from)).toEqual(Array.from({ length: 5 }, () => 'weights'));
  });
});

describe('the groups of a set', () => {
  it('stand in the order of their values, numbers by size', () => {
    expect(builtSet(settledProject()).groups.map(({ group }) => group.title)).toEqual(['Grade 4', 'Grade 10']);
  });

  it('are merged over columns that make no tables', () => {
    const project = settledProject();
    const { groups } = builtSet({ ...project, groups: { ...project.groups, by: [] } });
    expect(groups.map(({ group, summary }) => [group.title, summary.n])).toEqual([['All pupils', 840]]);
    const both = builtSet({ ...project, groups: { ...project.groups, by: ['form', 'grade'] } });
    expect(both.groups.map(({ group }) => group.title)).toEqual([
      'Form A, Grade 4',
      'Form A, Grade 10',
      'Form B, Grade 4',
      'Form B, Grade 10',
    ]);
  });

  it('leave out those that get no table, and say so when none is left', () => {
    const project = settledProject();
    const without = (values: readonly string[][]): NormProject => ({
      ...project,
      groups: { ...project.groups, choices: values.map((one) => ({ values: one, title: '', printed: false })) },
    });
    expect(builtSet(without([['4']])).groups.map(({ group }) => group.title)).toEqual(['Grade 10']);
    expect(buildNormSet(without([['4'], ['10']]))).toEqual({ ok: false, problem: expect.stringContaining('No group') });
  });

  it('are refused in a sentence before a cohort was read and for an unusable definition', () => {
    expect(buildNormSet({ ...settledProject(), tally: null })).toEqual({
      ok: false,
      problem: expect.stringContaining('No cohort has been read yet.'),
    });
    for (const definition of [
      { kind: 'grouped', width: 1.5 },
      { kind: 'plotting-position', offset: '1' },
      { kind: 'plotting-position', offset: 'x' },
    ] as const) {
      expect(buildNormSet({ ...settledProject(), curve: curveOf(definition) }).ok).toBe(false);
    }
  });

  it('leave the project untouched', () => {
    const project = settledProject();
    const before = JSON.stringify(project);
    builtSet(project);
    expect(JSON.stringify(project)).toBe(before);
  });
});

describe('the check code', () => {
  const project = settledProject();
  const base = builtSet(project).check;

  it('is two times four figures and the same each time', () => {
    expect(base).toMatch(/^[0-9A-F]{4}-[0-9A-F]{4}$/);
    expect(builtSet(settledProject()).check).toBe(base);
  });

  const withSheet = (change: Partial<NormProject['sheet']>): NormProject => ({
    ...project,
    sheet: { ...project.sheet, ...change },
  });
  const withTable = (change: Partial<NormProject['table']>): NormProject => ({
    ...project,
    table: { ...project.table, ...change },
  });
  const oneMore = project.tally && {
    ...project.tally,
    cells: project.tally.cells.map((cell, index) =>
      index > 0 ? cell : { ...cell, counts: cell.counts.map((count, score) => (score === 10 ? count + 1 : count)) },
    ),
  };
  const changes: readonly (readonly [string, NormProject])[] = [
    ['title', { ...project, title: 'Another' }],
    ['subtitle', { ...project, subtitle: 'Form C' }],
    ['people', { ...project, people: 'students' }],
    ['edition', { ...project, release: { ...project.release, edition: '1.1' } }],
    ['date', { ...project, release: { ...project.release, date: '2026-06-16' } }],
    ['definition', { ...project, curve: curveOf({ kind: 'below' }) }],
    ['one person more', { ...project, tally: oneMore }],
    ['sheet title', withSheet({ title: 'Ranks' })],
    ['how to read', withSheet({ howToRead: 'Look.' })],
    ['cautions', withSheet({ cautions: 'Beware.' })],
    ['notes', withSheet({ notes: '' })],
    ['inverse table', withSheet({ inverse: false })],
    ['columns', withTable({ columns: ['t', 'stanine'] })],
    ['decimals', withTable({ decimals: 1 })],
    ['rounding', withTable({ rounding: 'half-even' })],
    ['ends', withTable({ ends: 'held' })],
    ['z', withTable({ zSource: 'linear' })],
    ['ends of z', withTable({ zEnds: 'half-person' })],
    [
      'group title',
      { ...project, groups: { ...project.groups, choices: [{ values: ['4'], title: 'Fourth', printed: true }] } },
    ],
    [
      'documentation',
      {
        ...project,
        groups: { ...project.groups, documentation: { ...project.groups.documentation, testDates: 'June 2026' } },
      },
    ],
    ['source', { ...project, source: project.source && { ...project.source, sha256: 'c'.repeat(64) } }],
  ];
  it.each(changes)('differs with another %s', (_, changed) => {
    expect(builtSet(changed).check).not.toBe(base);
  });

  it('does not depend on the paper or on answers given', () => {
    const answers = [{ query: 'documentation', reason: 'Told elsewhere.' }];
    expect(builtSet(withSheet({ paper: 'letter', orientation: 'landscape', tableColumns: 1 })).check).toBe(base);
    expect(builtSet({ ...project, release: { ...project.release, answers } }).check).toBe(base);
  });
});
