import { spawn } from 'node:child_process';
import { inRoot, ROOT } from '../../src-main/launch/folders.mjs';

/** @typedef {{ name: string, passed: number, failed: number }} Outcome */

/** Runs one program under Node and gathers what it prints. @param {string[]} words */
const run = (words) =>
  new Promise((resolve) => {
    const child = spawn(process.execPath, words, { cwd: ROOT, env: { ...process.env, FORCE_COLOR: '0' } });
    let output = '';
    for (const stream of [child.stdout, child.stderr]) {
      stream.setEncoding('utf8').on('data', (text) => {
        output += text;
      });
    }
    child.on('close', (code) => resolve({ code, output }));
  });

/** @param {string} name @param {boolean} good @param {number} startedAt @param {string} output */
const report = (name, good, startedAt, output) => {
  const seconds = ((performance.now() - startedAt) / 1000).toFixed(1);
  console.log(`${good ? 'ok    ' : 'FAILED'}  ${name} (${seconds} s)`);
  if (!good) console.log(output.trimEnd());
};

/**
 * One check made of several programs, each a list of words for Node; it counts as one and is good when all end well.
 * @param {string} name
 * @param {string[][]} programs
 * @returns {Promise<Outcome>}
 */
export const check = async (name, programs) => {
  const startedAt = performance.now();
  let failures = '';
  for (const words of programs) {
    const { code, output } = await run(words);
    if (code !== 0) failures += `${output}\n`;
  }
  const good = failures === '';
  report(name, good, startedAt, failures);
  return { name, passed: good ? 1 : 0, failed: good ? 0 : 1 };
};

/**
 * A test runner that counts its own tests. A run that broke before it could count is one failure.
 * @param {string} name
 * @param {string[]} words
 * @param {() => { passed: number, failed: number } | null} count
 * @returns {Promise<Outcome>}
 */
export const tests = async (name, words, count) => {
  const startedAt = performance.now();
  const { code, output } = await run(words);
  const counted = count() ?? { passed: 0, failed: 0 };
  const failed = code !== 0 && counted.failed === 0 ? 1 : counted.failed;
  report(`${name}: ${counted.passed} passed, ${failed} failed`, failed === 0, startedAt, output);
  return { name, passed: counted.passed, failed };
};

/** Program file of an installed package. @param {...string} parts */
export const packageFile = (...parts) => inRoot('node_modules', ...parts);
