import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { distinctTitles, sheetNames } from '../../../src-main/press/sheet-names.ts';

describe('sheet names', () => {
  it('hold nothing that a workbook forbids or takes for a formula', () => {
    expect(sheetNames(['=1+1', "'quoted'", 'a/b:c', '', 'History', "O'Brien"], ['Look-up'])).toEqual([
      '1+1',
      'quoted',
      'a b c',
      'Table 4',
      'History (2)',
      'O\u2019Brien',
    ]);
  });

  it('are distinct and short, whatever the titles', () => {
    fc.assert(
      fc.property(fc.array(fc.string({ unit: 'grapheme', maxLength: 60 }), { maxLength: 12 }), (titles) => {
        const names = sheetNames(titles, ['About']);
        expect(new Set(['about', ...names.map((name) => name.toLowerCase())]).size).toBe(titles.length + 1);
        for (const name of names) {
          expect(name.length).toBeLessThanOrEqual(31);
          expect(name).toMatch(/^[^=+\-@'\s[\]:*?/\\][^'[\]:*?/\\]*$/u);
          expect(name).not.toMatch(/'$/);
        }
      }),
    );
  });

  it('number titles that stand twice', () => {
    expect(distinctTitles(['Grade 4', 'grade 4', 'Grade 5'])).toEqual(['Grade 4', 'grade 4 (2)', 'Grade 5']);
  });
});
