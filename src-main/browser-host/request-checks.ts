import type { IncomingMessage } from 'node:http';

/** The names under which this machine may be asked: anything else is a page of another site that found the port. */
function hostsAt(port: number): readonly string[] {
  return [`127.0.0.1:${port}`, `localhost:${port}`];
}

export function comesToThisHost({ headers }: IncomingMessage, port: number): boolean {
  return headers.host !== undefined && hostsAt(port).includes(headers.host);
}

/** Whether the request was made by the program's own page: its origin is exactly the host that was asked. */
export function comesFromOwnPage({ headers }: IncomingMessage): boolean {
  return headers.origin !== undefined && headers.origin === `http://${headers.host}`;
}

export function isJson({ headers }: IncomingMessage): boolean {
  return /^application\/json(; *charset=utf-8)?$/i.test(headers['content-type'] ?? '');
}
