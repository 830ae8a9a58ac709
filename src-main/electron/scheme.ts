import { readFile } from 'node:fs/promises';
import { protocol } from 'electron';
import { PAGE_HEADERS, mediaType } from '../page-policy.ts';
import { pageFile } from '../page-file.ts';

export const SCHEME = 'normloom';
const HOST = 'app';
export const PAGE_ADDRESS = `${SCHEME}://${HOST}/`;

/** True for addresses of the program's own page and its files. */
export const isOwnAddress = (address: string): boolean => {
  if (!URL.canParse(address)) return false;
  const url = new URL(address);
  return url.protocol === `${SCHEME}:` && url.host === HOST;
};

/** Must run before the app is ready: makes the scheme an origin of its own, as secure as https. */
export const registerScheme = (): void => {
  protocol.registerSchemesAsPrivileged([
    { scheme: SCHEME, privileges: { standard: true, secure: true, supportFetchAPI: true } },
  ]);
};

const refuse = (status: number): Response => new Response(null, { status, headers: PAGE_HEADERS });

/** Serves the files of `folder` (the built page) under the own scheme, each with the content policy; nothing else. */
export const serveFolder = (folder: string): void => {
  protocol.handle(SCHEME, async (request) => {
    if (request.method !== 'GET') return refuse(405);
    if (!isOwnAddress(request.url)) return refuse(404);
    const file = pageFile(folder, new URL(request.url).pathname);
    const type = file === null ? null : mediaType(file);
    if (file === null || type === null) return refuse(404);
    try {
      return new Response(await readFile(file), { headers: { ...PAGE_HEADERS, 'content-type': type } });
    } catch {
      return refuse(404);
    }
  });
};
