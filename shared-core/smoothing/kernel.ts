import normalCdf from '@stdlib/stats-base-dists-normal-cdf';

/** Standardised distances at which Φ is 0 and 1 as far as a double in a sum can tell. */
const NOTHING_BELOW = -38;
const ALL_ABOVE = 8.5;
const DENSITY_REACH = 8.5;
const ROOT_TWO_PI = Math.sqrt(2 * Math.PI);

/** A discrete distribution on positions 0, 1, 2 … of the grid with its mean and variance, in steps. */
export interface GridDistribution {
  readonly probabilities: readonly number[];
  readonly mean: number;
  /** Above 0. */
  readonly variance: number;
}

/**
 * Gaussian kernel continuization (von Davier, Holland & Thayer 2004, The Kernel Method of Test Equating):
 * F_h(x) = Σ p_k Φ((x − a x_k − (1 − a)μ)/(a h)), a² = σ²/(σ² + h²), which keeps mean and variance. The bandwidth h and
 * positions x are in steps of the grid; x may be any number.
 */
export function kernelCumulative(distribution: GridDistribution, bandwidth: number): (x: number) => number {
  const { probabilities, mean } = distribution;
  const a = shrinkage(distribution, bandwidth);
  const spread = a * bandwidth;
  let running = 0;
  const belows = probabilities.map((probability) => {
    const before = running;
    running += probability;
    return before;
  });
  return (x) => {
    // Scores far enough below x count in full, those far enough above it not at all.
    const centre = (x - (1 - a) * mean) / a;
    const first = held(Math.ceil(centre - ALL_ABOVE * bandwidth), probabilities.length);
    const last = Math.min(probabilities.length - 1, Math.floor(centre - NOTHING_BELOW * bandwidth));
    let sum = first === probabilities.length ? running : (belows[first] ?? 0);
    for (let k = first; k <= last; k += 1) {
      const probability = probabilities[k] ?? 0;
      if (probability > 0) sum += probability * normalCdf((x - a * k - (1 - a) * mean) / spread, 0, 1);
    }
    return Math.min(1, sum);
  };
}

/** Density f_h at each position of the grid, per step. */
export function kernelDensities(distribution: GridDistribution, bandwidth: number): readonly number[] {
  const { probabilities, mean } = distribution;
  const a = shrinkage(distribution, bandwidth);
  const spread = a * bandwidth;
  return probabilities.map((_, x) => {
    const centre = (x - (1 - a) * mean) / a;
    const first = Math.max(0, Math.ceil(centre - DENSITY_REACH * bandwidth));
    const last = Math.min(probabilities.length - 1, Math.floor(centre + DENSITY_REACH * bandwidth));
    let sum = 0;
    for (let k = first; k <= last; k += 1) {
      const probability = probabilities[k] ?? 0;
      if (probability > 0) sum += probability * Math.exp(-0.5 * ((x - a * k - (1 - a) * mean) / spread) ** 2);
    }
    return sum / (spread * ROOT_TWO_PI);
  });
}

/** a, the factor by which scores are drawn to the mean. */
export function shrinkage({ variance }: GridDistribution, bandwidth: number): number {
  return Math.sqrt(variance / (variance + bandwidth * bandwidth));
}

function held(position: number, length: number): number {
  return Math.min(length, Math.max(0, position));
}
