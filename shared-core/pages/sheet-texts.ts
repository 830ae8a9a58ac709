import { dateInLanguage } from '../languages/number-format.ts';
import { figure, say, sayCounted, wordsOf, type PrintWords } from '../languages/phrases.ts';
import { asSentence, inSentence } from '../languages/sentence.ts';
import { markedRank } from '../norms/adjustment-words.ts';
import { prints } from '../norms/booklet-blocks.ts';
import { definitionInWords, definitionName } from '../norms/definitions.ts';
import type { ConversionRow } from '../norms/conversion-table.ts';
import { namedFiveNumbers, quarterWord } from '../norms/five-numbers.ts';
import {
  columnInWords,
  countedPeople,
  documentationFields,
  groupNoun,
  standingTitle,
  valueInWords,
  type DocumentationField,
  type NormGroup,
} from '../norms/norm-groups.ts';
import type { GroupNorms } from '../norms/group-norms.ts';
import type { NormSet } from '../norms/norm-set.ts';
import type { NormProject } from '../norms/norm-project.ts';
import { clusterFacts } from '../norms/sampling-words.ts';
import { levelInWords, type TableColumn } from '../norms/table-columns.ts';
import { scaleGrid } from '../scale/score-scale.ts';
import { printCount, printNumber } from '../scores/printed-number.ts';
import { groupMethod } from './group-method.ts';
import type { Paragraph } from './paragraph.ts';

/** The title of a group as it is printed: the user's, or made of the values of its columns. */
export function printedTitle(project: NormProject, { title, values }: NormGroup): string {
  const { groups, people } = project;
  return title === standingTitle(groups.by, values, people)
    ? standingTitle(groups.by, values, people, wordsOf(project))
    : title;
}

/** "Raw score to percentile rank, grade 5". */
export function sheetTitle(project: NormProject, { group }: GroupNorms): string {
  const { by } = project.groups;
  const words = wordsOf(project);
  const printed = printedTitle(project, group);
  const given = group.title !== standingTitle(by, group.values, project.people);
  const standing =
    by.length === 0
      ? inSentence(words, printed)
      : by
          .map((column, index) => {
            const value = valueInWords(group.values[index], words);
            return `${inSentence(words, columnInWords(column))} ${value}`;
          })
          .join(', ');
  const title = project.sheet.title.trim();
  if (title === '') return printed;
  return say(words, 'sheet.title-with-group', { title, group: given ? printed : standing });
}

/** "Table 2 · Grade 5". */
export function tableName(project: NormProject, index: number, { group }: GroupNorms): string {
  return say(wordsOf(project), 'head.table', { number: String(index + 1), title: printedTitle(project, group) });
}

/** What the definition counts, under the title. */
export function sheetSubtitle(project: NormProject): string {
  const words = wordsOf(project);
  const direction = project.tally?.scale.direction ?? 'high-is-good';
  const definition = definitionInWords(project.curve.definition, direction, words);
  const noun = groupNoun(project.groups.documentation);
  return say(words, noun === 'sample' ? 'sheet.subtitle-sample' : 'sheet.subtitle-norm-group', { definition });
}

/** Left side of the running head: what the booklet is about. */
export function surveyName({ title, subtitle }: NormProject): string {
  return [title.trim(), subtitle.trim()].filter((part) => part !== '').join(' · ');
}

/** Stands before titles of a set that is not released; nothing otherwise. */
export function draftMark({ status, project }: NormSet): string {
  return status === 'draft' ? say(wordsOf(project), 'head.draft') : '';
}

/** A title, marked where the set is a draft. */
export function draftTitle(normSet: NormSet, title: string): string {
  return [draftMark(normSet), title].filter((part) => part !== '').join(' · ');
}

/** Left side of the foot of a group's page: which edition this is and what its numbers are. */
export function editionLine(normSet: NormSet, { summary, smoothing }: GroupNorms): string {
  const { project } = normSet;
  return footLine(
    normSet,
    smoothing.state === 'smoothed' ? 'foot.definition-smoothed' : 'foot.definition',
    countedPeople(printCount(summary.n), project.people, wordsOf(project)),
  );
}

/** The same of a page that belongs to no single group. */
export function bookletLine(normSet: NormSet): string {
  const { groups, project } = normSet;
  const words = wordsOf(project);
  const people = printCount(groups.reduce((sum, { summary }) => sum + summary.n, 0));
  const count = printCount(groups.length);
  const smoothed = groups.filter(({ smoothing }) => smoothing.state === 'smoothed').length;
  return footLine(
    normSet,
    smoothed === 0
      ? 'foot.definition'
      : smoothed === groups.length
        ? 'foot.definition-smoothed'
        : 'foot.definition-smoothed-in-part',
    sayCounted(words, 'foot.groups', count, {
      count: figure(words, count),
      people: countedPeople(people, project.people, words),
    }),
  );
}

