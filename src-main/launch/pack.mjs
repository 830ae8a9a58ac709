import { existsSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { parseArgs } from 'node:util';
import { build } from 'electron-builder';
import { electronDist } from './electron-binary.mjs';
import { ROOT } from './folders.mjs';
import { ensurePackages } from './packages.mjs';
import { ensureBuild } from './programs.mjs';
import { electronVersion, makeStubElectron } from './stub-electron.mjs';

/** @param {string} line */
const say = (line) => process.stderr.write(`${line}\n`);

/** Full path of 7-Zip on PATH, or null. */
const sevenZip = () => {
  const folders = (process.env.PATH ?? '').split(delimiter).filter((folder) => folder !== '');
  const places = folders.flatMap((folder) => ['7z', '7zz', '7za', '7z.exe'].map((name) => join(folder, name)));
  return process.env.ELECTRON_BUILDER_7ZIP_PATH ?? places.find((place) => existsSync(place)) ?? null;
};

const ARCHIVES = { linux: ['tar.gz'], darwin: ['zip'], win32: ['zip'] };
const SYSTEMS = { linux: 'linux', darwin: 'mac', win32: 'win' };

const { values } = parseArgs({
  options: {
    // A folder only: no archives beside it.
    dir: { type: 'boolean', default: false },
    // The stand-in, even where Electron is at hand.
    stub: { type: 'boolean', default: false },
    output: { type: 'string', default: 'release' },
  },
});

ensurePackages(say);
await ensureBuild(say);

const present = values.stub ? null : electronDist();
const dist = present ?? makeStubElectron();
if (present === null)
  say('Electron itself is not used: packing with a stand-in, without fuses; the window cannot be opened.');
const zip = values.dir ? null : sevenZip();
if (zip === null && !values.dir) say('7-Zip was not found: making the folder only. Install p7zip for the archives.');

if (zip !== null) process.env.ELECTRON_BUILDER_7ZIP_PATH = zip;
const targets = ['dir', ...(zip === null ? [] : (ARCHIVES[process.platform] ?? []))];
try {
  await build({
    projectDir: ROOT,
    [SYSTEMS[process.platform] ?? 'linux']: targets,
    config: {
      electronDist: dist,
      electronVersion: electronVersion(),
      directories: { output: values.output },
      // Fuses are switches inside the real program; the stand-in has none.
      ...(present === null ? { electronFuses: null } : {}),
    },
  });
  say(`Packed into ${values.output}.`);
} catch (problem) {
  say(`Packing failed: ${problem.message}`);
  process.exitCode = 1;
}
