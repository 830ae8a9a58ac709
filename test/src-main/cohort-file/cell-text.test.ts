import { describe, expect, it } from 'vitest';
import { dateText, isDateFormat, numberText } from '../../../src-main/cohort-file/cell-text.ts';

describe('a cell as text', () => {
  it('is the shortest text of a number', () => {
    expect([12, 0.1, 1e21, -0.5, 4.7].map((value) => numberText(value, '.'))).toEqual([
      '12',
      '0.1',
      '1e+21',
      '-0.5',
      '4.7',
    ]);
    expect(numberText(1234.5, ',')).toBe('1234,5');
  });

  it('is an ISO date, a time, or both', () => {
    const facts = { mark: '.', from1904: false } as const;
    expect(dateText(1, facts)).toBe('1900-01-01');
    expect(dateText(59, facts)).toBe('1900-02-28');
    expect(dateText(61, facts)).toBe('1900-03-01');
    expect(dateText(45_294, facts)).toBe('2024-01-03');
    expect(dateText(45_294.25, facts)).toBe('2024-01-03T06:00:00');
    expect(dateText(45_293.999_999_9, facts)).toBe('2024-01-03');
    expect(dateText(0.5, facts)).toBe('12:00:00');
    expect(dateText(43_832, { ...facts, from1904: true })).toBe('2024-01-03');
    expect(dateText(1e12, facts)).toBe('1000000000000');
  });

  it('is a date only where the format shows one', () => {
    expect(
      ['yyyy-mm-dd', 'm/d/yy', '[h]:mm', 'mmm"/"yy', '[$-409]d-mmm;@', 'h:mm AM/PM'].map(isDateFormat),
    ).not.toContain(false);
    expect(
      ['General', '0.00', '#,##0', '0.0E+00', '@', '"days" 0', '[Red]0', '0\\h', '_d0', '0%'].map(isDateFormat),
    ).not.toContain(true);
  });
});
