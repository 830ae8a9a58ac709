import { type PrintWords, say } from '../languages/phrases.ts';
import { INVERSE_PERCENTILES } from '../norms/inverse-table.ts';
import type { NormSet } from '../norms/norm-set.ts';
import { rankColumn } from '../norms/table-columns.ts';
import { layAcross } from './across-pages.ts';
import type { AcrossTable } from './across-table.ts';
import { layIntroduction } from './block-introduction.ts';
import { openBlock } from './block-opening.ts';
import type { BlockPages } from './block-pages.ts';
import { figureCell } from './table-cells.ts';
import { groupHeads } from './groups-across-pages.ts';

/** One table of all groups: percentile ranks down, groups across, in each cell the raw score that reaches the rank. */
export const inversePages: BlockPages = (context) => {
  const { normSet, words } = context;
  const flow = openBlock(context);
  const good = normSet.project.tally?.scale.direction !== 'low-is-good';
  layIntroduction(
    flow,
    context,
    say(words, good ? 'inverse-block.lowest' : 'inverse-block.highest', {
      people: say(words, `people.${normSet.project.people}`),
    }),
  );
  return { remarks: layAcross(flow, context, inverseAcross(normSet, words)), pages: flow.pages };
};

function inverseAcross({ groups, project }: NormSet, words: PrintWords): AcrossTable {
  return {
    table: 'inverse-across',
    rowHead: rankColumn(words).heading,
    groups: groupHeads({ groups, project }, words),
    scale: null,
    rows: INVERSE_PERCENTILES.map((percentile, position) => ({
      row: percentile,
      scores: [],
      head: figureCell(words, String(percentile)),
      cells: groups.map(({ inverse }) => {
        const row = inverse[position];
        if (row?.percentile !== percentile) throw new RangeError('inverse tables list the same percentiles');
        return figureCell(words, row.scoreText);
      }),
    })),
  };
}
