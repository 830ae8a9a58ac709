import type { RandomSource } from './seeded-random.ts';

/** Counts, one for each probability, of a number of people drawn independently. */
export type MultinomialSampler = (people: number, next: RandomSource) => number[];

const WORDS = 2 ** 32;

/**
 * Draws from a distribution on a grid by the alias method (Walker 1977; set up as by Vose 1991, IEEE Transactions on
 * Software Engineering 17, 972–975): two random words a person, whatever the length. Probabilities are 0 or more and add
 * up to 1 but for rounding; they are met to about 2^-32. A cell of probability 0 is never drawn.
 */
export function multinomialSampler(probabilities: readonly number[]): MultinomialSampler {
  const cells = probabilities.length;
  const sum = probabilities.reduce((total, probability) => total + probability, 0);
  if (!probabilities.every((probability) => probability >= 0) || !(Math.abs(sum - 1) < 1e-6)) {
    throw new RangeError('probabilities are 0 or more and add up to 1');
  }
  const { keep, alias } = aliasTable(probabilities.map((probability) => (probability / sum) * cells));
  return (people, next) => {
    const counts = new Array<number>(cells).fill(0);
    for (let person = 0; person < people; person += 1) {
      const cell = Math.floor((next() / WORDS) * cells);
      const drawn = next() < (keep[cell] ?? 0) * WORDS ? cell : (alias[cell] ?? cell);
      counts[drawn] = (counts[drawn] ?? 0) + 1;
    }
    return counts;
  };
}

/** Each cell keeps a part of its draws and passes the others on to one alias; `loads` have a mean of 1. */
function aliasTable(loads: readonly number[]): { readonly keep: Float64Array; readonly alias: Int32Array } {
  const keep = new Float64Array(loads.length).fill(1);
  const alias = Int32Array.from(loads, (_, cell) => cell);
  const left = Float64Array.from(loads);
  const light: number[] = [];
  const heavy: number[] = [];
  loads.forEach((load, cell) => (load < 1 ? light : heavy).push(cell));
  // Rounding can leave the light ones without a heavy partner: what is left of them then goes to the largest cell.
  const largest = loads.indexOf(Math.max(...loads));
  for (let small = light.pop(); small !== undefined; small = light.pop()) {
    const large = heavy.at(-1) ?? largest;
    if (small === large) continue;
    const load = left[small] ?? 0;
    keep[small] = load;
    alias[small] = large;
    left[large] = (left[large] ?? 0) - (1 - load);
    if (heavy.length > 0 && (left[large] ?? 0) < 1) light.push(heavy.pop() ?? large);
  }
  return { keep, alias };
}
