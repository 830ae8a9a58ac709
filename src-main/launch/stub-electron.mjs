import { chmodSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { inRoot } from './folders.mjs';

const SCRIPT = `#!/bin/sh
echo 'This package was made on a machine without Electron; it holds the program, but no window to show it in.' >&2
exit 1
`;

/** Version of the electron package. */
export const electronVersion = () =>
  JSON.parse(readFileSync(inRoot('node_modules', 'electron', 'package.json'), 'utf8')).version;

/** A folder that stands in for the Electron program, so that packing can be tried without it. */
export const makeStubElectron = () => {
  const folder = inRoot('.cache', 'stub-electron');
  rmSync(folder, { recursive: true, force: true });
  mkdirSync(folder, { recursive: true });
  const program = join(folder, 'electron');
  writeFileSync(program, SCRIPT);
  chmodSync(program, 0o755);
  writeFileSync(join(folder, 'version'), electronVersion());
  return folder;
};
