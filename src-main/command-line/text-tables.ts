import type { BootstrapOf, PointsOf } from '../../shared-core/norms/norm-set-file.ts';
import type { GroupNorms } from '../../shared-core/norms/group-norms.ts';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { tableColumns, type TableColumn } from '../../shared-core/norms/table-columns.ts';
import { cellText, sampleFacts, sheetSubtitle } from '../../shared-core/pages/sheet-texts.ts';
import { inFives } from '../../shared-core/pages/row-blocks.ts';
import { POINT_DEFINITION_WORDS } from '../../shared-core/percentile/percentile-point.ts';
import { printNumber } from '../../shared-core/scores/printed-number.ts';
import { alignedLines } from './aligned-lines.ts';
import { bootstrapLines, precisionLines, smoothingLines } from './text-evidence.ts';

const GAP = '  ';

/** What goes with a group's rows where it was asked for. */
export interface BesideRows {
  readonly pointsOf: PointsOf;
  readonly bootstrapOf: BootstrapOf;
}

/** The tables of a set as plain text: one after the other, each with its definition, its n, its fit and its cautions. */
export function textTables(normSet: NormSet, { pointsOf, bootstrapOf }: BesideRows): string {
  const { project } = normSet;
  return normSet.groups
    .map((norms) =>
      [
        norms.group.title,
        `${sheetSubtitle(project)}.`,
        sampleFacts(project, norms),
        ...smoothingLines(norms),
        ...precisionLines(project, norms),
        ...bootstrapLines(project, norms, bootstrapOf(norms)),
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

/** Heading and rows with an empty line between fives. */
function tableLines({ project }: NormSet, { group, rows }: GroupNorms): readonly string[] {
  const columns = tableColumns(project);
  const deepest = Math.max(...columns.map(({ heading }) => heading.length));
  const heading = Array.from({ length: deepest }, (_, line) =>
    columns.map((column) => column.heading[line - deepest + column.heading.length] ?? ''),
  );
  const fives = inFives(rows, group.table.scale, ({ score }) => score).map((five) =>
    five.map((row) => cells(row, columns)),
  );
  return alignedLines([...heading, ...fives.flatMap((five) => [[], ...five])]);
}

function cells(row: GroupNorms['rows'][number], columns: readonly TableColumn[]): readonly string[] {
  return columns.map((column) => cellText(row, column));
}

/** Percentile points by definition; nothing where none were asked for. */
function pointLines(norms: GroupNorms, pointsOf: PointsOf): readonly string[] {
  const points = pointsOf(norms);
  const definitions = [...new Set(points.map(({ definition }) => definition))];
  const of = norms.smoothing.state === 'smoothed' ? ' of the scores before smoothing' : '';
  const lines = definitions.flatMap((definition) => [
    `Percentile points${of}, ${POINT_DEFINITION_WORDS[definition]}:`,
    ...points
      .filter((point) => point.definition === definition)
      .map(
        ({ proportion, score, flat }) =>
          `${GAP}${proportion}: ${printNumber(score, 4)}${flat ? ' (nobody scored near it)' : ''}`,
      ),
  ]);
  return lines.length === 0 ? [] : [...lines, ''];
}
