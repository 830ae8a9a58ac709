import { ENGLISH_WORDS, figure, say } from '../languages/phrases.ts';
import type { ConversionRow } from './conversion-table.ts';
import type { GroupNorms } from './group-norms.ts';

/** Stands behind every printed rank that was changed by hand. */
export const ADJUSTED_MARK = '†';

/** The printed rank of a row, with the mark where it was changed by hand. */
export function markedRank({ printed, adjusted }: Pick<ConversionRow, 'printed' | 'adjusted'>): string {
  return adjusted === null ? printed : `${printed}${ADJUSTED_MARK}`;
}

/**
 * What was changed by hand in a group's table, as it is printed under it; null where nothing was.
 * "† Adjusted by hand: raw 31 from 84 to 85 (reason; who)."
 */
export function adjustmentNote({ rows }: GroupNorms, words = ENGLISH_WORDS): string | null {
  const changes = rows.flatMap(({ scoreText, printed, adjusted }) => {
    if (adjusted === null) return [];
    const { reason, by } = adjusted;
    const [score, from, to] = [scoreText, adjusted.from, printed].map((text) => figure(words, text));
    return [say(words, 'adjusted.change', { score: score ?? '', from: from ?? '', to: to ?? '', reason, by })];
  });
  if (changes.length === 0) return null;
  return say(words, 'adjusted.note', { mark: ADJUSTED_MARK, changes: changes.join('; ') });
}
