import { describe, expect, it } from 'vitest';
import type { ConversionRow } from '../../../shared-core/norms/conversion-table.ts';
import type { GroupNorms } from '../../../shared-core/norms/group-norms.ts';
import type { NormProject, PrecisionChoices, TableChoices } from '../../../shared-core/norms/norm-project.ts';
import { printedRange, printInterval } from '../../../shared-core/norms/row-precision.ts';
import type { RankDefinition } from '../../../shared-core/percentile/percentile-rank.ts';
import { observedContinuization, smoothedContinuization } from '../../../shared-core/precision/continuized-rank.ts';
import { measurementBands } from '../../../shared-core/precision/measurement-band.ts';
import { INTERVAL_METHODS, rankIntervals } from '../../../shared-core/precision/proportion-interval.ts';
import { rankStandardErrors } from '../../../shared-core/precision/rank-variance.ts';
import { smooth } from '../../../shared-core/smoothing/smooth.ts';
import {
  firstNorms,
  logLinear,
  projectOf,
  scaleTo,
  smoothedBy,
  TEN_COUNTS,
  weightedProject,
} from './small-projects.ts';
import { SMOOTHED_COUNTS } from './smoothing-methods.ts';

function normsWith(
  project: NormProject,
  precision: Partial<PrecisionChoices>,
  definition: RankDefinition = project.curve.definition,
  table: Partial<TableChoices> = {},
): GroupNorms {
  return firstNorms({
    ...project,
    curve: { ...project.curve, definition },
    precision: { ...project.precision, ...precision },
    table: { ...project.table, ...table },
  });
}

const KINDS = ['midpoint', 'at-or-below', 'below'] as const;
const PROJECTS: readonly (readonly [string, NormProject])[] = [
  ['people', projectOf(SMOOTHED_COUNTS)],
  ['people, low is good', projectOf(SMOOTHED_COUNTS, scaleTo(10, 'low-is-good'))],
  ['weights', weightedProject()],
  ['weights, low is good', weightedProject('low-is-good')],
];

describe.each(PROJECTS)('how sure the ranks of %s are', (_, project) => {
  it.each(INTERVAL_METHODS)('is told by the %s interval of the observed rank', (method) => {
    for (const kind of KINDS) {
      const { rows, group, summary, precision } = normsWith(project, { interval: method, level: 90 }, { kind });
      const expected = rankIntervals(group.table, summary.effectiveN, { kind }, { method, level: 90 });
      expect(rows.map(({ interval }) => interval)).toEqual(expected.ok ? expected.intervals : rows.map(() => null));
      expect(precision.intervalProblem).toBe(expected.ok ? null : expected.problem);
      expect(expected.ok).toBe(method !== 'clopper-pearson' || (kind !== 'midpoint' && !group.table.weighted));
    }
  });

  it('is told by the multinomial error of the definition, and of the midpoint beside it', () => {
    for (const kind of KINDS) {
      const { rows, group, summary } = normsWith(project, {}, { kind });
      const errors = (counted: (typeof KINDS)[number]) => rankStandardErrors(group.table, counted, summary.effectiveN);
      expect(rows.map(({ standardError }) => standardError)).toEqual(errors(kind));
      expect(rows.map(({ midpointError }) => midpointError)).toEqual(errors('midpoint'));
    }
  });

  it('is told by a band of measurement, from the reliability', () => {
    const { rows, group, summary, precision } = normsWith(project, { reliability: 0.84, level: 68 });
    const choice = { reliability: 0.84, level: 68 };
    const bands = measurementBands(group.table.scale, observedContinuization(group.table), summary.sd, choice);
    if (!bands.ok) throw new Error(bands.problem);
    expect(rows.map(({ band }) => band)).toEqual(bands.bands.map(({ ranks }) => ranks));
    expect(precision.sem).toBeCloseTo((summary.sd ?? NaN) * 0.4, 12);
    expect(normsWith(project, {}).rows.every(({ band }) => band === null)).toBe(true);
  });
});

