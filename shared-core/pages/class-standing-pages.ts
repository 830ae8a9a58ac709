import { figure, printWords, say, type PrintWords } from '../languages/phrases.ts';
import { countedPeople } from '../norms/norm-groups.ts';
import type { ScoreScale } from '../scale/score-scale.ts';
import { printCount } from '../scores/printed-number.ts';
import type { PlacedPages } from './booklet.ts';
import type { StandingPrint } from './class-print.ts';
import { layMissed, layTitle, openReport, placedReport, type ReportHead } from './class-report-frame.ts';
import { classSubtitle, classTitle, keptParagraph, missedParagraphs } from './class-report-texts.ts';
import { layCountsAndScores } from './class-scores-blocks.ts';
import { BETWEEN_SECTIONS, fitted } from './class-sections.ts';
import { standingTable } from './class-standing-table.ts';
import type { Paragraph } from './paragraph.ts';
import { layRowTable } from './row-table.ts';
import { paragraphLines } from './text-lines.ts';
import { PROSE } from './type-sizes.ts';

const ABOVE_TABLE = 12;

/**
 * The standing of a class within itself, called that and nothing else: places, raw scores and the share with the same or
 * a poorer score. It speaks of nobody outside of the class.
 */
export function composeClassStanding(print: StandingPrint): PlacedPages {
  const { file, standing } = print;
  if (file.sharing.as === 'summary') throw new RangeError('a standing without pupils tells nothing');
  const words = printWords(file.report.language);
  const title = say(words, 'standing.title');
  const head: ReportHead = {
    title: classTitle(print, words),
    subtitle: classSubtitle(print, title, words),
    place: title,
    foot: say(words, 'class.report-check', { check: standing.check }),
    draft: '',
  };
  const open = openReport(head, file.report.paper, words);
  const { flow } = open;
  layTitle(flow, head, standingParagraphs(print, words));
  if (standing.pupils.length > 0) {
    flow.skip(ABOVE_TABLE);
    const table = standingTable(print, words);
    layRowTable(flow, table, fitted(table, flow.width));
  }
  layMissed(flow, missedParagraphs(print, standing, words));
  flow.skip(BETWEEN_SECTIONS);
  layCountsAndScores(flow, standing.counts, standing.facts, scaleOf(print), words);
  flow.skip(BETWEEN_SECTIONS);
  flow.inTwoColumns(paragraphLines(closingParagraphs(print, words), PROSE, flow.halfWidth, 'reading'), PROSE);
  return placedReport(head, open, file.report.language, standing.remark === null ? [] : [standing.remark]);
}

/** What the standing is, and how coarse. */
export function standingParagraphs({ standing, file }: StandingPrint, words: PrintWords): readonly Paragraph[] {
  const n = figure(words, printCount(standing.pupils.length));
  const text = [
    say(words, 'standing.text', { n }),
    ...(standing.direction === 'low-is-good' ? [say(words, 'class.low-is-good')] : []),
  ];
  return [
    { lead: say(words, 'standing.lead'), text: text.join(' ') },
    ...(standing.onePupil === null
      ? []
      : [
          {
            lead: say(words, 'standing.coarse-lead'),
            text: say(words, 'standing.coarse', {
              n,
              one: countedPeople('1', file.people, words),
              points: figure(words, standing.onePupil),
            }),
          },
        ]),
  ];
}

function closingParagraphs(print: StandingPrint, words: PrintWords): readonly Paragraph[] {
  return [
    { lead: say(words, 'class.cautions-lead'), text: say(words, 'standing.cautions') },
    ...keptParagraph(print, words),
  ];
}

/** From the lowest to the highest score obtained: the class knows no other scale. */
function scaleOf({ standing }: StandingPrint): ScoreScale | null {
  const scores = (standing.facts?.scores ?? []).map(({ score }) => score);
  const [min, max] = [scores[0], scores.at(-1)];
  if (min === undefined || max === undefined || min === max) return null;
  const steps = scores.slice(1).map((score, index) => score - (scores[index] ?? 0));
  return { min, max, step: Math.min(...steps), direction: standing.direction };
}
