import type { DrawnPages, JobResult } from '../../shared-core/desk.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import type { DeskWire } from '../desk/desk-wire.ts';

/** What drawing needs of the open project. */
export interface DrawingFor {
  readonly wire: DeskWire;
  readonly project: () => NormProject;
  /** Shows a job until it ends; null when it failed, which has then been told, or was stopped. */
  readonly follow: (job: string, doing: string) => Promise<JobResult | null>;
  readonly fail: (problem: string) => void;
}

/** The booklet as the press would draw it, and the page of it that is looked at. */
export class DrawnBooklet {
  readonly #for: DrawingFor;
  #drawing: string | null = null;

  drawn = $state.raw<DrawnPages | null>(null);
  /** The project that `drawn` shows. */
  drawnFor = $state.raw<NormProject | null>(null);
  /** 1 for the first; never beyond the last. */
  #page = $state(1);
  /** Whether pages that face each other are shown side by side. */
  facing = $state(false);

  constructor(drawingFor: DrawingFor) {
    this.#for = drawingFor;
  }

  get page(): number {
    return Math.min(this.#page, this.drawn?.pages ?? 1);
  }

  set page(page: number) {
    this.#page = Math.max(1, Math.min(page, this.drawn?.pages ?? 1));
  }

  /** Draws the project as it stands now; a drawing that a further choice has overtaken is dropped. */
  async draw(): Promise<void> {
    const { wire, follow, fail } = this.#for;
    const project = this.#for.project();
    if (this.drawnFor === project) return;
    if (this.#drawing !== null) await wire.ask('cancel-job', { job: this.#drawing });
    const started = await wire.ask('draw-pages', { project });
    if (!started.ok) {
      fail(started.problem);
      return;
    }
    const { job } = started.value;
    this.#drawing = job;
    const result = await follow(job, 'Drawing the pages');
    if (this.#drawing === job) this.#drawing = null;
    if (result?.kind === 'drawn' && this.#for.project() === project) {
      this.drawn = result.drawn;
      this.drawnFor = project;
    }
  }
}
