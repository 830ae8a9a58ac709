import { mkdir, readFile, stat } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import * as v from 'valibot';
import { removeLeftovers, replaceFile } from './atomic-write.ts';

export interface RecentProject {
  readonly path: string;
  readonly title: string;
  /** Milliseconds since 1970. */
  readonly changedAt: number;
}

const MOST = 12;
const FILE = 'recent-projects.json';

const recentsSchema = v.object({
  format: v.literal('normloom-recent-projects'),
  version: v.literal(1),
  projects: v.array(v.object({ path: v.string(), title: v.string() })),
});
type Entry = v.InferOutput<typeof recentsSchema>['projects'][number];

/**
 * The projects opened or saved last. A file that is not there now (a memory stick, a network folder) keeps its place in
 * the list but is not shown. A damaged list counts as an empty one: it holds nothing that cannot be opened again.
 */
export class Recents {
  readonly #path: string;
  #last: Promise<unknown> = Promise.resolve();

  constructor(dataFolder: string) {
    this.#path = join(dataFolder, FILE);
  }

  /** Puts a project at the head of the list. */
  add(path: string, title: string): Promise<void> {
    const write = async (): Promise<void> => {
      const others = (await this.#read()).filter((entry) => entry.path !== path);
      const projects = [{ path, title }, ...others].slice(0, MOST);
      await mkdir(dirname(this.#path), { recursive: true, mode: 0o700 });
      const list = { format: 'normloom-recent-projects', version: 1, projects };
      await replaceFile(this.#path, `${JSON.stringify(list, null, 1)}\n`);
    };
    const mine = this.#last.then(write, write);
    this.#last = mine;
    return mine;
  }

  /** The projects that are there, last used first. */
  async list(): Promise<readonly RecentProject[]> {
    const found: RecentProject[] = [];
    for (const { path, title } of await this.#read()) {
      const file = await stat(path).catch(() => null);
      if (file?.isFile() === true) found.push({ path, title, changedAt: Math.round(file.mtimeMs) });
    }
    return found;
  }

  /** Removes what killed writes of the list left behind, when older than ten seconds. */
  async sweep(now: number): Promise<void> {
    await removeLeftovers(dirname(this.#path), ({ file, writtenAt }) => file === FILE && now - writtenAt > 10_000);
  }

  async #read(): Promise<readonly Entry[]> {
    const text = await readFile(this.#path, 'utf8').catch(() => '');
    let value: unknown;
    try {
      value = JSON.parse(text);
    } catch {
      return [];
    }
    const list = v.safeParse(recentsSchema, value);
    return list.success ? list.output.projects : [];
  }
}
