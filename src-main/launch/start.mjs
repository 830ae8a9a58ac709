import { spawn } from 'node:child_process';
import { resolve } from 'node:path';
import { parseArgs } from 'node:util';
import { findElectron, noWindowReason } from './electron-binary.mjs';
import { ROOT, USER_FOLDER, inRoot } from './folders.mjs';
import { ensureBuild } from './programs.mjs';

const USAGE = 'Usage: npm start -- [FILE] [--browser] [--no-window] [--port N] [--folder FOLDER]';

/** @param {string} line */
const say = (line) => process.stderr.write(`${line}\n`);

/** What the user typed; everything but a file is for the browser host. */
const readWords = () => {
  try {
    const { values, positionals } = parseArgs({
      options: {
        browser: { type: 'boolean' },
        'no-window': { type: 'boolean' },
        port: { type: 'string' },
        folder: { type: 'string' },
      },
      allowPositionals: true,
    });
    if (positionals.length > 1) throw new Error('Only one file can be opened at a time.');
    const { 'no-window': noWindow, port, folder } = values;
    const file = positionals.map((word) => resolve(USER_FOLDER, word));
    const options = [
      ...(noWindow ? ['--no-window'] : []),
      ...(port === undefined ? [] : ['--port', port]),
      ...(folder === undefined ? [] : ['--folder', resolve(USER_FOLDER, folder)]),
    ];
    return { browser: values.browser === true || options.length > 0, options, file };
  } catch (problem) {
    // The first sentence says what is wrong; Node adds advice about its own rules.
    say(`${problem.message.split(/\.(?:\s|$)/)[0]}.\n${USAGE}`);
    return process.exit(2);
  }
};

/** Runs a program until it ends, and ends as it did. @param {string} program @param {string[]} words */
const become = (program, words) => {
  const child = spawn(program, words, { cwd: ROOT, stdio: 'inherit' });
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => child.kill(signal));
  child.on('error', (problem) => {
    say(`The program could not be started: ${problem.message}`);
    process.exitCode = 1;
  });
  child.on('close', (code) => {
    process.exitCode = code ?? 0;
  });
};

/** The Electron program to use, or null and a line that says why the browser is used instead. @param {boolean} browser */
const chooseElectron = async (browser) => {
  if (browser) return null;
  const reason = noWindowReason();
  const electron = reason === null ? await findElectron(say) : null;
  if (electron === null)
    say(`Using the browser: ${reason ?? 'the Electron window is not installed and could not be fetched'}.`);
  return electron;
};

const { browser, options, file } = readWords();
await ensureBuild(say);
const electron = await chooseElectron(browser);
if (electron === null) {
  become(process.execPath, [inRoot('dist', 'main', 'browser-host.js'), ...options, ...file]);
} else {
  say('Opening Normloom in its Electron window.');
  become(electron, [ROOT, ...file]);
}
