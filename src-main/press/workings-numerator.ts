import type { WorkingsPlaces } from './workings-places.ts';
import type { WorkingsPlan } from './workings-plan.ts';

/**
 * The formula of a score's numerator: the whole number which, divided by the divisor, is its rank in printed steps. It
 * holds the rank between 0 and 100 where sums of doubles or plotting positions could pass them.
 */
export function numeratorFormula(plan: WorkingsPlan, places: WorkingsPlaces, position: number): string {
  switch (plan.route) {
    case 'counts':
      return countedNumerator(plan, places, position);
    case 'shares':
    case 'curve': {
      const rank = `MAX(0,MIN(100,${smoothedRank(plan, places, position)}))`;
      return `ROUND(${places.fact('divisor')}*${rank},0)*${places.fact('steps')}`;
    }
    case 'values':
      throw new RangeError('ranks that are values have no numerator');
  }
}

function countedNumerator(plan: WorkingsPlan, places: WorkingsPlaces, position: number): string {
  const steps = `100*${places.fact('steps')}`;
  const at = places.cell(plan.weighted ? 'weight' : 'count', position);
  const below = places.cell('below', position);
  switch (plan.definition.kind) {
    case 'midpoint':
      return `${steps}*(2*${below}+${at})`;
    case 'at-or-below':
      return `${steps}*${places.cell('up-to', position)}`;
    case 'below':
      return `${steps}*${below}`;
    case 'plotting-position': {
      const [top, bottom] = [places.fact('offset-top'), places.fact('offset-bottom')];
      const people = places.fact('people');
      const all = places.fact(plan.weighted ? 'weight-sum' : 'people');
      const position0 = plan.weighted
        ? `((2*${below}+${at})*${people}+${all})*${bottom}-2*${all}*${top}`
        : `(2*${below}+${at}+1)*${bottom}-2*${top}`;
      return `MAX(0,MIN(${steps}*${places.fact('divisor')},${steps}*(${position0})))`;
    }
    case 'grouped': {
      const [lower, within, place] = [
        places.cell('class-below', position),
        places.cell('in-class', position),
        places.cell('place', position),
      ];
      return `${steps}*(2*${places.fact('class-size')}*${lower}+${within}*(2*${place}-1))`;
    }
  }
}

function smoothedRank(plan: WorkingsPlan, places: WorkingsPlaces, position: number): string {
  switch (plan.definition.kind) {
    case 'midpoint':
      return `100*${middleOf(plan, places, position)}`;
    case 'at-or-below':
      return `100*${upToOf(plan, places, position)}`;
    case 'below':
      return `100*${belowOf(plan, places, position)}`;
    case 'plotting-position': {
      const offset = `${places.fact('offset-top')}/${places.fact('offset-bottom')}`;
      const people = places.fact('people');
      return `100*(${people}*${middleOf(plan, places, position)}+0.5-${offset})/(${people}+1-2*${offset})`;
    }
    case 'grouped': {
      const { first, last } = classOf(plan, position);
      const low = belowOf(plan, places, first);
      const high = upToOf(plan, places, last);
      const into = `(2*${places.cell('place', position)}-1)/(2*${places.fact('class-size')})`;
      return `100*(${low}+(${high}-${low})*${into})`;
    }
  }
}

function belowOf(plan: WorkingsPlan, places: WorkingsPlaces, position: number): string {
  if (plan.route === 'shares') return places.cell('below', position);
  return plan.good ? places.cell('curve-low', position) : `(1-${places.cell('curve-high', position)})`;
}

function middleOf(plan: WorkingsPlan, places: WorkingsPlaces, position: number): string {
  if (plan.route === 'shares') return `(${places.cell('below', position)}+${places.cell('share', position)}/2)`;
  return plan.good ? places.cell('curve-middle', position) : `(1-${places.cell('curve-middle', position)})`;
}

function upToOf(plan: WorkingsPlan, places: WorkingsPlaces, position: number): string {
  if (plan.route === 'shares') return places.cell('up-to', position);
  return plan.good ? places.cell('curve-high', position) : `(1-${places.cell('curve-low', position)})`;
}

/** The class of a position: its ends as positions, the poorer end first, and the place in it, counted from 1 there. */
export function classOf(
  { norms, good, perClass }: WorkingsPlan,
  position: number,
): { readonly first: number; readonly last: number; readonly place: number } {
  if (perClass === null) throw new RangeError('no classes');
  const top = norms.rows.length - 1;
  const fromPoor = good ? position : top - position;
  const start = fromPoor - (fromPoor % perClass);
  const end = Math.min(top, start + perClass - 1);
  const place = fromPoor - start + 1;
  return good ? { first: start, last: end, place } : { first: top - start, last: top - end, place };
}
