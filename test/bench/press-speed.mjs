/**
 * Times a booklet of 200 tables against pdfmake drawing the same titles and rows with no structure, and a whole press
 * (booklet, workbook, csv, norm set, read-back, certificate) in its worker thread; each in a process of its own. Prints
 * times, their ratio, sizes, and the largest resident memory. Wants a built program (dist/main).
 *
 *   node test/bench/press-speed.mjs              200 tables
 *   node test/bench/press-speed.mjs --tables 40  another number of tables
 */
import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { parseArgs } from 'node:util';
import { Worker } from 'node:worker_threads';
import pdfmake from 'pdfmake';
import { loadSource } from '../run/load-source.mjs';

const SELF = fileURLToPath(import.meta.url);
const WORKER = new URL('../../dist/main/press-worker.js', import.meta.url);
const ROUNDS = 3;
const SCORES = 61;
const SANS = '@expo-google-fonts/source-sans-3';

/** Counts of a group that is unlike every other: a triangle whose peak moves with the group. */
function countsOf(group) {
  const peak = 15 + (group % 31);
  return Array.from({ length: SCORES }, (_, score) => Math.max(1, 40 - 2 * Math.abs(score - peak) + (group % 7)));
}

async function projectOf(tables) {
  const { newProject } = await loadSource('shared-core/norms/new-project.ts');
  const bare = newProject('Two hundred tables (invented)');
  const cells = Array.from({ length: tables }, (_, group) => ({
    values: [String(group + 1)],
    counts: countsOf(group),
    weights: null,
    squares: null,
    clusters: null,
  }));
  const rows = cells.reduce((sum, { counts }) => sum + counts.reduce((all, count) => all + count, 0), 0);
  return {
    ...bare,
    source: {
      kind: 'typed',
      file: '',
      sha256: '0'.repeat(64),
      bytes: 1,
      rowsRead: rows,
      rowsKept: rows,
      leftOut: [],
      scaleInferred: false,
    },
    tally: {
      scale: { min: 0, max: SCORES - 1, step: 1, direction: 'high-is-good' },
      groupColumns: ['group'],
      weightDecimals: null,
      cells,
    },
    groups: { ...bare.groups, by: ['group'] },
    sheet: { ...bare.sheet, ogive: false },
  };
}

async function setOf(project) {
  const { buildNormSet } = await loadSource('shared-core/norms/norm-set.ts');
  const built = buildNormSet(project);
  if (!built.ok) throw new Error(built.problem);
  return built.normSet;
}

/** The booklet, from the norm set on. */
async function ourBooklet(project) {
  const { bookletPdf } = await loadSource('src-main/press/booklet-pdf.ts');
  const normSet = await setOf(project);
  return timed(async () => (await bookletPdf(normSet)).pdf.length);
}

/** Titles, prose and rows of the same tables as pdfmake lays them out by itself, untagged, three columns a page. */
async function plainBooklet(project) {
  const normSet = await setOf(project);
  const face = (file) => fileURLToPath(import.meta.resolve(`${SANS}/${file}`));
  pdfmake.setFonts({
    Sans: {
      normal: face('400Regular/SourceSans3_400Regular.ttf'),
      bold: face('600SemiBold/SourceSans3_600SemiBold.ttf'),
    },
  });
  pdfmake.setUrlAccessPolicy(() => false);
  pdfmake.setLocalAccessPolicy(() => true);
  const head = ['Raw score', 'Percentile rank', 'Stanine', 'T'].map((text) => ({ text, bold: true }));
  const third = (rows) => ({
    table: {
      headerRows: 1,
      dontBreakRows: true,
      body: [head.map((cell) => ({ ...cell })), ...rows],
    },
    layout: 'lightHorizontalLines',
  });
  return timed(async () => {
    const content = normSet.groups.flatMap(({ group, rows }, index) => {
      const cells = rows.map(({ scoreText, printed, texts }) => [scoreText, printed, texts.stanine, texts.t]);
      const share = Math.ceil(cells.length / 3);
      return [
        { text: group.title, fontSize: 15, ...(index === 0 ? {} : { pageBreak: 'before' }) },
        { text: project.sheet.howToRead },
        { text: project.sheet.cautions },
        { columns: [0, 1, 2].map((part) => third(cells.slice(part * share, (part + 1) * share))) },
      ];
    });
    const made = pdfmake.createPdf({
      pageSize: 'A4',
      defaultStyle: { font: 'Sans', fontSize: 8.7 },
      header: { text: project.title },
      footer: (page, pages) => ({ text: `page ${page} of ${pages}` }),
      content,
    });
    return (await made.getBuffer()).length;
  });
}

