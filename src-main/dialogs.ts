import type { FileKind } from '../shared-core/desk.ts';

/** What is saved as a file of the user's. */
export type SavedFile = 'project' | 'class';

/** What a host with windows can ask the user for. Every answer is an absolute path, or null when the user closed it. */
export interface Dialogs {
  chooseFile(kind: FileKind): Promise<string | null>;
  /** Where to save a new file; `suggested` is an absolute path. It asks before it names a file that exists. */
  chooseSave(kind: SavedFile, suggested: string): Promise<string | null>;
  chooseFolder(): Promise<string | null>;
}
