import { execFileSync } from 'node:child_process';
import { mkdtemp, readdir, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { build } from 'vite';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { newClass } from '../../../shared-core/class/new-class.ts';
import { startPressJob, startTableJob } from '../../../src-main/press/press-job.ts';
import { LOG_LINEAR, sampleProject, WHOLE_SCALE } from '../../shared-core/pages/sample-norm-set.ts';

const root = fileURLToPath(new URL('../../../', import.meta.url));
const project = sampleProject({ scale: WHOLE_SCALE });
const quiet = { onProgress: (): void => {} };
const never = (): AbortSignal => new AbortController().signal;
const script = (code: string): URL => new URL(`data:text/javascript,${encodeURIComponent(code)}`);

let folder: string;
let worker: URL;

beforeAll(async () => {
  // Beside the packages, which the built worker looks for when it runs.
  folder = await mkdtemp(join(root, 'node_modules', '.press-worker-'));
  await build({
    configFile: false,
    root,
    logLevel: 'silent',
    build: { ssr: join(root, 'src-main/press/press-worker.ts'), outDir: folder, emptyOutDir: false, minify: false },
  });
  worker = pathToFileURL(join(folder, 'press-worker.js'));
});

afterAll(async () => {
  await rm(folder, { recursive: true, force: true });
});

describe('startPressJob', () => {
  it('draws the pages in a thread and tells how far it is', async () => {
    const told: string[] = [];
    const hooks = { onProgress: (progress: number, doing: string) => told.push(`${doing} ${progress}`) };
    const reply = await startPressJob({ kind: 'draw', project }, hooks, never(), worker);
    if (!reply.ok || reply.value.kind !== 'drawn') throw new Error('not drawn');
    expect(reply.value.drawn.pages).toBe(2);
    expect(Buffer.from(reply.value.drawn.pdf, 'base64').toString('latin1', 0, 8)).toBe('%PDF-1.7');
    expect(told.at(-1)).toBe('Drawing the pages 1');
  });

  it('presses into a folder', async () => {
    const into = join(folder, 'pressed');
    const reply = await startPressJob({ kind: 'press', project, folder: into }, quiet, never(), worker);
    if (!reply.ok || reply.value.kind !== 'pressed') throw new Error('not pressed');
    expect(reply.value.pressed.folder).toBe(into);
    expect(reply.value.pressed.files).toHaveLength(6);
  });

  it('works out the tables for a class, and draws and presses one, in the same thread', async () => {
    const table = await startTableJob({ project, source: 'project' }, worker);
    if (!table.ok) throw new Error(table.problem);
    expect(table.value.groups[0]?.rows).toHaveLength(41);
    const row = { name: 'Ida', code: '', scoreText: '12', group: '', statusText: '' };
    const rows = [1, 2].map((line) => ({ ...row, line, name: `Ida ${line}` }));
    const file = {
      ...newClass('Class 5b', 1),
      table: table.value,
      group: table.value.groups[0]?.values ?? null,
      list: { decimalMark: '.' as const, rows },
    };
    const drawn = await startPressJob({ kind: 'draw-class', class: file, what: 'report' }, quiet, never(), worker);
    expect(drawn).toMatchObject({ ok: true, value: { kind: 'drawn-class', drawn: { remarks: [] } } });
    const into = { folder: join(folder, 'class'), keyFolder: join(folder, 'class-key') };
    const coded = { ...file, sharing: { as: 'codes' as const, seed: 3 } };
    const pressed = await startPressJob(
      { kind: 'press-class', class: coded, slips: true, ...into },
      quiet,
      never(),
      worker,
    );
    if (!pressed.ok || pressed.value.kind !== 'pressed-class') throw new Error(JSON.stringify(pressed));
    expect(await readdir(into.keyFolder)).toEqual(['key-to-codes.csv']);
    expect(await readdir(into.folder)).toHaveLength(5);
    const stopped = new AbortController();
    stopped.abort();
    expect(
      await startPressJob({ kind: 'draw-class', class: file, what: 'slips' }, quiet, stopped.signal, worker),
    ).toEqual({
      ok: false,
      problem: 'The press was stopped. Press again when you are ready.',
    });
  });

  it('presses the same bytes in every language and time zone', () => {
    const smoothed: NormProject = {
      ...project,
      curve: { ...project.curve, smoothing: LOG_LINEAR },
      table: { ...project.table, columns: ['interval', 'standard-error', 'print-range'] },
    };
    const code = `
      import { Worker } from 'node:worker_threads';
      const request = JSON.parse(process.env.REQUEST);
      new Worker(new URL(process.env.WORKER), { workerData: request, execArgv: [] }).on('message', (report) => {
        if (report.kind === 'result') console.log(JSON.stringify(report.reply.value.pressed.files));
      });`;
    const [english, turkish] = [
      { LANG: 'en_US.UTF-8', LC_ALL: 'en_US.UTF-8', TZ: 'America/Los_Angeles' },
      { LANG: 'tr_TR.UTF-8', LC_ALL: 'tr_TR.UTF-8', TZ: 'Pacific/Auckland' },
    ].map((place, index) =>
      execFileSync(process.execPath, ['--input-type=module', '-e', code], {
        encoding: 'utf8',
        env: {
          ...process.env,
          ...place,
          WORKER: worker.href,
          REQUEST: JSON.stringify({ kind: 'press', project: smoothed, folder: join(folder, `place-${index}`) }),
        },
      }),
    );
    expect(english).toContain('booklet.pdf');
    expect(turkish).toBe(english);
  }, 30_000);

  it('ends the thread when it is cancelled', async () => {
    const cancel = new AbortController();
    const job = startPressJob({ kind: 'draw', project }, quiet, cancel.signal, script('setInterval(() => {}, 1000)'));
    cancel.abort();
    expect(await job).toMatchObject({ ok: false, problem: expect.stringContaining('stopped') });
    expect(await startPressJob({ kind: 'draw', project }, quiet, cancel.signal, worker)).toMatchObject({ ok: false });
  });

  it('turns a fault of the thread into a sentence', async () => {
    const faulty = startPressJob({ kind: 'draw', project }, quiet, never(), script('throw new Error("no ink")'));
    expect(await faulty).toMatchObject({ ok: false, problem: expect.stringContaining('no ink') });
    const early = startPressJob({ kind: 'draw', project }, quiet, never(), script(''));
    expect(await early).toMatchObject({ ok: false, problem: expect.stringContaining('ended early') });
  });
});
