import { phraseProblem, printWords, say, type PrintWords } from '../languages/phrases.ts';
import type { SlipChoices } from '../class/class-file.ts';
import type { Reply } from '../desk.ts';
import type { Block, Paper, PlacedPage, PlacedPages } from './booklet.ts';
import { pupilsInOrder, type ClassPrint } from './class-print.ts';
import { classTitle } from './class-report-texts.ts';
import { cutMarks, slipBoxes } from './slip-cuts.ts';
import { placeSlip } from './slip-layout.ts';
import { slipTexts, type SlipTexts } from './slip-texts.ts';
import { missingSignsRemark } from './missing-signs.ts';
import { paperOf } from './paper.ts';

type PerPage = SlipChoices['perPage'];

/** Sizes of the sentences, points, tried from the largest that is sensible for so many slips on a page. */
const SIZES = [12, 11.4, 10.8, 10.2, 9.6, 9.1, 8.6, 8.2, 7.8, 7.4, 7] as const;
const LARGEST: Readonly<Record<PerPage, number>> = { 1: 12, 2: 10.2, 3: 9.6, 4: 9.6 };

const NO_PUPILS = 'Nobody in the list has a score that can be reported, so there are no slips. Enter the scores first.';
const TOO_LONG =
  'The sentences of the slips do not fit a page of this paper. Shorten your own sentences, or take larger paper.';

/**
 * A slip for each pupil with a score, as many to a page as chosen and never divided. Where they do not fit, fewer stand
 * on a page, and a remark says so. Sentences of the user stand in place of the standing ones. Names are printed only
 * where the sharing chosen prints names.
 */
export function composeSlips(print: ClassPrint): Reply<PlacedPages> {
  const { file } = print;
  if (file.sharing.as === 'summary') throw new RangeError('a summary has no slips');
  const { perPage, language, texts: own } = file.slips;
  const words = printWords({ ...language, phrases: [...language.phrases, ...own] });
  const slips = pupilsInOrder(print).map((pupil) => slipTexts(print, words, pupil));
  if (slips.length === 0) return { ok: false, problem: NO_PUPILS };
  const paper = paperOf({ paper: file.slips.paper, orientation: 'portrait', marginMm: null, gutterMm: 0 });
  for (const count of ([4, 3, 2, 1] as const).filter((each) => each <= perPage)) {
    const placed = placedSlips(slips, count, paper);
    if (placed === null) continue;
    const pages = pagesOf(placed, count, paper, title(print, words));
    const remarks = [...fewerRemark(perPage, count), ...ownTextRemarks(own), ...missingSignsRemark(pages)];
    return { ok: true, value: { title: title(print, words), language: language.tag, paper, pages, remarks } };
  }
  return { ok: false, problem: TOO_LONG };
}

/** Begins the names of all that stands on a slip, counted from 0. */
export function slipKey(index: number): string {
  return `slip ${index}`;
}

function title(print: ClassPrint, words: PrintWords): string {
  const named = say(words, 'slip.title', { class: classTitle(print, words) });
  return print.results.table.draft ? `${say(words, 'head.draft')} · ${named}` : named;
}

/** All slips in the largest type in which every one fits; null where none does. */
function placedSlips(
  slips: readonly SlipTexts[],
  perPage: PerPage,
  paper: Paper,
): readonly (readonly Block[])[] | null {
  const boxes = slipBoxes(perPage, paper);
  for (const size of SIZES.filter((each) => each <= LARGEST[perPage])) {
    const placed: (readonly Block[])[] = [];
    for (const [index, slip] of slips.entries()) {
      const box = boxes[index % perPage];
      if (box === undefined) throw new RangeError('a slip without a place');
      const blocks = placeSlip(slip, slipKey(index), box, size);
      if (blocks === null) break;
      placed.push(blocks);
    }
    if (placed.length === slips.length) return placed;
  }
  return null;
}

function pagesOf(
  slips: readonly (readonly Block[])[],
  perPage: PerPage,
  paper: Paper,
  heading: string,
): readonly PlacedPage[] {
  return Array.from({ length: Math.ceil(slips.length / perPage) }, (_, page) => ({
    number: page + 1,
    opens: page === 0 ? heading : null,
    blocks: [...cutMarks(perPage, paper), ...slips.slice(page * perPage, (page + 1) * perPage).flat()],
  }));
}

function fewerRemark(asked: PerPage, taken: PerPage): readonly string[] {
  if (asked === taken) return [];
  return [
    `${asked} slips do not fit on a page of this paper in type that can be read; ${taken} ${taken === 1 ? 'stands' : 'stand'} ` +
      'on each. Take larger paper, or shorten your own sentences.',
  ];
}

function ownTextRemarks(own: SlipChoices['texts']): readonly string[] {
  return own.flatMap(({ key, text }) => {
    const problem = phraseProblem(key, text);
    return problem === null ? [] : [problem];
  });
}
