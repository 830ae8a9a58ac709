import type { BlockKind } from '../norms/booklet-blocks.ts';
import type { ColumnKey } from '../norms/column-keys.ts';
import type { TextRole } from './text-role.ts';
import type { FontFace } from './text-width.ts';

/**
 * Something printed as placed pages. Lengths are in points (1/72 inch), x from the left edge of the paper, y from its
 * top. Text is broken into lines here, so that whatever draws the pages only draws.
 */
export interface PlacedPages {
  readonly title: string;
  readonly paper: Paper;
  readonly pages: readonly PlacedPage[];
  /** What had to be set otherwise than asked, as sentences that tell what to do. */
  readonly remarks: readonly string[];
}

export interface Booklet extends PlacedPages {
  readonly pages: readonly BookletPage[];
}

export interface Paper {
  readonly width: number;
  readonly height: number;
  /** White space at the sides. */
  readonly margin: number;
  /** White space above the head and below the foot. */
  readonly edge: number;
  /** More of it at the edge that is bound: left on odd pages, right on even ones. */
  readonly gutter: number;
}

export interface PlacedPage {
  /** 1 for the first. */
  readonly number: number;
  /** "Table 2 · Grade 5", or the heading of a block, where one begins; null on its further pages. */
  readonly opens: string | null;
  readonly blocks: readonly Block[];
}

export interface BookletPage extends PlacedPage {
  /** The block of the booklet that it belongs to; null for a page left blank. */
  readonly block: BlockKind | null;
  /** Position of the group in the norm set; null where it belongs to no single one. */
  readonly group: number | null;
}

export type Block = TextLine | Rule | Picture | TableColumnBlock;

export interface TextRun {
  readonly text: string;
  readonly face: FontFace;
}

export type Colour = 'ink' | 'soft';

/** One line of text. It never needs more than its width. */
export interface TextLine {
  readonly kind: 'text';
  readonly x: number;
  readonly baseline: number;
  readonly width: number;
  readonly align: 'left' | 'right';
  readonly size: number;
  readonly colour: Colour;
  readonly runs: readonly TextRun[];
  readonly role: TextRole;
}

export interface Rule {
  readonly kind: 'rule';
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly weight: number;
}

export interface Picture {
  readonly kind: 'picture';
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
  readonly svg: string;
  /** The picture in words and numbers. */
  readonly alt: string;
}

/** One column of a conversion table: heads, rules, and a row for each score in it. */
export interface TableColumnBlock {
  readonly kind: 'table-column';
  readonly x: number;
  readonly width: number;
  /** The rules above the heads, below them, and below the last line that any column of the table could hold. */
  readonly top: number;
  readonly headRule: number;
  readonly bottom: number;
  readonly size: number;
  /** True where the heads of the same table stand before it already. */
  readonly continued: boolean;
  readonly heads: readonly TableHead[];
  readonly rows: readonly PlacedRow[];
}

export interface TableHead {
  readonly key: ColumnKey | 'score' | 'rank';
  readonly lines: readonly string[];
  /** Figures and heads end here. */
  readonly right: number;
  /** Room from the column before it. */
  readonly width: number;
  /** Where the cells are ranges aligned on their dashes: room for the dash and for what stands behind it. */
  readonly range: { readonly dash: number; readonly after: number } | null;
}

export interface PlacedRow {
  /** Raw-score points. */
  readonly score: number;
  readonly baseline: number;
  /** One text for each head. */
  readonly texts: readonly string[];
  /** True where the rank was adjusted by hand: a mark hangs behind it. */
  readonly adjusted: boolean;
}
