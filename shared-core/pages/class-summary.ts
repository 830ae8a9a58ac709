import type { CountRow, TotalledRow } from '../class/class-counts.ts';
import type { ClassResults } from '../class/class-results.ts';
import { foldedText } from '../class/list-text.ts';
import { summariesMayTell } from '../class/shared-summary.ts';
import { suppressed, type SuppressedCell, type SuppressedTable } from '../class/small-cells.ts';
import { checkCodeOf } from '../norms/check-code.ts';
import { compareGroupValues } from '../tally/tally.ts';
import type { ClassPrint } from './class-print.ts';

/** Names of the statistics of raw scores that a summary may hold. */
export type SharedStatistic = 'lower-hinge' | 'median' | 'upper-hinge';

/** What may be told of a class without its pupils: counts with small cells hidden, and statistics of raw scores. */
export interface ClassSummary {
  /** Rows of the counts: groups of the list, null for those without one; empty where the class is not divided. */
  readonly groups: readonly (string | null)[];
  readonly counts: SuppressedTable;
  /** Of the whole class, as printed, those that may be told, lowest first. */
  readonly statistics: readonly { readonly name: SharedStatistic; readonly printed: string }[];
  /** Of the groups; null where nothing may be told of them. */
  readonly compared: readonly SharedGroup[] | null;
  /** Printed ranks of each quarter, lowest first. */
  readonly quarters: readonly string[];
  /** Of what is told alone, so that nothing hidden can be tried out against it. */
  readonly check: string;
}

/** Printed texts; null where one may not be told, for no group then, or has no value. */
export interface SharedGroup {
  readonly group: string;
  readonly median: string | null;
  readonly mean: string | null;
  readonly nceMean: string | null;
}

const FIVE_PLACES: Readonly<Record<SharedStatistic, number>> = { 'lower-hinge': 1, median: 2, 'upper-hinge': 3 };

/** The class as it may be shared: a pure function of its results. Rows that an answer left out are in no count. */
export function classSummary({ results, file }: ClassPrint): ClassSummary {
  const { facts, table, comparison } = results;
  const members = membersOf(results);
  const groups = members.length < 2 ? [] : members.map(({ group }) => group);
  const counts = suppressed(
    members.map((each) => each.counts),
    table.smallestCell,
  );
  const may = summariesMayTell(counts, table.smallestCell, {
    together: areAlike(results.pupils.map(({ score }) => score)),
    rows: members.map(({ scores }) => areAlike(scores)),
  });
  const names = [
    ...(may.together.quartiles ? (['lower-hinge'] as const) : []),
    ...(may.together.median ? (['median'] as const) : []),
    ...(may.together.quartiles ? (['upper-hinge'] as const) : []),
  ];
  const statistics = names.flatMap((name) => {
    const number = facts.fiveNumbers?.[FIVE_PLACES[name]];
    return number === undefined ? [] : [{ name, printed: number.printed }];
  });
  // The comparison has no row for those without a group: all groups are told, or none.
  const mayCompare = (may.groups.median || may.groups.mean) && !groups.includes(null);
  const compared =
    comparison === null || !mayCompare
      ? null
      : comparison.groups.map(({ group, median, mean, nceMean }) => ({
          group,
          median: may.groups.median ? median : null,
          mean: may.groups.mean ? mean : null,
          nceMean: may.groups.mean ? nceMean : null,
        }));
  const quarters = facts.quarters.map(({ ranks }) => ranks);
  const told = { groups, counts: toldOnly(counts), statistics, compared };
  const check = checkCodeOf([
    [file.title, file.date, file.people],
    [table.title, table.form, table.edition, table.date, table.check, table.cited, table.definition, table.draft],
    told,
  ]);
  return { groups, counts, statistics, compared, quarters, check };
}

interface Members {
  readonly group: string | null;
  readonly counts: CountRow;
  readonly scores: readonly number[];
}

/** Those with a result or a reason for having none, by the groups that the list names; one row where it names fewer than two. */
function membersOf({ pupils, missed }: ClassResults): readonly Members[] {
  const spelled = new Map<string, string>();
  for (const group of [...pupils, ...missed].map(({ row }) => row.group)) {
    const key = foldedText(group);
    if (!spelled.has(key)) spelled.set(key, group);
  }
  const of = (group: string | null, belongs: (group: string) => boolean): Members => {
    const own = pupils.filter(({ row }) => belongs(row.group));
    const without = missed.filter(({ row }) => belongs(row.group));
    return {
      group,
      scores: own.map(({ score }) => score),
      counts: {
        standings: ([1, 2, 3, 4] as const).map((quarter) => own.filter((pupil) => pupil.quarter === quarter).length),
        statuses: (['absent', 'not-tested', 'excused'] as const).map(
          (status) => without.filter((one) => one.status === status).length,
        ),
      },
    };
  };
  const named = [...spelled].filter(([key]) => key !== '').toSorted(([, a], [, b]) => compareGroupValues([a], [b]));
  if (named.length < 2) return [of(null, () => true)];
  return [
    ...named.map(([key, group]) => of(group, (other) => foldedText(other) === key)),
    ...(spelled.has('') ? [of(null, (other) => foldedText(other) === '')] : []),
  ];
}

function areAlike(scores: readonly number[]): boolean {
  return new Set(scores).size < 2;
}

/** Counts as they stand on the page: a hidden one is null, whatever it is. */
export function toldCounts(row: TotalledRow<SuppressedCell>): readonly (number | null)[] {
  return [...row.standings, row.tested, ...row.statuses, row.total].map((cell) =>
    cell.kind === 'told' ? cell.count : null,
  );
}

function toldOnly(counts: SuppressedTable): unknown {
  switch (counts.kind) {
    case 'table':
      return [...counts.rows, counts.together].map(toldCounts);
    case 'class-only':
      return [toldCounts(counts.together)];
    case 'nothing':
      return null;
  }
}
