import { figure, say, wordsOf, type PrintWords } from '../languages/phrases.ts';
import { cutsOfGroup, firstOnGoodSide } from '../norms/cuts.ts';
import type { GroupNorms } from '../norms/group-norms.ts';
import type { NormProject } from '../norms/norm-project.ts';
import { printedRows, type PrintedRow } from '../norms/printed-rows.ts';
import { tableColumns, type TableColumn } from '../norms/table-columns.ts';
import type { PlacedCell } from './booklet.ts';
import { cellText } from './sheet-texts.ts';
import { spokenFigure } from './spoken-text.ts';
import type { LooseRow } from './table-rows.ts';

/** The rows of a group's conversion table, lowest score first, with the rules that mark its cuts. */
export function conversionLines(project: NormProject, norms: GroupNorms): readonly LooseRow[] {
  const { scale } = norms.group.table;
  const columns = tableColumns(project);
  const words = wordsOf(project);
  const side = scale.direction === 'high-is-good' ? 'above' : 'below';
  const cuts = new Set(
    cutsOfGroup(project, norms.group.key).map(({ score }) => norms.rows[firstOnGoodSide(scale, score) ?? -1]),
  );
  return printedRows(project, norms).map((printed) => ({
    row: printed.shown.score,
    scores: printed.rows.map(({ score }) => score),
    cells: columns.map((column) => conversionCell(words, printed, column)),
    cut: printed.rows.some((row) => cuts.has(row)) ? side : null,
  }));
}

function conversionCell(words: PrintWords, { scoreText, shown }: PrintedRow, column: TableColumn): PlacedCell {
  if (column.key === 'score') return figureCell(words, scoreText);
  const text = cellText(shown, column);
  return column.key === 'rank' ? rankCell(words, text, shown.adjusted !== null) : figureCell(words, text);
}

/** A figure of the norm set as it is printed. */
export function figureCell(words: PrintWords, text: string): PlacedCell {
  const printed = figure(words, text);
  return { text: printed, said: spokenFigure(words, printed), marked: false };
}

/** A percentile rank of the norm set as it is printed, with its mark where it was adjusted by hand. */
export function rankCell(words: PrintWords, text: string, adjusted: boolean): PlacedCell {
  const cell = figureCell(words, text);
  if (!adjusted) return cell;
  return { ...cell, said: say(words, 'spoken.adjusted', { figure: cell.said ?? cell.text }), marked: true };
}
