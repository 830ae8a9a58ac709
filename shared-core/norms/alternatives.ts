import type { NormProject } from './norm-project.ts';
import { definitionInWords, definitionKey } from './definitions.ts';
import type { RankDefinition } from '../percentile/percentile-rank.ts';
import { decimalOf } from '../scale/decimal.ts';
import {
  degreeAlternatives,
  intervalAlternatives,
  levelAlternatives,
  smoothingAlternatives,
  type SmoothingScope,
} from './smoothing-alternatives.ts';
import { sheetAlternatives } from './sheet-alternatives.ts';
import type { ChoiceKey, EditedChoice } from './statements.ts';

/** One way a choice can be made: what it is, what it changes, and the project with it made. */
export interface Alternative {
  readonly label: string;
  readonly explanation: string;
  readonly chosen: boolean;
  readonly project: NormProject;
}

/** Choices that are made from a short list. */
export type ListedChoice = Exclude<ChoiceKey, EditedChoice>;

/** All alternatives of a choice for a project, the present one marked; smoothing is chosen for a scope. */
export function alternatives(
  project: NormProject,
  choice: ListedChoice,
  scope: SmoothingScope = null,
): readonly Alternative[] {
  switch (choice) {
    case 'people':
      return (['pupils', 'students', 'candidates', 'people'] as const).map((people) => ({
        label: people,
        explanation: `The sheet speaks of ${people}.`,
        chosen: project.people === people,
        project: { ...project, people },
      }));
    case 'direction':
      return [
        directionAlternative(
          project,
          'high-is-good',
          'high scores are good',
          'Marks won: a rank tells how many did worse by scoring lower.',
        ),
        directionAlternative(
          project,
          'low-is-good',
          'low scores are good',
          'Seconds or errors: a rank tells how many did worse by scoring higher.',
        ),
      ];
    case 'duplicates':
      return [
        duplicateAlternative(
          project,
          'keep-first',
          'keep the first row',
          'Later rows with the same identifier are left out.',
        ),
        duplicateAlternative(
          project,
          'leave-out-all',
          'keep none of them',
          'Nobody knows which row is right, so none counts.',
        ),
        duplicateAlternative(
          project,
          'keep-all',
          'keep every row',
          'Right only if the identifier does not name a person.',
        ),
      ];
    case 'definition':
      return definitionAlternatives(project);
    case 'smoothing':
      return smoothingAlternatives(project, scope);
    case 'degree':
      return degreeAlternatives(project, scope);
    case 'interval':
      return intervalAlternatives(project);
    case 'level':
      return levelAlternatives(project);
    case 'decimals':
      return [
        tableAlternative(
          project,
          { decimals: 0 },
          'as whole numbers',
          'What most tables print; finer steps are rarely trustworthy.',
        ),
        tableAlternative(
          project,
          { decimals: 1 },
          'to one decimal',
          'For large groups and for work at the ends of the scale.',
        ),
      ];
    case 'rounding':
      return [
        tableAlternative(project, { rounding: 'half-up' }, 'halves rounded up', '62.5 prints 63. The usual rule.'),
        tableAlternative(
          project,
          { rounding: 'half-even' },
          'halves rounded to even',
          '62.5 prints 62, 63.5 prints 64: no drift upwards.',
        ),
      ];
    case 'ends':
      return [
        tableAlternative(
          project,
          { ends: 'signs' },
          'signs at the ends',
          'Below the lowest printed rank stands “<”, above the highest “>”.',
        ),
        tableAlternative(
          project,
          { ends: 'held' },
          'held at the ends',
          'Ranks outside print as the lowest or highest whole rank.',
        ),
      ];
    case 'z-source':
      return [
        tableAlternative(
          project,
          { zSource: 'normalised' },
          'normal deviates of the ranks',
          'z is the point of the normal curve with that rank, whatever the shape of the scores.',
        ),
        tableAlternative(
          project,
          { zSource: 'linear' },
          'linear',
          'z is (score − mean) / SD and keeps the shape of the scores; stanines and stens follow z.',
        ),
      ];
    case 'z-ends':
      return [
        tableAlternative(
          project,
          { zEnds: 'limits' },
          'held between −3 and 3',
          'T prints from 20 to 80. Ranks 0 and 100, which have no z, print the limit.',
        ),
        tableAlternative(
          project,
          { zEnds: 'half-person' },
          'half a person at the ends',
          'Ranks 0 and 100 are taken as half a person from the end; nothing is held.',
        ),
      ];
    case 'booklet':
    case 'paper':
    case 'orientation':
    case 'fours':
    case 'table-columns':
    case 'fives':
    case 'range-rows':
    case 'ogive':
    case 'inverse':
      return sheetAlternatives(project, choice);
  }
}

