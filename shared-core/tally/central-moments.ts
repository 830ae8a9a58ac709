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
  let mean = 0;
  scores.forEach((score, position) => (mean += (shares[position] ?? 0) * (score - origin)));
  mean += origin;
  let [m2, m3, m4] = [0, 0, 0];
  scores.forEach((score, position) => {
    const gap = score - mean;
    const square = (shares[position] ?? 0) * gap * gap;
    m2 += square;
    m3 += square * gap;
    m4 += square * gap * gap;
  });
  return { mean, m2, m3, m4 };
}
