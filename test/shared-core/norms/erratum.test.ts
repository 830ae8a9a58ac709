import { describe, expect, it } from 'vitest';
import { compareEditions } from '../../../shared-core/norms/edition-compare.ts';
import {
  followRoster,
  type Cut,
  type FollowedRoster,
  type RosterPerson,
} from '../../../shared-core/norms/erratum-roster.ts';
import { erratumText } from '../../../shared-core/norms/erratum.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { ratio } from '../../../shared-core/percentile/exact-ratio.ts';
import type { DecimalMark } from '../../../shared-core/scale/decimal.ts';
import { groupedProject } from './edition-projects.ts';
import { builtSet, projectOf, settledProject } from './small-projects.ts';

/** Grades 4 and 5 on a scale of 0 to 4, ten pupils each, with a rank alone beside the score. */
function twoGrades(
  counts: { readonly [grade: string]: readonly number[] },
  release: Partial<NormProject['release']> = {},
): NormProject {
  const bare = groupedProject('grade', counts);
  return {
    ...bare,
    table: { ...bare.table, columns: ['count'] },
    release: { ...bare.release, ...release },
  };
}

// Midpoint ranks 5, 20, 45, 60, 80; with one pupil moved 5, 25, 50, 60, 80.
const OLD = twoGrades({ '4': [1, 2, 3, 0, 4], '5': [2, 2, 2, 2, 2] }, { edition: '1.0', date: '2026-06-15' });
const NEW = twoGrades({ '4': [1, 3, 2, 0, 4], '5': [2, 2, 2, 2, 2] }, { edition: '1.1', date: '2026-09-01' });

function roster(...rows: readonly (readonly [string, string, string])[]): readonly RosterPerson[] {
  return rows.map(([person, grade, score], index) => ({ row: index + 2, person, values: [grade], score }));
}

function cutAt(text: string, numerator: bigint, denominator = 1n): Cut {
  return { text, rank: ratio(numerator, denominator) };
}

function followed(
  people: readonly RosterPerson[],
  { cut = null, before = OLD, after = NEW, decimalMark = '.' }: Following = {},
): FollowedRoster {
  const result = followRoster(builtSet(before), builtSet(after), { people, decimalMark }, cut);
  if (!result.ok) throw new Error(result.problem);
  const { changed, unplaced, unchanged } = result.followed;
  expect(unchanged + changed.length + unplaced.length).toBe(people.length);
  return result.followed;
}

interface Following {
  readonly cut?: Cut | null;
  readonly before?: NormProject;
  readonly after?: NormProject;
  readonly decimalMark?: DecimalMark;
}

describe('the people of a roster', () => {
  it('are told where their printed rank changes, and nobody else', () => {
    const { changed, unchanged, unplaced } = followed(roster(['Ann', '4', '1'], ['Ben', '4', '4'], ['Cai', '5', '1']));
    expect([unchanged, unplaced]).toEqual([2, []]);
    expect(changed).toEqual([
      {
        of: { row: 2, person: 'Ann', values: ['4'], score: '1' },
        group: 'Grade 4',
        scoreText: '1',
        ranks: { before: '20', after: '25' },
        cells: [{ column: 'rank', name: 'percentile rank', before: '20', after: '25' }],
        side: null,
        crossed: [],
      },
    ]);
  });

  it('change sides of a cut by their unrounded rank, the cut itself on the side below', () => {
    const ann = roster(['Ann', '4', '1']);
    const sides = (cut: Cut) => followed(ann, { cut }).changed.map(({ side }) => side);
    expect(sides(cutAt('25', 25n))).toEqual([null]);
    expect(sides(cutAt('24.9', 249n, 10n))).toEqual([{ before: 'at or below', after: 'above' }]);
    expect(sides(cutAt('20', 20n))).toEqual([{ before: 'at or below', after: 'above' }]);
    expect(sides(cutAt('19.9', 199n, 10n))).toEqual([null]);
  });

  it('are told where the side changes and no printed number does', () => {
    // 249 and 251 of 1000 pupils below: ranks 24.9 and 25.1, both printed 25.
    const before = projectOf([498, 0, 502]);
    const after = projectOf([502, 0, 498]);
    const people = [{ row: 2, person: 'Ann', values: [], score: '0' }];
    const { changed } = followed(people, { before, after, cut: cutAt('25', 25n) });
    expect(changed).toMatchObject([
      { ranks: { before: '25', after: '25' }, cells: [], side: { before: 'at or below', after: 'above' } },
    ]);
    const comparison = compareEditions(builtSet(before), builtSet(after));
    expect(erratumText(comparison, followed(people, { before, after, cut: cutAt('25', 25n) }))).toContain(
      '  Ann (All pupils, raw score 0): percentile rank stays 25; at or below 25 → above 25\n',
    );
  });

  it('are told, not dropped, where a score or a group has no row', () => {
    const wider = twoGrades({ '4': [1, 3, 2, 0, 4, 0], '6': [2, 2, 2, 2, 2, 0] });
    const people = roster(
      ['Ann', '4', '5'],
      ['Ben', '4', '6'],
      ['Cai', '9', '1'],
      ['Dee', '5', '1'],
      ['Eli', '6', '1'],
      ['Fay', '4', ''],
      ['Gus', '4', 'abs'],
      ['Hal', '4', '1.5'],
      ['Ivy', '4', '-1'],
      ['Jon', '', '1'],
    );
    const { unplaced, unchanged, changed } = followed(people, { after: wider });
    expect([unchanged, changed]).toEqual([0, []]);
    expect(unplaced.map(({ of, problem }) => [of.person, problem])).toEqual([
      ['Ann', 'In the old edition 5 lies above the scale, 0 to 4; the new one prints >99.'],
      ['Ben', 'In the old edition 6 lies above the scale, 0 to 4; in the new one 6 lies above the scale, 0 to 5.'],
      ['Cai', 'In both editions there is no table for 9.'],
      ['Dee', 'In the new edition there is no table for 5; the old one prints 30.'],
      ['Eli', 'In the old edition there is no table for 6; the new one prints 30.'],
      ['Fay', 'In both editions there is no score to look up.'],
      ['Gus', 'In both editions "abs" is not a score.'],
      [
        'Hal',
        'In the old edition 1.5 lies between two steps of the scale, 0 to 4; ' +
          'in the new one 1.5 lies between two steps of the scale, 0 to 5.',
      ],
      ['Ivy', 'In the old edition -1 lies below the scale, 0 to 4; in the new one -1 lies below the scale, 0 to 5.'],
      ['Jon', 'In both editions there is no table for (blank).'],
    ]);
  });

  it('are read with the decimal mark of the roster', () => {
    expect(followed(roster(['Ann', '4', '1,0']), { decimalMark: ',' }).changed).toHaveLength(1);
    expect(followed(roster(['Ann', '4', '1,0'])).unplaced).toHaveLength(1);
  });

  it('cannot be followed between editions that group otherwise', () => {
    const project = settledProject();
    const byForm = { ...project, groups: { ...project.groups, by: ['form'] } };
    expect(followRoster(builtSet(project), builtSet(byForm), { people: [], decimalMark: '.' }, null)).toEqual({
      ok: false,
      problem:
        'The old edition groups people by grade, the new one by form. ' +
        'A roster can be followed only between editions that group alike.',
    });
  });
});

