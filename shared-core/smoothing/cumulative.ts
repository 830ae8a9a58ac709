/**
 * Cumulative proportion 0–1 at a position of the grid plus a shift in steps, for probabilities on the grid: below the
 * score at −½ (B), half of it added at 0 (B + p/2), all of it at ½ (B + p).
 */
export function cumulativeOnGrid(
  probabilities: readonly number[],
): (position: number, shift: -0.5 | 0 | 0.5) => number {
  let below = 0;
  const belows = probabilities.map((probability) => {
    const before = below;
    below += probability;
    return before;
  });
  return (position, shift) => {
    const before = belows[position];
    const probability = probabilities[position];
    if (before === undefined || probability === undefined) throw new RangeError(`no position ${position} on the grid`);
    return Math.min(1, before + (shift + 0.5) * probability);
  };
}
