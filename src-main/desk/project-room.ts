import { randomUUID } from 'node:crypto';
import { stat } from 'node:fs/promises';
import { basename, dirname, extname, join } from 'node:path';
import type { DeskRequests, FileHandle, OpenedProject, Reply } from '../../shared-core/desk.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import type { Dialogs } from '../dialogs.ts';
import { diskTrouble } from '../project-file/disk-trouble.ts';
import type { Drafts } from '../project-file/drafts.ts';
import { cleanFileName } from '../project-file/file-name.ts';
import type { ProjectSaver } from '../project-file/project-saver.ts';
import {
  fingerprintAt,
  fingerprintOf,
  PROJECT_EXTENSION,
  projectText,
  readProject,
} from '../project-file/project-store.ts';
import type { Recents } from '../project-file/recents.ts';
import { UNKNOWN_FILE, type FileHandles, type KnownFile } from './file-handles.ts';
import { answered, refused } from './reply.ts';

export interface ProjectRoomParts {
  readonly handles: FileHandles;
  readonly drafts: Drafts;
  readonly recents: Recents;
  readonly saver: ProjectSaver;
  readonly dialogs: Dialogs | null;
  readonly projectsFolder: string;
  /** The project of the sample cohort. */
  readonly sample: string;
  /** Milliseconds since 1970. */
  readonly now: () => number;
}

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
      value: { draft, project, handle, file: path === null ? null : basename(path), cohort },
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
    const own = known?.standing === 'own' ? known : null;
    const kept = await this.keepDraft({
      draft: ask.draft,
      handle: own === null ? null : ask.handle,
      project: ask.project,
    });
    const saved =
      own === null || ask.handle === null
        ? await this.#saveNew(ask.name, text.text)
        : await this.#saveAgain(ask.handle, own, text.text);
    if (!saved.ok || saved.value === null) return saved.ok ? { ok: true, value: null } : saved;
    const { handle, path } = saved.value;
    this.#parts.handles.noteFingerprint(handle, fingerprintOf(text.text));
    // The project is safe by now. A list that cannot be written must not make it look unsaved.
    await this.#parts.recents.add(path, ask.project.title).catch(() => undefined);
    if (kept.ok) await this.#parts.drafts.forget(ask.draft).catch(() => undefined);
    return answered({ handle, file: basename(path), at: this.#parts.now() });
  }

  async #saveAgain(
    handle: FileHandle,
    file: KnownFile,
    text: string,
  ): Promise<Reply<{ readonly handle: FileHandle; readonly path: string }>> {
    try {
      const there = await fingerprintAt(file.path);
      if (there !== null && there !== file.fingerprint && there !== fingerprintOf(text)) {
        return refused(
          `${file.name} was changed by another program since it was opened here, and was not overwritten. Save the project as a new file, or open the file again.`,
        );
      }
      await this.#parts.saver.replace(file.path, text);
    } catch (error) {
      return refused(diskTrouble(file.name, 'saved', error));
    }
    return answered({ handle, path: file.path });
  }

  async #saveNew(
    name: string,
    text: string,
  ): Promise<Reply<{ readonly handle: FileHandle; readonly path: string } | null>> {
    const { dialogs, projectsFolder, saver, handles } = this.#parts;
    const ending = name.toLowerCase().endsWith(PROJECT_EXTENSION) ? PROJECT_EXTENSION.length : 0;
    const clean = cleanFileName(name.slice(0, name.length - ending), 'Norm project');
    try {
      if (dialogs === null) {
        const path = await saver.createBeside(projectsFolder, clean, PROJECT_EXTENSION, text);
        return answered({ handle: handles.give(path), path });
      }
      const chosen = await dialogs.chooseSave(join(projectsFolder, `${clean}${PROJECT_EXTENSION}`));
      if (chosen === null) return answered(null);
      let path = chosen;
      if (extname(chosen).toLowerCase() === PROJECT_EXTENSION) await saver.replace(chosen, text);
      // The dialog asked about another name than this one, so nothing of this name may be replaced.
      else path = await saver.createBeside(dirname(chosen), basename(chosen), PROJECT_EXTENSION, text);
      return answered({ handle: handles.give(path), path });
    } catch (error) {
      return refused(diskTrouble('The project', 'saved', error));
    }
  }

  async #openFile(file: KnownFile): Promise<Reply<OpenedProject>> {
    const read = await readProject(file.path);
    if (!read.ok) return read;
    const { project, fingerprint } = read;
    const own = file.standing === 'own';
    // Being on the list of recent projects is a convenience; a list that cannot be written stops no one from working.
    if (own) await this.#parts.recents.add(file.path, project.title).catch(() => undefined);
    return {
      ok: true,
      value: {
        draft: randomUUID(),
        project,
        handle: own ? this.#parts.handles.give(file.path, { fingerprint }) : null,
        file: file.name,
        cohort: await this.#cohortBeside(file.path, project),
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

function draftFile(file: KnownFile | null): { readonly path: string; readonly fingerprint: string } | null {
  return file === null || file.standing === 'copy' || file.fingerprint === null
    ? null
    : { path: file.path, fingerprint: file.fingerprint };
}

async function isFile(path: string): Promise<boolean> {
  return (await stat(path).catch(() => null))?.isFile() === true;
}
