import { EventEmitter } from 'node:events';
import type { Session, WebContents, WebFrameMain } from 'electron';
import { describe, expect, it, vi } from 'vitest';
import { closeSession, holdPage, isOwnPage } from '../../../src-main/electron/security.ts';

vi.mock('electron', () => ({ protocol: {} }));

type BeforeRequest = (details: { url: string }, answer: (response: { cancel?: boolean }) => void) => void;

const closedSession = () => {
  const session = Object.assign(new EventEmitter(), {
    setPermissionRequestHandler: vi.fn<Session['setPermissionRequestHandler']>(),
    setPermissionCheckHandler: vi.fn<Session['setPermissionCheckHandler']>(),
    setDevicePermissionHandler: vi.fn<Session['setDevicePermissionHandler']>(),
    setSpellCheckerEnabled: vi.fn<Session['setSpellCheckerEnabled']>(),
    webRequest: { onBeforeRequest: vi.fn<(listener: BeforeRequest) => void>() },
  });
  closeSession(session as unknown as Session);
  return session;
};

const first = <T>(calls: readonly (readonly T[])[]): T => {
  const value = calls[0]?.[0];
  if (value === undefined) throw new Error('Nothing was set.');
  return value;
};

describe('the session', () => {
  it('grants no permission, asked for or looked up, and no device', () => {
    const session = closedSession();
    const contents = {} as WebContents;
    const handler = first(session.setPermissionRequestHandler.mock.calls);
    for (const permission of ['media', 'geolocation', 'notifications', 'openExternal', 'fileSystem'] as const) {
      const answer = vi.fn<(granted: boolean) => void>();
      handler?.(contents, permission, answer, {} as never);
      expect(answer.mock.calls, permission).toEqual([[false]]);
    }
    const check = first(session.setPermissionCheckHandler.mock.calls);
    expect(check?.(contents, 'clipboard-read', 'normloom://app', {} as never)).toBe(false);
    const device = first(session.setDevicePermissionHandler.mock.calls);
    expect(device?.({} as never)).toBe(false);
  });

  it('cancels every request that would leave the machine or its own scheme', () => {
    const listener = first(closedSession().webRequest.onBeforeRequest.mock.calls);
    const isCancelled = (url: string): boolean | undefined => {
      const answer = vi.fn<(response: { cancel?: boolean }) => void>();
      listener({ url }, answer);
      expect(answer).toHaveBeenCalledTimes(1);
      return answer.mock.calls[0]?.[0].cancel;
    };
    for (const url of ['normloom://app/page.js', 'blob:normloom://app/1', 'data:image/png;base64,']) {
      expect(isCancelled(url), url).toBe(false);
    }
    for (const url of [
      'https://example.org/',
      'http://127.0.0.1:80/',
      'ws://localhost/',
      'file:///etc/hosts',
      'ftp://example.org/',
      'normloom://elsewhere/page.js',
      'nonsense',
    ]) {
      expect(isCancelled(url), url).toBe(true);
    }
  });

  it('downloads nothing and fetches no dictionary', () => {
    const session = closedSession();
    const event = { preventDefault: vi.fn() };
    session.emit('will-download', event);
    expect(event.preventDefault).toHaveBeenCalledTimes(1);
    expect(session.setSpellCheckerEnabled.mock.calls).toEqual([[false]]);
  });
});

describe('the page', () => {
  it('cannot navigate, redirect or embed, and opens no window', () => {
    const setWindowOpenHandler = vi.fn<WebContents['setWindowOpenHandler']>();
    const contents = Object.assign(new EventEmitter(), { setWindowOpenHandler });
    holdPage(contents as unknown as WebContents);
    for (const name of ['will-navigate', 'will-frame-navigate', 'will-redirect', 'will-attach-webview']) {
      const event = { preventDefault: vi.fn(), url: 'normloom://app/' };
      contents.emit(name, event);
      expect(event.preventDefault, name).toHaveBeenCalledTimes(1);
    }
    const open = first(setWindowOpenHandler.mock.calls);
    expect(open({ url: 'https://example.org/' } as never)).toEqual({ action: 'deny' });
    expect(open({ url: 'normloom://app/' } as never)).toEqual({ action: 'deny' });
  });

  it('is told apart from any other sender', () => {
    const frame = (url: string, parent: WebFrameMain | null = null) => ({ url, parent }) as WebFrameMain;
    const own = frame('normloom://app/');
    const from = (senderFrame: WebFrameMain | null, mainFrame: WebFrameMain) =>
      isOwnPage({ senderFrame, sender: { mainFrame } as WebContents });
    expect(from(own, own)).toBe(true);
    expect(from(null, own)).toBe(false);
    expect(from(frame('normloom://app/', own), own)).toBe(false);
    expect(from(frame('normloom://app/'), own)).toBe(false);
    for (const url of ['https://example.org/', 'about:blank', 'file:///page.html', 'normloom://app.example/']) {
      const foreign = frame(url);
      expect(from(foreign, foreign), url).toBe(false);
    }
  });
});
