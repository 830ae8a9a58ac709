import { vi } from 'vitest';
import type { NormSet } from '../../../../shared-core/norms/norm-set.ts';
import type { Block, Booklet, TableColumnBlock } from '../../../../shared-core/pages/booklet.ts';

const COMPOSER = '../../../../shared-core/pages/booklet-pages.ts';

/** Draws a booklet that was composed wrongly in the place of the right one. */
export type Misprinter = (booklet: Booklet, normSet: NormSet) => Promise<Uint8Array>;

/** The press with its composer taken out; what reads back keeps the right one. */
export async function misprinter(): Promise<Misprinter> {
  const held: { booklet: Booklet | null } = { booklet: null };
  vi.resetModules();
  vi.doMock(COMPOSER, () => ({ composeBooklet: () => held.booklet }));
  try {
    const { bookletPdf } = await import('../../../../src-main/press/booklet-pdf.ts');
    return async (booklet, normSet) => {
      held.booklet = booklet;
      return (await bookletPdf(normSet)).pdf;
    };
  } finally {
    vi.doUnmock(COMPOSER);
    vi.resetModules();
  }
}

/** The booklet with other blocks in the place of some. */
export function withBlocks(booklet: Booklet, change: (block: Block, page: number) => readonly Block[]): Booklet {
  return {
    ...booklet,
    pages: booklet.pages.map((page) => ({
      ...page,
      blocks: page.blocks.flatMap((block) => change(block, page.number)),
    })),
  };
}

/** The booklet with other columns of rows of a table. */
export function withColumns(
  booklet: Booklet,
  table: TableColumnBlock['table'],
  change: (column: TableColumnBlock, page: number) => TableColumnBlock,
): Booklet {
  return withBlocks(booklet, (block, page) =>
    block.kind === 'table-column' && block.table === table ? [change(block, page)] : [block],
  );
}

/** The same block with a glyph of it changed, for every glyph that it has and that is another one. */
export function misprintsOf(block: Block, glyph: string): readonly Block[] {
  switch (block.kind) {
    case 'text':
      return block.runs.flatMap((run, index) =>
        changedTexts(run.text, glyph).map((text) => ({ ...block, runs: block.runs.with(index, { ...run, text }) })),
      );
    case 'table-column':
      return [
        ...block.heads.flatMap((head, index) =>
          head.lines.flatMap((line, at) =>
            changedTexts(line, glyph).map((text) => ({
              ...block,
              heads: block.heads.with(index, { ...head, lines: head.lines.with(at, text) }),
            })),
          ),
        ),
        ...block.rows.flatMap((row, index) =>
          row.cells.flatMap((cell, at) =>
            changedTexts(cell.text, glyph).map((text) => ({
              ...block,
              rows: block.rows.with(index, { ...row, cells: row.cells.with(at, { ...cell, text }) }),
            })),
          ),
        ),
      ];
    case 'picture':
      return [...block.svg.matchAll(/>([^<]+)<\/text>/g)].flatMap(({ 1: words = '', index }) =>
        changedTexts(words, glyph).map((text) => ({
          ...block,
          svg: `${block.svg.slice(0, index + 1)}${text}${block.svg.slice(index + 1 + words.length)}`,
        })),
      );
    case 'rule':
      return [];
  }
}

function changedTexts(text: string, glyph: string): readonly string[] {
  return [...text].flatMap((character, index, all) =>
    /\s/.test(character) || character === glyph ? [] : [all.with(index, glyph).join('')],
  );
}
