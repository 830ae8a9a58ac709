import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The repository's root folder. */
export const ROOT = fileURLToPath(new URL('../../', import.meta.url));

/** @param {...string} parts */
export const inRoot = (...parts) => join(ROOT, ...parts);

/** Folder the user typed the command in; npm itself always runs scripts in the root folder. */
export const USER_FOLDER = process.env.INIT_CWD ?? process.cwd();

/** Text of a stamp file, or null when there is none. @param {string} file */
export const readStamp = (file) => (existsSync(file) ? readFileSync(file, 'utf8').trim() : null);

/** @param {string} file @param {string} text */
export const writeStamp = (file, text) => {
  mkdirSync(dirname(file), { recursive: true });
  writeFileSync(file, `${text}\n`);
};
