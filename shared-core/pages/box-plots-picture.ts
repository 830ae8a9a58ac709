import { figure, say, type PrintWords } from '../languages/phrases.ts';
import { decimalOf } from '../scale/decimal.ts';
import type { ScoreScale } from '../scale/score-scale.ts';
import { printNumber } from '../scores/printed-number.ts';
import type { FiveNumbers } from '../tally/cohort-summary.ts';
import { PRINTED_COLOURS } from './ogive-picture.ts';
import { scoreTicks } from './score-ticks.ts';
import { area, fixed, path, words, type Point } from './svg-marks.ts';

/** Height of the axis below the boxes, points. */
export const AXIS_HEIGHT = 23;
const EDGE = 5;
const HALF_BOX = 4.6;
const HALF_CAP = 2.6;

/**
 * Boxes one below the other, the first of `fives` at the top, above an axis of raw scores: an SVG text that is the same
 * everywhere. `pitch` is from one box to the next, in points.
 */
export function boxPlotsPicture(
  fives: readonly FiveNumbers[],
  scale: ScoreScale,
  { width, pitch }: { readonly width: number; readonly pitch: number },
  language: PrintWords,
): string {
  const { ink, soft, grid, curve, band } = PRINTED_COLOURS;
  const [low, high] = [scale.min - scale.step / 2, scale.max + scale.step / 2];
  const across = (width - 2 * EDGE) / (high - low);
  const x = (score: number): number => EDGE + (score - low) * across;
  const bottom = fives.length * pitch;
  const height = bottom + AXIS_HEIGHT;
  const line = (from: Point, to: Point, colour: string, weight: number): string => path([from, to], colour, weight);
  const upright = (score: number, y: number, half: number, colour: string, weight: number): string =>
    line({ x: x(score), y: y - half }, { x: x(score), y: y + half }, colour, weight);
  const boxes = fives.flatMap(([lowest, lower, median, upper, highest], index) => {
    const y = (index + 0.5) * pitch;
    const corners = [
      { x: x(lower), y: y - HALF_BOX },
      { x: x(upper), y: y - HALF_BOX },
      { x: x(upper), y: y + HALF_BOX },
      { x: x(lower), y: y + HALF_BOX },
    ];
    return [
      line({ x: x(lowest), y }, { x: x(lower), y }, ink, 0.7),
      line({ x: x(upper), y }, { x: x(highest), y }, ink, 0.7),
      upright(lowest, y, HALF_CAP, ink, 0.7),
      upright(highest, y, HALF_CAP, ink, 0.7),
      area(corners, band),
      path([...corners, ...corners.slice(0, 1)], ink, 0.7),
      upright(median, y, HALF_BOX, curve, 1.6),
    ];
  });
  const ticks = scoreTicks(scale, width - 2 * EDGE).flatMap((tick) => [
    line({ x: x(tick), y: 0 }, { x: x(tick), y: bottom }, grid, 0.5),
    line({ x: x(tick), y: bottom }, { x: x(tick), y: bottom + 2.5 }, soft, 0.5),
    words(
      figure(language, printNumber(tick, decimalOf(tick).decimals)),
      { x: x(tick), y: bottom + 9.5 },
      'middle',
      soft,
    ),
  ]);
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${fixed(width)}" height="${fixed(height)}" viewBox="0 0 ${fixed(width)} ${fixed(height)}">`,
    ...ticks,
    line({ x: EDGE, y: bottom }, { x: width - EDGE, y: bottom }, soft, 0.5),
    words(say(language, 'picture.raw-score'), { x: width - EDGE, y: bottom + 18.5 }, 'end', soft),
    ...boxes,
    '</svg>',
  ].join('');
}
