import { checkCodeOf } from '../norms/check-code.ts';
import { countedPeople } from '../norms/norm-groups.ts';
import type { PeopleNoun } from '../norms/norm-project.ts';
import { ratio } from '../percentile/exact-ratio.ts';
import { percentileRanks } from '../percentile/percentile-rank.ts';
import { decimalOf } from '../scale/decimal.ts';
import type { Direction, ScoreScale } from '../scale/score-scale.ts';
import { printCount, printNumber, printRatio } from '../scores/printed-number.ts';
import { inferScale } from '../tally/cohort-counter-scores.ts';
import { tableFromCounts } from '../tally/frequency-table.ts';
import type { ClassFile } from './class-file.ts';
import { rowsOfClass, type ClassCounts, type PupilMissed, type PupilSetAside, type ScoredPupil } from './class-rows.ts';
import { scoreFacts, type ScoreFacts } from './score-facts.ts';

/** Where a pupil stands among those of the class who have a score. */
export interface StandingPupil extends ScoredPupil {
  /** Places from 1, the best; those of the same score share theirs. */
  readonly firstPlace: number;
  readonly lastPlace: number;
  /** "3", or "4 to 6". */
  readonly placeText: string;
  /** Pupils with this score or a poorer one, the pupil among them. */
  readonly atOrBelow: number;
  /** The same in per cent of the class, as printed: whole up to 100 pupils, with one decimal beyond. */
  readonly percentText: string;
}

/** The standing within the class: it says nothing about anybody outside of it. */
export interface ClassStanding {
  readonly direction: Direction;
  /** In order of the list. */
  readonly pupils: readonly StandingPupil[];
  readonly missed: readonly PupilMissed[];
  readonly leftOut: readonly PupilSetAside[];
  readonly open: readonly PupilSetAside[];
  readonly counts: ClassCounts;
  /** Points of per cent that one pupil is worth, "3.6" in a class of 28; null for nobody. */
  readonly onePupil: string | null;
  /** What the reader of so small or so even a class must know, in a sentence; null for others. */
  readonly remark: string | null;
  /** Null where the scores lie so far apart that they have no common scale. */
  readonly facts: ScoreFacts | null;
  /** Of everything printed but names and codes; see the check of class results. */
  readonly check: string;
}

/** Puts a class in order within itself, as if the file had no table. Any class will do. */
export function classStanding(file: ClassFile): ClassStanding {
  const { people, direction } = file;
  const { scored, missed, leftOut, open, counts } = rowsOfClass({ ...file, table: null });
  const scores = scored.map(({ outcome }) => outcome.score);
  const decimals = scores.reduce((most, score) => Math.max(most, decimalOf(score).decimals), 0);
  const places = placesOf(scores, direction);
  const pupils = scored.map(({ sorted: { index, row, name }, outcome: { score, corrected } }): StandingPupil => {
    const place = places.get(score);
    if (place === undefined) throw new RangeError('a score without a place');
    const scoreText = printNumber(score, decimals);
    return { index, row, name, group: row.group, score, scoreText, corrected, ...place };
  });
  const n = pupils.length;
  const onePupil = n === 0 ? null : printRatio(ratio(100n, BigInt(n)), 1);
  const scale = scaleOf(scores, direction);
  const facts = scale === null ? null : scoreFacts(scale, scores, people);
  const printed = pupils.map(({ group, scoreText, placeText, percentText }) => [
    group,
    scoreText,
    placeText,
    percentText,
  ]);
  const check = checkCodeOf([
    [file.title, file.date, people, direction],
    printed,
    missed.map(({ group, status }) => [group, status]),
    counts,
    facts?.fiveNumbers ?? null,
  ]);
  const remark = remarkOn(n, places.size, people);
  return { direction, pupils, missed, leftOut, open, counts, onePupil, remark, facts, check };
}

type Place = Pick<StandingPupil, 'firstPlace' | 'lastPlace' | 'placeText' | 'atOrBelow' | 'percentText'>;

const WHOLE_PERCENTS_TO = 100;

/** The place of every score that somebody has. The share at or below is the `at-or-below` rank within the class. */
function placesOf(scores: readonly number[], direction: Direction): ReadonlyMap<number, Place> {
  const distinct = [...new Set(scores)].toSorted((a, b) => a - b);
  if (distinct.length === 0) return new Map();
  // Only the order counts, so that the scores are counted on their numbers in order.
  const counts = distinct.map((score) => scores.filter((one) => one === score).length);
  const order: ScoreScale = { min: 0, max: Math.max(1, distinct.length - 1), step: 1, direction };
  const table = tableFromCounts(order, distinct.length === 1 ? [...counts, 0] : counts);
  const shares = percentileRanks(table, { kind: 'at-or-below' });
  const n = scores.length;
  return new Map(
    distinct.map((score, index): [number, Place] => {
      const better = scores.filter((one) => (direction === 'high-is-good' ? one > score : one < score)).length;
      const [firstPlace, lastPlace] = [better + 1, better + (counts[index] ?? 0)];
      const share = shares[index];
      if (share === undefined) throw new RangeError('a score without a share');
      return [
        score,
        {
          firstPlace,
          lastPlace,
          placeText: firstPlace === lastPlace ? String(firstPlace) : `${firstPlace} to ${lastPlace}`,
          atOrBelow: n - better,
          percentText: printRatio(share, n > WHOLE_PERCENTS_TO ? 1 : 0),
        },
      ];
    }),
  );
}

function remarkOn(n: number, different: number, people: PeopleNoun): string | null {
  if (n === 0) return 'Nobody has a score yet, so there is no standing.';
  if (n === 1) return 'There is only one score, so there is nobody to stand beside.';
  if (different > 1) return null;
  return `All ${countedPeople(printCount(n), people)} have the same score and share all places.`;
}

/** A scale that carries the scores of the class; null where there is none. */
function scaleOf(scores: readonly number[], direction: Direction): ScoreScale | null {
  const [first, ...others] = scores;
  if (others.every((score) => score === first)) return { min: first ?? 0, max: (first ?? 0) + 1, step: 1, direction };
  const inferred = inferScale(scores.map(decimalOf));
  return inferred.ok ? { ...inferred.value, direction } : null;
}
