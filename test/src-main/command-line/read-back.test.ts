import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { fileForTest, normloom, SAMPLE_COHORT, SAMPLE_PROJECT } from './run-normloom.ts';

const FILES = ['booklet.pdf', 'tables.xlsx', 'tables.csv', 'norm-set.json', 'certificate.json', 'certificate.pdf'];

let folder: string;

beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'normloom-read-back-'));
  expect(normloom(['press', SAMPLE_PROJECT, '--into', folder]).exit).toBe(0);
});

afterAll(() => rmSync(folder, { recursive: true, force: true }));

const paths = (): readonly string[] => FILES.map((file) => join(folder, file));

describe('read-back', () => {
  it('finds all pressed files of one mind with their project, whatever they are called', () => {
    const ran = normloom(['read-back', ...paths(), '--against', SAMPLE_PROJECT]);
    expect([ran.exit, ran.stderr]).toEqual([0, '']);
    const lines = ran.stdout.trimEnd().split('\n');
    expect(lines.map((line) => line.split(':')[0])).toEqual(FILES);
    expect(lines.every((line) => /, \d+ cells( and \d+ lines)? compared, no difference$/.test(line))).toBe(true);
    const renamed = fileForTest('old tables', readFileSync(join(folder, 'tables.xlsx')));
    expect(normloom(['read-back', renamed, '--against', SAMPLE_PROJECT]).stdout).toMatch(
      /^old tables: workbook, \d+ cells/,
    );
  });

  it('exits 3 with the cells that differ', () => {
    const csv = readFileSync(join(folder, 'tables.csv'), 'utf8');
    const altered = fileForTest('tables.csv', csv.replace('4,Grade 4,0,', '4,Grade 4,O,'));
    const ran = normloom(['read-back', altered, join(folder, 'booklet.pdf'), '--against', SAMPLE_PROJECT]);
    expect(ran.exit).toBe(3);
    const [first = '', second = ''] = ran.stdout.split('\n');
    expect(first).toBe('tables.csv, line 2: Grade 4, raw score 0, raw-score: expected "0", found "O"');
    expect(second).toMatch(/^booklet\.pdf: booklet, \d+ cells and \d+ lines compared, no difference$/);
    expect(ran.stderr).toBe('normloom: one cell differs from the project.\n');
    const json = normloom(['read-back', altered, '--against', SAMPLE_PROJECT, '--format', 'json']);
    expect(json.exit).toBe(3);
    expect(JSON.parse(json.stdout)).toMatchObject({
      files: [
        {
          file: 'tables.csv',
          kind: 'csv',
          differences: [
            { where: 'line 2', group: 'Grade 4', 'raw-score': '0', column: 'raw-score', expected: '0', found: 'O' },
          ],
        },
      ],
    });
  });

  it('finds the paper of another edition', () => {
    const project = readFileSync(SAMPLE_PROJECT, 'utf8');
    const next = fileForTest('next.normloom', project.replace('"edition": "1.0"', '"edition": "1.1"'));
    const ran = normloom(['read-back', join(folder, 'booklet.pdf'), '--against', next]);
    expect(ran.exit).toBe(3);
    expect(ran.stdout.split('\n').filter((line) => line.includes('check code'))).toHaveLength(3);
    expect(ran.stdout.split('\n').filter((line) => line.includes('Edition 1.0'))).toHaveLength(3);
    expect(ran.stderr).toBe('normloom: 6 cells differ from the project.\n');
  });

  it('tells wrong usage, and files that were never pressed', () => {
    expect(normloom(['read-back', '--against', SAMPLE_PROJECT]).stderr).toContain('at least one pressed file');
    const without = normloom(['read-back', join(folder, 'tables.csv')]);
    expect([without.exit, without.stderr.includes('--against PROJECT')]).toEqual([2, true]);
    expect(normloom(['read-back', 'a', '--against', SAMPLE_PROJECT, '--format', 'csv']).exit).toBe(2);
    const cohort = normloom(['read-back', SAMPLE_COHORT, '--against', SAMPLE_PROJECT]);
    expect([cohort.exit, cohort.stdout]).toEqual([3, '']);
    expect(cohort.stderr).toContain('is no file that Normloom presses');
    const missing = normloom(['read-back', join(folder, 'nothing.pdf'), '--against', SAMPLE_PROJECT]);
    expect([missing.exit, missing.stdout]).toEqual([3, '']);
    expect(missing.stderr).toContain('nothing.pdf could not be read');
    const half = fileForTest('half.pdf', readFileSync(join(folder, 'booklet.pdf')).subarray(0, 3000));
    expect(normloom(['read-back', half, '--against', SAMPLE_PROJECT]).stderr).toContain('half.pdf cannot be opened');
    writeFileSync(join(folder, 'none.normloom'), '{}');
    const none = normloom(['read-back', half, '--against', join(folder, 'none.normloom')]);
    expect([none.exit, none.stderr]).toEqual([
      3,
      expect.stringContaining('none.normloom: This is not a Normloom project.'),
    ]);
  });
});
