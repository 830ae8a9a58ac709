import { scaleInWords } from '../scale/score-scale.ts';
import { printCount } from '../scores/printed-number.ts';
import { BLOCK_NAMES, blocksInWords } from './blocks-in-words.ts';
import { cutScoreText } from './cuts.ts';
import type { NormProject } from './norm-project.ts';
import { sheetStatement } from './sheet-statement.ts';
import { tableStatement } from './method-statements.ts';
import { cohortStatement, curveStatement, groupsStatement, type ChoiceKey } from './statements.ts';

/** A text that differs; null on a side that has none. */
export interface TextChange {
  readonly what: string;
  readonly before: string | null;
  readonly after: string | null;
}

/** Under this name a comparison tells that another cohort file was read. */
export const COHORT_FINGERPRINT = 'SHA-256 of the cohort';

export interface NamedText {
  readonly what: string;
  readonly text: string | null;
}

/** The texts of the same name that differ, in the order of the first list, then those that only the second one has. */
export function textChanges(before: readonly NamedText[], after: readonly NamedText[]): readonly TextChange[] {
  const earlier = new Map(before.map(({ what, text }) => [what, text]));
  const later = new Map(after.map(({ what, text }) => [what, text]));
  return [...new Set([...earlier.keys(), ...later.keys()])]
    .map((what) => ({ what, before: earlier.get(what) ?? null, after: later.get(what) ?? null }))
    .filter((change) => change.before !== change.after);
}

/** What two projects chose otherwise, in the words of their statements; what names an edition is left out. */
export function changedChoices(before: NormProject, after: NormProject): readonly TextChange[] {
  return textChanges(choicesOf(before), choicesOf(after));
}

/** Phrases that name an edition and those who answer for it. */
type NamesEdition = 'edition' | 'date' | 'analyst' | 'checker';

/** Phrases of the statements that are compared, in order; the scale is told from the tally, as the rows are. */
const CHOICE_NAMES: Readonly<Record<Exclude<ChoiceKey, 'scale' | NamesEdition>, string>> = {
  people: 'who the rows are',
  direction: 'which scores are good',
  missing: 'codes for a missing score',
  duplicates: 'repeated identifiers',
  grouping: 'tables',
  definition: 'definition: the share of the group scoring',
  smoothing: 'smoothing of the distribution',
  degree: 'degree of the model',
  kept: 'kept by the model',
  bandwidth: 'bandwidth',
  level: 'confidence',
  interval: 'interval',
  reliability: 'reliability of the test',
  decimals: 'ranks are printed',
  rounding: 'rounding',
  ends: 'ends of the table',
  columns: 'columns beside the rank',
  'z-source': 'z scores',
  'z-ends': 'ends of the z scores',
  booklet: 'booklet',
  paper: 'paper',
  orientation: 'orientation',
  margin: 'margins',
  gutter: 'binding edge',
  fours: 'blank pages',
  'table-columns': 'columns on the page',
  'row-type': 'size of the figures',
  'row-height': 'height of the rows',
  fives: 'spacing of the rows',
  'range-rows': 'rows',
  ogive: 'picture',
  inverse: 'inverse table',
};

/** How a page is set, which no reader of a table has to be told. */
const LAYOUT = [
  'paper',
  'orientation',
  'margin',
  'gutter',
  'fours',
  'table-columns',
  'row-type',
  'row-height',
  'fives',
] as const satisfies readonly (keyof typeof CHOICE_NAMES)[];
export const LAYOUT_NAMES: ReadonlySet<string> = new Set(LAYOUT.map((choice) => CHOICE_NAMES[choice]));

function choicesOf(project: NormProject): readonly NamedText[] {
  const phrases = new Map<string, string>(
    [
      ...cohortStatement(project),
      ...groupsStatement(project),
      ...curveStatement(project),
      ...tableStatement(project),
      ...sheetStatement(project),
    ].flatMap(({ choice, text }) => (choice === null ? [] : [[choice, text] as const])),
  );
  return [
    { what: 'title', text: given(project.title) },
    { what: 'form or season', text: given(project.subtitle) },
    ...sourceOf(project),
    { what: 'scale', text: project.tally === null ? null : scaleInWords(project.tally.scale) },
    ...Object.entries(CHOICE_NAMES).map(([choice, what]) => ({ what, text: phrases.get(choice) ?? null })),
    ...textsOf(project),
    ...cutsOf(project),
    { what: 'language of the booklet', text: project.sheet.language.tag },
  ];
}

function sourceOf({ source }: NormProject): readonly NamedText[] {
  if (source === null) return [];
  return [
    { what: 'cohort', text: source.kind === 'typed' ? 'typed counts' : source.file },
    { what: COHORT_FINGERPRINT, text: source.sha256 },
    { what: 'rows read', text: printCount(source.rowsRead) },
    { what: 'rows kept', text: printCount(source.rowsKept) },
  ];
}

/** What the user wrote for the sheets. */
function textsOf(project: NormProject): readonly NamedText[] {
  const { groups, sheet } = project;
  const { population, sampling, participation, testDates, weighting } = groups.documentation;
  return [
    { what: 'population', text: given(population) },
    { what: 'sampling', text: given(sampling) },
    { what: 'participation', text: given(participation) },
    { what: 'dates of testing', text: given(testDates) },
    { what: 'weighting', text: given(weighting) },
    { what: 'title of the sheets', text: given(sheet.title) },
    { what: 'how to read the table', text: given(sheet.howToRead) },
    { what: 'cautions', text: given(sheet.cautions) },
    { what: 'notes', text: given(sheet.notes) },
    { what: 'blocks of the booklet', text: given(blocksInWords(project)) },
    ...sheet.blocks.flatMap(({ kind, heading, text }) => [
      { what: `heading of the block “${BLOCK_NAMES[kind]}”`, text: given(heading) },
      { what: `text of the block “${BLOCK_NAMES[kind]}”`, text: given(text) },
    ]),
  ];
}

/** Cut scores by their names; those of one group with its values. */
function cutsOf({ cuts, tally }: NormProject): readonly NamedText[] {
  if (tally === null) return [];
  return cuts.map(({ name, score, values }) => ({
    what: `cut score ${name}${values === null ? '' : ` (${values.join(', ')})`}`,
    text: cutScoreText(tally.scale, score),
  }));
}

function given(text: string): string | null {
  return text.trim() === '' ? null : text.trim();
}
