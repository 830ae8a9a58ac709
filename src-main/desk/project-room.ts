import { randomUUID } from 'node:crypto';
import { stat } from 'node:fs/promises';
import { basename, dirname, join } from 'node:path';
import type { DeskRequests, EarlierEdition, FileHandle, OpenedProject, Reply } from '../../shared-core/desk.ts';
import { EDITION_ENDING } from '../../shared-core/norms/file-endings.ts';
import { nextEdition } from '../../shared-core/norms/next-edition.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import { diskTrouble } from '../project-file/disk-trouble.ts';
import type { Drafts } from '../project-file/drafts.ts';
import { projectText, readProject, type StoredProject } from '../project-file/project-store.ts';
import type { Recents } from '../project-file/recents.ts';
import { UNKNOWN_FILE, type KnownFile } from './file-handles.ts';
import { writeAgain, writeNew, type WritingParts } from './file-writing.ts';
import { answered, refused } from './reply.ts';

export interface ProjectRoomParts extends WritingParts {
  readonly drafts: Drafts;
  readonly recents: Recents;
  /** The project of the sample cohort. */
  readonly sample: string;
  /** Milliseconds since 1970. */
  readonly now: () => number;
}

type StoredRead = Extract<StoredProject, { readonly ok: true }>;
type Saved = DeskRequests['save-project']['answer'];

/** Opens, keeps and saves projects. */
export class ProjectRoom {
  readonly #parts: ProjectRoomParts;

  constructor(parts: ProjectRoomParts) {
    this.#parts = parts;
  }

  async list(): Promise<DeskRequests['list-projects']['answer']> {
    const { handles, drafts, recents } = this.#parts;
    const recent = await recents.list();
    const found = await drafts.list();
    return {
      recent: recent.map(({ path, title, changedAt }) => ({
        handle: handles.giveForList(path),
        file: basename(path),
        title,
        changedAt,
      })),
      drafts: found.drafts.map(({ draft, file, at, project }) => ({
        draft,
        file: file === null ? '' : basename(file.path),
        title: project.title,
        changedAt: at,
      })),
      problems: found.problems,
    };
  }

  async open(handle: FileHandle): Promise<Reply<OpenedProject>> {
    const file = this.#parts.handles.find(handle);
    return file === null ? refused(UNKNOWN_FILE) : this.#openFile(file);
  }

  /** What another project is compared with; nothing else is done with it. */
  async lookAtEdition(handle: FileHandle): Promise<Reply<EarlierEdition>> {
    const file = this.#parts.handles.find(handle);
    if (file === null) return refused(UNKNOWN_FILE);
    const read = await readProject(file.path);
    return read.ok ? answered(earlierEdition(file.name, read)) : read;
  }

  async openSample(): Promise<Reply<OpenedProject>> {
    const { sample } = this.#parts;
    const opened = await this.#openFile({ path: sample, name: basename(sample), standing: 'copy', fingerprint: null });
    return opened.ok ? { ok: true, value: { ...opened.value, file: null } } : opened;
  }

  async openDraft(name: string): Promise<Reply<OpenedProject>> {
    const read = await this.#parts.drafts.read(name);
    if (!read.ok) return refused(read.problem);
    const { draft, project, file } = read.draft;
    const path = file !== null && (await isFile(file.path)) ? file.path : null;
    const handle = path === null ? null : this.#parts.handles.give(path, { fingerprint: file?.fingerprint ?? null });
    const cohort = path === null ? null : await this.#cohortBeside(path, project);
    return {
      ok: true,
      value: { draft, project, handle, file: path === null ? null : basename(path), cohort, earlier: null },
    };
  }

  async keepDraft({ draft, handle, project }: DeskRequests['keep-draft']['ask']): Promise<Reply<{ at: number }>> {
    const text = projectText(project);
    if (!text.ok) return text;
    const file = handle === null ? null : this.#parts.handles.find(handle);
    if (handle !== null && file === null) return refused(UNKNOWN_FILE);
    const at = this.#parts.now();
    try {
      await this.#parts.drafts.keep({ draft, file: draftFile(file), at, project });
    } catch (error) {
      return refused(diskTrouble('The draft of your work', 'kept', error));
    }
    return answered({ at });
  }

  /**
   * Saves and forgets the draft. The draft is brought up to date first: a kill between the two leaves a draft that says
   * the same as the file, which the next list drops.
   */
  async save(ask: DeskRequests['save-project']['ask']): Promise<Reply<Saved>> {
    const text = projectText(ask.project);
    if (!text.ok) return text;
    const known = ask.handle === null ? null : this.#parts.handles.find(ask.handle);
    if (ask.handle !== null && known === null) return refused(UNKNOWN_FILE);
    const own = known?.standing === 'own' && !known.path.toLowerCase().endsWith(EDITION_ENDING) ? known : null;
    const kept = await this.keepDraft({
      draft: ask.draft,
      handle: own === null ? null : ask.handle,
      project: ask.project,
    });
    const saved =
      own === null || ask.handle === null
        ? await writeNew(this.#parts, 'project', ask.name, text.text)
        : await writeAgain(this.#parts, 'project', ask.handle, own, text.text);
    if (!saved.ok || saved.value === null) return saved.ok ? answered(null) : saved;
    const { handle, path, remark } = saved.value;
    // The project is safe by now. A list that cannot be written must not make it look unsaved.
    await this.#parts.recents.add(path, ask.project.title).catch(() => undefined);
    if (kept.ok) await this.#parts.drafts.forgetSaved(ask.draft, text.text).catch(() => undefined);
    return answered({ handle, file: basename(path), at: this.#parts.now(), remark });
  }

  async #openFile(file: KnownFile): Promise<Reply<OpenedProject>> {
    const read = await readProject(file.path);
    if (!read.ok) return read;
    const { fingerprint, edition } = read;
    const project = edition === null ? read.project : nextEdition(edition);
    const own = file.standing === 'own' && edition === null;
    // Being on the list of recent projects is a convenience; a list that cannot be written stops no one from working.
    if (own) await this.#parts.recents.add(file.path, project.title).catch(() => undefined);
    return {
      ok: true,
      value: {
        draft: randomUUID(),
        project,
        handle: own ? this.#parts.handles.give(file.path, { fingerprint }) : null,
        file: edition === null ? file.name : null,
        cohort: await this.#cohortBeside(file.path, project),
        earlier: edition === null ? null : earlierEdition(file.name, read),
      },
    };
  }

  /** The cohort file, when one of that name and size lies beside the project. */
  async #cohortBeside(path: string, { source }: NormProject): Promise<FileHandle | null> {
    if (source === null || source.kind === 'typed' || source.file !== basename(source.file)) return null;
    if (source.file === '' || source.file === '.' || source.file === '..' || source.file.includes('\\')) return null;
    const cohort = join(dirname(path), source.file);
    const found = await stat(cohort).catch(() => null);
    return found?.isFile() === true && found.size === source.bytes ? this.#parts.handles.give(cohort) : null;
  }
}

function earlierEdition(file: string, { project, edition }: StoredRead): EarlierEdition {
  if (edition === null) return { file, project, released: null };
  const { check, analyst, checker } = edition;
  return { file, project, released: { check, analyst, checker } };
}

function draftFile(file: KnownFile | null): { readonly path: string; readonly fingerprint: string } | null {
  return file === null || file.standing === 'copy' || file.fingerprint === null
    ? null
    : { path: file.path, fingerprint: file.fingerprint };
}

async function isFile(path: string): Promise<boolean> {
  return (await stat(path).catch(() => null))?.isFile() === true;
}
