import { kernelDensities, type GridDistribution } from './kernel.ts';

/** Raw-score points that doubles can carry; far beyond either end the curve is that of the shares, or the normal one. */
const LOWEST_BANDWIDTH = 1e-6;
const HIGHEST_BANDWIDTH = 1e6;

/** What is wrong with a bandwidth in raw-score points, in a sentence, or null. */
export function bandwidthProblem(bandwidth: number): string | null {
  return bandwidth >= LOWEST_BANDWIDTH && bandwidth <= HIGHEST_BANDWIDTH
    ? null
    : 'A bandwidth is a number of raw-score points above 0, such as 0.6.';
}

/** Trial bandwidths in steps of the grid. */
const NARROWEST = 0.1;
const WIDEST = 10;
const TRIALS = 41;
const CLOSE_ENOUGH = 1e-6;
const GOLDEN = (Math.sqrt(5) - 1) / 2;

/**
 * The bandwidth, in steps, that makes Σ (p_k − f_h(x_k))² least (von Davier, Holland & Thayer 2004, first penalty):
 * 41 trial values from 0.1 to 10 steps, each the same per cent above the one before it; then a golden-section search
 * between the neighbours of the best trial value, to a millionth of a step.
 */
export function automaticBandwidth(distribution: GridDistribution): number {
  const miss = (bandwidth: number): number =>
    kernelDensities(distribution, bandwidth).reduce(
      (sum, density, k) => sum + ((distribution.probabilities[k] ?? 0) - density) ** 2,
      0,
    );
  const trial = (index: number): number => NARROWEST * (WIDEST / NARROWEST) ** (index / (TRIALS - 1));
  const misses = Array.from({ length: TRIALS }, (_, index) => miss(trial(index)));
  const best = misses.indexOf(Math.min(...misses));
  return goldenSection(miss, trial(Math.max(0, best - 1)), trial(Math.min(TRIALS - 1, best + 1)));
}

function goldenSection(value: (x: number) => number, from: number, to: number): number {
  let [low, high] = [from, to];
  let [left, right] = [high - GOLDEN * (high - low), low + GOLDEN * (high - low)];
  let [atLeft, atRight] = [value(left), value(right)];
  while (high - low > CLOSE_ENOUGH) {
    if (atLeft <= atRight) {
      [high, right, atRight] = [right, left, atLeft];
      left = high - GOLDEN * (high - low);
      atLeft = value(left);
    } else {
      [low, left, atLeft] = [left, right, atRight];
      right = low + GOLDEN * (high - low);
      atRight = value(right);
    }
  }
  return (low + high) / 2;
}
