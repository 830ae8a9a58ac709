import { figure, type PrintWords, say } from '../languages/phrases.ts';
import type { NormSet } from '../norms/norm-set.ts';
import { scoreColumn } from '../norms/table-columns.ts';
import { printCount } from '../scores/printed-number.ts';
import { layAcross } from './across-pages.ts';
import type { AcrossGroup, AcrossTable } from './across-table.ts';
import { layIntroduction } from './block-introduction.ts';
import { openBlock } from './block-opening.ts';
import type { BlockContext, BlockPages } from './block-pages.ts';
import { printedTitle } from './sheet-texts.ts';
import { figureCell, rankCell } from './table-cells.ts';
import { layAdjustmentNotes, layTableNote } from './table-notes.ts';

/** One table of all groups: raw scores down, groups across, in each cell the printed percentile rank. */
export const groupsAcrossPages: BlockPages = (context) => {
  const { normSet, words } = context;
  const flow = openBlock(context);
  layIntroduction(
    flow,
    context,
    say(words, 'across.how-to-read', { people: say(words, `people.${normSet.project.people}`) }),
  );
  const remarks = layAcross(flow, context, groupsAcross(normSet, words));
  layTableNote(flow, 'smoothed', smoothedNote(context));
  layAdjustmentNotes(flow, normSet, normSet.groups, words);
  return { pages: flow.pages, remarks };
};

function groupsAcross(normSet: NormSet, words: PrintWords): AcrossTable {
  const { groups } = normSet;
  const [first] = groups;
  const scores = first?.rows ?? [];
  return {
    table: 'groups-across',
    rowHead: scoreColumn(words).heading,
    groups: groupHeads(normSet, words),
    scale: first?.group.table.scale ?? null,
    rows: scores.map(({ score, scoreText }, position) => ({
      row: score,
      scores: [score],
      head: figureCell(words, scoreText),
      cells: groups.map(({ rows }) => {
        const row = rows[position];
        if (row?.score !== score) throw new RangeError('groups of one tally have one scale');
        return rankCell(words, row.printed, row.adjusted !== null);
      }),
    })),
  };
}

/** The groups as heads: their titles, and under each how many people it has. */
export function groupHeads({ groups, project }: NormSet, words: PrintWords): readonly AcrossGroup[] {
  return groups.map(({ group, summary }) => ({
    title: printedTitle(project, group),
    note: say(words, 'across.n', { count: figure(words, printCount(summary.n)) }),
  }));
}

/** Which groups are smoothed; null where none is. */
function smoothedNote({ normSet: { groups, project }, words }: BlockContext): string | null {
  const smoothed = groups.filter(({ smoothing }) => smoothing.state === 'smoothed');
  if (smoothed.length === 0) return null;
  if (smoothed.length === groups.length) return say(words, 'across.all-smoothed');
  return say(words, 'across.some-smoothed', {
    groups: smoothed.map(({ group }) => printedTitle(project, group)).join('; '),
  });
}
