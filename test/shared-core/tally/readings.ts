import type { Reading } from '../../../shared-core/norms/reading.ts';
import { cohortCounter, type CountedCohort } from '../../../shared-core/tally/cohort-counter.ts';
import { FirstIdentities, type Identities } from '../../../shared-core/tally/cohort-counter-identities.ts';

/** A reading of people with the roles given as "column role" and everything else at its plainest. */
export function readingWith(
  roles: Readonly<Record<string, Reading['roles'][number]['role']>>,
  more: Partial<Reading> = {},
): Reading {
  return {
    layout: 'people',
    encoding: 'utf-8',
    separator: ',',
    decimalMark: '.',
    header: true,
    sheet: null,
    roles: Object.entries(roles).map(([column, role]) => ({ column, role })),
    missing: [],
    scale: { min: 0, max: 20, step: 1, direction: 'high-is-good' },
    decisions: { duplicateId: 'keep-first', raggedRow: 'leave-out', blankGroup: 'leave-out', blankCluster: 'alone' },
    ...more,
  };
}

/** Rows below a heading counted in one pass; throws the refusal. */
export function countRows(
  reading: Reading,
  columns: readonly string[],
  rows: readonly (readonly string[])[],
  identities: Identities | null = new FirstIdentities(),
): CountedCohort {
  const counted = tryRows(reading, columns, rows, identities);
  if (typeof counted === 'string') throw new Error(counted);
  return counted;
}

/** The same, with the refusal as a text. */
export function tryRows(
  reading: Reading,
  columns: readonly string[],
  rows: readonly (readonly string[])[],
  identities: Identities | null = new FirstIdentities(),
): CountedCohort | string {
  const made = cohortCounter(reading, columns, identities);
  if (!made.ok) return made.problem;
  rows.forEach((row, index) => made.value.add(row, index + 2));
  const counted = made.value.finish();
  return counted.ok ? counted.value : counted.problem;
}
