import { mkdir, readdir, symlink, writeFile } from 'node:fs/promises';
import { networkInterfaces } from 'node:os';
import { connect } from 'node:net';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Reply } from '../../../shared-core/desk.ts';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import { projectToText } from '../../../shared-core/norms/project-text.ts';
import { Uploads } from '../../../src-main/browser-host/uploads.ts';
import { cookieOf, hostAtHand, ownHeaders, type Answer, type HostAtHand } from './host-at-hand.ts';

let at: HostAtHand;
let cookie = '';
let first: Answer;
beforeAll(async () => {
  at = await hostAtHand();
  first = await at.send(new URL(at.host.address).search.replace(/^/, '/'));
  cookie = cookieOf(first);
});
afterAll(() => at.close());

const own = (more: Readonly<Record<string, string>> = {}): Readonly<Record<string, string>> => ({
  ...ownHeaders(at.host.port, cookie),
  ...more,
});
const ask = (body: string, headers = own()): Promise<Answer> => at.send('/desk', { method: 'POST', headers, body });
const about = JSON.stringify({ request: 'about', ask: {} });

describe('coming in', () => {
  it('turns the code into a cookie for this machine’s page alone, and goes to the page', () => {
    expect(first.status).toBe(303);
    expect(first.headers['location']).toBe('/');
    expect(first.headers['set-cookie']?.[0]).toMatch(/^normloom-\d+=[\w-]{43}; Path=\/; HttpOnly; SameSite=Strict$/);
    expect(at.host.address).toMatch(/^http:\/\/127\.0\.0\.1:\d+\/\?code=[\w-]{32}$/);
  });

  it('takes the code once: a second time, with the right or a wrong code, there is only a page that says so', async () => {
    for (const path of [new URL(at.host.address).search.replace(/^/, '/'), '/?code=', '/?code=wrong']) {
      const answer = await at.send(path);
      expect(answer.status).toBe(403);
      expect(answer.text).toContain('start Normloom again');
      expect(answer.headers['set-cookie']).toBeUndefined();
    }
  });

  it('shows nothing without the cookie, or with another', async () => {
    for (const headers of [{}, { cookie: `${cookie}x` }, { cookie: 'normloom-1=x' }, { cookie: cookie.slice(0, -1) }]) {
      for (const path of ['/', '/assets/index.js', '/nothing']) {
        expect((await at.send(path, { headers })).status).toBe(403);
      }
      const asked = { ...own(), cookie: '', ...headers };
      expect((await ask(about, asked)).status).toBe(403);
    }
    expect((await at.send('/', { headers: { cookie } })).status).toBe(200);
    expect((await at.send('/', { headers: { cookie: `a=b; ${cookie}; c=d` } })).status).toBe(200);
  });

  it('listens on the loopback address only', async () => {
    const others = Object.values(networkInterfaces())
      .flatMap((addresses) => addresses ?? [])
      .filter(({ internal, family }) => !internal && family === 'IPv4');
    for (const { address } of others) {
      const reached = await new Promise<boolean>((resolve) => {
        const socket = connect(at.host.port, address, () => resolve(true));
        socket.on('error', () => resolve(false));
        socket.on('connect', () => socket.destroy());
      });
      expect(reached, address).toBe(false);
    }
  });
});

