import type { NormSet } from './norm-set.ts';
import { openMustQueries, type Query } from './queries.ts';
import { signedByOne } from './signatures.ts';

/** What an edition still lacks before it can be released, with where it is put right. */
export type ReleaseGap =
  | { readonly kind: 'query'; readonly query: Query }
  | { readonly kind: 'edition' | 'analyst' | 'checker' | 'same-person'; readonly problem: string };

/** Everything that stands in the way of a release, in the order in which it is best done; nothing where it is ready. */
export function releaseGaps({ project, queries }: NormSet): readonly ReleaseGap[] {
  const { edition, analyst, checker } = project.release;
  const gaps: ReleaseGap[] = openMustQueries(queries).map((query) => ({ kind: 'query', query }));
  if (edition.trim() === '') gaps.push({ kind: 'edition', problem: 'The edition has no number. Give it one.' });
  if (analyst.trim() === '') {
    gaps.push({ kind: 'analyst', problem: 'Nobody has signed as analyst. Name who prepared the tables.' });
  }
  if (checker.trim() === '') {
    gaps.push({ kind: 'checker', problem: 'Nobody has signed as checker. Name who checked the tables.' });
  }
  if (signedByOne(project)) {
    gaps.push({
      kind: 'same-person',
      problem: 'Analyst and checker are the same person. Let somebody else check the tables and sign.',
    });
  }
  return gaps;
}

/** The gaps as one text, or null where there are none. */
export function releaseProblem(normSet: NormSet): string | null {
  const told = releaseGaps(normSet).map((gap) =>
    gap.kind === 'query' ? `Still open: ${asked(gap.query)}` : gap.problem,
  );
  return told.length === 0 ? null : `This edition cannot be released yet. ${told.join(' ')}`;
}

function asked({ lead, whatToDo }: Query): string {
  return `${lead} ${whatToDo}`;
}
