import type { SheetChoices } from '../norms/norm-project.ts';
import type { Paper } from './booklet.ts';
import { RUNNING } from './type-sizes.ts';

type PaperChoices = Pick<SheetChoices, 'paper' | 'orientation' | 'marginMm' | 'gutterMm'>;

/** Shorter and longer edge in points: A4 and A5 by ISO 216 (210 × 297 and 148 × 210 mm), Letter 8½ × 11 inches. */
const EDGES: Readonly<Record<SheetChoices['paper'], readonly [number, number]>> = {
  a4: [595.28, 841.89],
  letter: [612, 792],
  a5: [419.53, 595.28],
};

/** 18 mm, and 12 mm on the small sheet. */
const MARGINS: Readonly<Record<SheetChoices['paper'], number>> = { a4: 51, letter: 51, a5: 34 };
/** The usual head stands this much above its margin, the foot this much below. */
const OUTSIDE = 6;
const POINTS_PER_MM = 72 / 25.4;
/** Room that margins have to leave for the page between them, points. */
const LEAST_ROOM = { width: 250, height: 290 } as const;

/** The sheet of a booklet. Margins that would leave too little room are narrowed; see `paperRemarks`. */
export function paperOf(choices: PaperChoices): Paper {
  const [width, height] = edgesOf(choices);
  const gutter = choices.gutterMm * POINTS_PER_MM;
  if (choices.marginMm === null) {
    const usual = MARGINS[choices.paper];
    const margin = Math.min(usual, roomiest(choices));
    return { width, height, margin, edge: margin - OUTSIDE - RUNNING.leading / 2, gutter };
  }
  const margin = Math.min(choices.marginMm * POINTS_PER_MM, roomiest(choices));
  return { width, height, margin, edge: margin, gutter };
}

/** That margins were set narrower than asked, as a sentence that tells what to do. */
export function paperRemarks(choices: PaperChoices): readonly string[] {
  const asked = choices.marginMm === null ? MARGINS[choices.paper] : choices.marginMm * POINTS_PER_MM;
  const { margin } = paperOf(choices);
  if (margin >= asked) return [];
  return [
    `Margins and gutter leave too little room for the tables; the margins are set at ${Math.floor(margin / POINTS_PER_MM)} mm. ` +
      'Choose smaller ones, or turn or enlarge the paper.',
  ];
}

function edgesOf({ paper, orientation }: PaperChoices): readonly [number, number] {
  const [short, long] = EDGES[paper];
  return orientation === 'portrait' ? [short, long] : [long, short];
}

/** The widest margin that leaves room enough, points. */
function roomiest(choices: PaperChoices): number {
  const [width, height] = edgesOf(choices);
  const across = width - choices.gutterMm * POINTS_PER_MM - LEAST_ROOM.width;
  return Math.min(across, height - LEAST_ROOM.height) / 2;
}
