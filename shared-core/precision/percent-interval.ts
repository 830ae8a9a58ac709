/** Two percentages 0–100, the lower first. */
export interface PercentInterval {
  readonly low: number;
  readonly high: number;
}

/** One interval for each attainable score, lowest score first, or a sentence that says why there is none. */
export type RankIntervals =
  | { readonly ok: true; readonly intervals: readonly PercentInterval[] }
  | { readonly ok: false; readonly problem: string };

/** From two proportions 0–1, held within 0 and 1, which rounding errors may pass. */
export function percentInterval(low: number, high: number): PercentInterval {
  return { low: 100 * Math.min(1, Math.max(0, low)), high: 100 * Math.min(1, Math.max(0, high)) };
}
