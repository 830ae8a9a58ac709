import { chdir } from 'node:process';
import { pathToFileURL } from 'node:url';
import { USER_FOLDER, inRoot } from './folders.mjs';
import { ensurePackages } from './packages.mjs';
import { ensureBuild } from './programs.mjs';

/** stdout is for the result alone. @param {string} line */
const say = (line) => process.stderr.write(`${line}\n`);

ensurePackages(say);
await ensureBuild(say);

const program = inRoot('dist', 'main', 'command-line.js');
process.argv[1] = program;
chdir(USER_FOLDER);
await import(pathToFileURL(program).href);
