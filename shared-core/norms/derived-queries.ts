import type { GroupNorms } from './group-norms.ts';
import { listed } from './listed.ts';
import type { NormProject } from './norm-project.ts';
import type { AskedOfGroup } from './queries.ts';

/** Whole derived scores with few values, so that a reader looks for each of them, and how many there are. */
const BANDED = [
  ['stanine', 9],
  ['sten', 10],
] as const;

/** What a proof-reader would ask of derived scores that no raw score of the group reaches. */
export function derivedQueries({ table }: NormProject, { group, rows }: GroupNorms): readonly AskedOfGroup[] {
  return BANDED.flatMap(([key, bands]): readonly AskedOfGroup[] => {
    if (!table.columns.includes(key)) return [];
    const reached = new Set(rows.map(({ texts }) => texts[key]));
    const missing = Array.from({ length: bands }, (_, index) => String(index + 1)).filter((band) => !reached.has(band));
    if (missing.length === 0) return [];
    return [
      {
        id: `unreached-${key}`,
        station: 'table',
        weight: 'note',
        lead: `No raw score of ${group.title} gives ${key} ${listed(missing)}.`,
        why: 'One step of the raw score passes over the whole band; a reader may take it for a row that was lost.',
        whatToDo: 'Nothing, or leave the column out.',
      },
    ];
  });
}
