import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { editionFromText, type FrozenEdition, type FrozenFile } from '../../shared-core/norms/edition-file.ts';
import { EDITION_ENDING } from '../../shared-core/norms/file-endings.ts';
import { namesIn } from '../project-file/atomic-write.ts';
import { fingerprintOf } from '../project-file/stored-text.ts';
import { cleanFileName } from '../project-file/file-name.ts';

/** The name of the file in which an edition is frozen: "edition-1.0.normedition". */
export function editionFileName(edition: string): string {
  return `${cleanFileName(`edition-${edition.trim()}`, 'edition')}${EDITION_ENDING}`;
}

/** A file by its name and its bytes. */
export type NamedBytes = Pick<FrozenFile, 'file' | 'sha256'>;

/** An edition file that lies in a folder of pressed files. */
export interface ReleasedThere extends NamedBytes {
  /** Null where the file cannot be read as an edition, which then guards its folder all the same. */
  readonly edition: FrozenEdition | null;
}

/** The editions that were released into a folder; none where there is no such folder. */
export async function releasedIn(folder: string): Promise<readonly ReleasedThere[]> {
  const files = (await namesIn(folder)).filter((name) => name.toLowerCase().endsWith(EDITION_ENDING));
  return Promise.all(
    files.map(async (file) => {
      const bytes = await readFile(join(folder, file)).catch(() => Buffer.alloc(0));
      const read = editionFromText(bytes.toString('utf8'));
      return { file, sha256: fingerprintOf(bytes), edition: read.ok ? read.edition : null };
    }),
  );
}

/**
 * The released edition that would be harmed if these files were written beside it; null where each of them is the edition
 * file itself or one that it names, byte for byte, or nothing was released there.
 */
export function harmedBy(released: readonly ReleasedThere[], files: readonly NamedBytes[]): ReleasedThere | null {
  return (
    released.find(
      (there) =>
        there.edition === null ||
        !files.every((file) => [there, ...(there.edition?.files ?? [])].some((frozen) => sameFile(frozen, file))),
    ) ?? null
  );
}

function sameFile(one: NamedBytes, other: NamedBytes): boolean {
  return one.file === other.file && one.sha256 === other.sha256;
}

/** Why files must not be written beside a released edition, in a sentence that tells what to do. */
export function harmProblem({ file, edition }: ReleasedThere): string {
  if (edition === null) {
    return `The folder holds ${file}, which cannot be read as a released edition. Press into another folder.`;
  }
  return (
    `The folder holds the released edition ${edition.edition} (${file}), and these files are not its own. Nothing was ` +
    'written: raise the number of the edition, or use another folder.'
  );
}

/** Pressed files that are not what an edition says of them: by name, in the order of the edition, then files it lacks. */
export function filesUnlike({ files }: FrozenEdition, pressed: readonly NamedBytes[]): readonly string[] {
  const names = [...new Set([...files, ...pressed].map(({ file }) => file))];
  const hash = (list: readonly NamedBytes[], name: string): string | undefined =>
    list.find(({ file }) => file === name)?.sha256;
  return names.filter((name) => hash(files, name) !== hash(pressed, name));
}
