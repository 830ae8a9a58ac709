import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import { projectToText } from '../../../shared-core/norms/project-text.ts';
import { projectOf } from '../../shared-core/norms/small-projects.ts';
import { fileForTest, folderForTest, normloom, SAMPLE_PROJECT } from './run-normloom.ts';
import { readTables } from './tables-file.ts';

const FILES = ['booklet.pdf', 'tables.xlsx', 'tables.csv', 'norm-set.json', 'certificate.json', 'certificate.pdf'];

/** What `sha256sum` would print of the pressed files. */
function fingerprints(folder: string): string {
  return FILES.map((file) => {
    const sha256 = createHash('sha256')
      .update(readFileSync(join(folder, file)))
      .digest('hex');
    return `${sha256}  ${file}\n`;
  }).join('');
}

describe('press', () => {
  it('writes the files and names each with its SHA-256', () => {
    const folder = join(folderForTest(), 'new', 'folder');
    const ran = normloom(['press', SAMPLE_PROJECT, '--into', folder]);
    expect([ran.exit, ran.stderr]).toEqual([0, '']);
    expect(ran.stdout).toBe(fingerprints(folder));
    expect(readdirSync(folder).toSorted()).toEqual(FILES.toSorted());
    expect(readFileSync(join(folder, 'booklet.pdf')).subarray(0, 5).toString()).toBe('%PDF-');
    const set = readTables(readFileSync(join(folder, 'norm-set.json'), 'utf8'));
    expect(set.groups.map(({ group }) => group)).toEqual(['4', '5', '6'].map((grade) => ({ grade })));
    expect(set.groups.reduce((sum, { n }) => sum + n, 0)).toBe(4812);
  });

  it('writes the same bytes over those before, in any time zone and language', () => {
    const folder = folderForTest();
    const run = (zone: string, language: string) =>
      normloom(['press', SAMPLE_PROJECT, '--into', folder], { TZ: zone, LANG: language, LC_ALL: language });
    const first = run('Pacific/Kiritimati', 'de_DE.UTF-8');
    expect(first.exit).toBe(0);
    expect(run('America/Los_Angeles', 'tr_TR.UTF-8')).toEqual(first);
    expect(readdirSync(folder).toSorted()).toEqual(FILES.toSorted());
    expect(first.stdout).toBe(fingerprints(folder));
  });

  it('presses a small project and tells which queries must still be answered', () => {
    const project = projectOf([1, 2, 3, 0, 4]);
    const path = fileForTest('small.normloom', projectToText(project));
    const ran = normloom(['press', path, '--into', folderForTest()]);
    expect([ran.exit, ran.stdout.split('\n').length]).toEqual([0, 7]);
    expect(ran.stderr).toBe(
      'Still open: Only 10 pupils in All pupils. One alone is worth 10.0 points of percentile rank. ' +
        'Policy: at least 30, or a reason (common practice). ' +
        'Merge groups, gather more data, or say on the sheet how coarse the ranks are.\n',
    );
    const answers = [{ query: 'small-group:[]', reason: 'A class.' }];
    const answered = fileForTest(
      'small.normloom',
      projectToText({ ...project, release: { ...project.release, answers } }),
    );
    expect(normloom(['press', answered, '--into', folderForTest()]).stderr).toBe('');
  });

  it.each<[string, string, string]>([
    ['a project without a tally', projectToText(newProject('Nothing yet')), 'No cohort has been read yet.'],
    ['a file that is no project', '{"a": 1}', 'This is not a Normloom project.'],
    ['half a project', readFileSync(SAMPLE_PROJECT, 'utf8').slice(0, 4000), 'it is not complete JSON'],
    [
      'a newer project',
      readFileSync(SAMPLE_PROJECT, 'utf8').replace(/"version": \d+/, '"version": 9'),
      'saved by a newer Normloom',
    ],
    [
      'an unusable definition',
      projectToText({
        ...projectOf([1, 2]),
        curve: { ...newProject('').curve, definition: { kind: 'grouped', width: 0.3 } },
      }),
      'must be a multiple',
    ],
    [
      'a smoothing that the data cannot carry',
      projectToText({
        ...projectOf([1, 0, 0, 2]),
        curve: { ...newProject('').curve, smoothing: { kind: 'beta-binomial' } },
        precision: newProject('').precision,
      }),
      'cannot be smoothed as chosen',
    ],
  ])('refuses %s', (_, text, problem) => {
    const folder = join(folderForTest(), 'out');
    const ran = normloom(['press', fileForTest('one.normloom', text), '--into', folder]);
    expect([ran.exit, ran.stdout]).toEqual([3, '']);
    expect(ran.stderr).toContain(`normloom: one.normloom: `);
    expect(ran.stderr).toContain(problem);
    expect(existsSync(folder)).toBe(false);
  });

  it('refuses a project that is not there and a folder that is a file', () => {
    const missing = normloom(['press', 'nowhere.normloom', '--into', folderForTest()]);
    expect([missing.exit, missing.stdout]).toEqual([3, '']);
    expect(missing.stderr).toContain('nowhere.normloom could not be read');
    const small = fileForTest('small.normloom', projectToText(projectOf([1, 2, 3, 0, 4])));
    const taken = normloom(['press', small, '--into', fileForTest('taken', 'x')]);
    expect([taken.exit, taken.stdout]).toEqual([3, '']);
    expect(taken.stderr).toMatch(/^normloom: .*could not be written: a file of that name is in the way\. .*\.\n$/m);
  });
});
