import { markedRank } from '../../shared-core/norms/adjustment-words.ts';
import type { ConversionRow } from '../../shared-core/norms/conversion-table.ts';

/** A printed text as a workbook cell holds it. */
export type TypedCell =
  | { readonly kind: 'number'; readonly value: number; readonly format: string }
  | { readonly kind: 'text'; readonly value: string };

const MINUS = '\u2212';
const NARROW_SPACE = '\u202f';

/**
 * A number wherever the text is one, with the format that shows exactly this text; otherwise the text: "<1", "–". A rank
 * adjusted by hand stays a number: the format shows its mark.
 */
export function typedCell(printed: string): TypedCell {
  const match = /^(−?)(\d{1,3}(?:\u202f\d{3})*|\d+)(?:\.(\d+))?(†?)$/.exec(printed);
  if (match === null) return { kind: 'text', value: printed };
  const [, sign = '', whole = '', fraction = '', mark = ''] = match;
  const groups = whole.split(NARROW_SPACE);
  const places = groups.map((group, index) => (index === 0 ? '0' : '0'.repeat(group.length)));
  const positive = `${places.join(`"${NARROW_SPACE}"`)}${fraction === '' ? '' : `.${'0'.repeat(fraction.length)}`}`;
  const value = Number(`${sign === '' ? '' : '-'}${groups.join('')}.${fraction || '0'}`);
  if (mark !== '') return { kind: 'number', value, format: `${positive}"${mark}"` };
  return { kind: 'number', value, format: `${positive};"${MINUS}"${positive}` };
}

/** The printed rank of a row, with its mark where it was adjusted by hand. */
export function rankCell(row: ConversionRow): TypedCell {
  return typedCell(markedRank(row));
}
