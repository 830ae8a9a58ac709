import { basename } from 'node:path';
import type { DeskRequests, JobResult, PressedClassFiles, PressedFile, Reply } from '../../shared-core/desk.ts';
import { codeOf, diskTrouble } from '../project-file/disk-trouble.ts';
import { cleanFileName } from '../project-file/file-name.ts';
import { asCalledHere } from './called-here.ts';
import type { ErratumRequest } from '../erratum/make-erratum.ts';
import type { DeskWork } from './desk-work.ts';
import type { JobHooks } from './jobs.ts';
import type { PressedFor, PressFolders } from './press-folders.ts';
import { answered, refused } from './reply.ts';

/** Files that some work made in a hidden folder. */
interface Made {
  readonly files: readonly PressedFile[];
  readonly editionFile: string | null;
}

/** What a folder of class files holds, by how the class is shared: names never lie in a folder that may be handed on. */
const CLASS_FOLDERS = {
  names: 'class report with names',
  codes: 'class report with codes',
  summary: 'class summary',
} as const;
const KEY_FOLDER = 'key to codes, keep apart';

/** Presses and releases into folders named after the project, and shows the last one. */
export class PressRoom {
  readonly #work: DeskWork;
  readonly #folders: PressFolders;
  readonly #showFolder: ((folder: string) => Promise<void>) | null;
  #last: string | null = null;

  constructor(work: DeskWork, folders: PressFolders, showFolder: ((folder: string) => Promise<void>) | null) {
    this.#work = work;
    this.#folders = folders;
    this.#showFolder = showFolder;
  }