function footLine(
  normSet: NormSet,
  definition: 'foot.definition' | 'foot.definition-smoothed' | 'foot.definition-smoothed-in-part',
  people: string,
): string {
  const { project, check } = normSet;
  const { edition, date } = project.release;
  const words = wordsOf(project);
  return [
    ...(normSet.status === 'draft' ? [draftMark(normSet)] : []),
    ...(edition.trim() === '' ? [] : [say(words, 'foot.edition', { edition: edition.trim() })]),
    ...(date === '' ? [] : [dateInLanguage(date, words.numbers)]),
    say(words, 'foot.check', { check }),
    say(words, definition, { definition: definitionName(project.curve.definition, words) }),
    people,
  ].join(' · ');
}

/**
 * The paragraphs beside the picture, in order; those without text are left out, and those that a block of the booklet
 * tells for all groups.
 */
export function notesOf({ project }: NormSet, norms: GroupNorms): readonly Paragraph[] {
  const { sheet } = project;
  const words = wordsOf(project);
  const noun = groupNoun(project.groups.documentation);
  const documentation = prints(sheet, 'norm-group') ? [] : documentationSentences(project);
  return [
    {
      lead: say(words, noun === 'sample' ? 'notes.sample' : 'notes.norm-group'),
      text: [sampleFacts(project, norms), ...documentation].join(' '),
    },
    ...(prints(sheet, 'technical-notes')
      ? []
      : [{ lead: say(words, 'notes.method'), text: groupMethod(project, norms) }]),
    ...(sheet.notes.trim() === '' ? [] : [{ lead: say(words, 'notes.notes'), text: sheet.notes.trim() }]),
  ];
}

/** The words under the picture. */
export function figureCaption(project: NormProject, { smoothing, precision }: GroupNorms): string {
  const words = wordsOf(project);
  const worse = say(words, project.tally?.scale.direction === 'low-is-good' ? 'worse.above' : 'worse.below');
  const steps = say(words, 'caption.steps', { worse });
  const curve = say(words, smoothing.state === 'smoothed' ? 'caption.curve-smoothed' : 'caption.curve');
  if (precision.intervals === null) return say(words, 'caption.without-band', { steps, curve });
  return say(words, 'caption.with-band', {
    steps,
    curve,
    level: levelInWords(project, words),
    interval: say(words, `interval.${project.precision.interval}`),
  });
}

/** The picture for those who do not see it: what it shows, and the numbers of the group. */
export function figureInWords(project: NormProject, norms: GroupNorms): string {
  return `${figureCaption(project, norms)} ${sampleFacts(project, norms)}`;
}

/** n, mean, SD and five numbers in a sentence or two. */
export function sampleFacts(project: NormProject, norms: GroupNorms): string {
  const { summary, group } = norms;
  const words = wordsOf(project);
  const decimals = scaleGrid(group.table.scale).decimals + 1;
  const mean = figure(words, printNumber(summary.mean, decimals));
  const centre =
    summary.sd === null
      ? say(words, 'facts.mean', { mean })
      : say(words, 'facts.mean-and-sd', { mean, sd: figure(words, printNumber(summary.sd, decimals)) });
  return [peopleFacts(project, norms), centre, asSentence(fiveInWords(norms, words))]
    .map((sentence) => `${sentence}.`)
    .join(' ');
}

/** "312 pupils, weighted, with an effective n of 290.4, drawn in 24 clusters". */
function peopleFacts(project: NormProject, { summary, sampling, group }: GroupNorms): string {
  const words = wordsOf(project);
  const counted = countedPeople(printCount(summary.n), project.people, words);
  const n = figure(words, printNumber(summary.effectiveN, 1));
  const people = group.table.weighted ? say(words, 'facts.weighted', { people: counted, n }) : counted;
  if (sampling.clusters === null) return people;
  return say(words, 'facts.drawn', { people, clusters: clusterFacts(sampling, words) });
}

/** The five numbers one after the other. */
function fiveInWords(norms: GroupNorms, words: PrintWords): string {
  const quarter = quarterWord(norms.group.table);
  const keys = ['lowest', `lower-${quarter}`, 'median', `upper-${quarter}`, 'highest'] as const;
  return namedFiveNumbers(norms)
    .map(({ printed }, index) => say(words, `five.${keys[index] ?? 'median'}`, { score: figure(words, printed) }))
    .join(', ');
}

function documentationSentences(project: NormProject): readonly string[] {
  return documentationOf(project).map(({ field, text }) => say(wordsOf(project), `documentation.${field}`, { text }));
}

/** What is told of the norm group, as sentences; what is not told is left out. */
export function documentationOf(
  project: NormProject,
): readonly { readonly field: DocumentationField; readonly text: string }[] {
  return documentationFields(project.groups.documentation).flatMap(({ field, text }) =>
    text === null ? [] : [{ field, text: closed(text) }],
  );
}

function closed(sentence: string): string {
  return /[.!?…]$/.test(sentence) ? sentence : `${sentence}.`;
}

/** Text of one column in a row, as the norm set has it: what machines read, and the screen. */
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

/** The same as it is printed in the language of the booklet. */
export function printedCell(words: PrintWords, row: ConversionRow, column: TableColumn): string {
  return figure(words, cellText(row, column));
}

/** The same with the mark of a rank that was adjusted by hand, where one printed text holds both. */
export function markedText(words: PrintWords, row: ConversionRow, column: TableColumn): string {
  return column.key === 'rank' ? figure(words, markedRank(row)) : printedCell(words, row, column);
}
