import { spawnSync } from 'node:child_process';
import { ensureBuild } from '../../src-main/launch/programs.mjs';
import { ROOT } from '../../src-main/launch/folders.mjs';
import { ensureTools } from './debian.mjs';
import { packageFile } from './stage.mjs';

/** @param {string} line */
const say = (line) => process.stderr.write(`${line}\n`);

// The tests under Node with many more drawn cases and kills. Words after -- go to the test runner: a file or a folder.
await ensureBuild(say);
ensureTools(say);
const { status } = spawnSync(process.execPath, [packageFile('vitest', 'vitest.mjs'), 'run', ...process.argv.slice(2)], {
  cwd: ROOT,
  env: { ...process.env, NORMLOOM_SOAK: '1' },
  stdio: 'inherit',
});
process.exitCode = status ?? 1;
