import { changeLines } from '../../shared-core/norms/change-list.ts';
import { comparedProjects } from '../../shared-core/norms/compared-projects.ts';
import { printRanges } from '../../shared-core/norms/group-norms.ts';
import { smoothGroup } from '../../shared-core/norms/group-smoothing.ts';
import { normGroups, type NormGroup } from '../../shared-core/norms/norm-groups.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import type { PrintRange } from '../../shared-core/norms/print-range.ts';
import { smoothingOf } from '../../shared-core/norms/smoothing-choice.ts';
import { readForeignRanks } from '../../shared-core/norms/why-differ-column.ts';
import { explanationInWords, findingInWords } from '../../shared-core/norms/why-differ-words.ts';
import { whyDiffer } from '../../shared-core/norms/why-differ.ts';
import { bootstrapRanks, type BootstrapProgress, type BootstrapResult } from '../../shared-core/precision/bootstrap.ts';
import { countedRank } from '../../shared-core/precision/counted-rank.ts';
import { samplingDesign } from '../../shared-core/precision/sampling-design.ts';
import { printScore } from '../../shared-core/scores/printed-number.ts';
import { summarise } from '../../shared-core/tally/cohort-summary.ts';
import type { ComparedForPage, DifferAnswer } from './compute-message.ts';

/** The group of a key; throws when the project has none such, which is a programmer's mistake. */
function groupOf(project: NormProject, key: string): NormGroup {
  const group = normGroups(project).find((candidate) => candidate.key === key);
  if (group === undefined) throw new RangeError(`no group ${key}`);
  return group;
}

export function rangesOf(project: NormProject, key: string): readonly PrintRange[] {
  const { table } = groupOf(project, key);
  const smoothing = smoothGroup(table, smoothingOf(project, key), project.curve.definition);
  return printRanges(project, table, smoothing.state === 'smoothed' ? smoothing.curve : null);
}

export function differOf(project: NormProject, key: string, text: string): DifferAnswer {
  const { table } = groupOf(project, key);
  const { scale } = table;
  const { column, problems } = readForeignRanks(text, scale);
  if (column === null || column.rows.length === 0) return { problems, finding: null, explanations: [], rows: [] };
  const found = whyDiffer(table, column);
  const words = { direction: scale.direction, decimals: column.decimals } as const;
  return {
    problems,
    finding: findingInWords(found, words.direction, words.decimals),
    explanations:
      found.kind === 'reproduced'
        ? found.explanations.slice(1).map((other) => explanationInWords(other, words.direction, words.decimals))
        : [],
    rows:
      found.kind === 'nearest'
        ? found.disagreeing.map(({ score, theirs, expected }) => ({
            scoreText: printScore(scale, score),
            theirs,
            ours: expected ?? '–',
          }))
        : [],
  };
}

export function comparisonOf(before: NormProject, after: NormProject): ComparedForPage {
  const compared = comparedProjects(before, after);
  if (!compared.ok) return compared;
  const { comparison } = compared;
  return { ok: true, comparison, lines: changeLines(comparison) };
}

/** The samples of a group, step by step; refuses at once where the definition counts nobody. */
export function* bootstrapOf(
  project: NormProject,
  key: string,
): Generator<BootstrapProgress, BootstrapResult, undefined> {
  const { table } = groupOf(project, key);
  const counted = countedRank(project.curve.definition);
  if (counted === null) {
    return {
      ok: false,
      problem: 'Samples are drawn for ranks that count people: define the rank as midpoint, at or below, or below.',
    };
  }
  const { bootstrap, level } = project.precision;
  const { effectiveN } = samplingDesign(table, counted, summarise(table).effectiveN);
  const plan = { ...bootstrap, level, counted, choice: smoothingOf(project, key) };
  return yield* bootstrapRanks(table, effectiveN, plan);
}
