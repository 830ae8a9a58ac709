import { cutsOfGroup, firstOnGoodSide } from '../norms/cuts.ts';
import type { GroupNorms } from '../norms/group-norms.ts';
import type { NormProject } from '../norms/norm-project.ts';
import { printedRows, type PrintedRow } from '../norms/printed-rows.ts';
import { tableColumns, type TableColumn } from '../norms/table-columns.ts';
import type { PlacedCell } from './booklet.ts';
import { cellText } from './sheet-texts.ts';
import { spokenFigure } from './spoken-text.ts';
import type { LooseRow } from './table-rows.ts';

/** How the mark behind a rank is read aloud. */
const ADJUSTED_IN_WORDS = 'adjusted by hand';

/** The rows of a group's conversion table, lowest score first, with the rules that mark its cuts. */
export function conversionLines(project: NormProject, norms: GroupNorms): readonly LooseRow[] {
  const { scale } = norms.group.table;
  const columns = tableColumns(project);
  const side = scale.direction === 'high-is-good' ? 'above' : 'below';
  const cuts = new Set(
    cutsOfGroup(project, norms.group.key).map(({ score }) => norms.rows[firstOnGoodSide(scale, score) ?? -1]),
  );
  return printedRows(project, norms).map((printed) => ({
    row: printed.shown.score,
    scores: printed.rows.map(({ score }) => score),
    cells: columns.map((column) => conversionCell(printed, column)),
    cut: printed.rows.some((row) => cuts.has(row)) ? side : null,
  }));
}

function conversionCell({ scoreText, shown }: PrintedRow, column: TableColumn): PlacedCell {
  if (column.key === 'score') return figureCell(scoreText);
  const text = cellText(shown, column);
  return column.key === 'rank' ? rankCell(text, shown.adjusted !== null) : figureCell(text);
}

/** A printed figure. */
export function figureCell(text: string): PlacedCell {
  return { text, said: spokenFigure(text), marked: false };
}

/** A printed percentile rank, with its mark where it was adjusted by hand. */
export function rankCell(text: string, adjusted: boolean): PlacedCell {
  const figure = figureCell(text);
  return adjusted ? { text, said: `${figure.said ?? text}, ${ADJUSTED_IN_WORDS}`, marked: true } : figure;
}
