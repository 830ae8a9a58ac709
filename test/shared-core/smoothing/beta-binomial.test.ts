import { describe, expect, it } from 'vitest';
import { betaBinomial } from '../../../shared-core/smoothing/beta-binomial.ts';
import { smooth } from '../../../shared-core/smoothing/smooth.ts';
import { tableFromCounts } from '../../../shared-core/tally/frequency-table.ts';
import { expectAllNear, expectNear } from '../../reference/near.ts';
import { wholeScale } from '../../reference/read-reference.ts';
import { cohortTable, logLinear, smoothed } from '../../reference/smoothing-reference.ts';

describe('beta-binomial smoothing', () => {
  it('is even over the scale for a = b = 1, and rises by steps of one for a = 2, b = 1', () => {
    const even = betaBinomial(4, 2, 2);
    expect(even.ok).toBe(true);
    expectAllNear(even.ok ? even.probabilities : [], [0.2, 0.2, 0.2, 0.2, 0.2], 1e-14, 'probability');
    // Pólya's urn with two balls of one colour and one of the other: the chance of k of 3 is (k + 1)/10.
    const rising = betaBinomial(3, 2, 1);
    expectAllNear(rising.ok ? rising.probabilities : [], [0.1, 0.2, 0.3, 0.4], 1e-14, 'probability');
    expectAllNear(rising.ok ? [rising.a, rising.b] : [], [2, 1], 1e-12, 'a and b');
  });

  it.each(['c2_leftskew', 'c3_twomodes', 'c4_large'])('keeps mean and variance of %s', (id) => {
    const fit = smoothed(cohortTable(id), { kind: 'beta-binomial' });
    expectNear(fit.momentsFitted.mean, fit.momentsObserved.mean, 1e-9, 'mean');
    expectNear(fit.momentsFitted.sd, fit.momentsObserved.sd, 1e-9, 'sd');
    expectNear(
      fit.probabilities.reduce((sum, probability) => sum + probability, 0),
      1,
      1e-12,
      'sum',
    );
    expect(fit.probabilities.every((probability) => probability > 0)).toBe(true);
    expect(fit.df).toBe(fit.probabilities.length - 3);
    expect([fit.aic, fit.bic, fit.varianceOf, fit.degree]).toEqual([null, null, null, null]);
    expectNear(fit.cumulative(0, 0), (fit.probabilities[0] ?? NaN) / 2, 0, 'half of the lowest');
  });

  it('holds on a long scale', () => {
    const counts = Array.from({ length: 3001 }, (_, k) => Math.round(50 * Math.exp(-(((k - 900) / 400) ** 2))));
    const fit = smoothed(tableFromCounts(wholeScale(0, 3000), counts), { kind: 'beta-binomial' });
    expectNear(fit.momentsFitted.sd / fit.momentsObserved.sd, 1, 1e-9, 'sd');
  });

  it('is refused for a spread no wider than binomial, with log-linear smoothing offered', () => {
    const result = smooth(tableFromCounts(wholeScale(0, 10), [0, 0, 0, 0, 9, 20, 8, 0, 0, 0, 0]), {
      kind: 'beta-binomial',
    });
    expect(result).toMatchObject({ ok: false, instead: logLinear('bic') });
    expect(!result.ok && result.problem).toContain('no more than the binomial');
    // Exactly binomial: 1 4 6 4 1 on 0 to 4.
    const binomial = smooth(tableFromCounts(wholeScale(0, 4), [1, 4, 6, 4, 1]), { kind: 'beta-binomial' });
    expect(binomial.ok).toBe(false);
  });

  it('is refused where all people stand at the ends', () => {
    const result = smooth(tableFromCounts(wholeScale(0, 6), [5, 0, 0, 0, 0, 0, 5]), { kind: 'beta-binomial' });
    expect(!result.ok && result.problem).toContain('lowest or the highest score');
    // Here ρ is 1 but for rounding.
    const uneven = smooth(tableFromCounts(wholeScale(0, 3), [1, 0, 0, 2]), { kind: 'beta-binomial' });
    expect(!uneven.ok && uneven.problem).toContain('lowest or the highest score');
  });

  it.each([
    ['does not start at 0', wholeScale(1, 7)],
    ['has half marks', { min: 0, max: 3, step: 0.5, direction: 'high-is-good' } as const],
  ])('is refused on a scale that %s', (_, scale) => {
    const result = smooth(tableFromCounts(scale, [4, 6, 5, 5, 5, 6, 4]), { kind: 'beta-binomial' });
    expect(!result.ok && result.problem).toContain('whole marks from 0');
    expect(!result.ok && result.instead.kind).toBe('log-linear');
  });

  it('offers nothing where nothing works', () => {
    const result = smooth(tableFromCounts(wholeScale(0, 6), [0, 0, 1, 1, 0, 0, 0]), { kind: 'beta-binomial' });
    expect(result).toMatchObject({ ok: false, instead: { kind: 'none' } });
  });
});
