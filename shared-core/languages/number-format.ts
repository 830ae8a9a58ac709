import type { ShippedWords } from './shipped-words.ts';

/** How numbers and dates are written in print. */
export interface NumberFormat {
  readonly decimalMark: '.' | ',';
  readonly thousands: 'narrow-space' | 'comma' | 'point' | 'apostrophe' | 'none';
  readonly minus: 'minus' | 'hyphen';
  readonly dateOrder: 'yyyy-mm-dd' | 'dd.mm.yyyy' | 'dd/mm/yyyy' | 'mm/dd/yyyy';
}

/** As `printed-number` writes them; whatever is printed in a language is made from it. */
export const ENGLISH_NUMBERS: NumberFormat = {
  decimalMark: '.',
  thousands: 'narrow-space',
  minus: 'minus',
  dateOrder: 'yyyy-mm-dd',
};

const NARROW_SPACE = '\u202f';
const MINUS = '\u2212';

const THOUSANDS: Readonly<Record<NumberFormat['thousands'], string>> = {
  'narrow-space': NARROW_SPACE,
  comma: ',',
  point: '.',
  apostrophe: '’',
  none: '',
};

const MINUS_SIGNS: Readonly<Record<NumberFormat['minus'], string>> = { minus: MINUS, hyphen: '-' };

const NUMBER = /(\d+(?:\u202f\d{3})*)(?:\.(\d+))?/g;

/** True where one sign would both divide thousands and begin decimals, so that a reader cannot tell 1,234 from 1,234. */
export function signsCollide({ decimalMark, thousands }: NumberFormat): boolean {
  return THOUSANDS[thousands] === decimalMark;
}

/**
 * Printed figures as a language writes them: "1 234.5" is "1.234,5", "−2.5" is "-2,5"; "<1", "23–25" and "4.1 %" keep
 * their other signs. Digits are never changed. Where one sign would stand for thousands and decimals, thousands keep
 * their narrow space.
 */
export function inLanguage(printed: string, numbers: NumberFormat): string {
  const thousands = signsCollide(numbers) ? NARROW_SPACE : THOUSANDS[numbers.thousands];
  return printed
    .replace(NUMBER, (_, whole: string, decimals?: string) => {
      const grouped = whole.replaceAll(NARROW_SPACE, thousands);
      return decimals === undefined ? grouped : `${grouped}${numbers.decimalMark}${decimals}`;
    })
    .replaceAll(MINUS, MINUS_SIGNS[numbers.minus]);
}

/** A date yyyy-mm-dd in the order chosen; any other text as it is. */
export function dateInLanguage(date: string, { dateOrder }: NumberFormat): string {
  const [, year = '', month = '', day = ''] = /^(\d{4})-(\d{2})-(\d{2})$/.exec(date) ?? [];
  if (year === '') return date;
  return dateOrder.replace('yyyy', year).replace('mm', month).replace('dd', day);
}

const OF_THE_CONTINENT = { decimalMark: ',', thousands: 'narrow-space', minus: 'minus' } as const;

const USUAL: Readonly<Record<ShippedWords, NumberFormat>> = {
  en: ENGLISH_NUMBERS,
  de: { ...OF_THE_CONTINENT, dateOrder: 'dd.mm.yyyy' },
  es: { ...OF_THE_CONTINENT, dateOrder: 'dd/mm/yyyy' },
  fr: { ...OF_THE_CONTINENT, dateOrder: 'dd/mm/yyyy' },
};

/**
 * How numbers and dates are usually written in a language: decimal mark and order of the date as in the Unicode CLDR; a
 * narrow space between thousands, which no reader takes for a decimal mark (ISO 80000-1), in all of them.
 */
export function usualNumbers(words: ShippedWords): NumberFormat {
  return USUAL[words];
}
