import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { createDesk } from '../desk.ts';
import { findBrowser, hasDisplay, openAppWindow, type AppWindow } from './app-window.ts';
import { dataFolder, projectsFolder } from '../places.ts';
import { programVersion } from '../program-version.ts';
import { startBrowserHost } from './server.ts';
import { showFolder } from './show-folder.ts';
import { readStartWords, USAGE, type StartWords } from './start-words.ts';

/** The program's root: this file is built into dist/main. */
const ROOT = join(dirname(fileURLToPath(import.meta.url)), '..', '..');

async function run(words: StartWords): Promise<void> {
  const data = dataFolder(process.env, process.platform);
  const display = hasDisplay(process.env, process.platform);
  const desk = createDesk({
    version: programVersion(),
    host: 'browser',
    dataFolder: data,
    projectsFolder: words.folder ?? projectsFolder(process.env),
    assetsFolder: join(ROOT, 'assets'),
    workers: {
      tally: builtFile('tally-worker.js'),
      press: builtFile('press-worker.js'),
      erratum: builtFile('erratum-worker.js'),
    },
    dialogs: null,
    showFolder: display ? showFolder : null,
    openedWith: words.file,
  });
  const rendererFolder = join(ROOT, 'dist', 'renderer');
  const host = await startBrowserHost({ desk, rendererFolder, dataFolder: data, port: words.port });
  process.stdout.write(`Normloom is at ${host.address}\n`);

  let window: AppWindow | null = null;
  let ending = false;
  const end = async (): Promise<void> => {
    if (ending) return;
    ending = true;
    await window?.close();
    await host.close();
    process.exit();
  };
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) process.on(signal, () => void end());

  const browser = words.window && display ? findBrowser(process.env, process.platform) : null;
  if (browser === null) return;
  window = await openAppWindow(browser, host.address);
  await window.closed;
  await end();
}

function builtFile(name: string): URL {
  return new URL(name, import.meta.url);
}

const read = readStartWords(process.argv.slice(2), process.cwd());
if (!read.ok || (read.words.file !== null && !existsSync(read.words.file))) {
  const problem = read.ok ? `There is no file ${read.words.file}.` : read.problem;
  process.stderr.write(`${problem}\n${USAGE}\n`);
  process.exitCode = 2;
} else {
  run(read.words).catch((error: unknown) => {
    process.stderr.write(`Normloom could not start: ${error instanceof Error ? error.message : String(error)}\n`);
    process.exit(1);
  });
}
