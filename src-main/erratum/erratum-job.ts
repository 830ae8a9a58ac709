import type { Reply } from '../../shared-core/desk.ts';
import { startThreadJob, type ThreadHooks } from '../thread-job.ts';
import type { ErratumParts, ErratumRequest } from './make-erratum.ts';

const WORDS = {
  cancelled: 'The erratum was stopped. Ask for it again when you are ready.',
  broken: (why: string) => `The erratum broke off (${why}). Nothing was changed; ask for it again.`,
} as const;

/** Makes an erratum in a worker thread. `workerFile` is the built erratum worker. */
export function startErratumJob(
  request: ErratumRequest,
  hooks: ThreadHooks,
  signal: AbortSignal,
  workerFile: URL,
): Promise<Reply<ErratumParts>> {
  return startThreadJob(workerFile, request, hooks, signal, WORDS);
}
