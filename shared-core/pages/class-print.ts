import type { ClassFile } from '../class/class-file.ts';
import type { ClassResults, PupilResult } from '../class/class-results.ts';
import type { ClassStanding } from '../class/class-standing.ts';
import type { ClassTableRow } from '../class/class-table.ts';
import { ADJUSTED_MARK } from '../norms/adjustment-words.ts';
import type { Direction } from '../scale/score-scale.ts';

/** How a class is printed, and under which names. */
export interface PrintedClass {
  readonly file: Pick<ClassFile, 'title' | 'date' | 'people' | 'report' | 'slips' | 'sharing'>;
  /** Codes by place in the list, where pupils are printed under codes; empty otherwise. */
  readonly codes: readonly string[];
}

/** What report, slips and files of a class with a table are made from. */
export interface ClassPrint extends PrintedClass {
  readonly results: ClassResults;
}

/** The same of a class without a table. */
export interface StandingPrint extends PrintedClass {
  readonly standing: ClassStanding;
}

/** Somebody of the list, by place in it. */
export interface Listed {
  readonly index: number;
  readonly name: string;
}

/** What stands for a pupil in print: the name, or the code where pupils are printed under codes. */
export function labelOf({ file, codes }: PrintedClass, { index, name }: Listed): string {
  if (file.sharing.as !== 'codes') return name;
  const code = codes[index];
  if (code === undefined) throw new RangeError('a pupil without a code');
  return code;
}

/** Listed people in the order of print: codes in their own order, which tells nothing; otherwise that of the list. */
export function inPrintOrder<One extends Listed>(print: PrintedClass, listed: readonly One[]): readonly One[] {
  if (print.file.sharing.as !== 'codes') return listed;
  return listed.toSorted((left, right) => compareTexts(labelOf(print, left), labelOf(print, right)));
}

/** Somebody with a score. */
interface Scored extends Listed {
  readonly group: string;
  readonly score: number;
}

/**
 * Those with a score in the order chosen for the report; those who are alike stay in the order of the list. `rankOf` is
 * the more the better.
 */
export function inChosenOrder<One extends Scored>(
  print: PrintedClass,
  scored: readonly One[],
  direction: Direction,
  rankOf: (one: One) => number,
): readonly One[] {
  const listed = inPrintOrder(print, scored);
  if (print.file.sharing.as === 'codes') return listed;
  const better = direction === 'high-is-good' ? 1 : -1;
  switch (print.file.report.sort) {
    case 'list':
      return listed;
    case 'name':
      return listed.toSorted((left, right) => compareTexts(folded(left.name), folded(right.name)));
    case 'score':
      return listed.toSorted((left, right) => better * (right.score - left.score));
    case 'rank':
      return listed.toSorted((left, right) => rankOf(right) - rankOf(left));
    case 'group':
      return listed.toSorted((left, right) => compareTexts(folded(left.group), folded(right.group)));
  }
}

/** The pupils of the report in its order. */
export function pupilsInOrder(print: ClassPrint): readonly PupilResult[] {
  const { pupils, table } = print.results;
  return inChosenOrder(print, pupils, table.scale.direction, ({ found }) => rankPlace(found));
}

/** A printed rank with its sign and its mark taken off: "<1" is below 1, "85†" was set by hand. */
export interface RankParts {
  readonly end: 'below' | 'above' | null;
  /** "63". */
  readonly figures: string;
  readonly adjusted: boolean;
}

export function rankParts(printed: string): RankParts {
  const adjusted = printed.endsWith(ADJUSTED_MARK);
  const text = adjusted ? printed.slice(0, -ADJUSTED_MARK.length) : printed;
  const end = text.startsWith('<') ? 'below' : text.startsWith('>') ? 'above' : null;
  return { end, figures: end === null ? text : text.slice(1), adjusted };
}

/** Where a printed rank stands, 0–100: "<1" at 0 and ">99" at 100. */
export function rankPlace({ printed }: Pick<ClassTableRow, 'printed'>): number {
  const { end, figures } = rankParts(printed);
  if (end !== null) return end === 'below' ? 0 : 100;
  const place = Number(figures);
  if (!Number.isFinite(place)) throw new RangeError(`no percentile rank: ${printed}`);
  return place;
}

function compareTexts(left: string, right: string): number {
  return left < right ? -1 : left > right ? 1 : 0;
}

/** Letters without their marks, capitals like small ones: an order of names that is the same on every machine. */
function folded(text: string): string {
  return text.normalize('NFD').replace(/\p{M}/gu, '').toLowerCase();
}
