import { randomUUID } from 'node:crypto';
import { mkdir, readFile, rm, writeFile } from 'node:fs/promises';
import { basename, dirname, isAbsolute, join } from 'node:path';
import { createFile, namesIn, removeLeftovers, replaceFile } from './atomic-write.ts';

/** A leftover may carry a slightly older time than the note about it, on disks with coarse clocks. In milliseconds. */
const CLOCK_SLACK = 3000;

/**
 * Writes project files into the user's own folders. Before each write a note goes into the program's folder; a note
 * that is still there at the next start tells that a kill came between, and where a half-written neighbour may lie.
 * Only there, and only what is not older than the note, is anything removed: a file of the user's is never taken for one.
 */
export class ProjectSaver {
  readonly #notes: string;
  readonly #now: () => number;

  constructor(dataFolder: string, now: () => number) {
    this.#notes = join(dataFolder, 'unfinished');
    this.#now = now;
  }

  /** Replaces the file at the path, or makes it. */
  async replace(path: string, text: string): Promise<void> {
    await this.#noted(path, () => replaceFile(path, text));
  }

  /** Makes a new file at the path; false when the name is taken. */
  async create(path: string, text: string): Promise<boolean> {
    return this.#noted(path, () => createFile(path, text));
  }

  /** Makes `<name><extension>` in the folder, or `<name> (2)<extension>` and so on; the folder too. Returns the path. */
  async createBeside(folder: string, name: string, extension: string, text: string): Promise<string> {
    await mkdir(folder, { recursive: true });
    for (let number = 1; ; number += 1) {
      const path = join(folder, `${name}${number === 1 ? '' : ` (${number})`}${extension}`);
      if (await this.create(path, text)) return path;
    }
  }

  /** Removes what the writes of an earlier, killed run left behind. */
  async sweep(): Promise<void> {
    for (const name of await namesIn(this.#notes)) {
      const note = join(this.#notes, name);
      const [at, path] = (await readFile(note, 'utf8').catch(() => '')).split('\n');
      if (path !== undefined && isAbsolute(path)) {
        const oldest = Number(at) - CLOCK_SLACK;
        await removeLeftovers(dirname(path), ({ file, writtenAt }) => file === basename(path) && writtenAt >= oldest);
      }
      await rm(note, { force: true });
    }
  }

  async #noted<T>(path: string, write: () => Promise<T>): Promise<T> {
    const note = join(this.#notes, randomUUID());
    await mkdir(this.#notes, { recursive: true, mode: 0o700 });
    await writeFile(note, `${this.#now()}\n${path}`, { mode: 0o600 });
    try {
      return await write();
    } finally {
      await rm(note, { force: true });
    }
  }
}
