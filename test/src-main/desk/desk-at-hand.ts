import { createHash } from 'node:crypto';
import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { DeskRequest, DeskRequests, JobState, Reply } from '../../../shared-core/desk.ts';
import type { Reading } from '../../../shared-core/norms/reading.ts';
import { openDesk, type DeskHost, type DeskOptions } from '../../../src-main/desk/desk-host.ts';
import type { DeskWork } from '../../../src-main/desk/desk-work.ts';

export const READING: Reading = {
  layout: 'people',
  encoding: 'utf-8',
  separator: ',',
  decimalMark: '.',
  header: true,
  sheet: null,
  roles: [{ column: 'score', role: 'score' }],
  missing: [],
  scale: null,
  decisions: { duplicateId: 'keep-first', raggedRow: 'leave-out', blankGroup: 'leave-out', blankCluster: 'alone' },
};

/** Work that stands in for the reader and the press: it writes two small files that hold the project's title. */
export const PLAIN_WORK: DeskWork = {
  lookAtCohort(_path, file, reading) {
    const preview = { file, bytes: 1, sheets: [], columns: ['score'], rows: [], remarks: [] };
    return Promise.resolve({ ok: true, value: { ...preview, reading: reading ?? READING } });
  },
  tally(_path, file) {
    return Promise.resolve({ ok: false, problem: `${file} holds no scores. Choose another file.` });
  },
  async press(request, hooks) {
    hooks.onProgress(0.5, 'Drawing pages');
    if (request.kind === 'draw')
      return { ok: true, value: { kind: 'drawn', drawn: { pdf: 'JVBERi0=', pages: 1, sections: [], remarks: [] } } };
    const files = [];
    for (const file of ['booklet.pdf', 'tables.csv']) {
      const text = `${file} of ${request.project.title}`;
      await writeFile(join(request.folder, file), text);
      files.push({ file, bytes: text.length, sha256: createHash('sha256').update(text).digest('hex') });
    }
    const readBack = { cells: 2, recomputed: 1 };
    return { ok: true, value: { kind: 'pressed', pressed: { folder: request.folder, files, readBack } } };
  },
};

export interface DeskAtHand {
  readonly folder: string;
  readonly desk: DeskHost;
  /** The answer to a request that is expected to succeed. */
  ask<R extends DeskRequest>(request: R, ask: DeskRequests[R]['ask']): Promise<DeskRequests[R]['answer']>;
  /** The problem of a request that is expected to fail, asked with anything. */
  problem(request: string, ask: unknown): Promise<string>;
  /** How a job ends. */
  endOf(job: string): Promise<JobState>;
  /** Another desk over the same folders, as after a start of the program. */
  again(options?: Partial<DeskOptions>): DeskAtHand;
  close(): Promise<void>;
}

export async function deskAtHand(options: Partial<DeskOptions> = {}, work: DeskWork = PLAIN_WORK): Promise<DeskAtHand> {
  const folder = await mkdtemp(join(tmpdir(), 'normloom-desk-'));
  await mkdir(join(folder, 'assets', 'sample-cohorts'), { recursive: true });
  return deskOver(folder, options, work);
}

function deskOver(folder: string, options: Partial<DeskOptions>, work: DeskWork): DeskAtHand {
  const desk = openDesk(
    {
      version: '0.0.1',
      host: 'browser',
      dataFolder: join(folder, 'data'),
      projectsFolder: join(folder, 'projects'),
      assetsFolder: join(folder, 'assets'),
      dialogs: null,
      showFolder: null,
      openedWith: null,
      ...options,
    },
    work,
  );
  const loose: { ask(request: string, ask: unknown): Promise<Reply<unknown>> } = desk;
  const ask: DeskAtHand['ask'] = async (request, asked) => {
    const reply = await desk.ask(request, asked);
    if (!reply.ok) throw new Error(reply.problem);
    return reply.value;
  };
  return {
    folder,
    desk,
    ask,
    async problem(request, asked) {
      const reply = await loose.ask(request, asked);
      if (reply.ok) throw new Error(`a problem was expected, not ${JSON.stringify(reply.value)}`);
      return reply.problem;
    },
    async endOf(job) {
      for (;;) {
        const state = await ask('job-state', { job });
        if (state.state !== 'running') return state;
        await new Promise((resolve) => setTimeout(resolve, 5));
      }
    },
    again: (others = {}) => deskOver(folder, { ...options, ...others }, work),
    async close() {
      await desk.close();
      await rm(folder, { recursive: true, force: true });
    },
  };
}
