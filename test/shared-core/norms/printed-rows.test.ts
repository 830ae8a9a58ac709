import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Cut, NormProject } from '../../../shared-core/norms/norm-project.ts';
import { printedRows } from '../../../shared-core/norms/printed-rows.ts';
import { builtSet, projectOf, scaleTo, TEN_COUNTS } from './small-projects.ts';

const cutAt = (score: number, values: Cut['values'] = null): Cut => ({ name: 'Support', score, values });

function textsOf(project: NormProject): readonly string[] {
  const { project: built, groups } = builtSet(project);
  return groups.flatMap((norms) => printedRows(built, norms).map(({ scoreText }) => scoreText));
}

/** Nobody but at 4 and 5 of a scale of 0 to 9: four scores print below 1 on one side, four above 99 on the other. */
const ENDS = [0, 0, 0, 0, 5, 5, 0, 0, 0, 0] as const;

function ranged(change: Partial<NormProject> = {}, columns: NormProject['table']['columns'] = []): NormProject {
  const project = projectOf(ENDS);
  return {
    ...project,
    sheet: { ...project.sheet, rangeRows: true },
    table: { ...project.table, columns },
    ...change,
  };
}

describe('printedRows', () => {
  it('are one for each score unless ranges are asked for', () => {
    const project = ranged();
    const texts = textsOf({ ...project, sheet: { ...project.sheet, rangeRows: false } });
    expect(texts).toEqual(['0', '1', '2', '3', '4', '5', '6', '7', '8', '9']);
  });

  it('stand for neighbours that print alike', () => {
    expect(textsOf(ranged())).toEqual(['0–3', '4', '5', '6–9']);
    const negative = projectOf(ENDS, { min: -4, max: 5, step: 1, direction: 'high-is-good' });
    expect(textsOf({ ...ranged(), tally: negative.tally })).toEqual(['−4–−1', '0', '1', '2–5']);
  });

  it('are apart where any chosen column prints otherwise, such as a count', () => {
    expect(textsOf(ranged({}, ['stanine']))).toEqual(['0–3', '4', '5', '6–9']);
    const project = ranged({}, ['count']);
    const counts = projectOf([0, 0, 0, 1, 50, 50, 1, 0, 0, 0]).tally;
    expect(textsOf({ ...project, tally: counts })).toEqual(['0–2', '3', '4', '5', '6', '7–9']);
    expect(textsOf({ ...ranged(), tally: counts })).toEqual(['0–3', '4', '5', '6–9']);
  });

  it('begin anew at a cut of the group, towards the good end', () => {
    expect(textsOf(ranged({ cuts: [cutAt(2)] }))).toEqual(['0–1', '2–3', '4', '5', '6–9']);
    expect(textsOf(ranged({ cuts: [cutAt(7.5)] }))).toEqual(['0–3', '4', '5', '6–7', '8–9']);
    const low = projectOf(ENDS, scaleTo(9, 'low-is-good'));
    expect(textsOf(ranged({ tally: low.tally, cuts: [cutAt(2)] }))).toEqual(['0–2', '3', '4', '5', '6–9']);
    expect(textsOf(ranged({ cuts: [cutAt(2, ['4'])] }))).toEqual(['0–3', '4', '5', '6–9']);
    expect(textsOf(ranged({ cuts: [cutAt(0), cutAt(99)] }))).toEqual(['0–3', '4', '5', '6–9']);
  });

  it('are apart where one was adjusted by hand', () => {
    const adjusted = (score: number, reason: string) => ({ values: [], score, to: '1', reason, by: 'A. B.' });
    const one = ranged({ adjustments: [adjusted(3, 'order')] });
    expect(textsOf(one)).toEqual(['0–2', '3', '4', '5', '6–9']);
    const both = ranged({ adjustments: [adjusted(2, 'order'), adjusted(3, 'order')] });
    expect(textsOf(both)).toEqual(['0–1', '2–3', '4', '5', '6–9']);
    const otherwise = ranged({ adjustments: [adjusted(2, 'order'), adjusted(3, 'other')] });
    expect(textsOf(otherwise)).toEqual(['0–1', '2', '3', '4', '5', '6–9']);
  });

  it('hold every score once and in order, alike within a row, whatever is drawn', () => {
    fc.assert(
      fc.property(
        fc.array(fc.constantFrom(0, 0, 1, 30), { minLength: 2, maxLength: 40 }).filter((counts) => counts.includes(1)),
        fc.constantFrom('high-is-good' as const, 'low-is-good' as const),
        fc.array(
          fc.integer({ min: -2, max: 84 }).map((halves) => halves / 2),
          { maxLength: 3 },
        ),
        fc.boolean(),
        (counts, direction, scores, rangeRows) => {
          const project = projectOf(counts, scaleTo(counts.length - 1, direction));
          const { groups } = builtSet(project);
          const [norms] = groups;
          if (norms === undefined) throw new Error('no group');
          const cuts = scores.map((score) => cutAt(score));
          const choices = {
            ...project,
            cuts,
            sheet: { ...project.sheet, rangeRows },
            table: { ...project.table, columns: ['stanine' as const] },
          };
          const rows = printedRows(choices, norms);
          expect(rows.flatMap((row) => row.rows)).toEqual(norms.rows);
          for (const row of rows) {
            const prints = row.rows.map(({ printed, texts }) => `${printed} ${texts.stanine}`);
            expect(new Set(prints).size).toBe(1);
            if (!rangeRows) expect(row.rows).toHaveLength(1);
            for (const cut of scores) {
              const good = row.rows.map(({ score }) => (direction === 'high-is-good' ? score >= cut : score <= cut));
              expect(new Set(good).size).toBe(1);
            }
          }
          const joined = rows.slice(1).filter((row, index) => {
            const [before, first] = [rows[index]?.rows.at(-1), row.rows[0]];
            const parted = scores.some((cut) =>
              direction === 'high-is-good'
                ? (before?.score ?? 0) < cut && cut <= (first?.score ?? 0)
                : (before?.score ?? 0) <= cut && cut < (first?.score ?? 0),
            );
            return before?.printed === first?.printed && before?.texts.stanine === first?.texts.stanine && !parted;
          });
          if (rangeRows) expect(joined).toEqual([]);
        },
      ),
      { numRuns: 60 },
    );
  });

  it('are unmerged where all print differently', () => {
    const project = projectOf(TEN_COUNTS);
    expect(textsOf({ ...project, sheet: { ...project.sheet, rangeRows: true } })).toEqual(['0', '1', '2', '3', '4']);
  });
});
