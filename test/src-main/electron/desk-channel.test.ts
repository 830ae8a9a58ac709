import type { IpcMainInvokeEvent } from 'electron';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { DESK_REQUESTS } from '../../../shared-core/desk.ts';
import type { Reply } from '../../../shared-core/desk.ts';
import type { DeskHost } from '../../../src-main/desk.ts';
import { answerDesk } from '../../../src-main/electron/desk-channel.ts';

type Handler = (event: Pick<IpcMainInvokeEvent, 'sender' | 'senderFrame'>, message: unknown) => unknown;

const electron = vi.hoisted(() => ({
  ipcMain: { handle: vi.fn<(channel: string, handler: Handler) => void>() },
  protocol: {},
}));
vi.mock('electron', () => electron);

const desk = {
  ask: vi.fn<(request: string, ask: unknown) => Promise<Reply<unknown>>>(),
  giveHandle: vi.fn<(path: string) => string>(),
  close: vi.fn<() => Promise<void>>(),
};
const received = vi.fn<(path: string) => void>();

const eventFrom = (url: string): Pick<IpcMainInvokeEvent, 'sender' | 'senderFrame'> => {
  const frame = { url, parent: null };
  return { senderFrame: frame, sender: { mainFrame: frame } } as unknown as IpcMainInvokeEvent;
};
const OWN = eventFrom('normloom://app/');

let send: Handler;

beforeEach(() => {
  vi.clearAllMocks();
  desk.ask.mockResolvedValue({ ok: true, value: 'the answer' });
  desk.giveHandle.mockReturnValue('handle-1');
  answerDesk(desk as unknown as DeskHost, received);
  const call = electron.ipcMain.handle.mock.calls[0];
  if (call === undefined) throw new Error('No channel was opened.');
  send = call[1];
});

describe('the desk channel', () => {
  it('is one channel', () => {
    expect(electron.ipcMain.handle.mock.calls.map(([channel]) => channel)).toEqual(['desk']);
  });

  it('hands every request of the contract to the desk and its answer back', async () => {
    for (const request of DESK_REQUESTS) {
      const ask = { job: request };
      expect(await send(OWN, { kind: 'ask', request, ask })).toEqual({ ok: true, value: 'the answer' });
      expect(desk.ask).toHaveBeenLastCalledWith(request, ask);
    }
    expect(desk.ask).toHaveBeenCalledTimes(DESK_REQUESTS.length);
  });

  it('refuses requests it does not know and what is not an object, without asking the desk', async () => {
    for (const message of [
      { kind: 'ask', request: 'read-any-file', ask: {} },
      { kind: 'ask', request: '__proto__', ask: {} },
      { kind: 'ask', request: 'toString', ask: {} },
      { kind: 'ask', request: 'about', ask: null },
      { kind: 'ask', request: 'about', ask: [] },
      { kind: 'ask', request: 'about' },
      { kind: 'ask', request: 7, ask: {} },
      { kind: 'other', request: 'about', ask: {} },
      { kind: 'file', path: 7 },
      'about',
      null,
      undefined,
      [],
    ]) {
      expect(await send(OWN, message), JSON.stringify(message)).toMatchObject({ ok: false });
    }
    expect(desk.ask).not.toHaveBeenCalled();
    expect(desk.giveHandle).not.toHaveBeenCalled();
  });

  it('refuses foreign pages and frames by throwing', () => {
    const parent = { url: 'normloom://app/', parent: null };
    const inner = { senderFrame: { url: 'normloom://app/', parent }, sender: { mainFrame: parent } };
    for (const event of [
      eventFrom('https://example.org/'),
      eventFrom('about:blank'),
      eventFrom('normloom://elsewhere/'),
      { ...OWN, senderFrame: null },
      inner as unknown as IpcMainInvokeEvent,
    ]) {
      expect(() => send(event, { kind: 'ask', request: 'about', ask: {} })).toThrow('only the page of this program');
      expect(() => send(event, { kind: 'file', path: '/scores.csv' })).toThrow('only the page of this program');
    }
    expect(desk.ask).not.toHaveBeenCalled();
    expect(desk.giveHandle).not.toHaveBeenCalled();
  });

  it('gives a handle for a dropped file with a full path, and lets the host know', async () => {
    expect(await send(OWN, { kind: 'file', path: '/data/scores.csv' })).toEqual({ ok: true, value: 'handle-1' });
    expect(desk.giveHandle.mock.calls).toEqual([['/data/scores.csv']]);
    expect(received.mock.calls).toEqual([['/data/scores.csv']]);
    expect(await send(OWN, { kind: 'file', path: 'scores.csv' })).toMatchObject({ ok: false });
    expect(desk.giveHandle).toHaveBeenCalledTimes(1);
  });
});
