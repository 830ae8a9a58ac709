/** A tag of a language as BCP 47 writes it, without its rarer parts: "de", "fr-CA", "es-419". */
export const LANGUAGE_TAG = /^[A-Za-z]{2,3}(-[A-Za-z0-9]{2,8})*$/;

/** Why a text is no tag of a language, in a sentence that tells what to do; null when it is one. */
export function languageTagProblem(tag: string): string | null {
  return LANGUAGE_TAG.test(tag)
    ? null
    : 'The tag of a language is two or three letters, and what tells it apart behind hyphens: de, fr-CA, es-419.';
}
