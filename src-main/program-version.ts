import { readFileSync } from 'node:fs';

/** The version of the program, from the package.json above the folder of built programs. */
export function programVersion(): string {
  const about: unknown = JSON.parse(readFileSync(new URL('../../package.json', import.meta.url), 'utf8'));
  const version = typeof about === 'object' && about !== null && 'version' in about ? about.version : null;
  if (typeof version !== 'string') throw new Error('package.json names no version');
  return version;
}