describe('who is answered', () => {
  it('refuses a Host that is not this machine’s', async () => {
    const hosts = [
      'evil.example',
      `evil.example:${at.host.port}`,
      '127.0.0.1',
      `127.0.0.1:${at.host.port + 1}`,
      'localhost',
    ];
    for (const host of hosts) {
      expect((await at.send('/', { headers: { cookie, host } })).status, host).toBe(403);
      expect((await ask(about, own({ host }))).status, host).toBe(403);
    }
    const host = `localhost:${at.host.port}`;
    expect((await at.send('/', { headers: { cookie, host } })).status).toBe(200);
    expect((await ask(about, own({ host, origin: `http://${host}` }))).status).toBe(200);
  });

  it('refuses a foreign or missing Origin on everything that is asked or handed over', async () => {
    const origins = [
      'http://evil.example',
      'null',
      `https://127.0.0.1:${at.host.port}`,
      `http://localhost:${at.host.port}`,
    ];
    const { origin: _own, ...without } = own();
    for (const headers of [...origins.map((origin) => own({ origin })), without]) {
      for (const path of ['/desk', '/upload?name=a.csv']) {
        const answer = await at.send(path, { method: 'POST', headers, body: about });
        expect(answer.status, headers['origin'] ?? 'none').toBe(403);
      }
    }
    expect(await readdir(join(at.hand.folder, 'data')).catch(() => [])).not.toContain('uploads');
  });

  it('refuses any other method in plain words', async () => {
    for (const method of ['PUT', 'DELETE', 'OPTIONS', 'PATCH']) {
      const answer = await at.send('/', { method, headers: own() });
      expect(answer.status).toBe(405);
      expect(answer.headers['allow']).toBe('GET, HEAD, POST');
    }
    expect(await at.send('/', { method: 'HEAD', headers: { cookie } })).toMatchObject({ status: 200, text: '' });
    expect((await at.send('/elsewhere', { method: 'POST', headers: own(), body: '{}' })).status).toBe(404);
  });
});

describe('the desk by wire', () => {
  it('answers in JSON what the desk answers', async () => {
    const answer = await ask(about);
    expect(answer.status).toBe(200);
    expect(JSON.parse(answer.text)).toMatchObject({ ok: true, value: { host: 'browser', version: '0.0.1' } });
  });

  it('refuses other kinds of body, damaged ones, unknown requests, and too large ones', async () => {
    for (const type of ['text/plain', 'application/x-www-form-urlencoded', 'application/json-seq', '']) {
      expect((await ask(about, own({ 'content-type': type }))).status, type).toBe(415);
    }
    expect((await ask(about, own({ 'content-type': 'application/json; charset=utf-8' }))).status).toBe(200);
    for (const body of ['', '{', '[]', 'null', '{"request":"erase","ask":{}}', '{"request":"__proto__","ask":{}}']) {
      const answer = await ask(body);
      expect(answer.status, body).toBe(400);
      expect(JSON.parse(answer.text)).toEqual({ ok: false, problem: 'Normloom does not know this request.' });
    }
    expect(JSON.parse((await ask('{"request":"about"}')).text)).toMatchObject({ ok: false });
    const declared = await ask('x', own({ 'content-length': String(10 ** 9) })).catch((error: unknown) => error);
    expect(declared).toMatchObject({ status: 413 });
  });

  it('refuses a body that grows beyond the limit without saying so', async () => {
    const chunk = Buffer.alloc(66 * 1024 * 1024, 0x20);
    const answer = await at
      .send('/desk', { method: 'POST', headers: own({ 'transfer-encoding': 'chunked' }), body: chunk })
      .catch(() => null);
    // The answer, or a connection cut while the rest was still being sent.
    expect(answer === null || answer.status === 413).toBe(true);
    expect((await ask(about)).status).toBe(200);
  });
});

