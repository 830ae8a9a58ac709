import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdir, mkdtemp, readdir, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { setTimeout as wait } from 'node:timers/promises';
import { build } from 'vite';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Drafts } from '../../../src-main/project-file/drafts.ts';
import { ProjectSaver } from '../../../src-main/project-file/project-saver.ts';
import { readProject } from '../../../src-main/project-file/project-store.ts';
import { tries } from '../../thoroughness.ts';

const KILLS = tries(10, 60);
const here = (path: string): string => fileURLToPath(new URL(path, import.meta.url));

describe('a kill in the midst of saving', () => {
  let folder = '';
  let program = '';

  beforeAll(async () => {
    folder = await mkdtemp(join(tmpdir(), 'normloom-kill-'));
    // Below the repository, so that the built file finds its packages.
    const outDir = here('../../../.cache/saving-child');
    program = join(outDir, 'saving-child.js');
    await build({
      configFile: false,
      logLevel: 'error',
      root: here('../../..'),
      build: { ssr: here('./saving-child.ts'), outDir, emptyOutDir: true, target: 'node20' },
    });
  });
  afterAll(() => rm(folder, { recursive: true, force: true }));

  it(`leaves one of the two projects, whole, after each of ${KILLS} kills`, async () => {
    const data = join(folder, 'data');
    const projects = join(folder, 'projects');
    await mkdir(projects);
    const titles = new Set<string>();
    for (let kill = 0; kill < KILLS; kill += 1) {
      const child = spawn(process.execPath, [program, data, projects], { stdio: ['ignore', 'pipe', 'inherit'] });
      const ended = once(child, 'exit');
      await once(child.stdout, 'data');
      // Spread over a few rounds of the loop, so that the kills fall on every step of a save.
      await wait((kill * 13) % 45);
      child.kill('SIGKILL');
      await ended;
      for (const name of (await readdir(projects)).filter((each) => each.endsWith('.normloom'))) {
        const read = await readProject(join(projects, name));
        if (!read.ok) throw new Error(`${name} after kill ${kill}: ${read.problem}`);
        titles.add(read.project.title);
      }
      const found = await new Drafts(data).list();
      expect(found.problems).toEqual([]);
      expect(found.drafts.map(({ draft }) => draft)).toEqual(['draft-of-the-child']);
    }
    expect([...titles].sort()).toEqual(['First', 'The second one']);

    await new ProjectSaver(data, Date.now).sweep();
    await new Drafts(data).sweep(Date.now() + 60_000);
    expect((await readdir(projects)).filter((name) => !name.endsWith('.normloom'))).toEqual([]);
    expect(await readdir(join(data, 'drafts'))).toEqual(['draft-of-the-child.draft']);
    expect(await readdir(join(data, 'unfinished'))).toEqual([]);
  }, 60_000);
});
