import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { chromium } from 'playwright';
import { inRoot } from '../../src-main/launch/folders.mjs';
import { installOnDebian, onPath } from './debian.mjs';

const INSTALLED_ELSEWHERE = [
  '/Applications/Google Chrome.app/Contents/MacOS/Google Chrome',
  '/Applications/Chromium.app/Contents/MacOS/Chromium',
  'C:\\Program Files\\Google\\Chrome\\Application\\chrome.exe',
  'C:\\Program Files (x86)\\Microsoft\\Edge\\Application\\msedge.exe',
];

const installed = () =>
  onPath('chromium', 'chromium-browser', 'google-chrome', 'google-chrome-stable', 'chrome') ??
  INSTALLED_ELSEWHERE.find((file) => existsSync(file)) ??
  null;

const playwrightsOwn = () => (existsSync(chromium.executablePath()) ? chromium.executablePath() : null);

/** @param {(line: string) => void} say */
const fetchPlaywrightsOwn = (say) => {
  say('No browser found; fetching the Chromium of Playwright (once)…');
  const cli = inRoot('node_modules', 'playwright', 'cli.js');
  spawnSync(process.execPath, [cli, 'install', 'chromium'], { stdio: 'ignore', timeout: 180_000 });
  return playwrightsOwn();
};

/**
 * A Chromium to test with: BROWSER_PATH, an installed one, the one of Playwright, or one that is installed now.
 * Null, with one line that says so, when none can be had.
 * @param {(line: string) => void} say
 */
export const findBrowser = (say) => {
  const named = process.env.BROWSER_PATH;
  if (named) {
    if (existsSync(named)) return named;
    say(`BROWSER_PATH names ${named}, which is not there; looking for another browser.`);
  }
  const found = installed() ?? playwrightsOwn() ?? fetchPlaywrightsOwn(say);
  if (found !== null) return found;
  if (installOnDebian(['chromium'], say)) return installed();
  say('No browser for the journey tests: install Chromium or Chrome, or name one in BROWSER_PATH.');
  return null;
};
