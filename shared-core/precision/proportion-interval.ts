import betaQuantile from '@stdlib/stats-base-dists-beta-quantile';
import type { RankDefinition } from '../percentile/percentile-rank.ts';
import { peopleIn, weighsEqually, type FrequencyTable } from '../tally/frequency-table.ts';
import { deviateOf, levelProblem, tailOf } from './confidence-level.ts';
import { countedRank, rankCounts } from './counted-rank.ts';
import { percentInterval, type PercentInterval, type RankIntervals } from './percent-interval.ts';

/** How the interval of a proportion is found; `wilson` is the default. */
export const INTERVAL_METHODS = ['wilson', 'clopper-pearson', 'jeffreys'] as const;

export type IntervalMethod = (typeof INTERVAL_METHODS)[number];

/** For print, with the source. */
export const INTERVAL_METHOD_WORDS: Readonly<Record<IntervalMethod, string>> = {
  wilson: 'score interval of Wilson (1927), without continuity correction',
  'clopper-pearson': 'exact interval of Clopper and Pearson (1934)',
  jeffreys: 'equal-tailed beta interval with the prior of Jeffreys',
};

export interface IntervalChoice {
  readonly method: IntervalMethod;
  /** Per cent, 50–99.9. */
  readonly level: number;
}

/**
 * The two-sided interval, in per cent 0–100, of a proportion of which `count` of n were seen; 0 ≤ count ≤ n, n > 0, both
 * may be fractions.
 *
 * `wilson`: Wilson (1927, JASA 22, 209–212), without continuity correction (method 3 of Newcombe 1998, Statistics in
 * Medicine 17, 857–872). `clopper-pearson`: Clopper & Pearson (1934, Biometrika 26, 404–413), with 0 at a count of 0 and
 * 100 at a count of n. `jeffreys`: equal tails of Beta(count + 1/2, n − count + 1/2) (Brown, Cai & DasGupta 2001,
 * Statistical Science 16, 101–133), without their special case at counts of 0 and n, so that there the interval ends a
 * little short of the observed 0 or 100. Fractions in these formulas are a convention, not part of the sources.
 *
 * Accuracy: 1e-8 percentage points. Throws on impossible counts and levels.
 */
export function proportionInterval(count: number, n: number, { method, level }: IntervalChoice): PercentInterval {
  if (!(n > 0 && count >= 0 && count <= n)) throw new RangeError(`no proportion: ${count} of ${n}`);
  const tail = tailOf(level);
  const others = n - count;
  switch (method) {
    case 'wilson': {
      const z = deviateOf(level);
      const centre = count + (z * z) / 2;
      const reach = z * Math.sqrt((count / n) * others + (z * z) / 4);
      const all = n + z * z;
      return percentInterval(count === 0 ? 0 : (centre - reach) / all, others === 0 ? 1 : (centre + reach) / all);
    }
    case 'clopper-pearson':
      return percentInterval(
        count === 0 ? 0 : betaQuantile(tail, count, others + 1),
        others === 0 ? 1 : upperBeta(tail, count + 1, others),
      );
    case 'jeffreys':
      return percentInterval(betaQuantile(tail, count + 0.5, others + 0.5), upperBeta(tail, count + 0.5, others + 0.5));
  }
}

/** The point that a beta variable passes with a small probability, by way of its mirror image: 1 − tail loses digits. */
function upperBeta(tail: number, a: number, b: number): number {
  return 1 - betaQuantile(tail, b, a);
}

const NOT_COUNTED = 'Intervals need a rank that counts people. Define the rank as midpoint, at or below, or below.';

/** Why a table's ranks can have no interval of a kind, in a sentence that tells what to do, or null. */
export function intervalProblem(
  table: FrequencyTable,
  effectiveN: number,
  definition: RankDefinition,
  { method, level }: IntervalChoice,
): string | null {
  const wrong = levelProblem(level);
  if (wrong !== null) return wrong;
  const counted = countedRank(definition);
  if (counted === null) return NOT_COUNTED;
  if (method !== 'clopper-pearson') return null;
  if (counted === 'midpoint') {
    return 'Clopper–Pearson intervals need whole counts, and the midpoint rank counts halves. Take Wilson or Jeffreys, or define the rank as at or below.';
  }
  if (!weighsEqually(table) || effectiveN !== peopleIn(table)) {
    return 'Clopper–Pearson intervals need whole counts, and weights or an effective n leave none. Take Wilson or Jeffreys.';
  }
  return null;
}

/**
 * The interval of every attainable score's percentile rank, lowest score first, for the count that the definition uses,
 * on the effective n (the number of people without weights). Throws on a table without people.
 */
export function rankIntervals(
  table: FrequencyTable,
  effectiveN: number,
  definition: RankDefinition,
  choice: IntervalChoice,
): RankIntervals {
  const problem = intervalProblem(table, effectiveN, definition, choice);
  const counted = countedRank(definition);
  if (problem !== null || counted === null) return { ok: false, problem: problem ?? NOT_COUNTED };
  return { ok: true, intervals: intervalsOf(rankCounts(table, counted, effectiveN), effectiveN, choice) };
}

/** Scores that nobody obtained repeat the count of their neighbour; each count is worked out once. */
function intervalsOf(counts: readonly number[], n: number, choice: IntervalChoice): readonly PercentInterval[] {
  const known = new Map<number, PercentInterval>();
  return counts.map((count) => {
    const held = Math.min(count, n);
    const interval = known.get(held) ?? proportionInterval(held, n, choice);
    known.set(held, interval);
    return interval;
  });
}
