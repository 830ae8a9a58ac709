/**
 * A general-purpose Poisson regression with a log link as textbooks have it (McCullagh & Nelder 1989, chapter 2):
 * iteratively reweighted least squares by normal equations, with nothing of the program in it. For checks only.
 */
export interface PlainGlm {
  readonly fitted: readonly number[];
  readonly deviance: number;
}

/** Solves a symmetric positive system by Gaussian elimination with row exchange. */
function solve(matrix: readonly (readonly number[])[], right: readonly number[]): number[] {
  const rows = matrix.map((row, i) => [...row, right[i] ?? NaN]);
  const size = rows.length;
  const at = (i: number, j: number): number => rows[i]?.[j] ?? NaN;
  for (let pivot = 0; pivot < size; pivot += 1) {
    let best = pivot;
    for (let i = pivot + 1; i < size; i += 1) if (Math.abs(at(i, pivot)) > Math.abs(at(best, pivot))) best = i;
    const swapped = rows[best] ?? [];
    rows[best] = rows[pivot] ?? [];
    rows[pivot] = swapped;
    for (let i = pivot + 1; i < size; i += 1) {
      const factor = at(i, pivot) / at(pivot, pivot);
      rows[i] = (rows[i] ?? []).map((value, j) => value - factor * at(pivot, j));
    }
  }
  const solution = new Array<number>(size).fill(0);
  for (let i = size - 1; i >= 0; i -= 1) {
    let rest = at(i, size);
    for (let j = i + 1; j < size; j += 1) rest -= at(i, j) * (solution[j] ?? 0);
    solution[i] = rest / at(i, i);
  }
  return solution;
}

const devianceOf = (f: readonly number[], m: readonly number[]): number =>
  2 * f.reduce((sum, count, k) => sum + (count > 0 ? count * Math.log(count / (m[k] ?? NaN)) : 0) - count + (m[k] ?? NaN), 0);

/** Columns run over the cells; the first is usually the constant. */
export function plainGlm(columns: readonly (readonly number[])[], f: readonly number[]): PlainGlm {
  let m = f.map((count) => count + 0.1);
  let eta = m.map((mean) => Math.log(mean));
  let deviance = devianceOf(f, m);
  for (let step = 0; step < 500; step += 1) {
    const working = eta.map((value, k) => value + ((f[k] ?? 0) - (m[k] ?? 0)) / (m[k] ?? 0));
    const inner = (left: readonly number[], right: readonly number[]): number =>
      left.reduce((sum, value, k) => sum + (m[k] ?? 0) * value * (right[k] ?? 0), 0);
    const beta = solve(
      columns.map((left) => columns.map((right) => inner(left, right))),
      columns.map((left) => inner(left, working)),
    );
    const before = eta;
    eta = f.map((_, k) => columns.reduce((sum, column, c) => sum + (beta[c] ?? 0) * (column[k] ?? 0), 0));
    let next = eta.map((value) => Math.exp(value));
    for (let half = 0; half < 60 && step > 0 && !(devianceOf(f, next) <= deviance + 1e-9); half += 1) {
      eta = eta.map((value, k) => (value + (before[k] ?? 0)) / 2);
      next = eta.map((value) => Math.exp(value));
    }
    m = next;
    const now = devianceOf(f, m);
    if (Math.abs(now - deviance) < 1e-12 * (1 + Math.abs(now))) return { fitted: m, deviance: now };
    deviance = now;
  }
  throw new Error('the plain regression did not come to rest');
}

/** 1, z, z² … of standardised positions: raw powers, as a user of a statistics package would write them. */
export function standardisedPowers(cells: number, degree: number): readonly (readonly number[])[] {
  const mean = (cells - 1) / 2;
  const sd = Math.sqrt((cells * cells - 1) / 12);
  return Array.from({ length: degree + 1 }, (_, power) =>
    Array.from({ length: cells }, (_cell, k) => ((k - mean) / sd) ** power),
  );
}
