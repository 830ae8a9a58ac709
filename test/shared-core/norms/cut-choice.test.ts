import * as v from 'valibot';
import { describe, expect, it } from 'vitest';
import { cutGroupInWords, withCut, withoutCut, type TypedCut } from '../../../shared-core/norms/cut-choice.ts';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import { normProjectSchema, type Cut, type NormProject } from '../../../shared-core/norms/norm-project.ts';
import { projectOf, settledProject } from './small-projects.ts';

const settled = settledProject();
const typed: TypedCut = { name: 'Reading support', score: '7', values: null };

function taken(project: NormProject, cut: TypedCut, inPlaceOf: Cut | null = null): NormProject {
  const answer = withCut(project, cut, inPlaceOf);
  if (!answer.ok) throw new Error(answer.problem);
  return answer.project;
}

function problemOf(project: NormProject, cut: Partial<TypedCut>): string | null {
  const answer = withCut(project, { ...typed, ...cut });
  return answer.ok ? null : answer.problem;
}

describe('a cut score', () => {
  it('is taken with its name trimmed, for all groups or for one, behind those before it', () => {
    const first = taken(settled, { ...typed, name: ' Reading support ' });
    const second = taken(first, { name: 'Extension', score: '18', values: ['10'] });
    expect(second.cuts).toEqual([
      { name: 'Reading support', score: 7, values: null },
      { name: 'Extension', score: 18, values: ['10'] },
    ]);
    expect(v.safeParse(normProjectSchema, second).success).toBe(true);
    expect(second.cuts.map((cut) => cutGroupInWords(second, cut))).toEqual(['all groups', 'Grade 10']);
    expect(cutGroupInWords(second, { name: 'Gone', score: 7, values: ['7'] })).toBe('Grade 7');
  });

  it('reads a decimal comma, a minus and a whole number', () => {
    const scale = { min: -1, max: 1, step: 0.5, direction: 'high-is-good' } as const;
    const halves = projectOf([1, 1, 1, 1, 1], scale);
    const scores = ['-0,5', '−0.5', '.5', '1'].map((score) => taken(halves, { ...typed, score }).cuts[0]);
    expect(scores.map((cut) => cut?.score)).toEqual([-0.5, -0.5, 0.5, 1]);
  });

  it('is refused where nobody can score so, or where it is no number', () => {
    expect(problemOf(settled, { score: '7.5' })).toBe(
      'Nobody can have this score: the scores go from 0 to 20. Give the cut the lowest score that is on its good side.',
    );
    for (const score of ['21', '-1', '1e9']) expect(problemOf(settled, { score })).toContain('scores go from 0 to 20');
    for (const score of ['', 'x', '7 8', 'NaN', 'Infinity', '1.2.3'])
      expect(problemOf(settled, { score })).toBe('Type the raw score, for example 23.');
    for (const score of ['0', '20', ' 20 ']) expect(problemOf(settled, { score })).toBeNull();
  });

  it('needs a name, a cohort, and room among at most fifty', () => {
    expect(problemOf(settled, { name: '  ' })).toBe('Give the cut score a name; it is printed.');
    expect(problemOf(newProject(''), {})).toMatch(/^Read the cohort first/);
    const many = Array.from({ length: 50 }, (_, index) => ({ name: `Cut ${index}`, score: 7, values: null }));
    const full = { ...settled, cuts: many };
    expect(problemOf(full, {})).toMatch(/^At most 50/);
    expect(taken(full, typed, many[3] ?? null).cuts).toHaveLength(50);
  });

  it('never tells two scores of one name to the same group', () => {
    const one = taken(settled, { ...typed, values: ['4'] });
    expect(problemOf(one, { score: '9', values: ['4'] })).toBe(
      '“Reading support” holds for Grade 4 already. Change that one, or take another name.',
    );
    expect(problemOf(one, { score: '9', values: null })).toContain('holds for Grade 4 already');
    expect(problemOf(taken(settled, typed), { score: '9', values: ['4'] })).toContain('holds for all groups already');
    expect(problemOf(one, { score: '9', values: ['10'] })).toBeNull();
  });

  it('is changed in its place and removed', () => {
    const both = taken(taken(settled, typed), { name: 'Extension', score: '18', values: null });
    const [first, second] = both.cuts;
    const moved = taken(both, { ...typed, score: '8' }, first);
    expect(moved.cuts).toEqual([{ name: 'Reading support', score: 8, values: null }, second]);
    if (first === undefined) throw new Error('no cut');
    expect(withoutCut(both, first).cuts).toEqual([second]);
  });
});
