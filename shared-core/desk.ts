import type { ClassFile } from './class/class-file.ts';
import type { ClassTable } from './class/class-table.ts';
import type { ListedRow } from './class/pasted-rows.ts';
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
  /** The released edition that the project goes on from, where it was opened from an edition file. */
  readonly earlier: EarlierEdition | null;
}

/** An edition that a project is compared with, as it was read from its file. */
export interface EarlierEdition {
  readonly file: string;
  readonly project: NormProject;
  /** Null for a project file that was never released. */
  readonly released: {
    readonly check: string;
    readonly analyst: string;
    readonly checker: string;
  } | null;
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
  /** The file in which the edition was frozen, one of the files; null for a proof. */
  readonly editionFile: string | null;
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

/** People of a roster whom a new edition concerns: rows = unchanged + changed + unplaced. */
export interface ErratumPeople {
  readonly rows: number;
  readonly unchanged: number;
  readonly changed: number;
  /** Not found in both editions. */
  readonly unplaced: number;
  /** Of the changed ones: those who now stand on another side of a cut. */
  readonly crossing: number;
  /** The first of them, in the order of the roster. */
  readonly changedFirst: readonly {
    readonly row: number;
    readonly person: string;
    readonly group: string;
    readonly score: string;
    readonly changes: readonly string[];
  }[];
  readonly unplacedFirst: readonly { readonly row: number; readonly person: string; readonly problem: string }[];
}

export interface Erratum {
  /** Null where no roster was given. */
  readonly people: ErratumPeople | null;
  /** Where its files lie; null where it was only looked at. */
  readonly written: { readonly folder: string; readonly files: readonly PressedFile[] } | null;
}

/** A list of people and the columns that are read of it. It is never kept with a project. */
export interface RosterChoice {
  readonly handle: FileHandle;
  readonly reading: Reading;
  readonly columns: {
    readonly score: string;
    /** Names or codes; null where people are told by their row. */
    readonly person: string | null;
    /** One column for each grouping column of the project, in that order. */
    readonly by: readonly string[];
  };
}

/** A class file as it was read. */
export interface OpenedClass {
  readonly class: ClassFile;
  readonly handle: FileHandle;
  readonly file: string;
}

/** Rows of a class list as they stand in a file, before its columns are known. */
export interface ListedFile {
  readonly file: string;
  /** Sheets of a workbook; empty for text. */
  readonly sheets: readonly string[];
  /** The sheet that was read; null for text. */
  readonly sheet: string | null;
  readonly rows: readonly ListedRow[];
  /** What looks odd: sentences. */
  readonly remarks: readonly string[];
}

export interface PressedClassFiles {
  readonly folder: string;
  readonly files: readonly PressedFile[];
  /**
   * The file that holds who has which code, one of the files; null where no codes are printed. It lies in a folder of
   * its own beside the other: this is the name of that folder, a slash and the name of the file.
   */
  readonly keyFile: string | null;
  /** Cells that were read back and agree. */
  readonly cells: number;
  readonly remarks: readonly string[];
}

export type JobResult =
  | { readonly kind: 'tallied'; readonly tallied: TalliedCohort }
  | { readonly kind: 'pressed'; readonly pressed: Pressed }
  | { readonly kind: 'drawn'; readonly drawn: DrawnPages }
  | { readonly kind: 'erratum'; readonly erratum: Erratum }
  | { readonly kind: 'drawn-class'; readonly drawn: Omit<DrawnPages, 'sections'> }
  | { readonly kind: 'pressed-class'; readonly pressed: PressedClassFiles };

export type JobState =
  | { readonly state: 'running'; /** 0–1 */ readonly progress: number; readonly doing: string }
  | { readonly state: 'done'; readonly result: JobResult }
  | { readonly state: 'failed'; readonly problem: string }
  | { readonly state: 'cancelled' };

/** A file from outside the program: named when it was started, opened in the file manager, or dropped. */
export interface GivenFile {
  readonly kind: 'project' | 'cohort' | 'class';
  readonly handle: FileHandle;
}

/** What a file is chosen for: `project` and `edition` take projects and released editions alike. */
export type FileKind = 'cohort' | 'project' | 'edition' | 'roster' | 'class' | 'class-list';

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
  'choose-file': { ask: { readonly kind: FileKind }; answer: { readonly handle: FileHandle } | null };
  /** A released edition opens as a new project that goes on from it; nothing is ever saved into its file. */
  'open-project': { ask: { readonly handle: FileHandle }; answer: OpenedProject };
  /** Reads a project or a released edition to be compared with. */
  'look-at-edition': { ask: { readonly handle: FileHandle }; answer: EarlierEdition };
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
  /** The same, and the edition is frozen: refused while something is missing, or where its number was used before. */
  release: { ask: { readonly project: NormProject; readonly name: string }; answer: { readonly job: string } };
  /** The erratum of an earlier edition; with `write`, its files go into a folder of their own. */
  'make-erratum': {
    ask: {
      readonly before: NormProject;
      readonly after: NormProject;
      readonly roster: RosterChoice | null;
      /** Percentile rank that decides something, as it was typed; empty for none. */
      readonly cut: string;
      readonly write: boolean;
    };
    answer: { readonly job: string };
  };
  /** Class files opened or saved before that are still there. */
  'list-classes': { ask: Record<never, never>; answer: readonly ProjectListing[] };
  'open-class': { ask: { readonly handle: FileHandle }; answer: OpenedClass };
  /**
   * Saves a class to the handle's file, or to a new one, in the way of `save-project`. A class is kept nowhere else:
   * there are no drafts of it, since it holds names.
   */
  'save-class': {
    ask: { readonly handle: FileHandle | null; readonly name: string; readonly class: ClassFile };
    answer: {
      readonly handle: FileHandle;
      readonly file: string;
      readonly at: number;
      readonly remark: string | null;
    } | null;
  };
  /** The tables of a project or a released edition, as a class looks pupils up in them; null: of the sample. */
  'class-table': { ask: { readonly handle: FileHandle | null }; answer: ClassTable };
  /** The rows of a class list in a file; null sheet: the first that holds anything. */
  'look-at-list': { ask: { readonly handle: FileHandle; readonly sheet: string | null }; answer: ListedFile };
  /** Report or slips of a class as a PDF, for the screen. */
  'draw-class': {
    ask: { readonly class: ClassFile; readonly what: 'report' | 'slips' };
    answer: { readonly job: string };
  };
  /** Writes report, slips, workbook, csv and certificate into a folder of their own, and the key to codes where there is one. */
  'press-class': {
    ask: { readonly class: ClassFile; readonly slips: boolean; readonly name: string };
    answer: { readonly job: string };
  };
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
  'look-at-edition',
  'open-draft',
  'open-sample',
  'forget-draft',
  'keep-draft',
  'save-project',
  'look-at-cohort',
  'tally-cohort',
  'draw-pages',
  'press',
  'release',
  'make-erratum',
  'list-classes',
  'open-class',
  'save-class',
  'class-table',
  'look-at-list',
  'draw-class',
  'press-class',
  'job-state',
  'cancel-job',
  'show-pressed',
] as const satisfies readonly DeskRequest[];

/** The desk as code sees it, in the host and, by way of a wire, in the renderer. */
export interface Desk {
  ask<R extends DeskRequest>(request: R, ask: DeskRequests[R]['ask']): Promise<Reply<DeskRequests[R]['answer']>>;
}
