import type { FileHandle } from '../../shared-core/desk.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';

/**
 * What the states of a project's history do not say themselves: which cohort file each was read from, and whether its
 * tally still waits for a reading that was changed.
 */
export class ReadStates {
  readonly #cohorts = new WeakMap<NormProject, FileHandle>();
  readonly #waiting = new WeakSet<NormProject>();

  note(project: NormProject, cohort: FileHandle | null, waits: boolean): void {
    if (cohort === null) this.#cohorts.delete(project);
    else this.#cohorts.set(project, cohort);
    if (waits) this.#waiting.add(project);
    else this.#waiting.delete(project);
  }

  /** Null where no file is at hand. */
  cohortOf(project: NormProject): FileHandle | null {
    return this.#cohorts.get(project) ?? null;
  }

  waits(project: NormProject): boolean {
    return this.#waiting.has(project);
  }
}
