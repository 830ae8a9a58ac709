import { homedir } from 'node:os';
import { extname, join, relative, isAbsolute } from 'node:path';
import * as v from 'valibot';
import {
  DESK_REQUESTS,
  type About,
  type Desk,
  type DeskRequest,
  type DeskRequests,
  type FileHandle,
  type JobResult,
  type Reply,
} from '../../shared-core/desk.ts';
import type { Dialogs } from '../dialogs.ts';
import { diskTrouble, codeOf } from '../project-file/disk-trouble.ts';
import { Drafts } from '../project-file/drafts.ts';
import { cleanFileName } from '../project-file/file-name.ts';
import { ProjectSaver } from '../project-file/project-saver.ts';
import { PROJECT_EXTENSION } from '../project-file/project-store.ts';
import { Recents } from '../project-file/recents.ts';
import { ASK_SCHEMAS } from './ask-schemas.ts';
import type { DeskWork } from './desk-work.ts';
import { FileHandles, UNKNOWN_FILE, type KnownFile } from './file-handles.ts';
import { Jobs, unexpected, type JobHooks } from './jobs.ts';
import { PressFolders } from './press-folders.ts';
import { ProjectRoom } from './project-room.ts';
import { answered, refused } from './reply.ts';

export interface DeskHost extends Desk {
  /**
   * A handle for a file that the user gave to the host: dropped on the window, opened from the file manager, uploaded.
   * `details` tell a copy from the user's own file (nothing is saved to a copy), and its name where the path has another.
   */
  giveHandle(path: string, details?: Partial<Pick<KnownFile, 'name' | 'standing'>>): FileHandle;
  /** Stops all work and waits for its end. */
  close(): Promise<void>;
}

export interface DeskOptions {
  readonly version: string;
  readonly host: 'electron' | 'browser';
  /** The program's own folder: drafts, recent projects. Absolute, as all paths here; made when needed. */
  readonly dataFolder: string;
  /** Where new projects and pressed files go; made on the first save. */
  readonly projectsFolder: string;
  readonly assetsFolder: string;
  readonly workers: { readonly tally: URL; readonly press: URL };
  readonly dialogs: Dialogs | null;
  readonly showFolder: ((folder: string) => Promise<void>) | null;
  /** A project or cohort file the program was opened with. */
  readonly openedWith: string | null;
}

type Answer<R extends DeskRequest> = Reply<DeskRequests[R]['answer']>;
type Handlers = {
  readonly [R in DeskRequest]: (ask: DeskRequests[R]['ask']) => Answer<R> | Promise<Answer<R>>;
};

