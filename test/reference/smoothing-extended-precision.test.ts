import { describe, expect, it } from 'vitest';
import { tableFromCounts } from '../../shared-core/tally/frequency-table.ts';
import { exponential, fraction, ONE, over, solveFixed, times, toNumber } from './fixed-point.ts';
import { expectAllNear } from './near.ts';
import { wholeScale } from './read-reference.ts';
import { logLinear, smoothed } from './smoothing-reference.ts';

const RANK = 1e-9;
const DEGREE = 10;

const dot = (left: readonly bigint[], right: readonly bigint[]): bigint =>
  left.reduce((sum, value, k) => sum + times(value, right[k] ?? 0n), 0n);

/** Shares e^η/Σ e^η and −Σ f η/N + log Σ e^η up to what does not change, the η shifted to a highest of 0. */
function sharesOf(eta: readonly bigint[]): { readonly shares: readonly bigint[]; readonly shifted: readonly bigint[] } {
  const highest = eta.reduce((most, value) => (value > most ? value : most));
  const shifted = eta.map((value) => value - highest);
  const raised = shifted.map(exponential);
  const sum = raised.reduce((total, value) => total + value, 0n);
  return { shares: raised.map((value) => over(value, sum)), shifted };
}

/**
 * Midpoint ranks of the log-linear fit with 72 decimals: plain powers of positions from −1 to 1 and Newton's method on
 * them, each step no longer than moves an η by 2 until the equations nearly hold.
 */
function extendedRanks(counts: readonly number[]): readonly number[] {
  const n = counts.reduce((sum, count) => sum + count, 0);
  const last = counts.length - 1;
  const point = counts.map((_, k) => fraction(2 * k - last, last));
  const powers = [point];
  for (let c = 2; c <= DEGREE; c += 1) powers.push(point.map((x, k) => times(x, powers[c - 2]?.[k] ?? 0n)));
  const observed = counts.map((count) => fraction(count, n));
  let eta = counts.map(() => 0n);
  for (let step = 0; step < 200; step += 1) {
    const { shares } = sharesOf(eta);
    const means = powers.map((power) => dot(power, shares));
    const gaps = powers.map((power, c) => dot(power, observed) - (means[c] ?? 0n));
    const weighted = powers.map((power) => power.map((value, k) => times(value, shares[k] ?? 0n)));
    const matrix = powers.map((power, c) =>
      powers.map((_, d) => dot(power, weighted[d] ?? []) - times(means[c] ?? 0n, means[d] ?? 0n)),
    );
    const beta = solveFixed(matrix, gaps);
    const move = counts.map((_, k) => powers.reduce((sum, power, c) => sum + times(beta[c] ?? 0n, power[k] ?? 0n), 0n));
    // What moves the likelihood is the move where people are or are expected.
    const most = move.reduce((found, value, k) => {
      const size = value < 0n ? -value : value;
      return (shares[k] ?? 0n) + (observed[k] ?? 0n) > ONE >> 20n && size > found ? size : found;
    }, 0n);
    const length = most > 2n * ONE ? over(2n * ONE, most) : ONE;
    eta = eta.map((value, k) => value + times(length, move[k] ?? 0n));
    if (most < ONE >> 100n) {
      let below = 0n;
      return sharesOf(eta).shares.map((share) => {
        below += share;
        return 100 * toNumber(below - share / 2n);
      });
    }
  }
  throw new Error('the extended fit did not come to rest');
}

/** Counts of a known bent shape on a grid, with a lump and scores that nobody has. */
function bentCounts(cells: number, n: number): readonly number[] {
  const shape = Array.from({ length: cells }, (_, k) => {
    const t = k / (cells - 1);
    const main = Math.exp(-0.5 * ((t - 0.42) / 0.11) ** 2);
    const second = 0.35 * Math.exp(-0.5 * ((t - 0.74) / 0.07) ** 2);
    return (main + second) * (1 + 0.3 * Math.sin(7.3 * k)) * (k % 29 === 11 ? 0 : 1);
  });
  const sum = shape.reduce((total, value) => total + value, 0);
  return shape.map((value) => Math.round((n * value) / sum));
}

describe('degree 10 beside arithmetic with 72 decimals', () => {
  it.each([
    ['0 to 300', 0, 300, 3000],
    ['500 to 800', 500, 800, 12_000],
  ] as const)('agrees on the scale %s', (_, min, max, people) => {
    const counts = bentCounts(max - min + 1, people);
    const fit = smoothed(tableFromCounts(wholeScale(min, max), counts), logLinear(DEGREE));
    expect(fit.degrees.at(-1)?.converged).toBe(true);
    expectAllNear(
      counts.map((_count, position) => 100 * fit.cumulative(position, 0)),
      extendedRanks(counts),
      RANK,
      'midpoint rank',
    );
  });
});
