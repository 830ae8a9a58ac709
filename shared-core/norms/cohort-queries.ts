import { printShare } from '../scores/printed-number.ts';
import type { NormProject } from './norm-project.ts';
import { policySays } from './policy.ts';
import type { Asked } from './queries.ts';

/** What a proof-reader would ask of the file and how it was read. */
export function cohortQueries({ source, reading, policy }: NormProject): readonly Asked[] {
  if (source === null) return [];
  const asked: Asked[] = [];
  const out = source.rowsRead - source.rowsKept;
  if (source.scaleInferred) {
    asked.push({
      id: 'scale-inferred',
      station: 'cohort',
      weight: 'must',
      group: null,
      lead: 'Is this the whole scale?',
      why: 'Its ends were taken from the scores that occur; a score that nobody obtained would have no row.',
      whatToDo: 'Declare the lowest and the highest attainable score.',
    });
  }
  if (source.rowsRead > 0 && out / source.rowsRead > policy.mostLeftOut.value) {
    asked.push({
      id: 'many-left-out',
      station: 'cohort',
      weight: 'should',
      group: null,
      lead: `${printShare(out / source.rowsRead)} of the rows are left out.`,
      why: `If those left out differ from the others, every rank shifts. ${policySays(policy, 'mostLeftOut')}`,
      whatToDo: 'Look at the rules of the exclusion flow and the rows they name.',
    });
  }
  if (reading?.decisions.duplicateId === 'keep-all' && reading.roles.some(({ role }) => role === 'id')) {
    asked.push({
      id: 'duplicates-kept',
      station: 'cohort',
      weight: 'should',
      group: null,
      lead: 'Repeated identifiers are kept.',
      why: 'A person who stands in the file twice counts twice.',
      whatToDo: 'Keep the first row of each, or give the reason for keeping all.',
    });
  }
  return asked;
}
