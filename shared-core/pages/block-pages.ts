import type { BookletBlock } from '../norms/booklet-blocks.ts';
import type { NormSet } from '../norms/norm-set.ts';
import type { Block } from './booklet.ts';
import type { BlockWords } from './block-words.ts';
import type { PageFrame } from './page-frame.ts';

/** What a block of the booklet is made from. */
export interface BlockContext {
  readonly normSet: NormSet;
  /** As the user chose it: an empty heading or text stands for the standing one. */
  readonly block: BookletBlock;
  /** The heading as it is printed. */
  readonly heading: string;
  readonly frame: PageFrame;
  readonly words: BlockWords;
  /** Version of the program that presses; null where it is not told. */
  readonly programVersion: string | null;
}

export interface BlockBody {
  /** What stands on each page besides head and foot; a block without pages is not printed at all. */
  readonly pages: readonly (readonly Block[])[];
  /** What had to be set otherwise than asked, as sentences that tell what to do. */
  readonly remarks: readonly string[];
}

/** A block of the booklet from its heading to its last page. */
export type BlockPages = (context: BlockContext) => BlockBody;
