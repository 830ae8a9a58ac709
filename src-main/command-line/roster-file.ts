import { basename } from 'node:path';
import type { Roster } from '../../shared-core/norms/erratum-roster.ts';
import { rosterPeople } from '../erratum/roster-people.ts';
import { chosenReading } from './chosen-reading.ts';
import type { CohortOptions } from './cohort-options.ts';

export type RosterRead =
  | { readonly kind: 'read'; readonly roster: Roster }
  | { readonly kind: 'no-such-column'; readonly problem: string }
  | { readonly kind: 'unreadable'; readonly problem: string };

/** The people of a roster, read as the options say; identifiers are their names or codes. */
export async function readRoster(path: string, options: CohortOptions): Promise<RosterRead> {
  const file = basename(path);
  const chosen = await chosenReading(path, file, options);
  if (chosen.kind !== 'chosen') return chosen;
  const { score, id, by } = options.named;
  const read = await rosterPeople(path, file, chosen.reading, { score, person: id, by });
  return read.ok ? { kind: 'read', roster: read.value } : { kind: 'unreadable', problem: read.problem };
}
