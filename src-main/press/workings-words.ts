import { printRatio } from '../../shared-core/scores/printed-number.ts';
import { ratio } from '../../shared-core/percentile/exact-ratio.ts';
import type { FactKey, WorkingsKey, WorkingsPlan } from './workings-plan.ts';

/** How a column of workings is headed, what it holds, and the format of its numbers. */
export interface WorkingsWords {
  readonly head: string;
  readonly note: string;
  readonly format: string;
}

const WHOLE = '0';
const SHARE = '0.00000000';
const RANK = '0.000000';

/** Head and note of a column in the words of the project. */
export function workingsWords(plan: WorkingsPlan, key: WorkingsKey): WorkingsWords {
  const { project, good, weighted, curve, steps, perClass } = plan;
  const { people, table } = project;
  const heads = people.charAt(0).toUpperCase() + people.slice(1);
  const side = good ? 'below' : 'above';
  const counted = weighted ? 'weight' : people;
  const cumulative = curve === null ? WHOLE : SHARE;
  const whole = (head: string, note: string): WorkingsWords => ({ head, note, format: WHOLE });
  switch (key) {
    case 'score':
      return { head: 'Raw score', note: 'As in the table.', format: 'General' };
    case 'count':
      return whole(heads, `Counted at the score. A value.`);
    case 'weight':
      return plan.route === 'values'
        ? { head: 'Weight', note: 'Sum at the score. A value.', format: 'General' }
        : whole('Weight', `Sum at the score, in units of ${weightUnit(plan)}. A value.`);
    case 'share':
      return { head: 'Smoothed share', note: 'Of the group at the score, 0 to 1. A value.', format: SHARE };
    case 'curve-low':
      return { head: 'Curve, low', note: 'Smoothed share up to half a step below. A value.', format: SHARE };
    case 'curve-middle':
      return { head: 'Curve, middle', note: 'Smoothed share up to the score. A value.', format: SHARE };
    case 'curve-high':
      return { head: 'Curve, high', note: 'Smoothed share up to half a step above. A value.', format: SHARE };
    case 'below':
      return {
        head: good ? 'Below' : 'Above',
        note: `${curve === null ? `All ${counted}` : 'All shares'} ${side}${good ? '' : ', the poorer side'}.`,
        format: cumulative,
      };
    case 'up-to':
      return {
        head: `At or ${side}`,
        note: `${good ? 'Below' : 'Above'} and at the score together.`,
        format: cumulative,
      };
    case 'class-below':
      return whole('Before the class', `All ${counted} in poorer classes.`);
    case 'in-class':
      return whole('In the class', `All ${counted} in the class of ${perClass ?? ''} scores.`);
    case 'place':
      return whole('Place in class', 'From its poorer end, from 1. A value.');
    case 'numerator':
      return whole('Numerator', curve === null ? numeratorNote(plan) : smoothedNote(plan));
    case 'rank':
      return {
        head: 'Percentile rank',
        note: plan.route === 'values' ? 'Unrounded. A value.' : `Numerator / divisor${perStep(steps)}, unrounded.`,
        format: RANK,
      };
    case 'rest':
      return whole('Rest', 'What is left when the numerator is divided by the divisor.');
    case 'whole':
      return whole('Whole', `How often the divisor goes into it${steps === 1 ? '' : ', in tenths'}.`);
    case 'rounded': {
      const half = table.rounding === 'half-up' ? 'goes up' : 'goes to the even one';
      return whole('Rounded', `Up where 2 × rest is above the divisor; a half ${half}.`);
    }
    case 'printed':
      return {
        head: 'Printed',
        note: plan.route === 'values' ? 'As printed. A value.' : endsNote(plan),
        format: steps === 1 ? '0' : '0.0',
      };
    case 'table':
      return { head: 'In the table', note: 'The cell of the table sheet.', format: steps === 1 ? '0' : '0.0' };
    case 'same':
      return { head: 'Agrees', note: '“same”, or by how much; ranks adjusted by hand differ.', format: 'General' };
  }
}

