import type { PointsOf } from '../../shared-core/norms/norm-set-file.ts';
import type { GroupNorms } from '../../shared-core/norms/group-norms.ts';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { tableColumns, type TableColumn } from '../../shared-core/norms/table-columns.ts';
import { cellText, sampleFacts, sheetSubtitle } from '../../shared-core/pages/sheet-texts.ts';
import { inFives } from '../../shared-core/pages/table-rows.ts';
import { POINT_DEFINITION_WORDS } from '../../shared-core/percentile/percentile-point.ts';
import { printNumber } from '../../shared-core/scores/printed-number.ts';

const GAP = '  ';

/** The tables of a set as plain text: one after the other, each with its definition, its n and its cautions. */
export function textTables(normSet: NormSet, pointsOf: PointsOf): string {
  const { project } = normSet;
  return normSet.groups
    .map((norms) =>
      [
        norms.group.title,
        `${sheetSubtitle(project)}.`,
        sampleFacts(project, norms),
        '',
        ...tableLines(normSet, norms),
        '',
        ...pointLines(norms, pointsOf),
        project.sheet.cautions,
      ]
        .map((line) => `${line}\n`)
        .join(''),
    )
    .join('\n\n');
}

/** Heading and rows, aligned to the right, with an empty line between fives. */
function tableLines({ project }: NormSet, { group, rows }: GroupNorms): readonly string[] {
  const columns = tableColumns(project);
  const deepest = Math.max(...columns.map(({ heading }) => heading.length));
  const heading = Array.from({ length: deepest }, (_, line) =>
    columns.map((column) => column.heading[line - deepest + column.heading.length] ?? ''),
  );
  const fives = inFives(rows, group.table.scale).map((five) => five.map((row) => cells(row, columns)));
  const widths = columns.map((_, index) =>
    Math.max(...[...heading, ...fives.flat()].map((line) => (line[index] ?? '').length)),
  );
  const set = (line: readonly string[]): string =>
    line
      .map((text, index) => text.padStart(widths[index] ?? 0))
      .join(GAP)
      .trimEnd();
  return [...heading.map(set), ...fives.flatMap((five) => ['', ...five.map(set)])];
}

function cells(row: GroupNorms['rows'][number], columns: readonly TableColumn[]): readonly string[] {
  return columns.map((column) => cellText(row, column));
}

/** Percentile points by definition; nothing where none were asked for. */
function pointLines(norms: GroupNorms, pointsOf: PointsOf): readonly string[] {
  const points = pointsOf(norms);
  const definitions = [...new Set(points.map(({ definition }) => definition))];
  const lines = definitions.flatMap((definition) => [
    `Percentile points, ${POINT_DEFINITION_WORDS[definition]}:`,
    ...points
      .filter((point) => point.definition === definition)
      .map(
        ({ proportion, score, flat }) =>
          `${GAP}${proportion}: ${printNumber(score, 4)}${flat ? ' (nobody scored near it)' : ''}`,
      ),
  ]);
  return lines.length === 0 ? [] : [...lines, ''];
}
