import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';
import { printNumber, printShare } from '../scores/printed-number.ts';
import type { CohortSummary } from '../tally/cohort-summary.ts';
import { adjustmentNote } from './adjustment-words.ts';
import { DEFAULT_BLOCKS, type BlockKind, type BookletBlock } from './booklet-blocks.ts';
import { cutTables } from './cut-table.ts';
import { definitionKey } from './definitions.ts';
import type { GroupNorms } from './group-norms.ts';
import type { NormProject } from './norm-project.ts';
import { clusterFacts } from './sampling-words.ts';
import { ENGLISH_LANGUAGE } from './sheet-schema.ts';
import { methodText } from './statements.ts';

/**
 * "7F3A-91C2": eight hexadecimal digits of the SHA-256 of everything that is printed, except the paper it is printed on
 * and the version of the program that pressed it.
 */
export function checkCode(project: NormProject, groups: readonly GroupNorms[], status: 'draft' | 'released'): string {
  const { title, subtitle, people, source, sheet, release } = project;
  const { documentation } = project.groups;
  const printed = [
    [title, subtitle, people, release.edition, release.date, definitionKey(project.curve.definition)],
    [sheet.title, sheet.howToRead, sheet.cautions, sheet.notes, methodText(project)],
    [documentation.population, documentation.sampling, documentation.participation],
    [documentation.testDates, documentation.weighting],
    source === null ? [] : [source.file, source.sha256, source.rowsRead, source.rowsKept],
    project.table.columns,
    groups.map(({ group, summary, sampling, smoothing, rows, inverse }) => [
      group.title,
      smoothing.state === 'smoothed' ? smoothing.curve.statement : '',
      factsIn(summary),
      ...(sampling.clusters === null ? [] : [clusterFacts(sampling)]),
      rows.map((row) => [row.scoreText, row.printed, ...project.table.columns.map((column) => row.texts[column])]),
      sheet.inverse ? inverse.map((row) => [row.percentile, row.scoreText]) : [],
    ]),
    // What few sets have leaves the code of the others as it is.
    ...groups.map((norms) => adjustmentNote(norms)).filter((note) => note !== null),
    ...cutTexts(project, groups),
    ...blockTexts(project, groups),
    ...languageTexts(sheet.language),
    ...(status === 'draft' ? [status] : []),
  ];
  return checkCodeOf(printed);
}

/**
 * "7F3A-91C2": the first 32 bits of the SHA-256 of printed texts, given as plain data. The same texts have the same code
 * everywhere. It is short enough that texts can be tried until one has it: what must not be found out, as a cell that
 * is left out, may not be in it.
 */
export function checkCodeOf(printed: readonly unknown[]): string {
  const hash = bytesToHex(sha256(utf8ToBytes(JSON.stringify(printed)))).toUpperCase();
  return `${hash.slice(0, 4)}-${hash.slice(4, 8)}`;
}

/** Cuts are marked in every table, whether or not they have a block of their own. */
function cutTexts(project: NormProject, groups: readonly GroupNorms[]): readonly unknown[] {
  return cutTables(project, groups).map(({ cut, scoreText, rows }) => [
    'cut',
    cut.name,
    scoreText,
    rows.map(({ title, rank, interval, shareText }) => [title, rank, interval, shareText]),
  ]);
}

/** What is printed of the blocks besides the tables, under names that say what it is; nothing for the tables alone. */
function blockTexts(project: NormProject, groups: readonly GroupNorms[]): readonly unknown[] {
  const { sheet, release, source } = project;
  const blocks = printedBlocks(sheet.blocks);
  if (same(blocks, printedBlocks(DEFAULT_BLOCKS))) return [];
  const changes = release.changes;
  const parts: Partial<Record<BlockKind, unknown>> = {
    'norm-group': [
      source?.leftOut.map(({ rule, count }) => [rule, count]) ?? null,
      groups.map(({ summary }) => [printShare(summary.shareAtLowest), printShare(summary.shareAtHighest)]),
    ],
    inverse: groups.map(({ inverse }) => inverse.map(({ percentile, scoreText }) => [percentile, scoreText])),
    'change-list': changes === null ? null : [changes.edition, changes.date, changes.check, changes.lines],
    colophon: [release.analyst, release.checker, source === null ? null : [source.kind, source.bytes]],
  };
  return [{ blocks }, ...Object.entries(parts).filter(([kind]) => blocks.some(([printed]) => printed === kind))];
}

/** Kind, heading and text of the blocks that are printed, in print order. */
function printedBlocks(blocks: readonly BookletBlock[]): readonly (readonly [BlockKind, string, string])[] {
  return blocks
    .filter(({ printed }) => printed)
    .map(({ kind, heading, text }) => [kind, heading.trim(), text.trim()] as const);
}

/** Nothing for the English that ships. */
function languageTexts(language: NormProject['sheet']['language']): readonly unknown[] {
  const told = languageFacts(language);
  return same(told, languageFacts(ENGLISH_LANGUAGE)) ? [] : [{ language: told }];
}

function languageFacts({ tag, words, numbers, phrases }: NormProject['sheet']['language']): readonly unknown[] {
  const { decimalMark, thousands, minus, dateOrder } = numbers;
  return [tag, words, decimalMark, thousands, minus, dateOrder, phrases.map(({ key, text }) => [key, text])];
}

function same(one: unknown, other: unknown): boolean {
  return JSON.stringify(one) === JSON.stringify(other);
}

/** Rounded, so that the last digit of a machine's square roots decides nothing. */
function factsIn({
  n,
  weightSum,
  effectiveN,
  mean,
  sd,
  skewness,
  excessKurtosis,
  fiveNumbers,
}: CohortSummary): unknown {
  const rounded = [weightSum, effectiveN, mean, sd, skewness, excessKurtosis, ...fiveNumbers];
  return [n, rounded.map((value) => (value === null ? null : printNumber(value, 2)))];
}
