import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll } from 'vitest';
import type { CohortPreview, TalliedCohort } from '../../../shared-core/desk.ts';
import type { Reading } from '../../../shared-core/norms/reading.ts';
import { lookAtCohort } from '../../../src-main/cohort-file/look-at-cohort.ts';
import { tallyCohort } from '../../../src-main/cohort-file/tally-cohort.ts';

/** A folder for the files of one test file, removed at its end. */
export function cohortFolder(): {
  write(name: string, content: string | Uint8Array): Promise<string>;
  path(name: string): string;
} {
  const made = mkdtemp(join(tmpdir(), 'normloom-cohort-'));
  let folder = '';
  afterAll(async () => rm(await made, { recursive: true, force: true }));
  return {
    async write(name, content) {
      folder = await made;
      const path = join(folder, name);
      await writeFile(path, content);
      return path;
    },
    path: (name) => join(folder, name),
  };
}

export async function look(path: string, reading: Reading | null = null): Promise<CohortPreview> {
  const seen = await lookAtCohort(path, 'cohort', reading);
  if (!seen.ok) throw new Error(seen.problem);
  return seen.value;
}

export async function lookProblem(path: string, reading: Reading | null = null): Promise<string> {
  const seen = await lookAtCohort(path, 'cohort', reading);
  return seen.ok ? 'no problem' : seen.problem;
}

const still = { onProgress: () => undefined, signal: new AbortController().signal };

export async function tally(path: string, reading: Reading, filterBits?: number): Promise<TalliedCohort> {
  const tallied = await tallyCohort(path, 'cohort', reading, still, filterBits);
  if (!tallied.ok) throw new Error(tallied.problem);
  return tallied.value;
}

export async function tallyProblem(path: string, reading: Reading): Promise<string> {
  const tallied = await tallyCohort(path, 'cohort', reading, still);
  return tallied.ok ? 'no problem' : tallied.problem;
}

/** The flow as "rule: rows", for short comparisons. */
export function leftOut({ source }: TalliedCohort): Readonly<Record<string, readonly number[]>> {
  return Object.fromEntries(source.leftOut.map(({ rule, rows }) => [rule, rows]));
}
