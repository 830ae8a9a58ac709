import { describe, expect, it } from 'vitest';
import { PHRASE_KEYS, shippedPhrases } from '../../../shared-core/languages/phrases.ts';
import { standingTexts } from '../../../shared-core/languages/standing-texts.ts';
import { composeBooklet } from '../../../shared-core/pages/booklet-pages.ts';
import { missingCharacters, type FontFace } from '../../../shared-core/pages/text-width.ts';
import { cellsOf, EVERY_KIND, printedFigures, textsOf, wordlessSet } from './booklets-in-languages.ts';

const OTHERS = ['de', 'es', 'fr'] as const;

/** English words that none of the other languages has. */
const ENGLISH =
  'the of and to with from by is was were where that this these than which whose how it its not at or below above lowest ' +
  'highest raw rank ranks scores people pupils candidates smoothed check lower upper mean between drawn one each their ' +
  'counted below norm group sample method figure observed percentile error measurement standard nothing blank value ' +
  'degree fit beware everybody all draft continued edition could printed halves held';
/** Words of that list that the other language has as well. */
const SHARED = { de: ['standard', 'was'], es: ['error'], fr: ['figure', 'scores'] } as const;

const englishIn = (language: keyof typeof SHARED): RegExp => {
  const shared: readonly string[] = SHARED[language];
  const words = ENGLISH.split(' ').filter((word) => !shared.includes(word));
  return new RegExp(`(?<!\\p{L})(?:${words.join('|')})(?!\\p{L})`, 'iu');
};

describe.each(OTHERS)('a booklet in %s', (words) => {
  const english = englishIn(words);

  it.each(EVERY_KIND)('has no English word: %s', (_, change) => {
    const texts = textsOf(composeBooklet(wordlessSet(words, change)));
    expect(texts.length).toBeGreaterThan(100);
    expect(texts.filter((text) => english.test(text))).toEqual([]);
  });

  it.each(EVERY_KIND)('has decimal commas and no decimal point: %s', (_, change) => {
    const normSet = wordlessSet(words, change);
    const cells = cellsOf(composeBooklet(normSet));
    expect(cells).toEqual(printedFigures(normSet));
    expect(cells.filter((cell) => /\d,\d/.test(cell)).length).toBeGreaterThan(10);
    const texts = textsOf(composeBooklet(normSet)).filter((text) => !text.includes('Ostrey'));
    const withoutDates = texts.map((text) => text.replace(/\d\d\.\d\d\.\d{4}|(?<=ersi[oó]n )1\.1/g, ''));
    expect(withoutDates.filter((text) => /\d\.\d/.test(text))).toEqual([]);
  });

  it.each(EVERY_KIND)('has the digits of the English one: %s', (_, change) => {
    const digits = (language: 'en' | typeof words): readonly string[] =>
      cellsOf(composeBooklet(wordlessSet(language, change))).map((cell) => cell.replace(/\D/g, ''));
    expect(digits(words)).toEqual(digits('en'));
  });

  it('is marked with its language', () => {
    expect(composeBooklet(wordlessSet(words, (project) => project)).language).toBe(words);
  });
});

describe('an English booklet', () => {
  it('would be found out', () => {
    const texts = textsOf(composeBooklet(wordlessSet('en', (project) => project)));
    for (const words of OTHERS) expect(texts.filter((text) => englishIn(words).test(text)).length).toBeGreaterThan(20);
  });
});

describe('the typefaces', () => {
  const faces: readonly FontFace[] = ['sans', 'sans-bold', 'serif-bold', 'serif-italic'];

  it.each(['en', ...OTHERS] as const)('have every sign of the words in %s', (words) => {
    const all = [...PHRASE_KEYS.map((key) => shippedPhrases(words)[key]), ...Object.values(standingTexts(words))];
    for (const face of faces) expect(missingCharacters(all.join(''), face)).toEqual([]);
  });

  it('have the letters of all four languages, their quotation marks and spaces', () => {
    for (const face of faces) {
      expect(missingCharacters('äöüßÄÖÜẞéèêëàâçîïôùûœæÉÈÀÇŒñÑáíóúü¿¡«»„“”‚‘’–—…−†º', face)).toEqual([]);
    }
  });
});
