import { describe, expect, it } from 'vitest';
import { fileKey, fromFileKeys, toFileKeys } from '../../../shared-core/norms/file-keys.ts';

describe('keys of files', () => {
  it('turn at every depth, values stay', () => {
    const inCode = { rowsRead: 1, leftOut: [{ sha256: 'aB', deepKey: null }], text: 'rowsRead' };
    const inFile = { 'rows-read': 1, 'left-out': [{ sha256: 'aB', 'deep-key': null }], text: 'rowsRead' };
    expect(toFileKeys(inCode)).toEqual(inFile);
    expect(fromFileKeys(inFile)).toEqual(inCode);
  });

  it('are read one by one too', () => {
    expect(['howToRead', 'sheet', 'sheet.howToRead'].map(fileKey)).toEqual([
      'how-to-read',
      'sheet',
      'sheet.how-to-read',
    ]);
  });

  it('never reach the prototype of an object', () => {
    const read = fromFileKeys(JSON.parse('{"__proto__": {"polluted": true}}'));
    expect(Object.getPrototypeOf(read)).toBe(Object.prototype);
    expect('polluted' in {}).toBe(false);
  });
});
