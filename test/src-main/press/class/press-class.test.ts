import { describe, expect, it } from 'vitest';
import type { ClassFile } from '../../../../shared-core/class/class-file.ts';
import { printOfClass } from '../../../../shared-core/pages/print-of-class.ts';
import { KEY_FILE } from '../../../../src-main/press/class/press-class.ts';
import { NAMES, SAMPLE_TABLE, sampleFile, spreadScores } from '../../../shared-core/pages/sample-class.ts';
import { readPdf } from '../pdf-text.ts';
import { bytesOf, everythingIn, pressed } from './pressed-class.ts';

const CLASS = sampleFile({
  entries: [...spreadScores(25), 'absent', 'absent', 'excused', 'what?'],
  groups: ['a', 'b'],
});
const codesOf = (file: ClassFile): ClassFile => ({ ...file, sharing: { as: 'codes', seed: 99 } });
const summaryOf = (file: ClassFile): ClassFile => ({ ...file, sharing: { as: 'summary', seed: 99 } });
const standingOf = (file: ClassFile): ClassFile => ({ ...file, table: null, group: null });

/** Parts of names that are long enough to be nothing else. */
const NAME_PARTS = [...new Set(NAMES.flatMap((name) => name.split(' ')).filter((part) => part.length > 3))];

async function namesIn(bytes: Uint8Array): Promise<readonly string[]> {
  const all = await everythingIn(bytes);
  return NAME_PARTS.filter((part) => all.includes(part));
}

