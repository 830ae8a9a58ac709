import type { ClassCounts } from '../class/class-rows.ts';
import type { ScoreFacts } from '../class/score-facts.ts';
import { figure, say, type PrintWords } from '../languages/phrases.ts';
import type { ScoreScale } from '../scale/score-scale.ts';
import { printCount } from '../scores/printed-number.ts';
import { boxPicture } from './class-pictures.ts';
import {
  BETWEEN_SECTIONS,
  captionLines,
  layAcross,
  laySideBySide,
  namedFigures,
  placeCaption,
} from './class-sections.ts';
import type { RowTable } from './row-table.ts';
import type { SheetFlow } from './sheet-flow.ts';
import { heightOf } from './text-lines.ts';
import { SMALL_PROSE } from './type-sizes.ts';

const BOX_HEIGHT = 62;
const BELOW_PICTURE = 4;

/** How many are in the list and why, and the raw scores of the class: five numbers and a box plot, or the scores themselves. */
export function layCountsAndScores(
  flow: SheetFlow,
  counts: ClassCounts,
  facts: ScoreFacts | null,
  scale: ScoreScale | null,
  words: PrintWords,
): void {
  const numbers =
    facts === null || facts.boxPlot === null
      ? []
      : fiveNumbers(facts, words).map(([name, text]) => [name, figure(words, text)] as const);
  const heads = [say(words, 'class.place'), say(words, 'class.score')] as const;
  laySideBySide(flow, [
    { heading: say(words, 'class.counts-heading'), table: countsTable(counts, words) },
    ...(numbers.length === 0
      ? []
      : [{ heading: say(words, 'class.scores-heading'), table: namedFigures('scores', heads, numbers) }]),
  ]);
  if (facts === null || facts.n === 0) return;
  flow.skip(BETWEEN_SECTIONS);
  if (facts.boxPlot !== null && scale !== null) layBox(flow, { ...facts, boxPlot: facts.boxPlot }, scale, words);
  else layAcross(flow, 'scores listed', say(words, 'class.scores-listed', { scores: scoresInWords(facts, words) }));
}

function countsTable(counts: ClassCounts, words: PrintWords): RowTable {
  return namedFigures(
    'counts',
    [say(words, 'class.counted'), say(words, 'class.count')],
    countRows(counts, words).map(([name, count]) => [name, figure(words, count)]),
  );
}

/** How many are in the list and why, with the words for it; figures as `printed-number` writes them. */
export function countRows(counts: ClassCounts, words: PrintWords): readonly (readonly [string, string])[] {
  const rows = [
    ['class.count-listed', counts.rows, true],
    ['class.count-reported', counts.reported, true],
    ['class.count-absent', counts.absent, true],
    ['class.count-not-tested', counts.notTested, true],
    ['class.count-excused', counts.excused, true],
    ['class.count-left-out', counts.leftOut, false],
    ['class.count-open', counts.open, false],
  ] as const;
  return rows
    .filter(([, count, always]) => always || count > 0)
    .map(([key, count]) => [say(words, key), printCount(count)] as const);
}

const FIVE_NAMES = ['class.lowest', 'class.lower-hinge', 'class.median', 'class.upper-hinge', 'class.highest'] as const;

/** The five numbers with their names, in the words of the report; figures as `printed-number` writes them. */
export function fiveNumbers(facts: ScoreFacts, words: PrintWords): readonly (readonly [string, string])[] {
  return (facts.fiveNumbers ?? []).map(({ printed }, index) => {
    const name = FIVE_NAMES[index];
    if (name === undefined) throw new RangeError('a sixth of five numbers');
    return [say(words, name), printed];
  });
}

function scoresInWords({ scores }: ScoreFacts, words: PrintWords): string {
  return scores
    .flatMap(({ scoreText, count }) => Array.from({ length: count }, () => figure(words, scoreText)))
    .join('; ');
}

function layBox(
  flow: SheetFlow,
  facts: ScoreFacts & { readonly boxPlot: NonNullable<ScoreFacts['boxPlot']> },
  scale: ScoreScale,
  words: PrintWords,
): void {
  const size = { width: flow.width, height: BOX_HEIGHT };
  const caption = captionLines(flow, 'box', say(words, 'class.box-caption'));
  flow.need(size.height + BELOW_PICTURE + heightOf(caption, SMALL_PROSE));
  const numbers = fiveNumbers(facts, words).map(([name, text]) => `${name} ${figure(words, text)}`);
  flow.place(
    [
      {
        kind: 'picture',
        x: flow.left,
        y: flow.y,
        ...size,
        svg: boxPicture(facts, scale, size, (text) => figure(words, text)),
        alt: say(words, 'class.box-alt', { numbers: numbers.join(', ') }),
      },
    ],
    size.height + BELOW_PICTURE,
  );
  placeCaption(flow, caption);
}
