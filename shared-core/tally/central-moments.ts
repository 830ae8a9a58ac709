/** Mean in raw-score points and central moments, all divided by the total share (1), not by n − 1. */
export interface CentralMoments {
  readonly mean: number;
  readonly m2: number;
  readonly m3: number;
  readonly m4: number;
}

/** Moments of shares (adding up to 1) at scores. */
export function centralMoments(scores: readonly number[], shares: readonly number[]): CentralMoments {
  const origin = scores[0] ?? 0;
  const sum = (term: (score: number) => number): number =>
    scores.reduce((total, score, position) => total + (shares[position] ?? 0) * term(score), 0);
  const mean = origin + sum((score) => score - origin);
  const about = (order: number): number => sum((score) => (score - mean) ** order);
  return { mean, m2: about(2), m3: about(3), m4: about(4) };
}
