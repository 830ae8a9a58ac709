import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { classStanding } from '../../../shared-core/class/class-standing.ts';
import { classOf, type Typed } from './classes.ts';

const alone = { table: null, group: null } as const;
const standing = (scores: readonly (number | string)[], more = {}) =>
  classStanding(
    classOf(
      scores.map((score, index): Typed => [`P${index + 1}`, String(score)]),
      { ...alone, ...more },
    ),
  );

describe('the standing within a class', () => {
  it('gives places from the best, ties sharing theirs', () => {
    const { pupils } = standing([10, 7, 9, 7, 12, 7, 3]);
    expect(pupils.map(({ scoreText, placeText }) => [scoreText, placeText])).toEqual([
      ['10', '2'],
      ['7', '4 to 6'],
      ['9', '3'],
      ['7', '4 to 6'],
      ['12', '1'],
      ['7', '4 to 6'],
      ['3', '7'],
    ]);
    // At or below, the pupil among them: 6, 4, 5, 4, 7, 4 and 1 of 7.
    expect(pupils.map(({ atOrBelow, percentText }) => [atOrBelow, percentText])).toEqual([
      [6, '86'],
      [4, '57'],
      [5, '71'],
      [4, '57'],
      [7, '100'],
      [4, '57'],
      [1, '14'],
    ]);
  });

  it('begins with the lowest score where low is good', () => {
    const { pupils, direction } = standing([10, 7, 7, 3], { direction: 'low-is-good' });
    expect(direction).toBe('low-is-good');
    expect(pupils.map(({ placeText, atOrBelow, percentText }) => [placeText, atOrBelow, percentText])).toEqual([
      ['4', 1, '25'],
      ['2 to 3', 3, '75'],
      ['2 to 3', 3, '75'],
      ['1', 4, '100'],
    ]);
  });

  it('says how coarse it is: one pupil of 28 is 3.6 points', () => {
    expect(standing(Array.from({ length: 28 }, (_, index) => index)).onePupil).toBe('3.6');
    expect(standing([1, 2]).onePupil).toBe('50.0');
  });

  it('has the scores as they were written, and the five numbers', () => {
    const { pupils, facts } = standing(['12.5', '7', '9', '8', '11']);
    expect(pupils.map(({ scoreText }) => scoreText)).toEqual(['12.5', '7.0', '9.0', '8.0', '11.0']);
    expect(facts?.boxPlot).toEqual([7, 8, 9, 11, 12.5]);
  });

  it('counts those without a score apart and asks what is no score', () => {
    const { counts, open } = standing(['5', 'absent', '1O', '2000000']);
    expect(counts).toMatchObject({ rows: 4, reported: 1, absent: 1, open: 2 });
    expect(open.map(({ row }) => row.line)).toEqual([3, 4]);
  });

  it('is had for nobody, for one, and for all the same score', () => {
    expect(standing(['absent'])).toMatchObject({
      pupils: [],
      onePupil: null,
      remark: 'Nobody has a score yet, so there is no standing.',
    });
    expect(standing([])).toMatchObject({ facts: { n: 0 } });
    expect(standing([5])).toMatchObject({
      onePupil: '100.0',
      remark: 'There is only one score, so there is nobody to stand beside.',
    });
    for (const direction of ['high-is-good', 'low-is-good']) {
      const same = standing([5, 5, 5], { direction });
      expect(same.pupils.map(({ placeText, percentText }) => [placeText, percentText])).toEqual(
        Array(3).fill(['1 to 3', '100']),
      );
      expect(same.remark).toBe('All 3 pupils have the same score and share all places.');
    }
    expect(standing([5, 6]).remark).toBeNull();
  });

  it('prints no share of 0, in however large a class', () => {
    const { pupils } = standing(Array.from({ length: 400 }, (_, index) => index));
    // 1 of 400 is 0.25 per cent, half up.
    expect([pupils[0]?.percentText, pupils[399]?.percentText]).toEqual(['0.3', '100.0']);
  });

  it('goes on where scores have no common scale', () => {
    const { pupils, facts } = standing(['0.0001', '1000', '3']);
    expect(pupils.map(({ placeText }) => placeText)).toEqual(['3', '1', '2']);
    expect(facts).toBeNull();
  });

  it('has a check code without names', () => {
    const { check } = standing([1, 2]);
    expect(
      classStanding(
        classOf(
          [
            ['Ada', '1'],
            ['Ivo', '2'],
          ],
          alone,
        ),
      ).check,
    ).toBe(check);
    expect(standing([1, 3]).check).not.toBe(check);
  });

  it('puts places and shares together by law', () => {
    const scores = fc.array(fc.integer({ min: 0, max: 12 }), { minLength: 1, maxLength: 30 });
    fc.assert(
      fc.property(scores, fc.constantFrom('high-is-good', 'low-is-good'), (drawn, direction) => {
        const { pupils } = standing(drawn, { direction });
        const n = drawn.length;
        for (const { score, firstPlace, lastPlace, atOrBelow, percentText } of pupils) {
          // Plainly counted.
          const better = drawn.filter((one) => (direction === 'high-is-good' ? one > score : one < score)).length;
          const same = drawn.filter((one) => one === score).length;
          expect([firstPlace, lastPlace]).toEqual([better + 1, better + same]);
          expect(atOrBelow).toBe(n - firstPlace + 1);
          expect(percentText).toBe(String(Math.round((100 * atOrBelow) / n)));
        }
        // Every place is taken once.
        const places = pupils.reduce((sum, { firstPlace, lastPlace }) => sum + (firstPlace + lastPlace) / 2, 0);
        expect(places).toBeCloseTo((n * (n + 1)) / 2, 9);
      }),
    );
  });
});
