import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';

export const LOWEST_LEVEL = 50;
export const HIGHEST_LEVEL = 99.9;

/** What is wrong with a confidence level in per cent, in a sentence, or null. */
export function levelProblem(level: number): string | null {
  return level >= LOWEST_LEVEL && level <= HIGHEST_LEVEL
    ? null
    : `The level of an interval lies between ${LOWEST_LEVEL} and ${HIGHEST_LEVEL} per cent.`;
}

/** The probability 0–1 that a two-sided interval leaves at either end. Throws on a level `levelProblem` refuses. */
export function tailOf(level: number): number {
  const problem = levelProblem(level);
  if (problem !== null) throw new RangeError(problem);
  return (100 - level) / 200;
}

/** The normal deviate that a two-sided interval reaches to either side: 1.96 for 95 per cent. */
export function deviateOf(level: number): number {
  return -normalQuantile(tailOf(level), 0, 1);
}
