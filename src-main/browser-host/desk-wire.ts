import type { IncomingMessage, ServerResponse } from 'node:http';
import * as v from 'valibot';
import { DESK_REQUESTS, type Desk, type Reply } from '../../shared-core/desk.ts';
import { refused } from '../desk/reply.ts';
import { MAX_PROJECT_BYTES } from '../project-file/project-store.ts';
import { sendReply } from './answers.ts';
import { isJson } from './request-checks.ts';

/** A request may hold one project of the largest size and a little more. */
const MAX_BODY_BYTES = MAX_PROJECT_BYTES + 1024 * 1024;

const envelope = v.object({ request: v.picklist(DESK_REQUESTS), ask: v.unknown() });

/** Answers POST /desk: body `{request, ask}`, answer the desk's reply. The desk itself checks what is asked. */
export async function answerDesk(desk: Desk, request: IncomingMessage, response: ServerResponse): Promise<void> {
  if (!isJson(request)) {
    sendReply(response, 415, refused('The desk is asked in application/json.'));
    return;
  }
  const body = await readBody(request);
  if (body === null) {
    response.setHeader('connection', 'close');
    sendReply(response, 413, refused('This is more than the desk takes at once. Make the project smaller.'));
    return;
  }
  const parsed = v.safeParse(envelope, parsedOrNull(body));
  if (!parsed.success) {
    sendReply(response, 400, refused('Normloom does not know this request.'));
    return;
  }
  const { request: asked, ask } = parsed.output;
  const wire: { ask(request: string, ask: unknown): Promise<Reply<unknown>> } = desk;
  sendReply(response, 200, await wire.ask(asked, ask));
}

/** The body as text; null when it is larger than allowed. */
async function readBody(request: IncomingMessage): Promise<string | null> {
  if (Number(request.headers['content-length'] ?? 0) > MAX_BODY_BYTES) return null;
  const chunks: Buffer[] = [];
  let bytes = 0;
  for await (const chunk of request as AsyncIterable<Buffer>) {
    bytes += chunk.length;
    if (bytes > MAX_BODY_BYTES) return null;
    chunks.push(chunk);
  }
  return Buffer.concat(chunks).toString('utf8');
}

function parsedOrNull(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}
