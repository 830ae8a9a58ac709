import { scaleInWords } from '../scale/score-scale.ts';
import { columnInWords, onePerson } from './norm-groups.ts';
import { definitionInWords } from './definitions.ts';
import type { SmoothingChoice } from '../smoothing/smoothing.ts';
import type { NormProject } from './norm-project.ts';
import { smoothingInScope, type SmoothingScope } from './smoothing-alternatives.ts';
import { logLinearIn } from './smoothing-choice.ts';
import { bandwidthInWords, degreeInWords, intervalName, keptInWords, smoothingInWords } from './smoothing-words.ts';
import { drawnInGeneral } from './sampling-words.ts';
import { columnOf } from './table-columns.ts';

/** Phrases of the statements that stand for a choice. */
export type ChoiceKey =
  | 'people'
  | 'direction'
  | 'scale'
  | 'missing'
  | 'duplicates'
  | 'grouping'
  | 'definition'
  | 'smoothing'
  | 'degree'
  | 'kept'
  | 'bandwidth'
  | 'level'
  | 'interval'
  | 'reliability'
  | 'decimals'
  | 'rounding'
  | 'ends'
  | 'columns'
  | 'z-source'
  | 'z-ends'
  | 'booklet'
  | 'paper'
  | 'orientation'
  | 'margin'
  | 'gutter'
  | 'fours'
  | 'table-columns'
  | 'row-type'
  | 'row-height'
  | 'fives'
  | 'range-rows'
  | 'ogive'
  | 'inverse'
  | 'edition'
  | 'date'
  | 'analyst'
  | 'checker';

/** Choices that take a number, a text or several ticks; all others are made from a list. */
export const EDITED_CHOICES = [
  'scale',
  'missing',
  'grouping',
  'kept',
  'bandwidth',
  'reliability',
  'columns',
  'margin',
  'gutter',
  'row-type',
  'row-height',
  'edition',
  'date',
  'analyst',
  'checker',
] as const satisfies readonly ChoiceKey[];

export type EditedChoice = (typeof EDITED_CHOICES)[number];

export interface StatementPart {
  readonly text: string;
  /** Null for plain words. */
  readonly choice: ChoiceKey | null;
}

/** Plain words of a statement. */
export function words(text: string): StatementPart {
  return { text, choice: null };
}

/** Words of a statement that stand for a choice. */
export function phrase(choice: ChoiceKey, text: string): StatementPart {
  return { choice, text };
}

/** The statement as one plain sentence, for print. */
export function statementText(parts: readonly StatementPart[]): string {
  return parts.map((part) => part.text).join('');
}

/** "a, b and c" */
export function joined(items: readonly string[]): string {
  return items.length < 2 ? items.join('') : `${items.slice(0, -1).join(', ')} and ${items.at(-1)}`;
}

export function cohortStatement(project: NormProject): readonly StatementPart[] {
  const reading = project.reading;
  const scale = reading?.scale ?? project.tally?.scale ?? null;
  const declared = reading === null || reading.scale !== null;
  const codes = reading?.missing ?? [];
  const duplicates = reading?.decisions.duplicateId ?? 'keep-first';
  const hasId = reading?.roles.some(({ role }) => role === 'id') ?? false;
  return [
    words('The rows are '),
    phrase('people', project.people),
    words(' whose scores run from '),
    phrase(
      'scale',
      scale === null ? 'the lowest to the highest met' : `${scaleInWords(scale)}${declared ? '' : ', as met'}`,
    ),
    words('; '),
    phrase('direction', scale?.direction === 'low-is-good' ? 'low scores are good' : 'high scores are good'),
    ...(reading === null
      ? []
      : [
          words('. '),
          phrase(
            'missing',
            codes.length === 0 ? 'No code stands' : `${joined(codes)} ${codes.length === 1 ? 'stands' : 'stand'}`,
          ),
          words(' for a missing score'),
        ]),
    ...(hasId
      ? [
          words('; of repeated identifiers '),
          phrase(
            'duplicates',
            {
              'keep-first': 'the first row is kept',
              'leave-out-all': 'no row is kept',
              'keep-all': 'every row is kept',
            }[duplicates],
          ),
        ]
      : []),
    words('.'),
  ];
}

export function groupsStatement(project: NormProject): readonly StatementPart[] {
  const { by } = project.groups;
  const columns = by.map((column) => columnInWords(column).toLowerCase());
  return [
    words('There is '),
    phrase(
      'grouping',
      by.length === 0 ? `one table for all ${project.people}` : `one table for each ${columns.join(' and ')}`,
    ),
    words('.'),
  ];
}

