import { describe, expect, it } from 'vitest';
import { codeFiles, withoutWords } from './source-files.ts';

/** What would make the same project give other numbers on another day or machine, or tie the core to one host. */
const IMPURE: readonly RegExp[] = [
  /\bDate\s*\.\s*now\b/,
  /\bnew\s+Date\s*\(/,
  /\bMath\s*\.\s*random\b/,
  /\bperformance\b/,
  /\bprocess\b/,
  /(?<![.\w])document\b(?!\s*[?:,}])/,
  /(?<![.\w])window\b(?!\s*[?:,}])/,
  /\bglobalThis\b/,
  /\bcrypto\b/,
  /\bfetch\s*\(/,
  /\bset(?:Timeout|Interval)\b/,
  /\bIntl\b/,
  /\btoLocale\w*/,
];

const impuritiesOf = (code: string): readonly string[] =>
  IMPURE.flatMap((pattern) => pattern.exec(withoutWords(code))?.[0] ?? []);

describe('shared-core', () => {
  it('is looked at without comments and strings, but with everything that runs', () => {
    expect(impuritiesOf('const now = Date.now();')).toEqual(['Date.now']);
    expect(impuritiesOf('const x = window.name + document.title;')).toEqual(['document', 'window']);
    expect(impuritiesOf("// Date.now\n/* process */ const text = 'window document process';")).toEqual([]);
    expect(impuritiesOf("const url = 'https://x'; const y = Math.random();")).toEqual(['Math.random']);
  });

  it('knows no clock, no chance, no host and no locale', () => {
    const files = codeFiles('shared-core');
    expect(files.length).toBeGreaterThan(10);
    const found = files.flatMap(({ path, text }) => impuritiesOf(text).map((what) => `${path}: ${what}`));
    expect(found).toEqual([]);
  });
});
