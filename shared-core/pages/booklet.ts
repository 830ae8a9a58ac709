import type { BlockKind } from '../norms/booklet-blocks.ts';
import type { TextRole } from './text-role.ts';
import type { FontFace } from './text-width.ts';
import type { TypeSize } from './type-sizes.ts';

/**
 * Something printed as placed pages. Lengths are in points (1/72 inch), x from the left edge of the paper, y from its
 * top. Text is broken into lines here, so that whatever draws the pages only draws.
 */
export interface PlacedPages {
  readonly title: string;
  /** Tag of the language (BCP 47). */
  readonly language: string;
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

/** One column of rows of a table: heads, rules, and its rows. */
export interface TableColumnBlock {
  readonly kind: 'table-column';
  readonly table: ColumnTable;
  readonly x: number;
  readonly width: number;
  /** The rules above the heads, below them, and below the last line that any column of the table could hold. */
  readonly top: number;
  readonly headRule: number;
  readonly bottom: number;
  /** Size of the figures, and of the heads with their leading. */
  readonly size: number;
  readonly headType: TypeSize;
  readonly heads: readonly TableHead[];
  readonly rows: readonly PlacedRow[];
  /** Rules between rows that mark cuts. */
  readonly cutRules: readonly number[];
}

/** Tables that are set in columns of rows. In a conversion table each raw score of its group stands once. */
export type ColumnTable = 'conversion' | 'groups-across' | 'inverse-across' | `cuts ${number}`;

export interface TableHead {
  /** Which column of its whole table it heads, 0 for the heads of rows; further parts of a table have other columns. */
  readonly column: number;
  readonly lines: readonly string[];
  /** A line in lighter type below them; empty for none. */
  readonly note: string;
  /** How the whole head is read aloud, where its lines would not say it. */
  readonly said: string | null;
  /** What of the column is printed once more, standing in the table already. */
  readonly repeated: 'nothing' | 'head' | 'column';
  /** Words begin at the left edge of their room, figures end at its right. */
  readonly align: 'left' | 'right';
  /** Figures and heads end here, from the left edge of the block. */
  readonly right: number;
  /** Room from the column before it. */
  readonly width: number;
  /** Where the cells are ranges aligned on their dashes: room for the dash and for what stands behind it. */
  readonly range: { readonly dash: number; readonly after: number } | null;
}

export interface PlacedRow {
  /** Tells the rows of a whole table apart: the raw score, the first of several, or the place in the table. */
  readonly row: number;
  /** Raw scores that it stands for, lowest first; none where rows are not headed by raw scores. */
  readonly scores: readonly number[];
  readonly baseline: number;
  /** One for each head. */
  readonly cells: readonly PlacedCell[];
}

export interface PlacedCell {
  /** Empty where nothing is printed. */
  readonly text: string;
  /** How it is read aloud, where its signs would not say it. */
  readonly said: string | null;
  /** True where the mark of a rank adjusted by hand hangs behind it. */
  readonly marked: boolean;
}