/** Answers every request of the contract. No answer throws or rejects: what goes wrong comes back as a sentence. */
export function openDesk(options: Omit<DeskOptions, 'workers'>, work: DeskWork): DeskHost {
  const handles = new FileHandles();
  const jobs = new Jobs();
  const drafts = new Drafts(options.dataFolder);
  const recents = new Recents(options.dataFolder);
  const saver = new ProjectSaver(options.dataFolder, Date.now);
  const folders = new PressFolders(options.projectsFolder, options.dataFolder);
  const sample = join(options.assetsFolder, 'sample-cohorts', `ostrey-vale${PROJECT_EXTENSION}`);
  const { dialogs, projectsFolder } = options;
  const room = new ProjectRoom({
    handles,
    drafts,
    recents,
    saver,
    dialogs,
    projectsFolder,
    sample,
    now: Date.now,
  });
  const about = aboutHost(options, handles);
  let lastPressed: string | null = null;

  // What killed runs left behind is no reason not to start.
  const swept = Promise.all([
    drafts.sweep(Date.now()),
    recents.sweep(Date.now()),
    saver.sweep(),
    folders.sweep(),
  ]).catch(() => undefined);

  const press = async (
    { project, name }: DeskRequests['press']['ask'],
    hooks: JobHooks,
    signal: AbortSignal,
  ): Promise<Reply<JobResult>> => {
    const { title, subtitle, release } = project;
    const shown = name.trim() === '' ? title : name.replace(/\.normloom$/i, '');
    const folder = cleanFileName(`${shown} – edition ${release.edition}`, 'Normloom');
    let staged: string | null = null;
    try {
      staged = await folders.stage();
      const reply = await work.press({ kind: 'press', project, folder: staged }, hooks, signal);
      if (!reply.ok || reply.value.kind !== 'pressed' || signal.aborted) return reply;
      const pressed = await folders.settle(staged, reply.value.pressed, { name: folder, title, subtitle });
      lastPressed = pressed.folder;
      return { ok: true, value: { kind: 'pressed', pressed: { ...pressed, folder: asCalledHere(pressed.folder) } } };
    } catch (error) {
      if (codeOf(error) === null) throw error;
      return refused(diskTrouble('The pressed files', 'written', error));
    } finally {
      if (staged !== null) await folders.discard(staged);
    }
  };

  const handlers: Handlers = {
    about: () => answered(about),
    'list-projects': async () => answered(await room.list()),
    'choose-file': async ({ kind }) => {
      if (dialogs === null) return refused('Drop the file on the page, or use its button to choose one.');
      const path = await dialogs.chooseFile(kind);
      return answered(path === null ? null : { handle: handles.give(path) });
    },
    'open-project': ({ handle }) => room.open(handle),
    'open-draft': ({ draft }) => room.openDraft(draft),
    'open-sample': () => room.openSample(),
    'forget-draft': async ({ draft }) => {
      await drafts.forget(draft);
      return answered(null);
    },
    'keep-draft': (ask) => room.keepDraft(ask),
    'save-project': (ask) => room.save(ask),
    'look-at-cohort': async ({ handle, reading }) => {
      const file = handles.find(handle);
      return file === null ? refused(UNKNOWN_FILE) : work.lookAtCohort(file.path, file.name, reading);
    },
    'tally-cohort': ({ handle, reading }) => {
      const file = handles.find(handle);
      if (file === null) return refused(UNKNOWN_FILE);
      return answered({ job: jobs.start((hooks, signal) => work.tally(file.path, file.name, reading, hooks, signal)) });
    },
    'draw-pages': ({ project }) =>
      answered({ job: jobs.start((hooks, signal) => work.press({ kind: 'draw', project }, hooks, signal)) }),
    press: (ask) => answered({ job: jobs.start((hooks, signal) => press(ask, hooks, signal)) }),
    'job-state': ({ job }) => {
      const state = jobs.collect(job);
      return state === null
        ? refused('This work has ended and its result was collected. Start it again.')
        : answered(state);
    },
    'cancel-job': ({ job }) => {
      jobs.cancel(job);
      return answered(null);
    },
    'show-pressed': async () => {
      if (lastPressed === null) return refused('Nothing was pressed yet. Press the project first.');
      if (options.showFolder === null)
        return refused(`The files lie in ${asCalledHere(lastPressed)}. Open that folder.`);
      await options.showFolder(lastPressed);
      return answered(null);
    },
  };

  return {
    async ask(request, ask) {
      if (!DESK_REQUESTS.includes(request)) return refused('Normloom does not know this request.');
      const parsed = v.safeParse(ASK_SCHEMAS[request], ask);
      if (!parsed.success) {
        const issue = parsed.issues[0];
        return refused(
          `The request "${request}" was not understood (${v.getDotPath(issue) ?? 'all of it'}: ${issue.message}).`,
        );
      }
      try {
        await swept;
        return await handlers[request](parsed.output);
      } catch (error) {
        return refused(unexpected(error));
      }
    },
    giveHandle: (path, details) => handles.give(path, details),
    async close() {
      await jobs.close();
      await swept;
    },
  };
}

function aboutHost(options: Omit<DeskOptions, 'workers'>, handles: FileHandles): About {
  const { version, host, openedWith } = options;
  return {
    version,
    host,
    folder: asCalledHere(options.projectsFolder),
    openedWith:
      openedWith === null
        ? null
        : {
            kind: extname(openedWith).toLowerCase() === PROJECT_EXTENSION ? 'project' : 'cohort',
            handle: handles.give(openedWith),
          },
  };
}

/** A folder as a person at this machine would write it: the home folder as ~. */
function asCalledHere(folder: string): string {
  if (process.platform === 'win32') return folder;
  const below = relative(homedir(), folder);
  return below === '' || below.startsWith('..') || isAbsolute(below) ? folder : `~/${below}`;
}
