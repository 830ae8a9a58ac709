import { posix } from 'node:path';
import { describe, expect, it } from 'vitest';
import { codeFiles } from './source-files.ts';
import type { SourceFile } from './source-files.ts';

interface Rule {
  /** Packages by name; `@stdlib/*` stands for all of a scope, `node:*` for the built-ins. */
  readonly packages: readonly string[];
  /** Folders whose files may be imported, beside the file's own. */
  readonly folders: readonly string[];
}

const CORE: Rule = { packages: ['valibot', '@noble/hashes', '@stdlib/*'], folders: ['shared-core'] };
const PAGE: Rule = {
  packages: ['svelte', 'chart.js', 'pdfjs-dist'],
  folders: ['shared-core', 'src-renderer', 'assets'],
};

const host = (packages: readonly string[], folders: readonly string[]): Rule => ({
  packages: ['node:*', ...packages],
  folders: ['shared-core', ...folders],
});

/** The first folder that a file lies in decides; the rooms of src-main stand before src-main itself. */
const RULES: readonly (readonly [string, Rule])[] = [
  ['shared-core', CORE],
  ['src-main/cohort-file', host(['papaparse', '@e965/xlsx', 'jszip'], [])],
  [
    'src-main/press',
    host(
      [
        'pdfmake',
        'pdfjs-dist',
        'exceljs',
        'jszip',
        'papaparse',
        'write-file-atomic',
        'valibot',
        '@expo-google-fonts/*',
      ],
      ['src-main/project-file', 'src-main/program-version.ts', 'src-main/thread-job.ts'],
    ),
  ],
  ['src-main/project-file', host(['write-file-atomic', 'valibot'], [])],
  ['src-main/electron', host(['electron'], ['src-main'])],
  ['src-main/browser-host', host(['valibot'], ['src-main'])],
  ['src-main/command-line', host(['papaparse'], ['src-main'])],
  ['src-main', host(['valibot'], ['src-main'])],
  ['src-renderer', PAGE],
];

/** Files of src-main that a room may import although they lie in another: none of the hosts. */
const HOSTS = ['src-main/electron', 'src-main/browser-host', 'src-main/command-line'];

const IMPORT =
  /(?:^|[\s;}])(?:import|export)\s+(?:[\w*{}\s,$]+?\s+from\s+)?['"]([^'"\n]+)['"]|\bimport\(\s*['"]([^'"\n]+)['"]/g;

const importsOf = ({ text }: SourceFile): readonly string[] =>
  [...text.matchAll(IMPORT)].map((found) => found[1] ?? found[2] ?? '').map((name) => name.replace(/\?.*$/, ''));

const isInside = (path: string, folder: string): boolean => path === folder || path.startsWith(`${folder}/`);

const mayUse = (rule: Rule, name: string): boolean =>
  rule.packages.some((allowed) =>
    allowed.endsWith('*') ? name.startsWith(allowed.slice(0, -1)) : name === allowed || name.startsWith(`${allowed}/`),
  );

/** What is wrong with one import, or null. */
const problemOf = (file: string, name: string): string | null => {
  const [room, rule] = RULES.find(([folder]) => isInside(file, folder)) ?? [];
  if (room === undefined || rule === undefined) return `${file} lies in no room of the table`;
  if (!name.startsWith('.')) return mayUse(rule, name) ? null : `${file} must not import the package ${name}`;
  const target = posix.join(posix.dirname(file), name);
  if (!/\.\w+$/.test(target)) return `${file} imports ${name} without its ending`;
  const own = isInside(target, room);
  const allowed = own || rule.folders.some((folder) => isInside(target, folder));
  if (!allowed) return `${file} must not import ${target}`;
  const intoHost = HOSTS.some((folder) => isInside(target, folder) && !isInside(file, folder));
  return intoHost ? `${file} must not import ${target}: nothing imports a host` : null;
};

describe('imports', () => {
  const files = codeFiles('shared-core', 'src-main', 'src-renderer');

  it('are found in every form they are written in', () => {
    const text = [
      "import { a } from './a.ts';",
      'import type { B } from "../b.ts";',
      "import './c.css';",
      "import d, { type E } from 'd';",
      "import * as f from 'f';",
      "export { g } from './g.ts';",
      'import {\n  h,\n  i,\n} from "h/i";',
      "const j = await import('./j.ts');",
      "import url from './k.ts?worker&url';",
      "export * from './l.ts';",
    ].join('\n');
    expect(importsOf({ path: 'x.ts', text })).toEqual([
      './a.ts',
      '../b.ts',
      './c.css',
      'd',
      'f',
      './g.ts',
      'h/i',
      './j.ts',
      './k.ts',
      './l.ts',
    ]);
  });

  it('are refused by the table where they should be', () => {
    expect(problemOf('shared-core/norms/a.ts', 'node:fs')).toContain('node:fs');
    expect(problemOf('shared-core/norms/a.ts', '../../src-main/desk.ts')).toContain('src-main/desk.ts');
    expect(problemOf('src-renderer/desk/a.ts', '../../src-main/desk.ts')).toContain('src-main/desk.ts');
    expect(problemOf('src-renderer/desk/a.ts', 'electron')).toContain('electron');
    expect(problemOf('src-main/desk.ts', 'electron')).toContain('electron');
    expect(problemOf('src-main/press/a.ts', '../cohort-file/b.ts')).toContain('cohort-file');
    expect(problemOf('src-main/desk.ts', './electron/menu.ts')).toContain('host');
    expect(problemOf('src-main/electron/a.ts', 'electron')).toBeNull();
    expect(problemOf('src-main/desk.ts', './press/press-job')).toContain('ending');
  });

  it('keep to the table in every file', () => {
    expect(files.length).toBeGreaterThan(20);
    const problems = files.flatMap((file) => importsOf(file).flatMap((name) => problemOf(file.path, name) ?? []));
    expect(problems).toEqual([]);
  });

  it('of the second engine take nothing but types from the first, and the words that it prints', () => {
    const own = files.filter(({ path }) => isInside(path, 'shared-core/second-engine'));
    expect(own.length).toBeGreaterThan(3);
    const values = own.flatMap(({ path, text }) =>
      [...text.matchAll(/^import (?!type )[^;]*from '([^']+)';/gm)].flatMap(([, name = '']) =>
        name.startsWith('./') || name.startsWith('../languages/') ? [] : [`${path} imports ${name}`],
      ),
    );
    expect(values).toEqual([]);
  });

  it('of electron stand only in its host and the tests of it', () => {
    const importers = [...files, ...codeFiles('test')]
      .filter((file) => importsOf(file).includes('electron'))
      .map((file) => file.path)
      .filter((path) => !isInside(path, 'src-main/electron') && !isInside(path, 'test/src-main/electron'));
    // This file shows the word in its own examples, not in an import.
    expect(importers).toEqual([]);
  });
});
