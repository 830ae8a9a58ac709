/** A printed text as a workbook cell holds it. */
export type TypedCell =
  | { readonly kind: 'number'; readonly value: number; readonly format: string }
  | { readonly kind: 'text'; readonly value: string };

const MINUS = '\u2212';
const NARROW_SPACE = '\u202f';

/** A number wherever the text is one, with the format that shows exactly this text; otherwise the text: "<1", "–". */
export function typedCell(printed: string): TypedCell {
  const match = /^(−?)(\d{1,3}(?:\u202f\d{3})*|\d+)(?:\.(\d+))?$/.exec(printed);
  if (match === null) return { kind: 'text', value: printed };
  const [, sign = '', whole = '', fraction = ''] = match;
  const groups = whole.split(NARROW_SPACE);
  const places = groups.map((group, index) => (index === 0 ? '0' : '0'.repeat(group.length)));
  const positive = `${places.join(`"${NARROW_SPACE}"`)}${fraction === '' ? '' : `.${'0'.repeat(fraction.length)}`}`;
  const value = Number(`${sign === '' ? '' : '-'}${groups.join('')}.${fraction || '0'}`);
  return { kind: 'number', value, format: `${positive};"${MINUS}"${positive}` };
}
