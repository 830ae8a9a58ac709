import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  dateInLanguage,
  ENGLISH_NUMBERS,
  inLanguage,
  signsCollide,
  usualNumbers,
  type NumberFormat,
} from '../../../shared-core/languages/number-format.ts';
import { printCount, printNumber, printRatio, printShare } from '../../../shared-core/scores/printed-number.ts';

const german = usualNumbers('de');

const format: fc.Arbitrary<NumberFormat> = fc
  .record({
    decimalMark: fc.constantFrom('.', ','),
    thousands: fc.constantFrom('narrow-space', 'comma', 'point', 'apostrophe', 'none'),
    minus: fc.constantFrom('minus', 'hyphen'),
    dateOrder: fc.constantFrom('yyyy-mm-dd', 'dd.mm.yyyy', 'dd/mm/yyyy', 'mm/dd/yyyy'),
  } as const)
  .map((made) => made);

/** Texts as tables hold them: counts, numbers, ranks with their signs, ranges, shares, a dash. */
const number = fc
  .tuple(fc.double({ min: -99_999, max: 99_999, noNaN: true }), fc.integer({ min: 0, max: 4 }))
  .map(([value, decimals]) => printNumber(value, decimals));
const printed = fc.oneof(
  number,
  fc.nat({ max: 9_999_999 }).map(printCount),
  fc.double({ min: 0, max: 1, noNaN: true }).map(printShare),
  fc.constantFrom('<1', '>99', '<0.1', '>99.9', '–', ''),
  fc.tuple(number, number).map(([low, high]) => `${low}–${high}`),
);

/** The figures as English writes them again, where thousands and decimals have signs of their own. */
function inEnglish(text: string, { decimalMark, thousands, minus }: NumberFormat): string {
  const signs = { 'narrow-space': '\u202f', comma: ',', point: '.', apostrophe: '’', none: '' } as const;
  const thousand = signs[thousands];
  const bare = thousand === '' ? text : text.replaceAll(thousand, '|');
  return bare
    .replaceAll(decimalMark, '.')
    .replaceAll('|', '\u202f')
    .replaceAll(minus === 'hyphen' ? '-' : '\u2212', '\u2212');
}

const digitsOf = (text: string): string => text.replace(/\D/g, '');

describe('printed figures in a language', () => {
  it.each([
    ['1\u202f234.5', '1\u202f234,5'],
    ['−2.5', '−2,5'],
    ['<1', '<1'],
    ['>99.9', '>99,9'],
    ['23–25', '23–25'],
    ['−2.5–−1.0', '−2,5–−1,0'],
    ['4.1\u00a0%', '4,1\u00a0%'],
    ['–', '–'],
    ['3/8', '3/8'],
  ])('%s is %s in German', (english, expected) => {
    expect(inLanguage(english, german)).toBe(expected);
  });

  it.each([
    [{ thousands: 'point', decimalMark: ',' }, '1.234.567,89'],
    [{ thousands: 'comma', decimalMark: '.' }, '1,234,567.89'],
    [{ thousands: 'apostrophe', decimalMark: '.' }, '1’234’567.89'],
    [{ thousands: 'none', decimalMark: ',' }, '1234567,89'],
  ] as const)('divide thousands as chosen: %o', (chosen, expected) => {
    expect(inLanguage('1\u202f234\u202f567.89', { ...german, ...chosen })).toBe(expected);
  });

  it('keep the narrow space where one sign would stand for thousands and decimals', () => {
    for (const chosen of [
      { thousands: 'point', decimalMark: '.' },
      { thousands: 'comma', decimalMark: ',' },
    ] as const) {
      const numbers = { ...german, ...chosen };
      expect(signsCollide(numbers)).toBe(true);
      expect(inLanguage('1\u202f234.5', numbers)).toBe(`1\u202f234${chosen.decimalMark}5`);
    }
    expect(signsCollide(german)).toBe(false);
  });

  it('are those of English in English', () => {
    fc.assert(fc.property(printed, (text) => inLanguage(text, ENGLISH_NUMBERS) === text));
    fc.assert(fc.property(fc.string(), (text) => inLanguage(text, ENGLISH_NUMBERS) === text));
  });

  it('have the same digits in every language', () => {
    fc.assert(fc.property(printed, format, (text, numbers) => digitsOf(inLanguage(text, numbers)) === digitsOf(text)));
    fc.assert(
      fc.property(fc.string(), format, (text, numbers) => digitsOf(inLanguage(text, numbers)) === digitsOf(text)),
    );
  });

  it('can be read back, unless thousands are not divided at all', () => {
    fc.assert(
      fc.property(printed, format, (text, numbers) => {
        fc.pre(!signsCollide(numbers) && numbers.thousands !== 'none');
        expect(inEnglish(inLanguage(text, numbers), numbers)).toBe(text);
      }),
    );
  });

  it('hold one decimal mark, that of the language, for each of the English ones', () => {
    const decimals = fc
      .bigInt({ min: 0n, max: 10n ** 9n })
      .map((units) => printRatio({ numerator: units, denominator: 1000n }, 2));
    fc.assert(
      fc.property(decimals, (text) => {
        expect(inLanguage(text, german)).toMatch(/^[\d\u202f]+,\d\d$/);
      }),
    );
  });
});

describe('dates in a language', () => {
  it.each([
    ['yyyy-mm-dd', '2024-06-03'],
    ['dd.mm.yyyy', '03.06.2024'],
    ['dd/mm/yyyy', '03/06/2024'],
    ['mm/dd/yyyy', '06/03/2024'],
  ] as const)('stand in the order %s', (dateOrder, expected) => {
    expect(dateInLanguage('2024-06-03', { ...german, dateOrder })).toBe(expected);
  });

  it('stay as they are where they are none', () => {
    for (const text of ['', '2024', 'June 2024', '2024-06-03 10:00']) expect(dateInLanguage(text, german)).toBe(text);
  });
});

// Decimal comma and the order of day, month and year: Unicode CLDR, charts of numbers and dates for de, es and fr. A
// space between groups of three digits: ISO 80000-1. yyyy-mm-dd: ISO 8601.
describe('the usual numbers of a language', () => {
  it.each([
    ['en', '1\u202f234.5', '2024-06-03'],
    ['de', '1\u202f234,5', '03.06.2024'],
    ['es', '1\u202f234,5', '03/06/2024'],
    ['fr', '1\u202f234,5', '03/06/2024'],
  ] as const)('%s', (words, figures, date) => {
    expect(inLanguage('1\u202f234.5', usualNumbers(words))).toBe(figures);
    expect(dateInLanguage('2024-06-03', usualNumbers(words))).toBe(date);
  });
});
