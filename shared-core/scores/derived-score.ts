import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import { compareToWhole, ratioToNumber, type ExactRatio } from '../percentile/exact-ratio.ts';

/** Normal curve equivalents reach percentile ranks 1, 50 and 99 unchanged: 49/Φ⁻¹(0.99) = 21.063, in use as 21.06. */
export const NCE_FACTOR = 21.06;

/** Stanines 1 to 8 end at these cumulative per cents; a rank on a cut belongs to the stanine above it. */
const STANINE_CUTS = [4n, 11n, 23n, 40n, 60n, 77n, 89n, 96n] as const;

/** A set of derived scores, unrounded; null where no finite z exists. Stanine and sten are whole. */
export interface DerivedScores {
  readonly z: number | null;
  readonly t: number | null;
  readonly nce: number | null;
  readonly deviation: number | null;
  readonly stanine: number;
  /** Null only for linear z in a group whose scores are all equal. */
  readonly sten: number | null;
}

/**
 * z = Φ⁻¹(PR/100) of a rank 0–100; null at 0 and 100, which have no finite z. Accurate to 1e-8 or better
 * (Wichura 1988, algorithm AS 241).
 */
export function normalisedZ(rank: ExactRatio): number | null {
  if (compareToWhole(rank, 0n) <= 0 || compareToWhole(rank, 100n) >= 0) return null;
  return normalQuantile(ratioToNumber(rank) / 100, 0, 1);
}

/** Stanine by cumulative per cent 4, 11, 23, 40, 60, 77, 89, 96. */
export function stanineOfRank(rank: ExactRatio): number {
  return 1 + STANINE_CUTS.filter((cut) => compareToWhole(rank, cut) >= 0).length;
}

/** 5 + 2z rounded half up and cut to 1–9: bounds at z = −1.75, −1.25 … 1.75. */
export function stanineOfZ(z: number): number {
  return cut(Math.floor(5.5 + 2 * z), 1, 9);
}

/** 5.5 + 2z, half-standard-deviation bands with bounds at z = −2, −1.5 … 2, cut to 1–10. */
export function stenOfZ(z: number): number {
  return cut(Math.floor(6 + 2 * z), 1, 10);
}

function cut(value: number, low: number, high: number): number {
  return Math.min(high, Math.max(low, value));
}

/** The linear scale M + S z, in the units of M. */
export function linearScale(z: number, mean: number, spread: number): number {
  return mean + spread * z;
}

/**
 * All derived scores of a percentile rank and its z. A rank of 0 or 100 has no finite z, T, NCE or deviation score;
 * its stanine comes from the rank and its sten is the outermost.
 */
export function derivedScores(rank: ExactRatio, z: number | null): DerivedScores {
  return {
    z,
    t: z === null ? null : linearScale(z, 50, 10),
    nce: z === null ? null : linearScale(z, 50, NCE_FACTOR),
    deviation: z === null ? null : linearScale(z, 100, 15),
    stanine: stanineOfRank(rank),
    sten: z === null ? outermostSten(rank) : stenOfZ(z),
  };
}

function outermostSten(rank: ExactRatio): number | null {
  if (compareToWhole(rank, 0n) <= 0) return 1;
  return compareToWhole(rank, 100n) >= 0 ? 10 : null;
}
