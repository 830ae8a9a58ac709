import type { PrintWords } from './phrases.ts';

/**
 * "Grade" as it stands inside a sentence; abbreviations stay as they are, and so does whatever is printed in German, where
 * nouns keep their capital.
 */
export function inSentence({ words }: PrintWords, text: string): string {
  return words !== 'de' && /^\p{Lu}\p{Ll}/u.test(text) ? text.charAt(0).toLowerCase() + text.slice(1) : text;
}

/** A text that begins with a capital. */
export function asSentence(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
