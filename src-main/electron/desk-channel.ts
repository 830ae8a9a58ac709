import { isAbsolute } from 'node:path';
import { ipcMain } from 'electron';
import { DESK_REQUESTS } from '../../shared-core/desk.ts';
import type { DeskRequest, FileHandle, Reply } from '../../shared-core/desk.ts';
import type { DeskHost } from '../desk.ts';
import { DESK_CHANNEL } from './bridge.ts';
import type { DeskMessage } from './bridge.ts';
import { isOwnPage } from './security.ts';

const isRecord = (value: unknown): value is Readonly<Record<string, unknown>> =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

const isDeskRequest = (name: string): name is DeskRequest => DESK_REQUESTS.some((request) => request === name);

/** The message, if it has one of the two known forms; null for anything else. */
const readMessage = (message: unknown): DeskMessage | null => {
  if (!isRecord(message)) return null;
  if (message['kind'] === 'file' && typeof message['path'] === 'string') {
    return { kind: 'file', path: message['path'] };
  }
  if (message['kind'] === 'ask' && typeof message['request'] === 'string') {
    return { kind: 'ask', request: message['request'], ask: message['ask'] };
  }
  return null;
};

const refusal = (problem: string): Reply<never> => ({ ok: false, problem });

/**
 * Answers the page's requests and hands out handles for files dropped on it. Anything not sent by the program's own page
 * is refused by throwing, so that it learns nothing. `received` hears the path of each file that got a handle.
 */
export const answerDesk = (desk: DeskHost, received: (path: string) => void): void => {
  ipcMain.handle(DESK_CHANNEL, (event, message: unknown): Promise<Reply<unknown>> | Reply<FileHandle> => {
    if (!isOwnPage(event)) throw new Error('The desk answers only the page of this program.');
    const read = readMessage(message);
    if (read === null) return refusal('The page sent a message that the desk does not know. Restart the program.');
    switch (read.kind) {
      case 'file': {
        if (!isAbsolute(read.path)) return refusal('The file has no full path. Choose it with Open instead.');
        const handle = desk.giveHandle(read.path);
        received(read.path);
        return { ok: true, value: handle };
      }
      case 'ask': {
        if (!isDeskRequest(read.request) || !isRecord(read.ask)) {
          return refusal(`The desk does not know the request “${read.request}”. Restart the program.`);
        }
        // The desk checks the fields of what it is asked; the wire only knows that it is an object.
        return desk.ask(read.request, read.ask);
      }
    }
  });
};
