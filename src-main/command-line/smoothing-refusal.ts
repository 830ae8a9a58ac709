import { pressProblem, type NormSet } from '../../shared-core/norms/norm-set.ts';
import { smooth } from '../../shared-core/smoothing/smooth.ts';
import type { SmoothingChoice } from '../../shared-core/smoothing/smoothing.ts';
import { smoothingAsOption } from './smooth-option.ts';

/** Why the groups cannot be smoothed as chosen, with the nearest option that works for all of them, or null. */
export function smoothingRefusal(normSet: NormSet): string | null {
  const problem = pressProblem(normSet);
  if (problem === null) return null;
  const offers = normSet.groups.flatMap(({ smoothing }) => (smoothing.state === 'refused' ? [smoothing.instead] : []));
  const option = smoothingAsOption(offers.find((offer) => worksForAll(normSet, offer)) ?? { kind: 'none' });
  return `${problem}${othersRefused(offers.length - 1)} Type --smooth ${option}${
    normSet.groups.length > 1 ? ', which works for every group' : ''
  }.`;
}

function worksForAll({ groups }: NormSet, choice: SmoothingChoice): boolean {
  return choice.kind === 'none' || groups.every(({ group }) => smooth(group.table, choice, 'fit-only').ok);
}

function othersRefused(others: number): string {
  if (others === 0) return '';
  return others === 1 ? ' Another group cannot either.' : ` ${others} other groups cannot either.`;
}
