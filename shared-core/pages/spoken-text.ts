import { RANGE_DASH, rangeSides } from './range-cell.ts';

const NO_VALUE = 'no value';

/**
 * A printed figure as it is read aloud: "23–25" is "23 to 25", "<1" is "below 1", ">99" is "above 99", "−2" is
 * "minus 2", a dash alone is "no value", and no space divides the thousands. Null where it reads well as it is printed.
 */
export function spokenFigure(printed: string): string | null {
  if (printed === RANGE_DASH) return NO_VALUE;
  const { upToDash, after } = rangeSides(printed);
  const said =
    after === null
      ? spokenSide(printed)
      : `${spokenSide(upToDash.slice(0, -RANGE_DASH.length))} to ${spokenSide(after)}`;
  return said === printed ? null : said;
}

function spokenSide(side: string): string {
  return side.replace(/^</, 'below ').replace(/^>/, 'above ').replace('\u2212', 'minus ').replaceAll('\u202f', '');
}

/** A head whose word is divided at the end of a line, put together again; null for any other. */
export function spokenHead(lines: readonly string[]): string | null {
  const printed = lines.join(' ');
  const said = printed.replace(/(?<=\p{L})- (?=\p{Ll})/gu, '');
  return said === printed ? null : said;
}
