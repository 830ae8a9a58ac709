import { ratio, type ExactRatio } from '../percentile/exact-ratio.ts';
import { parseDecimal, powerOfTen, type DecimalMark } from '../scale/decimal.ts';
import { placeOnGrid, scaleGrid, type ScoreScale } from '../scale/score-scale.ts';
import { typedLines, type LineProblem } from '../tally/typed-counts.ts';

/** A rank as it is printed: a number in per cent, or "below" or "above" one. */
export interface PrintedValue {
  readonly sign: '' | '<' | '>';
  readonly value: ExactRatio;
}

/** One line of somebody's table. */
export interface ForeignRow {
  /** Place of the score on the scale, 0 = lowest. */
  readonly position: number;
  /** The rank as it was pasted, without spaces. */
  readonly text: string;
  readonly printed: PrintedValue;
}

export interface ForeignColumn {
  readonly rows: readonly ForeignRow[];
  /** Most decimals of a rank, in per cent. */
  readonly decimals: number;
  /** True when the column gives proportions 0–1; the rows have them in per cent. */
  readonly proportions: boolean;
}

export interface ForeignColumnRead {
  /** Null as long as there are problems. */
  readonly column: ForeignColumn | null;
  readonly problems: readonly LineProblem[];
}

const MOST_DECIMALS = 8;

/**
 * Reads a pasted column of percentile ranks, one "score rank" a line, separated by tab, semicolon, comma or spaces; a
 * first line without any digit is a heading. A rank is a number from 0 to 100, "<1", ">99", or ends in "%"; where no rank
 * exceeds 1 and some have decimals, they are read as proportions.
 */
export function readForeignRanks(text: string, scale: ScoreScale): ForeignColumnRead {
  const grid = scaleGrid(scale);
  const problems: LineProblem[] = [];
  const cells: CellRead[] = [];
  const firstLines = new Map<number, number>();
  const { lines, mark } = typedLines(closedUp(text));
  for (const { line, cells: entries } of lines) {
    const [scoreText = '', rankText = ''] = entries;
    const tell = (problem: string): number => problems.push({ line, problem });
    if (entries.length !== 2) {
      tell(
        `A line holds a score and a rank; this one holds ${entries.length} ${entries.length === 1 ? 'entry' : 'entries'}.`,
      );
      continue;
    }
    const score = parseDecimal(scoreText, mark);
    const place = score === null ? null : placeOnGrid(grid, score);
    if (place === null) tell(`"${scoreText}" is not a score. Give each score a line of its own.`);
    else if (typeof place !== 'number')
      tell(`Score ${scoreText} is not on the scale of this group. Leave the line out.`);
    else if (firstLines.has(place)) tell(`Score ${scoreText} stands in line ${firstLines.get(place)} already.`);
    else {
      firstLines.set(place, line);
      const cell = cellOf(place, rankText, mark);
      if (cell === null) tell(`"${rankText}" is not a percentile rank. Write a number from 0 to 100, <1 or >99.`);
      else cells.push(cell);
    }
  }
  if (problems.length > 0) return { column: null, problems };
  if (cells.length === 0) {
    const problem = 'Paste one line for each score: the score, a space, and its percentile rank.';
    return { column: null, problems: [{ line: 0, problem }] };
  }
  return { column: columnOf(cells), problems: [] };
}

/** "> 99" and "83 %" without their spaces, which would be taken for separators. */
function closedUp(text: string): string {
  return text.replace(/([<>≤≥])[ \u00a0\u202f]+/g, '$1').replace(/[ \u00a0\u202f]+%/g, '%');
}

interface CellRead {
  readonly position: number;
  readonly text: string;
  readonly sign: '' | '<' | '>';
  readonly value: ExactRatio;
  readonly decimals: number;
  readonly percentSign: boolean;
}

function cellOf(position: number, text: string, mark: DecimalMark): CellRead | null {
  const match = /^([<>]?)([\d.,]+)(%?)$/.exec(text.replace('≤', '<').replace('≥', '>'));
  const digits = match?.[2] ?? '';
  const read = match === null ? null : (parseDecimal(digits, mark) ?? parseDecimal(digits));
  if (match === null || read === null || read.units > 100n * powerOfTen(read.decimals)) return null;
  const decimals = /[.,](\d*)$/.exec(digits)?.[1]?.length ?? 0;
  if (decimals > MOST_DECIMALS) return null;
  return {
    position,
    text,
    sign: match[1] === '<' ? '<' : match[1] === '>' ? '>' : '',
    value: ratio(read.units, powerOfTen(read.decimals)),
    decimals,
    percentSign: match[3] === '%',
  };
}

function columnOf(cells: readonly CellRead[]): ForeignColumn {
  const decimals = Math.max(...cells.map((cell) => cell.decimals));
  const small = cells.every(({ value }) => value.numerator <= value.denominator);
  const proportions = small && decimals > 0 && cells.every(({ percentSign }) => !percentSign);
  const rows = cells
    .map(({ position, text, sign, value }) => ({
      position,
      text,
      printed: { sign, value: proportions ? ratio(100n * value.numerator, value.denominator) : value },
    }))
    .sort((left, right) => left.position - right.position);
  return { rows, decimals: proportions ? Math.max(0, decimals - 2) : decimals, proportions };
}
