import { lookAtCohort } from './cohort-file/look-at-cohort.ts';
import { startTallyJob } from './cohort-file/tally-job.ts';
import { openDesk, type DeskHost, type DeskOptions } from './desk/desk-host.ts';
import { startPressJob } from './press/press-job.ts';

export type { DeskHost, DeskOptions } from './desk/desk-host.ts';

/** The desk of every host, with the work that reads cohorts and presses. */
export function createDesk(options: DeskOptions): DeskHost {
  const { workers } = options;
  return openDesk(options, {
    lookAtCohort,
    tally: (path, file, reading, hooks, signal) => startTallyJob(path, file, reading, hooks, signal, workers.tally),
    press: (request, hooks, signal) => startPressJob(request, hooks, signal, workers.press),
  });
}
