import { tailOf } from './confidence-level.ts';
import type { PercentInterval } from './percent-interval.ts';
import { percentInterval } from './percent-interval.ts';

/**
 * Half the height, in percentile-rank points, of a band that holds the whole ogive at once with the given confidence
 * (per cent, 50–99.9): 100 √(ln(2/α)/(2n)), the inequality of Dvoretzky, Kiefer & Wolfowitz (1956) with the constant of
 * Massart (1990, Annals of Probability 18, 1269–1283). It holds for every n and every distribution, on the safe side
 * where scores are tied; on an effective n it is an approximation.
 */
export function ogiveReach(n: number, level: number): number {
  if (!(n > 0)) throw new RangeError('a band needs people');
  const alpha = 2 * tailOf(level);
  return 100 * Math.sqrt(Math.log(2 / alpha) / (2 * n));
}

/**
 * The band about observed ranks 0–100, held within 0 and 100. It serves `below`, `at-or-below` and `midpoint` alike: a
 * distribution function that is nowhere off by more than the reach is not so just below a score either.
 */
export function ogiveBand(ranks: readonly number[], n: number, level: number): readonly PercentInterval[] {
  const reach = ogiveReach(n, level);
  return ranks.map((rank) => percentInterval((rank - reach) / 100, (rank + reach) / 100));
}
