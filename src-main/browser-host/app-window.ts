import { spawn } from 'node:child_process';
import { existsSync } from 'node:fs';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { delimiter, isAbsolute, join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';

type Environment = Readonly<Record<string, string | undefined>>;

export interface AppWindow {
  /** Resolves once the window was closed and its profile is gone. */
  readonly closed: Promise<void>;
  close(): Promise<void>;
}

const COMMANDS = ['chromium', 'chromium-browser', 'google-chrome', 'google-chrome-stable', 'microsoft-edge', 'msedge'];
const WINDOWS_PLACES = ['Google\\Chrome\\Application\\chrome.exe', 'Microsoft\\Edge\\Application\\msedge.exe'];
const MAC_PLACES = [
  '/Applications/Google Chrome.app/Contents/MacOS/Google Chrome',
  '/Applications/Chromium.app/Contents/MacOS/Chromium',
  '/Applications/Microsoft Edge.app/Contents/MacOS/Microsoft Edge',
];

/** Whether this machine can show a window at all. */
export function hasDisplay(environment: Environment, platform: NodeJS.Platform): boolean {
  if (platform === 'win32' || platform === 'darwin') return true;
  return [environment['DISPLAY'], environment['WAYLAND_DISPLAY']].some(
    (display) => display !== undefined && display !== '',
  );
}

/** A browser of the Chromium family on this machine, or null. BROWSER_PATH goes before all others. */
export function findBrowser(
  environment: Environment,
  platform: NodeJS.Platform,
  exists: (path: string) => boolean = existsSync,
): string | null {
  const chosen = environment['BROWSER_PATH'];
  const places = [...(chosen === undefined ? [] : [chosen]), ...placesOn(environment, platform)];
  return places.find((place) => isAbsolute(place) && exists(place)) ?? null;
}

function placesOn(environment: Environment, platform: NodeJS.Platform): readonly string[] {
  switch (platform) {
    case 'win32':
      return ['PROGRAMFILES', 'PROGRAMFILES(X86)', 'LOCALAPPDATA']
        .map((name) => environment[name])
        .filter((folder) => folder !== undefined)
        .flatMap((folder) => WINDOWS_PLACES.map((place) => `${folder}\\${place}`));
    case 'darwin':
      return MAC_PLACES;
    default: {
      const folders = (environment['PATH'] ?? '').split(delimiter).filter((folder) => folder !== '');
      return COMMANDS.flatMap((command) => folders.map((folder) => join(folder, command)));
    }
  }
}

/** Opens the address in a window of its own, with a profile that is removed when the window closes. */
export async function openAppWindow(browser: string, address: string): Promise<AppWindow> {
  const profile = await mkdtemp(join(tmpdir(), 'normloom-window-'));
  const words = [`--app=${address}`, `--user-data-dir=${profile}`, '--no-first-run', '--no-default-browser-check'];
  // Chromium refuses its sandbox to the superuser.
  if (process.getuid?.() === 0) words.push('--no-sandbox');
  const child = spawn(browser, words, { stdio: 'ignore' });
  const ended = new Promise<void>((resolve) => {
    child.once('exit', () => resolve());
    child.once('error', () => resolve());
  });
  const closed = ended.then(() => rm(profile, { recursive: true, force: true, maxRetries: 5, retryDelay: 100 }));
  return {
    closed,
    async close() {
      child.kill('SIGTERM');
      await Promise.race([ended, wait(3000)]);
      child.kill('SIGKILL');
      await closed;
    },
  };
}
