import type { GroupNorms } from '../../shared-core/norms/group-norms.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import type { NormSetBuilt } from '../../shared-core/norms/norm-set.ts';
import { openQueries, type Query } from '../../shared-core/norms/queries.ts';
import { compute } from '../compute/compute.ts';

/** The norm set of the project that was last worked out, beside the page. */
export class BuiltNorms {
  built = $state.raw<NormSetBuilt>({ ok: false, problem: 'The tables are being worked out.' });
  /** The project that `built` belongs to. */
  builtFor = $state.raw<NormProject | null>(null);
  #wanted: NormProject | null = null;

  readonly groups: readonly GroupNorms[] = $derived(this.built.ok ? this.built.normSet.groups : []);
  readonly queries: readonly Query[] = $derived(this.built.ok ? this.built.normSet.queries : []);
  readonly open: readonly Query[] = $derived(openQueries(this.queries));

  /** Works a project out; an answer that another question has overtaken is dropped. */
  async build(project: NormProject): Promise<void> {
    this.#wanted = project;
    const built = await compute.ask({ kind: 'norm-set', project }).then(
      (answer) => answer.built,
      (fault: unknown): NormSetBuilt => ({
        ok: false,
        problem: `The tables could not be worked out (${fault instanceof Error ? fault.message : 'unknown fault'}). Undo the last choice.`,
      }),
    );
    if (this.#wanted !== project) return;
    this.built = built;
    this.builtFor = project;
  }
}
