import type { GroupNorms } from './group-norms.ts';
import type { NormSet } from './norm-set.ts';

export interface PairedGroups {
  readonly both: readonly { readonly before: GroupNorms; readonly after: GroupNorms }[];
  /** Printed by one of the two alone, in its print order. */
  readonly went: readonly GroupNorms[];
  readonly came: readonly GroupNorms[];
}

/** Whether two sets group people by the same columns, so that equal values name the same group. */
export function groupAlike(before: NormSet, after: NormSet): boolean {
  return JSON.stringify(before.project.groups.by) === JSON.stringify(after.project.groups.by);
}

/**
 * The groups of two sets that belong together: those with the same values of the same grouping columns, and of what is
 * left those with the same title, the first of a title with the first, the second with the second.
 */
export function pairedGroups(before: NormSet, after: NormSet): PairedGroups {
  const partner = new Map<GroupNorms, GroupNorms>();
  const taken = new Set<GroupNorms>();
  const pairBy = (name: (norms: GroupNorms) => string): void => {
    const free = after.groups.filter((norms) => !taken.has(norms));
    for (const norms of before.groups) {
      if (partner.has(norms)) continue;
      const found = free.find((other) => !taken.has(other) && name(other) === name(norms));
      if (found === undefined) continue;
      partner.set(norms, found);
      taken.add(found);
    }
  };
  if (groupAlike(before, after)) pairBy(({ group }) => group.key);
  pairBy(({ group }) => group.title);
  return {
    both: before.groups.flatMap((norms) => {
      const found = partner.get(norms);
      return found === undefined ? [] : [{ before: norms, after: found }];
    }),
    went: before.groups.filter((norms) => !partner.has(norms)),
    came: after.groups.filter((norms) => !taken.has(norms)),
  };
}
