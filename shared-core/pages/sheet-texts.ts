import { markedRank } from '../norms/adjustment-words.ts';
import { namedFiveNumbers } from '../norms/five-numbers.ts';
import { definitionInWords, definitionName } from '../norms/definitions.ts';
import type { ConversionRow } from '../norms/conversion-table.ts';
import { columnInWords, countedPeople, groupNoun, standingTitle, valueInWords } from '../norms/norm-groups.ts';
import type { GroupNorms } from '../norms/group-norms.ts';
import type { NormSet } from '../norms/norm-set.ts';
import type { NormProject } from '../norms/norm-project.ts';
import { clusterFacts } from '../norms/sampling-words.ts';
import { intervalName } from '../norms/smoothing-words.ts';
import type { TableColumn } from '../norms/table-columns.ts';
import { scaleGrid } from '../scale/score-scale.ts';
import { printCount, printNumber } from '../scores/printed-number.ts';
import { groupMethod } from './group-method.ts';
import type { Paragraph } from './paragraph.ts';

/** "Raw score to percentile rank, grade 5". */
export function sheetTitle(project: NormProject, { group }: GroupNorms): string {
  const { by } = project.groups;
  const given = group.title !== standingTitle(by, group.values, project.people);
  const standing =
    by.length === 0
      ? inSentence(group.title)
      : by
          .map((column, index) => `${inSentence(columnInWords(column))} ${valueInWords(group.values[index])}`)
          .join(', ');
  const title = project.sheet.title.trim();
  return title === '' ? group.title : `${title}, ${given ? group.title : standing}`;
}

/** "Grade" as it stands inside a sentence; abbreviations stay as they are. */
function inSentence(words: string): string {
  return /^\p{Lu}\p{Ll}/u.test(words) ? words.charAt(0).toLowerCase() + words.slice(1) : words;
}

/** "Table 2 · Grade 5". */
export function tableName(index: number, { group }: GroupNorms): string {
  return `Table ${index + 1} · ${group.title}`;
}

/** What the definition counts, under the title. */
export function sheetSubtitle(project: NormProject): string {
  const direction = project.tally?.scale.direction ?? 'high-is-good';
  const noun = groupNoun(project.groups.documentation);
  return `The share of the ${noun} scoring ${definitionInWords(project.curve.definition, direction)}`;
}

/** Left side of the running head: what the booklet is about. */
export function surveyName({ title, subtitle }: NormProject): string {
  return [title.trim(), subtitle.trim()].filter((part) => part !== '').join(' · ');
}

/** Stands before titles of a set that is not released; nothing otherwise. */
export function draftMark({ status }: NormSet): string {
  return status === 'draft' ? 'DRAFT' : '';
}

/** A title, marked where the set is a draft. */
export function draftTitle(normSet: NormSet, title: string): string {
  return [draftMark(normSet), title].filter((part) => part !== '').join(' · ');
}

/** Left side of the foot of a group's page: which edition this is and what its numbers are. */
export function editionLine(normSet: NormSet, { summary, smoothing }: GroupNorms): string {
  return footLine(
    normSet,
    smoothing.state === 'smoothed' ? ', smoothed' : '',
    countedPeople(printCount(summary.n), normSet.project.people),
  );
}

/** The same of a page that belongs to no single group. */
export function bookletLine(normSet: NormSet): string {
  const { groups, project } = normSet;
  const people = countedPeople(printCount(groups.reduce((sum, { summary }) => sum + summary.n, 0)), project.people);
  const smoothed = groups.filter(({ smoothing }) => smoothing.state === 'smoothed').length;
  return footLine(
    normSet,
    smoothed === 0 ? '' : smoothed === groups.length ? ', smoothed' : ', smoothed in part',
    `${groups.length} ${groups.length === 1 ? 'group' : 'groups'}, ${people}`,
  );
}

