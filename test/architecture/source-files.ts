import { execFileSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

export interface SourceFile {
  /** Relative to the repository's root, with forward slashes. */
  readonly path: string;
  readonly text: string;
}

export const ROOT = fileURLToPath(new URL('../../', import.meta.url));

/** Every file of the repository that is kept or would be: known to git, or new and not ignored. */
export const repositoryFiles = (): readonly string[] =>
  execFileSync('git', ['ls-files', '-z', '--cached', '--others', '--exclude-standard'], { cwd: ROOT, encoding: 'utf8' })
    .split('\0')
    .filter((path) => path !== '' && existsSync(`${ROOT}${path}`));

/** The files of some folders that hold code, with their text. */
export const codeFiles = (...folders: readonly string[]): readonly SourceFile[] =>
  repositoryFiles()
    .filter((path) => folders.some((folder) => path.startsWith(`${folder}/`)) && /\.(ts|svelte)$/.test(path))
    .map((path) => ({ path, text: readFileSync(`${ROOT}${path}`, 'utf8') }));

export const readText = (path: string): string => readFileSync(`${ROOT}${path}`, 'utf8');

/** The code of a file without its comments and the contents of its strings, so that only what runs is looked at. */
export const withoutWords = (code: string): string =>
  code
    .replace(/\/\*[\s\S]*?\*\//g, ' ')
    .replace(/'(?:[^'\\\n]|\\.)*'|"(?:[^"\\\n]|\\.)*"/g, "''")
    .replace(/(^|[^:])\/\/[^\n]*/g, '$1');
