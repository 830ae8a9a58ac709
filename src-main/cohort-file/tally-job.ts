import { Worker } from 'node:worker_threads';
import type { Reply, TalliedCohort } from '../../shared-core/desk.ts';
import type { Reading } from '../../shared-core/norms/reading.ts';
import { CANCELLED } from './row-taker.ts';
import type { TallyReport, TallyRequest } from './tally-message.ts';

export interface TallyJobHooks {
  /** 0–1 within what is being done, and what that is, as it is shown. */
  readonly onProgress: (done: number, doing: string) => void;
}

/**
 * Reads a cohort file into its tally in a worker thread. `workerFile` is the built tally worker. Cancelling ends the
 * thread at once; nothing is ever written, so there is nothing to clear up. Never rejects: a fault of the thread comes
 * back as a problem, a cancelled job as the problem CANCELLED.
 */
export function startTallyJob(
  workerFile: URL,
  path: string,
  file: string,
  reading: Reading,
  { onProgress }: TallyJobHooks,
  signal: AbortSignal,
): Promise<Reply<TalliedCohort>> {
  if (signal.aborted) return Promise.resolve({ ok: false, problem: CANCELLED });
  const request: TallyRequest = { path, file, reading };
  return new Promise((resolve) => {
    const worker = new Worker(workerFile, { workerData: request });
    const end = (result: Reply<TalliedCohort>): void => {
      signal.removeEventListener('abort', cancel);
      resolve(result);
      void worker.terminate();
    };
    const cancel = (): void => end({ ok: false, problem: CANCELLED });
    signal.addEventListener('abort', cancel);
    worker.on('message', (report: TallyReport) => {
      if (report.kind === 'progress') onProgress(report.done, report.doing);
      else end(report.result);
    });
    worker.on('error', (error) => end({ ok: false, problem: broken(file, error.message) }));
    worker.on('exit', () => end({ ok: false, problem: broken(file, 'the thread ended early') }));
  });
}

function broken(file: string, why: string): string {
  return `Reading ${file} broke off (${why}). The file was not changed; try again, or save it in another format.`;
}
