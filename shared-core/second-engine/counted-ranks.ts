import type { RankDefinition } from '../percentile/percentile-rank.ts';
import type { ScoreScale } from '../scale/score-scale.ts';
import { fractionOfOffset, fractionOfText, type Fraction } from './fraction.ts';
import type { GroupCounts } from './group-counts.ts';

/** One score with its exact rank and what it was counted from, in weight units. */
export interface CountedRank {
  /** 0–100. */
  readonly rank: Fraction;
  readonly worse: bigint;
  readonly at: bigint;
  readonly better: bigint;
}

/**
 * The percentile rank of every attainable score, lowest score first, from sums that run from the good end of the scale:
 * who did better is counted, who did worse is what remains of all. Where low scores are good the poor end is the high
 * one. Formulas: Crawford, Garthwaite & Slick (2009) for the three usual definitions; 100 (r − a)/(N + 1 − 2a) for
 * plotting positions (Blom 1958); 100 (B + w (x − L)/h)/W for classes, laid from the poor end, the last of full width.
 */
export function countedRanks(
  counts: GroupCounts,
  scale: ScoreScale,
  definition: RankDefinition,
): readonly CountedRank[] {
  const goodIsLast = scale.direction === 'high-is-good';
  const weights = goodIsLast ? counts.weights : counts.weights.toReversed();
  const people = counts.people.reduce((sum, count) => sum + count, 0n);
  const from = sumsFromGoodEnd(weights);
  const all = from[0] ?? 0n;
  if (all === 0n) throw new RangeError('a group without people has no ranks');
  const rankAt = (place: number): CountedRank => {
    const better = from[place + 1] ?? 0n;
    const at = (from[place] ?? 0n) - better;
    const worse = all - better - at;
    return { worse, at, better, rank: rankOf(definition, { worse, at, better, all, people }, () => inClass(place)) };
  };
  const inClass = (place: number): Fraction => {
    const size = definition.kind === 'grouped' ? scoresInClass(definition.width, scale.step) : 1;
    const first = place - (place % size);
    const belowClass = all - (from[first] ?? 0n);
    const within = (from[first] ?? 0n) - (from[first + size] ?? 0n);
    const half = BigInt(2 * (place - first) + 1);
    const twice = 2n * BigInt(size);
    return { top: 100n * (belowClass * twice + within * half), bottom: twice * all };
  };
  const ranks = weights.map((_, place) => rankAt(place));
  return goodIsLast ? ranks : ranks.toReversed();
}

interface Counted {
  readonly worse: bigint;
  readonly at: bigint;
  readonly better: bigint;
  readonly all: bigint;
  readonly people: bigint;
}

function rankOf(definition: RankDefinition, counted: Counted, inClass: () => Fraction): Fraction {
  const { worse, at, better, all, people } = counted;
  switch (definition.kind) {
    case 'midpoint':
      // Everybody, plus those left behind, less those ahead, is twice those below and once those at the score.
      return { top: 50n * (all + worse - better), bottom: all };
    case 'at-or-below':
      return { top: 100n * (all - better), bottom: all };
    case 'below':
      return { top: 100n * (all - better - at), bottom: all };
    case 'plotting-position': {
      const a = fractionOfOffset(definition.offset);
      // The mean rank is half of N (all + worse − better)/all + 1.
      const twiceRank = people * (all + worse - better) + all;
      return withinHundred({
        top: 100n * (twiceRank * a.bottom - 2n * all * a.top),
        bottom: 2n * all * ((people + 1n) * a.bottom - 2n * a.top),
      });
    }
    case 'grouped':
      return inClass();
  }
}

/** Attainable scores in a class of so many points. */
export function scoresInClass(width: number, step: number): number {
  const [wide, narrow] = [fractionOfText(String(width)), fractionOfText(String(step))];
  const [top, bottom] = [wide.top * narrow.bottom, wide.bottom * narrow.top];
  if (top % bottom !== 0n) throw new RangeError('a class holds a whole number of scores');
  return Number(top / bottom);
}

/** At each place those at it or ahead of it; 0 behind the last. */
function sumsFromGoodEnd(weights: readonly bigint[]): readonly bigint[] {
  const sums = [0n];
  for (const weight of weights.toReversed()) sums.push((sums.at(-1) ?? 0n) + weight);
  return sums.toReversed();
}

function withinHundred(rank: Fraction): Fraction {
  if (rank.top < 0n) return { top: 0n, bottom: 1n };
  return rank.top > 100n * rank.bottom ? { top: 100n, bottom: 1n } : rank;
}
