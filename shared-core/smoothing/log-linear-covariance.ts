import type { LogLinearDesign } from './log-linear-design.ts';
import { orthonormalBasis } from './orthonormal-basis.ts';

/**
 * Variance of Σ g_k p̂_k under Cov(p̂) = (V B)(Bᵀ V B)⁻¹(V B)ᵀ / N, V = diag(p) − ppᵀ (Holland & Thayer 1987), for any
 * g. With a basis Q orthonormal under p and orthogonal to the constant, V Q = diag(p) Q and Qᵀ V Q is the identity, so
 * the variance is Σ_c (Σ_k g_k p_k Q_c(x_k))² / N: no matrix is inverted, and it is never below 0. Kept scores and a
 * comb are columns like the polynomials; a kept score that nobody has varies with nothing. The basis is built at the
 * first call.
 */
export function logLinearVariance(
  design: LogLinearDesign,
  degree: number,
  probabilities: readonly number[],
): (weights: readonly number[]) => number {
  let columns: readonly Float64Array[] | null = null;
  return (weights) => {
    if (weights.length !== probabilities.length) {
      throw new RangeError(`one weight for each of ${probabilities.length} scores, not ${weights.length}`);
    }
    columns ??= varyingColumns(design, degree, probabilities);
    let sum = 0;
    for (const column of columns) {
      let part = 0;
      for (let k = 0; k < weights.length; k += 1) part += (weights[k] ?? 0) * (column[k] ?? 0);
      sum += part * part;
    }
    return sum / design.total;
  };
}

/** Columns p_k Q_c(x_k), without the constant's. */
function varyingColumns(
  design: LogLinearDesign,
  degree: number,
  probabilities: readonly number[],
): readonly Float64Array[] {
  const masses = Float64Array.from(probabilities);
  const indicators = design.kept.flatMap((isKept, place) =>
    isKept && (masses[place] ?? 0) > 0 ? [Float64Array.from(masses, (_, k) => (k === place ? 1 : 0))] : [],
  );
  const extras = design.comb === null ? indicators : [...indicators, design.comb];
  const basis = orthonormalBasis(design.points, masses, degree, extras);
  if (basis === null) throw new RangeError('a fit that has converged determines all of its columns');
  return basis.slice(1).map((column) => column.map((value, k) => value * (masses[k] ?? 0)));
}
