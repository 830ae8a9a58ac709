import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Adjustment } from '../../../shared-core/norms/adjustment-schema.ts';
import { adjustmentNote } from '../../../shared-core/norms/adjustment-words.ts';
import { computedText, withAdjustment, withoutAdjustment } from '../../../shared-core/norms/adjustments.ts';
import { choiceEffect } from '../../../shared-core/norms/choice-effect.ts';
import { normSetForFile } from '../../../shared-core/norms/norm-set-file.ts';
import { pressProblem } from '../../../shared-core/norms/norm-set.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { projectFromText, projectToText } from '../../../shared-core/norms/project-text.ts';
import { workingsOf } from '../../../shared-core/norms/workings.ts';
import { builtSet, firstNorms, settledProject } from './small-projects.ts';

const settled = settledProject();

/** Grade 4 prints 2, 7, 12, 17, 21, 26 … 98: nothing below stands on the rest. */
function change(score: number, to: string, values: readonly string[] = ['4']): Adjustment {
  return { values, score, to, reason: 'Agreed with the board', by: 'M. Orr' };
}

function adjusted(...adjustments: readonly Adjustment[]): NormProject {
  return { ...settled, adjustments };
}

function problems(...adjustments: readonly Adjustment[]): readonly string[] {
  return builtSet(adjusted(...adjustments)).refusedAdjustments.map(({ problem }) => problem);
}

const printed = firstNorms(settled).rows.map((row) => row.printed);

describe('an adjustment by hand', () => {
  const project = adjusted(change(3, '18'));
  const norms = firstNorms(project);
  const [before, row] = [firstNorms(settled).rows[3], norms.rows[3]];
  if (before === undefined || row === undefined) throw new Error('no row');

  it('changes what is printed of its row, and keeps what was', () => {
    expect(printed.slice(2, 5)).toEqual(['12', '17', '21']);
    expect(norms.rows.map((one) => one.printed)).toEqual(printed.with(3, '18'));
    expect(row.adjusted).toEqual({ from: '17', reason: 'Agreed with the board', by: 'M. Orr' });
    expect(row.provenance.printed).toEqual({ from: 'adjusted', end: null });
    expect([computedText(row), computedText(before)]).toEqual(['17', '17']);
    expect(norms.rows.filter((one) => one.adjusted !== null)).toHaveLength(1);
    expect(builtSet(project).groups[1]?.rows).toEqual(builtSet(settled).groups[1]?.rows);
  });

  it('leaves the rank, the derived scores and the inverse table as they were computed', () => {
    const { printed: now, adjusted: why, provenance, ...rest } = row;
    expect(now).toBe('18');
    expect(why).not.toBeNull();
    expect(before).toMatchObject(rest);
    expect(provenance.percentileRank).toEqual(before.provenance.percentileRank);
    expect(norms.inverse).toEqual(firstNorms(settled).inverse);
  });

  it('is told in the workings, under the table and in the file', () => {
    const workings = workingsOf(project, norms, '3', 'rank');
    expect(workings.lines.slice(-2)).toEqual([
      'Rounded to whole numbers, halves up: 17.',
      'Adjusted by hand (Agreed with the board; M. Orr), from 17 to 18.',
    ]);
    expect(workings.result).toBe('18');
    expect(adjustmentNote(norms)).toBe(
      '† Adjusted by hand: raw 3 from 17 to 18 (Agreed with the board; M. Orr). ' +
        'Everything else follows the computed rank.',
    );
    expect(adjustmentNote(firstNorms(settled))).toBeNull();
    const file = JSON.parse(JSON.stringify(normSetForFile(builtSet(project), () => [])));
    expect(file.groups[0].rows[3]).toMatchObject({ printed: '18', adjusted: { from: '17', by: 'M. Orr' } });
    expect(file.groups[0].rows[4].adjusted).toBeNull();
  });

  it('changes the check code with its text and with its reason', () => {
    const codes = [settled, project, adjusted(change(3, '19')), adjusted({ ...change(3, '18'), reason: 'Other' })];
    expect(new Set(codes.map((one) => builtSet(one).check)).size).toBe(4);
  });

  it('is no effect of another choice', () => {
    expect(choiceEffect(norms, project)).toMatchObject({ changed: 0, largestMove: 0 });
  });

  it('is kept in the file of the project, with a reason and a name', () => {
    const text = projectToText(project);
    expect(projectFromText(text)).toEqual({ ok: true, project });
    for (const [good, bad, where] of [
      ['Agreed with the board', ' ', 'adjustments.0.reason: an adjustment needs a reason'],
      ['M. Orr', '', 'adjustments.0.by: an adjustment tells who made it'],
      ['"to": "18"', '"to": ""', 'adjustments.0.to: an adjustment names the rank to print'],
    ] as const) {
      const read = projectFromText(text.replace(good, bad));
      expect(read.ok ? 'was read' : read.problem).toContain(where);
    }
  });

  it('may reach the ends of the table as they print', () => {
    expect(problems(change(0, '<1'), change(20, '>99'))).toEqual([]);
    const heldEnds = { ...adjusted(change(0, '<1')), table: { ...settled.table, ends: 'held' as const } };
    expect(builtSet(heldEnds).refusedAdjustments[0]?.problem).toContain(
      'cannot print <1: its ranks are 1, 2 … 98 and 99',
    );
    const decimals = { ...adjusted(change(3, '16.9')), table: { ...settled.table, decimals: 1 as const } };
    expect(builtSet(decimals).refusedAdjustments).toEqual([]);
  });
});

