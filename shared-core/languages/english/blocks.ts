/** The blocks of a booklet besides its tables. */
export const ENGLISH_BLOCKS = {
  'block.contents': 'Contents',
  'block.norm-group': 'The norm group',
  'block.sample': 'The sample',
  'block.how-to-read': 'How to read the tables',
  'block.tables': 'Conversion tables',
  'block.groups-across': 'All groups side by side',
  'block.inverse': 'From percentile rank to raw score',
  'block.cut-scores': 'Cut scores',
  'block.pictures': 'Pictures',
  'block.technical-notes': 'Technical notes',
  'block.cautions': 'Cautions',
  'block.change-list': 'Changes',
  'block.colophon': 'Colophon',
  'block.continued': '{heading} (continued)',
  'block.blank': 'This page is left blank.',

  'title-page.norms': 'Norm tables',
  'title-page.sample': 'Tables of a sample',
  'title-page.groups': '{count} groups',
  'title-page.edition': 'Edition',
  'title-page.date': 'Date',
  'title-page.check': 'Check code',
  'title-page.draft': 'Draft, not released',
  'title-page.caution':
    'For use by those who are qualified to give and to interpret the test, under the rules that hold where they work. Read how the tables are to be read, and the cautions, before use.',

  'norm-group.population': 'Population',
  'norm-group.sampling': 'Sampling',
  'norm-group.participation': 'Participation',
  'norm-group.test-dates': 'Tested',
  'norm-group.weighting': 'Weighting',
  'norm-group.untold':
    'Not told here: {list}. Without it these are tables of a sample, and are not to be taken for norms.',
  'norm-group.untold-head': 'Left open',
  'norm-group.numbers': 'The groups in numbers',
  'norm-group.group': 'Group',
  'norm-group.n': 'n',
  'norm-group.effective-n': 'Effective\nn',
  'norm-group.clusters': 'Clusters',
  'norm-group.design-effect': 'Design\neffect',
  'norm-group.mean': 'Mean',
  'norm-group.sd': 'SD',
  'norm-group.at-lowest': 'At\nlowest',
  'norm-group.at-highest': 'At\nhighest',
  'norm-group.numbers-note':
    'At lowest, at highest: the share of the group with the lowest and with the highest attainable score, {lowest} and {highest}.',
  'norm-group.hinges':
    'Mean, SD, median and hinges are raw-score points; hinges are the medians of the lower and of the upper half.',
  'norm-group.quartiles': 'Mean, SD, median and quartiles are raw-score points.',
  'norm-group.effective': 'The effective n is how many people of equal weight the group is worth.',
  'norm-group.for-intervals': 'n for\nintervals',
  'norm-group.intervals': 'The n for intervals is how many people drawn one by one the clusters are worth.',
  'five-head.lowest': 'Lowest',
  'five-head.lower-hinge': 'Lower\nhinge',
  'five-head.lower-quartile': 'Lower\nquartile',
  'five-head.median': 'Median',
  'five-head.upper-hinge': 'Upper\nhinge',
  'five-head.upper-quartile': 'Upper\nquartile',
  'five-head.highest': 'Highest',
  'norm-group.rows': 'From the file to the tables',
  'norm-group.rows-head': 'Rows',
  'norm-group.rows-count': 'Number',
  'norm-group.read': 'Read from {file}',
  'norm-group.read-typed': 'Typed in',
  'norm-group.left-out': 'Left out: {rule}',
  'norm-group.kept': 'Kept',
  'norm-group.without-table': 'Of those kept, {count} stand in groups that have no table here.',

  'untold.population': 'the population the group stands for',
  'untold.sampling': 'how people were chosen',
  'untold.participation': 'how many of those asked took part',
  'untold.test-dates': 'when they were tested',
  'untold.weighting': 'whether and how they were weighted',

  'how.example': 'An example',
  'how.rank': 'In {table}, the raw score {score} has the percentile rank {rank}.',
  'how.share-norm-group':
    'It is the share of the norm group scoring {definition}: {exact} per cent, printed as {rank}.',
  'how.share-sample': 'It is the share of the sample scoring {definition}: {exact} per cent, printed as {rank}.',
  'how.smoothed-norm-group':
    'It is the share of the norm group scoring {definition}: after smoothing {exact} per cent, printed as {rank}.',
  'how.smoothed-sample':
    'It is the share of the sample scoring {definition}: after smoothing {exact} per cent, printed as {rank}.',
  'how.counts-lower': 'Of {people}, {worse} had a lower score and {same} this very score.',
  'how.counts-higher': 'Of {people}, {worse} had a higher score and {same} this very score.',
  'how.beside': 'In the same row: {list}.',
  'how.cell': '{name} {text}',
  'how.other-group': 'In another group the same score has another place: in {table} its rank is {rank}.',
  'how.low-is-good': 'On this test a low raw score is the good one: the rank rises as the raw score falls.',
  'how.ends': '{low} and {high}',
  'how.ends-signs':
    '{low} is printed for a rank that is below {least} before it is rounded, {high} for one above {most}. So few people stand out there that the table does not tell their places apart.',
  'how.ends-held':
    'Ranks that would round below {least} are printed as {least}, and those above {most} as {most}: nobody stands below or above the whole group.',
  'how.not': 'What it does not mean',
  'how.not-correct':
    'A percentile rank is not the per cent of questions answered correctly. The rank 50 is the middle of the group, not half of the marks.',
  'how.not-equal':
    'Its steps are unequal: in {table} the step from raw score {a-from} to {a-to} moves the rank from {a-low} to {a-high}, the step from {b-from} to {b-to} only from {b-low} to {b-high}.',
  'how.not-average': 'Nor is it to be added, subtracted or averaged.',
  'how.columns': 'The columns of the tables',

  'pictures.boxes': 'All groups on one scale',
  'pictures.box-alt':
    'Box plots of the raw scores of {list} on one scale from {lowest} to {highest}. Their numbers stand in the table beside them.',
  'pictures.box-caption-hinges':
    'A box reaches from the lower to the upper hinge, with a line at the median; the lines beside it reach to the lowest and the highest score that somebody had.',
  'pictures.box-caption-quartiles':
    'A box reaches from the lower to the upper quartile, with a line at the median; the lines beside it reach to the lowest and the highest score that somebody had.',

  'technical.method': 'Method',
  'technical.scale': 'Scale',
  'technical.scale-ones':
    'Raw scores run from {lowest} to {highest}, which makes {count} attainable scores; {direction}.',
  'technical.scale-steps':
    'Raw scores run from {lowest} to {highest} in steps of {step}, which makes {count} attainable scores; {direction}.',
  'technical.high-is-good': 'high scores are good',
  'technical.low-is-good': 'low scores are good',
  'technical.rounding': 'Rounding and ends',
  'technical.rounding-exact':
    'Without smoothing, ranks are held as exact fractions until they are printed, so that no half is decided by a machine’s arithmetic.',
  'technical.rounding-half-up': 'A rank that lies in the middle between two printed ones is rounded up.',
  'technical.rounding-half-even':
    'A rank that lies in the middle between two printed ones is rounded to the even digit.',
  'technical.sampling': 'Sampling design',
  'technical.one-by-one': 'Errors are worked out as if {people} were drawn one by one.',
  'technical.weighted':
    'People carry weights; the effective n is the square of the sum of the weights over the sum of their squares.',
  'technical.clustered': 'The {people} were drawn in clusters, and errors are worked out between these: {list}.',
  'technical.clusters-of': '{group}, {facts}',
  'technical.effective-clustered':
    'With clusters, intervals count n over the design effect as people, but never more than the effective n.',
  'technical.precision': 'Precision',
  'technical.no-errors': 'No column of the tables tells of errors.',
  'technical.smoothing': 'Smoothing',
  'technical.of-groups': '{groups}: {text}',
  'technical.fit-of': 'Fit of the smoothing: {group}',
  'technical.recipe': 'One row worked out by hand',
  'technical.recipe-of': 'The percentile rank of one raw score of {table}, from the tally alone.',

  'across.how-to-read':
    'Find the raw score in the first column. In its line, under the name of the group, stands the percentile rank in that group; n\u00a0is the number of its {people}.',
  'across.n': 'n {count}',
  'across.part': 'Groups {first} to {last} of {all}',
  'across.part-of-one': 'Group {first} of {all}',
  'across.note': '{group}: {note}',
  'across.all-smoothed': 'The percentile ranks of all groups are smoothed.',
  'across.some-smoothed': 'Smoothed are the percentile ranks of {groups}.',

  'inverse-block.lowest':
    'Find the percentile rank in the first column. In its line, under the name of the group, stands the lowest raw score whose percentile rank in that group, before rounding, reaches it; a dash where none does. n\u00a0is the number of its {people}.',
  'inverse-block.highest':
    'Find the percentile rank in the first column. In its line, under the name of the group, stands the highest raw score whose percentile rank in that group, before rounding, reaches it; a dash where none does. n\u00a0is the number of its {people}.',

  'cuts.heading': '{name}: raw score {score}',
  'cuts.heading-nameless': 'Raw score {score}',
  'cuts.how-to-read':
    'At each cut: the percentile rank of its score, as in the table of the group, and how many per cent of the group have that score or a better one, counted as they were observed. n\u00a0is the number of {people} in the group.',
  'cuts.how-to-read-weighted':
    'At each cut: the percentile rank of its score, as in the table of the group, and how many per cent of the group, by weight, have that score or a better one, counted as they were observed. n\u00a0is the number of {people} in the group.',
  'cuts.name': 'Cut',
  'cuts.group': 'Group',
  'cuts.n': 'n',
  'cuts.share': 'Per cent\nat or better',
  'cuts.rule': 'A rule marks the cut {cut}.',
  'cuts.rules': 'Rules mark the cuts {cuts}.',
  'cuts.named': '“{name}” at {score}',
  'cuts.nameless': 'at {score}',

  'cautions.place':
    'A percentile rank is a place in a named group. It is not a per cent of correct answers, and does not tell how much of the subject is known.',
  'cautions.steps':
    'The steps between percentile ranks are unequal: in the middle of the group a few points of raw score move the rank far, at the ends hardly at all. A difference of ranks does not measure a difference of performance.',
  'cautions.average':
    'Percentile ranks are not to be added, subtracted or averaged, neither over people nor over tests. Average raw scores, or scores made for it.',
  'cautions.valid':
    'Each table holds for the form, the season and the group that it was made from: {survey}. For another form, at another time of the year or for other people its ranks are wrong.',
  'cautions.this-test': 'this test',
  'cautions.measurement':
    'A raw score is measured with error. The same {person} could well have had a score some points higher or lower on another day, and another rank with it.',
  'cautions.sampling':
    'The ranks come from the {people} who were tested. Had others been drawn, the ranks would be somewhat different; the smaller the group, the more so.',
  'cautions.decision':
    'No decision about a person may rest on one score alone. Other evidence, and what is known of how the test was taken, belong to it.',
  'cautions.rules':
    'Tests are given, and these tables used, by those who are qualified to do so, in the way that local rules and law ask for.',
  'cautions.age':
    'Norms grow old. Look at the dates of testing before use, and ask whether the group is still the same.',

  'changes.since': 'Compared with edition {edition}.',
  'changes.since-date': 'Compared with edition {edition} of {date}.',
  'changes.since-unnumbered': 'Compared with an earlier edition without a number.',
  'changes.check': 'Its check code is {check}.',
  'changes.none': 'Nothing that is printed has changed.',
  'changes.not-compared':
    'No earlier edition was compared with this one. Whether there is one, and how it differs, is not told here.',

  'colophon.survey': 'Survey',
  'colophon.edition': 'Edition',
  'colophon.no-edition': 'without a number',
  'colophon.date': 'Date',
  'colophon.no-date': 'without a date',
  'colophon.status': 'Status',
  'colophon.released': 'released',
  'colophon.draft': 'draft: a question of the proof is still open',
  'colophon.prepared': 'Prepared by',
  'colophon.checked': 'Checked by',
  'colophon.not-signed': 'not signed',
  'colophon.definition': 'Definition',
  'colophon.method': 'Method',
  'colophon.source': 'Source',
  'colophon.source-file': '{file}, {bytes} bytes',
  'colophon.source-typed': 'Counts typed in',
  'colophon.source-none': 'not told',
  'colophon.fingerprint': 'SHA-256',
  'colophon.rows': 'Rows',
  'colophon.rows-text': '{read} read, {kept} kept, {left} left out',
  'colophon.check': 'Check code',
  'colophon.check-text':
    '{check}. It stands on every page and is made of every printed text and number by SHA-256; the paper and the version of the program do not enter into it. Another code means that something else is printed.',
  'colophon.verify': 'To verify',
  'colophon.verify-text':
    'With the project from which this booklet was pressed, the command “{command}” reads every cell of it again and compares it with the tables.',
  'colophon.program': 'Program',
  'colophon.program-text': 'Normloom {version}',
  'colophon.program-plain': 'Normloom',
  'colophon.typefaces': 'Typefaces',
  'colophon.typefaces-text': 'Source Sans 3 and Source Serif 4, both under the SIL Open Font License, version 1.1.',
} as const;
