import { ENGLISH_CLASS_REPORT } from './english/class-report.ts';
import { ENGLISH_CLASS_STANDING } from './english/class-standing.ts';
import { ENGLISH_PEOPLE } from './english/people.ts';
import { ENGLISH_SLIPS } from './english/slips.ts';

/**
 * Every printed word, as templates. A key is named by where the words stand; `:one` and `:many` are chosen by a count.
 * What stands in braces is put in when the words are printed and stands in every language.
 */
export const ENGLISH_PHRASES = {
  'foot.page': 'page {page} of {pages}',
  'foot.edition': 'Edition {edition}',
  'foot.check': 'check {check}',
  'foot.definition': 'definition: {definition}',
  'foot.definition-smoothed': 'definition: {definition}, smoothed',
  'head.draft': 'DRAFT',
  'head.table': 'Table {number} · {title}',
  'sheet.title-with-group': '{title}, {group}',
  'sheet.continued': '{title} (continued)',
  ...ENGLISH_PEOPLE,
  ...ENGLISH_CLASS_REPORT,
  ...ENGLISH_CLASS_STANDING,
  ...ENGLISH_SLIPS,
} as const;
