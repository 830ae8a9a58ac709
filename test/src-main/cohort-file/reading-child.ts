import { pathToFileURL } from 'node:url';
import { startTallyJob } from '../../../src-main/cohort-file/tally-job.ts';
import { readingWith } from '../../shared-core/tally/readings.ts';

/** Reads a cohort file in the worker again and again until it is killed. Words: worker file, cohort file. */
const [workerFile = '', cohort = ''] = process.argv.slice(2);
const reading = readingWith({ id: 'id', score: 'score', weight: 'weight' });
const hooks = { onProgress: (done: number): void => void (done > 0.1 && process.stdout.write('.')) };
for (;;) {
  const read = await startTallyJob(
    pathToFileURL(workerFile),
    cohort,
    'cohort',
    reading,
    hooks,
    new AbortController().signal,
  );
  if (!read.ok) throw new Error(read.problem);
}
