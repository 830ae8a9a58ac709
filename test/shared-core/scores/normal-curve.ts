/**
 * Φ(z), the area of the normal curve below z, by the series of Marsaglia (2004, Journal of Statistical Software 11(4)):
 * 1/2 + φ(z)(z + z³/3 + z⁵/15 + …). Good to about 1e-15 for |z| up to 6; written here so that the quantile that the
 * program uses is checked by another route.
 */
export function areaBelow(z: number): number {
  let term = z;
  let sum = z;
  for (let odd = 3; Math.abs(term) > 1e-20 * Math.abs(sum); odd += 2) {
    term *= (z * z) / odd;
    sum += term;
  }
  return 0.5 + (sum * Math.exp((-z * z) / 2)) / Math.sqrt(2 * Math.PI);
}
