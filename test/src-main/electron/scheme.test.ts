import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { CustomScheme } from 'electron';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { isOwnAddress, registerScheme, serveFolder } from '../../../src-main/electron/scheme.ts';
import { CONTENT_SECURITY_POLICY } from '../../../src-main/page-policy.ts';

type Handler = (request: Request) => Response | Promise<Response>;

const electron = vi.hoisted(() => ({
  protocol: {
    handle: vi.fn<(scheme: string, handler: (request: Request) => Response | Promise<Response>) => void>(),
    registerSchemesAsPrivileged: vi.fn<(schemes: CustomScheme[]) => void>(),
  },
}));
vi.mock('electron', () => electron);

// A Request of Node changes the scheme's case and folds dots; what Electron hands over is only read for these two.
const ask = (url: string, method = 'GET'): Promise<Response> => Promise.resolve(handler({ url, method } as Request));

let folder = '';
let handler: Handler;

beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'normloom-scheme-'));
  writeFileSync(join(folder, 'index.html'), '<!doctype html><title>Page</title>');
  writeFileSync(join(folder, 'page.js'), 'export {};');
  writeFileSync(join(folder, 'notes.secret'), 'not for the page');
  serveFolder(folder);
  const call = electron.protocol.handle.mock.calls[0];
  if (call === undefined) throw new Error('No scheme was handled.');
  expect(call[0]).toBe('normloom');
  handler = call[1];
});

afterAll(() => {
  rmSync(folder, { recursive: true });
});

describe('the own scheme', () => {
  it('is registered as a standard, secure origin without a way around the policy', () => {
    registerScheme();
    const [schemes] = electron.protocol.registerSchemesAsPrivileged.mock.calls[0] ?? [];
    expect(schemes).toEqual([
      { scheme: 'normloom', privileges: { standard: true, secure: true, supportFetchAPI: true } },
    ]);
  });

  it('serves the page and its files with their type and the content policy', async () => {
    const page = await ask('normloom://app/');
    expect(page.status).toBe(200);
    expect(page.headers.get('content-type')).toBe('text/html; charset=utf-8');
    expect(page.headers.get('content-security-policy')).toBe(CONTENT_SECURITY_POLICY);
    expect(page.headers.get('x-content-type-options')).toBe('nosniff');
    expect(await page.text()).toContain('<title>Page</title>');
    const script = await ask('normloom://app/page.js?v=1');
    expect(script.status).toBe(200);
    expect(script.headers.get('content-type')).toBe('text/javascript; charset=utf-8');
  });

  it('refuses every way out of the folder, with the policy on the refusal too', async () => {
    for (const path of [
      '/../package.json',
      '/..%2fpackage.json',
      '/%2e%2e/package.json',
      '/%2e%2e%2fpackage.json',
      '/a/..%2f..%2fpackage.json',
      '/..%5cpackage.json',
      '/page.js%00.html',
      '/%zz.js',
      '//etc/hosts.json',
    ]) {
      const answer = await ask(`normloom://app${path}`);
      expect(answer.status, path).toBe(404);
      expect(answer.headers.get('content-security-policy'), path).toBe(CONTENT_SECURITY_POLICY);
      expect(await answer.text(), path).toBe('');
    }
  });

  it('refuses other hosts, other methods, missing files and files of no known type', async () => {
    expect((await ask('normloom://other/index.html')).status).toBe(404);
    expect((await ask('normloom://app/', 'POST')).status).toBe(405);
    expect((await ask('normloom://app/absent.js')).status).toBe(404);
    expect((await ask('normloom://app/notes.secret')).status).toBe(404);
  });

  it('tells its own addresses from look-alikes', () => {
    expect(isOwnAddress('normloom://app/index.html')).toBe(true);
    for (const address of [
      'normloom://app.example/',
      'normloom://app:80/',
      'normloom:app',
      'https://app/',
      'about:blank',
      'not an address',
      '',
    ]) {
      expect(isOwnAddress(address), address).toBe(false);
    }
  });
});