describe('the files of the page', () => {
  it('come with their type, and every answer with the policy that holds the page', async () => {
    const get = (path: string): Promise<Answer> => at.send(path, { headers: { cookie } });
    expect((await get('/')).headers['content-type']).toBe('text/html; charset=utf-8');
    expect((await get('/assets/index.js?v=1')).headers['content-type']).toBe('text/javascript; charset=utf-8');
    const answers = [
      await get('/'),
      await get('/none'),
      first,
      await at.send('/'),
      await ask(about),
      await get('/favicon.ico'),
    ];
    answers.push(await at.send('/', { method: 'PUT' }), await at.send('/', { headers: { host: 'x' } }));
    for (const { headers } of answers) {
      expect(headers['content-security-policy']).toContain("default-src 'none'; script-src 'self'");
      expect(headers['content-security-policy']).toContain("require-trusted-types-for 'script'");
      expect(headers['content-security-policy']).toContain('normloom-worker');
      expect(headers['x-content-type-options']).toBe('nosniff');
      expect(headers['referrer-policy']).toBe('no-referrer');
      expect(headers['cross-origin-resource-policy']).toBe('same-origin');
      expect(headers['cache-control']).toBe('no-store');
      expect(headers['access-control-allow-origin']).toBeUndefined();
    }
  });

  it('end at the folder of the page: no way out by dots, codes, backslashes, absolute paths or links', async () => {
    await symlink(join(at.hand.folder, 'secret.js'), join(at.page, 'link.js'));
    await symlink(at.hand.folder, join(at.page, 'out'));
    const ways = [
      '/../secret.js',
      '/assets/../../secret.js',
      '/%2e%2e/secret.js',
      '/..%2fsecret.js',
      '/%2e%2e%2fsecret.js',
      '/..\\secret.js',
      '/..%5csecret.js',
      '/%252e%252e/secret.js',
      `/${at.hand.folder}/secret.js`,
      `//${at.hand.folder}/secret.js`,
      '/link.js',
      '/out/secret.js',
      '/index.html%00.js',
      '/%',
      '/assets',
      '/assets/',
    ];
    for (const way of ways) {
      const answer = await at.send(way, { headers: { cookie } });
      expect(answer.status, way).toBe(404);
      expect(answer.text, way).not.toContain('secret');
    }
  });
});

describe('files that the page hands over', () => {
  const upload = async (name: string, body: string | Uint8Array): Promise<Reply<{ handle: string }>> => {
    const headers = own({ 'content-type': 'application/octet-stream' });
    const path = `/upload?name=${encodeURIComponent(name)}`;
    const answer = await at.send(path, { method: 'POST', headers, body });
    return JSON.parse(answer.text) as Reply<{ handle: string }>;
  };
  const asked = async (request: string, what: unknown): Promise<unknown> =>
    JSON.parse((await ask(JSON.stringify({ request, ask: what }))).text);

  it('are known by the name they had, and can be read through their handle', async () => {
    const reply = await upload('Lesen/Übung "2".csv', 'score\n1\n');
    const handle = reply.ok ? reply.value.handle : '';
    expect(await asked('look-at-cohort', { handle, reading: null })).toMatchObject({
      ok: true,
      value: { file: 'Übung "2".csv' },
    });
  });

  it('that are projects open as copies: the page gets no handle to save to', async () => {
    const reply = await upload('mine.normloom', projectToText(newProject('Brought along')));
    const handle = reply.ok ? reply.value.handle : '';
    expect(await asked('open-project', { handle })).toMatchObject({
      ok: true,
      value: { handle: null, file: 'mine.normloom', project: { title: 'Brought along' } },
    });
  });

  it('that are too large are refused and leave nothing behind', async () => {
    const uploads = join(at.hand.folder, 'data', 'uploads');
    const before = (await readdir(uploads, { recursive: true })).length;
    expect(await upload('large.csv', Buffer.alloc(1_000_001))).toMatchObject({ ok: false });
    expect((await readdir(uploads, { recursive: true })).length).toBe(before);
  });

  it('are removed when the program ends, and at the next start when it was killed', async () => {
    const other = await hostAtHand();
    const uploads = join(other.hand.folder, 'data', 'uploads');
    await mkdir(join(uploads, '999999999-dead'), { recursive: true });
    await writeFile(join(uploads, '999999999-dead', 'a.csv'), 'personal');
    await other.host.close();
    expect(await readdir(uploads)).toEqual(['999999999-dead']);
    await new Uploads(join(other.hand.folder, 'data')).sweep();
    expect(await readdir(uploads)).toEqual([]);
    await other.hand.close();
  });
});
