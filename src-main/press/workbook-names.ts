/** A range or a cell that formulas and readers can call by a name. */
export interface NamedRange {
  readonly name: string;
  /** Name of the sheet, without apostrophes, and "A1:B9" or "D6". */
  readonly sheetName: string;
  readonly address: string;
}

const LONGEST_STEM = 40;
const MARKS = /\p{M}/gu;

/**
 * Parts of names that can stand behind "Table_" and the like, one for each title, in order: Latin letters, digits and
 * underscores, no two alike when capitals are not told apart. A title of which nothing is left gives its number.
 */
export function nameStems(titles: readonly string[]): readonly string[] {
  const used = new Set<string>();
  return titles.map((title, index) => {
    const plain = title
      .normalize('NFKD')
      .replace(MARKS, '')
      .replace(/[^A-Za-z0-9]+/g, '_');
    const wanted = plain.replace(/^_+/, '').slice(0, LONGEST_STEM).replace(/_+$/, '') || String(index + 1);
    let stem = wanted;
    for (let number = 2; used.has(stem.toLowerCase()); number += 1) stem = `${wanted}_${number}`;
    used.add(stem.toLowerCase());
    return stem;
  });
}

/** "'Grade 5'!$A$9:$H$49", with the sheet's name in apostrophes whatever it is. */
export function rangeText({ sheetName, address }: NamedRange): string {
  return `'${sheetName}'!${address.replace(/([A-Z]+)(\d+)/g, '$$$1$$$2')}`;
}

/** The part of a workbook that lists its sheets, with names added to those that print areas have put there. */
export function withNamedRanges(workbookXml: string, ranges: readonly NamedRange[]): string {
  const added = ranges.map((range) => `<definedName name="${range.name}">${escaped(rangeText(range))}</definedName>`);
  const end = workbookXml.indexOf('</definedNames>');
  if (end < 0) throw new RangeError('a workbook without print areas');
  return `${workbookXml.slice(0, end)}${added.join('')}${workbookXml.slice(end)}`;
}

function escaped(text: string): string {
  return text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;');
}
