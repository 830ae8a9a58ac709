import { say, type PrintWords } from '../languages/phrases.ts';
import { RANGE_DASH, rangeSides } from './range-cell.ts';

/**
 * A printed figure as it is read aloud: "23–25" is "23 to 25", "<1" is "below 1", ">99" is "above 99", "−2" is
 * "minus 2", a dash alone is "no value", and no space divides the thousands. Null where it reads well as it is printed.
 */
export function spokenFigure(words: PrintWords, printed: string): string | null {
  if (printed === RANGE_DASH) return say(words, 'spoken.no-value');
  const { upToDash, after } = rangeSides(printed);
  const said =
    after === null
      ? spokenSide(words, printed)
      : say(words, 'spoken.range', {
          low: spokenSide(words, upToDash.slice(0, -RANGE_DASH.length)),
          high: spokenSide(words, after),
        });
  return said === printed ? null : said;
}

function spokenSide(words: PrintWords, side: string): string {
  const plain = side.replaceAll('\u202f', '');
  const [, sign = '', rest = ''] = /^([<>\u2212]|-(?=\d))?(.*)$/s.exec(plain) ?? [];
  switch (sign) {
    case '<':
      return say(words, 'spoken.below', { figure: spokenSide(words, rest) });
    case '>':
      return say(words, 'spoken.above', { figure: spokenSide(words, rest) });
    case '':
      return plain;
    default:
      return say(words, 'spoken.minus', { figure: rest });
  }
}

/** A head whose word is divided at the end of a line, put together again; null for any other. */
export function spokenHead(lines: readonly string[]): string | null {
  const said = headInOneLine(lines);
  return said === lines.join(' ') ? null : said;
}

/** The lines of a head in one, a divided word put together again. */
export function headInOneLine(lines: readonly string[]): string {
  return lines.join(' ').replace(/(?<=\p{L})- (?=\p{Ll})/gu, '');
}
