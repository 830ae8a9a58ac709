/** How the degree of a log-linear model is found; see choose-degree. */
export type DegreeRule = 'bic' | 'aic' | 'likelihood-ratio';

export interface LogLinearChoice {
  /** 1–10, or the rule that picks it. */
  readonly degree: number | DegreeRule;
  /** Single scores whose observed frequency is kept exactly, in raw-score points. */
  readonly keptScores: readonly number[];
  /** A regular comb whose share is kept: every so many steps, counted from the lowest score plus an offset in steps. */
  readonly comb: { readonly every: number; readonly offset: number } | null;
}

/** A smoothing method as the user picks it; `none` is the default. */
export type SmoothingChoice =
  | { readonly kind: 'none' }
  | ({ readonly kind: 'log-linear' } & LogLinearChoice)
  | {
      readonly kind: 'kernel';
      /** In raw-score points, or chosen from the data. */
      readonly bandwidth: number | 'auto';
      /** The log-linear model whose probabilities are continuized; null for the observed ones. */
      readonly after: LogLinearChoice | null;
    }
  | { readonly kind: 'beta-binomial' };

/** One line of the table of degrees. */
export interface DegreeLine {
  readonly degree: number;
  /** False where the score equations could not be met; the figures are then those of the last step. */
  readonly converged: boolean;
  /** Likelihood-ratio and Pearson statistics against the saturated model, in people (or effective people). */
  readonly g2: number;
  readonly x2: number;
  readonly df: number;
  /** G² + 2(C + 1) and G² + ln N (C + 1), people counted; kept scores and a comb count as parameters like the C + 1. */
  readonly aic: number;
  readonly bic: number;
  /** p-value 0–1 of this degree against the next lower one; null for the lowest. */
  readonly p: number | null;
}

/** Dividing by N, so that observed and fitted ones can be compared; sd in raw-score points. */
export interface Moments {
  readonly mean: number;
  readonly sd: number;
  readonly skewness: number;
  readonly excessKurtosis: number;
}

/** A distribution smoothed on its grid, lowest score first. */
export interface Smoothed {
  readonly choice: Exclude<SmoothingChoice, { readonly kind: 'none' }>;
  /** Probability of each attainable score; they add up to 1. */
  readonly probabilities: readonly number[];
  /**
   * Cumulative proportion 0–1 at score + shift steps, shift −0.5, 0 or 0.5: for methods on the grid B, B + p/2, B + p;
   * for the kernel its continuous F.
   */
  readonly cumulative: (position: number, shift: -0.5 | 0 | 0.5) => number;
  readonly degree: number | null;
  /** In raw-score points. */
  readonly bandwidth: number | null;
  /** Parameters of a beta-binomial distribution; null for other methods. */
  readonly shape: { readonly a: number; readonly b: number } | null;
  /**
   * Of the log-linear model, also where a kernel follows it; of a beta-binomial fit G², X² and df alone, which is not of
   * maximum likelihood; null for a kernel of the observed shares.
   */
  readonly g2: number | null;
  readonly x2: number | null;
  readonly df: number | null;
  readonly aic: number | null;
  readonly bic: number | null;
  /** Degrees that were compared; empty for other methods. */
  readonly degrees: readonly DegreeLine[];
  readonly momentsObserved: Moments;
  readonly momentsFitted: Moments;
  /** Freeman–Tukey residuals √f + √(f + 1) − √(4m + 1), one for each score. */
  readonly residuals: readonly number[];
  /**
   * Covariance of the probabilities, as a function that gives the variance of Σ g_k p̂_k for weights g; null where the
   * method has none.
   */
  readonly varianceOf: ((weights: readonly number[]) => number) | null;
  /**
   * From the same covariance the variance of Σ_{j<k} p̂_j + tied · p̂_k at every score k, which is that of its rank as a
   * proportion: one pass for all scores, where varianceOf takes one pass a score. `tied` is the share of a score's own people counted, 0–1.
   */
  readonly rankVariancesOf: ((tied: number) => readonly number[]) | null;
  /** What was done, in a plain sentence or two of English; see `smoothingStatement`. */
  readonly statement: string;
}

/** A refusal says why the data cannot carry the method and what works nearest to it. */
export type SmoothingResult =
  | { readonly ok: true; readonly smoothed: Smoothed }
  | {
      readonly ok: false;
      readonly problem: string;
      readonly instead: SmoothingChoice;
      /** The degrees tried, with the ones that failed marked, where there are any. */
      readonly degrees: readonly DegreeLine[];
    };
