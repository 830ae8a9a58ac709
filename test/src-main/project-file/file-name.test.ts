import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cleanFileName, shownFileName } from '../../../src-main/project-file/file-name.ts';

describe('names of files', () => {
  it.each([
    ['Reading survey', 'Reading survey'],
    ['  ..hidden.. ', 'hidden'],
    ['../../etc/passwd', '-..-etc-passwd'],
    ['a\\b:c*d?"<>|', 'a-b-c-d-'],
    ['con', '_con'],
    ['Com1.old', '_Com1.old'],
    ['console', 'console'],
    ['line\nbreak\u0000', 'line-break-'],
    ['Lesen – Frühjahr', 'Lesen – Frühjahr'],
    ['gnp.\u202Eexe', 'gnp.-exe'],
    ['', 'unnamed'],
    ['///', 'unnamed'],
    [' . ', 'unnamed'],
  ])('%j becomes %j', (text, name) => {
    expect(cleanFileName(text, 'unnamed')).toBe(name);
  });

  it('whatever the text, the name is short, not empty and without separators', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 400 }), (text) => {
        const name = cleanFileName(text, 'unnamed');
        expect(name).not.toBe('');
        expect(Buffer.byteLength(name)).toBeLessThanOrEqual(121);
        expect(name).not.toMatch(/[/\\\u0000-\u001f:*?"<>|]/);
        expect(name).not.toMatch(/^[. ]|[. ]$/);
      }),
    );
  });

  it('keeps the name of a handed over file as it was, but for folders and control characters', () => {
    expect(shownFileName('what? "readers": 2.csv', 'x')).toBe('what? "readers": 2.csv');
    expect(shownFileName('/home/someone/readers.csv', 'x')).toBe('readers.csv');
    expect(shownFileName('C:\\fakepath\\readers.csv', 'x')).toBe('readers.csv');
    expect(shownFileName('..', 'x')).toBe('..');
    expect(shownFileName('\u0007', 'x')).toBe('x');
    expect([...shownFileName('ä'.repeat(900), 'x')]).toHaveLength(200);
  });
});
