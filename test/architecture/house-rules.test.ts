import { describe, expect, it } from 'vitest';
import { ROOT, readText, repositoryFiles } from './source-files.ts';

const ALLOWED_AT_TOP = [
  'package.json',
  'package-lock.json',
  'electron-builder.yml',
  'vite.config.ts',
  'tsconfig.json',
  'README.md',
  'DEVELOPERS.md',
  'LICENSE',
  'eslint.config.js',
];
const ALLOWED_FOLDERS = ['src-main', 'src-renderer', 'shared-core', 'test', 'assets'];
const LONGEST_FILE = 400;

const files = repositoryFiles();
const isText = (path: string): boolean => /\.(ts|mjs|js|svelte|css|html|json|yml|md|svg)$/.test(path);
const isCode = (path: string): boolean => /\.(ts|mjs|js|svelte|css)$/.test(path);
// The lock names where each package comes from; reference values and sample cohorts are data.
const isOwnText = (path: string): boolean =>
  isText(path) && path !== 'package-lock.json' && !path.startsWith('test/reference/');
const texts = files.filter(isOwnText).map((path) => ({ path, text: readText(path) }));

// Written in two halves, so that this file does not break the rule it states.
const word = (...halves: readonly string[]): string => halves.join('');
const OPEN_TASKS = new RegExp(
  `\\b(?:${[word('TO', 'DO'), word('FIX', 'ME'), word('XX', 'X'), word('HA', 'CK')].join('|')})\\b`,
);
/** The folder of this very clone, and homes; `someone` is nobody's home. */
const HOME_PATHS = new RegExp(
  [
    `(?<![\\w/.:-])${ROOT.replace(/[.*+?^${}()|[\]\\]/g, '\\$&')}`,
    word('/ro', 'ot/'),
    word('/(?:ho', 'me|Users)/(?!someone/)[a-z]+/'),
    word('C:\\\\+Us', 'ers'),
  ].join('|'),
);
const REGISTRIES = new RegExp(
  [
    word('registry', '\\.npmjs'),
    word('registry', '\\.yarnpkg'),
    word('npm', 'mirror'),
    word('unpkg', '\\.com'),
    word('jsdelivr', '\\.net'),
  ].join('|'),
);
const SILENCERS = new RegExp(
  [
    word('@ts-', 'ignore'),
    word('@ts-', 'expect-error'),
    word('@ts-', 'nocheck'),
    word('eslint-', 'disable'),
    word('as ', 'any\\b'),
  ].join('|'),
);
const LEFT_OUT_TESTS = new RegExp(
  `\\b(?:it|test|describe)\\.(?:${[word('sk', 'ip'), word('on', 'ly'), word('to', 'do')].join('|')})\\b`,
);

const breaking = (rule: RegExp): readonly string[] =>
  texts.flatMap(({ path, text }) =>
    text
      .split('\n')
      .flatMap((line, index) => (rule.test(line) ? `${path}:${index + 1}: ${line.trim().slice(0, 80)}` : [])),
  );

describe('the repository', () => {
  it('has only known files and folders at its top', () => {
    const strangers = files
      .map((path) => path.split('/'))
      .filter(([top = '', ...rest]) => {
        if (top.startsWith('.')) return false;
        return rest.length === 0 ? !ALLOWED_AT_TOP.includes(top) : !ALLOWED_FOLDERS.includes(top);
      });
    expect(strangers).toEqual([]);
  });

  it('holds no paths of the machine it was written on and no addresses of package registries', () => {
    expect(breaking(HOME_PATHS)).toEqual([]);
    expect(breaking(REGISTRIES)).toEqual([]);
  });

  it('leaves no task open, silences no check and leaves out no test', () => {
    expect(breaking(OPEN_TASKS)).toEqual([]);
    expect(breaking(SILENCERS)).toEqual([]);
    expect(breaking(LEFT_OUT_TESTS)).toEqual([]);
  });

  it('has no file of code that is too long to read', () => {
    const long = texts
      .filter(({ path }) => isCode(path))
      .map(({ path, text }) => ({ path, lines: text.split('\n').length - 1 }))
      .filter(({ lines }) => lines > LONGEST_FILE);
    expect(long).toEqual([]);
  });
});
