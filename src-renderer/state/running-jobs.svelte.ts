import type { JobResult } from '../../shared-core/desk.ts';
import type { DeskWire } from '../desk/desk-wire.ts';
import { followJob } from './run-job.ts';

interface RunningWork {
  readonly job: string;
  readonly doing: string;
  /** 0–1 */
  readonly progress: number;
}

/** The job that is shown while it runs; another may take its place at any time. */
export class RunningJobs {
  readonly #wire: DeskWire;
  readonly #fail: (problem: string) => void;

  work = $state.raw<RunningWork | null>(null);

  constructor(wire: DeskWire, fail: (problem: string) => void) {
    this.#wire = wire;
    this.#fail = fail;
  }

  /** Shows a job until it ends; null when it failed, which has then been told, or was stopped. */
  async follow(job: string, doing: string): Promise<JobResult | null> {
    this.work = { job, doing, progress: 0 };
    const result = await followJob(this.#wire, job, (progress, now) => {
      if (this.work?.job === job) this.work = { job, doing: now, progress };
    });
    this.#ended(job);
    if (result.ok) return result.value;
    this.#fail(result.problem);
    return null;
  }

  async cancel(): Promise<void> {
    const running = this.work;
    if (running === null) return;
    await this.#wire.ask('cancel-job', { job: running.job });
    this.#ended(running.job);
  }

  /** Another job may have taken the place meanwhile. */
  #ended(job: string): void {
    if (this.work?.job === job) this.work = null;
  }
}
