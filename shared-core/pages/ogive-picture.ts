import { figure, say, type PrintWords } from '../languages/phrases.ts';
import type { GroupNorms } from '../norms/group-norms.ts';
import { levelInWords } from '../norms/table-columns.ts';
import { ratio, ratioToNumber } from '../percentile/exact-ratio.ts';
import { decimalOf } from '../scale/decimal.ts';
import { printNumber } from '../scores/printed-number.ts';
import { scoreTicks } from './score-ticks.ts';
import { ogiveLabels, type OgiveLabel, type PlacedLabels } from './ogive-labels.ts';
import { area, dot, horizontal, path, picture, vertical, words, type Point } from './svg-marks.ts';

export interface OgiveColours {
  readonly ink: string;
  readonly soft: string;
  readonly grid: string;
  readonly curve: string;
  /** Light enough that the grid shows on it. */
  readonly band: string;
}

export const PRINTED_COLOURS: OgiveColours = {
  ink: '#1e2326',
  soft: '#6a665e',
  grid: '#d8d3c7',
  curve: '#0d5a66',
  band: '#d3e4e5',
};

/** Width and height in points. */
export interface PictureSize {
  readonly width: number;
  readonly height: number;
}

const EDGE = { left: 19, right: 4, top: 4, bottom: 21 };
const AROUND_LABELS = 3;
/** Dots at the single scores are told apart up to about this many. */
const MOST_DOTS = 61;
const PER_CENT_TICKS = [0, 25, 50, 75, 100] as const;

/** From a raw score and a per cent to a place in the picture. */
interface Plot {
  readonly x: (score: number) => number;
  readonly y: (percent: number) => number;
}

/**
 * Observed steps (cumulative per cent, by weight where people are weighted), the percentile rank at each score, smoothed
 * where the group is, and the sampling interval of the observed rank as a band where the definition has one; as an SVG
 * text that is the same everywhere. `level` is the confidence of the interval, per cent.
 */
export function ogivePicture(
  norms: GroupNorms,
  level: number,
  size: PictureSize,
  language: PrintWords,
  colours: OgiveColours = PRINTED_COLOURS,
): string {
  const { scale } = norms.group.table;
  const [low, high] = [scale.min - scale.step / 2, scale.max + scale.step / 2];
  const across = (size.width - EDGE.left - EDGE.right) / (high - low);
  const down = (size.height - EDGE.top - EDGE.bottom) / 100;
  const x = (score: number): number => EDGE.left + (score - low) * across;
  const y = (percent: number): number => size.height - EDGE.bottom - percent * down;
  const ranks = norms.rows.map((row) => ({
    x: x(row.score),
    y: y(Math.min(100, Math.max(0, ratioToNumber(row.rank)))),
  }));
  const smoothed = norms.smoothing.state === 'smoothed';
  const dotted = !smoothed && ranks.length <= MOST_DOTS;
  const band = bandEdges(norms, { x, y });
  const labels: readonly OgiveLabel[] = [
    {
      text: say(language, smoothed ? 'picture.smoothed' : 'picture.percentile-rank'),
      colour: colours.curve,
      sample: dotted ? 'dotted-curve' : 'curve',
      fill: colours.curve,
    },
    { text: say(language, 'picture.observed'), colour: colours.ink, sample: 'steps', fill: colours.ink },
    ...(band === null
      ? []
      : [
          {
            text: say(language, 'column.interval.name', { level: levelInWords({ precision: { level } }, language) }),
            colour: colours.soft,
            sample: 'band',
            fill: colours.band,
          } as const,
        ]),
  ];
  const stepLevels = norms.rows.map((row) => ({ x: x(row.score), ends: stepAt(row, { x, y }) }));
  const extreme = (pick: (...values: number[]) => number): readonly Point[] =>
    ranks.map((point, index) => {
      const ends = stepLevels[index]?.ends ?? [];
      const edges = band === null ? [] : [band.upper[index]?.y ?? point.y, band.lower[index]?.y ?? point.y];
      return { x: point.x, y: pick(point.y, ...ends, ...edges) };
    });
  const room = {
    left: EDGE.left + 4,
    right: size.width - EDGE.right - 2,
    y,
    rising: scale.direction === 'high-is-good',
  };
  const placed = ogiveLabels(labels, extreme(Math.min), extreme(Math.max), room);
  return picture(size, [
    ...(band === null ? [] : [area([...band.upper, ...band.lower.toReversed()], colours.band)]),
    ...PER_CENT_TICKS.flatMap((tick) =>
      gridLine(y(tick), size.width - EDGE.right, placed.box, tick === 0 ? colours.soft : colours.grid),
    ),
    ...PER_CENT_TICKS.map((tick) => words(String(tick), { x: EDGE.left - 4, y: y(tick) + 2.2 }, 'end', colours.soft)),
    ...scoreTicks(scale, size.width - EDGE.left - EDGE.right).flatMap((tick) => [
      vertical(x(tick), y(0), y(0) + 2.5, colours.soft),
      words(
        figure(language, printNumber(tick, decimalOf(tick).decimals)),
        { x: x(tick), y: y(0) + 9.5 },
        'middle',
        colours.soft,
      ),
    ]),
    words(say(language, 'picture.raw-score'), { x: size.width - EDGE.right, y: y(0) + 18.5 }, 'end', colours.soft),
    words(say(language, 'picture.per-cent'), { x: EDGE.left - 15, y: y(0) + 18.5 }, 'start', colours.soft),
    path(steps(norms, { x, y }), colours.ink, 0.6),
    path(ranks, colours.curve, 1),
    ...(dotted ? ranks.map((point) => dot(point, colours.curve)) : []),
    ...placed.marks,
  ]);
}

