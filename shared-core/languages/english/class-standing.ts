/** The report of a class without a table. */
export const ENGLISH_CLASS_STANDING = {
  'standing.title': 'Class standing',
  'standing.lead': 'Class standing.',
  'standing.text':
    'There is no table for this test. The scores are put in order within this class of {n}, and nothing beyond this class can be told from them. Place 1 is the best score; equal scores share their places.',
  'standing.coarse':
    'One {person} of {n} is {points} points of the last column: that is how coarse it is. A few places more or less can be chance.',
  'standing.direction-low': 'On this test a low score is good.',
  'standing.place': 'Place',
  'standing.share-low': 'Same score\nor lower, %',
  'standing.share-high': 'Same score\nor higher, %',
  'standing.places-shared': '{first} to {last}',
} as const;
