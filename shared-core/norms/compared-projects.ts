import { compareEditions, type EditionComparison } from './edition-compare.ts';
import type { NormProject } from './norm-project.ts';
import { buildNormSet, pressProblem, type NormSet, type NormSetBuilt } from './norm-set.ts';

export type ProjectsCompared =
  | {
      readonly ok: true;
      readonly before: NormSet;
      readonly after: NormSet;
      readonly comparison: EditionComparison;
    }
  | { readonly ok: false; readonly problem: string };

/** Two projects worked out and compared, the earlier one first; the problem tells which of them stands in the way. */
export function comparedProjects(before: NormProject, after: NormProject): ProjectsCompared {
  const old = printable(before);
  if (!old.ok) return { ok: false, problem: `The earlier edition cannot be compared. ${old.problem}` };
  const now = printable(after);
  if (!now.ok) return { ok: false, problem: `This edition cannot be compared. ${now.problem}` };
  return {
    ok: true,
    before: old.normSet,
    after: now.normSet,
    comparison: compareEditions(old.normSet, now.normSet),
  };
}

function printable(project: NormProject): NormSetBuilt {
  const built = buildNormSet(project);
  if (!built.ok) return built;
  const problem = pressProblem(built.normSet);
  return problem === null ? built : { ok: false, problem };
}
