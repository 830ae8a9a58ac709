import { describe, expect, it } from 'vitest';
import { languageTagProblem } from '../../../shared-core/languages/language-tag.ts';
import { listedPhrases, phrasesFound, withPhrase } from '../../../shared-core/languages/own-phrases.ts';
import { PHRASE_KEYS, printWords, shippedPhrases } from '../../../shared-core/languages/phrases.ts';
import { ENGLISH_LANGUAGE } from '../../../shared-core/norms/sheet-schema.ts';

const english = ENGLISH_LANGUAGE;
const german = { ...english, words: 'de' } as const;
const PAGE = 'foot.page';

describe('the list of printed words', () => {
  it('holds every phrase once, with what ships for the language', () => {
    for (const language of [english, german]) {
      const listed = listedPhrases(language);
      expect(listed.map(({ key }) => key)).toEqual(PHRASE_KEYS);
      expect(Object.fromEntries(listed.map(({ key, shipped }) => [key, shipped]))).toEqual(
        shippedPhrases(language.words),
      );
      expect(listed.every(({ own, problem }) => own === null && problem === null)).toBe(true);
    }
  });

  it('tells the user’s words, why some of them do not print, and those without a place', () => {
    const own = [
      { key: PAGE, text: 'leaf {page} of {pages}' },
      { key: 'head.draft', text: ' ' },
      { key: 'of.an.earlier.version', text: 'Words' },
    ];
    const listed = listedPhrases({ ...english, phrases: own });
    const of = (key: string): unknown => listed.find((phrase) => phrase.key === key);
    expect(of(PAGE)).toMatchObject({ own: 'leaf {page} of {pages}', problem: null });
    expect(of('head.draft')).toMatchObject({ own: ' ', problem: expect.stringContaining('is empty') });
    expect(listed.at(-1)).toMatchObject({ key: 'of.an.earlier.version', shipped: '', own: 'Words' });
    expect(listed.at(-1)?.problem).toContain('Remove it.');
  });

  it('is searched in keys, shipped and own words, all words of the question together', () => {
    const listed = listedPhrases(withPhrase(english, PAGE, 'Leaf {page} of {pages}'));
    const keys = (question: string): readonly string[] => phrasesFound(listed, question).map(({ key }) => key);
    expect(keys('')).toEqual(PHRASE_KEYS);
    expect(keys('LEAF')).toEqual([PAGE]);
    expect(keys('foot page')).toContain(PAGE);
    expect(keys('draft')).toContain('head.draft');
    expect(keys('leaf draft')).toEqual([]);
  });
});

describe('a phrase in the user’s own words', () => {
  it('prints, is replaced, and gives way to the shipped words again', () => {
    const first = withPhrase(german, PAGE, 'Blatt {page} ({pages})');
    expect(printWords(first).phrases[PAGE]).toBe('Blatt {page} ({pages})');
    expect(first.tag).toBe(german.tag);
    const second = withPhrase(first, PAGE, 'Blatt {page}/{pages}');
    expect(second.phrases).toEqual([{ key: PAGE, text: 'Blatt {page}/{pages}' }]);
    expect(withPhrase(second, PAGE, null).phrases).toEqual([]);
    expect(withPhrase(second, PAGE, shippedPhrases('de')[PAGE]).phrases).toEqual([]);
    expect(withPhrase(second, 'head.draft', 'Probe').phrases).toHaveLength(2);
  });
});

describe('the tag of a language', () => {
  it('is letters, and parts behind hyphens', () => {
    for (const tag of ['de', 'de-CH', 'es-419', 'gsw', 'zh-Hant-TW']) expect(languageTagProblem(tag)).toBeNull();
    for (const tag of ['', 'd', 'german', 'de_CH', 'de-', '-de', 'de CH', 'de-abcdefghi'])
      expect(languageTagProblem(tag)).toContain('two or three letters');
  });
});
