import { ratio } from '../percentile/exact-ratio.ts';
import { powerOfTen } from '../scale/decimal.ts';
import { printRank, type RankPrint } from '../scores/printed-number.ts';
import type { Adjustment } from './adjustment-schema.ts';
import type { ConversionRow } from './conversion-table.ts';
import type { GroupNorms } from './group-norms.ts';
import { groupKey, valueInWords, type NormGroup } from './norm-groups.ts';
import type { NormProject } from './norm-project.ts';

/** An adjustment that is not made, with the sentence that tells why and what to do. */
export interface RefusedAdjustment {
  readonly adjustment: Adjustment;
  readonly problem: string;
}

/** The rank that the numbers print, whether or not it was changed by hand. */
export function computedText(row: ConversionRow): string {
  return row.adjusted?.from ?? row.printed;
}

/**
 * The rows of a group with its adjustments made: `printed`, `adjusted` and the provenance change, nothing else. An
 * adjustment that names no row, names one a second time, changes nothing, is no rank the table can print, or would let a
 * better score print a lower rank is refused and left out.
 */
export function adjustRows(
  project: NormProject,
  group: NormGroup,
  rows: readonly ConversionRow[],
): { readonly rows: readonly ConversionRow[]; readonly refused: readonly RefusedAdjustment[] } {
  const own = project.adjustments.filter(({ values }) => groupKey(values) === group.key);
  if (own.length === 0) return { rows, refused: [] };
  const ranks = printableRanks(project.table);
  const made = new Map<number, Adjustment>();
  const refused: RefusedAdjustment[] = [];
  for (const adjustment of own) {
    const position = rows.findIndex(({ score }) => score === adjustment.score);
    const row = rows[position];
    const problem =
      row === undefined ? noRow(group, adjustment) : unfit(group, row, adjustment, ranks, made.has(position));
    if (problem === null) made.set(position, adjustment);
    else refused.push({ adjustment, problem });
  }
  // Taking adjustments back may put those that leant on them out of order in their turn.
  const inDisorder = (): ReturnType<typeof outOfOrder> => outOfOrder(group, rows, made, ranks);
  for (let broken = inDisorder(); broken.length > 0; broken = inDisorder()) {
    for (const { position, adjustment, problem } of broken) {
      refused.push({ adjustment, problem });
      made.delete(position);
    }
  }
  return {
    rows: rows.map((row, position) => {
      const adjustment = made.get(position);
      return adjustment === undefined ? row : adjustedRow(row, adjustment);
    }),
    refused,
  };
}

/** Adjustments of groups that are no more. */
export function strayAdjustments(project: NormProject, groups: readonly NormGroup[]): readonly RefusedAdjustment[] {
  const keys = new Set(groups.map(({ key }) => key));
  return project.adjustments
    .filter(({ values }) => !keys.has(groupKey(values)))
    .map((adjustment) => ({
      adjustment,
      problem:
        `There is no group ${adjustment.values.map((value) => valueInWords(value)).join(', ') || 'of everybody'} any more, ` +
        'so its adjusted rank has no place. Withdraw the adjustment.',
    }));
}

/** The project with one more adjustment, or in place of an earlier one of the same row; or why it cannot be made. */
export function withAdjustment(
  project: NormProject,
  { group, rows }: GroupNorms,
  given: Pick<Adjustment, 'score' | 'to' | 'reason' | 'by'>,
): { readonly ok: true; readonly project: NormProject } | { readonly ok: false; readonly problem: string } {
  const [to, reason, by] = [given.to.trim(), given.reason.trim(), given.by.trim()];
  if (to === '') return { ok: false, problem: 'Give the rank to print.' };
  if (reason === '') return { ok: false, problem: 'Give the reason; it is printed under the table.' };
  if (by === '') return { ok: false, problem: 'Tell who changes the rank; the name is printed under the table.' };
  const adjustment: Adjustment = { values: group.values, score: given.score, to, reason, by };
  const others = project.adjustments.filter((known) => !sameRow(known, adjustment));
  const next = { ...project, adjustments: [...others, adjustment] };
  const problem = adjustRows(next, group, rows.map(asComputed)).refused.find(
    (refusal) => refusal.adjustment === adjustment,
  )?.problem;
  return problem === undefined ? { ok: true, project: next } : { ok: false, problem };
}

/** The project without an adjustment. */
export function withoutAdjustment(project: NormProject, adjustment: Adjustment): NormProject {
  return { ...project, adjustments: project.adjustments.filter((known) => known !== adjustment) };
}

function sameRow(left: Adjustment, right: Adjustment): boolean {
  return left.score === right.score && groupKey(left.values) === groupKey(right.values);
}

function adjustedRow(row: ConversionRow, { to, reason, by }: Adjustment): ConversionRow {
  return {
    ...row,
    printed: to,
    adjusted: { from: row.printed, reason, by },
    provenance: { ...row.provenance, printed: { from: 'adjusted', end: null } },
  };
}

function asComputed(row: ConversionRow): ConversionRow {
  return { ...row, printed: computedText(row), adjusted: null };
}

/** Every text that a rank of the table can have, lowest first. */
function printableRanks(print: RankPrint): readonly string[] {
  const one = Number(powerOfTen(print.decimals));
  const texts = Array.from(
    { length: 100 * one + 1 },
    (_, units) => printRank(ratio(BigInt(units), BigInt(one)), print).text,
  );
  return [...new Set(texts)];
}

function noRow({ title }: NormGroup, { score }: Adjustment): string {
  return `${title} has no raw score ${score}, so it has no rank to adjust. Withdraw the adjustment.`;
}

/** Why a row cannot print the text, its neighbours left aside; null where it can. */
function unfit(
  { title }: NormGroup,
  row: ConversionRow,
  { to }: Adjustment,
  ranks: readonly string[],
  repeated: boolean,
): string | null {
  const where = `Raw ${row.scoreText} of ${title}`;
  if (repeated) return `${where} is adjusted twice. Withdraw one of the adjustments.`;
  if (row.printed === to) return `${where} prints ${to} without an adjustment. Withdraw it.`;
  if (ranks.includes(to)) return null;
  const [first, second, ...others] = ranks;
  return `${where} cannot print ${to}: its ranks are ${first}, ${second} … ${others.at(-2)} and ${others.at(-1)}.`;
}

/** Adjusted rows whose text does not go in order with a neighbour's. */
function outOfOrder(
  { title, table }: NormGroup,
  rows: readonly ConversionRow[],
  made: ReadonlyMap<number, Adjustment>,
  ranks: readonly string[],
): readonly (RefusedAdjustment & { readonly position: number })[] {
  const text = (position: number): string => made.get(position)?.to ?? rows[position]?.printed ?? '';
  const towardsBetter = table.scale.direction === 'high-is-good' ? 1 : -1;
  const problemBetween = (worse: number, better: number): string | null => {
    if (ranks.indexOf(text(worse)) <= ranks.indexOf(text(better))) return null;
    const says = (position: number): string => `raw ${rows[position]?.scoreText} prints ${text(position)}`;
    return (
      `In ${title}, with this adjustment, ${says(better)} and ${says(worse)}: a better score may not print a lower ` +
      'rank. Choose a rank between those of its neighbours.'
    );
  };
  return [...made].flatMap(([position, adjustment]) => {
    const worse = position - towardsBetter;
    const better = position + towardsBetter;
    const problem =
      (rows[worse] === undefined ? null : problemBetween(worse, position)) ??
      (rows[better] === undefined ? null : problemBetween(position, better));
    return problem === null ? [] : [{ position, adjustment, problem }];
  });
}
