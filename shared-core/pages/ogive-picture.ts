import type { GroupNorms } from '../norms/group-norms.ts';
import { ratio, ratioToNumber } from '../percentile/exact-ratio.ts';
import { decimalOf } from '../scale/decimal.ts';
import type { ScoreScale } from '../scale/score-scale.ts';
import { printNumber } from '../scores/printed-number.ts';

export interface OgiveColours {
  readonly ink: string;
  readonly soft: string;
  readonly grid: string;
  readonly curve: string;
}

export const PRINTED_COLOURS: OgiveColours = { ink: '#1e2326', soft: '#6a665e', grid: '#d8d3c7', curve: '#0d5a66' };

/** Width and height, in points in print and in pixels on screen. */
export interface PictureSize {
  readonly width: number;
  readonly height: number;
}

interface Point {
  readonly x: number;
  readonly y: number;
}

const FONT = 'Source Sans 3';
const FONT_SIZE = 6.6;
const EDGE = { left: 19, right: 4, top: 4, bottom: 21 };
/** Dots at the single scores are told apart up to about this many. */
const MOST_DOTS = 61;
const PER_CENT_TICKS = [0, 25, 50, 75, 100] as const;
/** Percent at which the curve's label gives way to it. */
const LABEL_LEVEL = 60;
const LABEL_LEADING = 9;

/**
 * Observed steps (cumulative per cent, by weight where people are weighted) and the percentile rank at each score, as an
 * SVG text without scripts, styles or outside references. Numbers have two decimals, so the text is the same everywhere.
 */
export function ogivePicture(norms: GroupNorms, size: PictureSize, colours: OgiveColours = PRINTED_COLOURS): string {
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
  const dots = ranks.length <= MOST_DOTS ? ranks.map((point) => dot(point, colours.curve)) : [];
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${fixed(size.width)}" height="${fixed(size.height)}" viewBox="0 0 ${fixed(size.width)} ${fixed(size.height)}">`,
    ...PER_CENT_TICKS.map((tick) =>
      horizontal(y(tick), EDGE.left, size.width - EDGE.right, tick === 0 ? colours.soft : colours.grid),
    ),
    ...PER_CENT_TICKS.map((tick) => words(String(tick), { x: EDGE.left - 4, y: y(tick) + 2.2 }, 'end', colours.soft)),
    ...scoreTicks(scale, size.width).flatMap((tick) => [
      `<path d="M${fixed(x(tick))} ${fixed(y(0))}v2.5" fill="none" stroke="${colours.soft}" stroke-width="0.5"/>`,
      words(printNumber(tick, decimalOf(tick).decimals), { x: x(tick), y: y(0) + 9.5 }, 'middle', colours.soft),
    ]),
    words('Raw score', { x: size.width - EDGE.right, y: y(0) + 18.5 }, 'end', colours.soft),
    words('Per cent', { x: EDGE.left - 15, y: y(0) + 18.5 }, 'start', colours.soft),
    path(steps(norms, x, y), colours.ink, 0.6),
    path(ranks, colours.curve, 1),
    ...dots,
    ...labels(norms, ranks, y, size, colours),
    '</svg>',
  ].join('');
}

/** Corners of the observed steps from the lower to the upper end of the scale. */
function steps(norms: GroupNorms, x: (score: number) => number, y: (percent: number) => number): readonly Point[] {
  const { scale } = norms.group.table;
  const rising = scale.direction === 'high-is-good';
  const corners: Point[] = [];
  const add = (corner: Point): void => {
    if (corners.at(-1)?.y === corner.y && corners.at(-2)?.y === corner.y) corners.pop();
    corners.push(corner);
  };
  norms.rows.forEach(({ score, parts }, index) => {
    const [before, after] = rising ? [parts.below, parts.below + parts.at] : [parts.below + parts.at, parts.below];
    const level = (units: bigint): number => y(100 * ratioToNumber(ratio(units, parts.all)));
    if (index === 0) add({ x: x(score - scale.step / 2), y: level(before) });
    add({ x: x(score), y: level(before) });
    add({ x: x(score), y: level(after) });
    if (index === norms.rows.length - 1) add({ x: x(score + scale.step / 2), y: level(after) });
  });
  return corners;
}

/** Round scores about 28 points apart or more, never closer than the scale's step: 0, 5, 10 … */
function scoreTicks({ min, max, step: scaleStep }: ScoreScale, width: number): readonly number[] {
  const least = (max - min) / Math.max(2, Math.floor((width - EDGE.left - EDGE.right) / 28));
  const power = 10 ** Math.floor(Math.log10(least));
  const round = [1, 2, 5].map((factor) => factor * power).find((candidate) => candidate >= least * 0.999) ?? 10 * power;
  const step = Math.max(round, scaleStep);
  const first = Math.ceil(min / step - 1e-9);
  const last = Math.floor(max / step + 1e-9);
  return Array.from({ length: last - first + 1 }, (_, index) => Number(((first + index) * step).toPrecision(12)));
}

/** Names both lines beside the curve, on the side where the plot is empty. */
function labels(
  norms: GroupNorms,
  ranks: readonly Point[],
  y: (percent: number) => number,
  size: PictureSize,
  colours: OgiveColours,
): readonly string[] {
  const rising = norms.group.table.scale.direction === 'high-is-good';
  const crossing = (percent: number): number =>
    (rising ? ranks.find((point) => point.y <= y(percent)) : ranks.findLast((point) => point.y <= y(percent)))?.x ??
    size.width / 2;
  const upper = crossing(LABEL_LEVEL);
  const roomAbove = rising ? upper - EDGE.left : size.width - EDGE.right - upper;
  const above = roomAbove > size.width * 0.4;
  const leftOfCurve = rising === above;
  const anchor = leftOfCurve ? 'end' : 'start';
  const first = y(above ? 88 : 22);
  const at = above ? upper : crossing(100 - LABEL_LEVEL);
  const place = at + (leftOfCurve ? -9 : 9);
  return [
    words('percentile rank', { x: place, y: first }, anchor, colours.curve),
    words('observed', { x: place, y: first + LABEL_LEADING }, anchor, colours.ink),
  ];
}

function horizontal(y: number, from: number, to: number, colour: string): string {
  return `<path d="M${fixed(from)} ${fixed(y)}H${fixed(to)}" fill="none" stroke="${colour}" stroke-width="0.5"/>`;
}

function path(points: readonly Point[], colour: string, weight: number): string {
  const d = points.map((point, index) => `${index === 0 ? 'M' : 'L'}${fixed(point.x)} ${fixed(point.y)}`).join('');
  return `<path d="${d}" fill="none" stroke="${colour}" stroke-width="${weight}" stroke-linejoin="round"/>`;
}

function dot({ x, y }: Point, colour: string): string {
  return `<circle cx="${fixed(x)}" cy="${fixed(y)}" r="1.1" fill="${colour}"/>`;
}

function words(text: string, { x, y }: Point, anchor: 'start' | 'middle' | 'end', colour: string): string {
  return `<text x="${fixed(x)}" y="${fixed(y)}" text-anchor="${anchor}" font-family="${FONT}" font-size="${FONT_SIZE}" fill="${colour}">${text}</text>`;
}

function fixed(value: number): string {
  return value.toFixed(2);
}
