import { ENGLISH_WORDS, figure, say } from '../languages/phrases.ts';
import { decimalOf, unitsAt, type Decimal } from './decimal.ts';

/** Whether a high raw score is the good end (number right) or the low one (seconds, errors). */
export type Direction = 'high-is-good' | 'low-is-good';

/** Every score a person can get: min, min + step, … max. All three in raw-score points. */
export interface ScoreScale {
  readonly min: number;
  readonly max: number;
  readonly step: number;
  readonly direction: Direction;
}

/** The same scale as whole numbers of 10^-decimals points, so that no comparison is made in floating point. */
export interface ScaleGrid {
  readonly decimals: number;
  readonly minUnits: bigint;
  readonly stepUnits: bigint;
  /** Number of attainable scores. */
  readonly length: number;
}

export const MAX_ATTAINABLE_SCORES = 5001;
const MAX_SCALE_DECIMALS = 4;

/** What is wrong with a scale, in sentences; empty when it can be used. */
export function scaleProblems(scale: ScoreScale): readonly string[] {
  const parts = [scale.min, scale.max, scale.step];
  if (!parts.every(Number.isFinite))
    return ['The scale needs a lowest score, a highest score and a step, all numbers.'];
  if (scale.step <= 0) return ['The step of the scale must be above 0, for example 1 or 0.5.'];
  if (scale.max <= scale.min) return ['The highest score of the scale must lie above the lowest.'];
  const decimals = parts.map((part) => decimalOf(part).decimals);
  if (Math.max(...decimals) > MAX_SCALE_DECIMALS) {
    return [`A scale may have at most ${MAX_SCALE_DECIMALS} decimals.`];
  }
  const grid = gridOf(scale);
  const span = unitsAt(decimalOf(scale.max), grid.decimals) - grid.minUnits;
  if (span % grid.stepUnits !== 0n) {
    return [
      `From ${scale.min} in steps of ${scale.step} the scale never reaches ${scale.max}. Change the step or an end.`,
    ];
  }
  if (grid.length > MAX_ATTAINABLE_SCORES) {
    return [`The scale has ${grid.length} scores; at most ${MAX_ATTAINABLE_SCORES} can be tabled. Use a larger step.`];
  }
  return [];
}

function gridOf(scale: ScoreScale): ScaleGrid {
  const min = decimalOf(scale.min);
  const max = decimalOf(scale.max);
  const step = decimalOf(scale.step);
  const decimals = Math.max(min.decimals, max.decimals, step.decimals);
  const minUnits = unitsAt(min, decimals);
  const stepUnits = unitsAt(step, decimals);
  const length = Number((unitsAt(max, decimals) - minUnits) / stepUnits) + 1;
  return { decimals, minUnits, stepUnits, length };
}

/** The grid of a scale that has no problems; throws on one that has. */
export function scaleGrid(scale: ScoreScale): ScaleGrid {
  const problems = scaleProblems(scale);
  if (problems.length > 0) throw new RangeError(problems.join(' '));
  return gridOf(scale);
}

/** All attainable scores, lowest first. */
export function attainableScores(scale: ScoreScale): readonly number[] {
  const grid = scaleGrid(scale);
  const divisor = 10 ** grid.decimals;
  return Array.from(
    { length: grid.length },
    (_, position) => Number(grid.minUnits + BigInt(position) * grid.stepUnits) / divisor,
  );
}

export type PlaceOnScale = number | 'below-scale' | 'above-scale' | 'off-grid';

/** The position (0 = lowest) of a score on the grid, or why it has none. */
export function placeOnGrid(grid: ScaleGrid, score: Decimal): PlaceOnScale {
  const decimals = Math.max(grid.decimals, score.decimals);
  const widen = 10n ** BigInt(decimals - grid.decimals);
  const offset = unitsAt(score, decimals) - grid.minUnits * widen;
  const step = grid.stepUnits * widen;
  if (offset < 0n) return 'below-scale';
  if (offset > step * BigInt(grid.length - 1)) return 'above-scale';
  if (offset % step !== 0n) return 'off-grid';
  return Number(offset / step);
}

/** The scale in a few words: "0 to 40" or "0 to 20 in steps of 0.5". */
export function scaleInWords(scale: ScoreScale, words = ENGLISH_WORDS): string {
  const ends = { low: figure(words, String(scale.min)), high: figure(words, String(scale.max)) };
  return scale.step === 1
    ? say(words, 'scale.range', ends)
    : say(words, 'scale.range-in-steps', { ...ends, step: figure(words, String(scale.step)) });
}
