import { ADJUSTED_MARK } from '../../shared-core/norms/adjustment-words.ts';
import type { ConversionRow } from '../../shared-core/norms/conversion-table.ts';

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

/** The printed rank of a row. One adjusted by hand carries its mark, and stays a number: its format shows the mark. */
export function rankCell({ printed, adjusted }: ConversionRow): TypedCell {
  const typed = typedCell(printed);
  if (adjusted === null) return typed;
  return typed.kind === 'text'
    ? { kind: 'text', value: `${typed.value}${ADJUSTED_MARK}` }
    : { ...typed, format: `${typed.format.split(';')[0] ?? ''}"${ADJUSTED_MARK}"` };
}
