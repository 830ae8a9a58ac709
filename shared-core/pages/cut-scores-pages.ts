import { figure, type PrintWords, say } from '../languages/phrases.ts';
import { cutTables, type CutRow, type CutTable } from '../norms/cut-table.ts';
import type { NormSet } from '../norms/norm-set.ts';
import { layIntroduction } from './block-introduction.ts';
import { openBlock } from './block-opening.ts';
import type { BlockPages } from './block-pages.ts';
import { brokenLines, cutColumns, measureCuts, type CutColumn } from './cut-columns.ts';
import { printedTitle } from './sheet-texts.ts';
import { inCountedFives } from './row-blocks.ts';
import { wordsCell } from './table-cells.ts';
import { layAdjustmentNotes } from './table-notes.ts';
import { layTable } from './table-pages.ts';
import type { Five, LooseRow } from './table-rows.ts';
import { chosenType, rowHeightRemark, smallerRemark } from './table-type.ts';
import { READING } from './type-sizes.ts';

const BETWEEN_TABLES = 18;

/** What each cut means in each of its groups: a table under its name and score. Nothing without cuts. */
export const cutScoresPages: BlockPages = (context) => {
  const { normSet, words } = context;
  const { project, groups } = normSet;
  const tables = printedCuts(normSet);
  if (tables.length === 0) return { pages: [], remarks: [] };
  const weighted = groups.some(({ group }) => group.table.weighted);
  const flow = openBlock(context);
  const { sheet } = project;
  const people = say(words, `people.${project.people}`);
  layIntroduction(flow, context, say(words, weighted ? 'cuts.how-to-read-weighted' : 'cuts.how-to-read', { people }));
  const rows = tables.flatMap((table) => table.rows);
  const columns = cutColumns(project, rows, words);
  const { measure, titleRoom, smaller } = measureCuts(
    columns,
    rows,
    say(words, 'cuts.group'),
    chosenType(sheet),
    flow.width,
  );
  const linesOf = ({ title }: CutRow): readonly string[] =>
    brokenLines(title, 'sans-bold', measure.type.row.size, titleRoom);
  tables.forEach((table, index) => {
    if (index > 0) flow.skip(BETWEEN_TABLES);
    const text = headingOf(table, words);
    const role = { kind: 'heading', level: 2, name: `cut ${index}` } as const;
    const blocks = cutBlocks(table, columns, linesOf, sheet.fives);
    layTable(flow, `cuts ${index}`, blocks, measure, { text, face: 'sans-bold', type: READING, role });
  });
  layAdjustmentNotes(
    flow,
    normSet,
    groups.filter((_, group) => rows.some((row) => row.group === group && row.row?.adjusted)),
    words,
  );
  return {
    pages: flow.pages,
    remarks: [rowHeightRemark(sheet), smaller ? smallerRemark(sheet) : null].filter((remark) => remark !== null),
  };
};

/** The cuts that stand in a group, with its title as it is printed. */
export function printedCuts({ project, groups }: NormSet): readonly CutTable[] {
  return cutTables(project, groups)
    .filter(({ rows }) => rows.length > 0)
    .map((table) => ({
      ...table,
      rows: table.rows.map((row) => {
        const norms = groups[row.group];
        return norms === undefined ? row : { ...row, title: printedTitle(project, norms.group) };
      }),
    }));
}

function headingOf({ cut, scoreText }: CutTable, words: PrintWords): string {
  const [name, score] = [cut.name.trim(), figure(words, scoreText)];
  return name === '' ? say(words, 'cuts.heading-nameless', { score }) : say(words, 'cuts.heading', { name, score });
}

/** A row for each group; a title of several lines goes on below its figures. */
function cutBlocks(
  { rows }: CutTable,
  columns: readonly CutColumn[],
  linesOf: (row: CutRow) => readonly string[],
  fives: boolean,
): readonly Five[] {
  const groups = rows.map((row): readonly LooseRow[] => {
    const lines = linesOf(row);
    const said = lines.length > 1 ? row.title : null;
    return lines.map((line, index) => ({
      row: row.group,
      scores: [],
      cut: null,
      cells: [wordsCell(line, said), ...columns.map(({ cellOf }) => (index === 0 ? cellOf(row) : wordsCell('')))],
    }));
  });
  return fives ? inCountedFives(groups).map((five) => five.flat()) : groups;
}
