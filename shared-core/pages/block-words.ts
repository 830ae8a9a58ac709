import { ENGLISH_BLOCKS } from '../languages/english/blocks.ts';
import type { PrintWords } from '../languages/phrases.ts';
import { filledParts, type PlaceholdersOf } from '../languages/placeholders.ts';

/** The words of a booklet; those of its blocks are English in all of them. */
export type BlockWords = PrintWords;
export type BlockWord = keyof typeof ENGLISH_BLOCKS;

/** What a phrase needs: a printed text for each of its placeholders. */
type ValuesFor<Key extends BlockWord> = [PlaceholdersOf<(typeof ENGLISH_BLOCKS)[Key]>] extends [never]
  ? []
  : [Readonly<Record<PlaceholdersOf<(typeof ENGLISH_BLOCKS)[Key]>, string>>];

/** A phrase of the blocks as it is printed. */
export function say<Key extends BlockWord>(_: BlockWords, key: Key, ...values: ValuesFor<Key>): string {
  return filledParts(ENGLISH_BLOCKS[key], values[0] ?? {})
    .map(({ text }) => text)
    .join('');
}
