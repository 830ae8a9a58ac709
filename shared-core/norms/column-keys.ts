/** Columns a conversion table can carry beside the raw score and the percentile rank. */
export const COLUMN_KEYS = [
  'count',
  'cumulative',
  'exact-rank',
  'observed-rank',
  'interval',
  'standard-error',
  'measurement-band',
  'print-range',
  'z',
  't',
  'nce',
  'deviation',
  'sten',
  'stanine',
] as const;

export type ColumnKey = (typeof COLUMN_KEYS)[number];
