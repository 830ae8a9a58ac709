import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createInterface } from 'node:readline';
import { fileURLToPath } from 'node:url';

const HOST = fileURLToPath(new URL('../../dist/main/browser-host.js', import.meta.url));

/** The browser host as `npm start` runs it, with folders of its own. */
export class Program {
  readonly #home: string;
  #child: ChildProcess | null = null;

  private constructor(home: string) {
    this.#home = home;
  }

  static async inNewHome(): Promise<Program> {
    return new Program(await mkdtemp(join(tmpdir(), 'normloom-journey-')));
  }

  /** Where projects are saved and booklets pressed. */
  get projects(): string {
    return join(this.#home, 'projects');
  }

  get home(): string {
    return this.#home;
  }

  /** Starts the host, after a kill once more, and gives the address to open. */
  async start(): Promise<string> {
    const child = spawn(process.execPath, [HOST, '--no-window'], {
      stdio: ['ignore', 'pipe', 'inherit'],
      env: { ...process.env, NORMLOOM_DATA: join(this.#home, 'data'), NORMLOOM_FOLDER: this.projects },
    });
    this.#child = child;
    const said: readonly unknown[] = await once(createInterface(child.stdout), 'line');
    const line = String(said[0]);
    const address = /http:\/\/\S+/.exec(line)?.[0];
    if (address === undefined) throw new Error(`the host said: ${line}`);
    return address;
  }

  /** As when the machine loses power: no warning, no tidying. */
  async kill(): Promise<void> {
    await this.#stop('SIGKILL');
  }

  async end(): Promise<void> {
    await this.#stop('SIGTERM');
    await rm(this.#home, { recursive: true, force: true });
  }

  async #stop(signal: NodeJS.Signals): Promise<void> {
    const child = this.#child;
    this.#child = null;
    if (child === null || child.exitCode !== null) return;
    const gone = once(child, 'exit');
    child.kill(signal);
    await gone;
  }
}