describe('an adjustment that cannot stand', () => {
  it.each<[string, readonly Adjustment[], readonly string[]]>([
    [
      'names no row',
      [change(21, '99')],
      ['Grade 4 has no raw score 21, so it has no rank to adjust. Withdraw the adjustment.'],
    ],
    [
      'names no group',
      [change(3, '18', ['7'])],
      ['There is no group 7 any more, so its adjusted rank has no place. Withdraw the adjustment.'],
    ],
    [
      'repeats another',
      [change(3, '18'), change(3, '19')],
      ['Raw 3 of Grade 4 is adjusted twice. Withdraw one of the adjustments.'],
    ],
    ['changes nothing', [change(3, '17')], ['Raw 3 of Grade 4 prints 17 without an adjustment. Withdraw it.']],
    [
      'is no rank of the table',
      [change(3, '17.5')],
      ['Raw 3 of Grade 4 cannot print 17.5: its ranks are <1, 1 … 99 and >99.'],
    ],
    [
      'stands above a better score',
      [change(3, '22')],
      [
        'In Grade 4, with this adjustment, raw 4 prints 21 and raw 3 prints 22: a better score may not print a lower ' +
          'rank. Choose a rank between those of its neighbours.',
      ],
    ],
    [
      'stands below a poorer score',
      [change(3, '11')],
      [
        'In Grade 4, with this adjustment, raw 3 prints 11 and raw 2 prints 12: a better score may not print a lower ' +
          'rank. Choose a rank between those of its neighbours.',
      ],
    ],
  ])('%s', (_, adjustments, expected) => {
    expect(problems(...adjustments)).toEqual(expected);
  });

  it('is not printed, must be looked at, and keeps the press from running', () => {
    const set = builtSet(adjusted(change(3, '22'), change(8, '41')));
    expect(set.groups[0]?.rows.map((row) => row.printed)).toEqual(printed.with(8, '41'));
    expect(set.queries.filter(({ weight }) => weight === 'must')).toMatchObject([
      {
        id: 'adjustment:3:["4"]',
        station: 'table',
        group: '["4"]',
        lead: 'A rank adjusted by hand cannot be printed as 22.',
      },
    ]);
    expect(pressProblem(set)).toMatch(/^In Grade 4, with this adjustment, raw 4 prints 21/);
    expect(pressProblem(builtSet(adjusted(change(8, '41'))))).toBeNull();
  });

  it('has ids of its own where a row is named three times or the group is gone', () => {
    const set = builtSet(adjusted(change(3, '18'), change(3, '19'), change(3, '20'), change(3, '20', ['7'])));
    expect(set.queries.filter(({ weight }) => weight === 'must').map(({ id, group }) => [id, group])).toEqual([
      ['adjustment:3:["7"]', null],
      ['adjustment:3:["4"]', '["4"]'],
      ['adjustment:3:["4"]:2', '["4"]'],
    ]);
  });

  it('may lean on its neighbours, and falls with them', () => {
    // 22 and 23 go together; 22 alone would stand above the 21 of raw 4.
    expect(problems(change(3, '22'), change(4, '23'))).toEqual([]);
    expect(problems(change(3, '22'), change(4, '90'))).toHaveLength(2);
  });

  it('turns with the direction of the scale', () => {
    const tally = settled.tally && {
      ...settled.tally,
      scale: { ...settled.tally.scale, direction: 'low-is-good' as const },
    };
    const low = (to: string) => builtSet({ ...adjusted(change(3, to)), tally }).refusedAdjustments.length;
    // Raw 2, 3, 4 print 88, 83, 79 where low scores are the good ones.
    expect([low('84'), low('80'), low('89'), low('78')]).toEqual([0, 0, 1, 1]);
  });

  it('never leaves a table out of order, whatever is asked', () => {
    const asked = fc.array(
      fc.record({ score: fc.integer({ min: -1, max: 21 }), to: fc.integer({ min: 0, max: 100 }).map(String) }),
      { maxLength: 6 },
    );
    fc.assert(
      fc.property(asked, (wanted) => {
        const adjustments = wanted.map(({ score, to }) => change(score, to));
        const { groups, refusedAdjustments } = builtSet(adjusted(...adjustments));
        const ranks = (groups[0]?.rows ?? []).map((row) => Number(row.printed));
        expect(ranks).toEqual(ranks.toSorted((left, right) => left - right));
        const made = (groups[0]?.rows ?? []).filter((row) => row.adjusted !== null).length;
        expect(made + refusedAdjustments.length).toBe(adjustments.length);
      }),
      { numRuns: 60 },
    );
  });
});

