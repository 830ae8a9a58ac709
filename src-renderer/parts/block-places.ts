import type { BlockKind } from '../../shared-core/norms/booklet-blocks.ts';
import type { BookletSection } from '../../shared-core/pages/booklet-sections.ts';

/** The pages that a block takes, the first one being 1. */
export interface BlockPlaces {
  readonly first: number;
  readonly last: number;
}

/** Where a block stands in the drawn booklet; null where it takes no page. */
export function pagesOf(sections: readonly BookletSection[], kind: BlockKind): BlockPlaces | null {
  const own = sections.filter(({ block }) => block === kind);
  const [first, last] = [own[0], own.at(-1)];
  return first === undefined || last === undefined ? null : { first: first.page, last: last.page + last.pages - 1 };
}

/** "page 4", "pages 4–6" */
export function pagesInWords({ first, last }: BlockPlaces): string {
  return first === last ? `page ${first}` : `pages ${first}–${last}`;
}
