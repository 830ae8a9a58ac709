import { ENGLISH_WORDS, say } from '../languages/phrases.ts';
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

/** What a rule means, as it is shown and printed. */
export function leftOutInWords(rule: LeftOutRule, words = ENGLISH_WORDS): string {
  return say(words, `left-out.${rule}`);
}
