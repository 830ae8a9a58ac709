import { read, utils, write, type BookType } from '@e965/xlsx';
import JSZip from 'jszip';
import { mkdir } from 'node:fs/promises';
import { describe, expect, it } from 'vitest';
import { knowFile } from '../../../src-main/cohort-file/file-kind.ts';
import { cohortFolder, lookProblem } from './cohorts-at-hand.ts';

const folder = cohortFolder();

function zipWith(...names: readonly string[]): Promise<Uint8Array> {
  const zip = new JSZip();
  for (const name of names) zip.file(name, 'x');
  return zip.generateAsync({ type: 'uint8array' });
}

function workbook(bookType: BookType): Uint8Array {
  const book = { SheetNames: ['S'], Sheets: { S: utils.aoa_to_sheet([['score'], [5]]) } };
  return new Uint8Array(write(book, { type: 'buffer', bookType }) as Buffer);
}

describe('the kind of a file', () => {
  it('is told by what is in it, not by its name', async () => {
    const kind = async (content: string | Uint8Array): Promise<string> => {
      const known = await knowFile(await folder.write('any.dat', content), 'any.dat');
      return known.ok ? known.value.kind : known.problem;
    };
    expect(await kind('score\n5\n')).toBe('text');
    expect(await kind(workbook('xlsx'))).toBe('xlsx');
    expect(await kind(workbook('ods'))).toBe('whole-workbook');
    expect(await kind(workbook('biff8'))).toBe('whole-workbook');
    expect(await kind(workbook('xlsb'))).toBe('whole-workbook');
  });

  it.each([
    ['a PDF', '%PDF-1.7\n', /is a PDF.*Save the scores as csv or xlsx/],
    ['SPSS', '$FL2@(#) SPSS DATA FILE', /SPSS data file.*csv or xlsx/],
    ['a web page', '<html><table><tr><td>5', /web page.*csv or xlsx/],
    ['gzip', Buffer.from([0x1f, 0x8b, 8, 0, 0, 0, 0, 0]), /compressed file/],
    ['a picture', Buffer.from([0x89, 0x50, 0x4e, 0x47, 13, 10, 26, 10, 0]), /picture/],
    ['junk', Buffer.from(Array.from({ length: 4000 }, (_, index) => (index * 7919) % 256)), /not a text or a workbook/],
    ['nothing', '', /is empty/],
    ['blanks', '\n \n,,\n', /nothing in the file/],
  ])('%s is refused with the way out', async (name, content, sentence) => {
    expect(await lookProblem(await folder.write(`${name}.csv`, content))).toMatch(sentence);
  });

  it('documents, locked workbooks and compressed folders are refused', async () => {
    const problem = async (content: string | Uint8Array): Promise<string> =>
      lookProblem(await folder.write('any.xlsx', content));
    expect(await problem(await zipWith('[Content_Types].xml', 'word/document.xml'))).toMatch(
      /document or a presentation/,
    );
    expect(await problem(await zipWith('scores.csv'))).toMatch(/compressed folder. Unpack it/);
    const compound = (name: string): Buffer =>
      Buffer.concat([
        Buffer.from([0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1]),
        Buffer.alloc(1000),
        Buffer.from(name, 'utf16le'),
      ]);
    expect(await problem(compound('EncryptedPackage'))).toMatch(/locked with a password/);
    expect(await problem(compound('WordDocument'))).toMatch(/document or a presentation/);
    expect(await problem(compound('Nothing known'))).toMatch(/damaged/);
    expect(await problem(workbook('xlsx').subarray(0, 900))).toMatch(/its end is missing.* Copy it once more/);
  });

  it('folders and missing files are refused', async () => {
    await folder.write('some.csv', 'x');
    await mkdir(folder.path('a-folder'));
    expect(await lookProblem(folder.path('a-folder'))).toMatch(/is a folder/);
    expect(await lookProblem(folder.path('gone.csv'))).toMatch(/not there any more/);
  });

  it('the fixtures are what they are taken for', () => {
    expect(read(workbook('ods')).SheetNames).toEqual(['S']);
  });
});
