import { buildNormSet } from '../../shared-core/norms/norm-set.ts';
import { bootstrapOf, comparisonOf, differOf, rangesOf } from './answers.ts';
import type { ComputeAsk, FromWorker, ToWorker } from './compute-message.ts';

/** Samples are drawn for so long before other questions get their turn. */
const TURN_MS = 40;

const stopped = new Set<number>();

const say = (message: FromWorker): void => {
  postMessage(message);
};

const pause = (): Promise<void> => new Promise((resolve) => setTimeout(resolve, 0));

async function answer(id: number, ask: ComputeAsk): Promise<void> {
  switch (ask.kind) {
    case 'norm-set':
      say({ id, answer: { kind: 'norm-set', built: buildNormSet(ask.project) } });
      break;
    case 'print-ranges':
      say({ id, answer: { kind: 'print-ranges', ranges: rangesOf(ask.project, ask.group) } });
      break;
    case 'differ':
      say({ id, answer: { kind: 'differ', answer: differOf(ask.project, ask.group, ask.text) } });
      break;
    case 'comparison':
      say({ id, answer: { kind: 'comparison', compared: comparisonOf(ask.before, ask.after) } });
      break;
    case 'bootstrap':
      await drawSamples(id, ask);
      break;
  }
}

async function drawSamples(id: number, ask: Extract<ComputeAsk, { readonly kind: 'bootstrap' }>): Promise<void> {
  const steps = bootstrapOf(ask.project, ask.group);
  let turnEnds = performance.now() + TURN_MS;
  for (;;) {
    const step = steps.next();
    if (step.done === true) {
      say({ id, answer: { kind: 'bootstrap', result: step.value } });
      return;
    }
    if (performance.now() < turnEnds) continue;
    say({ id, progress: step.value });
    await pause();
    if (stopped.delete(id)) return;
    turnEnds = performance.now() + TURN_MS;
  }
}

addEventListener('message', ({ data }: MessageEvent<ToWorker>) => {
  if ('stop' in data) {
    stopped.add(data.id);
    return;
  }
  answer(data.id, data.ask).catch((fault: unknown) => {
    say({ id: data.id, fault: fault instanceof Error ? fault.message : String(fault) });
  });
});
