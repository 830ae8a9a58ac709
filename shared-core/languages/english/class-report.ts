/** The report of a class. */
export const ENGLISH_CLASS_REPORT = {
  'class.report': 'Class report',
  'class.tested-on': 'tested on {date}',
  'class.table-check': 'table check {check}',
  'class.report-check': 'report check {check}',
  'class.continued': '{title} (continued)',

  'class.table-lead': 'Table.',
  'class.table-cited': 'Published in: {source}.',
  'class.group-and-count': '{group} ({count})',
  'class.rank-lead': 'Percentile rank.',
  'class.rank-midpoint':
    'How many of 100 {people} of {the-group} scored {worse}, counting half of those with the same score.',
  'class.rank-at-or-below': 'How many of 100 {people} of {the-group} had the same score or scored {worse}.',
  'class.rank-below': 'How many of 100 {people} of {the-group} scored {worse}.',
  'class.rank-plotting-position':
    'How many of 100 {people} of {the-group} scored {worse}, counting those with the same score in part.',
  'class.rank-grouped':
    'How many of 100 {people} of {the-group} scored {worse}, counting those in the same class of scores in part.',
  'class.rank-unknown':
    'How many of 100 {people} of {the-group} scored {worse}; the table does not say how those with the same score are counted.',
  'class.the-norm-group': 'the norm group',
  'class.the-sample': 'the sample',
  'class.lower': 'lower',
  'class.higher': 'higher',
  'class.low-is-good': 'On this test a low score is good.',
  'class.band-lead': 'Band.',
  'class.band-text':
    'Every score has an error of measurement. The band allows for it: for about {level} of 100 {people}, a band made in this way holds the result that they would have on average over many tests of this kind (reliability {reliability}).',
  'class.band-missing':
    'No band is printed, because the table gives no reliability. Every score has an error of measurement all the same: read each rank as less certain than one number looks.',

  'class.column-name': 'Name',
  'class.column-code': 'Code',
  'class.column-group': 'Group',
  'class.column-table': 'Table',
  'class.column-status': 'Status',
  'class.column-score': 'Raw\nscore',
  'class.column-rank': 'Percentile\nrank',
  'class.column-band': 'Band',
  'class.nobody': 'Nobody in the list has a score that can be reported.',
  'class.chart-caption':
    'Chart: a dot for the percentile rank on a scale from 1 to 99. The scale is spaced by the normal curve (normal curve equivalents), because ranks lie close together in the middle, where a few points of raw score move them far. A ring stands for a rank below 1 or above 99.',
  'class.chart-caption-band':
    'Chart: a dot for the percentile rank and a bar for its band, on a scale from 1 to 99. The scale is spaced by the normal curve (normal curve equivalents), because ranks lie close together in the middle, where a few points of raw score move them far. A ring stands for a rank below 1 or above 99; a bar without a stroke at its end goes beyond the scale.',
  'class.chart-alt': 'Percentile ranks on one scale from 1 to 99.',
  'class.chart-alt-band': 'Percentile ranks and bands on one scale from 1 to 99.',
  'class.chart-alt-row': '{name}: {rank}.',
  'class.chart-alt-row-band': '{name}: {rank}, band {band}.',
  'class.absent': 'Absent ({count}):',
  'class.not-tested': 'Not tested ({count}):',
  'class.excused': 'Excused ({count}):',
  'class.left-out': 'Left out ({count}):',
  'class.open': 'Not yet answered ({count}):',
  'class.corrected': 'Score entered anew ({count}):',
  'class.name-and-why': '{name} ({why})',
  'class.left-out-code': 'left out by an answer about the list',
  'class.open-code': 'a question about the list is open',

  'class.sheet-class': 'Class',
  'class.sheet-groups': 'Groups',
  'class.sheet-summary': 'Summary',
  'class.sheet-about': 'About',

  'class.count-listed': 'In the list',
  'class.count-reported': 'With a result',
  'class.count-absent': 'Absent',
  'class.count-not-tested': 'Not tested',
  'class.count-excused': 'Excused',
  'class.count-left-out': 'Left out',
  'class.count-open': 'Not yet answered',
  'class.counts-heading': 'Who is in this report',
  'class.counted': 'Who',
  'class.count': 'Number',
  'class.scores-heading': 'Raw scores of the class',
  'class.place': 'Place in the class',
  'class.score': 'Raw score',
  'class.lowest': 'Lowest',
  'class.lower-hinge': 'Lower hinge',
  'class.median': 'Median',
  'class.upper-hinge': 'Upper hinge',
  'class.highest': 'Highest',
  'class.box-caption':
    'The box reaches from hinge to hinge and so holds the middle half of the class; the line in it is the median, the strokes end at the lowest and the highest score. Each dot is one of the class.',
  'class.box-alt': 'Box plot of the raw scores: {numbers}.',
  'class.scores-listed': 'A box plot needs five scores or more. The scores are: {scores}.',
  'class.quarters-heading': 'Where the class stands in the norm group',
  'class.quarters-heading-sample': 'Where the class stands in the sample',
  'class.quarter-ranks': 'Percentile ranks',
  'class.quarter-count': 'In the class',
  'class.quarters-expected':
    'The grey stroke is a quarter of {n}, which is {expected}. In {the-group} about a quarter has ranks in each of these ranges. A class is small and not drawn by chance, so that a few more or fewer say nothing by themselves.',
  'class.quarters-alt': '{counts}. A quarter of {n} is {expected}.',
  'class.quarter-alt': 'ranks {ranks}: {count}',
  'class.compared-heading': 'Groups in the class',
  'class.compared-group': 'Group',
  'class.compared-n': 'n',
  'class.compared-median': 'Median\nraw score',
  'class.compared-mean': 'Mean\nraw score',
  'class.compared-nce': 'Mean\nNCE',
  'class.compared-note':
    'Groups are compared by raw scores and by normal curve equivalents (NCE), whose steps are equal. A dash: no mean is given of fewer than two, nor of NCE where somebody has none. Differences between groups this small can be chance.',
  'class.no-mean-lead': 'No mean rank.',
  'class.no-mean':
    'Percentile ranks are not averaged: their steps are unequal, so that their mean is no rank of anything. Nor is the mean raw score of the class looked up in the table, which tells how {people} stand among {people}, not how classes stand among classes.',
  'class.read-lead': 'How to read it.',
  'class.read':
    'The raw score is what was counted on the test; the percentile rank is its place in {the-group}. Compare bands rather than ranks: where the bands of two {people} overlap, the test does not tell them apart with certainty.',
  'class.read-no-band':
    'The raw score is what was counted on the test; the percentile rank is its place in {the-group}. Small differences between ranks, above all in the middle of the scale, lie within the error of the test.',
  'class.cautions-lead': 'Take care.',
  'class.cautions':
    'A percentile rank is no per cent of right answers and no mark. It holds for this form, this season and this group. No decision about anybody may rest on one score alone; follow local rules and the judgement of those who are qualified.',
  'class.private-lead': 'Who may see it.',
  'class.private-names':
    'This report holds names. Keep it like a mark book, and pass it on only to those who may see it.',
  'class.private-codes':
    'Codes stand for names, in an order drawn by chance. Keep the key apart from this report; with it, or with what somebody knows of them already, results can be told apart by name.',

  'class.summary-lead': 'Summary.',
  'class.summary-all': 'This summary names nobody, and all its counts are shown.',
  'class.summary-hidden':
    'This summary names nobody. A count that is smaller than {least} is hidden, and so is every count from which one could be worked out; “hidden” may stand for any number.',
  'class.summary-class-only':
    'Counts by group are left out, because not all groups are large enough to hide counts below {least} in them.',
  'class.summary-nothing':
    'This summary names nobody, and gives no counts: whatever was left out to hide counts below {least} could be worked out again from the rest.',
  'class.summary-again':
    'Share it once: if it is made again after somebody has joined, left or been tested later, the difference between the two can tell of that one.',
  'class.summary-ends': 'Lowest and highest score are not told, since each belongs to somebody.',
  'class.summary-not-tested': 'Not\ntested',
  'class.hidden': 'hidden',
  'class.summary-heading': 'The class by percentile rank',
  'class.summary-ranks': 'Ranks\n{ranks}',
  'class.summary-tested': 'With a\nresult',
  'class.summary-total': 'In the\nlist',
  'class.summary-whole': 'Whole class',
  'class.summary-no-group': 'No group',
} as const;
