import { describe, expect, it } from 'vitest';
import { smooth } from '../../../shared-core/smoothing/smooth.ts';
import type { LogLinearChoice } from '../../../shared-core/smoothing/smoothing.ts';
import { tableFromCounts } from '../../../shared-core/tally/frequency-table.ts';
import { expectAllNear, expectNear } from '../../reference/near.ts';
import { plainGlm, standardisedPowers } from '../../reference/plain-glm.ts';
import { wholeScale } from '../../reference/read-reference.ts';
import { cohortTable, logLinear, smoothed } from '../../reference/smoothing-reference.ts';

const table = cohortTable('c3_twomodes');
const { counts } = table;
const n = 1500;
const indicator = (places: readonly number[]): readonly number[] => counts.map((_, k) => (places.includes(k) ? 1 : 0));
const keep = (choice: Partial<LogLinearChoice>): { readonly kind: 'log-linear' } & LogLinearChoice => ({
  ...logLinear(5),
  ...choice,
});
const frequencies = (probabilities: readonly number[]): readonly number[] => probabilities.map((p) => p * n);

describe('indicators of a log-linear fit', () => {
  it('keep chosen scores exactly and are parameters, as in a plain regression', () => {
    const fit = smoothed(table, keep({ keptScores: [30, 44] }));
    const plain = plainGlm([...standardisedPowers(61, 5), indicator([30]), indicator([44])], counts);
    expectAllNear(frequencies(fit.probabilities), plain.fitted, 1e-6, 'frequency');
    expectNear((fit.probabilities[30] ?? NaN) * n, counts[30] ?? NaN, 1e-10, 'kept');
    expectNear(fit.g2, plain.deviance, 1e-7, 'G²');
    expect(fit.df).toBe(61 - 8);
    expectNear(fit.bic, (fit.g2 ?? NaN) + 8 * Math.log(n), 1e-9, 'BIC');
    expectNear(fit.aic, (fit.g2 ?? NaN) + 16, 1e-9, 'AIC');
    expect(fit.statement).toContain('30, 44');
  });

  it('keep the share of a comb, as in a plain regression', () => {
    const teeth = counts.map((_, k) => k).filter((k) => k % 4 === 1);
    const fit = smoothed(table, keep({ comb: { every: 4, offset: 1 } }));
    const plain = plainGlm([...standardisedPowers(61, 5), indicator(teeth)], counts);
    expectAllNear(frequencies(fit.probabilities), plain.fitted, 1e-6, 'frequency');
    const share = (at: readonly number[]): number => teeth.reduce((sum, k) => sum + (at[k] ?? NaN), 0);
    expectNear(share(fit.probabilities), share(counts) / n, 1e-12, 'share of the teeth');
    expect(fit.df).toBe(61 - 7);
    expect(fit.statement).toContain('the share of one score in every 4, counted from position 2');
  });

  it('keep moments over all scores, and take part in the covariance', () => {
    const fit = smoothed(table, keep({ keptScores: [30], comb: { every: 2, offset: 0 } }));
    for (let power = 1; power <= 5; power += 1) {
      const moment = (of: readonly number[], total: number): number =>
        of.reduce((sum, value, k) => sum + (value / total) * (k / 60) ** power, 0);
      expectNear(moment(fit.probabilities, 1), moment(counts, n), 1e-10, `moment ${power}`);
    }
    const share = (counts[30] ?? NaN) / n;
    expectNear(fit.varianceOf?.(indicator([30])) ?? null, (share * (1 - share)) / n, 1e-12, 'variance of a kept share');
  });

  it('keep a score that nobody has at nothing', () => {
    const fit = smoothed(table, keep({ keptScores: [24, 37] }));
    expect([fit.probabilities[24], fit.probabilities[37]]).toEqual([0, 0]);
    expect(fit.varianceOf?.(indicator([24]))).toBe(0);
    const others = counts.map((_, k) => k).filter((k) => k !== 24 && k !== 37);
    const columns = standardisedPowers(61, 5).map((power) => others.map((k) => power[k] ?? NaN));
    const plain = plainGlm(
      columns,
      others.map((k) => counts[k] ?? NaN),
    );
    expectAllNear(
      others.map((k) => (fit.probabilities[k] ?? NaN) * n),
      plain.fitted,
      1e-6,
      'frequency',
    );
  });

  it('are refused off the scale, and when nothing is left for the curve', () => {
    const stranger = smooth(table, keep({ keptScores: [30.5] }));
    expect(stranger).toMatchObject({ ok: false, instead: logLinear(5) });
    expect(!stranger.ok && stranger.problem).toContain('30.5 is not a score');
    const few = tableFromCounts(wholeScale(0, 5), [9, 0, 7, 0, 4, 0]);
    const all = smooth(few, { ...logLinear(1), keptScores: [0, 2, 4] });
    expect(all).toMatchObject({ ok: false, instead: logLinear(1) });
    expect(!all.ok && all.problem).toContain('Keep fewer scores');
    const bare = smooth(table, { ...logLinear(2), keptScores: [1, 3], comb: { every: 62, offset: 61 } });
    expect(!bare.ok && bare.problem).toContain('comb');
  });

  it('are refused when nobody has a tooth of the comb, or everybody', () => {
    const even = tableFromCounts(
      wholeScale(0, 20),
      Array.from({ length: 21 }, (_, k) => (k % 2 === 0 ? 5 + (k % 7) : 0)),
    );
    for (const offset of [0, 1]) {
      const result = smooth(even, { ...logLinear(3), comb: { every: 2, offset } });
      expect(!result.ok && result.problem).toContain('Choose another comb');
      expect(!result.ok && result.instead).toEqual(logLinear(3));
    }
  });

  it('are refused when the comb takes from the curve what would hold it', () => {
    // 1 − (x − 10)² is 0 at 9 and 11 and below at other odd scores, 1 at 10 and below at other even ones.
    const counts = Array.from({ length: 21 }, (_, k) => (k >= 9 && k <= 11 ? 8 : 0));
    const result = smooth(tableFromCounts(wholeScale(0, 20), counts), {
      ...logLinear(3),
      comb: { every: 2, offset: 0 },
    });
    expect(!result.ok && result.degrees.map((line) => line.converged)).toEqual([true, false, false]);
    expect(result).toMatchObject({ ok: false, instead: { degree: 1 } });
  });

  it('throw on a comb that is none', () => {
    for (const comb of [
      { every: 1, offset: 0 },
      { every: 2.5, offset: 0 },
      { every: 3, offset: 3 },
      { every: 3, offset: -1 },
    ]) {
      expect(() => smooth(table, keep({ comb }))).toThrow(RangeError);
    }
  });
});
