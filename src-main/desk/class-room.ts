import { basename } from 'node:path';
import type { ClassTable } from '../../shared-core/class/class-table.ts';
import type {
  DeskRequests,
  FileHandle,
  ListedFile,
  OpenedClass,
  ProjectListing,
  Reply,
} from '../../shared-core/desk.ts';
import { classText, readClass } from '../project-file/class-store.ts';
import { readProject } from '../project-file/project-store.ts';
import type { Recents } from '../project-file/recents.ts';
import type { DeskWork } from './desk-work.ts';
import { UNKNOWN_FILE } from './file-handles.ts';
import { writeAgain, writeNew, type WritingParts } from './file-writing.ts';
import { answered, refused } from './reply.ts';

export interface ClassRoomParts extends WritingParts {
  readonly recents: Recents;
  readonly work: Pick<DeskWork, 'lookAtList' | 'classTable'>;
  /** The project of the sample cohort. */
  readonly sample: string;
  /** Milliseconds since 1970. */
  readonly now: () => number;
}

type Saved = DeskRequests['save-class']['answer'];

/**
 * Opens and saves classes. They hold names, so that nothing of them is kept anywhere but in their own files: there are no
 * drafts, and the list of recent ones knows nothing but where they lie.
 */
export class ClassRoom {
  readonly #parts: ClassRoomParts;

  constructor(parts: ClassRoomParts) {
    this.#parts = parts;
  }

  /** Titles are read from the files each time; a file that cannot be read stands there without one. */
  async list(): Promise<readonly ProjectListing[]> {
    const recent = await this.#parts.recents.list();
    return Promise.all(
      recent.map(async ({ path, changedAt }) => {
        const read = await readClass(path);
        return {
          handle: this.#parts.handles.giveForList(path),
          file: basename(path),
          title: read.ok ? read.value.class.title : '',
          changedAt,
        };
      }),
    );
  }

  async open(handle: FileHandle): Promise<Reply<OpenedClass>> {
    const { handles } = this.#parts;
    const file = handles.find(handle);
    if (file === null) return refused(UNKNOWN_FILE);
    const read = await readClass(file.path);
    if (!read.ok) return read;
    const { class: opened, fingerprint } = read.value;
    if (file.standing === 'own') await this.#remember(file.path);
    // A handle of its own, so that what is saved to it is held against this reading of the file.
    const given = handles.give(file.path, { name: file.name, standing: file.standing, fingerprint });
    return answered({ class: opened, handle: given, file: file.name });
  }

  async save({ handle, name, class: saved }: DeskRequests['save-class']['ask']): Promise<Reply<Saved>> {
    const { handles, now } = this.#parts;
    const text = classText(saved);
    if (!text.ok) return text;
    const known = handle === null ? null : handles.find(handle);
    if (handle !== null && known === null) return refused(UNKNOWN_FILE);
    const written =
      handle === null || known?.standing !== 'own'
        ? await writeNew(this.#parts, 'class', name, text.value)
        : await writeAgain(this.#parts, 'class', handle, known, text.value);
    if (!written.ok || written.value === null) return written.ok ? answered(null) : written;
    const { handle: given, path, remark } = written.value;
    await this.#remember(path);
    return answered({ handle: given, file: basename(path), at: now(), remark });
  }

  async table(handle: FileHandle | null): Promise<Reply<ClassTable>> {
    const { handles, sample, work } = this.#parts;
    const path = handle === null ? sample : (handles.find(handle)?.path ?? null);
    if (path === null) return refused(UNKNOWN_FILE);
    const read = await readProject(path);
    if (!read.ok) return read;
    return work.classTable({ project: read.project, source: read.edition === null ? 'project' : 'edition' });
  }

  async lookAtList({ handle, sheet }: DeskRequests['look-at-list']['ask']): Promise<Reply<ListedFile>> {
    const file = this.#parts.handles.find(handle);
    return file === null ? refused(UNKNOWN_FILE) : this.#parts.work.lookAtList(file.path, file.name, sheet);
  }

  /** Being on the list of recent classes is a convenience; a list that cannot be written stops no one from working. */
  async #remember(path: string): Promise<void> {
    await this.#parts.recents.add(path, '').catch(() => undefined);
  }
}
