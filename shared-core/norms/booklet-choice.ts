import { blocksIn, BLOCK_KINDS, prints, type BlockKind, type BookletBlock } from './booklet-blocks.ts';
import type { SheetChoices } from './norm-project.ts';

/** What a booklet amounts to: the tables alone, every block, some of them, or none. */
export type BookletExtent = 'tables' | 'whole' | 'own' | 'nothing';

export function bookletExtent(sheet: SheetChoices): BookletExtent {
  const printed = BLOCK_KINDS.filter((kind) => prints(sheet, kind));
  if (printed.length === 0) return 'nothing';
  if (printed.length === BLOCK_KINDS.length) return 'whole';
  return printed.length === 1 && printed[0] === 'tables' ? 'tables' : 'own';
}

/** How many blocks are printed. */
export function printedBlocks({ blocks }: Pick<SheetChoices, 'blocks'>): number {
  return blocks.filter(({ printed }) => printed).length;
}

/** The sheet with the tables alone, or with every block; order, headings and texts stay as they are. */
export function withExtent(sheet: SheetChoices, extent: 'tables' | 'whole'): SheetChoices {
  return mapBlocks(sheet, (block) => ({ ...block, printed: extent === 'whole' || block.kind === 'tables' }));
}

/** The sheet with one block changed. */
export function withBlock(
  sheet: SheetChoices,
  kind: BlockKind,
  change: Partial<Omit<BookletBlock, 'kind'>>,
): SheetChoices {
  return mapBlocks(sheet, (block) => (block.kind === kind ? { ...block, ...change } : block));
}

/** The sheet with a block taken out and put in at a place among all, 0 for the first. Places beyond an end mean that end. */
export function withBlockAt(sheet: SheetChoices, kind: BlockKind, place: number): SheetChoices {
  const all = blocksIn(sheet);
  const moved = all.filter((block) => block.kind === kind);
  const others = all.filter((block) => block.kind !== kind);
  const at = Math.max(0, Math.min(others.length, place));
  return { ...sheet, blocks: [...others.slice(0, at), ...moved, ...others.slice(at)] };
}

/** Whether the blocks stand in the usual order. */
export function inUsualOrder(sheet: SheetChoices): boolean {
  return blocksIn(sheet).every(({ kind }, place) => BLOCK_KINDS[place] === kind);
}

/** The sheet with all blocks in the usual order. */
export function withUsualOrder(sheet: SheetChoices): SheetChoices {
  const all = blocksIn(sheet);
  return { ...sheet, blocks: BLOCK_KINDS.flatMap((kind) => all.filter((block) => block.kind === kind)) };
}

function mapBlocks(sheet: SheetChoices, change: (block: BookletBlock) => BookletBlock): SheetChoices {
  return { ...sheet, blocks: blocksIn(sheet).map(change) };
}
