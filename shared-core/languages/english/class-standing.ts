/** The report of a class without a table. */
export const ENGLISH_CLASS_STANDING = {
  'standing.title': 'Class standing',
  'standing.lead': 'Class standing.',
  'standing.text':
    'There is no table for this test. The scores are put in order within this class of {n}, and tell nothing beyond it. Place 1 is the best score; equal scores share their places.',
  'standing.coarse-lead': 'How coarse it is.',
  'standing.coarse':
    '{one} of {n} is {points} points of the last column. A little more or less of score can move somebody by several places.',
  'standing.place': 'Place',
  'standing.share-low': 'Same score\nor lower, %',
  'standing.share-high': 'Same score\nor higher, %',
  'standing.cautions':
    'A place depends on who is in the class. It does not tell how much was learned, is no mark, and says nothing of other classes. No decision about anybody may rest on one score alone; follow local rules and the judgement of those who are qualified.',
} as const;
