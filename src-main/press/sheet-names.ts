const LONGEST = 31;
/** Characters that sheet names cannot hold, and control characters. */
const FORBIDDEN = /[[\]:*?/\\]|\p{Cc}/gu;
/** Formulas put names into apostrophes; one within a name becomes the curved one, which needs no care. */
const APOSTROPHE = /'/g;
const CURVED = '\u2019';
/** What would make a name a formula, or break the quotes that stand round it in one. */
const BAD_START = /^[=+\-@'\s]+/;
/** Excel keeps this name for itself. */
const RESERVED = 'history';

/**
 * Names of sheets for titles, in their order: at most 31 characters, none that a workbook forbids or could take for a
 * formula, no two alike when capitals are not told apart, and none of those already taken.
 */
export function sheetNames(titles: readonly string[], taken: readonly string[]): readonly string[] {
  const used = new Set([RESERVED, ...taken.map((name) => name.toLowerCase())]);
  return titles.map((title, index) => {
    const cleaned = title
      .replace(FORBIDDEN, ' ')
      .replace(/\s+/g, ' ')
      .replace(BAD_START, '')
      .replace(/['\s]+$/, '')
      .replace(APOSTROPHE, CURVED);
    const name = unusedName(cleaned === '' ? `Table ${index + 1}` : cleaned, LONGEST, used);
    used.add(name.toLowerCase());
    return name;
  });
}

/** Titles with a number behind those that stand there already, so that each can be chosen from a list. */
export function distinctTitles(titles: readonly string[]): readonly string[] {
  const used = new Set<string>();
  return titles.map((title) => {
    const name = unusedName(title, Number.MAX_SAFE_INTEGER, used);
    used.add(name.toLowerCase());
    return name;
  });
}

function unusedName(wanted: string, longest: number, used: ReadonlySet<string>): string {
  const shortened = (end: string): string => `${clipped(wanted, longest - end.length)}${end}`;
  let name = shortened('');
  for (let number = 2; used.has(name.toLowerCase()); number += 1) name = shortened(` (${number})`);
  return name;
}

/** At most so many UTF-16 units, no character cut in half, no apostrophe or space left at the end. */
function clipped(text: string, longest: number): string {
  let kept = '';
  for (const character of text) {
    if (kept.length + character.length > longest) break;
    kept += character;
  }
  return kept.replace(/['\s]+$/, '');
}
