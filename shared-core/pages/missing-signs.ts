import type { PlacedPages } from './booklet.ts';
import { missingCharacters } from './text-width.ts';

const MOST_TOLD = 12;

/** That the typefaces lack signs of the printed texts, as a sentence that tells what to do; none where they have all. */
export function missingSignsRemark(pages: PlacedPages['pages']): readonly string[] {
  const missing = new Set(
    pages.flatMap(({ blocks }) =>
      blocks.flatMap((block) =>
        block.kind === 'text' ? block.runs.flatMap(({ text, face }) => missingCharacters(text, face)) : [],
      ),
    ),
  );
  if (missing.size === 0) return [];
  return [
    `The typefaces have no sign for ${[...missing].slice(0, MOST_TOLD).join(' ')}; boxes print instead. ` +
      'Write those words in Latin, Greek or Cyrillic letters.',
  ];
}
