/** Why two moments do not carry a beta-binomial distribution. */
export type BetaBinomialTrouble = 'not-above-binomial' | 'only-at-the-ends';

export type BetaBinomial =
  | { readonly ok: true; readonly a: number; readonly b: number; readonly probabilities: readonly number[] }
  | { readonly ok: false; readonly trouble: BetaBinomialTrouble };

/** Below this a + b, which is 0 but for rounding, all people stand at the ends. */
const SMALLEST_SIZE = 1e-9;

/**
 * Beta-binomial (negative hypergeometric) distribution of the scores 0 … n (Keats & Lord 1962, Psychometrika 27, 59–72) with
 * a given mean and variance (divisor N): with π = mean/n and ρ = (variance/(nπ(1 − π)) − 1)/(n − 1), a = π(1/ρ − 1) and
 * b = (1 − π)(1/ρ − 1). Probability of k: C(n, k) B(a + k, b + n − k)/B(a, b). n is 2 or more, the mean inside 0 … n.
 */
export function betaBinomial(n: number, mean: number, variance: number): BetaBinomial {
  const share = mean / n;
  const rho = (variance / (n * share * (1 - share)) - 1) / (n - 1);
  if (!(rho > 0)) return { ok: false, trouble: 'not-above-binomial' };
  const size = 1 / rho - 1;
  if (!(size > SMALLEST_SIZE)) return { ok: false, trouble: 'only-at-the-ends' };
  const a = share * size;
  const b = (1 - share) * size;
  const logs = [0];
  for (let k = 0; k < n; k += 1) {
    const ratio = ((n - k) * (a + k)) / ((k + 1) * (b + n - k - 1));
    logs.push((logs[k] ?? 0) + Math.log(ratio));
  }
  const highest = Math.max(...logs);
  const raised = logs.map((log) => Math.exp(log - highest));
  const sum = raised.reduce((total, value) => total + value, 0);
  return { ok: true, a, b, probabilities: raised.map((value) => value / sum) };
}
