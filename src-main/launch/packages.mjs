import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { ROOT, inRoot, readStamp, writeStamp } from './folders.mjs';

// Lies inside node_modules, so that it goes when they go.
const STAMP = inRoot('node_modules', '.cache', 'normloom', 'package-lock.sha256');
const OLDEST_NODE = [20, 19];

const lockHash = () =>
  createHash('sha256')
    .update(readFileSync(inRoot('package-lock.json')))
    .digest('hex');

const nodeIsTooOld = () => {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  return major < OLDEST_NODE[0] || (major === OLDEST_NODE[0] && minor < OLDEST_NODE[1]);
};

const runNpmCi = () => {
  const words = ['ci', '--no-audit', '--no-fund', '--loglevel=error'];
  // npm names its own program file where it started this script; what it prints is for the user, not part of a result.
  const npm = process.env.npm_execpath;
  const stdio = ['ignore', process.stderr, process.stderr];
  return npm?.endsWith('.js')
    ? spawnSync(process.execPath, [npm, ...words], { cwd: ROOT, stdio })
    : spawnSync('npm', words, { cwd: ROOT, stdio, shell: process.platform === 'win32' });
};

/**
 * Installs the packages of package-lock.json where they are not yet installed as it says. Ends the program with one
 * sentence when it cannot.
 * @param {(line: string) => void} say
 */
export const ensurePackages = (say) => {
  if (nodeIsTooOld()) {
    say(`Normloom needs Node ${OLDEST_NODE.join('.')} or newer; this is Node ${process.versions.node}.`);
    process.exit(1);
  }
  const wanted = lockHash();
  const present = readStamp(STAMP);
  if (present === wanted) return;
  say(
    present === null
      ? 'Installing the packages of package-lock.json (first run, about half a minute)…'
      : 'Installing packages: package-lock.json has changed since the last run…',
  );
  const { status } = runNpmCi();
  if (status !== 0) {
    say('The packages could not be installed (see above). Check the network or the npm settings and run this again.');
    process.exit(1);
  }
  writeStamp(STAMP, wanted);
};
