import type { RefusedAdjustment } from './adjustments.ts';
import type { GroupNorms } from './group-norms.ts';
import { listed } from './listed.ts';
import { groupKey } from './norm-groups.ts';
import type { Asked } from './queries.ts';

/** What a proof-reader would ask of ranks changed by hand: those that cannot stand, and those that do. */
export function adjustmentQueries(
  groups: readonly GroupNorms[],
  refused: readonly RefusedAdjustment[],
): readonly Asked[] {
  return [...refusedQueries(groups, refused), ...madeQueries(groups)];
}

function refusedQueries(groups: readonly GroupNorms[], refused: readonly RefusedAdjustment[]): readonly Asked[] {
  const seen = new Map<string, number>();
  return refused.map(({ adjustment, problem }) => {
    const key = groupKey(adjustment.values);
    const row = `adjustment:${adjustment.score}:${key}`;
    const before = seen.get(row) ?? 0;
    seen.set(row, before + 1);
    return {
      id: before === 0 ? row : `${row}:${before + 1}`,
      station: 'table',
      weight: 'must',
      group: groups.some(({ group }) => group.key === key) ? key : null,
      lead: `A rank adjusted by hand cannot be printed as ${adjustment.to}.`,
      why: problem,
      whatToDo: 'Choose any rank of the table to see the adjustments. Until then nothing is pressed.',
    };
  });
}

function madeQueries(groups: readonly GroupNorms[]): readonly Asked[] {
  return groups.flatMap(({ group, rows }): readonly Asked[] => {
    const adjusted = rows.filter((row) => row.adjusted !== null).map(({ scoreText }) => scoreText);
    if (adjusted.length === 0) return [];
    return [
      {
        id: `adjusted:${group.key}`,
        station: 'table',
        weight: 'note',
        group: group.key,
        lead: `Ranks of ${group.title} are adjusted by hand at ${listed(adjusted)}.`,
        why: 'They no longer follow from the counts; each is marked in print, with its reason.',
        whatToDo: 'Nothing, if the reasons hold for this edition.',
      },
    ];
  });
}
