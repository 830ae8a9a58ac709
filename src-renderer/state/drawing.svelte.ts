import type { DrawnPages, Reply } from '../../shared-core/desk.ts';
import type { WorkFor } from './work-for.ts';

/** Pages as the press would draw them, and the one that is looked at. */
export class Drawing<Source> {
  readonly #for: WorkFor<Source>;
  readonly #start: (source: Source) => Promise<Reply<{ readonly job: string }>>;
  #drawing: string | null = null;

  drawn = $state.raw<DrawnPages | null>(null);
  /** What `drawn` shows. */
  drawnFor = $state.raw<Source | null>(null);
  /** 1 for the first; never beyond the last. */
  #page = $state(1);
  /** Whether pages that face each other are shown side by side. */
  facing = $state(false);

  constructor(workFor: WorkFor<Source>, start: (source: Source) => Promise<Reply<{ readonly job: string }>>) {
    this.#for = workFor;
    this.#start = start;
  }

  get page(): number {
    return Math.min(this.#page, this.drawn?.pages ?? 1);
  }

  set page(page: number) {
    this.#page = Math.max(1, Math.min(page, this.drawn?.pages ?? 1));
  }

  /** Draws the work as it stands now; a drawing that a further choice has overtaken is dropped. */
  async draw(): Promise<void> {
    const { wire, follow, fail, present } = this.#for;
    const source = present();
    if (this.drawnFor === source) return;
    if (this.#drawing !== null) await wire.ask('cancel-job', { job: this.#drawing });
    const started = await this.#start(source);
    if (!started.ok) {
      fail(started.problem);
      return;
    }
    const { job } = started.value;
    this.#drawing = job;
    const result = await follow(job, 'Drawing the pages');
    if (this.#drawing === job) this.#drawing = null;
    if (present() !== source) return;
    if (result?.kind === 'drawn') this.drawn = result.drawn;
    else if (result?.kind === 'drawn-class') this.drawn = { ...result.drawn, sections: [] };
    else return;
    this.drawnFor = source;
  }
}