/** All files in the worker thread, with the longest time for which this thread could not answer. */
async function wholePress(project) {
  const folder = mkdtempSync(join(tmpdir(), 'press-speed-'));
  let late = 0;
  let last = performance.now();
  const beat = setInterval(() => {
    late = Math.max(late, performance.now() - last - 10);
    last = performance.now();
  }, 10);
  try {
    const run = await timed(
      () =>
        new Promise((resolve, reject) => {
          const worker = new Worker(WORKER, { workerData: { kind: 'press', project, folder } });
          worker.on('error', reject);
          worker.on('message', (report) => {
            if (report.kind !== 'result') return;
            if (!report.reply.ok) reject(new Error(report.reply.problem));
            else resolve(report.reply.value.pressed.files.reduce((sum, { bytes }) => sum + bytes, 0));
          });
        }),
    );
    return { ...run, late };
  } finally {
    clearInterval(beat);
    rmSync(folder, { recursive: true, force: true });
  }
}

async function timed(work) {
  const cpu = process.cpuUsage();
  const started = performance.now();
  const bytes = await work();
  const ms = performance.now() - started;
  const used = process.cpuUsage(cpu);
  const peak = Math.round(process.resourceUsage().maxRSS / 1024);
  return { ms, cpu: (used.user + used.system) / 1000, peak, bytes, late: 0 };
}

const PASSES = { 'plain pdfmake': plainBooklet, booklet: ourBooklet, 'whole press': wholePress };

function measured(name, tables) {
  const child = spawnSync(process.execPath, [SELF, '--pass', name, '--tables', String(tables)], { encoding: 'utf8' });
  if (child.status !== 0) throw new Error(child.stderr);
  return JSON.parse(child.stdout);
}

/** The least times and the largest memory of some rounds. */
function best(name, tables) {
  const runs = Array.from({ length: ROUNDS }, () => measured(name, tables));
  const least = (key) => Math.min(...runs.map((run) => run[key]));
  const most = (key) => Math.max(...runs.map((run) => run[key]));
  return { ms: least('ms'), cpu: least('cpu'), bytes: most('bytes'), peak: most('peak'), late: most('late') };
}

const { values } = parseArgs({ options: { pass: { type: 'string' }, tables: { type: 'string', default: '200' } } });
const tables = Number(values.tables);
if (values.pass !== undefined) {
  console.log(JSON.stringify(await PASSES[values.pass](await projectOf(tables))));
} else {
  console.log(`${tables} tables of ${SCORES} scores, the best of ${ROUNDS} rounds:`);
  let plain = null;
  for (const name of Object.keys(PASSES)) {
    const run = best(name, tables);
    plain ??= run;
    const times = `${String(Math.round(run.ms)).padStart(6)} ms  processor ${String(Math.round(run.cpu)).padStart(6)} ms`;
    const ratios = `${(run.cpu / plain.cpu).toFixed(2)} times the time, ${(run.bytes / plain.bytes).toFixed(2)} times the size`;
    console.log(
      `  ${name.padEnd(14)} ${times}  peak ${String(run.peak).padStart(4)} MB  ${String(Math.round(run.bytes / 1024)).padStart(6)} KB  ${ratios}`,
    );
    if (run.late > 0) console.log(`    the asking thread was late by ${Math.round(run.late)} ms at most`);
  }
}
