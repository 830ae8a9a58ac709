import { randomBytes } from 'node:crypto';
import type { JobResult, JobState, Reply } from '../../shared-core/desk.ts';

export interface JobHooks {
  /** Progress is a proportion, 0–1; `doing` says in a few words what is being done. */
  onProgress(progress: number, doing: string): void;
}

/** Work that takes a while. Once the signal is aborted its answer no longer matters, only that it ends. */
export type Work = (hooks: JobHooks, signal: AbortSignal) => Promise<Reply<JobResult>>;

interface Job {
  state: JobState;
  readonly stop: AbortController;
}

/** How long the end of a job waits to be collected, in milliseconds. */
const KEPT = 10 * 60 * 1000;

/**
 * Work in progress, asked after by name. How a job ended is told once and then forgotten, or after ten minutes.
 */
export class Jobs {
  readonly #jobs = new Map<string, Job>();
  /** Work that has not ended, though its job may have been cancelled and forgotten. */
  readonly #unfinished = new Set<Promise<void>>();
  readonly #kept: number;

  constructor(kept = KEPT) {
    this.#kept = kept;
  }

  start(work: Work): string {
    const name = randomBytes(12).toString('base64url');
    const stop = new AbortController();
    const hooks: JobHooks = {
      onProgress: (progress, doing) => {
        const job = this.#jobs.get(name);
        if (job?.state.state !== 'running') return;
        job.state = { state: 'running', progress: Math.min(1, Math.max(0, progress)), doing };
      },
    };
    this.#jobs.set(name, { state: { state: 'running', progress: 0, doing: 'Starting' }, stop });
    const ended = this.#endOf(() => work(hooks, stop.signal)).then((state) => {
      this.#unfinished.delete(ended);
      this.#end(name, state);
    });
    this.#unfinished.add(ended);
    return name;
  }

  /** Where a job stands; null when there is none of that name, or its end was told already. */
  collect(name: string): JobState | null {
    const job = this.#jobs.get(name);
    if (job === undefined) return null;
    if (job.state.state !== 'running') this.#jobs.delete(name);
    return job.state;
  }

  /** Stops a job; nothing happens when it has ended. */
  cancel(name: string): void {
    const job = this.#jobs.get(name);
    if (job?.state.state !== 'running') return;
    job.state = { state: 'cancelled' };
    job.stop.abort();
  }

  /** Stops all jobs and waits until they have ended. */
  async close(): Promise<void> {
    for (const name of this.#jobs.keys()) this.cancel(name);
    await Promise.all(this.#unfinished);
    this.#jobs.clear();
  }

  async #endOf(work: () => Promise<Reply<JobResult>>): Promise<JobState> {
    try {
      const reply = await work();
      return reply.ok ? { state: 'done', result: reply.value } : { state: 'failed', problem: reply.problem };
    } catch (error) {
      return { state: 'failed', problem: unexpected(error) };
    }
  }

  #end(name: string, state: JobState): void {
    const job = this.#jobs.get(name);
    if (job === undefined) return;
    if (job.state.state === 'running') job.state = state;
    setTimeout(() => this.#jobs.delete(name), this.#kept).unref();
  }
}

/** The sentence for a fault of the program that nobody foresaw. */
export function unexpected(error: unknown): string {
  const what = error instanceof Error ? error.message : String(error);
  return `Normloom met a fault of its own (${what}). Your work is kept; try again, or start the program again.`;
}
