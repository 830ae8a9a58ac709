import { figure, say, type PrintWords } from '../languages/phrases.ts';
import type { GroupNorms } from '../norms/group-norms.ts';
import type { Direction } from '../scale/score-scale.ts';
import type { Block } from './booklet.ts';
import { spokenFigure } from './spoken-text.ts';
import { linesOf, placeLines } from './text-lines.ts';
import { REPEATED, type CellRole } from './text-role.ts';
import { textWidth } from './text-width.ts';
import { FINE_RULE, ROW, STRONG_RULE, TABLE_HEAD } from './type-sizes.ts';

/** The inverse table lies: percentiles in one line, scores below them, in as many strips as the width asks for. */
export interface InverseStrip {
  readonly height: number;
  readonly place: (x: number, top: number) => readonly Block[];
}

const LEAST_GAP = 9;
const ABOVE_LINES = 4;
const BETWEEN_STRIPS = 8;
const STRIP_HEIGHT = ABOVE_LINES + 2 * ROW.leading + ABOVE_LINES;

export function inverseStrip({ inverse: listed, group }: GroupNorms, width: number, words: PrintWords): InverseStrip {
  const labels = inverseLabels(group.table.scale.direction, words);
  const inverse = listed.map(({ percentile, scoreText }) => ({
    percentile: figure(words, String(percentile)),
    scoreText: figure(words, scoreText),
  }));
  const labelWidth = Math.max(...labels.map((label) => textWidth(label, 'sans-bold', TABLE_HEAD.size))) + LEAST_GAP;
  const cell = Math.max(
    ...inverse.map(({ percentile, scoreText }) =>
      Math.max(textWidth(percentile, 'sans', ROW.size), textWidth(scoreText, 'sans-bold', ROW.size)),
    ),
  );
  const perStrip = Math.max(1, Math.floor((width - labelWidth) / (cell + LEAST_GAP)));
  const strips = Math.ceil(inverse.length / perStrip);
  const inStrip = Math.ceil(inverse.length / strips);
  const cellWidth = (width - labelWidth) / inStrip;
  return {
    height: strips * STRIP_HEIGHT + (strips - 1) * BETWEEN_STRIPS,
    place: (x, top) =>
      Array.from({ length: strips }, (_, strip) => {
        const stripTop = top + strip * (STRIP_HEIGHT + BETWEEN_STRIPS);
        const rows = inverse.slice(strip * inStrip, (strip + 1) * inStrip);
        const lines = [stripTop + ABOVE_LINES, stripTop + ABOVE_LINES + ROW.leading] as const;
        const rule = (y: number, weight: number): Block => ({ kind: 'rule', x, y, width, weight });
        return [
          rule(stripTop, STRONG_RULE),
          rule(lines[1], FINE_RULE),
          rule(stripTop + STRIP_HEIGHT, STRONG_RULE),
          ...labels.flatMap((label, line) =>
            placeLines(
              linesOf(label, 'sans-bold', TABLE_HEAD, labelWidth, strip === 0 ? cellRole(line, 0, null) : REPEATED),
              { ...TABLE_HEAD, leading: ROW.leading },
              {
                x,
                top: lines[line] ?? stripTop,
                width: labelWidth,
              },
            ),
          ),
          ...rows.flatMap(({ percentile, scoreText }, index) =>
            ([percentile, scoreText] as const).flatMap((text, line) =>
              placeLines(
                linesOf(
                  text,
                  line === 0 ? 'sans' : 'sans-bold',
                  ROW,
                  cellWidth,
                  cellRole(line, 1 + strip * inStrip + index, spokenFigure(words, text)),
                ),
                ROW,
                {
                  x: x + labelWidth + index * cellWidth,
                  top: lines[line] ?? stripTop,
                  width: cellWidth,
                  align: 'right',
                },
              ),
            ),
          ),
        ];
      }).flat(),
  };
}

/** What stands before percentiles and scores. */
export function inverseLabels(direction: Direction, words: PrintWords): readonly [string, string] {
  return [
    say(words, 'inverse.percentile-rank'),
    say(words, direction === 'high-is-good' ? 'inverse.lowest' : 'inverse.highest'),
  ];
}

/** The strips are one table of two rows: percentiles as heads of columns, and scores. Labels head their rows. */
function cellRole(line: number, column: number, said: string | null): CellRole {
  return {
    kind: 'cell',
    table: 'inverse',
    row: line === 0 ? 'head' : line,
    column,
    headOf: column === 0 ? 'row' : line === 0 ? 'column' : null,
    said,
  };
}
