import type { FileKind } from '../shared-core/desk.ts';

/** What a host with windows can ask the user for. Every answer is an absolute path, or null when the user closed it. */
export interface Dialogs {
  chooseFile(kind: FileKind): Promise<string | null>;
  /** Where to save a new project; `suggested` is an absolute path. It asks before it names a file that exists. */
  chooseSave(suggested: string): Promise<string | null>;
  chooseFolder(): Promise<string | null>;
}
