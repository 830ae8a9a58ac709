/** Numbers as whole multiples of 2^-240 (72 decimals), for checks of arithmetic in doubles. Nothing of the program is in it. */
const BITS = 240n;
export const ONE = 1n << BITS;
/** ln 2 to the same precision, from 2 artanh(1/3). */
const LN2 = (() => {
  let sum = 0n;
  let power = ONE / 3n;
  for (let odd = 1n; power > 0n; odd += 2n) {
    sum += power / odd;
    power /= 9n;
  }
  return 2n * sum;
})();

export const times = (left: bigint, right: bigint): bigint => (left * right) >> BITS;
export const over = (left: bigint, right: bigint): bigint => (left << BITS) / right;
export const fraction = (numerator: number, denominator: number): bigint =>
  (BigInt(numerator) << BITS) / BigInt(denominator);
export const toNumber = (value: bigint): number => Number((value * 10n ** 40n) >> BITS) / 1e40;

/** e^x for x of 0 or less; 0 below what the precision can hold. */
export function exponential(x: bigint): bigint {
  const halvings = -x / LN2;
  if (halvings > BITS) return 0n;
  // x + n ln 2 lies between −ln 2 and 0; its 2^-16 part has a short series, squared back afterwards.
  const part = (x + halvings * LN2) >> 16n;
  let term = ONE;
  let sum = ONE;
  for (let k = 1n; term !== 0n && k < 40n; k += 1n) {
    term = times(term, part) / k;
    sum += term;
  }
  for (let k = 0; k < 16; k += 1) sum = times(sum, sum);
  return sum >> halvings;
}

/** Solves a system by elimination; the matrix is positive definite, so that no rows are exchanged. */
export function solveFixed(matrix: readonly (readonly bigint[])[], right: readonly bigint[]): bigint[] {
  const rows = matrix.map((row, i) => [...row, right[i] ?? 0n]);
  const size = rows.length;
  const at = (i: number, j: number): bigint => rows[i]?.[j] ?? 0n;
  for (let pivot = 0; pivot < size; pivot += 1) {
    for (let i = pivot + 1; i < size; i += 1) {
      const factor = over(at(i, pivot), at(pivot, pivot));
      rows[i] = (rows[i] ?? []).map((value, j) => value - times(factor, at(pivot, j)));
    }
  }
  const solution = new Array<bigint>(size).fill(0n);
  for (let i = size - 1; i >= 0; i -= 1) {
    let rest = at(i, size);
    for (let j = i + 1; j < size; j += 1) rest -= times(at(i, j), solution[j] ?? 0n);
    solution[i] = over(rest, at(i, i));
  }
  return solution;
}
