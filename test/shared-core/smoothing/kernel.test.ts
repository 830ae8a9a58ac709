import { describe, expect, it } from 'vitest';
import { kernelCumulative, kernelDensities, type GridDistribution } from '../../../shared-core/smoothing/kernel.ts';
import { automaticBandwidth } from '../../../shared-core/smoothing/bandwidth.ts';
import { smooth } from '../../../shared-core/smoothing/smooth.ts';
import { tableFromCounts } from '../../../shared-core/tally/frequency-table.ts';
import { expectAllNear, expectNear } from '../../reference/near.ts';
import { wholeScale } from '../../reference/read-reference.ts';
import { cohortTable, logLinear, SMOOTHED_COHORTS, smoothed } from '../../reference/smoothing-reference.ts';

function distributionOf(counts: readonly number[]): GridDistribution {
  const n = counts.reduce((sum, count) => sum + count, 0);
  const probabilities = counts.map((count) => count / n);
  const mean = probabilities.reduce((sum, probability, k) => sum + probability * k, 0);
  const variance = probabilities.reduce((sum, probability, k) => sum + probability * (k - mean) ** 2, 0);
  return { probabilities, mean, variance };
}

/** Mean and variance of a continuous distribution function by parts, over a range that holds all of it. */
function momentsOfCurve(curve: (x: number) => number, from: number, to: number): readonly [number, number] {
  const cells = 20_000;
  const width = (to - from) / cells;
  let [first, second] = [0, 0];
  for (let cell = 0; cell < cells; cell += 1) {
    const x = from + (cell + 0.5) * width;
    const above = 1 - curve(x);
    first += above * width;
    second += 2 * (x - from) * above * width;
  }
  return [from + first, second - first * first];
}

