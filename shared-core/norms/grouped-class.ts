import { scoresPerClass } from '../percentile/percentile-rank.ts';
import { scaleGrid } from '../scale/score-scale.ts';
import { printNumber } from '../scores/printed-number.ts';
import type { FrequencyTable } from '../tally/frequency-table.ts';
import type { ConversionRow } from './conversion-table.ts';

/** The class of a grouped definition in which a score lies, seen from the poor end of the scale. */
export interface GroupedClass {
  /** Weight units in poorer classes, and in this one. */
  readonly below: bigint;
  readonly inClass: bigint;
  /** How far the score lies into the class, as a subtraction: "12 − 9.5". */
  readonly into: string;
}

/** Finds the class of a row. Throws on a width that is not a multiple of the scale's step. */
export function groupedClass(table: FrequencyTable, row: ConversionRow, width: number): GroupedClass {
  const perClass = scoresPerClass(table.scale, width);
  if (perClass === null) throw new RangeError('unusable width');
  const good = table.scale.direction === 'high-is-good';
  const weights = good ? table.weights : table.weights.toReversed();
  const { min, max, step } = table.scale;
  const fromEnd = Math.round(Math.abs(row.score - (good ? min : max)) / step);
  const start = Math.floor(fromEnd / perClass) * perClass;
  const limit = good ? min + (start - 0.5) * step : max - (start - 0.5) * step;
  const limitText = inBrackets(printNumber(limit, scaleGrid(table.scale).decimals + 1));
  const score = inBrackets(row.scoreText);
  return {
    below: sum(weights.slice(0, start)),
    inClass: sum(weights.slice(start, start + perClass)),
    into: good ? `${score} − ${limitText}` : `${limitText} − ${score}`,
  };
}

/** A number in the middle of a sum: "(−0.5)" where it is negative. */
export function inBrackets(number: string): string {
  return number.startsWith('\u2212') ? `(${number})` : number;
}

function sum(weights: readonly bigint[]): bigint {
  return weights.reduce((total, weight) => total + weight, 0n);
}
