import type { Reply } from '../desk.ts';
import { adjustmentNote, markedRank } from '../norms/adjustment-words.ts';
import type { ColumnKey } from '../norms/column-keys.ts';
import { printedScaleValue, type ConversionRow } from '../norms/conversion-table.ts';
import { definitionInWords } from '../norms/definitions.ts';
import { groupKey, groupNoun } from '../norms/norm-groups.ts';
import type { GroupNorms } from '../norms/group-norms.ts';
import type { NormProject } from '../norms/norm-project.ts';
import { buildNormSet, pressProblem, type NormSet } from '../norms/norm-set.ts';
import { columnOf } from '../norms/table-columns.ts';
import type { ClassTable, ClassTableGroup, ClassTableRow } from './class-table.ts';

const BAND: ColumnKey = 'measurement-band';

/**
 * The tables of a norm set as a class is looked up in them: every text as the set prints it. The measurement band stands
 * among the columns wherever a reliability is given, chosen for the booklet or not, and never without one. A set that
 * may not be pressed is refused with the sentence that says why.
 */
export function classTableOfSet(normSet: NormSet, source: 'project' | 'edition'): Reply<ClassTable> {
  const problem = pressProblem(normSet);
  if (problem !== null) return { ok: false, problem };
  const { project, groups } = normSet;
  const { tally, curve, precision, release } = project;
  if (tally === null) throw new RangeError('a norm set without a tally');
  const columns = columnsFor(project);
  return {
    ok: true,
    value: {
      source,
      title: project.title,
      form: project.subtitle,
      edition: release.edition,
      date: release.date,
      check: normSet.check,
      draft: normSet.status === 'draft',
      cited: '',
      definition: definitionInWords(curve.definition, tally.scale.direction),
      definitionKind: curve.definition.kind,
      groupNoun: groupNoun(project.groups.documentation),
      groupColumns: project.groups.by,
      groups: groups.map((norms) => groupOf(project, norms, columns)),
      columns: columns.map((key) => {
        const { name, heading } = columnOf(key, project);
        return { key, name, heading };
      }),
      scale: tally.scale,
      reliability: precision.reliability,
      level: precision.reliability === null ? null : precision.level,
      defaultGroup: defaultGroup(project, groups),
      smallestCell: project.policy.smallestCell.value,
      peopleNoun: project.people,
    },
  };
}

/** The same from a project whose norm set is still to be worked out. */
export function projectClassTable(project: NormProject, source: 'project' | 'edition'): Reply<ClassTable> {
  const built = buildNormSet(project);
  return built.ok ? classTableOfSet(built.normSet, source) : built;
}

/** Columns of the booklet, with the measurement band exactly where there is a reliability. */
function columnsFor({ table, precision }: NormProject): readonly ColumnKey[] {
  if (precision.reliability === null) return table.columns.filter((key) => key !== BAND);
  return table.columns.includes(BAND) ? table.columns : [...table.columns, BAND];
}

function groupOf(project: NormProject, norms: GroupNorms, columns: readonly ColumnKey[]): ClassTableGroup {
  const { group, summary, rows } = norms;
  return {
    values: group.values,
    title: group.title,
    n: summary.n,
    population: project.groups.documentation.population,
    note: adjustmentNote(norms) ?? '',
    rows: rows.map((row) => rowOf(project, row, columns)),
  };
}

function rowOf({ table }: NormProject, row: ConversionRow, columns: readonly ColumnKey[]): ClassTableRow {
  const { score, scoreText, percentileRank, printedZ, band, texts } = row;
  return {
    low: score,
    high: score,
    scoreText,
    printed: markedRank(row),
    rank: percentileRank,
    nce: printedZ === null ? null : printedScaleValue('nce', printedZ, table),
    band: band === null ? null : { text: texts[BAND], low: asPercent(band.low), high: asPercent(band.high) },
    texts: Object.fromEntries(columns.map((key) => [key, texts[key]])),
  };
}

/** Straight lines between two ranks may end the last digit of a double beyond 0 or 100. */
function asPercent(rank: number): number {
  return Math.min(100, Math.max(0, rank));
}

/** The group that the project names for classes, as long as it has a table. */
function defaultGroup({ classTable }: NormProject, groups: readonly GroupNorms[]): readonly string[] | null {
  if (classTable === null) return null;
  const named = groupKey(classTable);
  return groups.some(({ group }) => group.key === named) ? classTable : null;
}
