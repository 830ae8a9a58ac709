import { describe, expect, it } from 'vitest';
import { conversionRows } from '../../../shared-core/norms/conversion-table.ts';
import { fitEvidence, type FitEvidence } from '../../../shared-core/norms/fit-evidence.ts';
import type { SmoothedCurve } from '../../../shared-core/norms/group-smoothing.ts';
import { cumulativeOnGrid } from '../../../shared-core/smoothing/cumulative.ts';
import type { DegreeLine } from '../../../shared-core/smoothing/smoothing.ts';
import { tableFromCounts } from '../../../shared-core/tally/frequency-table.ts';
import { firstNorms, logLinear, projectOf, scaleTo, smoothedBy } from './small-projects.ts';

const MOMENTS = { mean: 0, sd: 1, skewness: 0, excessKurtosis: 0 };

/** A curve made up by hand, as if a log-linear model of degree 2 had given it. */
function curveWith(probabilities: readonly number[], degrees: readonly DegreeLine[] = []): SmoothedCurve {
  const cumulative = cumulativeOnGrid(probabilities);
  const at = (shift: -0.5 | 0 | 0.5): readonly number[] => probabilities.map((_, k) => cumulative(k, shift));
  return {
    choice: logLinear(2),
    probabilities,
    degree: 2,
    bandwidth: null,
    shape: null,
    g2: 0,
    x2: 0,
    df: 0,
    aic: 0,
    bic: 0,
    degrees,
    momentsObserved: MOMENTS,
    momentsFitted: MOMENTS,
    residuals: probabilities.map(() => 0),
    statement: '',
    below: at(-0.5),
    middle: at(0),
    atOrBelow: at(0.5),
    standardErrors: null,
  };
}

function evidenceOf(counts: readonly number[], curve: SmoothedCurve): FitEvidence {
  const project = projectOf(counts);
  const { summary, precision } = firstNorms(project);
  const table = tableFromCounts(scaleTo(counts.length - 1), counts);
  const definition = { kind: 'midpoint' } as const;
  const rows = conversionRows({ table, summary, definition, choices: project.table, curve, precision, ranges: null });
  return fitEvidence(rows, curve, table, project.table);
}

/** Probabilities proportional to people expected. */
const shares = (expected: readonly number[]): readonly number[] => {
  const all = expected.reduce((sum, people) => sum + people, 0);
  return expected.map((people) => people / all);
};

describe('the evidence for a curve', () => {
  it('names the largest move and counts the printed ranks that change', () => {
    // Observed midpoint ranks 25, 50, 50, 75; of the curve 12.5, 37.5, 62.5, 87.5.
    const evidence = evidenceOf([10, 0, 0, 10], curveWith([0.25, 0.25, 0.25, 0.25]));
    expect(evidence.largestMove).toEqual({ points: 12.5, scoreText: '0' });
    expect([evidence.changed, evidence.of]).toEqual([4, 4]);
    // 25 and 25.4 both print 25, 75 and 75.4 both 75; only the middle, 50 against 50.8, prints another rank.
    const near = evidenceOf([50, 0, 50], curveWith([0.508, 0, 0.492]));
    expect([near.changed, near.largestMove.scoreText]).toEqual([1, '1']);
    expect(near.largestMove.points).toBeCloseTo(0.8, 9);
  });

  it('names scores that nobody has and five or more are expected at, inside the observed range', () => {
    const counts = [0, 20, 0, 20, 0, 20, 0];
    expect(evidenceOf(counts, curveWith(shares([10, 10, 5.001, 10, 4.999, 10, 10]))).filledGaps).toEqual(['2']);
    expect(evidenceOf(counts, curveWith(shares([0, 20, 0, 20, 0, 20, 0]))).filledGaps).toEqual([]);
  });

  it('names dips of the curve that the data do not have', () => {
    const dipping = [20, 30, 40, 30, 20, 15, 10, 8, 10, 15, 20, 30, 40, 30, 20];
    const curve = curveWith(shares(dipping));
    expect(evidenceOf(dipping, curve).inventedDips).toEqual([]);
    expect(
      evidenceOf(
        dipping.map(() => 20),
        curve,
      ).inventedDips,
    ).toEqual(['7']);
    // A rise of less than a twentieth is none.
    const shallow = [20, 30, 40, 39.5, 39, 39, 39.2, 39.6, 40, 30, 20];
    expect(
      evidenceOf(
        shallow.map(() => 20),
        curveWith(shares(shallow)),
      ).inventedDips,
    ).toEqual([]);
    expect(
      evidenceOf(
        shallow.map(() => 20),
        curveWith(shares(shallow.with(5, 37.9))),
      ).inventedDips,
    ).toEqual(['5']);
  });

  it('sees a dip of the data beside a top at the end of the scale, where fewer scores lie about it', () => {
    const piled = [4, 8, 12, 16, 18, 16, 12, 9, 8, 8, 8, 8, 8, 9, 10, 12, 14];
    const curve = curveWith(shares(piled.with(10, 7.5)));
    expect(evidenceOf(piled, curve).inventedDips).toEqual([]);
    expect(evidenceOf(piled.toReversed(), curveWith(shares(piled.with(10, 7.5).toReversed()))).inventedDips).toEqual(
      [],
    );
  });

  it('names degrees whose BIC is lower, or at most 2 higher', () => {
    const line = (degree: number, bic: number, converged = true): DegreeLine => ({
      ...{ degree, bic, converged, g2: 0, x2: 0, df: 0, aic: 0, p: null },
    });
    const degrees = [line(1, 100.4), line(2, 98.5), line(3, 100.5), line(4, 96.6), line(5, 98.6, false), line(6, 96.5)];
    expect(evidenceOf([1, 2, 1], curveWith([0.25, 0.5, 0.25], degrees)).nearlyAsGood).toEqual([1, 4, 6]);
    expect(evidenceOf([1, 2, 1], curveWith([0.25, 0.5, 0.25])).nearlyAsGood).toEqual([]);
  });

  it('is there for smoothed groups alone', () => {
    const project = projectOf([5, 9, 14, 9, 6, 2]);
    expect(firstNorms(project).evidence).toBeNull();
    const smoothed = firstNorms(smoothedBy(project, logLinear(2)));
    if (smoothed.smoothing.state !== 'smoothed') throw new Error('not smoothed');
    const moves = smoothed.rows.map((row) => Math.abs(row.percentileRank - row.observed.percentileRank));
    expect(smoothed.evidence?.largestMove.points).toBe(Math.max(...moves));
  });
});
