import { join } from 'node:path';
import * as v from 'valibot';
import {
  DESK_REQUESTS,
  type About,
  type Desk,
  type DeskRequest,
  type DeskRequests,
  type FileHandle,
  type Reply,
} from '../../shared-core/desk.ts';
import { givenKind, PROJECT_ENDING } from '../../shared-core/norms/file-endings.ts';
import type { Dialogs } from '../dialogs.ts';
import { Drafts } from '../project-file/drafts.ts';
import { ProjectSaver } from '../project-file/project-saver.ts';
import { Recents } from '../project-file/recents.ts';
import { ASK_SCHEMAS } from './ask-schemas.ts';
import { asCalledHere } from './called-here.ts';
import { ClassRoom } from './class-room.ts';
import type { DeskWork } from './desk-work.ts';
import { FileHandles, UNKNOWN_FILE, type KnownFile } from './file-handles.ts';
import { Jobs, unexpected } from './jobs.ts';
import { PressFolders } from './press-folders.ts';
import { PressRoom } from './press-room.ts';
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
  readonly workers: { readonly tally: URL; readonly press: URL; readonly erratum: URL };
  readonly dialogs: Dialogs | null;
  readonly showFolder: ((folder: string) => Promise<void>) | null;
  /** A project, class or cohort file the program was opened with. */
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
  const recents = new Recents(options.dataFolder, 'projects');
  const recentClasses = new Recents(options.dataFolder, 'classes');
  const saver = new ProjectSaver(options.dataFolder, Date.now);
  const folders = new PressFolders(options.projectsFolder, options.dataFolder);
  const sample = join(options.assetsFolder, 'sample-cohorts', `ostrey-vale${PROJECT_ENDING}`);
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
  const classes = new ClassRoom({
    handles,
    recents: recentClasses,
    saver,
    dialogs,
    projectsFolder,
    sample,
    work,
    now: Date.now,
  });
  const about = aboutHost(options, handles);
  const pressRoom = new PressRoom(work, folders, options.showFolder);

  // What killed runs left behind is no reason not to start.
  const swept = Promise.all([
    drafts.sweep(Date.now()),
    recents.sweep(Date.now()),
    recentClasses.sweep(Date.now()),
    saver.sweep(),
    folders.sweep(),
  ]).catch(() => undefined);

  const handlers: Handlers = {
    about: () => answered(about),
    'list-projects': async () => answered(await room.list()),
    'choose-file': async ({ kind }) => {
      if (dialogs === null) return refused('Drop the file on the page, or use its button to choose one.');
      const path = await dialogs.chooseFile(kind);
      return answered(path === null ? null : { handle: handles.give(path) });
    },
    'open-project': ({ handle }) => room.open(handle),
    'look-at-edition': ({ handle }) => room.lookAtEdition(handle),
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
    press: (ask) => answered({ job: jobs.start((hooks, signal) => pressRoom.press('press', ask, hooks, signal)) }),
    release: (ask) => answered({ job: jobs.start((hooks, signal) => pressRoom.press('release', ask, hooks, signal)) }),
    'make-erratum': (ask) => {
      const { roster } = ask;
      const file = roster === null ? null : handles.find(roster.handle);
      if (roster !== null && file === null) return refused(UNKNOWN_FILE);
      const people = roster === null || file === null ? null : { ...roster, path: file.path, file: file.name };
      return answered({
        job: jobs.start((hooks, signal) => pressRoom.erratum(ask, people, hooks, signal)),
      });
    },
    'list-classes': async () => answered(await classes.list()),
    'open-class': ({ handle }) => classes.open(handle),
    'save-class': (ask) => classes.save(ask),
    'class-table': ({ handle }) => classes.table(handle),
    'look-at-list': (ask) => classes.lookAtList(ask),
    'draw-class': (ask) =>
      answered({ job: jobs.start((hooks, signal) => work.press({ kind: 'draw-class', ...ask }, hooks, signal)) }),
    'press-class': (ask) => answered({ job: jobs.start((hooks, signal) => pressRoom.pressClass(ask, hooks, signal)) }),
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
    'show-pressed': () => pressRoom.show(),
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
            kind: givenKind(openedWith),
            handle: handles.give(openedWith),
          },
  };
}
