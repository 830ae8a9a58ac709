import { beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import type { WindowDesk } from '../../../src-main/electron/bridge.ts';

type Listener = (event: unknown, ...values: unknown[]) => void;

const electron = vi.hoisted(() => ({
  contextBridge: { exposeInMainWorld: vi.fn<(name: string, api: WindowDesk) => void>() },
  ipcRenderer: {
    invoke: vi.fn<(channel: string, message: unknown) => Promise<unknown>>(),
    on: vi.fn<(channel: string, listener: Listener) => void>(),
  },
  webUtils: { getPathForFile: vi.fn<(file: File) => string>() },
}));
vi.mock('electron', () => electron);

let windowDesk: WindowDesk;
let names: string[] = [];

beforeAll(async () => {
  await import('../../../src-main/electron/preload.ts');
  names = electron.contextBridge.exposeInMainWorld.mock.calls.map(([name]) => name);
  const call = electron.contextBridge.exposeInMainWorld.mock.calls[0];
  if (call === undefined) throw new Error('Nothing was exposed.');
  windowDesk = call[1];
});

beforeEach(() => {
  vi.resetAllMocks();
});

describe('the preload script', () => {
  it('gives the page three functions and nothing else', () => {
    expect(names).toEqual(['normloomDesk']);
    expect(Object.keys(windowDesk).sort()).toEqual(['ask', 'onMenu', 'receiveFile']);
  });

  it('asks on the desk channel', async () => {
    electron.ipcRenderer.invoke.mockResolvedValueOnce({ ok: true, value: 1 });
    expect(await windowDesk.ask('about', {})).toEqual({ ok: true, value: 1 });
    expect(electron.ipcRenderer.invoke.mock.calls).toEqual([['desk', { kind: 'ask', request: 'about', ask: {} }]]);
  });

  it('hands over the path of a real file and gives the page its handle only', async () => {
    electron.webUtils.getPathForFile.mockReturnValueOnce('/data/scores.csv');
    electron.ipcRenderer.invoke.mockResolvedValueOnce({ ok: true, value: 'handle-1' });
    expect(await windowDesk.receiveFile(new File([], 'scores.csv'))).toBe('handle-1');
    expect(electron.ipcRenderer.invoke.mock.calls).toEqual([['desk', { kind: 'file', path: '/data/scores.csv' }]]);
  });

  it('rejects with a sentence for a made-up file and for a refused one', async () => {
    electron.webUtils.getPathForFile.mockReturnValueOnce('');
    await expect(windowDesk.receiveFile(new File(['1'], 'made-up.csv'))).rejects.toThrow('not a file on this machine');
    expect(electron.ipcRenderer.invoke).not.toHaveBeenCalled();
    electron.webUtils.getPathForFile.mockReturnValueOnce('/data/scores.csv');
    electron.ipcRenderer.invoke.mockResolvedValueOnce({ ok: false, problem: 'The file has gone.' });
    await expect(windowDesk.receiveFile(new File([], 'scores.csv'))).rejects.toThrow('The file has gone.');
  });

  it('passes menu commands on without the event that carried them', () => {
    const listener = vi.fn<Parameters<WindowDesk['onMenu']>[0]>();
    windowDesk.onMenu(listener);
    const [channel, carry] = electron.ipcRenderer.on.mock.calls[0] ?? [];
    expect(channel).toBe('menu');
    carry?.({ sender: 'secret' }, 'open-file', { kind: 'project', handle: 'handle-2' });
    expect(listener.mock.calls).toEqual([['open-file', { kind: 'project', handle: 'handle-2' }]]);
  });
});
