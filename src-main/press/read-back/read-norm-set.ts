import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { normSetForFile } from '../../../shared-core/norms/norm-set-file.ts';
import { CellComparison, type CellPlace, type FileReadBack } from './cell-differences.ts';

/** Compares every value of a norm set file with the set. */
export function readNormSet(file: string, content: unknown, normSet: NormSet): FileReadBack {
  const comparison = new CellComparison(file);
  const { title, subtitle, release } = normSet.project;
  const about = {
    title,
    subtitle,
    edition: release.edition,
    date: release.date,
    status: normSet.status,
    check: normSet.check,
  };
  const expected = asJson({ ...about, ...normSetForFile(normSet, () => []) });
  compareValues(comparison, normSet, [], expected, content);
  return comparison.result('norm set');
}

function compareValues(
  comparison: CellComparison,
  normSet: NormSet,
  path: readonly string[],
  expected: unknown,
  found: unknown,
): void {
  const [left, right] = [branchesOf(expected), branchesOf(found)];
  if (left === null) {
    comparison.compare(placeOf(normSet, path), valueText(expected), valueText(found));
    return;
  }
  const keys = path.length === 0 ? [...left.keys()] : [...new Set([...left.keys(), ...(right?.keys() ?? [])])];
  for (const key of keys) compareValues(comparison, normSet, [...path, key], left.get(key), right?.get(key));
}

/** groups / 1 / rows / 23 / derived / t is column "derived t" of raw score 23 in the second group. */
function placeOf({ groups }: NormSet, path: readonly string[]): CellPlace {
  const [first, group, rows, row, ...rest] = path;
  const norms = first === 'groups' ? groups[Number(group)] : undefined;
  const score = rows === 'rows' ? (norms?.rows[Number(row)]?.scoreText ?? '') : '';
  const column = score === '' ? path.slice(norms === undefined ? 0 : 2) : rest;
  return { where: path.join('/'), group: norms?.group.title ?? '', score, column: column.join(' ') };
}

function branchesOf(value: unknown): ReadonlyMap<string, unknown> | null {
  return typeof value === 'object' && value !== null ? new Map(Object.entries(value)) : null;
}

function valueText(value: unknown): string {
  return value === undefined ? '' : JSON.stringify(value);
}

function asJson(value: unknown): unknown {
  return JSON.parse(JSON.stringify(value));
}
