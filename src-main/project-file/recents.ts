import { mkdir, readFile, stat } from 'node:fs/promises';
import { basename, dirname, join } from 'node:path';
import * as v from 'valibot';
import { removeLeftovers, replaceFile } from './atomic-write.ts';

/** A file of one kind that was opened or saved here. */
export interface RecentFile {
  readonly path: string;
  readonly title: string;
  /** Milliseconds since 1970. */
  readonly changedAt: number;
}

const MOST = 12;
const entriesSchema = v.array(v.object({ path: v.string(), title: v.string() }));
type Entry = v.InferOutput<typeof entriesSchema>[number];

/**
 * The projects, or the classes, opened or saved last. A file that is not there now (a memory stick, a network folder) keeps its place in
 * the list but is not shown. A damaged list counts as an empty one: it holds nothing that cannot be opened again.
 */
export class Recents {
  readonly #what: 'projects' | 'classes';
  readonly #path: string;
  #last: Promise<unknown> = Promise.resolve();

  constructor(dataFolder: string, what: 'projects' | 'classes') {
    this.#what = what;
    this.#path = join(dataFolder, `recent-${what}.json`);
  }

  /** Puts a file at the head of the list. The title is kept with it, and is better left empty where it may name people. */
  add(path: string, title: string): Promise<void> {
    const write = async (): Promise<void> => {
      const others = (await this.#read()).filter((entry) => entry.path !== path);
      const files = [{ path, title }, ...others].slice(0, MOST);
      await mkdir(dirname(this.#path), { recursive: true, mode: 0o700 });
      const list = { format: this.#format, version: 1, [this.#what]: files };
      await replaceFile(this.#path, `${JSON.stringify(list, null, 1)}\n`);
    };
    const mine = this.#last.then(write, write);
    this.#last = mine;
    return mine;
  }

  /** The files that are there, last used first. */
  async list(): Promise<readonly RecentFile[]> {
    const found: RecentFile[] = [];
    for (const { path, title } of await this.#read()) {
      const file = await stat(path).catch(() => null);
      if (file?.isFile() === true) found.push({ path, title, changedAt: Math.round(file.mtimeMs) });
    }
    return found;
  }

  /** Removes what killed writes of the list left behind, when older than ten seconds. */
  async sweep(now: number): Promise<void> {
    await removeLeftovers(
      dirname(this.#path),
      ({ file, writtenAt }) => file === basename(this.#path) && now - writtenAt > 10_000,
    );
  }

  async #read(): Promise<readonly Entry[]> {
    const text = await readFile(this.#path, 'utf8').catch(() => '');
    let value: unknown;
    try {
      value = JSON.parse(text);
    } catch {
      return [];
    }
    const schema = v.object({
      format: v.literal(this.#format),
      version: v.literal(1),
      [this.#what]: entriesSchema,
    });
    const list = v.safeParse(schema, value);
    return list.success ? v.parse(entriesSchema, list.output[this.#what]) : [];
  }

  get #format(): string {
    return `normloom-recent-${this.#what}`;
  }
}
