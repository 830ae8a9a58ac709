import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { pairedPages } from '../../../../src-main/press/read-back/paired-pages.ts';

const page = fc.constantFrom('a', 'b', 'c', 'd', 'e');
const pages = fc.array(page, { maxLength: 9 });

describe('pairedPages', () => {
  it('pairs as many pages as there should be by their places', () => {
    expect(pairedPages(['a', 'b'], ['b', 'a'])).toEqual([
      { expected: 0, found: 0 },
      { expected: 1, found: 1 },
    ]);
  });

  it('finds the page that is missing, the one too many, and the one that changed beside it', () => {
    expect(pairedPages(['a', 'b', 'c'], ['a', 'c'])).toEqual([
      { expected: 0, found: 0 },
      { expected: 1, found: null },
      { expected: 2, found: 1 },
    ]);
    expect(pairedPages(['a', 'b'], ['a', 'b', 'b'])).toEqual([
      { expected: 0, found: 0 },
      { expected: 1, found: 1 },
      { expected: null, found: 2 },
    ]);
    expect(pairedPages(['a', 'b', 'c', 'd'], ['x', 'b', 'd'])).toEqual([
      { expected: 0, found: 0 },
      { expected: 1, found: 1 },
      { expected: 2, found: null },
      { expected: 3, found: 2 },
    ]);
  });

  it('holds every page once and in order, and pairs all that are left of a booklet', () => {
    fc.assert(
      fc.property(pages, pages, (expected, found) => {
        const pairs = pairedPages(expected, found);
        expect(pairs.flatMap((pair) => (pair.expected === null ? [] : [pair.expected]))).toEqual([...expected.keys()]);
        expect(pairs.flatMap((pair) => (pair.found === null ? [] : [pair.found]))).toEqual([...found.keys()]);
      }),
    );
    fc.assert(
      fc.property(
        fc.uniqueArray(fc.nat(99).map(String), { minLength: 1, maxLength: 12 }),
        fc.nat(),
        (expected, which) => {
          const lost = which % expected.length;
          const pairs = pairedPages(expected, expected.toSpliced(lost, 1));
          expect(pairs.filter((pair) => pair.found === null)).toEqual([{ expected: lost, found: null }]);
          expect(pairs.filter((pair) => pair.expected === null)).toEqual([]);
        },
      ),
    );
  });
});
