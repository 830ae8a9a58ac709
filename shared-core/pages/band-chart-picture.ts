import { CHART_TICKS, chartPlace, offScale, type ChartRow } from './band-chart-scale.ts';
import { PRINTED_COLOURS, type PictureSize } from './ogive-picture.ts';
import { bar, dot, horizontal, picture, ring, vertical, words } from './svg-marks.ts';

/** Room at the sides, so that marks and labels at the ends stay within the picture. */
const SIDES = 5;
const LABEL_ABOVE = 4.5;
const AXIS_TO_LABEL = 2.4;
const MARK_RADIUS = 1.9;
const BAR_HEIGHT = 4.6;
/** Labels between 1 and 10, and 90 and 99, are left out where they would run together. */
const NARROW = 118;
const CROWDED: ReadonlySet<number> = new Set([5, 95]);

/**
 * The column of a table of pupils that shows rank and band on one common scale: tick labels above the rule of the heads,
 * then a row for each pupil. Lengths are points from the top of the picture.
 */
export function bandChart(
  rows: readonly (ChartRow & { readonly middle: number })[],
  size: PictureSize,
  headRule: number,
): string {
  const x = acrossIn(size.width);
  return picture(size, [
    ...CHART_TICKS.map((tick) => vertical(x(tick), headRule, size.height, gridColour(tick))),
    ...tickLabels(size.width, headRule - LABEL_ABOVE),
    ...rows.flatMap((row) => rowMarks(row, x, row.middle, 1)),
  ]);
}

/** The line of a slip: one pupil's rank and band over the scale. */
export function bandLine(row: ChartRow, size: PictureSize, labelSize: number): string {
  const x = acrossIn(size.width);
  const axis = size.height - labelSize - AXIS_TO_LABEL;
  return picture(size, [
    ...CHART_TICKS.map((tick) => vertical(x(tick), 0, axis, gridColour(tick))),
    horizontal(axis, x(CHART_TICKS[0]), x(99), PRINTED_COLOURS.soft),
    ...tickLabels(size.width, size.height - 1.5, labelSize),
    ...rowMarks(row, x, axis / 2, Math.min(1.9, axis / 2 / BAR_HEIGHT)),
  ]);
}

function acrossIn(width: number): (rank: number) => number {
  return (rank) => SIDES + chartPlace(rank) * (width - 2 * SIDES);
}

function gridColour(tick: number): string {
  return tick === 50 ? PRINTED_COLOURS.soft : PRINTED_COLOURS.grid;
}

function tickLabels(width: number, baseline: number, size?: number): readonly string[] {
  const x = acrossIn(width);
  return CHART_TICKS.filter((tick) => width >= NARROW || !CROWDED.has(tick)).map((tick) =>
    words(String(tick), { x: x(tick), y: baseline }, 'middle', PRINTED_COLOURS.soft, size),
  );
}

/** The band as a bar, closed by strokes where it ends on the scale; the rank as a dot, or as a ring where it lies beyond. */
function rowMarks(
  { rank, band }: ChartRow,
  x: (rank: number) => number,
  middle: number,
  scale: number,
): readonly string[] {
  const { band: light, curve } = PRINTED_COLOURS;
  const height = BAR_HEIGHT * scale;
  const top = middle - height / 2;
  const radius = MARK_RADIUS * scale;
  const mark = { x: x(rank), y: middle };
  return [
    ...(band === null
      ? []
      : [
          bar({ x: x(band.low), y: top }, { width: x(band.high) - x(band.low), height }, light),
          ...[band.low, band.high]
            .filter((end) => !offScale(end))
            .map((end) => vertical(x(end), top, top + height, curve, 0.7)),
        ]),
    offScale(rank) ? ring(mark, curve, radius) : dot(mark, curve, radius),
  ];
}
