import { randomUUID } from 'node:crypto';
import { createWriteStream } from 'node:fs';
import { mkdir, rm } from 'node:fs/promises';
import type { IncomingMessage } from 'node:http';
import { extname, join } from 'node:path';
import { Transform } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { FileHandle, Reply } from '../../shared-core/desk.ts';
import type { DeskHost } from '../desk/desk-host.ts';
import { isAlive } from '../desk/live-process.ts';
import { answered, refused } from '../desk/reply.ts';
import { namesIn } from '../project-file/atomic-write.ts';
import { codeOf, diskTrouble } from '../project-file/disk-trouble.ts';
import { shownFileName } from '../project-file/file-name.ts';

/** Largest file taken in, in bytes: room for far more than ten million people. */
export const MAX_UPLOAD_BYTES = 8 * 1024 ** 3;

/**
 * Copies of the files that the page handed over, in a private folder that ends with the program. One folder a running
 * program; those of programs that no longer run are removed at the start.
 */
export class Uploads {
  readonly #all: string;
  readonly #mine: string;
  readonly #limit: number;

  constructor(dataFolder: string, limit = MAX_UPLOAD_BYTES) {
    this.#all = join(dataFolder, 'uploads');
    this.#mine = join(this.#all, `${process.pid}-${randomUUID()}`);
    this.#limit = limit;
  }

  async sweep(): Promise<void> {
    for (const name of await namesIn(this.#all)) {
      if (!isAlive(Number(name.split('-')[0]))) await rm(join(this.#all, name), { recursive: true, force: true });
    }
  }

  /** Takes a file in as it comes, without holding it in memory, and answers with its handle. */
  async take(request: IncomingMessage, givenName: string, desk: DeskHost): Promise<Reply<{ handle: FileHandle }>> {
    const name = shownFileName(givenName, 'cohort.csv');
    const ending = /^\.[a-z0-9]{1,10}$/i.exec(extname(name))?.[0] ?? '';
    const path = join(this.#mine, `${randomUUID()}${ending.toLowerCase()}`);
    try {
      await mkdir(this.#mine, { recursive: true, mode: 0o700 });
      await pipeline(request, atMost(this.#limit), createWriteStream(path, { mode: 0o600, flags: 'wx' }));
    } catch (error) {
      await rm(path, { force: true });
      if (error instanceof TooLarge) return refused(`${name} is too large to take in. Count it in a database first.`);
      if (codeOf(error) === 'ERR_STREAM_PREMATURE_CLOSE')
        return refused(`${name} did not arrive whole. Drop it again.`);
      return refused(diskTrouble(name, 'taken in', error));
    }
    return answered({ handle: desk.giveHandle(path, { name, standing: 'copy' }) });
  }

  async close(): Promise<void> {
    await rm(this.#mine, { recursive: true, force: true });
  }
}

class TooLarge extends Error {}

function atMost(limit: number): Transform {
  let bytes = 0;
  return new Transform({
    transform(chunk: Buffer, _encoding, done) {
      bytes += chunk.length;
      if (bytes > limit) done(new TooLarge());
      else done(null, chunk);
    },
  });
}
