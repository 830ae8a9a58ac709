import { lookAtCohort } from './cohort-file/look-at-cohort.ts';
import { lookAtList } from './cohort-file/look-at-list.ts';
import { startTallyJob } from './cohort-file/tally-job.ts';
import { openDesk, type DeskHost, type DeskOptions } from './desk/desk-host.ts';
import { startErratumJob } from './erratum/erratum-job.ts';
import { startPressJob, startTableJob } from './press/press-job.ts';

export type { DeskHost, DeskOptions } from './desk/desk-host.ts';

/** The desk of every host, with the work that reads cohorts and presses. */
export function createDesk(options: DeskOptions): DeskHost {
  const { workers } = options;
  return openDesk(options, {
    lookAtCohort,
    lookAtList,
    classTable: (request) => startTableJob(request, workers.press),
    async tally(path, file, reading, hooks, signal) {
      const reply = await startTallyJob(workers.tally, path, file, reading, hooks, signal);
      return reply.ok ? { ok: true, value: { kind: 'tallied', tallied: reply.value } } : reply;
    },
    erratum: (request, hooks, signal) => startErratumJob(request, hooks, signal, workers.erratum),
    press: (request, hooks, signal) => startPressJob(request, hooks, signal, workers.press),
  });
}
