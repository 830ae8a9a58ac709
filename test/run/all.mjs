import { existsSync, readFileSync, rmSync } from 'node:fs';
import { inRoot } from '../../src-main/launch/folders.mjs';
import { ensureTools } from './debian.mjs';
import { findBrowser } from './find-browser.mjs';
import { check, packageFile, tests } from './stage.mjs';

/** @param {string} line */
const say = (line) => console.log(line);

const UNIT_REPORT = inRoot('.cache', 'unit-tests.json');
const JOURNEY_REPORT = inRoot('.cache', 'journey.json');
const startedAt = performance.now();

/** @param {string} file */
const readReport = (file) => (existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : null);

const countUnit = () => {
  const report = readReport(UNIT_REPORT);
  return report && { passed: report.numPassedTests, failed: report.numFailedTests };
};

const countJourney = () => {
  const report = readReport(JOURNEY_REPORT);
  return report && { passed: report.stats.expected + report.stats.flaky, failed: report.stats.unexpected };
};

const checkTypes = () => check('types', [[packageFile('typescript', 'bin', 'tsc'), '-b']]);

const checkSvelteTypes = () =>
  check('types of the page', [
    [packageFile('svelte-check', 'bin', 'svelte-check'), '--tsconfig', 'src-renderer/tsconfig.json'],
  ]);

const checkLint = () => check('lint', [[packageFile('eslint', 'bin', 'eslint.js'), '.']]);

const checkLayout = () =>
  check('layout and dead code', [
    [packageFile('prettier', 'bin', 'prettier.cjs'), '--check', '.'],
    [packageFile('knip', 'bin', 'knip.js')],
  ]);

const checkBuild = () => check('build', [['src-main/launch/build.mjs']]);

const checkPack = () => check('pack', [['test/pack/packed-program.mjs']]);

const runUnitTests = () => {
  rmSync(UNIT_REPORT, { force: true });
  const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${UNIT_REPORT}`];
  return tests('unit tests', [packageFile('vitest', 'vitest.mjs'), 'run', ...reporters], countUnit);
};

const runJourney = () => {
  rmSync(JOURNEY_REPORT, { force: true });
  return tests('journey', ['test/run/journey.mjs'], countJourney);
};

/** @param {(() => Promise<import('./stage.mjs').Outcome>)[]} stages */
const inTurn = async (stages) => {
  const outcomes = [];
  for (const stage of stages) outcomes.push(await stage());
  return outcomes;
};

ensureTools(say);
const browser = findBrowser(say);
if (browser !== null) process.env.BROWSER_PATH = browser;

// Two processors are enough for the checks side by side; the tests, which measure and wait, run alone.
const outcomes = (
  await Promise.all([inTurn([checkLint]), inTurn([checkBuild, checkPack, checkTypes, checkSvelteTypes, checkLayout])])
).flat();
outcomes.push(...(await inTurn([runUnitTests, runJourney])));

const passed = outcomes.reduce((sum, outcome) => sum + outcome.passed, 0);
const failed = outcomes.reduce((sum, outcome) => sum + outcome.failed, 0);
console.log(`All checks took ${Math.round((performance.now() - startedAt) / 1000)} s.`);
console.log(`${passed} passed, ${failed} failed`);
process.exitCode = failed === 0 ? 0 : 1;
