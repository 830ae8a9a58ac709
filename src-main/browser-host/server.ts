import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';
import type { DeskHost } from '../desk/desk-host.ts';
import { unexpected } from '../desk/jobs.ts';
import { refused } from '../desk/reply.ts';
import { send, sendReply, sendSentence } from './answers.ts';
import { answerDesk } from './desk-wire.ts';
import { EntryPass } from './entry-pass.ts';
import { sendPageFile } from './page-files.ts';
import { comesFromOwnPage, comesToThisHost } from './request-checks.ts';
import { Uploads } from './uploads.ts';

export interface BrowserHostOptions {
  readonly desk: DeskHost;
  /** The built page. */
  readonly rendererFolder: string;
  /** The program's own folder; uploads are kept below it while the program runs. */
  readonly dataFolder: string;
  /** 0 or left out: any free port. */
  readonly port?: number;
  /** Bytes; left out: the usual limit. */
  readonly uploadLimit?: number;
}

export interface BrowserHost {
  readonly port: number;
  /** The first address, with the code that lets one browser in. */
  readonly address: string;
  /** Ends all connections, removes the uploads and closes the desk. */
  close(): Promise<void>;
}

interface Room {
  readonly desk: DeskHost;
  readonly rendererFolder: string;
  readonly uploads: Uploads;
  readonly pass: EntryPass;
  readonly port: number;
}

/** Serves the page and the desk on this machine alone: 127.0.0.1, one browser, nothing without its cookie. */
export async function startBrowserHost(options: BrowserHostOptions): Promise<BrowserHost> {
  const uploads = new Uploads(options.dataFolder, options.uploadLimit);
  await uploads.sweep();
  const pass = new EntryPass();
  const server = createServer();
  await listen(server, options.port ?? 0);
  const { port } = server.address() as AddressInfo;
  const room: Room = { desk: options.desk, rendererFolder: options.rendererFolder, uploads, pass, port };
  // A large file on a slow disk may take longer than Node allows a request by itself.
  server.requestTimeout = 0;
  server.on('request', (request: IncomingMessage, response: ServerResponse) => {
    answer(room, request, response).catch((error: unknown) => {
      if (response.headersSent) response.destroy();
      else sendReply(response, 500, refused(unexpected(error)));
    });
  });
  return {
    port,
    address: `http://127.0.0.1:${port}/?code=${pass.code ?? ''}`,
    async close() {
      server.closeAllConnections();
      await new Promise<void>((resolve) => server.close(() => resolve()));
      await options.desk.close();
      await uploads.close();
    },
  };
}

async function answer(room: Room, request: IncomingMessage, response: ServerResponse): Promise<void> {
  if (!comesToThisHost(request, room.port)) {
    sendSentence(response, 403, 'Not for you', 'Normloom answers only to this machine.');
    return;
  }
  const [path = '/', query = ''] = (request.url ?? '/').split('?', 2);
  switch (request.method) {
    case 'GET':
    case 'HEAD':
      return answerGet(room, path, query, request, response);
    case 'POST':
      return answerPost(room, path, query, request, response);
    default:
      sendSentence(response, 405, 'Not this way', 'Normloom is only read from and asked.', {
        allow: 'GET, HEAD, POST',
      });
  }
}

async function answerGet(
  { pass, port, rendererFolder }: Room,
  path: string,
  query: string,
  request: IncomingMessage,
  response: ServerResponse,
): Promise<void> {
  const code = path === '/' ? new URLSearchParams(query).get('code') : null;
  if (code !== null && request.method === 'GET' && pass.redeem(code)) {
    send(response, 303, 'text/plain; charset=utf-8', '', { location: '/', 'set-cookie': pass.cookie(port) });
    return;
  }
  // The page names its own icon; browsers ask for this one beside pages that name none.
  if (path === '/favicon.ico') {
    send(response, 204, 'image/x-icon', '');
    return;
  }
  if (!pass.admits(request.headers.cookie, port)) {
    const sentence =
      'This address was used already, or belongs to an earlier start. Close this page and start Normloom again; it will print a new address.';
    sendSentence(response, 403, 'Start Normloom again', sentence);
    return;
  }
  await sendPageFile(rendererFolder, path, response);
}

async function answerPost(
  { pass, port, desk, uploads }: Room,
  path: string,
  query: string,
  request: IncomingMessage,
  response: ServerResponse,
): Promise<void> {
  if (!pass.admits(request.headers.cookie, port) || !comesFromOwnPage(request)) {
    sendReply(response, 403, refused('Only the page of this program may ask. Start Normloom again.'));
    return;
  }
  switch (path) {
    case '/desk':
      return answerDesk(desk, request, response);
    case '/upload': {
      const reply = await uploads.take(request, new URLSearchParams(query).get('name') ?? '', desk);
      if (!reply.ok) response.setHeader('connection', 'close');
      sendReply(response, 200, reply);
      return;
    }
    default:
      sendReply(response, 404, refused('Normloom has nothing of this name to ask.'));
  }
}

function listen(server: Server, port: number): Promise<void> {
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, '127.0.0.1', () => {
      server.off('error', reject);
      resolve();
    });
  });
}
