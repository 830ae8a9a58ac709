import type { FileHandle, FileKind } from '../../shared-core/desk.ts';
import type { WorkFor } from './work-for.ts';

/**
 * The handle of a file: of the one that the page’s file field or the host gave, or, where there is none, of the one chosen
 * in the host’s dialog. Null when the dialog was closed, or when something failed, which has then been told.
 */
export async function takenFile(
  { wire, fail }: Pick<WorkFor<unknown>, 'wire' | 'fail'>,
  file: File | FileHandle | null,
  kind: FileKind,
): Promise<FileHandle | null> {
  if (typeof file === 'string') return file;
  if (file === null) {
    const chosen = await wire.ask('choose-file', { kind });
    if (chosen.ok) return chosen.value?.handle ?? null;
    fail(chosen.problem);
    return null;
  }
  const received = await wire.receiveFile(file);
  if (received.ok) return received.value;
  fail(received.problem);
  return null;
}
