import { createHash } from 'node:crypto';
import { mkdir, mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { projectClassTable } from '../../../shared-core/class/class-table-of-set.ts';
import type { DeskRequest, DeskRequests, JobResult, JobState, PressedFile, Reply } from '../../../shared-core/desk.ts';
import { editionToText } from '../../../shared-core/norms/edition-file.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { Reading } from '../../../shared-core/norms/reading.ts';
import { openDesk, type DeskHost, type DeskOptions } from '../../../src-main/desk/desk-host.ts';
import { lookAtList } from '../../../src-main/cohort-file/look-at-list.ts';
import { makeErratum } from '../../../src-main/erratum/make-erratum.ts';
import { drawClassReport, drawSlips } from '../../../src-main/press/class/press-class.ts';
import { pressClassInto } from '../../../src-main/press/class/press-class-into.ts';
import type { PressRequest } from '../../../src-main/press/press-message.ts';
import { editionFileName } from '../../../src-main/press/released-editions.ts';
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

/**
 * Work that stands in for the reader and the press: it writes two small files that hold the project's title. Classes are
 * so small that they are drawn and pressed.
 */
export const PLAIN_WORK: DeskWork = {
  lookAtCohort(_path, file, reading) {
    const preview = { file, bytes: 1, sheets: [], columns: ['score'], rows: [], remarks: [] };
    return Promise.resolve({ ok: true, value: { ...preview, reading: reading ?? READING } });
  },
  tally(_path, file) {
    return Promise.resolve({ ok: false, problem: `${file} holds no scores. Choose another file.` });
  },
  lookAtList,
  classTable: ({ project, source }) => Promise.resolve(projectClassTable(project, source)),
  erratum: (request) => makeErratum(request),
  async press(request, hooks) {
    hooks.onProgress(0.5, 'Drawing pages');
    if ('class' in request) return classWork(request);
    if (request.kind === 'draw')
      return { ok: true, value: { kind: 'drawn', drawn: { pdf: 'JVBERi0=', pages: 1, sections: [], remarks: [] } } };
    const files: PressedFile[] = [];
    for (const file of ['booklet.pdf', 'tables.csv']) {
      await writeFile(join(request.folder, file), `${file} of ${request.project.title}${request.project.sheet.notes}`);
      files.push(await pressedFile(request.folder, file));
    }
    const readBack = { cells: 2, recomputed: 1 };
    const editionFile =
      request.kind === 'release' ? await standInEdition(request.project, request.folder, [...files]) : null;
    if (editionFile !== null) files.push(await pressedFile(request.folder, editionFile));
    return { ok: true, value: { kind: 'pressed', pressed: { folder: request.folder, files, readBack, editionFile } } };
  },
};

async function classWork(request: Extract<PressRequest, { readonly class: unknown }>): Promise<Reply<JobResult>> {
  if (request.kind === 'draw-class') {
    const drawn = await (request.what === 'report' ? drawClassReport : drawSlips)(request.class);
    return drawn.ok ? { ok: true, value: { kind: 'drawn-class', drawn: drawn.value } } : drawn;
  }
  const pressed = await pressClassInto(request.class, request, request);
  return pressed.ok ? { ok: true, value: { kind: 'pressed-class', pressed: pressed.value } } : pressed;
}

async function pressedFile(folder: string, file: string): Promise<PressedFile> {
  const bytes = await readFile(join(folder, file));
  return { file, bytes: bytes.length, sha256: createHash('sha256').update(bytes).digest('hex') };
}

/** An edition file as the press writes it. */
async function standInEdition(project: NormProject, folder: string, files: readonly PressedFile[]): Promise<string> {
  const { edition, date, analyst, checker } = project.release;
  const frozen = {
    program: { name: 'Normloom', version: '0.0.1' } as const,
    ...{ edition, date, analyst, checker, files, project },
    check: '0000-0000',
    readBack: { cellsCompared: 2, cellsRecomputed: 1 },
  };
  const file = editionFileName(edition);
  await writeFile(join(folder, file), editionToText(frozen));
  return file;
}

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
