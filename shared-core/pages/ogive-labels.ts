import { area, dot, LABEL_SIZE, path, words, type Point } from './svg-marks.ts';
import { textWidth } from './text-width.ts';

/** What a label names: it begins with a small piece of it, so that no reader depends on colours. */
export interface OgiveLabel {
  readonly text: string;
  readonly colour: string;
  readonly sample: 'steps' | 'curve' | 'dotted-curve' | 'band';
  /** Colour of the sample. */
  readonly fill: string;
}

/** The room of a picture in which labels may stand. */
export interface LabelRoom {
  readonly left: number;
  readonly right: number;
  /** Height of a per cent, 0–100. */
  readonly y: (percent: number) => number;
  readonly rising: boolean;
}

export interface PlacedLabels {
  readonly marks: readonly string[];
  /** The ground they stand on. */
  readonly box: { readonly left: number; readonly right: number; readonly top: number; readonly bottom: number };
}

/** Baseline of the first label above the curve and of the last below it, per cent. */
const FIRST_ABOVE = 88;
const LAST_BELOW = 10;
const LEADING = 9;
const TO_CURVE = 9;
/** Room between the labels and what is drawn above or below them. */
const CLEAR = 4;
/** Share of the width that the room above the curve must have for the labels to stand there. */
const ROOM_ABOVE = 0.4;
const SAMPLE_WIDTH = 10;
const SAMPLE_GAP = 3;

/**
 * Labels one below the other on the side of the curve where the plot is empty. `upper` and `lower` are the highest and
 * lowest of what is drawn at each score, from left to right.
 */
export function ogiveLabels(
  labels: readonly OgiveLabel[],
  upper: readonly Point[],
  lower: readonly Point[],
  { left, right, y, rising }: LabelRoom,
): PlacedLabels {
  const middle = (left + right) / 2;
  const passed = (points: readonly Point[], percent: number): number =>
    (rising ? points.find((point) => point.y <= y(percent)) : points.findLast((point) => point.y <= y(percent)))?.x ??
    middle;
  const kept = (points: readonly Point[], percent: number): number =>
    (rising ? points.findLast((point) => point.y >= y(percent)) : points.find((point) => point.y >= y(percent)))?.x ??
    middle;
  const perPoint = 1 / (y(0) - y(1));
  const depth = (labels.length - 1) * LEADING;
  const highest = passed(upper, FIRST_ABOVE - (depth + CLEAR) * perPoint);
  const above = (rising ? highest - left : right - highest) > (right - left) * ROOM_ABOVE;
  const curveAt = above ? highest : kept(lower, LAST_BELOW + (depth + LABEL_SIZE + CLEAR) * perPoint);
  const width = SAMPLE_WIDTH + SAMPLE_GAP + Math.max(...labels.map(({ text }) => textWidth(text, 'sans', LABEL_SIZE)));
  const x = rising === above ? Math.max(left, curveAt - TO_CURVE - width) : Math.min(right - width, curveAt + TO_CURVE);
  const first = above ? y(FIRST_ABOVE) : y(LAST_BELOW) - depth;
  const marks = labels.flatMap((label, index) => {
    const baseline = first + index * LEADING;
    return [
      ...sample(label, { x, y: baseline - LABEL_SIZE * 0.32 }),
      words(label.text, { x: x + SAMPLE_WIDTH + SAMPLE_GAP, y: baseline }, 'start', label.colour),
    ];
  });
  return { marks, box: { left: x, right: x + width, top: first - LABEL_SIZE, bottom: first + depth + LABEL_SIZE / 3 } };
}

function sample({ sample: kind, fill }: OgiveLabel, { x, y }: Point): readonly string[] {
  const end = x + SAMPLE_WIDTH;
  const centre = x + SAMPLE_WIDTH / 2;
  switch (kind) {
    case 'steps': {
      const [low, high] = [y + 1.6, y - 1.6];
      const corners = [
        { x, y: low },
        { x: centre, y: low },
        { x: centre, y: high },
        { x: end, y: high },
      ];
      return [path(corners, fill, 0.6)];
    }
    case 'curve':
      return [
        path(
          [
            { x, y },
            { x: end, y },
          ],
          fill,
          1,
        ),
      ];
    case 'dotted-curve':
      return [
        path(
          [
            { x, y },
            { x: end, y },
          ],
          fill,
          1,
        ),
        dot({ x: centre, y }, fill),
      ];
    case 'band': {
      const [top, bottom] = [y - 2.4, y + 2.4];
      const corners = [
        { x, y: top },
        { x: end, y: top },
        { x: end, y: bottom },
        { x, y: bottom },
      ];
      return [area(corners, fill)];
    }
  }
}
