import type { ScoreScale } from '../scale/score-scale.ts';

/** Round scores about 28 points apart or more in a width of so many, never closer than the scale's step: 0, 5, 10 … */
export function scoreTicks({ min, max, step: scaleStep }: ScoreScale, width: number): readonly number[] {
  const least = (max - min) / Math.max(2, Math.floor(width / 28));
  const power = 10 ** Math.floor(Math.log10(least));
  const round = [1, 2, 5].map((factor) => factor * power).find((candidate) => candidate >= least * 0.999) ?? 10 * power;
  const step = Math.max(round, scaleStep);
  const first = Math.ceil(min / step - 1e-9);
  const last = Math.floor(max / step + 1e-9);
  return Array.from({ length: last - first + 1 }, (_, index) => Number(((first + index) * step).toPrecision(12)));
}
