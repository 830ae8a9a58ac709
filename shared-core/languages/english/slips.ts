/** The slip that goes home with a pupil. */
export const ENGLISH_SLIPS = {
  'slip.title': '{class} · Slips',
  'slip.test': '{test}, tested on {date}',
  'slip.score-label': 'Score',
  'slip.rank-label': 'Percentile rank',
  'slip.band-label': 'Band',

  'slip.means': 'What this result means',
  'slip.score': '{name} reached a score of {score} on a scale from {lowest} to\u00a0{highest}.',
  'slip.low-is-good': 'On this test a low score is good.',
  'slip.group': 'The score is compared with those of other {people}: {group}.',
  'slip.population': 'They stand for: {population}.',
  'slip.rank-midpoint':
    'Out of every 100 of them, {share} scored {worse}: this is the percentile rank. (Of those with exactly the same score, half are counted as {worse}.)',
  'slip.rank-at-or-below':
    'Out of every 100 of them, {share} had the same score or scored {worse}: this is the percentile rank.',
  'slip.rank-below': 'Out of every 100 of them, {share} scored {worse}: this is the percentile rank.',
  'slip.rank-plotting-position':
    'Out of every 100 of them, {share} scored {worse}: this is the percentile rank. (Those with exactly the same score are counted in part.)',
  'slip.rank-grouped':
    'Out of every 100 of them, {share} scored {worse}: this is the percentile rank. (Those with the same score, or one close to it, are counted in part.)',
  'slip.rank-unknown':
    'Out of every 100 of them, {share} scored {worse}: this is the percentile rank. (How those with exactly the same score are counted is not known.)',
  'slip.share-about': 'about {rank}',
  'slip.share-below': 'fewer than {rank}',
  'slip.share-above': 'more than {rank}',
  'slip.adjusted': 'Those who made the table set this percentile rank by hand.',
  'slip.band':
    'No test is exact. On another day, or with other questions of the same kind, {name} might have scored somewhat higher or lower. The band, {band}, allows for this: for about {level} out of every 100 {people}, such a band holds the result that they would have on average if they took many tests of this kind.',
  'slip.no-band':
    'No test is exact. On another day, or with other questions of the same kind, {name} might have scored somewhat higher or lower. How much is not known of this test.',
  'slip.picture-dot': 'The dot is the percentile rank.',
  'slip.picture-ring': 'The ring stands for a percentile rank beyond the end of the scale.',
  'slip.picture-bar': 'The bar is the band.',
  'slip.picture-scale': '50 is the middle; ranks lie closest together there, where most scores are.',
  'slip.picture-alt': 'A scale of percentile ranks from 1 to 99. The percentile rank is {rank}.',
  'slip.picture-alt-band': 'A scale of percentile ranks from 1 to 99. The percentile rank is {rank}, the band {band}.',

  'slip.means-not': 'What it does not mean',
  'slip.not-per-cent':
    'It is not how many per cent of the answers were right. It is not a mark, and 50 is no pass mark.',
  'slip.not-judgement':
    'It shows how one test went on one day. It is no judgement of {name}, and it does not tell what {name} can learn.',
  'slip.not-alone':
    'What teachers and family know besides counts as well. Nothing should be decided on this result alone.',
  'slip.ask': 'Please ask the school if anything is unclear, how this result is used, and which rules hold for it.',
} as const;
