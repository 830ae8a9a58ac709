import { randomBytes } from 'node:crypto';
import { constants } from 'node:fs';
import { copyFile, link, open, readdir, rm, stat } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import writeFileAtomic from 'write-file-atomic';
import { codeOf } from './disk-trouble.ts';

/**
 * Files are written whole to a neighbour with a number behind its name, flushed to the disk, and renamed. Whatever kills
 * the program, the file holds the old text or the new one; at worst a neighbour is left over, for `removeLeftovers`.
 */
const LEFTOVER = /^(?<file>.+)\.\d{1,10}$/;

/** Replaces the file at the path, or makes it. Rejects with the system's error; the old text then still stands. */
export async function replaceFile(path: string, text: string): Promise<void> {
  await writeFileAtomic(path, text, { encoding: 'utf8', fsync: true });
  await flushFolder(dirname(path));
}

/** Makes a new file at the path; false, with nothing written, when the name is taken. Never replaces anything. */
export async function createFile(path: string, text: string): Promise<boolean> {
  const neighbour = `${path}.${randomBytes(4).readUInt32BE()}`;
  try {
    const file = await open(neighbour, 'wx');
    try {
      await file.writeFile(text, 'utf8');
      await file.sync();
    } finally {
      await file.close();
    }
    if (!(await takesName(neighbour, path))) return false;
    await flushFolder(dirname(path));
    return true;
  } finally {
    await rm(neighbour, { force: true });
  }
}

async function takesName(neighbour: string, path: string): Promise<boolean> {
  try {
    await link(neighbour, path);
    return true;
  } catch (error) {
    if (codeOf(error) === 'EEXIST') return false;
  }
  // Memory sticks and some network disks have no links; there the new file is copied, still without replacing any.
  try {
    await copyFile(neighbour, path, constants.COPYFILE_EXCL);
    return true;
  } catch (error) {
    if (codeOf(error) === 'EEXIST') return false;
    throw error;
  }
}

/** What a file in a folder is to `removeLeftovers`: the name it was meant for, and when it was last written. */
export interface Leftover {
  readonly file: string;
  /** Milliseconds since 1970. */
  readonly writtenAt: number;
}

/** Removes what killed writes left in a folder, where `ours` says so. A missing folder holds nothing. */
export async function removeLeftovers(folder: string, ours: (leftover: Leftover) => boolean): Promise<void> {
  for (const name of await namesIn(folder)) {
    const file = LEFTOVER.exec(name)?.groups?.['file'];
    if (file === undefined) continue;
    const path = join(folder, name);
    const found = await stat(path).catch(() => null);
    if (found?.isFile() === true && ours({ file, writtenAt: found.mtimeMs })) await rm(path, { force: true });
  }
}

/** Names in a folder, sorted; none when it cannot be read. */
export async function namesIn(folder: string): Promise<readonly string[]> {
  return (await readdir(folder).catch(() => [])).sort();
}

/** Makes the new name itself survive a power cut, on the systems where a folder can be flushed. */
async function flushFolder(folder: string): Promise<void> {
  if (process.platform === 'win32') return;
  const handle = await open(folder, 'r').catch(() => null);
  if (handle === null) return;
  await handle.sync().catch(() => undefined);
  await handle.close();
}
