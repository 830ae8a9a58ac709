import { describe, expect, it } from 'vitest';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import { DEFAULT_POLICY, policyLines, policySays } from '../../../shared-core/norms/policy.ts';
import { policyFromText, policyToText } from '../../../shared-core/norms/policy-text.ts';
import { projectFromText, projectToText } from '../../../shared-core/norms/project-text.ts';
import { settledProject } from './small-projects.ts';

const text = policyToText(DEFAULT_POLICY);

function problemOf(changed: string): string {
  expect(changed).not.toBe(text);
  const read = policyFromText(changed);
  return read.ok ? 'was read' : read.problem;
}

describe('the text of a policy', () => {
  it('is read as it was written, with keys that people can edit', () => {
    expect(policyFromText(text)).toEqual({ ok: true, policy: DEFAULT_POLICY });
    expect(policyFromText(`\uFEFF${text}`)).toEqual({ ok: true, policy: DEFAULT_POLICY });
    const file = JSON.parse(text);
    expect([file.format, file.version]).toEqual(['normloom-policy', 1]);
    expect(file['smallest-must']).toEqual({ value: 30, source: 'common practice' });
    expect(Object.keys(file).join()).toMatch(/^[a-z0-9,-]+$/);
  });

  it('tells when it is no policy', () => {
    for (const other of ['[]', '3', 'null', '{}', projectToText(settledProject())]) {
      expect(problemOf(other)).toMatch(/^This is not a policy\./);
    }
    expect(problemOf(text.slice(0, 90))).toMatch(/^The policy is not complete JSON\./);
    expect(problemOf('')).toMatch(/^The policy is not complete JSON\./);
    expect(problemOf(text.replace('"version": 1', '"version": 2'))).toBe(
      'The policy has version 2; this program reads version 1.',
    );
  });

  it.each<[string, string, string]>([
    ['"value": 30,', '"value": 30.5,', 'smallest-must.value: a whole number of people.'],
    ['"value": 30,', '"value": -1,', 'smallest-must.value: a number of 0 or more.'],
    ['"value": 30,', '"value": 201,', 'smallest-must may not be above smallest-should.'],
    ['"value": 0.15,', '"value": 15,', 'crowded-end.value: a share from 0 to 1.'],
    ['"value": 10,', '"value": 101,', 'wide-step.value: points from 0 to 100.'],
    ['"longest-gap": {\n  "value": 2', '"longest-gap": {\n  "value": 0', 'longest-gap.value: a number of 1 or more.'],
    ['"value": "either"', '"value": "up"', 'rounding.value: '],
    ['"participation"', '"mood"', 'documentation.value.2: '],
    ['"source": "common practice"', '"source": " "', 'smallest-must.source: say where the value comes from.'],
    ['"oldest-years"', '"oldest"', 'oldest-years: '],
  ])('%s may not be %s', (good, bad, where) => {
    expect(problemOf(text.replace(good, bad))).toContain(`The policy cannot be used: ${where}`);
  });
});

describe('the policy of a project', () => {
  it('is the usual one until another is brought, and is kept with the project', () => {
    expect(newProject('').policy).toEqual(DEFAULT_POLICY);
    const own = { ...DEFAULT_POLICY, title: 'Office rules', wideStep: { value: 7.5, source: 'Rules, section 3' } };
    const read = projectFromText(projectToText({ ...settledProject(), policy: own }));
    expect(read.ok && read.project.policy).toEqual(own);
  });

  it('is the usual one in a project that was written before there were policies', () => {
    const file = JSON.parse(projectToText(settledProject()));
    delete file.policy;
    delete file.adjustments;
    expect(projectFromText(JSON.stringify(file))).toEqual({ ok: true, project: settledProject() });
  });

  it('names what is wrong with it', () => {
    const damaged = projectToText(settledProject()).replace('"value": 0.05', '"value": 5');
    const read = projectFromText(damaged);
    expect(read.ok ? 'was read' : read.problem).toContain('policy.most-left-out.value: a share from 0 to 1');
  });
});

describe('the words of a policy', () => {
  it('tell of each threshold with its source', () => {
    const keys = Object.keys(DEFAULT_POLICY).filter((key) => key !== 'title');
    expect(policyLines(DEFAULT_POLICY).map(({ key }) => key)).toEqual(keys);
    expect(policyLines(DEFAULT_POLICY).every(({ source }) => source === 'common practice')).toBe(true);
    expect(policySays(DEFAULT_POLICY, 'smallestMust')).toBe('Policy: at least 30, or a reason (common practice).');
    const steps = { ...DEFAULT_POLICY, wideStep: { value: 7.5, source: ' Rules, section 3 ' } };
    expect(policySays(steps, 'wideStep')).toBe('Policy: at most 7.5 points of percentile rank (Rules, section 3).');
    expect(policySays(DEFAULT_POLICY, 'documentation')).toBe(
      'Policy: population, sampling, participation, dates of testing, weighting (common practice).',
    );
    const nothing = { ...DEFAULT_POLICY, documentation: { value: [], source: 'none' } };
    expect(policySays(nothing, 'documentation')).toBe('Policy: nothing (none).');
  });
});
