import type { QuarterCount } from '../class/rank-quarters.ts';
import type { ScoreFacts } from '../class/score-facts.ts';
import { decimalOf } from '../scale/decimal.ts';
import type { ScoreScale } from '../scale/score-scale.ts';
import { printNumber } from '../scores/printed-number.ts';
import type { FiveNumbers } from '../tally/cohort-summary.ts';
import { scoreTicks } from './score-ticks.ts';
import { PRINTED_COLOURS, type PictureSize } from './ogive-picture.ts';
import { area, bar, dot, horizontal, path, picture, vertical, words as label } from './svg-marks.ts';

const SIDES = 8;
const BELOW_AXIS = 12;
const BOX = { top: 4, height: 17 } as const;
const DOT_RADIUS = 1.3;
/** From one dot of a stack to the next. */
const DOT_STEP = 3;

/** The raw scores of a class on their scale: the box plot, and below it a dot for each of the class. */
export function boxPicture(
  { boxPlot, scores }: Pick<ScoreFacts, 'scores'> & { readonly boxPlot: FiveNumbers },
  scale: ScoreScale,
  size: PictureSize,
  printed: (text: string) => string,
): string {
  const { ink, soft, curve, band } = PRINTED_COLOURS;
  const axis = size.height - BELOW_AXIS;
  const x = (score: number): number =>
    SIDES + ((score - scale.min) / (scale.max - scale.min)) * (size.width - 2 * SIDES);
  const [lowest, lower, median, upper, highest] = boxPlot;
  const { top, height } = BOX;
  const [middle, bottom] = [top + height / 2, top + height];
  const corners = [
    { x: x(lower), y: top },
    { x: x(upper), y: top },
    { x: x(upper), y: bottom },
    { x: x(lower), y: bottom },
  ];
  const tallest = Math.max(1, ...scores.map(({ count }) => count));
  const step = Math.min(DOT_STEP, (axis - bottom - 5) / tallest);
  return picture(size, [
    horizontal(middle, x(lowest), x(lower), ink),
    horizontal(middle, x(upper), x(highest), ink),
    vertical(x(lowest), middle - 4, middle + 4, ink, 0.7),
    vertical(x(highest), middle - 4, middle + 4, ink, 0.7),
    area(corners, band),
    path([...corners, { x: x(lower), y: top }], curve, 0.7),
    vertical(x(median), top, bottom, curve, 1.5),
    ...scores.flatMap(({ score, count }) =>
      Array.from({ length: count }, (_, place) =>
        dot({ x: x(score), y: axis - 2.5 - place * step }, curve, Math.min(DOT_RADIUS, Math.max(0.5, step * 0.45))),
      ),
    ),
    horizontal(axis, x(scale.min), x(scale.max), soft),
    ...scoreTicks(scale, size.width - 2 * SIDES).flatMap((tick) => [
      vertical(x(tick), axis, axis + 2.5, soft),
      label(printed(printNumber(tick, decimalOf(tick).decimals)), { x: x(tick), y: size.height - 2.5 }, 'middle', soft),
    ]),
  ]);
}

/** A bar for each quarter of the norm group, as long as its count, with a stroke at a quarter of all. */
export function quartersPicture(
  quarters: readonly QuarterCount[],
  rowMiddles: readonly number[],
  size: PictureSize,
  headRule: number,
): string {
  const { curve, band, soft } = PRINTED_COLOURS;
  const all = quarters.reduce((sum, { count }) => sum + count, 0);
  const longest = Math.max(1, ...quarters.map(({ count }) => count), all / 4);
  const x = (count: number): number => 1 + (count / longest) * (size.width - 2);
  const height = 6;
  return picture(size, [
    ...quarters.flatMap(({ count }, index) => {
      const top = (rowMiddles[index] ?? 0) - height / 2;
      if (count === 0) return [];
      return [
        bar({ x: x(0), y: top }, { width: x(count) - x(0), height }, band),
        vertical(x(count), top, top + height, curve, 0.7),
      ];
    }),
    vertical(x(0), headRule, size.height, soft),
    ...(all === 0 ? [] : [vertical(x(all / 4), headRule, size.height, soft, 0.9)]),
  ]);
}
