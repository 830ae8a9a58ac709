import type { Reading } from '../norms/reading.ts';

export type Separator = Reading['separator'];

const SEPARATORS = [';', '\t', '|', ','] as const satisfies readonly Separator[];
const SAMPLE_LINES = 200;

export const SEPARATOR_WORDS: Readonly<Record<Separator, string>> = {
  ',': 'comma',
  ';': 'semicolon',
  '\t': 'tab',
  '|': 'upright bar',
};

/**
 * The separator that cuts the first lines of a text into the most even rows of two cells or more; a comma where none
 * does. Cells in quotation marks are not looked into. Where two do equally well, semicolon, tab and bar come before the
 * comma, which may be a decimal mark. A comma that stands in decimals alone, below a heading without one, separates
 * nothing: the text is one column, and a semicolon leaves its decimals whole.
 */
export function guessSeparator(text: string): Separator {
  const lines = linesOutsideQuotes(text).slice(0, SAMPLE_LINES);
  let best: Separator = ',';
  let bestShare = 0;
  for (const separator of SEPARATORS) {
    const widths = lines.map((line) => line.split(separator).length);
    const usual = mostCommon(widths.filter((width) => width > 1));
    const share = usual === null ? 0 : widths.filter((width) => width === usual).length / widths.length;
    if (share > bestShare + 0.05) {
      best = separator;
      bestShare = share;
    }
  }
  return best === ',' && onlyDecimalCommas(lines) ? ';' : best;
}

function onlyDecimalCommas([heading = '', ...lines]: readonly string[]): boolean {
  const cut = lines.filter((line) => line.includes(','));
  return cut.length > 0 && !heading.includes(',') && cut.every((line) => /^\s*[-+]?\d*,\d+\s*$/.test(line));
}

/** Non-blank lines with everything between quotation marks taken out; the last line, perhaps cut off, is left out. */
function linesOutsideQuotes(text: string): readonly string[] {
  const bare = text.replace(/"(?:[^"]|"")*"/g, '');
  const lines = bare.split(/\r\n|\n|\r/);
  return (lines.length > 1 ? lines.slice(0, -1) : lines).filter((line) => line.trim() !== '');
}

function mostCommon(values: readonly number[]): number | null {
  const counts = new Map<number, number>();
  let best: number | null = null;
  for (const value of values) {
    const count = (counts.get(value) ?? 0) + 1;
    counts.set(value, count);
    if (best === null || count > (counts.get(best) ?? 0)) best = value;
  }
  return best;
}