function footLine(normSet: NormSet, smoothed: string, people: string): string {
  const { project, check } = normSet;
  const { edition, date } = project.release;
  return [
    ...(normSet.status === 'draft' ? [draftMark(normSet)] : []),
    ...(edition.trim() === '' ? [] : [`Edition ${edition.trim()}`]),
    ...(date === '' ? [] : [date]),
    `check ${check}`,
    `definition: ${definitionName(project.curve.definition)}${smoothed}`,
    people,
  ].join(' · ');
}

/** The paragraphs beside the picture, in order; those without text are left out. */
export function notesOf({ project }: NormSet, norms: GroupNorms): readonly Paragraph[] {
  const noun = groupNoun(project.groups.documentation) === 'norm group' ? 'Norm group.' : 'Sample.';
  return [
    { lead: noun, text: [sampleFacts(project, norms), ...documentationSentences(project)].join(' ') },
    { lead: 'Method.', text: groupMethod(project, norms) },
    ...(project.sheet.notes.trim() === '' ? [] : [{ lead: 'Notes.', text: project.sheet.notes.trim() }]),
  ];
}

/** The words under the picture. */
export function figureCaption(project: NormProject, { smoothing, precision }: GroupNorms): string {
  const side = project.tally?.scale.direction === 'low-is-good' ? 'above' : 'below';
  const curve =
    smoothing.state === 'smoothed' ? 'the smoothed percentile ranks as a curve' : 'the percentile rank at each score';
  const steps = `observed steps (at or ${side} the score)`;
  if (precision.intervals === null) return `Cumulative per cent by raw score: ${steps} and ${curve}.`;
  const { level, interval } = project.precision;
  const band = `as a light band, the ${level} % ${intervalName(interval)} interval of the observed rank`;
  return `Cumulative per cent by raw score: ${steps}, ${curve} and, ${band} (error of sampling).`;
}

/** The picture for those who do not see it: what it shows, and the numbers of the group. */
export function figureInWords(project: NormProject, norms: GroupNorms): string {
  return `${figureCaption(project, norms)} ${sampleFacts(project, norms)}`;
}

/** n, mean, SD and five numbers in a sentence or two. */
export function sampleFacts(project: NormProject, norms: GroupNorms): string {
  const { summary, sampling, group } = norms;
  const people = countedPeople(printCount(summary.n), project.people);
  const weighted = group.table.weighted
    ? `, weighted, with an effective n of ${printNumber(summary.effectiveN, 1)}`
    : '';
  const drawn = sampling.clusters === null ? '' : `, drawn in ${clusterFacts(sampling)}`;
  const decimals = scaleGrid(group.table.scale).decimals + 1;
  const spread = summary.sd === null ? '' : `, SD ${printNumber(summary.sd, decimals)}`;
  const five = namedFiveNumbers(norms).map(({ name, printed }) =>
    name === 'lowest' || name === 'highest' ? `${name} score ${printed}` : `${name} ${printed}`,
  );
  const sentence = five.join(', ');
  return (
    `${people}${weighted}${drawn}. Mean ${printNumber(summary.mean, decimals)}${spread}. ` +
    `${sentence.charAt(0).toUpperCase()}${sentence.slice(1)}.`
  );
}

function documentationSentences(project: NormProject): readonly string[] {
  const { population, sampling, participation, testDates, weighting } = project.groups.documentation;
  const given: readonly (readonly [string, string])[] = [
    ['Population', population],
    ['Sampling', sampling],
    ['Participation', participation],
    ['Tested', testDates],
    ['Weighting', weighting],
  ];
  return given.filter(([, text]) => text.trim() !== '').map(([head, text]) => `${head}: ${closed(text.trim())}`);
}

function closed(sentence: string): string {
  return /[.!?…]$/.test(sentence) ? sentence : `${sentence}.`;
}

/** Printed text of one column in a row. */
export function cellText(row: ConversionRow, { key }: TableColumn): string {
  switch (key) {
    case 'score':
      return row.scoreText;
    case 'rank':
      return row.printed;
    default:
      return row.texts[key];
  }
}

/** The same with the mark of a rank that was adjusted by hand, where one printed text holds both. */
export function markedText(row: ConversionRow, column: TableColumn): string {
  return column.key === 'rank' ? markedRank(row) : cellText(row, column);
}
