import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, readdirSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { ROOT, inRoot, readStamp, writeStamp } from './folders.mjs';

const STAMP = inRoot('.cache', 'build.stamp');
const LOCK = inRoot('.cache', 'build.lock');
const SOURCES = ['shared-core', 'src-main', 'src-renderer', 'vite.config.ts', 'package-lock.json', 'package.json'];
const LONGEST_BUILD_MS = 120_000;

/** Every file under a path, in the order of their names. @param {string} path @returns {string[]} */
const filesUnder = (path) =>
  statSync(path).isDirectory()
    ? readdirSync(path)
        .sort()
        .flatMap((name) => filesUnder(join(path, name)))
    : [path];

/** Changes whenever a source file is added, removed or saved. */
const sourcesHash = () => {
  const hash = createHash('sha256');
  for (const file of SOURCES.map((name) => inRoot(name)).flatMap(filesUnder)) {
    const { mtimeMs, size } = statSync(file);
    hash.update(`${file}\t${mtimeMs}\t${size}\n`);
  }
  return hash.digest('hex');
};

const isBuilt = () =>
  existsSync(inRoot('dist', 'main', 'browser-host.js')) && existsSync(inRoot('dist', 'renderer', 'index.html'));

/** Whether the program that holds the lock still runs. */
const lockIsHeld = () => {
  try {
    process.kill(Number(readFileSync(join(LOCK, 'pid'), 'utf8')), 0);
    return true;
  } catch {
    return Date.now() - (statSync(LOCK, { throwIfNoEntry: false })?.mtimeMs ?? 0) < 1000;
  }
};

/** Two builds at once would write over each other. @param {() => void} build */
const withLock = async (build) => {
  mkdirSync(inRoot('.cache'), { recursive: true });
  const deadline = Date.now() + LONGEST_BUILD_MS;
  for (;;) {
    try {
      mkdirSync(LOCK);
      break;
    } catch {
      if (Date.now() > deadline || !lockIsHeld()) rmSync(LOCK, { recursive: true, force: true });
      else await wait(100);
    }
  }
  try {
    writeFileSync(join(LOCK, 'pid'), String(process.pid));
    build();
  } finally {
    rmSync(LOCK, { recursive: true, force: true });
  }
};

/**
 * Builds the page and the programs into dist, where they are not built from the present sources already. Everything it
 * says goes to stderr. Ends the program when the build fails.
 * @param {(line: string) => void} say
 * @param {{ always?: boolean }} [options]
 */
export const ensureBuild = async (say, { always = false } = {}) => {
  const isFresh = () => !always && isBuilt() && readStamp(STAMP) === sourcesHash();
  if (isFresh()) return;
  await withLock(() => {
    if (isFresh()) return;
    say('Building Normloom (a few seconds)…');
    const hash = sourcesHash();
    rmSync(STAMP, { force: true });
    const vite = inRoot('node_modules', 'vite', 'bin', 'vite.js');
    const stdio = ['ignore', process.stderr, process.stderr];
    const { status } = spawnSync(process.execPath, [vite, 'build', '--logLevel', 'error'], { cwd: ROOT, stdio });
    if (status !== 0) {
      say('The build failed (see above).');
      rmSync(LOCK, { recursive: true, force: true });
      process.exit(1);
    }
    writeStamp(STAMP, hash);
  });
};
