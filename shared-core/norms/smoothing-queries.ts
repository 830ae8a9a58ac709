import type { GroupNorms } from './group-norms.ts';
import type { NormProject } from './norm-project.ts';
import type { AskedOfGroup } from './queries.ts';
import { listed } from './listed.ts';

/** What a proof-reader would ask of a group's smoothing and of how sure its ranks are. */
export function smoothingQueries(project: NormProject, norms: GroupNorms): readonly AskedOfGroup[] {
  return [...fitQueries(norms), ...precisionQueries(project, norms)];
}

function fitQueries({ group, smoothing, evidence }: GroupNorms): readonly AskedOfGroup[] {
  if (smoothing.state === 'refused') {
    return [
      {
        id: 'smoothing-refused',
        station: 'curve',
        weight: 'must',
        lead: `${group.title} cannot be smoothed so.`,
        why: smoothing.problem,
        whatToDo: 'Until then its table is not pressed.',
      },
    ];
  }
  if (evidence === null) return [];
  const asked: AskedOfGroup[] = [];
  if (evidence.filledGaps.length > 0) {
    asked.push({
      id: 'smoothing-fills-gap',
      station: 'curve',
      weight: 'should',
      lead: `Smoothing puts people at ${listed(evidence.filledGaps)}, where nobody in ${group.title} is.`,
      why: 'The curve expects five or more there: such a score may be impossible, or rarely given.',
      whatToDo: 'Keep the share of these scores apart in the model, or say why the gap is an accident.',
    });
  }
  if (evidence.inventedDips.length > 0) {
    asked.push({
      id: 'smoothing-invents-dip',
      station: 'curve',
      weight: 'should',
      lead: `The smooth curve dips at ${listed(evidence.inventedDips)}; the data do not.`,
      why: 'A high degree bends where the sample is thin.',
      whatToDo: 'Take a lower degree.',
    });
  }
  if (evidence.nearlyAsGood.length > 0) {
    asked.push({
      id: 'degree-nearly-as-good',
      station: 'curve',
      weight: 'note',
      lead: `Degree ${listed(evidence.nearlyAsGood.map(String))} does as well by BIC.`,
      why: 'Its BIC is lower than that of the degree taken, or at most 2 higher.',
      whatToDo: 'Look at which printed ranks hang on it: the range of defensible ranks tells.',
    });
  }
  return asked;
}

function precisionQueries(project: NormProject, { group, precision }: GroupNorms): readonly AskedOfGroup[] {
  const { columns } = project.table;
  const asked: AskedOfGroup[] = [];
  if (columns.includes('interval') && precision.intervalProblem !== null) {
    asked.push({
      id: 'no-interval',
      station: 'table',
      weight: 'must',
      lead: `The interval column of ${group.title} is empty.`,
      why: precision.intervalProblem,
      whatToDo: 'Choose so at the Curve station, or leave the column out.',
    });
  }
  if (columns.includes('measurement-band') && precision.bands === null) {
    asked.push({
      id: 'no-reliability',
      station: 'table',
      weight: 'must',
      lead: `The measurement band of ${group.title} is empty.`,
      why: precision.bandProblem ?? 'It needs the reliability of the test.',
      whatToDo: 'Give the reliability at the Curve station, or leave the column out.',
    });
  }
  return asked;
}
