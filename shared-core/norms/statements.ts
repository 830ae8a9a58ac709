import { listed } from '../languages/lists.ts';
import { ENGLISH_WORDS } from '../languages/phrases.ts';
import { scaleInWords } from '../scale/score-scale.ts';
import { columnInWords } from './norm-groups.ts';
import type { SmoothingChoice } from '../smoothing/smoothing.ts';
import { intervalStatement, rankStatement, reliabilityStatement, tableStatement } from './method-statements.ts';
import type { NormProject } from './norm-project.ts';
import { smoothingInScope, type SmoothingScope } from './smoothing-alternatives.ts';
import { logLinearIn } from './smoothing-choice.ts';
import { bandwidthInWords, degreeInWords, keptInWords, smoothingInWords } from './smoothing-words.ts';
import { drawnInGeneral } from './sampling-words.ts';

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
  return listed(ENGLISH_WORDS, items);
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
    ...withoutStop(intervalStatement(project)),
    words(`, ${drawnInGeneral(project)}.`),
    words(' '),
    ...reliabilityStatement(project),
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
export function methodText(project: NormProject, words = ENGLISH_WORDS): string {
  const { columns } = project.table;
  return [
    rankStatement(project, words),
    ...(columns.includes('interval') ? [intervalStatement(project, words)] : []),
    ...(columns.includes('measurement-band') ? [reliabilityStatement(project, words)] : []),
    tableStatement(project, words),
  ]
    .map(statementText)
    .join(' ');
}

/** A sentence that goes on. */
function withoutStop(parts: readonly StatementPart[]): readonly StatementPart[] {
  return parts.map((part, index) =>
    index === parts.length - 1 ? { ...part, text: part.text.replace(/\.$/, '') } : part,
  );
}
