import { setImmediate } from 'node:timers/promises';
import type { Reply } from '../../shared-core/desk.ts';
import type { GroupBootstrap } from '../../shared-core/norms/bootstrap-file.ts';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { smoothingOf } from '../../shared-core/norms/smoothing-choice.ts';
import { bootstrapRanks, type BootstrapPlan, type BootstrapResult } from '../../shared-core/precision/bootstrap.ts';
import { countedRank } from '../../shared-core/precision/counted-rank.ts';
import type { FrequencyTable } from '../../shared-core/tally/frequency-table.ts';
import type { BootstrapOptions } from './precision-options.ts';

/** A bootstrap of every group, by its key; each group is drawn from the same seed. */
export async function groupBootstraps(
  { project, groups }: NormSet,
  { replicates, seed }: BootstrapOptions,
): Promise<Reply<ReadonlyMap<string, GroupBootstrap>>> {
  const counted = countedRank(project.curve.definition);
  if (counted === null) throw new RangeError('a bootstrap of ranks that are no share of a count');
  const made = new Map<string, GroupBootstrap>();
  for (const { group, sampling } of groups) {
    const choice = smoothingOf(project, group.key);
    const plan = { choice, counted, replicates, seed, level: project.precision.level };
    const result = await drawn(group.table, sampling.effectiveN, plan);
    if (!result.ok) return { ok: false, problem: `${group.title}: ${result.problem}` };
    made.set(group.key, { seed, bootstrapped: result.bootstrapped });
  }
  return { ok: true, value: made };
}

/** Lets an interrupt from the keyboard in between samples. */
async function drawn(table: FrequencyTable, effectiveN: number, plan: BootstrapPlan): Promise<BootstrapResult> {
  const samples = bootstrapRanks(table, effectiveN, plan);
  for (;;) {
    const next = samples.next();
    if (next.done === true) return next.value;
    await setImmediate();
  }
}