describe('smoothing', () => {
  const project = smoothedBy(projectOf(SMOOTHED_COUNTS), logLinear(3));

  it('moves the band of measurement, which is of the curve', () => {
    const { rows, group, summary } = normsWith(project, { reliability: 0.9 });
    const result = smooth(group.table, logLinear(3));
    if (!result.ok) throw new Error(result.problem);
    const curve = smoothedContinuization(result.smoothed, group.table.scale);
    const bands = measurementBands(group.table.scale, curve, summary.sd, { reliability: 0.9, level: 95 });
    if (!bands.ok) throw new Error(bands.problem);
    rows.forEach(({ band }, position) => {
      expect(band?.low).toBeCloseTo(bands.bands[position]?.ranks.low ?? NaN, 10);
      expect(band?.high).toBeCloseTo(bands.bands[position]?.ranks.high ?? NaN, 10);
    });
  });
});

describe('printed precision', () => {
  const column = (rows: readonly ConversionRow[], key: keyof ConversionRow['texts']): readonly string[] =>
    rows.map(({ texts }) => texts[key]);
  const thousand = projectOf([1, 0, 498, 500, 1]);

  it('has both ends by the rules of the table, an en dash between', () => {
    expect(printInterval({ low: 44.6, high: 52.5 }, { decimals: 0, rounding: 'half-up', ends: 'signs' })).toBe(
      '45\u201353',
    );
    expect(printInterval({ low: 0.2, high: 99.4 }, { decimals: 0, rounding: 'half-up', ends: 'signs' })).toBe(
      '<1\u2013>99',
    );
    expect(printInterval({ low: 0, high: 100 }, { decimals: 1, rounding: 'half-up', ends: 'held' })).toBe(
      '0.1\u201399.9',
    );
    expect(printInterval({ low: 52.4, high: 52.5 }, { decimals: 0, rounding: 'half-even', ends: 'signs' })).toBe('52');
  });

  it('is one text where both ends are the same', () => {
    expect(printInterval({ low: 0.1, high: 0.9 }, { decimals: 0, rounding: 'half-up', ends: 'signs' })).toBe('<1');
    expect(printedRange('>99', '>99')).toBe('>99');
    expect(printedRange('45', '50')).toBe('45\u201350');
  });

  it('stands in the columns of a table', () => {
    const { rows } = normsWith(thousand, { reliability: 0.9 }, { kind: 'midpoint' });
    // Wilson 95 %: 0.5 and 1 of 1,000 lie under 1 per cent, 250 between 22.4 and 27.8, 749 between 72.1 and 77.5.
    expect(column(rows, 'interval')).toEqual(['<1', '<1', '22\u201328', '72\u201377', '>99']);
    // 100 √((b + a/4 − (b + a/2)²)/1000) at the second and third score: of (0.001 − 0.001²) 0.1, of (0.1255 − 0.25²) 0.8.
    expect(column(rows, 'standard-error')).toEqual(['0.0', '0.1', '0.8', '0.8', '0.0']);
    expect(column(rows, 'measurement-band').every((text) => /^[<>]?\d+(\u2013>?\d+)?$/.test(text))).toBe(true);
    expect(column(rows, 'print-range')).toEqual(rows.map(() => '\u2013'));
  });

  it('is a dash where there is none', () => {
    const plotting = normsWith(projectOf(TEN_COUNTS), {}, { kind: 'plotting-position', offset: '3/8' });
    expect(column(plotting.rows, 'interval')).toEqual(TEN_COUNTS.map(() => '\u2013'));
    expect(column(plotting.rows, 'standard-error')).toEqual(TEN_COUNTS.map(() => '\u2013'));
    expect(column(plotting.rows, 'measurement-band')).toEqual(TEN_COUNTS.map(() => '\u2013'));
    const kernel = smoothedBy(projectOf(SMOOTHED_COUNTS), { kind: 'kernel', bandwidth: 'auto', after: null });
    expect(new Set(column(normsWith(kernel, {}).rows, 'standard-error'))).toEqual(new Set(['\u2013']));
    const alone = normsWith(projectOf([0, 1, 0]), { reliability: 0.9 });
    expect(column(alone.rows, 'measurement-band')).toEqual(['\u2013', '\u2013', '\u2013']);
    expect(alone.precision.bandProblem).toContain('at least two people');
  });

  it('has the range of defensible ranks where its column is chosen', () => {
    const { rows } = normsWith(projectOf([998, 9002]), {}, { kind: 'midpoint' }, { columns: ['print-range'] });
    // Two scores carry no degree that changes them: below, midpoint and at or below alone.
    expect(rows.map(({ range }) => [range?.low, range?.high])).toEqual([
      ['<1', '10'],
      ['10', '>99'],
    ]);
    expect(column(rows, 'print-range')).toEqual(['<1\u201310', '10\u2013>99']);
  });
});
