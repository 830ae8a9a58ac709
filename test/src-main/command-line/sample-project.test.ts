import { spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { groupNoun } from '../../../shared-core/norms/norm-groups.ts';
import { projectFromText } from '../../../shared-core/norms/project-text.ts';
import { builtSet } from '../../shared-core/norms/small-projects.ts';
import { sample, SAMPLE_PROJECT } from './run-normloom.ts';

const text = readFileSync(SAMPLE_PROJECT, 'utf8');

function sampleProject() {
  const read = projectFromText(text);
  if (!read.ok) throw new Error(read.problem);
  return read.project;
}

describe('the sample project', () => {
  it('is what its script makes of the sample cohort, byte for byte, in any time zone', () => {
    const { status, stdout } = spawnSync(process.execPath, [sample('make-ostrey-vale-project.mjs'), '--print'], {
      encoding: 'utf8',
      env: { ...process.env, TZ: 'Asia/Kathmandu', LANG: 'de_DE.UTF-8' },
    });
    expect(status).toBe(0);
    expect(stdout).toBe(text);
  });

  it('presses as it is: three grades, documented, nothing left to ask but who signs', () => {
    const { groups, queries } = builtSet(sampleProject());
    expect(groups.map(({ group, summary }) => [group.title, summary.n])).toEqual([
      ['Grade 4', 1598],
      ['Grade 5', 1613],
      ['Grade 6', 1601],
    ]);
    expect(groupNoun(sampleProject().groups.documentation)).toBe('norm group');
    expect(queries.filter(({ weight }) => weight !== 'note')).toMatchObject([{ id: 'unsigned', weight: 'should' }]);
  });

  it('can be tabled by form as well, and says that it is invented', () => {
    const project = sampleProject();
    expect(builtSet({ ...project, groups: { ...project.groups, by: ['grade', 'form'] } }).groups).toHaveLength(6);
    const { population, testDates } = project.groups.documentation;
    for (const told of [project.title, project.sheet.notes, population, testDates]) {
      expect(told.toLowerCase()).toContain('invented');
    }
  });

  it('holds no path and no pupil', () => {
    expect(text).not.toMatch(/[\\/](home|work|Users|tmp)[\\/]/);
    expect(text).not.toContain('003624');
  });
});
