import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { missingCharacters, textWidth } from '../../../shared-core/pages/text-width.ts';

const path = (relative: string): string => fileURLToPath(new URL(relative, import.meta.url));

describe('text widths', () => {
  it('are those of the font files', () => {
    const measured = execFileSync(process.execPath, [path('./measure-fonts.mjs')], { encoding: 'utf8' });
    expect(readFileSync(path('../../../shared-core/pages/font-widths.ts'), 'utf8')).toBe(measured);
  });

  it('are the same for every figure, for the minus sign and for < and >', () => {
    const widths = new Set([...'0123456789−<>'].map((figure) => textWidth(figure, 'sans', 10)));
    expect([...widths]).toEqual([4.97]);
  });

  it('know Greek and Cyrillic, and what is missing', () => {
    expect(missingCharacters('Класс Ωμέγα – 5\u202f000', 'sans')).toEqual([]);
    expect(missingCharacters('5 年年 א', 'serif-bold')).toEqual(['年', 'א']);
  });
});
