import { randomUUID } from 'node:crypto';
import { mkdir, readFile, rename, rm, stat } from 'node:fs/promises';
import { basename, join } from 'node:path';
import * as v from 'valibot';
import type { Pressed, PressedFile, Reply } from '../../shared-core/desk.ts';
import { namesIn, replaceFile } from '../project-file/atomic-write.ts';
import { fingerprintAt } from '../project-file/stored-text.ts';
import { harmedBy, releasedIn, type ReleasedThere } from '../press/released-editions.ts';
import { isAlive } from './live-process.ts';
import { answered, refused } from './reply.ts';

/** What a folder of pressed files is for: two projects of the same name never share one. */
export interface PressedFor {
  /** Name of the folder, cleaned. */
  readonly name: string;
  readonly title: string;
  readonly subtitle: string;
  /** As it is told to the user. */
  readonly edition: string;
}

const ledgerSchema = v.object({
  format: v.literal('normloom-pressed'),
  version: v.literal(1),
  folders: v.array(
    v.object({
      folder: v.string(),
      title: v.string(),
      subtitle: v.string(),
      files: v.array(v.object({ file: v.string(), sha256: v.string() })),
    }),
  ),
});
type Entry = v.InferOutput<typeof ledgerSchema>['folders'][number];

const STAGING = '.normloom-press-';
const MOST = 500;

/**
 * Where pressed files go. A press writes into a hidden folder first, so that a press that fails or is stopped leaves
 * nothing; then its files take their place. A list in the program's folder tells which files a press wrote and what
 * they held: only those, unchanged, are ever replaced. Anything else makes the press take a new folder.
 */
export class PressFolders {
  readonly #projectsFolder: string;
  readonly #dataFolder: string;

  constructor(projectsFolder: string, dataFolder: string) {
    this.#projectsFolder = projectsFolder;
    this.#dataFolder = dataFolder;
  }

  /** Makes an empty hidden folder to press into. */
  async stage(): Promise<string> {
    const folder = join(this.#projectsFolder, `${STAGING}${process.pid}-${randomUUID()}`);
    await mkdir(folder, { recursive: true });
    return folder;
  }

  /**
   * Puts freshly pressed files where they belong, and says where that is. The hidden folder is gone afterwards. A folder
   * with a released edition takes only that edition's own files: a proof goes elsewhere, and another release under the
   * number of a released edition is refused.
   */
  async settle(
    staged: string,
    { files, editionFile }: Pick<Pressed, 'files' | 'editionFile'>,
    pressedFor: PressedFor,
  ): Promise<Reply<string>> {
    for (let number = 1; ; number += 1) {
      const folder = join(this.#projectsFolder, number === 1 ? pressedFor.name : `${pressedFor.name} (${number})`);
      const released = await releasedIn(folder);
      if (harmedBy(released, files) !== null) {
        const taken = released.find((there) => there.file === editionFile && isOf(there, pressedFor));
        if (taken !== undefined) return refused(numberTaken(basename(folder), pressedFor.edition));
        continue;
      }
      const earlier = await this.#earlierPress(folder, files, pressedFor, released.length > 0);
      if (earlier === null) continue;
      const { title, subtitle } = pressedFor;
      const fresh = files.map(({ file, sha256 }) => ({ file, sha256 }));
      await this.#record({ folder, title, subtitle, files: [...earlier, ...fresh] });
      await mkdir(folder, { recursive: true });
      for (const { file } of files) await rename(join(staged, file), join(folder, file));
      await this.discard(staged);
      const old = earlier.filter(({ file }) => !fresh.some((one) => one.file === file));
      if (released.length === 0) await removeUnchanged(folder, old);
      await this.#record({ folder, title, subtitle, files: released.length === 0 ? fresh : [...old, ...fresh] });
      return answered(folder);
    }
  }

  async discard(staged: string): Promise<void> {
    await rm(staged, { recursive: true, force: true });
  }

  /** Removes what presses of killed programs left behind. */
  async sweep(): Promise<void> {
    for (const name of await namesIn(this.#projectsFolder)) {
      const owner = name.startsWith(STAGING) ? Number(name.slice(STAGING.length).split('-')[0]) : null;
      if (owner !== null && !isAlive(owner)) await this.discard(join(this.#projectsFolder, name));
    }
  }

  /**
   * The files an earlier press wrote into this folder; null when the folder may not be used for these files. Where the
   * edition was released, they are its own and no list is needed: what lies there must be the same.
   */
  async #earlierPress(
    folder: string,
    files: readonly PressedFile[],
    { title, subtitle }: PressedFor,
    released: boolean,
  ): Promise<Entry['files'] | null> {
    const found = await stat(folder).catch(() => null);
    if (found === null) return [];
    const entry = (await this.#entries()).find((each) => each.folder === folder);
    const known = entry?.title === title && entry.subtitle === subtitle ? entry.files : null;
    if (!found.isDirectory() || (known === null && !released)) return null;
    const replaceable = released ? files : (known ?? []);
    for (const { file } of files) {
      const held = await fingerprintAt(join(folder, file));
      const ours = replaceable.some((each) => each.file === file && each.sha256 === held);
      if (held !== null && !ours) return null;
    }
    return known ?? [];
  }

  async #record(entry: Entry): Promise<void> {
    const others = (await this.#entries()).filter((each) => each.folder !== entry.folder);
    const ledger = { format: 'normloom-pressed', version: 1, folders: [entry, ...others].slice(0, MOST) };
    await mkdir(this.#dataFolder, { recursive: true, mode: 0o700 });
    await replaceFile(this.#ledger(), `${JSON.stringify(ledger, null, 1)}\n`);
  }

  async #entries(): Promise<readonly Entry[]> {
    const text = await readFile(this.#ledger(), 'utf8').catch(() => 'null');
    let value: unknown;
    try {
      value = JSON.parse(text);
    } catch {
      return [];
    }
    const ledger = v.safeParse(ledgerSchema, value);
    return ledger.success ? ledger.output.folders : [];
  }

  #ledger(): string {
    return join(this.#dataFolder, 'pressed.json');
  }
}

/** Takes away what an earlier press left that this one does not make; what the user changed since stays. */
async function removeUnchanged(folder: string, files: Entry['files']): Promise<void> {
  for (const { file, sha256 } of files) {
    const path = join(folder, file);
    if ((await fingerprintAt(path)) === sha256) await rm(path, { force: true });
  }
}

function isOf({ edition }: ReleasedThere, { title, subtitle }: PressedFor): boolean {
  return edition !== null && edition.project.title === title && edition.project.subtitle === subtitle;
}

function numberTaken(folder: string, edition: string): string {
  return (
    `Edition ${edition} was released before, with other contents; it lies in “${folder}” and was left as it is. ` +
    'Raise the number of this edition, and release it again.'
  );
}
