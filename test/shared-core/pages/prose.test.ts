import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { breakLines, firstLines } from '../../../shared-core/pages/prose.ts';
import { textWidth } from '../../../shared-core/pages/text-width.ts';

const asTexts = (text: string, width: number): readonly string[] =>
  breakLines([{ text, face: 'sans' }], 10, width).map((line) => line.map((run) => run.text).join(''));

describe('lines of prose', () => {
  it('end at spaces, behind hyphens, and where the user pressed Enter', () => {
    expect(asTexts('one two three', 35)).toEqual(['one two', 'three']);
    expect(asTexts('half-hearted', 40)).toEqual(['half-', 'hearted']);
    expect(asTexts('one\n\ntwo', 100)).toEqual(['one', 'two']);
    expect(asTexts('4–22 May', 30)).toEqual(['4–22', 'May']);
    expect(asTexts('at 95 %', 25)).toEqual(['at', '95 %']);
    expect(asTexts('', 100)).toEqual([]);
  });

  it('hold every letter and are never wider than asked', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme', maxLength: 200 }), fc.integer({ min: 12, max: 300 }), (text, width) => {
        const lines = asTexts(text, width);
        const plain = (part: string): string => part.replace(/\p{Cc}|\s/gu, '');
        expect(plain(lines.join(''))).toBe(plain(text));
        for (const line of lines) {
          const wide = textWidth(line, 'sans', 10);
          expect(wide <= width + 1e-9 || [...line].length === 1).toBe(true);
        }
      }),
    );
  });

  it('carry a bold lead into the same line', () => {
    const lines = breakLines(
      [
        { text: 'Method. ', face: 'sans-bold' },
        { text: 'Ranks are exact.', face: 'sans' },
      ],
      10,
      300,
    );
    expect(lines).toEqual([
      [
        { text: 'Method. ', face: 'sans-bold' },
        { text: 'Ranks are exact.', face: 'sans' },
      ],
    ]);
  });

  it('close with an ellipsis where text had to go', () => {
    const first = firstLines([{ text: 'one two three four five six', face: 'sans' }], 10, 40, 2);
    expect(first.cut).toBe(true);
    expect(first.lines.map((line) => line.map((run) => run.text).join(''))).toEqual(['one two', 'three…']);
    expect(textWidth('three…', 'sans', 10)).toBeLessThanOrEqual(40);
  });
});
