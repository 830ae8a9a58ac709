import { describe, expect, it } from 'vitest';
import { PHRASE_KEYS } from '../../shared-core/languages/phrases.ts';
import { codeFiles } from './source-files.ts';

const files = codeFiles('shared-core', 'src-main', 'src-renderer').filter(
  ({ path }) => !/^shared-core\/languages\/(?:english|german|spanish|french)\//.test(path),
);

/** Keys as they stand in the code: in full, or with a part that is put in. */
const quoted = new Set(
  files.flatMap(({ text }) => [...text.matchAll(/'([a-z][a-z-]*(?:\.[\w-]+)*)'/g)].map(([, key]) => key)),
);
const patterns = [
  ...new Set(
    files.flatMap(({ text }) =>
      [...text.matchAll(/`([a-z][a-z-]*\.[\w.-]*\$\{[^`]*)`/g)].map(([, template = '']) => template),
    ),
  ),
].map((template) => new RegExp(`^${template.replaceAll('.', '\\.').replace(/\$\{[^}]*\}/g, '[\\w-]+')}$`));

describe('printed words', () => {
  it('are all said somewhere in the code', () => {
    const said = (key: string): boolean => {
      const stem = key.replace(/:(?:one|many)$/, '');
      return quoted.has(stem) || patterns.some((pattern) => pattern.test(stem));
    };
    expect(PHRASE_KEYS.filter((key) => !said(key))).toEqual([]);
    expect(said('foot.pages')).toBe(false);
  });
});
