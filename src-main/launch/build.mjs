import { ensurePackages } from './packages.mjs';
import { ensureBuild } from './programs.mjs';

/** @param {string} line */
const say = (line) => process.stderr.write(`${line}\n`);

ensurePackages(say);
await ensureBuild(say, { always: true });
