import type { NormProject } from './norm-project.ts';

/** How a cohort file is read; see the schema in norm-project. */
export type Reading = NonNullable<NormProject['reading']>;
export type ColumnRole = Reading['roles'][number]['role'];
export type ReadingDecisions = Reading['decisions'];

/**
 * The rules by which a row can be left out, in the order they are asked: a row left out is counted under the first rule
 * that applies, so that read = kept + left out.
 */
export const LEFT_OUT_RULES = [
  'blank-row',
  'ragged-row',
  'duplicate-id',
  'blank-score',
  'missing-code',
  'not-a-number',
  'below-scale',
  'above-scale',
  'off-grid',
  'blank-group',
  'blank-cluster',
  'bad-weight',
  'bad-count',
] as const;

export type LeftOutRule = (typeof LEFT_OUT_RULES)[number];

/** Row numbers kept with each rule; the count goes on beyond them. */
export const MAX_ROWS_LISTED = 1000;

/** What each rule means, as it is shown and printed. */
export const LEFT_OUT_WORDS: Readonly<Record<LeftOutRule, string>> = {
  'blank-row': 'nothing in the row',
  'ragged-row': 'more or fewer cells than the heading',
  'duplicate-id': 'an identifier met before',
  'blank-score': 'no score',
  'missing-code': 'a code for a missing score',
  'not-a-number': 'a score that is not a number',
  'below-scale': 'a score below the scale',
  'above-scale': 'a score above the scale',
  'off-grid': 'a score between two steps of the scale',
  'blank-group': 'no value in a grouping column',
  'blank-cluster': 'no value in the cluster column',
  'bad-weight': 'a weight that is not a number above 0',
  'bad-count': 'a count that is not a whole number',
};
