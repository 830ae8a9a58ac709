import { readFile, realpath } from 'node:fs/promises';
import type { ServerResponse } from 'node:http';
import { isAbsolute, relative } from 'node:path';
import { pageFile } from '../page-file.ts';
import { mediaType } from '../page-policy.ts';
import { send, sendSentence } from './answers.ts';

/** Sends the file of the built page that a path names. A link that leads out of the folder counts as missing. */
export async function sendPageFile(folder: string, path: string, response: ServerResponse): Promise<void> {
  const file = pageFile(folder, path);
  const type = file === null ? null : mediaType(file);
  const body = file === null || type === null ? null : await readInside(folder, file);
  if (body !== null && type !== null) send(response, 200, type, body);
  else sendSentence(response, 404, 'Not here', 'Normloom has no page of this name. Go back to the program.');
}

async function readInside(folder: string, file: string): Promise<Uint8Array | null> {
  try {
    const below = relative(await realpath(folder), await realpath(file));
    if (below.startsWith('..') || isAbsolute(below)) return null;
    return await readFile(file);
  } catch {
    return null;
  }
}
