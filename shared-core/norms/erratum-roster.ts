import { compareRatios, compareToWhole, ratio, type ExactRatio } from '../percentile/exact-ratio.ts';
import { parseDecimal, powerOfTen, type DecimalMark } from '../scale/decimal.ts';
import { placeOnGrid, scaleGrid, scaleInWords, type PlaceOnScale } from '../scale/score-scale.ts';
import type { ConversionRow } from './conversion-table.ts';
import { groupAlike } from './edition-compare-pairs.ts';
import { changedCells, comparedColumns, type CellChange } from './edition-compare.ts';
import { crossedCuts, type CrossedCut } from './erratum-cuts.ts';
import { groupKey } from './norm-groups.ts';
import type { NormSet } from './norm-set.ts';

/** One row of a roster, as texts of the file. */
export interface RosterPerson {
  /** Number of the row in the file; the heading is row 1. */
  readonly row: number;
  /** Name or code; empty where the roster names no column for it. */
  readonly person: string;
  /** One value for each grouping column of the editions. */
  readonly values: readonly string[];
  readonly score: string;
}

export interface Roster {
  readonly people: readonly RosterPerson[];
  readonly decimalMark: DecimalMark;
}

/** A percentile rank, 0–100, that decides something, and its text. */
export interface Cut {
  readonly text: string;
  readonly rank: ExactRatio;
}

/** A percentile rank from 0 to 100 as it is typed; null for anything else. */
export function cutFromText(text: string): Cut | null {
  const decimal = parseDecimal(text);
  const rank = decimal === null ? null : ratio(decimal.units, powerOfTen(decimal.decimals));
  if (rank === null || compareToWhole(rank, 0n) < 0 || compareToWhole(rank, 100n) > 0) return null;
  return { text: text.trim(), rank };
}

export type SideOfCut = 'at or below' | 'above';

export interface ChangedPerson {
  readonly of: RosterPerson;
  /** Title of the group's table in the new edition. */
  readonly group: string;
  readonly scoreText: string;
  /** Printed percentile ranks, changed or not. */
  readonly ranks: { readonly before: string; readonly after: string };
  /** Printed rank and derived scores that differ; empty where only the side of a cut does. */
  readonly cells: readonly CellChange[];
  /** Null where there is no cut or the side stays. */
  readonly side: { readonly before: SideOfCut; readonly after: SideOfCut } | null;
  /** Cut scores of both editions on whose other side the person stands now. */
  readonly crossed: readonly CrossedCut[];
}

/** Everybody of a roster: people = unchanged + changed + unplaced. */
export interface FollowedRoster {
  readonly people: number;
  readonly cut: Cut | null;
  readonly unchanged: number;
  readonly changed: readonly ChangedPerson[];
  /** People who cannot be found in both editions, each with the reason. */
  readonly unplaced: readonly { readonly of: RosterPerson; readonly problem: string }[];
}

export type RosterFollowed =
  { readonly ok: true; readonly followed: FollowedRoster } | { readonly ok: false; readonly problem: string };

/** Columns that are read off for a person; counts and intervals describe the group. */
const OF_A_PERSON: ReadonlySet<string> = new Set(['rank', 'z', 't', 'nce', 'deviation', 'sten', 'stanine']);

/**
 * The people whose printed rank or derived scores differ between two editions, whose unrounded rank lies on another side
 * of a cut, or whose raw score lies on another side of a cut score that was moved, in the order of the roster. Refused where the editions group people by different columns.
 */
export function followRoster(before: NormSet, after: NormSet, roster: Roster, cut: Cut | null): RosterFollowed {
  if (!groupAlike(before, after)) {
    const named = (set: NormSet): string => set.project.groups.by.join(', ') || 'no column';
    return {
      ok: false,
      problem:
        `The old edition groups people by ${named(before)}, the new one by ${named(after)}. ` +
        'A roster can be followed only between editions that group alike.',
    };
  }
  const columns = comparedColumns(before, after).filter(({ column }) => OF_A_PERSON.has(column));
  const inOld = finder(before, roster.decimalMark);
  const inNew = finder(after, roster.decimalMark);
  const changed: ChangedPerson[] = [];
  const unplaced: FollowedRoster['unplaced'][number][] = [];
  for (const of of roster.people) {
    const old = inOld(of);
    const now = inNew(of);
    if (!old.ok || !now.ok) {
      unplaced.push({ of, problem: whyUnplaced(old, now) });
      continue;
    }
    const cells = changedCells(old.row, now.row, columns);
    const side = cut === null ? null : changedSide(old.row, now.row, cut);
    const crossed = crossedCuts(before.project, after.project, old.key, old.row.score);
    if (cells.length === 0 && side === null && crossed.length === 0) continue;
    const ranks = { before: old.row.printed, after: now.row.printed };
    changed.push({ of, group: now.group, scoreText: now.row.scoreText, ranks, cells, side, crossed });
  }
  const people = roster.people.length;
  const unchanged = people - changed.length - unplaced.length;
  return { ok: true, followed: { people, cut, unchanged, changed, unplaced } };
}

type Found =
  | { readonly ok: true; readonly group: string; readonly key: string; readonly row: ConversionRow }
  | { readonly ok: false; readonly problem: string };

/** Finds the row of a person in an edition; the problem goes on after "in the old edition". */
function finder(set: NormSet, mark: DecimalMark): (person: RosterPerson) => Found {
  const groups = new Map(set.groups.map((norms) => [norms.group.key, norms]));
  return ({ values, score }) => {
    const norms = groups.get(groupKey(values));
    if (norms === undefined) return { ok: false, problem: `there is no table for ${inWords(values)}` };
    const { scale } = norms.group.table;
    const decimal = parseDecimal(score, mark);
    if (decimal === null) {
      return { ok: false, problem: score.trim() === '' ? 'there is no score to look up' : `"${score}" is not a score` };
    }
    const place = placeOnGrid(scaleGrid(scale), decimal);
    const row = typeof place === 'number' ? norms.rows[place] : undefined;
    if (row !== undefined) return { ok: true, group: norms.group.title, key: norms.group.key, row };
    return { ok: false, problem: `${score} ${PLACE_WORDS[place]}, ${scaleInWords(scale)}` };
  };
}

const PLACE_WORDS: Readonly<Record<PlaceOnScale, string>> = {
  'below-scale': 'lies below the scale',
  'above-scale': 'lies above the scale',
  'off-grid': 'lies between two steps of the scale',
};

function inWords(values: readonly string[]): string {
  return values.map((value) => (value === '' ? '(blank)' : value)).join(', ');
}

function whyUnplaced(old: Found, now: Found): string {
  if (old.ok) return `In the new edition ${now.ok ? '' : now.problem}; the old one prints ${old.row.printed}.`;
  if (now.ok) return `In the old edition ${old.problem}; the new one prints ${now.row.printed}.`;
  if (old.problem === now.problem) return `In both editions ${old.problem}.`;
  return `In the old edition ${old.problem}; in the new one ${now.problem}.`;
}

function changedSide(old: ConversionRow, now: ConversionRow, cut: Cut): ChangedPerson['side'] {
  const before = sideOf(old, cut);
  const after = sideOf(now, cut);
  return before === after ? null : { before, after };
}

function sideOf({ rank }: ConversionRow, cut: Cut): SideOfCut {
  return compareRatios(rank, cut.rank) <= 0 ? 'at or below' : 'above';
}
