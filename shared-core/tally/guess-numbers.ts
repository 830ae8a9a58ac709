import { parseDecimal, type DecimalMark } from '../scale/decimal.ts';

/**
 * The decimal mark that more of the cells need: a comma only where cells such as "12,5" outnumber those such as "12.5".
 */
export function guessDecimalMark(rows: readonly (readonly string[])[]): DecimalMark {
  let commas = 0;
  let points = 0;
  for (const row of rows) {
    for (const cell of row) {
      if (/^\s*[-+]?\d*,\d+\s*$/.test(cell)) commas += 1;
      else if (/^\s*[-+]?\d*\.\d+\s*$/.test(cell)) points += 1;
    }
  }
  return commas > points ? ',' : '.';
}

export function isNumber(text: string, mark: DecimalMark): boolean {
  return parseDecimal(text, mark) !== null;
}

/**
 * True when the first row names columns: none of its cells is a number, and it differs from the rows below in having
 * texts over numbers or, where there are no numbers at all, in having every cell filled and different.
 */
export function guessHeader(rows: readonly (readonly string[])[], mark: DecimalMark): boolean {
  const [first, ...below] = rows;
  if (first === undefined) return false;
  const filled = first.filter((cell) => cell.trim() !== '');
  if (filled.length === 0 || filled.some((cell) => isNumber(cell, mark))) return false;
  if (below.some((row) => row.some((cell) => cell.trim() !== '' && isNumber(cell, mark)))) return true;
  return filled.length === first.length && new Set(filled).size === filled.length;
}

const MISSING_TEXTS = [
  'na',
  'n/a',
  'nan',
  'null',
  'none',
  '-',
  '.',
  '?',
  'x',
  'abs',
  'absent',
  'missing',
  '#n/a',
  '#null!',
];
/** Codes for "no score" that stand outside the scores: repeated nines, or negative numbers where all others are not. */
const NINES = /^-?9{2,}$/;
const SMALL_NEGATIVE = /^-[1-9]$/;

/**
 * Texts among the scores that clearly stand for "no score": words such as NA, and 99, 999, −9 or −1 where they lie well
 * outside all other scores (above them by half their range or more, or the only values below 0).
 */
export function guessMissingCodes(scores: readonly string[], mark: DecimalMark): readonly string[] {
  const texts = [...new Set(scores.map((score) => score.trim()).filter((score) => score !== ''))];
  const words = texts.filter((text) => MISSING_TEXTS.includes(text.toLowerCase()));
  const numbers = texts.filter((text) => isNumber(text, mark));
  const isCode = (text: string): boolean => NINES.test(text) || SMALL_NEGATIVE.test(text);
  const rest = numbers.filter((text) => !isCode(text)).map((text) => Number(text.replace(',', '.')));
  if (rest.length < 3) return words;
  const lowest = rest.reduce((least, value) => Math.min(least, value));
  const highest = rest.reduce((most, value) => Math.max(most, value));
  const margin = Math.max(2, (highest - lowest) / 2);
  const codes = numbers.filter((text) => {
    if (!isCode(text)) return false;
    const value = Number(text);
    return value > highest + margin || (value < 0 && lowest >= 0);
  });
  return [...words, ...codes];
}
