import { Worker } from 'node:worker_threads';
import type { Reply } from '../shared-core/desk.ts';

export interface ThreadHooks {
  /** Progress is a proportion, 0–1; `doing` says in a few words what is being done. */
  onProgress(progress: number, doing: string): void;
}

/** What a thread reports; plain JSON. */
export type ThreadReport<T> =
  | { readonly kind: 'progress'; readonly progress: number; readonly doing: string }
  | { readonly kind: 'result'; readonly reply: Reply<T> };

/** What is said when the work was stopped, and when the thread broke off and why. */
export interface ThreadWords {
  readonly cancelled: string;
  readonly broken: (why: string) => string;
}

/**
 * Lets a built worker do its work in a thread. Cancelling ends the thread at once, and the answer comes only when it has
 * ended: a caller that clears up afterwards must not meet a thread that still writes. Never rejects: a fault of the
 * thread comes back as a problem.
 */
export function startThreadJob<T>(
  workerFile: URL,
  request: unknown,
  hooks: ThreadHooks,
  signal: AbortSignal,
  words: ThreadWords,
): Promise<Reply<T>> {
  if (signal.aborted) return Promise.resolve({ ok: false, problem: words.cancelled });
  return new Promise((resolve) => {
    const worker = new Worker(workerFile, { workerData: request });
    let ending = false;
    const end = (reply: Reply<T>): void => {
      // The thread's exit follows every end; only the first reason counts.
      if (ending) return;
      ending = true;
      signal.removeEventListener('abort', cancel);
      void worker.terminate().then(() => resolve(reply));
    };
    const cancel = (): void => end({ ok: false, problem: words.cancelled });
    signal.addEventListener('abort', cancel);
    worker.on('message', (report: ThreadReport<T>) => {
      if (report.kind === 'progress') hooks.onProgress(report.progress, report.doing);
      else end(report.reply);
    });
    worker.on('error', (error) => end({ ok: false, problem: words.broken(error.message) }));
    worker.on('exit', () => end({ ok: false, problem: words.broken('the thread ended early') }));
  });
}