/** Name of a number of the whole group. */
export function factWords({ weighted, curve, steps, project }: WorkingsPlan, key: FactKey): string {
  switch (key) {
    case 'people':
      return `N, ${project.people}`;
    case 'weight-sum':
      return 'Sum of weights';
    case 'offset-top':
      return 'a, numerator';
    case 'offset-bottom':
      return 'a, divisor';
    case 'class-size':
      return 'Scores in a class';
    case 'divisor':
      return weighted || curve !== null ? 'Divisor' : 'Divisor, from N';
    case 'steps':
      return 'Steps in a point';
    case 'highest':
      return steps === 1 ? 'Highest printed' : 'Highest, in tenths';
  }
}

/** How the ranks of the sheet come about, in two or three sentences. */
export function workingsStatement(plan: WorkingsPlan): string {
  switch (plan.route) {
    case 'values':
      return (
        'The weights of this group have so many decimals that spreadsheet programs cannot carry the sums exactly: ranks ' +
        'and printed ranks stand here as values, and are compared with the table.'
      );
    case 'counts':
      return (
        `${plan.weighted ? 'Weights' : 'Counts'} are values; all that follows from them is a formula. ` +
        `${rankStatement(plan)} Numerator, divisor and rest are whole numbers, so that no half is decided by a ` +
        'computer’s approximation.'
      );
    case 'shares':
    case 'curve':
      return (
        `The ${plan.route === 'shares' ? 'smoothed shares' : 'points of the smoothed curve'} are values; ranks and their ` +
        `printing are formulas. ${rankStatement(plan)} It is held to billionths of a point, and from there on all ` +
        'numbers are whole.'
      );
  }
}

function rankStatement({ definition, good, weighted, curve }: WorkingsPlan): string {
  const side = good ? 'below' : 'above';
  const all = curve !== null ? '' : weighted ? ' / sum of weights' : ' / N';
  switch (definition.kind) {
    case 'midpoint':
      return `Percentile rank = 100 × (${side} + half of those at the score)${all}.`;
    case 'at-or-below':
      return `Percentile rank = 100 × at or ${side}${all}.`;
    case 'below':
      return `Percentile rank = 100 × ${side}${all}.`;
    case 'plotting-position':
      return (
        `Percentile rank = 100 × (r − a) / (N + 1 − 2a), with a = ${definition.offset} and the mean rank ` +
        `r = ${curve === null ? `${side} + (at + 1) / 2` : `N × (${side} + half of those at the score) + 1/2`}` +
        `${weighted && curve === null ? ', on weights rescaled to add up to N' : ''}; held between 0 and 100.`
      );
    case 'grouped':
      return (
        `Percentile rank = 100 × (before the class + in the class × (place − 1/2) / scores in a class)${all}, in classes ` +
        `of ${definition.width} points.`
      );
  }
}

function numeratorNote({ definition, good, steps, weighted }: WorkingsPlan): string {
  const hundred = steps === 1 ? '100' : `100 × ${steps}`;
  const side = good ? 'below' : 'above';
  switch (definition.kind) {
    case 'midpoint':
      return `${hundred} × (2 × ${side} + at).`;
    case 'at-or-below':
      return `${hundred} × at or ${side}.`;
    case 'below':
      return `${hundred} × ${side}.`;
    case 'plotting-position':
      return weighted ? `${hundred} × (r − a), in whole numbers.` : `${hundred} × (2r − 2a), in whole numbers.`;
    case 'grouped':
      return `${hundred} × ${weighted ? 'weight' : 'people'} up to the place, in whole numbers.`;
  }
}

function smoothedNote({ steps }: WorkingsPlan): string {
  return `The rank in billionths of a ${steps === 1 ? 'point' : 'tenth of a point'}, whole.`;
}

function perStep(steps: number): string {
  return steps === 1 ? '' : ' / steps';
}

function endsNote({ project, steps }: WorkingsPlan): string {
  const [low, high] = steps === 1 ? ['1', '99'] : ['0.1', '99.9'];
  return project.table.ends === 'held'
    ? `Rounded, held between ${low} and ${high}.`
    : `Rounded; <${low} or >${high} where the unrounded rank lies beyond.`;
}

function weightUnit({ norms }: WorkingsPlan): string {
  const { weightUnit: unit } = norms.group.table;
  return printRatio(ratio(1n, unit), String(unit).length - 1);
}
