import Papa from 'papaparse';
import { describe, expect, it } from 'vitest';
import { pupilKeyCsv } from '../../../../src-main/press/class/pupil-key-csv.ts';

const read = (bytes: Uint8Array): readonly (readonly string[])[] =>
  Papa.parse<string[]>(new TextDecoder('utf-8', { ignoreBOM: false }).decode(bytes), { skipEmptyLines: true }).data;

describe('the key to codes', () => {
  it('says who has which code, so that spreadsheets show it as text', () => {
    const names = ['Aud Wren', '=1+1', '+SUM(A1)', '-x', '@cmd', '\t=2', 'Fen, "Bo"', 'Å\nÖ'];
    const lines = names.map((name, index) => ({ code: `K${index}`, name, group: index === 0 ? '=7A' : '' }));
    const [heads, ...records] = read(pupilKeyCsv(lines));
    expect(heads).toEqual(['code', 'name', 'group']);
    expect(records.map(([, name]) => name)).toEqual([
      'Aud Wren',
      "'=1+1",
      "'+SUM(A1)",
      "'-x",
      "'@cmd",
      "'\t=2",
      'Fen, "Bo"',
      'Å\nÖ',
    ]);
    expect(records[0]).toEqual(['K0', 'Aud Wren', "'=7A"]);
  });

  it('begins with a byte-order mark and ends lines as RFC 4180 has it', () => {
    const bytes = pupilKeyCsv([{ code: 'K7P', name: 'Aud', group: '' }]);
    expect([...bytes.slice(0, 3)]).toEqual([0xef, 0xbb, 0xbf]);
    expect(new TextDecoder().decode(bytes)).toBe('code,name,group\r\nK7P,Aud,\r\n');
  });
});
