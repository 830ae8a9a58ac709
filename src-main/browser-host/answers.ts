import type { ServerResponse } from 'node:http';
import type { Reply } from '../../shared-core/desk.ts';
import { PAGE_HEADERS } from '../page-policy.ts';

const ALWAYS: Readonly<Record<string, string>> = { ...PAGE_HEADERS, 'cache-control': 'no-store' };

/** Sends a body with the headers that go with every answer of the browser host. */
export function send(
  response: ServerResponse,
  status: number,
  type: string,
  body: string | Uint8Array,
  more: Readonly<Record<string, string>> = {},
): void {
  const bytes = Buffer.from(body);
  response.writeHead(status, { ...ALWAYS, 'content-type': type, 'content-length': bytes.length, ...more });
  response.end(response.req.method === 'HEAD' ? undefined : bytes);
}

export function sendReply(response: ServerResponse, status: number, reply: Reply<unknown>): void {
  send(response, status, 'application/json; charset=utf-8', JSON.stringify(reply));
}

/** Sends a page of one heading and one sentence, both plain text of the program's own. */
export function sendSentence(
  response: ServerResponse,
  status: number,
  heading: string,
  sentence: string,
  more: Readonly<Record<string, string>> = {},
): void {
  const page = `<!doctype html>
<html lang="en">
<head><meta charset="utf-8"><title>Normloom</title></head>
<body><h1>${heading}</h1><p>${sentence}</p></body>
</html>
`;
  send(response, status, 'text/html; charset=utf-8', page, more);
}
