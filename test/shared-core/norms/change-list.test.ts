import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { changeLines } from '../../../shared-core/norms/change-list.ts';
import { compareEditions } from '../../../shared-core/norms/edition-compare.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { groupedProject } from './edition-projects.ts';
import { builtSet, projectOf, settledProject, TEN_COUNTS } from './small-projects.ts';

function linesOf(before: NormProject, after: NormProject): readonly string[] {
  return changeLines(compareEditions(builtSet(before), builtSet(after)));
}

function withColumns(project: NormProject, columns: NormProject['table']['columns']): NormProject {
  return { ...project, table: { ...project.table, columns } };
}

describe('a change list', () => {
  it('says so where nothing changed', () => {
    expect(linesOf(settledProject(), settledProject())).toEqual(['Nothing that is printed changed.']);
  });

  it('names changed rows, the rank without its name', () => {
    // Midpoint ranks of 1, 2, 3, 0, 4 of 10: 5, 20, 45, 60, 80; of 1, 3, 2, 0, 4: 5, 25, 50, 60, 80.
    const lines = linesOf(
      withColumns(projectOf(TEN_COUNTS), ['count']),
      withColumns(projectOf([1, 3, 2, 0, 4]), ['count']),
    );
    expect(lines).toEqual([
      'All pupils: 2 rows changed.',
      'All pupils, raw score 1: 20 → 25, number of pupils 2 → 3.',
      'All pupils, raw score 2: 45 → 50, number of pupils 3 → 2.',
    ]);
  });

  it('tells choices, columns, tables that came or went, n, and cut scores, as sentences', () => {
    const before = groupedProject('form', { A: [1, 2, 3], B: [2, 2, 2] });
    const after = groupedProject('form', { A: [1, 2, 4], C: [1, 1, 1] });
    const told = linesOf(
      { ...withColumns(before, ['z']), cuts: [{ name: 'Reading support', score: 1, values: null }] },
      {
        ...withColumns(after, ['t']),
        table: { ...after.table, columns: ['t'], rounding: 'half-even' },
        cuts: [
          { name: 'Reading support', score: 2, values: null },
          { name: 'Prize', score: 2, values: ['A'] },
        ],
      },
    );
    expect(told).toContain('Rounding: halves rounded up → halves rounded to even.');
    expect(told).toContain('Cut score Reading support: 1 → 2.');
    expect(told).toContain('Cut score Prize (A): none → 2.');
    expect(told).toContain('New column: T score.');
    expect(told).toContain('Column no longer printed: z score.');
    expect(told).toContain('New table: Form C, 3 rows.');
    expect(told).toContain('Table no longer printed: Form B.');
    expect(told).toContain('Form A, n: 6 → 7.');
    expect(told.some((line) => line.includes('mean'))).toBe(false);
  });

  it('leaves out how the pages are set', () => {
    const { sheet, ...project } = settledProject();
    const set = { ...sheet, paper: 'letter', marginMm: 20, fives: false } as const;
    expect(linesOf(settledProject(), { ...project, sheet: set })).toEqual(['Nothing that is printed changed.']);
    expect(linesOf(settledProject(), { ...project, sheet: { ...set, inverse: false } })).toEqual([
      'Inverse table: with the lowest score for each percentile → without an inverse table.',
    ]);
  });

  it('tells another cohort file without its fingerprint', () => {
    const project = settledProject();
    const source = project.source && { ...project.source, sha256: 'e'.repeat(64) };
    expect(linesOf(project, { ...project, source })).toEqual(['The tables are made from another cohort file.']);
  });

  it('counts the rows beyond the first twelve of a table', () => {
    const even = Array.from({ length: 41 }, () => 10);
    const moved = even.map((count, score) => (score === 0 ? 60 : count));
    const before = withColumns(projectOf(even), []);
    const rows = compareEditions(builtSet(before), builtSet(withColumns(projectOf(moved), []))).counts.rowsChanged;
    expect(rows).toBeGreaterThan(20);
    const lines = linesOf(before, withColumns(projectOf(moved), []));
    expect(lines.filter((line) => line.includes(', raw score '))).toHaveLength(12);
    expect(lines).toContain(`All pupils: ${rows} rows changed.`);
    expect(lines.at(-1)).toBe(`All pupils: and ${rows - 12} rows more.`);
  });

  it('names no more than 120 rows in all, and never fewer tables', () => {
    const names = Array.from({ length: 30 }, (_, index) => `T${String(index).padStart(2, '0')}`);
    const all = (first: number) =>
      withColumns(
        groupedProject(
          'form',
          Object.fromEntries(names.map((name) => [name, Array.from({ length: 20 }, (_, i) => (i === 0 ? first : 10))])),
        ),
        [],
      );
    const lines = linesOf(all(10), all(90));
    expect(lines.filter((line) => line.includes(', raw score '))).toHaveLength(120);
    expect(lines.filter((line) => / rows changed\.$/.test(line))).toHaveLength(30);
  });

  it('fits the project file, whatever was written', () => {
    fc.assert(
      fc.property(fc.string({ maxLength: 8000 }), fc.string({ maxLength: 400 }), (notes, title) => {
        const { sheet, ...project } = settledProject();
        const lines = linesOf(settledProject(), { ...project, title, sheet: { ...sheet, notes } });
        expect(lines.every((line) => line.length <= 8000)).toBe(true);
      }),
      { numRuns: 30 },
    );
  });
});
