import { parentPort, workerData } from 'node:worker_threads';
import type { ThreadReport } from '../thread-job.ts';
import { makeErratum, type ErratumParts, type ErratumRequest } from './make-erratum.ts';

function isErratumRequest(value: unknown): value is ErratumRequest {
  return typeof value === 'object' && value !== null && 'before' in value && 'after' in value && 'roster' in value;
}

/** Runs in a worker thread: makes the erratum that it was started with, and answers. */
async function run(): Promise<void> {
  if (parentPort === null) throw new Error('the erratum worker runs in a worker thread');
  const request: unknown = workerData;
  if (!isErratumRequest(request)) throw new TypeError('the erratum worker was started without two editions');
  const report: ThreadReport<ErratumParts> = { kind: 'result', reply: await makeErratum(request) };
  parentPort.postMessage(report);
}

await run();
