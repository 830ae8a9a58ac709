/** How a rank is worked out by hand, step by step. */
export const ENGLISH_RECIPE = {
  'recipe.take': 'Take the {people} of {group} and the raw score {score}.',
  'recipe.take-weighted': 'Take the {people} of {group}, whose weights add up to {weight}, and the raw score {score}.',
  'recipe.count-lower': 'Count those with a lower score: {worse}. Count those with this score: {same}.',
  'recipe.count-higher': 'Count those with a higher score: {worse}. Count those with this score: {same}.',
  'recipe.weigh-lower':
    'Add up the weights of those with a lower score: {worse}; and of those with this score: {same}.',
  'recipe.weigh-higher':
    'Add up the weights of those with a higher score: {worse}; and of those with this score: {same}.',
  'recipe.add-half': 'Add half of the second number to the first: {sum}.',
  'recipe.add-both': 'Add both numbers: {sum}.',
  'recipe.keep-first': 'Keep the first number only: {sum}.',
  'recipe.divide': 'Divide by {all} and multiply by 100: {rank}.',
  'recipe.mean-rank': 'Add half of the second number to the first and add 1/2: the mean rank r is {mean}.',
  'recipe.mean-rank-scaled':
    'Add half of the second number to the first, multiply by {factor} and add 1/2: the mean rank r is {mean}.',
  'recipe.plotting-position': 'With a = {offset}, 100 (r − a)/({count} + 1 − 2a) is {rank} (held between 0 and 100).',
  'recipe.classes':
    'Classes of {size} scores are laid from the poor end of the scale; this score is number {number} in its class, and its middle lies {part} of the way through it.',
  'recipe.in-classes':
    'In poorer classes stand {poorer}, in this class {own}: add that part of the second to the first.',
  'recipe.ends': 'Below {least} prints as {low}, above {most} as {high}.',
  'recipe.round': 'Round to {unit}, {half}{held}.',
  'recipe.whole-number': 'a whole number',
  'recipe.one-decimal': 'one decimal',
  'recipe.half-up': 'a half upwards',
  'recipe.half-even': 'a half to the even digit',
  'recipe.held': ', held between {least} and {most}',
  'recipe.gives': '{rounding} That gives {rank}.',
  'recipe.prints': 'The table prints {rank}.',
  'recipe.prints-smoothed': 'The table prints {rank}: its ranks are smoothed, and smoothing cannot be redone by hand.',
  'recipe.prints-adjusted': 'The table prints {rank}: it was adjusted by hand from {from}.',
} as const;