describe('pressing a class', () => {
  it('makes report, slips, workbook, csv and certificate, all read back, twice with the same bytes', async () => {
    const first = await pressed(CLASS);
    expect(first.files.map(({ file }) => file)).toEqual([
      'class-report.pdf',
      'slips.pdf',
      'class.xlsx',
      'class.csv',
      'class-certificate.json',
    ]);
    expect(first.key).toBeNull();
    expect(first.remarks).toEqual([]);
    expect(first.cells).toBeGreaterThan(2000);
    const second = await pressed(CLASS);
    second.files.forEach(({ file, bytes }, index) => {
      expect(Buffer.from(bytes).equals(first.files[index]?.bytes ?? new Uint8Array()), file).toBe(true);
    });
    const certificate = JSON.parse(new TextDecoder().decode(bytesOf(first, 'class-certificate.json'))) as {
      readonly 'read-back': { readonly differences: number; readonly files: readonly { readonly file: string }[] };
    };
    expect(certificate['read-back'].differences).toBe(0);
    expect(certificate['read-back'].files).toHaveLength(4);
  });

  it('names no pupil in file names and document properties, even where pages print names', async () => {
    const made = await pressed(CLASS);
    for (const { file } of made.files) for (const part of NAME_PARTS) expect(file).not.toContain(part);
    for (const name of ['class-report.pdf', 'slips.pdf']) {
      const { title, outline, language } = await readPdf(bytesOf(made, name));
      expect(title).toBe(name === 'slips.pdf' ? 'Class 5b · Slips' : 'Class 5b');
      expect(outline).toHaveLength(1);
      for (const part of NAME_PARTS) expect(outline.join(' ')).not.toContain(part);
      expect(language).toBe('en');
    }
    expect(await namesIn(bytesOf(made, 'class-report.pdf'))).not.toEqual([]);
    expect(await namesIn(bytesOf(made, 'class-certificate.json'))).toEqual([]);
  });

  it('holds no name anywhere under codes but in the key, and no seed', async () => {
    const made = await pressed(codesOf(CLASS));
    for (const { file, bytes } of made.files) expect(await namesIn(bytes), file).toEqual([]);
    expect(made.key?.file).toBe(KEY_FILE);
    const key = await namesIn(made.key?.bytes ?? new Uint8Array());
    expect(key.length).toBeGreaterThan(30);
    const csv = new TextDecoder().decode(bytesOf(made, 'class.csv'));
    const codes = [...csv.matchAll(/^([A-Z]\d[A-Z]),/gm)].map(([, code]) => code);
    expect(new Set(codes).size).toBe(29);
    const certificate = new TextDecoder().decode(bytesOf(made, 'class-certificate.json'));
    expect(certificate).not.toContain('seed');
    expect(certificate).not.toContain('key');
  });

  it('holds no pupil in a summary, neither by name nor by result', async () => {
    const answered = sampleFile({ entries: [...spreadScores(25), 'absent', 'absent', 'excused'], groups: ['a', 'b'] });
    const made = await pressed(summaryOf(answered));
    expect(made.files.map(({ file }) => file)).toEqual([
      'class-report.pdf',
      'class.xlsx',
      'class.csv',
      'class-certificate.json',
    ]);
    expect(made.remarks).toEqual(['A summary names nobody, so it has no slips.']);
    const print = printOfClass(answered);
    if (!print.ok || print.value.kind !== 'report') throw new Error('no report');
    for (const { file, bytes } of made.files) {
      expect(await namesIn(bytes), file).toEqual([]);
      expect(await everythingIn(bytes), file).not.toContain(print.value.print.results.check);
    }
  });

  it('puts a class without a table in order within itself, and calls that nothing else', async () => {
    const made = await pressed(standingOf(CLASS));
    expect(made.files.map(({ file }) => file)).not.toContain('slips.pdf');
    const { pages } = await readPdf(bytesOf(made, 'class-report.pdf'));
    const text = pages
      .flat()
      .map(({ text }) => text)
      .join(' ');
    expect(text).toContain('Class standing');
    expect(text).not.toMatch(/percentile|norm|stanine/i);
    expect(text).toContain('1 pupil of 25 is 4.0 points of the last column.');
    const codes = await pressed(codesOf(standingOf(CLASS)));
    for (const { file, bytes } of codes.files) expect(await namesIn(bytes), file).toEqual([]);
  });

  it.each([
    ['nobody', []],
    ['one', [12]],
    ['two', [12, 12]],
    ['all absent', ['absent', 'absent', 'absent']],
    ['all alike', Array.from({ length: 28 }, () => 20)],
  ] as const)('presses a class of %s in every way', async (_, entries) => {
    const file = sampleFile({ entries });
    for (const each of [file, codesOf(file), summaryOf(file), standingOf(file)]) {
      const made = await pressed(each);
      expect(made.files.length).toBeGreaterThan(3);
    }
  });

  it('presses 400 pupils', async () => {
    const file = sampleFile({ entries: spreadScores(400) });
    const made = await pressed({ ...file, slips: { ...file.slips, perPage: 4 } });
    expect(made.cells).toBeGreaterThan(20_000);
  }, 240_000);

  it('keeps what looks like a formula a text in workbook and csv', async () => {
    const names = ['=1+1', '=HYPERLINK("x")', '+2', '-3', '@sum', 'Ann; "B"', '李明'];
    const made = await pressed(sampleFile({ entries: [3, 9, 14, 20, 26, 33, 38], names }));
    const csv = new TextDecoder().decode(bytesOf(made, 'class.csv'));
    expect(csv).toContain("\r\n'=1+1,");
    expect(csv).toContain('\r\n"\'=HYPERLINK(""x"")",');
    const workbook = await everythingIn(bytesOf(made, 'class.xlsx'));
    expect(workbook).not.toMatch(/<f[ >]/);
    expect(made.remarks.join(' ')).toContain('The typefaces have no sign for');
  });

  it('refuses a summary without a table with a sentence', async () => {
    const { pressClass } = await import('../../../../src-main/press/class/press-class.ts');
    const made = await pressClass(summaryOf(standingOf(CLASS)), { slips: false });
    expect(made).toEqual({ ok: false, problem: expect.stringContaining('Choose a table') as string });
  });

  it('makes no summary while a question is open, which would count some of the class alone', async () => {
    const { pressClass } = await import('../../../../src-main/press/class/press-class.ts');
    const asked = sampleFile({ entries: [...spreadScores(20), 99] });
    const made = await pressClass(summaryOf(asked), { slips: false });
    expect(made).toEqual({
      ok: false,
      problem: expect.stringContaining('A row of the list has an open question.') as string,
    });
    expect((await pressClass(asked, { slips: false })).ok).toBe(true);
  });

  it('marks a draft in every file', async () => {
    const made = await pressed(sampleFile({ entries: spreadScores(6) }, { table: { ...SAMPLE_TABLE, draft: true } }));
    const { title } = await readPdf(bytesOf(made, 'slips.pdf'));
    expect(title.startsWith('DRAFT')).toBe(true);
    expect(new TextDecoder().decode(bytesOf(made, 'class.csv'))).toContain(',draft,');
    expect(await everythingIn(bytesOf(made, 'class.xlsx'))).toContain('DRAFT');
  });
});
