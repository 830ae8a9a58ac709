import { expect, it, vi } from 'vitest';

const app = vi.hoisted(() => ({
  on: vi.fn(),
  quit: vi.fn(),
  whenReady: vi.fn(),
  requestSingleInstanceLock: () => false,
}));
vi.mock('electron', () => ({
  app,
  BrowserWindow: vi.fn(),
  Menu: {},
  dialog: {},
  ipcMain: {},
  nativeTheme: {},
  protocol: {},
  session: {},
  shell: {},
}));
vi.mock('../../../src-main/desk.ts', () => ({ createDesk: vi.fn() }));

it('a second start hands over to the running program and ends without a window', async () => {
  await import('../../../src-main/electron/main.ts');
  expect(app.quit).toHaveBeenCalledTimes(1);
  expect(app.whenReady).not.toHaveBeenCalled();
});
