import { resolve } from 'node:path';
import { parseArgs } from 'node:util';

/** How the program was started. */
export interface StartWords {
  /** A project, class or cohort file to open, absolute; null for none. */
  readonly file: string | null;
  readonly window: boolean;
  /** 0: any free port. */
  readonly port: number;
  /** Folder for new projects, absolute; null for the usual one. */
  readonly folder: string | null;
}

export const USAGE = 'Usage: browser-host [FILE] [--no-window] [--port N] [--folder FOLDER]';

/** Reads the words after the program's name; a sentence when they cannot be understood. */
export function readStartWords(
  words: readonly string[],
  workingFolder: string,
): { readonly ok: true; readonly words: StartWords } | { readonly ok: false; readonly problem: string } {
  let parsed;
  try {
    parsed = parseArgs({
      args: [...words],
      allowPositionals: true,
      options: { 'no-window': { type: 'boolean' }, port: { type: 'string' }, folder: { type: 'string' } },
    });
  } catch (error) {
    return { ok: false, problem: error instanceof Error ? error.message : String(error) };
  }
  const { values, positionals } = parsed;
  if (positionals.length > 1) return { ok: false, problem: 'Only one file can be opened at a time.' };
  const port = values.port ?? '0';
  if (!/^\d{1,5}$/.test(port) || Number(port) > 65_535) {
    return { ok: false, problem: 'A port is a whole number from 1 to 65535, or 0 for any free one.' };
  }
  return {
    ok: true,
    words: {
      file: positionals[0] === undefined ? null : resolve(workingFolder, positionals[0]),
      window: values['no-window'] !== true,
      port: Number(port),
      folder: values.folder === undefined ? null : resolve(workingFolder, values.folder),
    },
  };
}
