import type { NormProject } from '../../shared-core/norms/norm-project.ts';

const MOST_STEPS = 500;

/** The project with every earlier and undone state of it: projects are plain data that share what did not change. */
export class ProjectHistory {
  #states = $state.raw<readonly NormProject[]>([]);
  #at = $state(0);

  constructor(project: NormProject) {
    this.#states = [project];
  }

  get project(): NormProject {
    const project = this.#states[this.#at];
    if (project === undefined) throw new RangeError('the history has lost its place');
    return project;
  }

  get canUndo(): boolean {
    return this.#at > 0;
  }

  get canRedo(): boolean {
    return this.#at < this.#states.length - 1;
  }

  /** A new step; what was undone is gone. */
  push(project: NormProject): void {
    if (project === this.project) return;
    const kept = this.#states.slice(Math.max(0, this.#at + 2 - MOST_STEPS), this.#at + 1);
    this.#states = [...kept, project];
    this.#at = this.#states.length - 1;
  }

  /** Completes the present step, as when the tally for a changed reading has come. */
  amend(project: NormProject): void {
    this.#states = [...this.#states.slice(0, this.#at), project, ...this.#states.slice(this.#at + 1)];
  }

  undo(): void {
    if (this.canUndo) this.#at -= 1;
  }

  redo(): void {
    if (this.canRedo) this.#at += 1;
  }
}
