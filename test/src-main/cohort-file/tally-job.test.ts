import ExcelJS from 'exceljs';
import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import { once } from 'node:events';
import { mkdir, mkdtemp, readdir, readFile, rm, stat, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { CANCELLED } from '../../../src-main/cohort-file/row-taker.ts';
import { startTallyJob } from '../../../src-main/cohort-file/tally-job.ts';
import { readingWith } from '../../shared-core/tally/readings.ts';
import { buildWorker, type BuiltWorker } from './built-worker.ts';
import { tally } from './cohorts-at-hand.ts';

const ROWS = 300_000;
const READING = readingWith({ id: 'id', score: 'score', weight: 'weight' });
const never = new AbortController().signal;

describe('a tally job in a worker thread', () => {
  let folder = '';
  let cohort = '';
  let built: BuiltWorker;

  beforeAll(async () => {
    folder = await mkdtemp(join(tmpdir(), 'normloom-job-'));
    cohort = join(folder, 'cohort.csv');
    const rows = Array.from({ length: ROWS }, (_, row) => `${row % (ROWS - 5)},${row % 21},1.${row % 100}\n`);
    await writeFile(cohort, `id,score,weight\n${rows.join('')}`);
    built = await buildWorker();
  });
  afterAll(() => rm(folder, { recursive: true, force: true }));

  it('answers what the same reading answers in this thread, with progress', async () => {
    const steps: number[] = [];
    const hooks = { onProgress: (done: number): void => void steps.push(done) };
    const made = await startTallyJob(built.worker, cohort, 'cohort', READING, hooks, never);
    expect(made).toEqual({ ok: true, value: await tally(cohort, READING) });
    expect(steps.length).toBeGreaterThan(10);
    expect(Math.max(...steps)).toBe(1);
  });

  it('answers what is wrong with a file', async () => {
    const job = (file: string): ReturnType<typeof startTallyJob> =>
      startTallyJob(built.worker, join(folder, file), file, READING, { onProgress: () => undefined }, never);
    expect(await job('gone.csv')).toEqual({
      ok: false,
      problem: 'gone.csv is not there any more. Choose the file again.',
    });
  });

  it('can be cancelled in the midst', async () => {
    const controller = new AbortController();
    const hooks = { onProgress: (done: number): void => void (done > 0.2 && controller.abort()) };
    const made = await startTallyJob(built.worker, cohort, 'cohort', READING, hooks, controller.signal);
    expect(made).toEqual({ ok: false, problem: CANCELLED });
    expect(await startTallyJob(built.worker, cohort, 'cohort', READING, hooks, controller.signal)).toEqual(made);
  });

  it('says so when its thread breaks', async () => {
    const broken = pathToFileURL(join(folder, 'broken-worker.mjs'));
    await writeFile(fileURLToPath(broken), 'throw new Error("out of paper")');
    const made = await startTallyJob(broken, cohort, 'cohort', READING, { onProgress: () => undefined }, never);
    expect(made.ok ? '' : made.problem).toMatch(/^Reading cohort broke off \(out of paper\)/);
    await writeFile(fileURLToPath(broken), 'process.exit(0)');
    const ended = await startTallyJob(broken, cohort, 'cohort', READING, { onProgress: () => undefined }, never);
    expect(ended.ok ? '' : ended.problem).toMatch(/ended early/);
  });

  it('killed in the midst leaves the file as it was and writes nothing', async () => {
    const book = new ExcelJS.Workbook();
    const sheet = book.addWorksheet('Scores');
    sheet.addRow(['id', 'score', 'weight']);
    for (let row = 0; row < 20_000; row += 1) sheet.addRow([`p${row}`, row % 21, 1.5]);
    const workbook = join(folder, 'cohort.xlsx');
    await book.xlsx.writeFile(workbook);
    const scratch = join(folder, 'scratch');
    await mkdir(scratch);
    const files = (await readdir(folder)).sort();
    for (const path of [cohort, workbook]) {
      const state = async (): Promise<unknown> => [
        createHash('sha256')
          .update(await readFile(path))
          .digest('hex'),
        (await stat(path)).mtimeMs,
      ];
      const before = await state();
      for (let kill = 0; kill < 4; kill += 1) {
        const child = spawn(process.execPath, [built.reader, fileURLToPath(built.worker), path], {
          stdio: ['ignore', 'pipe', 'inherit'],
          env: { ...process.env, TMPDIR: scratch },
        });
        const ended = once(child, 'exit');
        await once(child.stdout, 'data');
        await wait(kill * 13);
        child.kill('SIGKILL');
        await ended;
      }
      expect(await state()).toEqual(before);
      expect(await readdir(scratch)).toEqual([]);
      expect((await readdir(folder)).sort()).toEqual(files);
    }
  });
});
