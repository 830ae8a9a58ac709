import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import type * as exactRatio from '../../../shared-core/percentile/exact-ratio.ts';
import type { RankDefinition } from '../../../shared-core/percentile/percentile-rank.ts';
import { comparedCells, compareEngines, engineProblem } from '../../../shared-core/second-engine/compare-engines.ts';
import type * as fraction from '../../../shared-core/second-engine/fraction.ts';
import { LOG_LINEAR, sampleNormSet, sampleProject, WHOLE_SCALE } from '../pages/sample-norm-set.ts';
import { buildNormSet } from '../../../shared-core/norms/norm-set.ts';

function setOf(project: NormProject): NormSet {
  const built = buildNormSet(project);
  if (!built.ok) throw new Error(built.problem);
  return built.normSet;
}

const definitions = fc.oneof<fc.Arbitrary<RankDefinition>[]>(
  fc.constantFrom('midpoint', 'at-or-below', 'below').map((kind) => ({ kind })),
  fc.constantFrom('0', '.5', '0.375', '3/8', '1/3', '0.99').map((offset) => ({ kind: 'plotting-position', offset })),
  fc.constantFrom(0.5, 1, 1.5, 5, 40).map((width) => ({ kind: 'grouped', width })),
);

/** Random projects: any shape of counts, weights of some decimals, either direction, one or two columns of groups. */
const projects = fc
  .record({
    definition: definitions,
    direction: fc.constantFrom('high-is-good' as const, 'low-is-good' as const),
    decimals: fc.constantFrom(0 as const, 1 as const),
    rounding: fc.constantFrom('half-up' as const, 'half-even' as const),
    ends: fc.constantFrom('signs' as const, 'held' as const),
    weightDecimals: fc.constantFrom(null, 0, 1, 3),
    min: fc.constantFrom(-3, 0, 0.5),
    cells: fc.array(
      fc.array(fc.tuple(fc.constantFrom(0, 0, 1, 2, 7, 100), fc.integer({ min: 1, max: 4000 })), {
        minLength: 12,
        maxLength: 12,
      }),
      { minLength: 1, maxLength: 4 },
    ),
  })
  .filter(({ cells }) => cells.some((cell) => cell.some(([count]) => count > 0)))
  .map((drawn): NormProject => {
    const project = sampleProject({ scale: { min: 0, max: 1, step: 1 } });
    return {
      ...project,
      tally: {
        scale: { min: drawn.min, max: drawn.min + 5.5, step: 0.5, direction: drawn.direction },
        groupColumns: ['form', 'grade'],
        weightDecimals: drawn.weightDecimals,
        cells: drawn.cells.map((cell, index) => ({
          values: [`f${index % 2}`, `g${index >> 1}`],
          counts: cell.map(([count]) => count),
          weights: drawn.weightDecimals === null ? null : cell.map(([count, each]) => String(count * each)),
          squares: drawn.weightDecimals === null ? null : cell.map(([count, each]) => String(count * each ** 2)),
          clusters: null,
        })),
      },
      groups: { ...project.groups, by: ['grade'] },
      curve: { ...project.curve, definition: drawn.definition },
      table: { ...project.table, decimals: drawn.decimals, rounding: drawn.rounding, ends: drawn.ends },
    };
  });

