import { parentPort, workerData } from 'node:worker_threads';
import type { JobResult, Reply } from '../../shared-core/desk.ts';
import { drawPages, pressInto, releaseInto, type PressProgress } from './press-files.ts';
import { isPressRequest, type PressReport, type PressRequest } from './press-message.ts';

/** Runs in a worker thread: draws or presses the project it was started with, reports progress, and answers. */
async function run(): Promise<void> {
  if (parentPort === null) throw new Error('the press worker runs in a worker thread');
  const port = parentPort;
  const request: unknown = workerData;
  if (!isPressRequest(request)) throw new TypeError('the press worker was started without a project');
  const report = (message: PressReport): void => port.postMessage(message);
  let told = '';
  const reply = await answer(request, (progress, doing) => {
    const now = `${Math.floor(progress * 100)} ${doing}`;
    if (now === told) return;
    told = now;
    report({ kind: 'progress', progress, doing });
  });
  report({ kind: 'result', reply });
}

async function answer(request: PressRequest, onProgress: PressProgress): Promise<Reply<JobResult>> {
  switch (request.kind) {
    case 'draw': {
      const drawn = await drawPages(request.project, onProgress);
      return drawn.ok ? { ok: true, value: { kind: 'drawn', drawn: drawn.value } } : drawn;
    }
    case 'press':
    case 'release': {
      const press = request.kind === 'press' ? pressInto : releaseInto;
      const pressed = await press(request.project, request.folder, onProgress);
      return pressed.ok ? { ok: true, value: { kind: 'pressed', pressed: pressed.value } } : pressed;
    }
  }
}

await run();