describe('adjusting at the table', () => {
  const norms = firstNorms(settled);
  const given = { score: 3, to: ' 18 ', reason: ' Board ', by: ' M. Orr ' };

  it('adds an adjustment, puts another in its place, and withdraws it', () => {
    const first = withAdjustment(settled, norms, given);
    if (!first.ok) throw new Error(first.problem);
    expect(first.project.adjustments).toEqual([{ values: ['4'], score: 3, to: '18', reason: 'Board', by: 'M. Orr' }]);
    const again = withAdjustment(first.project, firstNorms(first.project), { ...given, to: '19' });
    if (!again.ok) throw new Error(again.problem);
    expect(again.project.adjustments.map(({ to }) => to)).toEqual(['19']);
    expect(firstNorms(again.project).rows[3]?.adjusted?.from).toBe('17');
    const [only] = again.project.adjustments;
    if (only === undefined) throw new Error('no adjustment');
    expect(withoutAdjustment(again.project, only)).toEqual(settled);
  });

  it.each([
    [{ to: ' ' }, 'Give the rank to print.'],
    [{ reason: '' }, 'Give the reason; it is printed under the table.'],
    [{ by: ' ' }, 'Tell who changes the rank; the name is printed under the table.'],
    [{ to: '17' }, 'Raw 3 of Grade 4 prints 17 without an adjustment. Withdraw it.'],
    [{ to: '30' }, 'In Grade 4, with this adjustment, raw 4 prints 21 and raw 3 prints 30'],
  ])('refuses %o in a sentence', (wrong, problem) => {
    const made = withAdjustment(settled, norms, { ...given, ...wrong });
    expect(made.ok ? 'was made' : made.problem).toContain(problem);
  });
});
