import type { ClassTable } from '../../../shared-core/class/class-table.ts';
import { readPublishedTable, type PublishedFacts } from '../../../shared-core/class/published-table.ts';

/** A published table of the invented Ostrey Vale of which only the lines are missing. */
export const PUBLISHED_FACTS: PublishedFacts = {
  title: 'Ostrey Vale spelling (invented)',
  form: 'Form A',
  edition: '2',
  date: '2026-06-15',
  cited: 'Ostrey Vale handbook (invented), table 4',
  definition: 'unknown',
  population: 'All pupils of the invented Ostrey Vale',
  n: 412,
  direction: null,
  step: null,
  peopleNoun: 'pupils',
};

export function publishedTable(text: string, facts: Partial<PublishedFacts> = {}): ClassTable {
  const { table, problems } = readPublishedTable(text, { ...PUBLISHED_FACTS, ...facts });
  if (table === null) throw new Error(JSON.stringify(problems));
  return table;
}
