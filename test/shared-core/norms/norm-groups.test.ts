import { describe, expect, it } from 'vitest';
import {
  columnInWords,
  countedPeople,
  groupNoun,
  missingDocumentation,
  normGroups,
  onePerson,
  standingTitle,
} from '../../../shared-core/norms/norm-groups.ts';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import { settledProject } from './small-projects.ts';

describe('titles of groups', () => {
  it('are made of column and value', () => {
    expect(standingTitle(['grade', 'test_form'], ['5', 'A'], 'pupils')).toBe('Grade 5, Test form A');
    expect(standingTitle(['grade'], [''], 'pupils')).toBe('Grade (blank)');
    expect(standingTitle(['test\nform'], ['A\r\n 1'], 'pupils')).toBe('Test form A 1');
    expect(standingTitle(['grade'], [' \n'], 'pupils')).toBe('Grade (blank)');
    expect(standingTitle([], [], 'candidates')).toBe('All candidates');
    expect(standingTitle([], [], 'people')).toBe('Everybody');
    expect(columnInWords('age_group_')).toBe('Age group');
  });

  it('are the user’s where one was given', () => {
    const project = settledProject();
    const choices = [
      { values: ['10'], title: ' Tenth grade ', printed: true },
      { values: ['4'], title: '  ', printed: false },
      { values: ['5'], title: 'Nobody', printed: true },
    ];
    const groups = normGroups({ ...project, groups: { ...project.groups, choices } });
    expect(groups.map(({ key, title, printed }) => [key, title, printed])).toEqual([
      ['["4"]', 'Grade 4', false],
      ['["10"]', 'Tenth grade', true],
    ]);
  });

  it('keep groups apart whose values look alike when run together', () => {
    const project = settledProject();
    const tally = project.tally && {
      ...project.tally,
      cells: project.tally.cells.slice(0, 2).map((cell, index) => ({
        ...cell,
        values: index === 0 ? ['a,b', 'c'] : ['a', 'b,c'],
      })),
    };
    const groups = normGroups({ ...project, tally, groups: { ...project.groups, by: ['grade', 'form'] } });
    expect(new Set(groups.map(({ key }) => key)).size).toBe(2);
  });

  it('are none before a cohort was read', () => {
    expect(normGroups(newProject(''))).toEqual([]);
  });
});

describe('documentation', () => {
  const { documentation } = settledProject().groups;

  it('makes a norm group only when all of it is there', () => {
    expect(groupNoun(documentation)).toBe('norm group');
    expect(missingDocumentation(documentation)).toEqual([]);
    for (const key of Object.keys(documentation)) {
      const less = { ...documentation, [key]: ' \n' };
      expect([key, groupNoun(less)]).toEqual([key, 'sample']);
      expect(missingDocumentation(less)).toHaveLength(1);
    }
  });
});

describe('people', () => {
  it('are counted with their noun', () => {
    expect(onePerson('people')).toBe('person');
    expect(onePerson('candidates')).toBe('candidate');
    expect([countedPeople('1', 'people'), countedPeople('0', 'pupils')]).toEqual(['1 person', '0 pupils']);
  });
});
