import { definitionKey } from '../../shared-core/norms/definitions.ts';
import { countedPeople, type NormGroup } from '../../shared-core/norms/norm-groups.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import { sourceForFile } from '../../shared-core/norms/norm-set-file.ts';
import type { ForeignColumn } from '../../shared-core/norms/why-differ-column.ts';
import type { Convention } from '../../shared-core/norms/why-differ-conventions.ts';
import { explanationInWords, findingInWords } from '../../shared-core/norms/why-differ-words.ts';
import type { DisagreeingRow, Explanation, WhyDiffer } from '../../shared-core/norms/why-differ.ts';
import { printCount, printScore } from '../../shared-core/scores/printed-number.ts';
import { peopleIn } from '../../shared-core/tally/frequency-table.ts';
import { alignedLines } from './aligned-lines.ts';

/** Somebody's ranks beside a group, and what was found. */
export interface Compared {
  readonly project: NormProject;
  readonly group: NormGroup;
  /** Name of the file with the ranks, without its folder. */
  readonly ranksFile: string;
  readonly column: ForeignColumn;
  readonly found: WhyDiffer;
}

/** The finding as text: what reproduces the ranks, or the nearest with the rows that disagree. */
export function differText({ project, group, ranksFile, column, found }: Compared): string {
  const { direction } = group.table.scale;
  const people = countedPeople(printCount(peopleIn(group.table)), project.people);
  const [, ...others] = explanationsOf(found);
  const lines = [
    `${ranksFile} beside ${group.title} (${people})`,
    findingInWords(found, direction, column.decimals),
    ...(others.length === 0 ? [] : ['', 'Also by:']),
    ...others.map((other) => `  ${explanationInWords(other, direction, column.decimals)}`),
    ...disagreeingLines(group, disagreeingIn(found)),
  ];
  return lines.map((line) => `${line}\n`).join('');
}

function disagreeingLines({ table }: NormGroup, rows: readonly DisagreeingRow[]): readonly string[] {
  if (rows.length === 0) return [];
  const cells = rows.map(({ score, theirs, expected }) => [printScore(table.scale, score), theirs, expected ?? 'none']);
  return ['', ...alignedLines([['Raw score', 'Theirs', 'By the nearest'], ...cells])];
}

/** The finding as JSON; every key is lower-case-with-hyphens, only `group` has the file's own column names. */
export function differJson({ project, group, ranksFile, column, found }: Compared): string {
  const { source, groups } = project;
  const { direction } = group.table.scale;
  const { rows, decimals, proportions } = column;
  const file = {
    source: source === null ? null : sourceForFile(source),
    group: Object.fromEntries(groups.by.map((name, index) => [name, group.values[index] ?? ''])),
    n: peopleIn(group.table),
    ranks: { file: ranksFile, rows: rows.length, decimals, proportions },
    reproduced: found.kind === 'reproduced',
    finding: findingInWords(found, direction, decimals),
    explanations: explanationsOf(found).map((explanation) => ({
      sentence: explanationInWords(explanation, direction, decimals),
      ...conventionForFile(explanation.applied.convention),
      reversed: explanation.applied.reversed,
      'weights-ignored': explanation.applied.weightsIgnored,
      ways: explanation.ways.map(({ rounding, ends }) => ({ rounding, ends: ends.kind, limits: ends.limits })),
    })),
    disagreeing: disagreeingIn(found).map(({ score, theirs, expected }) => ({ score, theirs, ours: expected })),
  };
  return `${JSON.stringify(file, null, 1)}\n`;
}

function conventionForFile(convention: Convention): {
  readonly convention: string;
  readonly 'cut-to-three-digits': boolean;
} {
  return convention.kind === 'definition'
    ? { convention: definitionKey(convention.definition), 'cut-to-three-digits': false }
    : { convention: `percent-rank:${convention.ends}`, 'cut-to-three-digits': convention.cutToThreeDigits };
}

function explanationsOf(found: WhyDiffer): readonly Explanation[] {
  return found.kind === 'reproduced' ? found.explanations : [found.explanation];
}

function disagreeingIn(found: WhyDiffer): readonly DisagreeingRow[] {
  return found.kind === 'nearest' ? found.disagreeing : [];
}
