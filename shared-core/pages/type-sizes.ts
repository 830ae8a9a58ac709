/** A size of type and the distance from one baseline to the next, in points. */
export interface TypeSize {
  readonly size: number;
  readonly leading: number;
}

export const RUNNING: TypeSize = { size: 7, leading: 8.8 };
export const TITLE: TypeSize = { size: 15.5, leading: 18.5 };
export const SUBTITLE: TypeSize = { size: 10, leading: 12.5 };
export const CONTINUED: TypeSize = { size: 10.5, leading: 13 };
export const PROSE: TypeSize = { size: 8.3, leading: 10.7 };
/** Text that is read through, as in the technical notes. */
export const READING: TypeSize = { size: 9.2, leading: 12.9 };
export const SMALL_PROSE: TypeSize = { size: 7.2, leading: 9 };
export const ROW: TypeSize = { size: 8.7, leading: 12.4 };
export const TABLE_HEAD: TypeSize = { size: 6.8, leading: 8 };

/** Weights of rule: the strong one opens and closes, the fine one divides. */
export const STRONG_RULE = 0.7;
export const FINE_RULE = 0.35;

/** Between two columns of text or of a table. */
export const GUTTER = 22;
/** Between two paragraphs. */
export const PARAGRAPH_GAP = 4.5;
