import { spawnSync } from 'node:child_process';
import { ensureBuild } from '../../src-main/launch/programs.mjs';
import { ROOT, inRoot } from '../../src-main/launch/folders.mjs';
import { ensureTools } from './debian.mjs';
import { findBrowser } from './find-browser.mjs';

/** @param {string} line */
const say = (line) => process.stderr.write(`${line}\n`);

// Words after -- go to the test runner: a file, --headed, --grep TEXT.
await ensureBuild(say);
ensureTools(say);
const browser = findBrowser(say);
if (browser === null) process.exit(1);
const cli = inRoot('node_modules', 'playwright', 'cli.js');
const words = ['test', '--config', 'test/journey/playwright.config.ts', ...process.argv.slice(2)];
const { status } = spawnSync(process.execPath, [cli, ...words], {
  cwd: ROOT,
  env: { ...process.env, BROWSER_PATH: browser },
  stdio: 'inherit',
});
process.exitCode = status ?? 1;
