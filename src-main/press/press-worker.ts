import { parentPort, workerData } from 'node:worker_threads';
import { projectClassTable } from '../../shared-core/class/class-table-of-set.ts';
import type { ClassTable } from '../../shared-core/class/class-table.ts';
import type { JobResult, Reply } from '../../shared-core/desk.ts';
import { drawClassReport, drawSlips } from './class/press-class.ts';
import { pressClassInto } from './class/press-class-into.ts';
import { drawPages, pressInto, releaseInto, type PressProgress } from './press-files.ts';
import { isPressRequest, type PressReport, type PressRequest, type TableRequest } from './press-message.ts';

/** Runs in a worker thread: draws or presses the project or class it was started with, reports progress, and answers. */
async function run(): Promise<void> {
  if (parentPort === null) throw new Error('the press worker runs in a worker thread');
  const port = parentPort;
  const request: unknown = workerData;
  if (!isPressRequest(request)) throw new TypeError('the press worker was started without its work');
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

async function answer(
  request: PressRequest | TableRequest,
  onProgress: PressProgress,
): Promise<Reply<JobResult | ClassTable>> {
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
    case 'draw-class': {
      const draw = request.what === 'report' ? drawClassReport : drawSlips;
      const drawn = await draw(request.class, onProgress);
      return drawn.ok ? { ok: true, value: { kind: 'drawn-class', drawn: drawn.value } } : drawn;
    }
    case 'press-class': {
      const { slips, folder, keyFolder } = request;
      const pressed = await pressClassInto(request.class, { slips }, { folder, keyFolder }, onProgress);
      return pressed.ok ? { ok: true, value: { kind: 'pressed-class', pressed: pressed.value } } : pressed;
    }
    case 'class-table':
      return projectClassTable(request.project, request.source);
  }
}

await run();
