import type { BrowserWindowConstructorOptions, MessageBoxSyncOptions } from 'electron';
import { describe, expect, it, vi } from 'vitest';
import { createWindow } from '../../../src-main/electron/window.ts';

const made = vi.hoisted(() => ({
  options: [] as BrowserWindowConstructorOptions[],
  theme: { shouldUseDarkColors: false },
  ask: vi.fn<(window: unknown, options: MessageBoxSyncOptions) => number>(),
}));

vi.mock('electron', async () => {
  const { EventEmitter } = await import('node:events');
  class BrowserWindow extends EventEmitter {
    readonly show = vi.fn();
    readonly webContents = new EventEmitter();
    constructor(options: BrowserWindowConstructorOptions) {
      super();
      made.options.push(options);
    }
  }
  return { BrowserWindow, nativeTheme: made.theme, dialog: { showMessageBoxSync: made.ask } };
});

describe('the window', () => {
  it('is sandboxed, isolated and without Node, and meets the host through the preload script only', () => {
    createWindow('/program/preload.cjs', '/program/icon.png');
    expect(made.options.at(-1)?.webPreferences).toEqual({
      preload: '/program/preload.cjs',
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
    });
  });

  it('has the smallest size the stations work in, and the paper of the system’s theme', () => {
    createWindow('/preload.cjs', '/icon.png');
    expect(made.options.at(-1)).toMatchObject({ minWidth: 1024, minHeight: 700, backgroundColor: '#fdfcf9' });
    made.theme.shouldUseDarkColors = true;
    createWindow('/preload.cjs', '/icon.png');
    expect(made.options.at(-1)).toMatchObject({ backgroundColor: '#1b1d1f' });
  });

  it('shows itself only once the page has been drawn', () => {
    const window = createWindow('/preload.cjs', '/icon.png');
    expect(made.options.at(-1)?.show).toBe(false);
    expect(window.show).not.toHaveBeenCalled();
    window.emit('ready-to-show');
    expect(window.show).toHaveBeenCalledTimes(1);
  });

  it('asks before it closes over unsaved work, and stays unless told to leave', () => {
    const window = createWindow('/preload.cjs', '/icon.png');
    const closing = (answer: string): boolean => {
      made.ask.mockImplementationOnce((holder, { buttons = [], defaultId, cancelId }) => {
        expect([holder, buttons[defaultId ?? -1], buttons[cancelId ?? -1]]).toEqual([window, 'Stay', 'Stay']);
        return buttons.indexOf(answer);
      });
      const event = { preventDefault: vi.fn() };
      Reflect.apply(window.webContents.emit, window.webContents, ['will-prevent-unload', event]);
      return event.preventDefault.mock.calls.length === 1;
    };
    expect(closing('Stay')).toBe(false);
    expect(closing('Leave without saving')).toBe(true);
    expect(made.ask).toHaveBeenCalledTimes(2);
  });
});
