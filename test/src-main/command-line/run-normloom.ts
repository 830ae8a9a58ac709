import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { onTestFinished } from 'vitest';

export const PROGRAM = fileURLToPath(new URL('../../../dist/main/command-line.js', import.meta.url));
export const SAMPLE_COHORT = sample('ostrey-vale-reading.csv');
export const SAMPLE_PROJECT = sample('ostrey-vale.normloom');

export function sample(name: string): string {
  return fileURLToPath(new URL(`../../../assets/sample-cohorts/${name}`, import.meta.url));
}

export function referenceCohort(name: string): string {
  return fileURLToPath(new URL(`../../reference/cohorts/${name}`, import.meta.url));
}

export interface Ran {
  readonly exit: number | null;
  readonly stdout: string;
  readonly stderr: string;
}

/** Runs the built command line to its end. */
export function normloom(words: readonly string[], environment: Readonly<Record<string, string>> = {}): Ran {
  const { status, stdout, stderr } = spawnSync(process.execPath, [PROGRAM, ...words], {
    encoding: 'utf8',
    env: { ...process.env, ...environment },
    maxBuffer: 1e8,
  });
  return { exit: status, stdout, stderr };
}

/** A folder that is gone when the test ends. */
export function folderForTest(): string {
  const folder = mkdtempSync(join(tmpdir(), 'normloom-command-line-'));
  onTestFinished(() => rmSync(folder, { recursive: true, force: true }));
  return folder;
}

/** A file in a folder of its own, gone when the test ends. */
export function fileForTest(name: string, content: string | Uint8Array): string {
  const path = join(folderForTest(), name);
  writeFileSync(path, content);
  return path;
}