describe('compareEngines', () => {
  it('finds both engines of one mind on any counts, weights, definition, rounding and ends', () => {
    fc.assert(
      fc.property(projects, (project) => {
        expect(compareEngines(setOf(project))).toEqual([]);
      }),
      { numRuns: 400, seed: 20260601 },
    );
  });

  it.each([false, true])('agrees on a whole booklet, weighted: %s', (weighted) => {
    for (const rounding of ['half-up', 'half-even'] as const) {
      const set = sampleNormSet({ scale: WHOLE_SCALE, groups: ['4', '5'], weighted }, (project) => ({
        ...project,
        table: { ...project.table, rounding },
      }));
      expect(compareEngines(set)).toEqual([]);
      expect(comparedCells(set)).toBe(2 * 41 * 6);
      expect(engineProblem([])).toBeNull();
    }
  });

  it('leaves smoothed groups out', () => {
    const set = sampleNormSet({ scale: WHOLE_SCALE }, (project) => ({
      ...project,
      curve: { ...project.curve, exceptions: [{ values: ['5'], smoothing: LOG_LINEAR }] },
    }));
    expect(compareEngines(set)).toEqual([]);
    expect(comparedCells(set)).toBe(41 * 6);
  });

  it('names group, score and both values of a cell that was printed otherwise', () => {
    const set = sampleNormSet({ scale: WHOLE_SCALE });
    const [first, second] = set.groups;
    const row = second?.rows[20];
    if (first === undefined || second === undefined || row === undefined) throw new Error('no such row');
    const rows = second.rows.map((each) => (each === row ? { ...row, printed: '98' } : each));
    const differences = compareEngines({ ...set, groups: [first, { ...second, rows }] });
    expect(differences).toEqual([
      { group: 'Grade 5', score: '20', column: 'percentile rank', first: '98', second: row.printed },
    ]);
    expect(engineProblem(differences)).toContain(
      `Grade 5, raw score 20, percentile rank: "98" by the first way, "${row.printed}" by the second. Nothing was pressed.`,
    );
    const lost = compareEngines({ ...set, groups: [{ ...first, rows: first.rows.slice(0, -1) }] });
    expect(lost.map(({ score, first: printed }) => [score, printed])).toEqual(Array(6).fill(['40', '']));
  });
});

describe('a wrong rounding', () => {
  /** Four people, one a score: midpoint ranks 12.5, 37.5, 62.5 and 87.5, every one of them a half. */
  const halves = (project: NormProject): NormProject => ({
    ...project,
    tally: {
      scale: { min: 1, max: 4, step: 1, direction: 'high-is-good' },
      groupColumns: ['grade'],
      weightDecimals: null,
      cells: [{ values: ['4'], counts: [1, 1, 1, 1], weights: null, squares: null, clusters: null }],
    },
  });

  it('in the first engine is found', async () => {
    vi.resetModules();
    vi.doMock('../../../shared-core/percentile/exact-ratio.ts', async (original) => {
      const real = await original<typeof exactRatio>();
      const roundRatio: typeof real.roundRatio = (value, decimals) =>
        (value.numerator * 10n ** BigInt(decimals)) / value.denominator;
      return { ...real, roundRatio };
    });
    const wrong = await import('../../../shared-core/norms/norm-set.ts');
    const built = wrong.buildNormSet(halves(sampleProject({ scale: WHOLE_SCALE })));
    vi.doUnmock('../../../shared-core/percentile/exact-ratio.ts');
    vi.resetModules();
    if (!built.ok) throw new Error(built.problem);
    expect(compareEngines(built.normSet).map(({ score, first, second }) => [score, first, second])).toEqual([
      ['1', '12', '13'],
      ['2', '37', '38'],
      ['3', '62', '63'],
      ['4', '87', '88'],
    ]);
  });

  it('in the second engine is found', async () => {
    vi.resetModules();
    vi.doMock('../../../shared-core/second-engine/fraction.ts', async (original) => {
      const real = await original<typeof fraction>();
      const nearestWhole: typeof real.nearestWhole = ({ top, bottom }) => top / bottom;
      return { ...real, nearestWhole };
    });
    const wrong = await import('../../../shared-core/second-engine/compare-engines.ts');
    const differences = wrong.compareEngines(setOf(halves(sampleProject({ scale: WHOLE_SCALE }))));
    vi.doUnmock('../../../shared-core/second-engine/fraction.ts');
    vi.resetModules();
    expect(differences.map(({ score, first, second }) => [score, first, second])).toEqual([
      ['1', '13', '12'],
      ['2', '38', '37'],
      ['3', '63', '62'],
      ['4', '88', '87'],
    ]);
  });
});