/** A line of the grid, which leaves the ground of the labels free. */
function gridLine(y: number, right: number, box: PlacedLabels['box'], colour: string): readonly string[] {
  if (y < box.top || y > box.bottom) return [horizontal(y, EDGE.left, right, colour)];
  return [
    horizontal(y, EDGE.left, Math.max(EDGE.left, box.left - AROUND_LABELS), colour),
    horizontal(y, Math.min(right, box.right + AROUND_LABELS), right, colour),
  ];
}

interface BandEdges {
  readonly upper: readonly Point[];
  readonly lower: readonly Point[];
}

function bandEdges({ rows }: GroupNorms, { x, y }: Plot): BandEdges | null {
  const edge = (end: 'low' | 'high'): readonly Point[] =>
    rows.flatMap(({ score, interval }) => (interval === null ? [] : [{ x: x(score), y: y(interval[end]) }]));
  const [upper, lower] = [edge('high'), edge('low')];
  return upper.length === rows.length && upper.length > 0 ? { upper, lower } : null;
}

/** Heights of the foot and the head of the step at a score. */
function stepAt({ parts }: GroupNorms['rows'][number], { y }: Plot): readonly [number, number] {
  const level = (units: bigint): number => y(100 * ratioToNumber(ratio(units, parts.all)));
  return [level(parts.below), level(parts.below + parts.at)];
}

/** Corners of the observed steps from the lower to the upper end of the scale. */
function steps(norms: GroupNorms, plot: Plot): readonly Point[] {
  const { scale } = norms.group.table;
  const rising = scale.direction === 'high-is-good';
  const corners: Point[] = [];
  const add = (corner: Point): void => {
    if (corners.at(-1)?.y === corner.y && corners.at(-2)?.y === corner.y) corners.pop();
    corners.push(corner);
  };
  norms.rows.forEach((row, index) => {
    const [foot, head] = stepAt(row, plot);
    const [before, after] = rising ? [foot, head] : [head, foot];
    if (index === 0) add({ x: plot.x(row.score - scale.step / 2), y: before });
    add({ x: plot.x(row.score), y: before });
    add({ x: plot.x(row.score), y: after });
    if (index === norms.rows.length - 1) add({ x: plot.x(row.score + scale.step / 2), y: after });
  });
  return corners;
}
