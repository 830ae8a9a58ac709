import type { CohortSource, NormProject } from './norms/norm-project.ts';
import type { Reading } from './norms/reading.ts';
import type { BookletSection } from './pages/booklet-sections.ts';
import type { Tally } from './tally/tally.ts';

/**
 * The contract between the renderer and whatever hosts it. Every request is one question with one answer, both plain
 * JSON; a failure is a value with a sentence that tells what to do. Files are named by handles that the host gives out,
 * so that the renderer never holds a path.
 */
export type Reply<T> = { readonly ok: true; readonly value: T } | { readonly ok: false; readonly problem: string };

/** Stands for a file that the host knows: chosen in a dialog, dropped, uploaded, or listed. */
export type FileHandle = string;

export interface ProjectListing {
  readonly handle: FileHandle;
  readonly file: string;
  readonly title: string;
  /** Milliseconds since 1970. */
  readonly changedAt: number;
}

/** Work that was not yet saved when the program ended. */
export interface DraftListing {
  readonly draft: string;
  /** Name of the file it belongs to; empty when it was never saved. */
  readonly file: string;
  readonly title: string;
  /** Milliseconds since 1970. */
  readonly changedAt: number;
}

export interface OpenedProject {
  /**
   * Names this work for autosave; a new one for each time a project is opened. A page that starts a new project makes up
   * a name of its own: 8 to 64 small letters, digits and hyphens.
   */
  readonly draft: string;
  readonly project: NormProject;
  /** File it is saved to; null for a new project, the sample, or a recovered draft without a file. */
  readonly handle: FileHandle | null;
  readonly file: string | null;
  /** The cohort file, where it lies beside the project and can be read again. */
  readonly cohort: FileHandle | null;
}

export interface CohortPreview {
  readonly file: string;
  readonly bytes: number;
  /** Sheets of a workbook; empty for text. */
  readonly sheets: readonly string[];
  readonly columns: readonly string[];
  /** First rows, as the texts that stand in the file, header left out. */
  readonly rows: readonly (readonly string[])[];
  /** The reading asked for, or the guessed one. */
  readonly reading: Reading;
  /** Why the guesses were made, or what looks odd: sentences. */
  readonly remarks: readonly string[];
}

export interface TalliedCohort {
  readonly source: CohortSource;
  readonly tally: Tally;
}

export interface PressedFile {
  readonly file: string;
  readonly bytes: number;
  readonly sha256: string;
}

export interface Pressed {
  /** Where the files lie, as the host would say it to the user. */
  readonly folder: string;
  readonly files: readonly PressedFile[];
  /** Cells of the files that were read back and agree, and cells that the second engine worked out alike. */
  readonly readBack: { readonly cells: number; readonly recomputed: number };
}

export interface DrawnPages {
  /** The PDF itself, base64. */
  readonly pdf: string;
  readonly pages: number;
  /** What stands on which page, in print order. */
  readonly sections: readonly BookletSection[];
  /** What the composer had to change to fit the page, in sentences. */
  readonly remarks: readonly string[];
}

export type JobResult =
  | { readonly kind: 'tallied'; readonly tallied: TalliedCohort }
  | { readonly kind: 'pressed'; readonly pressed: Pressed }
  | { readonly kind: 'drawn'; readonly drawn: DrawnPages };

export type JobState =
  | { readonly state: 'running'; /** 0–1 */ readonly progress: number; readonly doing: string }
  | { readonly state: 'done'; readonly result: JobResult }
  | { readonly state: 'failed'; readonly problem: string }
  | { readonly state: 'cancelled' };

/** A file from outside the program: named when it was started, opened in the file manager, or dropped. */
export interface GivenFile {
  readonly kind: 'project' | 'cohort';
  readonly handle: FileHandle;
}

/** What a desktop window's menu asks of the page; `open-file` comes with the file. */
export type MenuCommand = 'new' | 'open' | 'open-file' | 'save' | 'undo' | 'redo';

export interface About {
  readonly version: string;
  readonly host: 'electron' | 'browser';
  /** Folder in which new projects are saved, as it is called on this machine. */
  readonly folder: string;
  /** A project or cohort file the program was opened with. */
  readonly openedWith: GivenFile | null;
}

/** Every request: what is asked and what comes back. */
export interface DeskRequests {
  about: { ask: Record<never, never>; answer: About };
  'list-projects': {
    ask: Record<never, never>;
    answer: {
      readonly recent: readonly ProjectListing[];
      readonly drafts: readonly DraftListing[];
      /** Sentences about drafts that cannot be read. */
      readonly problems: readonly string[];
    };
  };
  /** A dialog where the host has one; null when the user closed it. Browser hosts answer with a problem: they upload. */
  'choose-file': { ask: { readonly kind: 'cohort' | 'project' }; answer: { readonly handle: FileHandle } | null };
  'open-project': { ask: { readonly handle: FileHandle }; answer: OpenedProject };
  'open-draft': { ask: { readonly draft: string }; answer: OpenedProject };
  'open-sample': { ask: Record<never, never>; answer: OpenedProject };
  'forget-draft': { ask: { readonly draft: string }; answer: null };
  /** Autosave: safe against a kill at any moment, once it has answered. */
  'keep-draft': {
    ask: { readonly draft: string; readonly handle: FileHandle | null; readonly project: NormProject };
    answer: { readonly at: number };
  };
  /**
   * Saves to the handle's file, or, without one, to a new file of that name in the projects folder (Electron asks
   * where). Never overwrites a file it was not given, nor one that another program changed in between: then the project
   * goes into a new file beside it, and `remark` says so. Null when the user closed the dialog.
   */
  'save-project': {
    ask: {
      readonly draft: string;
      readonly handle: FileHandle | null;
      readonly name: string;
      readonly project: NormProject;
    };
    answer: {
      readonly handle: FileHandle;
      readonly file: string;
      readonly at: number;
      /** A sentence for the user, or null when there is nothing to tell. */
      readonly remark: string | null;
    } | null;
  };
  /** Null reading: guess everything. */
  'look-at-cohort': { ask: { readonly handle: FileHandle; readonly reading: Reading | null }; answer: CohortPreview };
  'tally-cohort': { ask: { readonly handle: FileHandle; readonly reading: Reading }; answer: { readonly job: string } };
  /** The booklet of a project as a PDF, for the Sheet station. */
  'draw-pages': { ask: { readonly project: NormProject }; answer: { readonly job: string } };
  /** Writes booklet, workbook, csv, norm set and certificate into a folder named after the project. */
  press: { ask: { readonly project: NormProject; readonly name: string }; answer: { readonly job: string } };
  'job-state': { ask: { readonly job: string }; answer: JobState };
  'cancel-job': { ask: { readonly job: string }; answer: null };
  /** Shows the folder of the last press in the file manager, where the host can. */
  'show-pressed': { ask: Record<never, never>; answer: null };
}

export type DeskRequest = keyof DeskRequests;

export const DESK_REQUESTS = [
  'about',
  'list-projects',
  'choose-file',
  'open-project',
  'open-draft',
  'open-sample',
  'forget-draft',
  'keep-draft',
  'save-project',
  'look-at-cohort',
  'tally-cohort',
  'draw-pages',
  'press',
  'job-state',
  'cancel-job',
  'show-pressed',
] as const satisfies readonly DeskRequest[];

/** The desk as code sees it, in the host and, by way of a wire, in the renderer. */
export interface Desk {
  ask<R extends DeskRequest>(request: R, ask: DeskRequests[R]['ask']): Promise<Reply<DeskRequests[R]['answer']>>;
}
