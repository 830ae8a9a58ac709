import type { ColumnKey } from '../norms/column-keys.ts';

export const RANGE_DASH = '\u2013';

const RANGE_COLUMNS: ReadonlySet<string> = new Set<ColumnKey>(['interval', 'measurement-band', 'print-range']);

/** Columns of ranges are aligned on their dashes: the low ends end before them, the high ends begin behind. */
export function isRangeColumn(key: string): boolean {
  return RANGE_COLUMNS.has(key);
}

/** "45–50" with its dash. A single text stands where low ends do: its `after` is null. A lone dash has two empty sides. */
export interface RangeSides {
  /** The low end with the dash, where there is one. */
  readonly upToDash: string;
  readonly after: string | null;
}

export function rangeSides(text: string): RangeSides {
  const at = text.indexOf(RANGE_DASH);
  return at < 0 ? { upToDash: text, after: null } : { upToDash: text.slice(0, at + 1), after: text.slice(at + 1) };
}
