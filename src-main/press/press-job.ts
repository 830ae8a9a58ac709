import type { ClassTable } from '../../shared-core/class/class-table.ts';
import type { JobResult, Reply } from '../../shared-core/desk.ts';
import { startThreadJob, type ThreadHooks, type ThreadWords } from '../thread-job.ts';
import type { PressRequest, TableRequest } from './press-message.ts';

const CANCELLED = 'The press was stopped. Press again when you are ready.';

const OF_PROJECT: ThreadWords = {
  cancelled: CANCELLED,
  broken: (why) =>
    `The press broke off (${why}). The project was not changed; try again, or press fewer groups at once.`,
};

const OF_CLASS: ThreadWords = {
  cancelled: CANCELLED,
  broken: (why) => `The press broke off (${why}). The class was not changed; try again.`,
};

const OF_TABLE: ThreadWords = {
  cancelled: 'The work was stopped.',
  broken: (why) =>
    `The tables could not be worked out (${why}). Try again, or open the project and look at its tables.`,
};

/**
 * Draws, presses or releases a project, or draws or presses a class, in a worker thread. `workerFile` is the built press
 * worker. After a cancelled job a file is there whole or not at all.
 */
export function startPressJob(
  request: PressRequest,
  hooks: ThreadHooks,
  signal: AbortSignal,
  workerFile: URL,
): Promise<Reply<JobResult>> {
  return startThreadJob(workerFile, request, hooks, signal, 'class' in request ? OF_CLASS : OF_PROJECT);
}

/** Works the tables of a project out in the same thread, as a class is looked up in them. */
export function startTableJob(request: Omit<TableRequest, 'kind'>, workerFile: URL): Promise<Reply<ClassTable>> {
  const asked: TableRequest = { kind: 'class-table', ...request };
  return startThreadJob(workerFile, asked, { onProgress: () => undefined }, new AbortController().signal, OF_TABLE);
}
