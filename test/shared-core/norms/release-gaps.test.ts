import { describe, expect, it } from 'vitest';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { releaseGaps, releaseProblem } from '../../../shared-core/norms/release-gaps.ts';
import { builtSet, settledProject } from './small-projects.ts';

const settled = settledProject();

function withRelease(change: Partial<NormProject['release']>): NormProject {
  return { ...settled, release: { ...settled.release, ...change } };
}

function kindsOf(project: NormProject): readonly string[] {
  return releaseGaps(builtSet(project)).map(({ kind }) => kind);
}

function idsOf(project: NormProject): readonly string[] {
  return builtSet(project).queries.map(({ id, weight }) => `${weight} ${id}`);
}

describe('what is missing before a release', () => {
  it('is nothing for a settled and signed project', () => {
    expect(kindsOf(settled)).toEqual([]);
    expect(releaseProblem(builtSet(settled))).toBeNull();
  });

  it('is a number, each signature, and an answer to each query that must be answered', () => {
    expect(kindsOf(withRelease({ edition: ' ' }))).toEqual(['edition']);
    expect(kindsOf(withRelease({ analyst: ' ' }))).toEqual(['analyst']);
    expect(kindsOf(withRelease({ checker: '' }))).toEqual(['checker']);
    const silent = { ...withRelease({ analyst: '', checker: '' }), sheet: { ...settled.sheet, cautions: '' } };
    expect(kindsOf(silent)).toEqual(['query', 'analyst', 'checker']);
    expect(releaseProblem(builtSet(silent))).toBe(
      'This edition cannot be released yet. Still open: The cautions are gone. Put cautions back, or give the reason ' +
        'for printing none. Nobody has signed as analyst. Name who prepared the tables. Nobody has signed as checker. ' +
        'Name who checked the tables.',
    );
    const answers = [{ query: 'no-cautions', reason: 'They stand on the cover.' }];
    expect(kindsOf({ ...withRelease({ answers }), sheet: silent.sheet })).toEqual([]);
  });

  it('is a second person, however one person writes the name', () => {
    for (const checker of ['A. Weir', ' a.  WEIR ', 'Ａ. Weir']) {
      expect([checker, kindsOf(withRelease({ checker }))]).toEqual([checker, ['same-person']]);
    }
    expect(kindsOf(withRelease({ checker: 'A. Weird' }))).toEqual([]);
  });

  it('leaves out what only should be answered', () => {
    const undated = withRelease({ date: '' });
    expect(idsOf(undated)).toEqual(['should edition-date']);
    expect(kindsOf(undated)).toEqual([]);
  });
});

describe('queries about the edition', () => {
  it('ask for signatures, once', () => {
    expect(idsOf(withRelease({ analyst: '' }))).toEqual(['should unsigned']);
    expect(idsOf(withRelease({ analyst: '', checker: ' ' }))).toEqual(['should unsigned']);
    expect(idsOf(withRelease({ checker: 'a. weir' }))).toEqual(['should same-signature']);
  });

  it('ask for another number where an edition of this number prints something else, and make it a draft', () => {
    const changes = { edition: '1.0', date: '', check: '0000-0000', lines: [] };
    const clashing = withRelease({ changes });
    expect(idsOf(clashing)).toEqual(['must same-edition-number']);
    expect(builtSet(clashing).status).toBe('draft');
    expect(builtSet(clashing).queries[0]?.lead).toBe('There is an edition 1.0 already, and it prints something else.');
    expect(idsOf(withRelease({ changes, edition: '1.1' }))).toEqual([]);
    // The same number is right where the same is printed; the draft’s own code must not decide that.
    const { check } = builtSet(settled);
    expect(idsOf(withRelease({ changes: { ...changes, check } }))).toEqual([]);
  });
});
