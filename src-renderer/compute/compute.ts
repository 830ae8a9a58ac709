import type { BootstrapProgress } from '../../shared-core/precision/bootstrap.ts';
import type { ComputeAnswer, ComputeAsk, FromWorker, ToWorker } from './compute-message.ts';
import workerUrl from './compute-worker.ts?worker&url';
import { startWorker } from './own-worker.ts';

type AnswerOf<K extends ComputeAsk['kind']> = Extract<ComputeAnswer, { readonly kind: K }>;

interface Waiting {
  readonly resolve: (answer: ComputeAnswer) => void;
  readonly reject: (fault: Error) => void;
  readonly onProgress: (progress: BootstrapProgress) => void;
}

/** The worker that does all work which could hold the page up; started once, at the first question. */
class Compute {
  #worker: Worker | null = null;
  #next = 1;
  readonly #waiting = new Map<number, Waiting>();

  ask<K extends ComputeAsk['kind']>(ask: Extract<ComputeAsk, { readonly kind: K }>): Promise<AnswerOf<K>> {
    return this.follow(ask, () => undefined).answer;
  }

  /** A question whose progress is told and which can be given up; the answer then never comes. */
  follow<K extends ComputeAsk['kind']>(
    ask: Extract<ComputeAsk, { readonly kind: K }>,
    onProgress: (progress: BootstrapProgress) => void,
  ): { readonly answer: Promise<AnswerOf<K>>; readonly stop: () => void } {
    const id = this.#next;
    this.#next += 1;
    const answer = new Promise<ComputeAnswer>((resolve, reject) => {
      this.#waiting.set(id, { resolve, reject, onProgress });
    });
    this.#send({ id, ask });
    return {
      answer: answer as Promise<AnswerOf<K>>,
      stop: () => {
        if (this.#waiting.delete(id)) this.#send({ id, stop: true });
      },
    };
  }

  #send(message: ToWorker): void {
    if (this.#worker === null) {
      this.#worker = startWorker(workerUrl);
      this.#worker.addEventListener('message', ({ data }: MessageEvent<FromWorker>) => {
        this.#hear(data);
      });
    }
    this.#worker.postMessage(message);
  }

  #hear(message: FromWorker): void {
    const waiting = this.#waiting.get(message.id);
    if (waiting === undefined) return;
    if ('progress' in message) {
      waiting.onProgress(message.progress);
      return;
    }
    this.#waiting.delete(message.id);
    if ('fault' in message) waiting.reject(new Error(message.fault));
    else waiting.resolve(message.answer);
  }
}

export const compute = new Compute();
