import { randomBytes } from 'node:crypto';
import { basename, resolve } from 'node:path';
import type { FileHandle } from '../../shared-core/desk.ts';

/** What a page hears that asks with a handle of another run. */
export const UNKNOWN_FILE = 'Normloom no longer knows this file. Choose it again.';

/** A file behind a handle. */
export interface KnownFile {
  /** Absolute. */
  readonly path: string;
  /** Its name as the user knows it. */
  readonly name: string;
  /** The user's own file, or a copy (an upload, the sample) that nothing is saved to. */
  readonly standing: 'own' | 'copy';
  /** SHA-256 of the file when the project was last read from it or written to it; null before. */
  readonly fingerprint: string | null;
}

/** Gives out random names for files, so that the page never holds a path and cannot make one up. */
export class FileHandles {
  readonly #files = new Map<FileHandle, KnownFile>();
  readonly #listed = new Map<string, FileHandle>();

  give(path: string, details: Partial<Omit<KnownFile, 'path'>> = {}): FileHandle {
    const handle = randomBytes(16).toString('base64url');
    const file = { path: resolve(path), name: basename(path), standing: 'own', fingerprint: null, ...details } as const;
    this.#files.set(handle, file);
    return handle;
  }

  /** The handle under which a file stands in a list: the same each time the list is asked for. */
  giveForList(path: string): FileHandle {
    const known = this.#listed.get(path);
    if (known !== undefined) return known;
    const handle = this.give(path);
    this.#listed.set(path, handle);
    return handle;
  }

  find(handle: FileHandle): KnownFile | null {
    return this.#files.get(handle) ?? null;
  }

  /** Remembers what the file behind a handle now holds. */
  noteFingerprint(handle: FileHandle, fingerprint: string): void {
    const file = this.#files.get(handle);
    if (file === undefined) throw new RangeError('no file has this handle');
    this.#files.set(handle, { ...file, fingerprint });
  }
}
