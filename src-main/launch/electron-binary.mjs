import { spawn } from 'node:child_process';
import { existsSync, mkdirSync, readdirSync, rmSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { inRoot, readStamp, writeStamp } from './folders.mjs';

const PACKAGE = inRoot('node_modules', 'electron');
const FETCH_STAMP = inRoot('.cache', 'electron-fetch.stamp');
const FETCH_FOLDER = inRoot('.cache', 'electron-fetch');
const DAY_MS = 24 * 60 * 60 * 1000;
/** A fetch that brings nothing new for so long is given up. */
const SILENCE_MS = 6000;

const PROGRAM_IN_DIST = {
  darwin: 'Electron.app/Contents/MacOS/Electron',
  win32: 'electron.exe',
};

/** @param {string} dist */
const programIn = (dist) => {
  const program = join(dist, PROGRAM_IN_DIST[process.platform] ?? 'electron');
  return existsSync(program) ? program : null;
};

/** Folder of an Electron that is on this machine, or null. */
export const electronDist = () => {
  const dist = process.env.ELECTRON_OVERRIDE_DIST_PATH ?? join(PACKAGE, 'dist');
  return programIn(dist) === null ? null : dist;
};

/** Why no Electron window can be shown here at all, as half a sentence; null when one can. */
export const noWindowReason = () => {
  if (process.platform !== 'linux') return null;
  if (!process.env.DISPLAY && !process.env.WAYLAND_DISPLAY) return 'there is no display';
  // Electron's sandbox does not run as root, and this program does not run without it.
  return process.getuid?.() === 0 ? 'Electron does not run as root' : null;
};

/** @param {string} folder @returns {number} */
const bytesUnder = (folder) =>
  readdirSync(folder, { recursive: true }).reduce(
    (sum, name) => sum + (statSync(join(folder, String(name)), { throwIfNoEntry: false })?.size ?? 0),
    0,
  );

/** Runs the package's own installer for as long as bytes keep coming in. */
const runInstaller = () =>
  new Promise((resolve) => {
    mkdirSync(FETCH_FOLDER, { recursive: true });
    const env = { ...process.env, TMPDIR: FETCH_FOLDER, TMP: FETCH_FOLDER, TEMP: FETCH_FOLDER };
    const installer = spawn(process.execPath, [join(PACKAGE, 'install.js')], { env, stdio: 'ignore' });
    let bytes = 0;
    let heardAt = Date.now();
    const watch = setInterval(() => {
      const now = bytesUnder(FETCH_FOLDER);
      if (now !== bytes || existsSync(join(PACKAGE, 'dist'))) heardAt = Date.now();
      bytes = now;
      if (Date.now() - heardAt > SILENCE_MS) installer.kill();
    }, 500);
    installer.on('close', () => {
      clearInterval(watch);
      rmSync(FETCH_FOLDER, { recursive: true, force: true });
      resolve(undefined);
    });
  });

/**
 * The Electron program, fetched where it is missing, at most once a day; null when there is none.
 * @param {(line: string) => void} say
 */
export const findElectron = async (say) => {
  const present = electronDist();
  if (present !== null) return programIn(present);
  const tried = Number(readStamp(FETCH_STAMP) ?? 0);
  if (Date.now() - tried < DAY_MS) return null;
  say('Fetching the Electron window (tried once a day; given up after a few seconds without an answer)…');
  writeStamp(FETCH_STAMP, String(Date.now()));
  await runInstaller();
  const fetched = electronDist();
  return fetched === null ? null : programIn(fetched);
};
