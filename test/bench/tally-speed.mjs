/**
 * Times the reading of large cohort files against a plain papaparse pass over the same file, each in a process of its
 * own, and prints times, their ratio and the largest resident memory. Wants a built program (dist/main).
 *
 *   node test/bench/tally-speed.mjs          1,000,000 rows of 6 columns
 *   node test/bench/tally-speed.mjs --ten    also 10,000,000 rows
 */
import { spawnSync } from 'node:child_process';
import { createReadStream, createWriteStream, existsSync, mkdtempSync, rmSync } from 'node:fs';
import { once } from 'node:events';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { Worker } from 'node:worker_threads';
import Papa from 'papaparse';

const SELF = fileURLToPath(import.meta.url);
const WORKER = new URL('../../dist/main/tally-worker.js', import.meta.url);
const COMMAND_LINE = fileURLToPath(new URL('../../dist/main/command-line.js', import.meta.url));
const MOST_TIMES = 3;
const ROUNDS = 3;

/** Small generator with a fixed start, so that every run reads the same file (Marsaglia 2003, xorshift). */
function generator(seed) {
  let state = seed;
  return (below) => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return (state >>> 0) % below;
  };
}

async function writeCohort(path, rows) {
  const next = generator(20_011);
  const out = createWriteStream(path);
  out.write('id,school,grade,form,w,raw\n');
  for (let start = 0; start < rows; start += 20_000) {
    let block = '';
    for (let row = start; row < Math.min(rows, start + 20_000); row += 1) {
      const raw = next(21) + next(21) + next(21);
      const weight = (2000 + next(38_000)) / 10_000;
      block += `${String(row + 1).padStart(8, '0')},S${next(400)},0${4 + next(3)},${'AB'[next(2)]},${weight},${raw}\n`;
    }
    if (!out.write(block)) await once(out, 'drain');
  }
  out.end();
  await once(out, 'finish');
}

function plainPass(path) {
  return new Promise((resolve, reject) => {
    let rows = 0;
    Papa.parse(createReadStream(path, 'utf8'), {
      chunk: ({ data }) => {
        rows += data.length;
      },
      complete: () => resolve(rows - 1),
      error: reject,
    });
  });
}

function reading(roles) {
  return {
    layout: 'people',
    encoding: 'utf-8',
    separator: ',',
    decimalMark: '.',
    header: true,
    sheet: null,
    roles,
    missing: ['99'],
    scale: { min: 0, max: 60, step: 1, direction: 'high-is-good' },
    decisions: { duplicateId: 'keep-first', raggedRow: 'leave-out', blankGroup: 'leave-out', blankCluster: 'alone' },
  };
}

const ROLES = [
  { column: 'raw', role: 'score' },
  { column: 'grade', role: 'group' },
  { column: 'w', role: 'weight' },
];

function tallyPass(path, roles) {
  return new Promise((resolve, reject) => {
    const worker = new Worker(WORKER, { workerData: { path, file: 'cohort.csv', reading: reading(roles) } });
    worker.on('error', reject);
    worker.on('message', (report) => {
      if (report.kind !== 'result') return;
      if (report.result.ok) resolve(report.result.value.source.rowsRead);
      else reject(new Error(report.result.problem));
    });
  });
}

const PASSES = {
  'plain papaparse': (path) => plainPass(path),
  tally: (path) => tallyPass(path, ROLES),
  'tally with ids': (path) => tallyPass(path, [...ROLES, { column: 'id', role: 'id' }]),
};

/** One pass in a process of its own: milliseconds by the clock and of the processor, and peak memory in MB. */
function measured(name, path, rows) {
  const child = spawnSync(process.execPath, [SELF, '--pass', name, path], { encoding: 'utf8' });
  if (child.status !== 0) throw new Error(child.stderr);
  const run = JSON.parse(child.stdout);
  if (run.rows !== rows) throw new Error(`${name} read ${run.rows} rows of ${rows}`);
  return run;
}

/** Least times and largest memory of some rounds; in each round all passes run, so that a busy minute strikes all. */
function rounds(path, rows) {
  const names = Object.keys(PASSES);
  const all = Array.from({ length: ROUNDS }, () => names.map((name) => measured(name, path, rows)));
  return names.map((name, index) => {
    const runs = all.map((round) => round[index]);
    return {
      name,
      ms: Math.min(...runs.map((run) => run.ms)),
      cpu: Math.min(...runs.map((run) => run.cpu)),
      peak: Math.max(...runs.map((run) => run.peak)),
    };
  });
}

function commandLine(path) {
  const started = performance.now();
  const options = ['--score', 'raw', '--by', 'grade', '--weight', 'w', '--scale', '0:60', '--format', 'json'];
  const child = spawnSync(process.execPath, [COMMAND_LINE, 'table', path, ...options], { encoding: 'utf8' });
  if (child.status !== 0) throw new Error(child.stderr);
  return performance.now() - started;
}

function line({ name, ms, cpu, peak }, plain) {
  const ratio = plain === null ? '' : `${(ms / plain.ms).toFixed(2)} times plain`;
  const times = `${String(Math.round(ms)).padStart(7)} ms  processor ${String(Math.round(cpu)).padStart(6)} ms`;
  console.log(`  ${name.padEnd(24)} ${times}  peak ${String(peak).padStart(4)} MB  ${ratio}`);
}

async function compare(folder, rows) {
  const path = join(folder, `cohort-${rows}.csv`);
  await writeCohort(path, rows);
  console.log(`${rows} rows of 6 columns`);
  const [plain, ...tallies] = rounds(path, rows);
  line(plain, null);
  for (const tally of tallies) line(tally, plain);
  if (existsSync(COMMAND_LINE))
    console.log(`  command line as a whole  ${String(Math.round(commandLine(path))).padStart(7)} ms`);
  rmSync(path);
  return { plain, tallies };
}

async function main() {
  if (!existsSync(WORKER)) throw new Error('Build the program first: npm run build');
  const folder = mkdtempSync(join(tmpdir(), 'normloom-bench-'));
  try {
    const one = await compare(folder, 1_000_000);
    const ten = process.argv.includes('--ten') ? await compare(folder, 10_000_000) : null;
    const slow = one.tallies.filter(({ ms }) => ms > MOST_TIMES * one.plain.ms);
    if (slow.length > 0) throw new Error(`slower than ${MOST_TIMES} times plain: ${slow.map(({ name }) => name)}`);
    if (ten !== null) {
      const growth = ten.tallies.map(({ name, peak }, index) => `${name} ${peak - one.tallies[index].peak} MB`);
      console.log(`Peak memory from 1 to 10 million rows grew by: ${growth.join(', ')}`);
    }
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

const passAt = process.argv.indexOf('--pass');
if (passAt < 0) {
  await main();
} else {
  const started = performance.now();
  const before = process.cpuUsage();
  const rows = await PASSES[process.argv[passAt + 1]](process.argv[passAt + 2]);
  const peak = Math.round(process.resourceUsage().maxRSS / 1024);
  const { user, system } = process.cpuUsage(before);
  process.stdout.write(JSON.stringify({ ms: performance.now() - started, cpu: (user + system) / 1000, rows, peak }));
}