  async press(
    kind: 'press' | 'release',
    { project, name }: DeskRequests['press']['ask'],
    hooks: JobHooks,
    signal: AbortSignal,
  ): Promise<Reply<JobResult>> {
    const { title, subtitle, release } = project;
    const shown = name.trim() === '' ? title : name.replace(/\.normloom$/i, '');
    const folder = cleanFileName(`${shown} – edition ${release.edition}`, 'Normloom');
    const pressedFor = { name: folder, title, subtitle, edition: release.edition };
    const pressed = await this.#inOwnFolder(pressedFor, signal, async (staged) => {
      const reply = await this.#work.press({ kind, project, folder: staged }, hooks, signal);
      if (!reply.ok) return reply;
      if (reply.value.kind !== 'pressed') throw new TypeError('the press answered with something else');
      return answered(reply.value.pressed);
    });
    return pressed.ok ? answered({ kind: 'pressed', pressed: pressed.value }) : pressed;
  }

  /** The key to codes goes into a folder of its own, beside the one that may be handed on. */
  async pressClass(
    { class: file, slips, name }: DeskRequests['press-class']['ask'],
    hooks: JobHooks,
    signal: AbortSignal,
  ): Promise<Reply<JobResult>> {
    const sharing = file.sharing.as;
    const shown = name.trim() === '' ? file.title : name.replace(/\.normclass$/i, '');
    const pressedFor = {
      name: cleanFileName([shown.trim() || 'Class', CLASS_FOLDERS[sharing]].join(' – '), 'Class'),
      title: file.title,
      subtitle: `class, ${sharing}`,
      edition: '',
    };
    let keyStaged: string | null = null;
    try {
      const keyFolder = (keyStaged = await this.#folders.stage());
      const pressed = await this.#inOwnFolder(pressedFor, signal, async (staged) => {
        const request = { kind: 'press-class', class: file, slips, folder: staged, keyFolder } as const;
        const reply = await this.#work.press(request, hooks, signal);
        if (!reply.ok) return reply;
        if (reply.value.kind !== 'pressed-class') throw new TypeError('the press answered with something else');
        const made = reply.value.pressed;
        const key = made.files.find((one) => one.file === made.keyFile) ?? null;
        return answered({ ...made, files: made.files.filter((one) => one !== key), key, editionFile: null });
      });
      if (!pressed.ok) return pressed;
      const { folder, files, key, cells, remarks } = pressed.value;
      const told = { folder, files, keyFile: null, cells, remarks };
      if (key === null) return answered({ kind: 'pressed-class', pressed: told });
      return await this.#withKey(told, key, keyFolder, pressedFor);
    } catch (error) {
      if (codeOf(error) === null) throw error;
      return refused(diskTrouble('The key to the codes', 'written', error));
    } finally {
      if (keyStaged !== null) await this.#folders.discard(keyStaged);
    }
  }

  async #withKey(
    pressed: PressedClassFiles,
    key: PressedFile,
    staged: string,
    pressedFor: PressedFor,
  ): Promise<Reply<JobResult>> {
    const name = `${basename(this.#last ?? pressedFor.name)} – ${KEY_FOLDER}`;
    const settled = await this.#folders.settle(staged, { files: [key], editionFile: null }, { ...pressedFor, name });
    if (!settled.ok) return settled;
    const keyFile = `${basename(settled.value)}/${key.file}`;
    const files = [...pressed.files, { ...key, file: keyFile }];
    return answered({ kind: 'pressed-class', pressed: { ...pressed, files, keyFile } });
  }

  /** Follows the people of a roster, and writes the erratum into a folder that is none of a release. */
  async erratum(
    { before, after, cut, write }: DeskRequests['make-erratum']['ask'],
    roster: ErratumRequest['roster'],
    hooks: JobHooks,
    signal: AbortSignal,
  ): Promise<Reply<JobResult>> {
    const asked = { before, after, roster, cut } as const;
    if (!write) {
      const looked = await this.#work.erratum({ ...asked, folder: null }, hooks, signal);
      return looked.ok
        ? answered({ kind: 'erratum', erratum: { people: looked.value.people, written: null } })
        : looked;
    }
    const { title, subtitle } = before;
    const { edition } = before.release;
    // What can be handed out and what holds people lie apart.
    const people = roster === null ? '' : ', people';
    const name = cleanFileName(`${title} – erratum of edition ${edition}${people}`, 'Erratum');
    const written = await this.#inOwnFolder({ name, title, subtitle, edition }, signal, async (staged) => {
      const made = await this.#work.erratum({ ...asked, folder: staged }, hooks, signal);
      return made.ok ? answered({ ...made.value, editionFile: null }) : made;
    });
    if (!written.ok) return written;
    const { files, folder } = written.value;
    return answered({ kind: 'erratum', erratum: { people: written.value.people, written: { folder, files } } });
  }

  /** Opens the folder that was last written to, where the host can. */
  async show(): Promise<Reply<null>> {
    if (this.#last === null) return refused('Nothing was pressed yet. Press the project first.');
    if (this.#showFolder === null) {
      return refused(`The files lie in ${asCalledHere(this.#last)}. Open that folder.`);
    }
    await this.#showFolder(this.#last);
    return answered(null);
  }

  /** Lets work write into a hidden folder, then puts its files where they belong; a failure leaves nothing behind. */
  async #inOwnFolder<T extends Made>(
    pressedFor: PressedFor,
    signal: AbortSignal,
    work: (staged: string) => Promise<Reply<T>>,
  ): Promise<Reply<T & { readonly folder: string }>> {
    let staged: string | null = null;
    try {
      staged = await this.#folders.stage();
      const made = await work(staged);
      if (!made.ok) return made;
      if (signal.aborted) return refused('The work was stopped.');
      const settled = await this.#folders.settle(staged, made.value, pressedFor);
      if (!settled.ok) return settled;
      this.#last = settled.value;
      return answered({ ...made.value, folder: asCalledHere(settled.value) });
    } catch (error) {
      if (codeOf(error) === null) throw error;
      return refused(diskTrouble('The pressed files', 'written', error));
    } finally {
      if (staged !== null) await this.#folders.discard(staged);
    }
  }
}
