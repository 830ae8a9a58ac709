import { createHash } from 'node:crypto';
import { mkdir, readFile, rm } from 'node:fs/promises';
import { join } from 'node:path';
import writeFileAtomic from 'write-file-atomic';
import type { PressedFile } from '../../shared-core/desk.ts';
import { diskTrouble } from '../project-file/disk-trouble.ts';
import { harmedBy, harmProblem, releasedIn } from './released-editions.ts';

export interface FileToWrite {
  readonly file: string;
  readonly bytes: Uint8Array;
}

/**
 * Writes files into a folder, which is made where it is missing, and reads them again; the problem is a sentence, or null
 * where all is well. Each file is replaced whole or not at all. A certificate of an earlier press, of the name given, if any, is
 * taken away first, so that none stands beside files it does not speak of. A folder that holds a released edition takes
 * no other files.
 */
export async function writePressed(
  files: readonly FileToWrite[],
  folder: string,
  certificate: string | null,
): Promise<string | null> {
  const released = await releasedIn(folder);
  const harmed = harmedBy(released, files.map(named));
  if (harmed !== null) return harmProblem(harmed);
  try {
    await mkdir(folder, { recursive: true });
    if (released.length === 0 && certificate !== null) await rm(join(folder, certificate), { force: true });
    for (const { file, bytes } of files) {
      const path = join(folder, file);
      await writeFileAtomic(path, Buffer.from(bytes), { fsync: true });
      if (!(await readFile(path)).equals(bytes)) return wrongOnDisk(file);
    }
    return null;
  } catch (error) {
    return diskTrouble('The pressed files', 'written', error);
  }
}

/** A file as it is told of, without its bytes. */
export function named({ file, bytes }: FileToWrite): PressedFile {
  return { file, bytes: bytes.length, sha256: createHash('sha256').update(bytes).digest('hex') };
}

function wrongOnDisk(file: string): string {
  return `${file} was written, but the disk gives other bytes back. Press again, into a folder on another disk.`;
}
