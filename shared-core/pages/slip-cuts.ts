import type { SlipChoices } from '../class/class-file.ts';
import type { Paper, Rule } from './booklet.ts';
import type { SlipBox } from './slip-layout.ts';

type PerPage = SlipChoices['perPage'];

const GRID: Readonly<Record<PerPage, { readonly across: 1 | 2; readonly down: 1 | 2 | 3 }>> = {
  1: { across: 1, down: 1 },
  2: { across: 1, down: 2 },
  3: { across: 1, down: 3 },
  4: { across: 2, down: 2 },
};
/** White space between a cut and what stands beside it, against the margin of the paper. */
const AT_CUT = 0.5;
/** Slips above one another have less white above and below than a whole page. */
const AT_EDGE = 0.72;
/** A mark reaches this far from the edge into the margin, and this far to either side of a crossing. */
const MARK = 24;
const CROSSING = 7;
const WEIGHT = 0.4;

/** The places of the slips on a page, in order. */
export function slipBoxes(perPage: PerPage, { width, height, margin }: Paper): readonly SlipBox[] {
  const { across, down } = GRID[perPage];
  const [wide, high] = [width / across, height / down];
  const above = perPage === 1 ? margin : margin * AT_EDGE;
  const beside = across === 1 ? margin : margin * AT_EDGE;
  return Array.from({ length: perPage }, (_, index) => {
    const [column, row] = [index % across, Math.floor(index / across)];
    const left = column === 0 ? beside : margin * AT_CUT;
    const right = column === across - 1 ? beside : margin * AT_CUT;
    const top = row === 0 ? above : margin * AT_CUT;
    const bottom = row === down - 1 ? above : margin * AT_CUT;
    return {
      x: column * wide + left,
      y: row * high + top,
      width: wide - left - right,
      height: high - top - bottom,
    };
  });
}

/** Where to cut: short strokes at the edges of the paper, and a cross where two cuts meet. */
export function cutMarks(perPage: PerPage, { width, height }: Paper): readonly Rule[] {
  const { across, down } = GRID[perPage];
  const rows = Array.from({ length: down - 1 }, (_, cut) => ((cut + 1) * height) / down);
  const columns = Array.from({ length: across - 1 }, (_, cut) => ((cut + 1) * width) / across);
  return [
    ...rows.flatMap((y) => [lying(0, y, MARK), lying(width - MARK, y, MARK)]),
    ...columns.flatMap((x) => [standing(x, 0, MARK), standing(x, height - MARK, MARK)]),
    ...rows.flatMap((y) =>
      columns.flatMap((x) => [lying(x - CROSSING, y, 2 * CROSSING), standing(x, y - CROSSING, 2 * CROSSING)]),
    ),
  ];
}

function lying(x: number, y: number, length: number): Rule {
  return { kind: 'rule', x, y, width: length, weight: WEIGHT };
}

/** A rule as wide as its line is thick, and as thick as its line is long, stands upright. */
function standing(x: number, top: number, length: number): Rule {
  return { kind: 'rule', x: x - WEIGHT / 2, y: top + length / 2, width: WEIGHT, weight: length };
}
