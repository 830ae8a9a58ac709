import { describe, expect, it } from 'vitest';
import { ratioToNumber } from '../../shared-core/percentile/exact-ratio.ts';
import { percentilePoint } from '../../shared-core/percentile/percentile-point.ts';
import { percentileRanks, type RankDefinition } from '../../shared-core/percentile/percentile-rank.ts';
import { attainableScores } from '../../shared-core/scale/score-scale.ts';
import { summarise } from '../../shared-core/tally/cohort-summary.ts';
import { mergeTables, peopleIn } from '../../shared-core/tally/frequency-table.ts';
import { EXACT, expectNear } from './near.ts';
import { readBandsReference, readRows, tableFromScores, wholeScale } from './read-reference.ts';

const SCALE = wholeScale(0, 80);

describe('one-year bands of c6_age', () => {
  const reference = readBandsReference('c6_age');
  const people = readRows('c6_age_cohort.csv').map((row) => ({
    band: Math.floor(Number(row['age'])),
    score: Number(row['score']),
  }));
  const scoresIn = (band: number): readonly number[] =>
    people.filter((person) => person.band === band).map(({ score }) => score);
  const rows = readRows('c6_age_bands.csv');
  const scores = attainableScores(SCALE);

  it.each(reference.bands)('ages $band', (band) => {
    const table = tableFromScores(SCALE, scoresIn(band.band));
    const summary = summarise(table);
    expect(summary.n).toBe(band.n);
    expectNear(summary.mean, band.mean, EXACT, 'mean');
    expectNear(summary.sd, band.sd_n1, EXACT, 'standard deviation');
    expectNear(percentilePoint(table, 0.5, 'type-7', 1).score, band.median_type7, EXACT, 'median');
    expectNear(percentilePoint(table, 0.1, 'type-6', 1).score, band.q10_type6, EXACT, 'tenth');
    expectNear(percentilePoint(table, 0.9, 'type-6', 1).score, band.q90_type6, EXACT, 'ninetieth');

    const own = rows.filter((row) => Number(row['band']) === band.band);
    expect(own.length).toBe(41);
    const ranks = (kind: Extract<RankDefinition, { kind: 'below' | 'at-or-below' | 'midpoint' }>['kind']) =>
      percentileRanks(table, { kind }).map(ratioToNumber);
    const [below, atOrBelow, midpoint] = [ranks('below'), ranks('at-or-below'), ranks('midpoint')];
    for (const row of own) {
      const position = scores.indexOf(Number(row['score']));
      expect(table.counts[position]).toBe(Number(row['freq']));
      expectNear(below[position] ?? null, Number(row['pr_below']), EXACT, 'below');
      expectNear(atOrBelow[position] ?? null, Number(row['pr_atbelow']), EXACT, 'at or below');
      expectNear(midpoint[position] ?? null, Number(row['pr_mid']), EXACT, 'midpoint');
    }
  });

  it('bands add up to the whole cohort, whose table is that of all people', () => {
    expect(people.length).toBe(reference.n);
    const bands = reference.bands.map(({ band }) => tableFromScores(SCALE, scoresIn(band)));
    const merged = bands.reduce(mergeTables);
    expect(peopleIn(merged)).toBe(reference.n);
    const all = tableFromScores(
      SCALE,
      people.map(({ score }) => score),
    );
    expect(merged).toEqual(all);
  });
});