describe('kernel smoothing', () => {
  it.each([0.3, 0.6622, 2, 7.5])('keeps mean and variance at a bandwidth of %d steps', (bandwidth) => {
    const distribution = distributionOf(cohortTable('c2_leftskew').counts);
    const [mean, variance] = momentsOfCurve(kernelCumulative(distribution, bandwidth), -60, 90);
    expectNear(mean, distribution.mean, 1e-6, 'mean');
    expectNear(variance, distribution.variance, 1e-4, 'variance');
  });

  it('has the density that is the slope of its curve', () => {
    const distribution = distributionOf(cohortTable('c2_leftskew').counts);
    const curve = kernelCumulative(distribution, 0.9);
    const slopes = distribution.probabilities.map((_, x) => (curve(x + 1e-4) - curve(x - 1e-4)) / 2e-4);
    expectAllNear(kernelDensities(distribution, 0.9), slopes, 1e-7, 'density');
  });

  it('is given in raw-score points, whatever the step', () => {
    const counts = [2, 7, 11, 9, 4, 1];
    const whole = smoothed(tableFromCounts(wholeScale(0, 5), counts), { kind: 'kernel', bandwidth: 0.8, after: null });
    const scale = { min: 10, max: 12.5, step: 0.5, direction: 'high-is-good' } as const;
    const halves = smoothed(tableFromCounts(scale, counts), { kind: 'kernel', bandwidth: 0.4, after: null });
    expectAllNear(halves.probabilities, whole.probabilities, 1e-14, 'probability');
    expectNear(halves.momentsFitted.mean, 10 + whole.momentsFitted.mean / 2, 1e-12, 'mean');
    expectNear(halves.momentsFitted.sd, whole.momentsFitted.sd / 2, 1e-12, 'sd');
    const auto = [wholeScale(0, 5), scale].map((one) =>
      smoothed(tableFromCounts(one, counts), { kind: 'kernel', bandwidth: 'auto', after: null }),
    );
    expectNear(auto[1]?.bandwidth ?? null, (auto[0]?.bandwidth ?? NaN) / 2, 1e-9, 'automatic bandwidth');
  });

  it.each(SMOOTHED_COHORTS)('finds a bandwidth for %s that no other on a fine net beats', (id) => {
    for (const after of [null, { degree: 'bic', keptScores: [], comb: null } as const]) {
      const table = cohortTable(id);
      const fit = smoothed(table, { kind: 'kernel', bandwidth: 'auto', after });
      const before = after === null ? null : smoothed(table, logLinear('bic'));
      const distribution = distributionOf(before?.probabilities ?? table.counts);
      const miss = (bandwidth: number): number =>
        kernelDensities(distribution, bandwidth).reduce(
          (sum, density, k) => sum + ((distribution.probabilities[k] ?? NaN) - density) ** 2,
          0,
        );
      const found = miss(fit.bandwidth ?? NaN);
      for (let bandwidth = 0.1; bandwidth < 10; bandwidth *= 1.01) {
        expect(found).toBeLessThanOrEqual(miss(bandwidth) + 1e-15);
      }
      expectNear(automaticBandwidth(distribution), fit.bandwidth ?? NaN, 1e-5, 'bandwidth');
    }
  });

  it('has chances that add up to 1, the ends taking the tails, and a curve that never falls', () => {
    const table = cohortTable('c3_twomodes');
    const fit = smoothed(table, { kind: 'kernel', bandwidth: 1.5, after: null });
    expectNear(
      fit.probabilities.reduce((sum, probability) => sum + probability, 0),
      1,
      1e-12,
      'sum',
    );
    expectNear(fit.probabilities[0] ?? null, fit.cumulative(0, 0.5), 1e-15, 'lowest');
    expectNear(fit.probabilities[60] ?? null, 1 - fit.cumulative(59, 0.5), 1e-15, 'highest');
    fit.probabilities.forEach((_, position) => {
      expect(fit.cumulative(position, 0)).toBeGreaterThanOrEqual(fit.cumulative(position, -0.5));
      expect(fit.cumulative(position, 0.5)).toBeGreaterThanOrEqual(fit.cumulative(position, 0));
    });
    expect([fit.g2, fit.df, fit.degree, fit.varianceOf]).toEqual([null, null, null, null]);
    expect(() => fit.cumulative(61, 0)).toThrow('no position 61');
  });

  it('says after which log-linear fit it comes', () => {
    const table = cohortTable('c4_large');
    const after = { degree: 'bic', keptScores: [], comb: null } as const;
    const fit = smoothed(table, { kind: 'kernel', bandwidth: 0.6622, after });
    const first = smoothed(table, logLinear('bic'));
    expect([fit.degree, fit.g2, fit.degrees]).toEqual([first.degree, first.g2, first.degrees]);
    expect(fit.statement).toContain(
      'Log-linear smoothing of degree 4 of the observed scores, chosen by the lowest BIC',
    );
  });

  it('is refused with the log-linear fit that is to come first, and offers what works', () => {
    const two = tableFromCounts(wholeScale(0, 9), [0, 0, 6, 8, 0, 0, 0, 0, 0, 0]);
    const high = { degree: 4, keptScores: [], comb: null };
    const refused = smooth(two, { kind: 'kernel', bandwidth: 'auto', after: high });
    expect(refused).toMatchObject({ ok: false, instead: { kind: 'kernel', after: { ...high, degree: 1 } } });
    const pair = tableFromCounts(wholeScale(0, 9), [0, 0, 1, 1, 0, 0, 0, 0, 0, 0]);
    const bare = smooth(pair, { kind: 'kernel', bandwidth: 1, after: high });
    expect(bare).toMatchObject({ ok: false, instead: { kind: 'kernel', bandwidth: 1, after: null } });
    expect(!bare.ok && bare.problem).toContain('kernel alone works');
  });

  it('throws on a bandwidth that is none', () => {
    for (const bandwidth of [0, -1, NaN, Infinity]) {
      expect(() => smooth(cohortTable('c1_tiny'), { kind: 'kernel', bandwidth, after: null })).toThrow('above 0');
    }
  });
});
