import type { ClassFile } from '../../shared-core/class/class-file.ts';
import type { PressedClassFiles } from '../../shared-core/desk.ts';
import type { WorkFor } from './work-for.ts';

/** Presses a class, and holds what was pressed last as long as the class stays as it is. */
export class ClassPress {
  readonly #for: WorkFor<ClassFile>;
  #pressed = $state.raw<PressedClassFiles | null>(null);
  #pressedFor = $state.raw<ClassFile | null>(null);
  /** Whether slips are pressed with the report. */
  slips = $state(true);

  constructor(workFor: WorkFor<ClassFile>) {
    this.#for = workFor;
  }

  /** Null before the first press, and once the class says something else than the files. */
  get pressed(): PressedClassFiles | null {
    return this.#pressedFor === this.#for.present() ? this.#pressed : null;
  }

  async run(slips: boolean): Promise<void> {
    const { wire, follow, fail, present } = this.#for;
    const file = present();
    this.#pressed = null;
    const started = await wire.ask('press-class', { class: file, slips, name: file.title || 'Class' });
    if (!started.ok) {
      fail(started.problem);
      return;
    }
    const result = await follow(started.value.job, 'Pressing');
    if (result?.kind !== 'pressed-class') return;
    this.#pressed = result.pressed;
    this.#pressedFor = file;
  }

  async showFolder(): Promise<void> {
    const { wire, fail } = this.#for;
    const shown = await wire.ask('show-pressed', {});
    if (!shown.ok) fail(shown.problem);
  }
}
