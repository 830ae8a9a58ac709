import { ensurePackages } from './packages.mjs';

ensurePackages((line) => process.stderr.write(`${line}\n`));
