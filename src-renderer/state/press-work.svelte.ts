import type { Pressed } from '../../shared-core/desk.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import type { WorkFor } from './work-for.ts';

/** Presses proofs, releases editions, and holds what was pressed last as long as the project stays as it is. */
export class PressWork {
  readonly #for: WorkFor;
  #pressed = $state.raw<Pressed | null>(null);
  #pressedFor = $state.raw<NormProject | null>(null);

  constructor(workFor: WorkFor) {
    this.#for = workFor;
  }

  /** Null before the first press, and once the project says something else than the files. */
  get pressed(): Pressed | null {
    return this.#pressedFor === this.#for.present() ? this.#pressed : null;
  }

  async run(kind: 'press' | 'release'): Promise<void> {
    const { wire, follow, fail } = this.#for;
    const project = this.#for.present();
    this.#pressed = null;
    const name = project.title === '' ? 'Untitled norms' : project.title;
    const started = await wire.ask(kind, { project, name });
    if (!started.ok) {
      fail(started.problem);
      return;
    }
    const result = await follow(started.value.job, kind === 'press' ? 'Pressing' : 'Releasing');
    if (result?.kind !== 'pressed') return;
    this.#pressed = result.pressed;
    this.#pressedFor = project;
  }

  async showFolder(): Promise<void> {
    const { wire, fail } = this.#for;
    const shown = await wire.ask('show-pressed', {});
    if (!shown.ok) fail(shown.problem);
  }
}
