import type { DecimalMark } from '../scale/decimal.ts';
import { BETWEEN, NUMBER, readRank, readScores } from './published-cells.ts';

/** One line of a published table, cut into cells. */
export interface PublishedLine {
  /** Line of the text, from 1. */
  readonly line: number;
  readonly cells: readonly string[];
}

export interface PublishedText {
  /** Cells of the heading line; null where there is none. */
  readonly heading: readonly string[] | null;
  readonly lines: readonly PublishedLine[];
  /** Which cells hold the raw score and the percentile rank. */
  readonly scoreAt: number;
  readonly rankAt: number;
  readonly mark: DecimalMark;
  /** Blank cells leave no trace between spaces, but they do between marks. */
  readonly blanksKept: boolean;
}

interface Cut {
  readonly cut: (content: string) => readonly string[];
  readonly blanksKept: boolean;
}

const SPACED = new RegExp(`^(${NUMBER}(?:${BETWEEN}${NUMBER})?)\\s+(.*)$`, 'i');

const CUTS: readonly Cut[] = [
  { cut: (content) => content.split('\t'), blanksKept: true },
  { cut: (content) => content.split(';'), blanksKept: true },
  // A bar may also stand at both ends of the line.
  {
    cut: (content) =>
      content
        .trim()
        .replace(/^\||\|$/g, '')
        .split('|'),
    blanksKept: true,
  },
  { cut: (content) => content.trim().split(/\s{2,}/), blanksKept: false },
  { cut: (content) => content.split(','), blanksKept: true },
  { cut: cutAtSpaces, blanksKept: false },
];

/** Single spaces may also stand inside a range and behind a sign: "25 to 27", "< 1". */
function cutAtSpaces(content: string): readonly string[] {
  const found = SPACED.exec(content.trim());
  const cells = (text: string): readonly string[] => text.replace(/([<>])\s+(?=\d)/g, '$1').split(/\s+/);
  return found === null ? cells(content.trim()) : [found[1] ?? '', ...cells(found[2] ?? '')];
}

const RULED = /^[\s|:+=_\-\u2013\u2014]*$/;
const RANK_NAME = /percentile|%ile|\bpr\b/i;
const POORER_RANK_NAME = /\brank\b/i;
const SCORE_NAME = /\braw\b|score|points|marks?\b|number (?:right|correct)/i;

/**
 * Cuts a pasted table into cells. All lines have one separator, the one by which most of them begin with a score and a
 * rank: tab, semicolon, bar, two spaces or more, comma or single spaces, in this order where several do. A first line
 * that begins with a letter and holds no number in any cell is the heading; it tells which columns are the score and
 * the rank, otherwise the first two are. Blank lines and ruled lines are passed over.
 */
export function cutPublished(text: string): PublishedText {
  const contents = text
    .replace(/^\uFEFF/, '')
    .split(/\r\n|\n|\r/)
    .map((content, index) => ({ line: index + 1, content: content.replaceAll('\u00a0', ' ') }))
    .filter(({ content }) => !RULED.test(content));
  const tried = CUTS.map((cut) => laidOut(contents, cut));
  const read = tried.map(linesRead);
  const best = tried[read.indexOf(Math.max(...read))];
  if (best === undefined) throw new RangeError('no way to cut a line');
  return best;
}

function laidOut(
  contents: readonly { readonly line: number; readonly content: string }[],
  { cut, blanksKept }: Cut,
): PublishedText {
  const all = contents.map(({ line, content }) => ({ line, cells: cut(content).map(bare) }));
  const first = all[0]?.cells ?? [];
  const headed = /^[\p{L}%#]/u.test(first.find((cell) => cell !== '') ?? '') && !first.some(isNumeric);
  const lines = headed ? all.slice(1) : all;
  // Words of a heading that stand a space apart say nothing of columns, unless there are as many.
  const telling = headed && (cut !== cutAtSpaces || first.length === lines[0]?.cells.length);
  const heading = telling ? first : null;
  return { heading, lines, ...columnsIn(heading), mark: markOf(lines), blanksKept };
}

/** Without the space around it and the quotation marks of a spreadsheet. */
function bare(cell: string): string {
  return cell.replace(/^["\s]+|["\s]+$/g, '');
}

function isNumeric(cell: string): boolean {
  return (
    /\d/.test(cell) &&
    ['.' as const, ',' as const].some((mark) => readRank(cell, mark).ok || readScores(cell, mark, true).ok)
  );
}

function columnsIn(heading: readonly string[] | null): { readonly scoreAt: number; readonly rankAt: number } {
  const find = (name: RegExp, except: number): number =>
    heading?.findIndex((cell, index) => index !== except && name.test(cell)) ?? -1;
  const clear = find(RANK_NAME, -1);
  const named = clear >= 0 ? clear : find(POORER_RANK_NAME, -1);
  const score = find(SCORE_NAME, named);
  const rankAt = named >= 0 ? named : score === 1 ? 0 : 1;
  return { rankAt, scoreAt: score >= 0 ? score : rankAt === 0 ? 1 : 0 };
}

/** A comma where numbers are written with one and none with a point. */
function markOf(lines: readonly PublishedLine[]): DecimalMark {
  const holds = (decimal: RegExp): boolean => lines.some(({ cells }) => cells.some((cell) => decimal.test(cell)));
  return holds(/\d,\d/) && !holds(/\d\.\d/) ? ',' : '.';
}

function linesRead({ lines, scoreAt, rankAt, mark }: PublishedText): number {
  return lines.filter(
    ({ cells }) => readScores(cells[scoreAt] ?? '', mark, true).ok && readRank(cells[rankAt] ?? '', mark).ok,
  ).length;
}
