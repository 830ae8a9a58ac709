import type { JobResult, Reply } from '../../shared-core/desk.ts';
import { startThreadJob, type ThreadHooks } from '../thread-job.ts';
import type { PressRequest } from './press-message.ts';

const WORDS = {
  cancelled: 'The press was stopped. Press again when you are ready.',
  broken: (why: string) =>
    `The press broke off (${why}). The project was not changed; try again, or press fewer groups at once.`,
} as const;

/**
 * Draws, presses or releases a project in a worker thread. `workerFile` is the built press worker. After a cancelled job a
 * file is there whole or not at all.
 */
export function startPressJob(
  request: PressRequest,
  hooks: ThreadHooks,
  signal: AbortSignal,
  workerFile: URL,
): Promise<Reply<JobResult>> {
  return startThreadJob(workerFile, request, hooks, signal, WORDS);
}
