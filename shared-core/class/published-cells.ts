import { parseDecimal, type Decimal, type DecimalMark } from '../scale/decimal.ts';

/** The scores of one line, both ends included. */
export interface ScoreRange {
  readonly low: Decimal;
  readonly high: Decimal;
}

/** A percentile rank as a table prints it: exactly, below it ("<1") or above it (">99"). */
export interface PublishedRank {
  readonly side: 'below' | 'at' | 'above';
  readonly value: Decimal;
  /** Decimals as they were written, closing zeros counted. */
  readonly written: number;
}

/** A number, or the sentence that says what to write. */
export type CellRead<T> = { readonly ok: true; readonly value: T } | { readonly ok: false; readonly problem: string };

export const NUMBER = '[+\\-\\u2212\\u2013]?\\d+(?:[.,]\\d+)?';
/** Hyphen, hyphen that does not break, en dash, em dash, minus, two points, or "to". */
export const BETWEEN = '\\s*(?:-|\\u2011|\\u2013|\\u2014|\\u2212|\\.\\.|\\bto\\b)\\s*';
const RANGE = new RegExp(`^(${NUMBER})${BETWEEN}(${NUMBER})$`, 'i');
const OPEN_RANGE =
  /^(?:[<>≤≥]|up to\b|from\b|over\b|under\b|below\b|above\b)|[+]$|\b(?:and|or) (?:more|less|over|under|above|below)$/i;
/** "1,200" and "1.200": thousands for some, three decimals for others. */
const THOUSANDS = /^[+\-\u2212\u2013]?[1-9]\d{0,2}(?:[.,]\d{3})+$/;

/** A raw score or a range of them: "27", "25-27", "25 to 27", "−3–−1". */
export function readScores(cell: string, mark: DecimalMark, threeDecimals: boolean): CellRead<ScoreRange> {
  const text = cell.trim();
  if (text === '')
    return unread('There is no raw score in this line. Write the score, or the range, in front of the rank.');
  const ends = RANGE.exec(text);
  const texts = ends === null ? [text, text] : [ends[1] ?? '', ends[2] ?? ''];
  if (!threeDecimals && texts.some((end) => THOUSANDS.test(end))) {
    return unread(`"${text}" may mean thousands or three decimals. Write thousands without a mark, as in 1200.`);
  }
  const [low, high] = texts.map((end) => parseDecimal(end, mark));
  if (low === null || low === undefined || high === null || high === undefined) {
    if (OPEN_RANGE.test(text)) {
      return unread(`"${text}" has no end. Write the lowest and the highest score that it stands for, as in 40-45.`);
    }
    return unread(
      `"${text}" is not a raw score. Write a number, as in 27, or a range, as in 25-27${markAdvice(text, mark)}.`,
    );
  }
  return { ok: true, value: { low, high } };
}

const LARGEST_BELOW = 25;
const SMALLEST_ABOVE = 75;

/** A percentile rank: "63", "63.5", "<1", ">99", with or without a per cent sign. */
export function readRank(cell: string, mark: DecimalMark): CellRead<PublishedRank> {
  const text = cell.trim();
  if (text === '') return unread('There is no percentile rank in this line. Write it behind the score, as in 27 63.');
  const parts = /^([<>]?)\s*(\d+(?:[.,]\d+)?)\s*%?$/.exec(text);
  const digits = parts?.[2] ?? '';
  const value = parts === null ? null : parseDecimal(digits, mark);
  if (value === null) {
    if (/^\d+\s*-$/.test(text)) return unread(`"${text}" is not a percentile rank. Write "<1" for a rank below 1.`);
    if (/^\d+\s*\+$/.test(text)) return unread(`"${text}" is not a percentile rank. Write ">99" for a rank above 99.`);
    return unread(
      `"${text}" is not a percentile rank. Write a number from 0 to 100, as in 63, "<1" or ">99"${markAdvice(text, mark)}.`,
    );
  }
  const size = Number(value.units) / 10 ** value.decimals;
  const side = parts?.[1] === '<' ? 'below' : parts?.[1] === '>' ? 'above' : 'at';
  if (size > 100 || (side === 'below' && size === 0) || (side === 'above' && size === 100))
    return unread(`A percentile rank lies between 0 and 100, and "${text}" does not. Correct it.`);
  if ((side === 'below' && size > LARGEST_BELOW) || (side === 'above' && size < SMALLEST_ABOVE)) {
    return unread(`"${text}" leaves open where the score stands. Write the percentile rank itself.`);
  }
  return { ok: true, value: { side, value, written: /[.,](\d+)$/.exec(digits)?.[1]?.length ?? 0 } };
}

/** Where a decimal has the other mark. */
function markAdvice(text: string, mark: DecimalMark): string {
  const other = mark === '.' ? /\d,\d/ : /\d\.\d/;
  return other.test(text) ? `, with the decimal mark "${mark}" that the other lines have` : '';
}

function unread(problem: string): { readonly ok: false; readonly problem: string } {
  return { ok: false, problem };
}
