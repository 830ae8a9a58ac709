import { mkdir, readFile, rename, rm } from 'node:fs/promises';
import { join } from 'node:path';
import * as v from 'valibot';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import { projectFromText, projectToText } from '../../shared-core/norms/project-text.ts';
import { namesIn, removeLeftovers, replaceFile } from './atomic-write.ts';
import { readProject } from './project-store.ts';

/** Unsaved work: the project and the file it belongs to, in one small file, so that no kill can part the two. */
export interface Draft {
  readonly draft: string;
  /** File the project is saved to, and the fingerprint of that file when it was last read or written here. */
  readonly file: { readonly path: string; readonly fingerprint: string } | null;
  /** Milliseconds since 1970. */
  readonly at: number;
  readonly project: NormProject;
}

export type DraftRead =
  | { readonly ok: true; readonly draft: Draft }
  | { readonly ok: false; readonly damaged: boolean; readonly problem: string };

export interface DraftsFound {
  /** Drafts that hold something their file does not, newest first. */
  readonly drafts: readonly Draft[];
  /** Sentences about drafts that cannot be read. */
  readonly problems: readonly string[];
}

/** Names a page may give to a draft: small letters, digits and hyphens, so that the name is a safe file name. */
export const draftNameSchema = v.pipe(v.string(), v.regex(/^[a-z0-9][a-z0-9-]{7,63}$/));

const DRAFT_VERSION = 1;
const EXTENSION = '.draft';
/** A neighbour younger than this may belong to another window that is writing now. In milliseconds. */
const STILL_BEING_WRITTEN = 10_000;

const draftSchema = v.object({
  format: v.literal('normloom-draft'),
  version: v.number(),
  file: v.nullable(v.object({ path: v.string(), fingerprint: v.string() })),
  at: v.number(),
  /** The text of a project file. */
  project: v.string(),
});

export class Drafts {
  readonly #folder: string;
  readonly #asideFolder: string;
  readonly #putAside: string[] = [];
  /** The last thing asked of each draft, so that a late autosave never overtakes what follows it. */
  readonly #last = new Map<string, Promise<unknown>>();

  constructor(dataFolder: string) {
    this.#folder = join(dataFolder, 'drafts');
    this.#asideFolder = join(dataFolder, 'drafts-put-aside');
  }

  /** Keeps the draft in place of an earlier one of that name; safe against a kill once it has resolved. */
  async keep(draft: Draft): Promise<void> {
    const envelope: v.InferOutput<typeof draftSchema> = {
      format: 'normloom-draft',
      version: DRAFT_VERSION,
      file: draft.file,
      at: draft.at,
      project: projectToText(draft.project),
    };
    await this.#inTurn(draft.draft, async () => {
      await mkdir(this.#folder, { recursive: true, mode: 0o700 });
      await replaceFile(this.#pathOf(draft.draft), `${JSON.stringify(envelope)}\n`);
    });
  }

  async forget(draft: string): Promise<void> {
    await this.#inTurn(draft, () => rm(this.#pathOf(draft), { force: true }));
  }

  /** Forgets the draft once its project was saved as this text; a later draft, kept while it was saved, stays. */
  async forgetSaved(draft: string, text: string): Promise<void> {
    await this.#inTurn(draft, async () => {
      const kept = await readFile(this.#pathOf(draft), 'utf8').catch(() => '');
      const read = draftFromText(draft, kept);
      if (read.ok && projectToText(read.draft.project) === text) await rm(this.#pathOf(draft), { force: true });
    });
  }

  /** The draft of that name, or a sentence. */
  async read(draft: string): Promise<DraftRead> {
    return this.#inTurn(draft, async () => {
      const text = await readFile(this.#pathOf(draft), 'utf8').catch(() => null);
      return text === null
        ? { ok: false, damaged: false, problem: 'This draft is no longer there. Go back to the start page.' }
        : draftFromText(draft, text);
    });
  }

  /**
   * All drafts that can be recovered. A draft that says the same as its file is forgotten; a damaged one is put aside,
   * where nothing is lost and the start page can open; one of a newer program is left where it is.
   */
  async list(): Promise<DraftsFound> {
    const drafts: Draft[] = [];
    const problems: string[] = [];
    for (const name of await namesIn(this.#folder)) {
      const draft = name.endsWith(EXTENSION) ? name.slice(0, -EXTENSION.length) : '';
      if (!v.is(draftNameSchema, draft)) continue;
      const read = await this.read(draft);
      if (!read.ok && read.damaged) await this.#putAsideDamaged(draft, read.problem);
      else if (!read.ok) problems.push(read.problem);
      else if (await saysTheSameAsItsFile(read.draft)) await this.forget(draft);
      else drafts.push(read.draft);
    }
    drafts.sort((left, right) => right.at - left.at);
    return { drafts, problems: [...this.#putAside, ...problems] };
  }

  /** Removes what killed writes left in the folder of drafts. */
  async sweep(now: number): Promise<void> {
    await removeLeftovers(
      this.#folder,
      ({ file, writtenAt }) => file.endsWith(EXTENSION) && now - writtenAt > STILL_BEING_WRITTEN,
    );
  }

  /** Puts a damaged draft aside and remembers to say so until the program ends. */
  async #putAsideDamaged(draft: string, problem: string): Promise<void> {
    const aside = join(this.#asideFolder, `${draft}${EXTENSION}`);
    await mkdir(this.#asideFolder, { recursive: true, mode: 0o700 });
    await rename(this.#pathOf(draft), aside);
    this.#putAside.push(`${problem} It was put aside as ${aside}.`);
  }

  #pathOf(draft: string): string {
    if (!v.is(draftNameSchema, draft)) throw new RangeError('a draft name holds small letters, digits and hyphens');
    return join(this.#folder, `${draft}${EXTENSION}`);
  }

  #inTurn<T>(draft: string, work: () => Promise<T>): Promise<T> {
    const before = this.#last.get(draft) ?? Promise.resolve();
    const mine = before.then(work, work);
    this.#last.set(draft, mine);
    const clear = (): void => {
      if (this.#last.get(draft) === mine) this.#last.delete(draft);
    };
    mine.then(clear, clear);
    return mine;
  }
}

function draftFromText(draft: string, text: string): DraftRead {
  const envelope = v.safeParse(draftSchema, parsedOrNull(text));
  if (!envelope.success) {
    return { ok: false, damaged: true, problem: 'A draft of unsaved work is damaged and cannot be read.' };
  }
  const { version, file, at, project } = envelope.output;
  if (version > DRAFT_VERSION) {
    return { ok: false, damaged: false, problem: 'A draft was kept by a newer Normloom. Open it with that program.' };
  }
  const read = projectFromText(project);
  return read.ok
    ? { ok: true, draft: { draft, file, at, project: read.project } }
    : { ok: false, damaged: false, problem: `A draft of unsaved work cannot be read. ${read.problem}` };
}

function parsedOrNull(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}

async function saysTheSameAsItsFile({ file, project }: Draft): Promise<boolean> {
  if (file === null) return false;
  const saved = await readProject(file.path);
  return saved.ok && projectToText(saved.project) === projectToText(project);
}
