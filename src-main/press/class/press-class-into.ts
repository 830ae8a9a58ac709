import type { ClassFile } from '../../../shared-core/class/class-file.ts';
import type { PressedClassFiles, Reply } from '../../../shared-core/desk.ts';
import { namesIn } from '../../project-file/atomic-write.ts';
import type { PressProgress } from '../press-files.ts';
import { named, writePressed } from '../write-pressed.ts';
import { CLASS_CERTIFICATE_FILE, KEY_FILE, pressClass, SLIPS_FILE, type ClassPressChoices } from './press-class.ts';

/** Where the files of a class go, and where the key to its codes; folders are made where they are missing. */
export interface ClassFolders {
  readonly folder: string;
  readonly keyFolder: string;
}

/** Files that not every press of a class makes. */
const SOMETIMES = [SLIPS_FILE, KEY_FILE] as const;

/**
 * Presses a class into a folder. Every file is made and read back before any is written. The key is written first and
 * stands first among the files, so that no codes lie about without it. Where the folder holds slips or a key of an
 * earlier press that would not be replaced, nothing is written: they may show who is who.
 */
export async function pressClassInto(
  file: ClassFile,
  choices: ClassPressChoices,
  { folder, keyFolder }: ClassFolders,
  onProgress?: PressProgress,
): Promise<Reply<PressedClassFiles>> {
  const made = await pressClass(file, choices, onProgress);
  if (!made.ok) return made;
  const { files, key, cells, remarks } = made.value;
  const fresh = [...files, ...(key === null ? [] : [key])].map((one) => one.file);
  const there = await namesIn(folder);
  const stale = SOMETIMES.find((name) => there.includes(name) && !fresh.includes(name));
  if (stale !== undefined) return { ok: false, problem: staleProblem(stale) };
  const problem =
    (key === null ? null : await writePressed([key], keyFolder, null)) ??
    (await writePressed(files, folder, CLASS_CERTIFICATE_FILE));
  if (problem !== null) return { ok: false, problem };
  onProgress?.(1, 'Done');
  return {
    ok: true,
    value: {
      folder,
      files: [...(key === null ? [] : [key]), ...files].map(named),
      keyFile: key === null ? null : KEY_FILE,
      cells,
      remarks,
    },
  };
}

function staleProblem(file: string): string {
  return (
    `The folder holds ${file} of an earlier press, which this one would not replace. Nothing was written: take that ` +
    'file away, or press into another folder.'
  );
}
