/** Next whole number from 0 to 2^32 − 1, each as likely. */
export type RandomSource = () => number;

export type RandomState = readonly [number, number, number, number];

/** The generator's name, for print beside the seed. */
export const RANDOM_GENERATOR = 'xoshiro128**';

export const LARGEST_SEED = Number.MAX_SAFE_INTEGER;

/**
 * xoshiro128** 1.1 of Blackman & Vigna (2021, ACM Transactions on Mathematical Software 47, article 36): 128 bits of
 * state, period 2^128 − 1. At least one word of the state must differ from 0.
 */
export function xoshiro128(state: RandomState): RandomSource {
  let [a, b, c, d] = state;
  if ((a | b | c | d) === 0) throw new RangeError('the state of the generator must not be all 0');
  return () => {
    const result = Math.imul(rotated(Math.imul(b, 5), 7), 9) >>> 0;
    const shifted = b << 9;
    c ^= a;
    d ^= b;
    b ^= c;
    a ^= d;
    c ^= shifted;
    d = rotated(d, 11);
    return result;
  };
}

function rotated(word: number, bits: number): number {
  return (word << bits) | (word >>> (32 - bits));
}

const MASK = (1n << 64n) - 1n;

/** SplitMix64 (Steele, Lea & Flood 2014, OOPSLA), which the authors of xoshiro advise for making a state from a seed. */
export function* splitMix64(seed: bigint): Generator<bigint, never> {
  let state = seed & MASK;
  for (;;) {
    state = (state + 0x9e3779b97f4a7c15n) & MASK;
    let mixed = state;
    mixed = ((mixed ^ (mixed >> 30n)) * 0xbf58476d1ce4e5b9n) & MASK;
    mixed = ((mixed ^ (mixed >> 27n)) * 0x94d049bb133111ebn) & MASK;
    yield mixed ^ (mixed >> 31n);
  }
}

/** What is wrong with a seed, in a sentence, or null. */
export function seedProblem(seed: number): string | null {
  return Number.isSafeInteger(seed) && seed >= 0 ? null : `A seed is a whole number from 0 to ${LARGEST_SEED}.`;
}

/** The generator started from a whole number of 0 or more; the same seed gives the same numbers everywhere. */
export function seededRandom(seed: number): RandomSource {
  const problem = seedProblem(seed);
  if (problem !== null) throw new RangeError(problem);
  const words = splitMix64(BigInt(seed));
  const [first, second] = [words.next().value, words.next().value];
  const low = (word: bigint): number => Number(word & 0xffffffffn) | 0;
  const high = (word: bigint): number => Number(word >> 32n) | 0;
  return xoshiro128([low(first), high(first), low(second), high(second)]);
}
