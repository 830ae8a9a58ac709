import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { BrowserWindow, OpenDialogOptions, SaveDialogOptions } from 'electron';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { nativeDialogs } from '../../../src-main/electron/dialogs.ts';

const electron = vi.hoisted(() => ({
  dialog: {
    showOpenDialog:
      vi.fn<(window: unknown, options: OpenDialogOptions) => Promise<{ canceled: boolean; filePaths: string[] }>>(),
    showSaveDialog:
      vi.fn<(window: unknown, options: SaveDialogOptions) => Promise<{ canceled: boolean; filePath: string }>>(),
  },
}));
vi.mock('electron', () => electron);

const window = { id: 1 } as BrowserWindow;
const chosen = vi.fn<(path: string) => void>();
const dialogs = nativeDialogs(() => window, chosen);

beforeEach(() => {
  vi.resetAllMocks();
});

describe('native dialogs', () => {
  it('choose a cohort file or a project, held by the window', async () => {
    electron.dialog.showOpenDialog.mockResolvedValueOnce({ canceled: false, filePaths: ['/data/scores.csv'] });
    expect(await dialogs.chooseFile('cohort')).toBe('/data/scores.csv');
    const [holder, options] = electron.dialog.showOpenDialog.mock.calls[0] ?? [];
    expect(holder).toBe(window);
    expect(options?.properties).toEqual(['openFile']);
    expect(options?.filters?.[0]?.extensions).toEqual(['csv', 'tsv', 'txt', 'xlsx', 'ods', 'xls']);
    expect(chosen).not.toHaveBeenCalled();

    electron.dialog.showOpenDialog.mockResolvedValueOnce({ canceled: false, filePaths: ['/surveys/grade-4.normloom'] });
    expect(await dialogs.chooseFile('project')).toBe('/surveys/grade-4.normloom');
    expect(electron.dialog.showOpenDialog.mock.calls[1]?.[1].filters?.[0]?.extensions).toEqual([
      'normloom',
      'normedition',
    ]);
    expect(chosen.mock.calls).toEqual([['/surveys/grade-4.normloom']]);

    electron.dialog.showOpenDialog.mockResolvedValue({ canceled: false, filePaths: ['/surveys/old.normedition'] });
    expect(await dialogs.chooseFile('edition')).toBe('/surveys/old.normedition');
    expect(await dialogs.chooseFile('roster')).toBe('/surveys/old.normedition');
    const names = electron.dialog.showOpenDialog.mock.calls.slice(2).map(([, asked]) => asked.filters?.[0]?.name);
    expect(names).toEqual(['Projects and released editions', 'Lists of people']);
    expect(chosen).toHaveBeenCalledTimes(1);
  });

  it('answer null when closed, and when there is no window to hold them', async () => {
    electron.dialog.showOpenDialog.mockResolvedValue({ canceled: true, filePaths: [] });
    electron.dialog.showSaveDialog.mockResolvedValue({ canceled: true, filePath: '' });
    expect(await dialogs.chooseFile('project')).toBeNull();
    expect(await dialogs.chooseSave('project', '/surveys/grade-4.normloom')).toBeNull();
    expect(await dialogs.chooseFolder()).toBeNull();
    expect(chosen).not.toHaveBeenCalled();
    const without = nativeDialogs(() => null, chosen);
    vi.clearAllMocks();
    expect(await without.chooseFile('cohort')).toBeNull();
    expect(await without.chooseSave('project', '/surveys/grade-4.normloom')).toBeNull();
    expect(electron.dialog.showOpenDialog).not.toHaveBeenCalled();
    expect(electron.dialog.showSaveDialog).not.toHaveBeenCalled();
  });

  it('save under the suggested name and give a name without ending its ending', async () => {
    electron.dialog.showSaveDialog.mockResolvedValueOnce({ canceled: false, filePath: '/surveys/grade-5' });
    expect(await dialogs.chooseSave('project', '/surveys/grade-4.normloom')).toBe('/surveys/grade-5.normloom');
    const options = electron.dialog.showSaveDialog.mock.calls[0]?.[1];
    expect(options?.defaultPath).toBe('/surveys/grade-4.normloom');
    expect(options?.properties).toContain('showOverwriteConfirmation');
    expect(options?.filters?.map(({ extensions }) => extensions)).toEqual([['normloom']]);
    expect(chosen.mock.calls).toEqual([['/surveys/grade-5.normloom']]);
  });

  it('choose and save classes by their ending, and tell the system of none, since their names are nobody’s business', async () => {
    electron.dialog.showOpenDialog.mockResolvedValue({ canceled: false, filePaths: ['/lists/5b.normclass'] });
    expect(await dialogs.chooseFile('class')).toBe('/lists/5b.normclass');
    expect(await dialogs.chooseFile('class-list')).toBe('/lists/5b.normclass');
    const filters = electron.dialog.showOpenDialog.mock.calls.map(([, asked]) => asked.filters?.[0]?.extensions);
    expect(filters).toEqual([['normclass'], ['csv', 'tsv', 'txt', 'xlsx', 'ods', 'xls']]);
    electron.dialog.showSaveDialog.mockResolvedValueOnce({ canceled: false, filePath: '/lists/5c' });
    expect(await dialogs.chooseSave('class', '/lists/5b.normclass')).toBe('/lists/5c.normclass');
    expect(electron.dialog.showSaveDialog.mock.calls[0]?.[1].filters?.[0]?.extensions).toEqual(['normclass']);
    expect(chosen).not.toHaveBeenCalled();
  });

  it('ask again where the full name is taken, so that nothing is written over unasked', async () => {
    const folder = mkdtempSync(join(tmpdir(), 'normloom-dialogs-'));
    const taken = join(folder, 'grade-4.normloom');
    writeFileSync(taken, '{}');
    electron.dialog.showSaveDialog.mockResolvedValueOnce({ canceled: false, filePath: join(folder, 'grade-4') });
    electron.dialog.showSaveDialog.mockResolvedValueOnce({ canceled: true, filePath: '' });
    expect(await dialogs.chooseSave('project', join(folder, 'new.normloom'))).toBeNull();
    expect(electron.dialog.showSaveDialog.mock.calls[1]?.[1].defaultPath).toBe(taken);
    rmSync(folder, { recursive: true });
  });

  it('choose a folder', async () => {
    electron.dialog.showOpenDialog.mockResolvedValueOnce({ canceled: false, filePaths: ['/pressed'] });
    expect(await dialogs.chooseFolder()).toBe('/pressed');
    expect(electron.dialog.showOpenDialog.mock.calls[0]?.[1].properties).toEqual(['openDirectory']);
  });
});
