import { fileURLToPath } from 'node:url';
import { app, Menu, session, shell } from 'electron';
import type { BrowserWindow } from 'electron';
import type { GivenFile, MenuCommand } from '../../shared-core/desk.ts';
import { givenKind } from '../../shared-core/norms/file-endings.ts';
import { createDesk } from '../desk.ts';
import type { DeskHost } from '../desk.ts';
import { dataFolder, projectsFolder } from '../places.ts';
import { MENU_CHANNEL } from './bridge.ts';
import { answerDesk } from './desk-channel.ts';
import { nativeDialogs } from './dialogs.ts';
import { buildMenu } from './menu.ts';
import { fileToOpen } from './opened-file.ts';
import { PAGE_ADDRESS, registerScheme, serveFolder } from './scheme.ts';
import { closeSession, holdPage } from './security.ts';
import { createWindow } from './window.ts';

const here = (path: string): string => fileURLToPath(new URL(path, import.meta.url));

let window: BrowserWindow | null = null;
let desk: DeskHost | null = null;
/** A file named before there was a desk to give it to. */
let waiting: string | null = fileToOpen(process.argv.slice(1), process.cwd());

const remember = (path: string): void => {
  if (givenKind(path) === 'project') app.addRecentDocument(path);
};

const toPage = (command: MenuCommand, given: GivenFile | null = null): void => {
  window?.webContents.send(MENU_CHANNEL, command, given);
};

/** A file opened from outside: by the file manager, the recent documents or a second start of the program. */
const openFromOutside = (path: string): void => {
  if (desk === null) {
    waiting = path;
    return;
  }
  remember(path);
  toPage('open-file', { kind: givenKind(path), handle: desk.giveHandle(path) });
};

const bringForward = (): void => {
  if (window === null) return;
  if (window.isMinimized()) window.restore();
  window.focus();
};

const showFolder = async (folder: string): Promise<void> => {
  const problem = await shell.openPath(folder);
  if (problem !== '') throw new Error(problem);
};

const start = async (): Promise<void> => {
  await app.whenReady();
  closeSession(session.defaultSession);
  serveFolder(here('../renderer/'));
  if (waiting !== null) remember(waiting);
  desk = createDesk({
    version: app.getVersion(),
    host: 'electron',
    // The same as in the browser host, so that drafts and projects are found whichever host is used.
    dataFolder: dataFolder(process.env, process.platform),
    projectsFolder: projectsFolder(process.env),
    assetsFolder: here('../../assets/'),
    workers: {
      tally: new URL('./tally-worker.js', import.meta.url),
      press: new URL('./press-worker.js', import.meta.url),
      erratum: new URL('./erratum-worker.js', import.meta.url),
    },
    dialogs: nativeDialogs(() => window, remember),
    showFolder,
    openedWith: waiting,
  });
  answerDesk(desk, remember);
  Menu.setApplicationMenu(buildMenu(toPage, process.platform === 'darwin', !app.isPackaged));
  window = createWindow(here('./preload.cjs'), here('../../assets/icon/icon.png'));
  window.on('closed', () => {
    window = null;
  });
  await window.loadURL(PAGE_ADDRESS);
};

/** Ends jobs before the program ends: the first quit waits for the desk, the second goes through. */
const closeDesk = (event: { preventDefault(): void }): void => {
  if (desk === null) return;
  event.preventDefault();
  const closing = desk;
  desk = null;
  void closing.close().finally(() => {
    app.quit();
  });
};

app.on('open-file', (event, path) => {
  event.preventDefault();
  openFromOutside(path);
});

if (app.requestSingleInstanceLock()) {
  // Belt and braces to the rules of the session: whatever still asks for a name gets none.
  app.commandLine.appendSwitch('host-resolver-rules', 'MAP * ~NOTFOUND');
  app.commandLine.appendSwitch('disable-background-networking');
  app.enableSandbox();
  registerScheme();
  app.on('web-contents-created', (_event, contents) => {
    holdPage(contents);
  });
  app.on('second-instance', (_event, words, folder) => {
    bringForward();
    const path = fileToOpen(words.slice(1), folder);
    if (path !== null) openFromOutside(path);
  });
  app.on('window-all-closed', () => {
    app.quit();
  });
  app.on('will-quit', closeDesk);
  start().catch((problem: unknown) => {
    console.error(problem instanceof Error ? problem.message : problem);
    app.exit(1);
  });
} else {
  app.quit();
}
