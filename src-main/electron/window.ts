import { BrowserWindow, dialog, nativeTheme } from 'electron';
import type { BrowserWindowConstructorOptions } from 'electron';

const PAPER = '#fdfcf9';
const DARK_PAPER = '#1b1d1f';

/** The window's options: a sandboxed page without Node that meets the host only through the preload script. */
const windowOptions = (preload: string, icon: string, dark: boolean): BrowserWindowConstructorOptions => ({
  title: 'Normloom',
  width: 1320,
  height: 880,
  minWidth: 1024,
  minHeight: 700,
  show: false,
  backgroundColor: dark ? DARK_PAPER : PAPER,
  icon,
  webPreferences: {
    preload,
    contextIsolation: true,
    sandbox: true,
    nodeIntegration: false,
    nodeIntegrationInWorker: false,
    nodeIntegrationInSubFrames: false,
    webSecurity: true,
    allowRunningInsecureContent: false,
    webviewTag: false,
    spellcheck: false,
    navigateOnDragDrop: false,
  },
});

const LEAVE = 0;
const STAY = 1;

/** Asks before the window closes over a class that is kept nowhere yet: Electron itself would stay open without a word. */
const leavesUnsaved = (window: BrowserWindow): boolean =>
  dialog.showMessageBoxSync(window, {
    type: 'warning',
    message: 'This class is not saved.',
    detail: 'It holds names, so no draft of it is kept. Stay to save it, or leave it unsaved.',
    buttons: ['Leave without saving', 'Stay'],
    defaultId: STAY,
    cancelId: STAY,
    noLink: true,
  }) === LEAVE;

/**
 * Makes the program's one window, which shows itself once its page has been drawn and asks before it closes over unsaved
 * work. Paths are absolute.
 */
export const createWindow = (preload: string, icon: string): BrowserWindow => {
  const window = new BrowserWindow(windowOptions(preload, icon, nativeTheme.shouldUseDarkColors));
  window.once('ready-to-show', () => {
    window.show();
  });
  window.webContents.on('will-prevent-unload', (event) => {
    if (leavesUnsaved(window)) event.preventDefault();
  });
  return window;
};
