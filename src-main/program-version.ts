import { existsSync, readFileSync } from 'node:fs';

/** Seen from the sources, and from the folder of built programs. */
const PLACES = ['../package.json', '../../package.json'] as const;

/** The version of the program, from its package.json. */
export function programVersion(): string {
  const place = PLACES.map((path) => new URL(path, import.meta.url)).find((url) => existsSync(url));
  const about: unknown = place === undefined ? null : JSON.parse(readFileSync(place, 'utf8'));
  const version = typeof about === 'object' && about !== null && 'version' in about ? about.version : null;
  if (typeof version !== 'string') throw new Error('package.json names no version');
  return version;
}

/** How the program names itself in the PDFs that it makes: "Normloom 1.2.0". */
export function producerName(version: string): string {
  return `Normloom ${version}`;
}
