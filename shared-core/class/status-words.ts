import type { PupilStatus } from './class-list.ts';
import { foldedText } from './list-text.ts';

/**
 * The only words that are taken for a status without a question. A lone "a" or "x" is none of them, since it may be a
 * mark; neither is a dash, which says that there is nothing, but not why.
 */
const WORDS: Readonly<Record<PupilStatus, readonly string[]>> = {
  tested: ['tested', 'present', 'anwesend', 'presente', 'présent', 'présente'],
  absent: ['absent', 'abs', 'abs.', 'absente', 'abwesend', 'ausente'],
  'not-tested': ['not tested', 'not-tested', 'n/t', 'nt', 'nicht getestet', 'non testé', 'non testée', 'no evaluado'],
  excused: ['excused', 'exc', 'exc.', 'ex', 'ex.', 'entschuldigt', 'excusé', 'excusée'],
};

const STATUS_OF = new Map(
  Object.entries(WORDS).flatMap(([status, words]) => words.map((word) => [foldedText(word), status as PupilStatus])),
);

/** The status that a text names exactly, but for its case; null for any other text. */
export function statusWord(text: string): PupilStatus | null {
  return STATUS_OF.get(foldedText(text)) ?? null;
}

/** True for a text that says that there is nothing: empty, dashes, points or question marks alone. */
export function saysNothing(text: string): boolean {
  return /^[\s\-\u2010-\u2015\u2212._?*]*$/.test(text);
}
