import { existsSync } from 'node:fs';
import { dialog } from 'electron';
import type { BrowserWindow, FileFilter } from 'electron';
import type { FileKind } from '../../shared-core/desk.ts';
import { CLASS_ENDING, PROJECT_ENDING } from '../../shared-core/norms/file-endings.ts';
import type { Dialogs, SavedFile } from '../dialogs.ts';

const TABLES = ['csv', 'tsv', 'txt', 'xlsx', 'ods', 'xls'];
const ALL: FileFilter = { name: 'All files', extensions: ['*'] };
const PROJECTS: FileFilter = { name: 'Normloom projects', extensions: ['normloom'] };
const EDITIONS: FileFilter = { name: 'Released editions', extensions: ['normedition'] };
const CLASSES: FileFilter = { name: 'Normloom classes', extensions: ['normclass'] };
const EITHER: FileFilter = { name: 'Projects and released editions', extensions: ['normloom', 'normedition'] };

const FILTERS: Readonly<Record<FileKind, FileFilter[]>> = {
  cohort: [{ name: 'Cohort files', extensions: TABLES }, ALL],
  project: [EITHER, PROJECTS, EDITIONS],
  edition: [EITHER, EDITIONS, PROJECTS],
  roster: [{ name: 'Lists of people', extensions: TABLES }, ALL],
  class: [CLASSES],
  'class-list': [{ name: 'Class lists', extensions: TABLES }, ALL],
};

const SAVED: Readonly<Record<SavedFile, { readonly ending: string; readonly filter: FileFilter }>> = {
  project: { ending: PROJECT_ENDING, filter: PROJECTS },
  class: { ending: CLASS_ENDING, filter: CLASSES },
};

const askWhereToSave = async (holder: BrowserWindow, kind: SavedFile, suggested: string): Promise<string | null> => {
  const { ending, filter } = SAVED[kind];
  const answer = await dialog.showSaveDialog(holder, {
    defaultPath: suggested,
    filters: [filter],
    properties: ['createDirectory', 'showOverwriteConfirmation'],
  });
  if (answer.canceled || answer.filePath === '') return null;
  if (answer.filePath.toLowerCase().endsWith(ending)) return answer.filePath;
  // Some systems leave the ending off. Where the full name is taken, the dialog asks again, and about the right file.
  const path = `${answer.filePath}${ending}`;
  return existsSync(path) ? askWhereToSave(holder, kind, path) : path;
};

/** The system's own dialogs, held by the window. `chosen` hears the path of every project that was chosen or named. */
export const nativeDialogs = (window: () => BrowserWindow | null, chosen: (path: string) => void): Dialogs => {
  const open = async (properties: ('openFile' | 'openDirectory')[], filters: FileFilter[]): Promise<string | null> => {
    const holder = window();
    if (holder === null) return null;
    const answer = await dialog.showOpenDialog(holder, { properties, filters });
    return answer.canceled ? null : (answer.filePaths[0] ?? null);
  };
  return {
    async chooseFile(kind) {
      const path = await open(['openFile'], FILTERS[kind]);
      if (path !== null && kind === 'project') chosen(path);
      return path;
    },
    async chooseSave(kind, suggested) {
      const holder = window();
      const path = holder === null ? null : await askWhereToSave(holder, kind, suggested);
      if (path !== null && kind === 'project') chosen(path);
      return path;
    },
    chooseFolder: () => open(['openDirectory'], []),
  };
};
