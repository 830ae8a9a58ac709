import { missingCharacters } from '../../../shared-core/pages/text-width.ts';

/** Stands where a box is drawn for a character that the typefaces lack; which one it was says nobody. */
export const BOX = '\uFFFD';

/** Marks that are not drawn, such as a soft hyphen. */
const UNDRAWN = /\p{Cf}/gu;
const USUAL = /^[\x20-\x7e]*$/;

/** A text as readers of PDF see it, every kind of space as the usual one: they tell spaces apart by width alone. */
export function withPlainSpaces(text: string): string {
  return asRead(text).replace(/\s/g, ' ');
}

/** The same without any space: line breaks and the width of spaces say nothing about a text. */
export function squeezed(text: string): string {
  return asRead(text).replace(/\s+/g, '');
}

function asRead(text: string): string {
  if (USUAL.test(text)) return text;
  const drawn = text.replace(UNDRAWN, '');
  const missing = new Set(missingCharacters(drawn, 'sans'));
  return missing.size === 0 ? drawn : [...drawn].map((each) => (missing.has(each) ? BOX : each)).join('');
}