/** The whole statement of the Curve station; smoothing as it is in the scope given. */
export function curveStatement(project: NormProject, scope: SmoothingScope = null): readonly StatementPart[] {
  return [
    ...rankStatement(project),
    words(' '),
    ...smoothingStatement(smoothingInScope(project, scope)),
    words(' '),
    ...intervalStatement(project, `, ${drawnInGeneral(project)}.`),
    words(' '),
    ...reliabilityStatement(project),
  ];
}

function rankStatement(project: NormProject): readonly StatementPart[] {
  const direction = project.tally?.scale.direction ?? 'high-is-good';
  const one = onePerson(project.people);
  return [
    words(`A ${one}’s percentile rank is the share of the group scoring `),
    phrase('definition', definitionInWords(project.curve.definition, direction)),
    words('.'),
  ];
}

function smoothingStatement(smoothing: SmoothingChoice): readonly StatementPart[] {
  const model = logLinearIn(smoothing);
  return [
    words('The distribution is '),
    phrase('smoothing', smoothingInWords(smoothing)),
    ...(model === null
      ? []
      : [
          words(' whose degree is '),
          phrase('degree', degreeInWords(model.degree)),
          words(', keeping '),
          phrase('kept', keptInWords(model)),
        ]),
    ...(smoothing.kind === 'kernel'
      ? [words(', with a bandwidth '), phrase('bandwidth', bandwidthInWords(smoothing.bandwidth))]
      : []),
    words('.'),
  ];
}

function intervalStatement({ precision }: NormProject, end = '.'): readonly StatementPart[] {
  return [
    words('The sampling error of a rank is told by its '),
    phrase('level', `${precision.level} %`),
    words(' '),
    phrase('interval', `${intervalName(precision.interval)} interval`),
    words(end),
  ];
}

function reliabilityStatement({ precision }: NormProject): readonly StatementPart[] {
  return [
    words('The reliability of the test is '),
    phrase('reliability', precision.reliability === null ? 'not given' : String(precision.reliability)),
    words('.'),
  ];
}

export function tableStatement(project: NormProject): readonly StatementPart[] {
  const { columns, decimals, rounding, ends, zSource, zEnds } = project.table;
  const names = columns.map((key) => columnOf(key, project).name);
  const derived = columns.some(
    (key) => ['z', 't', 'nce', 'deviation', 'sten'].includes(key) || (key === 'stanine' && zSource === 'linear'),
  );
  const low = decimals === 0 ? '1' : '0.1';
  const high = decimals === 0 ? '99' : '99.9';
  return [
    words('Percentile ranks are printed '),
    phrase('decimals', decimals === 0 ? 'as whole numbers' : 'to one decimal'),
    words(', '),
    phrase('rounding', rounding === 'half-up' ? 'halves rounded up' : 'halves rounded to even'),
    words(', '),
    phrase('ends', ends === 'signs' ? `with <${low} and >${high} at the ends` : `held at ${low} and ${high}`),
    words('; beside them '),
    phrase(
      'columns',
      names.length === 0 ? 'nothing else' : names.length === 1 ? `the ${names[0]}` : `the ${joined(names)}`,
    ),
    words('.'),
    ...(derived
      ? [
          words(' z scores are '),
          phrase(
            'z-source',
            zSource === 'normalised' ? 'normal deviates of the ranks' : 'linear, from mean and standard deviation',
          ),
          words('; '),
          phrase(
            'z-ends',
            zEnds === 'limits' ? 'they are held between −3 and 3' : 'at ranks 0 and 100 half a person stands in',
          ),
          words('.'),
        ]
      : []),
  ];
}

export function releaseStatement(project: NormProject): readonly StatementPart[] {
  const { edition, date, analyst, checker } = project.release;
  return [
    words('This is edition '),
    phrase('edition', edition.trim() === '' ? '(no number)' : edition),
    words(', dated '),
    phrase('date', date === '' ? '(no date)' : date),
    words(', prepared by '),
    phrase('analyst', analyst.trim() === '' ? '(nobody yet)' : analyst),
    words(', checked by '),
    phrase('checker', checker.trim() === '' ? '(nobody yet)' : checker),
    words('.'),
  ];
}

/** What of the method holds for all tables, as it is printed. Each group's smoothing has a statement of its own. */
export function methodText(project: NormProject): string {
  const { columns } = project.table;
  return [
    rankStatement(project),
    ...(columns.includes('interval') ? [intervalStatement(project)] : []),
    ...(columns.includes('measurement-band') ? [reliabilityStatement(project)] : []),
    tableStatement(project),
  ]
    .map(statementText)
    .join(' ');
}
