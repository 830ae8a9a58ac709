import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import { dataFolder, projectsFolder } from '../../../src-main/places.ts';
import type { DeskOptions } from '../../../src-main/desk.ts';

const fake = vi.hoisted(() => ({
  options: [] as DeskOptions[],
  desk: { ask: vi.fn(), giveHandle: vi.fn((path: string) => `handle of ${path}`), close: vi.fn() },
  calls: [] as string[],
  app: { addRecentDocument: vi.fn(), quit: vi.fn() },
  ready: (): void => undefined,
  emit: (_event: string, ..._values: unknown[]): void => undefined,
  sent: vi.fn(),
  isMinimized: true,
  openPath: vi.fn<(path: string) => Promise<string>>(),
}));

vi.mock('../../../src-main/desk.ts', () => ({
  createDesk: (options: DeskOptions) => {
    fake.options.push(options);
    return fake.desk;
  },
}));

vi.mock('electron', async () => {
  const { EventEmitter } = await import('node:events');
  const events = new EventEmitter();
  fake.emit = (event, ...values) => void events.emit(event, ...values);
  const record = (name: string) => () => void fake.calls.push(name);
  const ready = new Promise<void>((resolve) => {
    fake.ready = resolve;
  });
  const app = Object.assign(events, {
    ...fake.app,
    isPackaged: true,
    requestSingleInstanceLock: () => true,
    whenReady: () => ready,
    getVersion: () => '1.2.3',
    enableSandbox: record('enableSandbox'),
    commandLine: { appendSwitch: (name: string, value = '') => void fake.calls.push(`${name} ${value}`.trim()) },
    exit: vi.fn(),
  });
  class BrowserWindow extends EventEmitter {
    readonly webContents = { send: fake.sent, on: vi.fn() };
    readonly show = record('show');
    readonly restore = record('restore');
    readonly focus = record('focus');
    isMinimized() {
      return fake.isMinimized;
    }
    loadURL(address: string) {
      fake.calls.push(`load ${address}`);
      return Promise.resolve();
    }
  }
  return {
    app,
    BrowserWindow,
    nativeTheme: { shouldUseDarkColors: false },
    ipcMain: { handle: record('answer') },
    Menu: { buildFromTemplate: () => ({}), setApplicationMenu: record('menu') },
    dialog: {},
    protocol: { handle: record('serve'), registerSchemesAsPrivileged: record('register') },
    session: {
      defaultSession: Object.assign(new EventEmitter(), {
        setPermissionRequestHandler: record('close session'),
        setPermissionCheckHandler: vi.fn(),
        setDevicePermissionHandler: vi.fn(),
        setSpellCheckerEnabled: vi.fn(),
        webRequest: { onBeforeRequest: vi.fn() },
      }),
    },
    shell: { openPath: fake.openPath },
  };
});

let folder = '';
let project = '';
const openEvent = { preventDefault: vi.fn() };

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'normloom-main-'));
  project = join(folder, 'grade-4.normloom');
  writeFileSync(project, '{}');
  await import('../../../src-main/electron/main.ts');
  // A Mac names the file in an event before the program is ready.
  fake.emit('open-file', openEvent, project);
  fake.ready();
  await vi.waitFor(() => {
    expect(fake.calls).toContain('load normloom://app/');
  });
});

afterAll(() => {
  rmSync(folder, { recursive: true });
});

beforeEach(() => {
  fake.sent.mockClear();
});

describe('the start of the program', () => {
  it('closes the session, serves the page and answers the desk before it loads the page', () => {
    const order = ['enableSandbox', 'register', 'close session', 'serve', 'answer', 'load normloom://app/'];
    expect(fake.calls.filter((call) => order.includes(call))).toEqual(order);
    expect(fake.calls).toContain('host-resolver-rules MAP * ~NOTFOUND');
  });

  it('makes the desk with the system’s folders and the file it was opened with', () => {
    expect(fake.options).toHaveLength(1);
    expect(fake.options[0]).toMatchObject({
      version: '1.2.3',
      host: 'electron',
      dataFolder: dataFolder(process.env, process.platform),
      projectsFolder: projectsFolder(process.env),
      openedWith: project,
    });
    expect(openEvent.preventDefault).toHaveBeenCalled();
    expect(fake.app.addRecentDocument).toHaveBeenCalledWith(project);
  });

  it('says why a folder could not be shown', async () => {
    const showFolder = fake.options[0]?.showFolder;
    fake.openPath.mockResolvedValueOnce('');
    await expect(showFolder?.('/pressed')).resolves.toBeUndefined();
    fake.openPath.mockResolvedValueOnce('The folder has gone.');
    await expect(showFolder?.('/pressed')).rejects.toThrow('The folder has gone.');
  });
});

describe('the running program', () => {
  it('gives the page files that are opened from outside', () => {
    fake.emit('open-file', openEvent, '/elsewhere/scores.csv');
    expect(fake.sent.mock.calls).toEqual([
      ['menu', 'open-file', { kind: 'cohort', handle: 'handle of /elsewhere/scores.csv' }],
    ]);
  });

  it('comes forward when it is started again, with the file of that start', () => {
    fake.calls.length = 0;
    fake.emit('second-instance', {}, ['normloom', '--flag', 'grade-4.normloom'], folder);
    expect(fake.calls).toEqual(['restore', 'focus']);
    expect(fake.sent.mock.calls).toEqual([['menu', 'open-file', { kind: 'project', handle: `handle of ${project}` }]]);
    fake.sent.mockClear();
    fake.emit('second-instance', {}, ['normloom'], folder);
    expect(fake.sent).not.toHaveBeenCalled();
  });

  it('holds every page that is made', () => {
    const contents = { setWindowOpenHandler: vi.fn(), on: vi.fn() };
    fake.emit('web-contents-created', {}, contents);
    expect(contents.setWindowOpenHandler).toHaveBeenCalledTimes(1);
    expect(contents.on.mock.calls.map(([name]: string[]) => name)).toContain('will-navigate');
  });

  it('waits for the desk to close before it quits', async () => {
    let closed: () => void = () => undefined;
    fake.desk.close.mockReturnValueOnce(
      new Promise<void>((resolve) => {
        closed = resolve;
      }),
    );
    const first = { preventDefault: vi.fn() };
    fake.emit('will-quit', first);
    expect(first.preventDefault).toHaveBeenCalledTimes(1);
    expect(fake.app.quit).not.toHaveBeenCalled();
    closed();
    await vi.waitFor(() => {
      expect(fake.app.quit).toHaveBeenCalledTimes(1);
    });
    const second = { preventDefault: vi.fn() };
    fake.emit('will-quit', second);
    expect(second.preventDefault).not.toHaveBeenCalled();
  });
});
