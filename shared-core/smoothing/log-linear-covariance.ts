import type { LogLinearDesign } from './log-linear-design.ts';
import { OrthonormalBasis } from './orthonormal-basis.ts';

/** Both are in squared proportions; see Smoothed. */
export interface LogLinearVariances {
  readonly varianceOf: (weights: readonly number[]) => number;
  readonly rankVariancesOf: (tied: number) => readonly number[];
}

/**
 * Variance of Σ g_k p̂_k under Cov(p̂) = (V B)(Bᵀ V B)⁻¹(V B)ᵀ / N, V = diag(p) − ppᵀ (Holland & Thayer 1987), for any
 * g. With a basis Q orthonormal under p and orthogonal to the constant, V Q = diag(p) Q and Qᵀ V Q is the identity, so
 * the variance is Σ_c (Σ_k g_k p_k Q_c(x_k))² / N: no matrix is inverted, and it is never below 0. Kept scores and a
 * comb are columns like the polynomials; a kept score that nobody has varies with nothing. The basis is built at the
 * first call.
 */
export function logLinearVariances(
  design: LogLinearDesign,
  degree: number,
  probabilities: readonly number[],
): LogLinearVariances {
  let made: readonly Float64Array[] | null = null;
  const running = (): readonly Float64Array[] => (made ??= runningSums(design, degree, probabilities));
  return {
    varianceOf: (weights) => {
      if (weights.length !== probabilities.length) {
        throw new RangeError(`one weight for each of ${probabilities.length} scores, not ${weights.length}`);
      }
      const total = running().reduce((sum, sums) => sum + weightedTotal(weights, sums) ** 2, 0);
      return total / design.total;
    },
    rankVariancesOf: (tied) => {
      const variances = probabilities.map(() => 0);
      for (const sums of running()) {
        let below = 0;
        for (let k = 0; k < variances.length; k += 1) {
          const at = sums[k] ?? 0;
          const part = below + tied * (at - below);
          variances[k] = (variances[k] ?? 0) + (part * part) / design.total;
          below = at;
        }
      }
      return variances;
    },
  };
}

/** Σ g_k l_k from the running sums of l. */
function weightedTotal(weights: readonly number[], sums: Float64Array): number {
  let [total, below] = [0, 0];
  for (let k = 0; k < sums.length; k += 1) {
    const at = sums[k] ?? 0;
    total += (weights[k] ?? 0) * (at - below);
    below = at;
  }
  return total;
}

/** Running sums over the grid of the columns p_k Q_c(x_k), without the constant's. */
function runningSums(
  design: LogLinearDesign,
  degree: number,
  probabilities: readonly number[],
): readonly Float64Array[] {
  const masses = new Float64Array(probabilities);
  const indicators = design.kept.flatMap((isKept, place) =>
    isKept && (masses[place] ?? 0) > 0 ? [masses.map((_, k) => (k === place ? 1 : 0))] : [],
  );
  const extras = design.comb === null ? indicators : [...indicators, design.comb];
  const basis = new OrthonormalBasis(design.points, degree, extras);
  if (!basis.renew(masses)) throw new RangeError('a fit that has converged determines all of its columns');
  return basis.weighted.slice(1).map((column) => {
    let sum = 0;
    return column.map((value) => (sum += value));
  });
}
