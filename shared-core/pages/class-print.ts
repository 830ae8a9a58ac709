import type { ClassFile } from '../class/class-file.ts';
import type { ClassResults, PupilResult } from '../class/class-results.ts';
import type { ClassTableRow } from '../class/class-table.ts';
import { ADJUSTED_MARK } from '../norms/adjustment-words.ts';

/** What the pages and files of a class are made from. */
export interface ClassPrint {
  readonly file: Pick<ClassFile, 'title' | 'date' | 'people' | 'report' | 'slips' | 'sharing'>;
  readonly results: ClassResults;
  /** Codes by place in the list, where pupils are printed under codes; empty otherwise. */
  readonly codes: readonly string[];
}

/** Somebody of the list, by place in it. */
interface Listed {
  readonly index: number;
  readonly name: string;
}

/** What stands for a pupil in print: the name, or the code where pupils are printed under codes. */
export function labelOf({ file, codes }: ClassPrint, { index, name }: Listed): string {
  if (file.sharing.as !== 'codes') return name;
  const code = codes[index];
  if (code === undefined) throw new RangeError('a pupil without a code');
  return code;
}

/** Listed people in the order of print: codes in their own order, which tells nothing; otherwise that of the list. */
export function inPrintOrder<One extends Listed>(print: ClassPrint, listed: readonly One[]): readonly One[] {
  if (print.file.sharing.as !== 'codes') return listed;
  return listed.toSorted((left, right) => compareTexts(labelOf(print, left), labelOf(print, right)));
}

/** The pupils with a score in the order chosen for the report; those who are alike stay in the order of the list. */
export function pupilsInOrder(print: ClassPrint): readonly PupilResult[] {
  const { results, file } = print;
  const listed = inPrintOrder(print, results.pupils);
  if (file.sharing.as === 'codes') return listed;
  const better = results.table.scale.direction === 'high-is-good' ? -1 : 1;
  switch (file.report.sort) {
    case 'list':
      return listed;
    case 'name':
      return listed.toSorted((left, right) => compareTexts(folded(left.name), folded(right.name)));
    case 'score':
      return listed.toSorted((left, right) => better * (left.score - right.score));
    case 'rank':
      return listed.toSorted((left, right) => rankPlace(right.found) - rankPlace(left.found));
    case 'group':
      return listed.toSorted((left, right) => compareTexts(folded(left.group), folded(right.group)));
  }
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
  const place = Number(figures.replace(',', '.'));
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
