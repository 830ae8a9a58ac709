import { parentPort, workerData } from 'node:worker_threads';
import { tallyCohort } from './tally-cohort.ts';
import { isTallyRequest, type TallyReport } from './tally-message.ts';

/** Runs in a worker thread: reads the file it was started with, reports progress, and answers with the tally. */
async function run(): Promise<void> {
  if (parentPort === null) throw new Error('the tally worker runs in a worker thread');
  const port = parentPort;
  const request: unknown = workerData;
  if (!isTallyRequest(request)) throw new TypeError('the tally worker was started without a file to read');
  const report = (message: TallyReport): void => port.postMessage(message);
  let told = -1;
  const result = await tallyCohort(request.path, request.file, request.reading, {
    onProgress: (done, doing) => {
      const hundredth = Math.floor(done * 100);
      if (hundredth === told) return;
      told = hundredth;
      report({ kind: 'progress', done, doing });
    },
    signal: new AbortController().signal,
  });
  report({ kind: 'result', result });
}

await run();
