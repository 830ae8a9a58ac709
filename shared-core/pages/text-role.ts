/**
 * What a placed text is to someone who has the booklet read aloud. Lines that share a name belong to one element, in
 * the order in which they are placed; names are unique on the sheet of a group.
 */
export type TextRole = PageRole | ProseRole | CellRole;

/** Not part of what is read: running heads and feet, and what is printed again so that a page can stand alone. */
export type PageRole = { readonly kind: 'running'; readonly edge: 'top' | 'bottom' } | { readonly kind: 'repeated' };

export type ProseRole =
  | { readonly kind: 'heading'; readonly level: 1 | 2; readonly name: string }
  | { readonly kind: 'paragraph'; readonly name: string };

/** A cell, or a line of one. A table may run over several columns and pages; its cells still make one table. */
export interface CellRole {
  readonly kind: 'cell';
  readonly table: string;
  /** Cells of equal row stand in one row, and rows in the order of their first cell. */
  readonly row: 'head' | number;
  readonly column: number;
  /** What the cell is the head of. */
  readonly headOf: 'row' | 'column' | null;
  /** How the whole cell is read aloud, where its signs would not say it; see `spokenFigure` and `spokenHead`. */
  readonly said: string | null;
}

export const REPEATED: PageRole = { kind: 'repeated' };

export function paragraph(name: string): ProseRole {
  return { kind: 'paragraph', name };
}
