import { compareEditions } from '../../shared-core/norms/edition-compare.ts';
import { followRoster, type Cut, type FollowedRoster } from '../../shared-core/norms/erratum-roster.ts';
import { erratumText } from '../../shared-core/norms/erratum.ts';
import { readEditions, type EditionPair, type EditionPaths } from './edition-pair.ts';
import type { ErratumOptions, RosterOptions } from './erratum-options.ts';
import { refused, wrongUsage, type Outcome } from './outcome.ts';
import { readRoster } from './roster-file.ts';

/** The erratum of the earlier of two editions; names of a roster go into the result and nowhere else. */
export async function erratumCommand(paths: EditionPaths, { roster, cut }: ErratumOptions): Promise<Outcome> {
  const editions = await readEditions(paths);
  if (!editions.ok) return refused(editions.problem);
  const { before, after, remarks } = editions.value;
  const followed = roster === null ? null : await follow(editions.value, roster, cut);
  if (followed !== null && 'outcome' in followed) return followed.outcome;
  return { kind: 'done', result: erratumText(compareEditions(before, after), followed), remarks };
}

async function follow(
  { before, after }: EditionPair,
  { path, cohort, byGiven }: RosterOptions,
  cut: Cut | null,
): Promise<FollowedRoster | { readonly outcome: Outcome }> {
  const { by } = before.project.groups;
  const named = byGiven ? cohort.named.by : by;
  if (named.length !== by.length) {
    const problem =
      by.length === 0
        ? 'The projects have one table for all: leave out --by.'
        : `--by names one column for each of ${by.join(', ')}: ${by.length}, not ${named.length}.`;
    return { outcome: wrongUsage(problem) };
  }
  const read = await readRoster(path, { ...cohort, named: { ...cohort.named, by: named } });
  if (read.kind === 'no-such-column') return { outcome: wrongUsage(read.problem) };
  if (read.kind === 'unreadable') return { outcome: refused(read.problem) };
  const result = followRoster(before, after, read.roster, cut);
  return result.ok ? result.followed : { outcome: refused(result.problem) };
}