function directionAlternative(
  project: NormProject,
  direction: 'high-is-good' | 'low-is-good',
  label: string,
  explanation: string,
): Alternative {
  const { tally, reading } = project;
  const now = tally?.scale.direction ?? reading?.scale?.direction ?? 'high-is-good';
  return {
    label,
    explanation,
    chosen: now === direction,
    project: {
      ...project,
      tally: tally === null ? null : { ...tally, scale: { ...tally.scale, direction } },
      reading:
        reading === null || reading.scale === null ? reading : { ...reading, scale: { ...reading.scale, direction } },
    },
  };
}

function duplicateAlternative(
  project: NormProject,
  duplicateId: 'keep-first' | 'leave-out-all' | 'keep-all',
  label: string,
  explanation: string,
): Alternative {
  const { reading } = project;
  return {
    label,
    explanation,
    chosen: reading?.decisions.duplicateId === duplicateId,
    project:
      reading === null
        ? project
        : { ...project, reading: { ...reading, decisions: { ...reading.decisions, duplicateId } } },
  };
}

function definitionAlternatives(project: NormProject): readonly Alternative[] {
  const listed: readonly (readonly [RankDefinition, string])[] = [
    [
      { kind: 'midpoint' },
      'Half of those who share the score count as below. The mean over everybody is 50; the usual choice in testing.',
    ],
    [
      { kind: 'at-or-below' },
      'The height of the cumulative curve. Kind to each score: the best score always stands at 100, printed as the upper end.',
    ],
    [
      { kind: 'below' },
      'Only those surpassed count. Strict: the poorest score always stands at 0, printed as the lower end.',
    ],
    [
      { kind: 'plotting-position', offset: '3/8' },
      'Blom’s position, with a = 3/8: leaves room beyond both ends for people not drawn; best for small groups.',
    ],
    [{ kind: 'plotting-position', offset: '1/3' }, 'Tukey’s position, with a = 1/3.'],
    [
      { kind: 'plotting-position', offset: '1/2' },
      'Hazen’s position, with a = 1/2: the midpoint rank for scores that occur.',
    ],
    [{ kind: 'plotting-position', offset: '0' }, 'Weibull’s and van der Waerden’s position, with a = 0.'],
    [
      { kind: 'grouped', width: fiveTimes(project.tally?.scale.step ?? 1) },
      'Scores are taken in classes and spread evenly within them, as in hand-worked tables. Hides detail within a class.',
    ],
  ];
  const now = definitionKey(project.curve.definition);
  const others: typeof listed = listed.some(([definition]) => definitionKey(definition) === now)
    ? []
    : [[project.curve.definition, 'As this project has it.']];
  const direction = project.tally?.scale.direction ?? 'high-is-good';
  return [...listed, ...others].map(([definition, explanation]) => ({
    label: definitionInWords(definition, direction),
    explanation,
    chosen: definitionKey(definition) === now,
    project: { ...project, curve: { ...project.curve, definition } },
  }));
}

/** Five steps of a scale, free of the error of a product of doubles. */
function fiveTimes(step: number): number {
  const { units, decimals } = decimalOf(step);
  return Number(5n * units) / 10 ** decimals;
}

function tableAlternative(
  project: NormProject,
  change: Partial<NormProject['table']>,
  label: string,
  explanation: string,
): Alternative {
  const table = { ...project.table, ...change };
  return { label, explanation, chosen: sameChoices(project.table, table), project: { ...project, table } };
}

function sameChoices(now: object, then: object): boolean {
  return JSON.stringify(now) === JSON.stringify(then);
}
