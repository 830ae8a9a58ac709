import type { BlockKind } from '../norms/booklet-blocks.ts';
import type { BookletPage } from './booklet.ts';

/** Pages of a booklet that stand together: a block, or the sheet of a group. */
export interface BookletSection {
  readonly block: BlockKind;
  /** "Table 2 · Grade 5", the heading of a block; null where it has none. */
  readonly name: string | null;
  /** Its first page, 1 for the first of the booklet. */
  readonly page: number;
  readonly pages: number;
}

/** The sections of a booklet in print order; blank pages belong to none. */
export function bookletSections(
  pages: readonly Pick<BookletPage, 'number' | 'block' | 'opens'>[],
): readonly BookletSection[] {
  const sections: BookletSection[] = [];
  for (const { number, block, opens } of pages) {
    const last = sections.at(-1);
    if (block === null) continue;
    if (opens === null && last?.block === block) {
      sections[sections.length - 1] = { ...last, pages: last.pages + 1 };
    } else {
      sections.push({ block, name: opens, page: number, pages: 1 });
    }
  }
  return sections;
}
