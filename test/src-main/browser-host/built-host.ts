import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { createInterface } from 'node:readline';
import { fileURLToPath } from 'node:url';
import { build } from 'vite';
import type { DeskRequest, DeskRequests, Reply } from '../../../shared-core/desk.ts';
import { cookieOf, ownHeaders, sendTo } from './host-at-hand.ts';

const here = (path: string): string => fileURLToPath(new URL(path, import.meta.url));

/** Builds the browser host and its workers two folders below the repository, where it expects to be. Returns its file. */
export async function buildHost(): Promise<string> {
  const outDir = here('../../../.cache/built-host');
  await build({
    configFile: false,
    logLevel: 'error',
    root: here('../../..'),
    build: {
      ssr: true,
      outDir,
      emptyOutDir: true,
      target: 'node20',
      rolldownOptions: {
        input: {
          'browser-host': here('../../../src-main/browser-host/main.ts'),
          'tally-worker': here('../../../src-main/cohort-file/tally-worker.ts'),
          'press-worker': here('../../../src-main/press/press-worker.ts'),
          'erratum-worker': here('../../../src-main/erratum/erratum-worker.ts'),
        },
        output: { entryFileNames: '[name].js', chunkFileNames: '[name]-[hash].js' },
      },
    },
  });
  return `${outDir}/browser-host.js`;
}

export interface RunningHost {
  readonly child: ChildProcess;
  readonly ended: Promise<readonly unknown[]>;
  readonly address: string;
  /** Lets the page in; further requests carry its cookie. */
  enter(): Promise<void>;
  ask<R extends DeskRequest>(request: R, ask: DeskRequests[R]['ask']): Promise<DeskRequests[R]['answer']>;
  /** Hands a file over and gives its handle. */
  upload(name: string, body: string): Promise<string>;
}

export type Environment = Readonly<Record<string, string | undefined>>;

/** Starts the built host and waits for the line with its address. */
export async function runHost(
  program: string,
  words: readonly string[],
  environment: Environment,
): Promise<RunningHost> {
  const child = spawn(process.execPath, [program, ...words], {
    stdio: ['ignore', 'pipe', 'inherit'],
    env: { ...process.env, ...environment },
  });
  const ended = once(child, 'exit');
  const [line] = (await once(createInterface(child.stdout), 'line')) as [string];
  const address = /^Normloom is at (http:\/\/127\.0\.0\.1:\d+\/\?code=[\w-]+)$/.exec(line)?.[1];
  if (address === undefined) throw new Error(`an address was expected, not ${line}`);
  const url = new URL(address);
  const port = Number(url.port);
  let cookie = '';
  const post = async (path: string, body: string): Promise<unknown> => {
    const reply: unknown = JSON.parse(
      (await sendTo(port, path, { method: 'POST', headers: ownHeaders(port, cookie), body })).text,
    );
    return reply;
  };
  return {
    child,
    ended,
    address,
    async enter() {
      cookie = cookieOf(await sendTo(port, `/${url.search}`));
    },
    async ask<R extends DeskRequest>(request: R, ask: DeskRequests[R]['ask']) {
      const reply = (await post('/desk', JSON.stringify({ request, ask }))) as Reply<DeskRequests[R]['answer']>;
      if (!reply.ok) throw new Error(reply.problem);
      return reply.value;
    },
    async upload(name, body) {
      const reply = (await post(`/upload?name=${encodeURIComponent(name)}`, body)) as Reply<{
        readonly handle: string;
      }>;
      if (!reply.ok) throw new Error(reply.problem);
      return reply.value.handle;
    },
  };
}
