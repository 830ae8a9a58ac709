import { levelProblem } from './confidence-level.ts';
import type { PercentInterval } from './percent-interval.ts';
import { proportionInterval, type IntervalChoice } from './proportion-interval.ts';
import { rankStandardError } from './rank-variance.ts';

/** What a table should be able to say: a standard error, or the whole width of an interval, in percentile-rank points. */
export type Wish =
  | { readonly kind: 'standard-error'; readonly points: number }
  | { readonly kind: 'width'; readonly points: number; readonly interval: IntervalChoice };

export interface PlannedSize {
  /** Percentile rank 0–100 the wish is about. */
  readonly rank: number;
  /** People needed in all, with the design effect. */
  readonly people: number;
  /** What that many people give, in percentile-rank points: at or just below the wish. */
  readonly reached: number;
}

export type SizePlan =
  | { readonly ok: true; readonly sizes: readonly PlannedSize[]; /** Enough for every rank. */ readonly people: number }
  | { readonly ok: false; readonly problem: string };

export const MOST_PLANNED = 1_000_000_000;
const SLACK = 1 - 1e-12;

/**
 * People needed so that percentile ranks meet a wish: the binomial standard error 100 √(p(1 − p)/n), or the width of an
 * interval at a count of pn, fractions and all. That is the rank without ties; half of those at a score makes a midpoint rank a little surer.
 * `designEffect` (1 for people sampled one by one; Kish 1965) divides n into the effective n.
 */
export function planSize(ranks: readonly number[], wish: Wish, designEffect: number): SizePlan {
  const problem = planProblem(ranks, wish, designEffect);
  if (problem !== null) return { ok: false, problem };
  const sizes: PlannedSize[] = [];
  for (const rank of ranks) {
    const reached = (people: number): number => precisionAt(rank, people / designEffect, wish);
    const people = fewest((size) => reached(size) * SLACK <= wish.points);
    if (people === null) {
      return { ok: false, problem: `No group of up to ${MOST_PLANNED} people is that precise. Wish for less.` };
    }
    sizes.push({ rank, people, reached: reached(people) });
  }
  return { ok: true, sizes, people: Math.max(...sizes.map(({ people }) => people)) };
}

function planProblem(ranks: readonly number[], wish: Wish, designEffect: number): string | null {
  if (ranks.length === 0) return 'Name at least one percentile rank.';
  if (!ranks.every((rank) => rank > 0 && rank < 100)) return 'Percentile ranks to plan for lie between 0 and 100.';
  if (!(wish.points > 0 && wish.points <= 100)) return 'The wish is a number of percentile-rank points above 0.';
  if (!(designEffect > 0 && designEffect <= 1000)) return 'A design effect is a number above 0, 1 for simple sampling.';
  return wish.kind === 'width' ? levelProblem(wish.interval.level) : null;
}

function precisionAt(rank: number, n: number, wish: Wish): number {
  const below = rank / 100;
  if (wish.kind === 'standard-error') return rankStandardError({ below, at: 0 }, 'below', n);
  return widthOf(proportionInterval(below * n, n, wish.interval));
}

function widthOf({ low, high }: PercentInterval): number {
  return high - low;
}

/** The smallest whole number that is enough, where every larger one is; null beyond the largest planned size. */
function fewest(enough: (people: number) => boolean): number | null {
  let high = 1;
  while (!enough(high)) {
    high *= 2;
    if (high > MOST_PLANNED) return null;
  }
  let low = high / 2;
  while (high - low > 1) {
    const middle = Math.floor((low + high) / 2);
    if (enough(middle)) high = middle;
    else low = middle;
  }
  return high;
}

/** One printed percentile and whether a cohort can carry it. */
export interface CarriedPercentile {
  readonly percentile: number;
  /** Width of its interval, in percentile-rank points. */
  readonly width: number;
  readonly carried: boolean;
}

/**
 * Which of the percentiles 1 to 99 an effective n can carry: those whose interval is no wider than wished. Throws on a
 * level, n or width that cannot be.
 */
export function carriedPercentiles(
  effectiveN: number,
  interval: IntervalChoice,
  widest: number,
): readonly CarriedPercentile[] {
  if (!(widest > 0)) throw new RangeError('a width is a number above 0');
  return Array.from({ length: 99 }, (_, index) => {
    const percentile = index + 1;
    const width = precisionAt(percentile, effectiveN, { kind: 'width', points: widest, interval });
    return { percentile, width, carried: width * SLACK <= widest };
  });
}
