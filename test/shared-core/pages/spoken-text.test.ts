import { describe, expect, it } from 'vitest';
import { ENGLISH_WORDS } from '../../../shared-core/languages/phrases.ts';
import { spokenFigure, spokenHead } from '../../../shared-core/pages/spoken-text.ts';

describe('figures read aloud', () => {
  it('say ranges, ends and signs in words', () => {
    for (const [printed, said] of [
      ['23–25', '23 to 25'],
      ['<1', 'below 1'],
      ['>99', 'above 99'],
      ['<1–3', 'below 1 to 3'],
      ['97–>99', '97 to above 99'],
      ['<0.001', 'below 0.001'],
      ['−2', 'minus 2'],
      ['−12.5–−10.0', 'minus 12.5 to minus 10.0'],
      ['–', 'no value'],
      ['12\u202f345', '12345'],
    ] as const) {
      expect(spokenFigure(ENGLISH_WORDS, printed)).toBe(said);
    }
  });

  it('are left as they are where they read well', () => {
    for (const printed of ['', '0', '50', '99.5', 'Mean', 'SD, dividing by n'])
      expect(spokenFigure(ENGLISH_WORDS, printed)).toBeNull();
  });
});

describe('heads read aloud', () => {
  it('have their divided words put together', () => {
    expect(spokenHead(['Sta-', 'nine'])).toBe('Stanine');
    expect(spokenHead(['Measure-', 'ment band'])).toBe('Measurement band');
    expect(spokenHead(['Raw', 'score'])).toBeNull();
    expect(spokenHead(['T'])).toBeNull();
  });
});
