import { figure, type PrintWords, say } from '../languages/phrases.ts';
import { asSentence } from '../languages/sentence.ts';
import { inSeries } from '../languages/series.ts';
import type { ConversionRow } from '../norms/conversion-table.ts';
import { definitionInWords } from '../norms/definitions.ts';
import type { GroupNorms } from '../norms/group-norms.ts';
import { countedPeople, groupNoun } from '../norms/norm-groups.ts';
import type { NormSet } from '../norms/norm-set.ts';
import { tableColumns, type TableColumn } from '../norms/table-columns.ts';
import { printCount } from '../scores/printed-number.ts';
import { openBlock, ownText } from './block-opening.ts';
import type { BlockContext, BlockPages } from './block-pages.ts';
import { factGrid, heightOfParts, layHeading, layParts, layText, type TextPart } from './block-text.ts';
import { endsHead, endsText } from './rank-ends.ts';
import { printedCell, tableName } from './sheet-texts.ts';
import { READING } from './type-sizes.ts';

/** The example is the row whose rank lies nearest to this. */
const EXAMPLE_RANK = 60;
const BETWEEN_COLUMNS = 3;

/** How the tables are read, by a row of the first of them, and what each of their columns means. */
export const howToReadPages: BlockPages = (context) => {
  const flow = openBlock(context);
  const own = ownText(context.block);
  if (own.length > 0) layText(flow, 'own', own);
  else layParts(flow, standing(context));
  const parts = columns(context);
  const look = { grid: factGrid(flow, parts, READING), between: BETWEEN_COLUMNS };
  layHeading(flow, 'columns heading', say(context.words, 'how.columns'), heightOfParts(flow, parts.slice(0, 2), look));
  layParts(flow, parts, look);
  return { pages: flow.pages, remarks: [] };
};

function standing({ normSet, words }: BlockContext): readonly TextPart[] {
  const [norms] = normSet.groups;
  if (norms === undefined) return [];
  const part = (name: string, head: string, paragraphs: readonly string[]): TextPart => ({
    name,
    head,
    headIs: 'heading',
    paragraphs,
  });
  const row = exampleRow(norms);
  return [
    ...(row === null ? [] : [part('example', say(words, 'how.example'), example(normSet, norms, row, words))]),
    part('ends', endsHead(normSet, words), [endsText(normSet, words)]),
    part('not', say(words, 'how.not'), [
      say(words, 'how.not-correct'),
      [...unequalSteps(normSet, norms, words), say(words, 'how.not-average')].join(' '),
    ]),
  ];
}

/** The row whose rank, printed as it was worked out, lies nearest to that of the example. */
function exampleRow({ rows }: GroupNorms): ConversionRow | null {
  const plain = rows.filter(({ provenance, adjusted }) => provenance.printed.end === null && adjusted === null);
  const away = ({ percentileRank }: ConversionRow): number => Math.abs(percentileRank - EXAMPLE_RANK);
  return plain.reduce<ConversionRow | null>(
    (best, row) => (best === null || away(row) < away(best) ? row : best),
    null,
  );
}

function example(normSet: NormSet, norms: GroupNorms, row: ConversionRow, words: PrintWords): readonly string[] {
  const { project } = normSet;
  const direction = project.tally?.scale.direction ?? 'high-is-good';
  const [score, rank] = [figure(words, row.scoreText), figure(words, row.printed)];
  const share = {
    definition: definitionInWords(project.curve.definition, direction, words),
    exact: figure(words, row.texts['exact-rank']),
    rank,
  };
  const noun = groupNoun(project.groups.documentation) === 'sample' ? 'sample' : 'norm-group';
  const smoothed = norms.smoothing.state === 'smoothed';
  const others = tableColumns(project, words).filter(({ key }) => key !== 'score' && key !== 'rank');
  const table = tableName(project, 0, norms);
  return [
    [
      ...(direction === 'low-is-good' ? [say(words, 'how.low-is-good')] : []),
      say(words, 'how.rank', { table, score, rank }),
      ...counts(normSet, norms, row, words),
      say(words, smoothed ? `how.smoothed-${noun}` : `how.share-${noun}`, share),
    ].join(' '),
    [
      ...(others.length === 0
        ? []
        : [say(words, 'how.beside', { list: inSeries(words, others.map(named(row, words))) })]),
      ...otherGroup(normSet, row, words),
    ].join(' '),
  ];
}

function named(row: ConversionRow, words: PrintWords): (column: TableColumn) => string {
  return (column) => say(words, 'how.cell', { name: column.name, text: printedCell(words, row, column) });
}

/** How many had a poorer score and the same; nothing where people do not weigh alike. */
function counts({ project }: NormSet, norms: GroupNorms, row: ConversionRow, words: PrintWords): readonly string[] {
  if (norms.group.table.weighted) return [];
  const { below, at, all } = row.provenance.percentileRank;
  const lowIsGood = project.tally?.scale.direction === 'low-is-good';
  return [
    say(words, lowIsGood ? 'how.counts-higher' : 'how.counts-lower', {
      people: countedPeople(printCount(all), project.people, words),
      worse: figure(words, printCount(below)),
      same: figure(words, printCount(at)),
    }),
  ];
}

/** Where the same score stands in the last group. */
function otherGroup({ groups, project }: NormSet, { score }: ConversionRow, words: PrintWords): readonly string[] {
  const last = groups.length - 1;
  const other = groups[last];
  const rank = other?.rows.find((row) => row.score === score)?.printed;
  if (last < 1 || other === undefined || rank === undefined) return [];
  return [say(words, 'how.other-group', { table: tableName(project, last, other), rank: figure(words, rank) })];
}

/** Two steps of one point with the longest and the shortest way of the rank among those that print as numbers. */
function unequalSteps({ project }: NormSet, norms: GroupNorms, words: PrintWords): readonly string[] {
  const steps = norms.rows.slice(1).flatMap((to, index) => {
    const from = norms.rows[index];
    if (from === undefined || [from, to].some(({ provenance }) => provenance.printed.end !== null)) return [];
    return [{ from, to, way: Math.abs(to.percentileRank - from.percentileRank) }];
  });
  const byWay = steps.toSorted((one, other) => other.way - one.way);
  const [longest, shortest] = [byWay[0], byWay.at(-1)];
  if (longest === undefined || shortest === undefined || longest.way === shortest.way) return [];
  return [
    say(words, 'how.not-equal', {
      table: tableName(project, 0, norms),
      'a-from': figure(words, longest.from.scoreText),
      'a-to': figure(words, longest.to.scoreText),
      'a-low': figure(words, longest.from.printed),
      'a-high': figure(words, longest.to.printed),
      'b-from': figure(words, shortest.from.scoreText),
      'b-to': figure(words, shortest.to.scoreText),
      'b-low': figure(words, shortest.from.printed),
      'b-high': figure(words, shortest.to.printed),
    }),
  ];
}

function columns({ normSet, words }: BlockContext): readonly TextPart[] {
  return tableColumns(normSet.project, words).map(({ key, name, explanation }) => ({
    name: `column ${key}`,
    head: asSentence(name),
    headIs: 'words',
    paragraphs: [explanation],
  }));
}
