import { describe, expect, it } from 'vitest';
import { projectToText } from '../../../shared-core/norms/project-text.ts';
import { projectOf, settledProject } from '../../shared-core/norms/small-projects.ts';
import { fileForTest, normloom, SAMPLE_PROJECT } from './run-normloom.ts';

const settled = settledProject();
const bare = { ...settled, sheet: { ...settled.sheet, cautions: '' }, release: { ...settled.release, date: '' } };

describe('queries', () => {
  it('lists them with why and what to do, most pressing first, and tells how many are open', () => {
    const ran = normloom(['queries', fileForTest('bare.normloom', projectToText(bare))]);
    expect(ran).toEqual({
      exit: 0,
      stdout:
        'must  sheet  no-cautions\n' +
        '  The cautions are gone. A table without them is read as per cent correct, averaged, and used alone. ' +
        'Put cautions back, or give the reason for printing none.\n' +
        '\n' +
        'should  release  edition-date\n' +
        '  The edition has no date. A reader cannot tell how old the table is. Give the date of the edition.\n',
      stderr: '2 queries are open; while 1 of them must be answered, the edition is a draft.\n',
    });
  });

  it('keeps the reasons that were given', () => {
    const answers = [{ query: 'no-cautions', reason: 'On the cover.' }];
    const answered = { ...bare, release: { ...bare.release, date: '2026-06-15', answers } };
    const ran = normloom(['queries', fileForTest('one.normloom', projectToText(answered))]);
    expect(ran.stdout).toMatch(/^must {2}sheet {2}no-cautions\n.*\n {2}Answered: On the cover\.\n$/);
    expect([ran.exit, ran.stderr]).toEqual([0, 'No query is open.\n']);
  });

  it('gives them as JSON, each with its group', () => {
    const project = { ...settled, policy: { ...settled.policy, smallestShould: { value: 500, source: 'Rules' } } };
    const ran = normloom(['queries', fileForTest('one.normloom', projectToText(project)), '--format', 'json']);
    const list = JSON.parse(ran.stdout);
    expect(list).toHaveLength(2);
    expect(Object.keys(list[0])).toEqual(['id', 'station', 'weight', 'group', 'lead', 'why', 'what-to-do', 'answer']);
    expect(list[1]).toMatchObject({ id: 'small-group:["10"]', weight: 'should', group: { grade: '10' }, answer: null });
    expect(list[1].why).toContain('Policy: at least 500 (Rules).');
    expect([ran.exit, ran.stderr]).toEqual([0, '2 queries are open.\n']);
    expect(normloom(['queries', fileForTest('s.normloom', projectToText(settled)), '--format', 'json']).stdout).toBe(
      '[]\n',
    );
  });

  it('asks only for signatures in the sample', () => {
    const ran = normloom(['queries', SAMPLE_PROJECT]);
    expect(ran).toMatchObject({ exit: 0, stderr: '1 query is open.\n' });
    expect(ran.stdout).toMatch(/^should {2}release {2}unsigned\n/);
  });

  it('refuses what is no project, and wrong usage', () => {
    const ran = normloom(['queries', fileForTest('a.normloom', '{}')]);
    expect([ran.exit, ran.stdout]).toEqual([3, '']);
    expect(ran.stderr).toContain('normloom: a.normloom: This is not a Normloom project.');
    const small = fileForTest('small.normloom', projectToText(projectOf([1, 2])));
    for (const words of [[], [small, small], [small, '--format', 'csv'], [small, '--into', 'x']]) {
      expect(normloom(['queries', ...words]).exit).toBe(2);
    }
  });
});
