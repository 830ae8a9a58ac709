/** The printed words of the blocks of a booklet; `{name}` is a place that is filled when they are printed. */
export const BLOCK_WORDS = {
  'block.title-page': 'Title page',
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

  'cuts.rule': 'A rule marks the cut {cut}.',
  'cuts.rules': 'Rules mark the cuts {cuts}.',
  'cuts.named': '“{name}” at {score}',
  'cuts.nameless': 'at {score}',

  'cautions.place':
    'A percentile rank is a place in a named group. It is not a per cent of correct answers, and says nothing of how ' +
    'much of the subject is known.',
  'cautions.steps':
    'The steps between percentile ranks are unequal: in the middle of the group a few points of raw score move the rank ' +
    'far, at the ends hardly at all. A difference of ranks is no measure of a difference of performance.',
  'cautions.average':
    'Percentile ranks are not to be added, subtracted or averaged, neither over people nor over tests. Average raw ' +
    'scores, or scores made for it.',
  'cautions.valid':
    'Each table holds for the form, the season and the group that it was made from: {survey}. For another form, at ' +
    'another time of the year or for other people its ranks are wrong.',
  'cautions.measurement':
    'A raw score is measured with error. The same {person} could well have had a score some points higher or lower on ' +
    'another day, and another rank with it.',
  'cautions.sampling':
    'The ranks come from the {people} who were tested. Had others been drawn, the ranks would be somewhat different; the ' +
    'smaller the group, the more so.',
  'cautions.decision':
    'No decision about a person may rest on one score alone. Other evidence, and what is known of how the test was taken, ' +
    'belong to it.',
  'cautions.rules':
    'Tests are given, and these tables used, by those who are qualified to do so, in the way that local rules and law ask ' +
    'for.',
  'cautions.this-test': 'this test',
  'cautions.age':
    'Norms grow old. Look at the date of testing before use, and ask whether the group is still the same.',
} as const;

export type BlockWord = keyof typeof BLOCK_WORDS;
/** The words of a booklet by their keys. */
export type BlockWords = Readonly<Record<BlockWord, string>>;

/** A text with its places filled. Throws where a place has no value, which is a mistake of the program. */
export function say(words: BlockWords, key: BlockWord, values: Readonly<Record<string, string>> = {}): string {
  return words[key].replace(/\{([a-z-]+)\}/g, (_, name: string) => {
    const value = values[name];
    if (value === undefined) throw new RangeError(`no value for ${name} in ${key}`);
    return value;
  });
}
