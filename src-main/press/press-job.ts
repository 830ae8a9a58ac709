import { Worker } from 'node:worker_threads';
import type { JobResult, Reply } from '../../shared-core/desk.ts';
import type { PressReport, PressRequest } from './press-message.ts';

export interface PressJobHooks {
  /** Progress is a proportion, 0–1; `doing` says in a few words what is being done. */
  onProgress(progress: number, doing: string): void;
}

const CANCELLED = 'The press was stopped. Press again when you are ready.';

/**
 * Draws or presses a project in a worker thread. `workerFile` is the built press worker. Cancelling ends the thread at
 * once; a file is then there whole or not at all. Never rejects: a fault of the thread comes back as a problem.
 */
export function startPressJob(
  request: PressRequest,
  hooks: PressJobHooks,
  signal: AbortSignal,
  workerFile: URL,
): Promise<Reply<JobResult>> {
  if (signal.aborted) return Promise.resolve({ ok: false, problem: CANCELLED });
  return new Promise((resolve) => {
    const worker = new Worker(workerFile, { workerData: request });
    let ending = false;
    const end = (reply: Reply<JobResult>): void => {
      // The thread's exit follows every end; only the first reason counts.
      if (ending) return;
      ending = true;
      signal.removeEventListener('abort', cancel);
      // A caller that clears up after a cancelled press must not meet a thread that still writes.
      void worker.terminate().then(() => resolve(reply));
    };
    const cancel = (): void => end({ ok: false, problem: CANCELLED });
    signal.addEventListener('abort', cancel);
    worker.on('message', (report: PressReport) => {
      if (report.kind === 'progress') hooks.onProgress(report.progress, report.doing);
      else end(report.reply);
    });
    worker.on('error', (error) => end({ ok: false, problem: broken(error.message) }));
    worker.on('exit', () => end({ ok: false, problem: broken('the thread ended early') }));
  });
}

function broken(why: string): string {
  return `The press broke off (${why}). The project was not changed; try again, or press fewer groups at once.`;
}
