import { mkdir, writeFile } from 'node:fs/promises';
import { request as httpRequest } from 'node:http';
import { join } from 'node:path';
import { startBrowserHost, type BrowserHost } from '../../../src-main/browser-host/server.ts';
import { deskAtHand, PLAIN_WORK, type DeskAtHand } from '../desk/desk-at-hand.ts';
import type { DeskWork } from '../../../src-main/desk/desk-work.ts';

export interface Answer {
  readonly status: number;
  readonly headers: Readonly<Record<string, string | string[] | undefined>>;
  readonly text: string;
}

export interface Asked {
  readonly method?: string;
  readonly headers?: Readonly<Record<string, string>>;
  readonly body?: string | Uint8Array;
}

export interface HostAtHand {
  readonly hand: DeskAtHand;
  readonly host: BrowserHost;
  readonly page: string;
  /** Sends a request whose path goes out exactly as written. */
  send(path: string, asked?: Asked): Promise<Answer>;
  /** The cookie that the first address gives. */
  enter(): Promise<string>;
  close(): Promise<void>;
}

export async function hostAtHand(work: DeskWork = PLAIN_WORK, uploadLimit = 1_000_000): Promise<HostAtHand> {
  const hand = await deskAtHand({}, work);
  const page = join(hand.folder, 'renderer');
  await mkdir(join(page, 'assets'), { recursive: true });
  await writeFile(join(page, 'index.html'), '<!doctype html><title>Normloom</title>');
  await writeFile(join(page, 'assets', 'index.js'), 'export {};');
  await writeFile(join(hand.folder, 'secret.js'), 'secret');
  const dataFolder = join(hand.folder, 'data');
  const host = await startBrowserHost({ desk: hand.desk, rendererFolder: page, dataFolder, uploadLimit });
  const send = (path: string, asked: Asked = {}): Promise<Answer> => sendTo(host.port, path, asked);
  return {
    hand,
    host,
    page,
    send,
    enter: async () => cookieOf(await send(new URL(host.address).pathname + new URL(host.address).search)),
    async close() {
      await host.close();
      await hand.close();
    },
  };
}

/** Sends a request to a port of this machine, with `fetch`'s tidying of paths and headers left out. */
export function sendTo(
  port: number,
  path: string,
  { method = 'GET', headers = {}, body }: Asked = {},
): Promise<Answer> {
  return new Promise((resolve, reject) => {
    const request = httpRequest(
      { host: '127.0.0.1', port, path, method, headers: { connection: 'close', ...headers } },
      (response) => {
        const chunks: Buffer[] = [];
        response.on('data', (chunk: Buffer) => chunks.push(chunk));
        response.on('end', () => {
          const text = Buffer.concat(chunks).toString('utf8');
          resolve({ status: response.statusCode ?? 0, headers: response.headers, text });
        });
        response.on('error', reject);
      },
    );
    request.on('error', reject);
    request.end(body);
  });
}

export function cookieOf({ headers }: Answer): string {
  return headers['set-cookie']?.[0]?.split(';')[0] ?? '';
}

/** Headers that the program's own page sends. */
export function ownHeaders(port: number, cookie: string): Readonly<Record<string, string>> {
  return { cookie, origin: `http://127.0.0.1:${port}`, 'content-type': 'application/json' };
}