describe('an erratum', () => {
  const before = builtSet(OLD);
  const after = builtSet(NEW);
  const comparison = compareEditions(before, after);

  it('says which edition corrects which, the rows old and new, and what to do', () => {
    expect(erratumText(comparison, null)).toBe(
      [
        'Erratum',
        '',
        `This corrects: Ostrey Vale spelling (invented), edition 1.0 of 2026-06-15, check ${before.check}.`,
        `Corrected by: Ostrey Vale spelling (invented), edition 1.1 of 2026-09-01, check ${after.check}.`,
        '4 cells in 2 rows changed. 20 printed cells of 2 groups compared.',
        '',
        'What to do',
        '  Put the old table out of use, read every raw score that is listed here again in the new table, and correct every report in which the old number stands.',
        '',
        'Changed tables (old → new)',
        '  Grade 4',
        '    mean: 2.4 → 2.3',
        '    SD: 1.5 → 1.6',
        '    skewness: −0.11 → 0.03',
        '    excess kurtosis: −1.39 → −1.57',
        '    raw score 1: percentile rank 20 → 25; number of pupils 2 → 3',
        '    raw score 2: percentile rank 45 → 50; number of pupils 3 → 2',
        '',
        'Cautions',
        '  No single score is ground enough for a decision about a person, the corrected one neither.',
        '',
      ].join('\n'),
    );
  });

  it('names people of a roster, in one line each', () => {
    const people = roster(['Ann\nLee', '4', '1'], ['', '4', '2'], ['Cai', '5', '1'], ['Dee', '7', '1']);
    const text = erratumText(comparison, followed(people, { cut: cutAt('20', 20n) }));
    expect(text).toContain(
      [
        'People of the roster',
        '  4 rows: 1 unchanged, 2 changed, 1 not found in both editions; 1 changes the side of 20.',
        '',
        'Changed for',
        '  Ann Lee (Grade 4, raw score 1): percentile rank 20 → 25; at or below 20 → above 20',
        '  row 3 (Grade 4, raw score 2): percentile rank 45 → 50',
        '',
        'Not found in both editions',
        '  Dee: In both editions there is no table for 7.',
        '',
      ].join('\n'),
    );
    expect(text).toContain('This text holds data about persons.');
    expect(text).not.toContain('Cai');
  });

  it('tells that nothing is to be done where no cell differs', () => {
    const text = erratumText(compareEditions(before, before), null);
    expect(text).toContain('No printed cell differs.');
    expect(text).toContain('  Nothing: what was read off the old table stands');
    expect(text).not.toContain('Put the old table out of use');
  });

  it('warns of two editions of one number, of other titles, other people and another scale', () => {
    const source = OLD.source;
    if (source === null) throw new Error('no source');
    const other: NormProject = {
      ...twoGrades({ '4': [1, 3, 2, 0, 4, 0] }, { edition: '1.0' }),
      title: 'Ostrey Vale sums (invented)',
      source: { ...source, sha256: 'd'.repeat(64) },
    };
    const text = erratumText(compareEditions(before, builtSet(other)), null);
    expect(text).toContain('Both editions carry the same number.');
    expect(text).toContain('do not have the same title');
    expect(text).toContain('made from another file');
    expect(text).toContain('Definition, direction or scale changed');
    expect(text).toContain('Grade 5: no table any more (it had 5 rows)');
    expect(text).toContain('raw score 5: new row (percentile rank >99; number of pupils 0)');
  });
});
