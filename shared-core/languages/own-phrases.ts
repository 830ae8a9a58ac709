import { PHRASE_KEYS, phraseProblem, shippedPhrases, type LanguageChoice } from './phrases.ts';

/** A printed phrase with what ships and what the user put over it. */
export interface ListedPhrase {
  readonly key: string;
  /** Empty for a key that this version of the program does not know. */
  readonly shipped: string;
  /** Null where the shipped words print. */
  readonly own: string | null;
  /** Why the user's words do not print; null where they do or where there are none. */
  readonly problem: string | null;
}

/** All phrases of a language in their order; behind them those of the user that no longer have a place. */
export function listedPhrases(language: LanguageChoice): readonly ListedPhrase[] {
  const own = new Map(language.phrases.map(({ key, text }) => [key, text]));
  const shipped = shippedPhrases(language.words);
  const known = new Set<string>(PHRASE_KEYS);
  const placeless = [...own.keys()].filter((key) => !known.has(key));
  const problemOf = (key: string): string | null => {
    const text = own.get(key);
    return text === undefined ? null : phraseProblem(key, text);
  };
  return [
    ...PHRASE_KEYS.map((key) => ({ key, shipped: shipped[key], own: own.get(key) ?? null, problem: problemOf(key) })),
    ...placeless.map((key) => ({ key, shipped: '', own: own.get(key) ?? null, problem: problemOf(key) })),
  ];
}

/** The phrases that hold every word of a question in their key, their shipped or their own words; all for none. */
export function phrasesFound(phrases: readonly ListedPhrase[], question: string): readonly ListedPhrase[] {
  const asked = question.toLowerCase().split(/\s+/);
  return phrases.filter(({ key, shipped, own }) => {
    const text = `${key} ${shipped} ${own ?? ''}`.toLowerCase();
    return asked.every((word) => text.includes(word));
  });
}

/** The language with a phrase said in the user's own words; with null, or the shipped words, these print again. */
export function withPhrase<L extends LanguageChoice>(language: L, key: string, text: string | null): L {
  const others = language.phrases.filter((phrase) => phrase.key !== key);
  const shipped: string | undefined = Object.entries(shippedPhrases(language.words)).find(
    ([known]) => known === key,
  )?.[1];
  const phrases = text === null || text === shipped ? others : [...others, { key, text }];
  return { ...language, phrases };
}
