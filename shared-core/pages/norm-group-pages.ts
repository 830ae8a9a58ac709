import { figure, type PrintWords, say } from '../languages/phrases.ts';
import { inSeries } from '../languages/series.ts';
import { documentationFields } from '../norms/norm-groups.ts';
import type { ScoreScale } from '../scale/score-scale.ts';
import { leftOutInWords } from '../norms/reading.ts';
import { printCount, printScore } from '../scores/printed-number.ts';
import { openBlock, ownText } from './block-opening.ts';
import type { BlockContext, BlockPages } from './block-pages.ts';
import { layHeading, layNote, layParts, layText, type TextPart } from './block-text.ts';
import { factTableStart, layFactTable, type FactRow, type FactTable } from './fact-table.ts';
import { groupTable, isDrawnInClusters, isWeighted, quarterOf, sizeAndSpread } from './group-facts.ts';
import { documentationOf } from './sheet-texts.ts';
import type { SheetFlow } from './sheet-flow.ts';

/** Whom the tables speak of: documentation, the groups in numbers, and which rows of the file stand in them. */
export const normGroupPages: BlockPages = (context) => {
  const { normSet, words } = context;
  const flow = openBlock(context);
  layText(flow, 'own', ownText(context.block));
  layParts(flow, documentation(context));
  const numbers = groupTable('numbers', normSet, sizeAndSpread(normSet.groups, words), words);
  layTable(flow, say(words, 'norm-group.numbers'), numbers, [numbersNote(context)], words);
  const rows = rowsTable(context);
  if (rows !== null) layTable(flow, say(words, 'norm-group.rows'), rows, rowsNotes(context), words);
  return { pages: flow.pages, remarks: [] };
};

function layTable(
  flow: SheetFlow,
  heading: string,
  table: FactTable,
  notes: readonly string[],
  words: PrintWords,
): void {
  layHeading(flow, `${table.name} heading`, heading, factTableStart(table, flow));
  layFactTable(flow, table, words);
  layNote(flow, `${table.name} notes`, notes);
}

function documentation({ normSet: { project }, words }: BlockContext): readonly TextPart[] {
  const told = documentationOf(project).map(({ field, text }) => ({ head: say(words, `norm-group.${field}`), text }));
  const untold = documentationFields(project.groups.documentation)
    .filter(({ text }) => text === null)
    .map(({ field }) => say(words, `untold.${field}`));
  const open = {
    head: say(words, 'norm-group.untold-head'),
    text: say(words, 'norm-group.untold', { list: inSeries(words, untold) }),
  };
  return [...told, ...(untold.length === 0 ? [] : [open])].map(({ head, text }, index) => ({
    name: `documentation ${index}`,
    head,
    headIs: 'heading',
    paragraphs: [text],
  }));
}

function numbersNote({ normSet: { groups }, words }: BlockContext): string {
  const scale = groups[0]?.group.table.scale;
  const ends = (of: ScoreScale): string =>
    say(words, 'norm-group.numbers-note', {
      lowest: figure(words, printScore(of, of.min)),
      highest: figure(words, printScore(of, of.max)),
    });
  return [
    say(words, `norm-group.${quarterOf(groups)}s`),
    ...(scale === undefined ? [] : [ends(scale)]),
    ...(groups.some(isWeighted) ? [say(words, 'norm-group.effective')] : []),
    ...(groups.some(isDrawnInClusters) ? [say(words, 'norm-group.intervals')] : []),
  ].join(' ');
}

/** Rows read, left out by each rule, and kept; null where no source is told. */
function rowsTable({ normSet, words }: BlockContext): FactTable | null {
  const { source } = normSet.project;
  if (source === null) return null;
  const line = (text: string, count: number, strong: boolean): FactRow => ({
    cells: [text, figure(words, printCount(count))],
    strong,
  });
  const read =
    source.kind === 'typed'
      ? say(words, 'norm-group.read-typed')
      : say(words, 'norm-group.read', { file: source.file });
  const leftOut = source.leftOut.filter(({ count }) => count > 0);
  return {
    name: 'rows',
    heads: [[say(words, 'norm-group.rows-head')], [say(words, 'norm-group.rows-count')]],
    rows: [
      line(read, source.rowsRead, true),
      ...leftOut.map(({ rule, count }) =>
        line(say(words, 'norm-group.left-out', { rule: leftOutInWords(rule, words) }), count, false),
      ),
      line(say(words, 'norm-group.kept'), source.rowsKept, true),
    ],
  };
}

/** How many people of the file stand in no table. */
function rowsNotes({ normSet, words }: BlockContext): readonly string[] {
  const { source } = normSet.project;
  if (source?.kind !== 'people') return [];
  const without = source.rowsKept - normSet.groups.reduce((sum, { summary }) => sum + summary.n, 0);
  return without > 0 ? [say(words, 'norm-group.without-table', { count: figure(words, printCount(without)) })] : [];
}
