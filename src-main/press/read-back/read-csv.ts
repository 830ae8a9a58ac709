import Papa from 'papaparse';
import type { ConversionRow } from '../../../shared-core/norms/conversion-table.ts';
import { definitionKey } from '../../../shared-core/norms/definitions.ts';
import type { GroupNorms } from '../../../shared-core/norms/group-norms.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { safeForCsv } from '../safe-text.ts';
import { CellComparison, type FileReadBack } from './cell-differences.ts';

type CellOf = (row: ConversionRow, norms: GroupNorms) => string;

/** Compares every cell of the tables' csv in place, line by line: a line lost, added or swapped is a difference. */
export function readCsv(file: string, text: string, normSet: NormSet): FileReadBack {
  const comparison = new CellComparison(file);
  const records = Papa.parse<string[]>(text.replace(/^\uFEFF/, ''), { delimiter: ',', skipEmptyLines: true }).data;
  const [heads = [], ...lines] = records;
  const columns = columnsOf(normSet);
  columns.forEach(([head], index) => {
    comparison.compare(
      { where: 'line 1', group: '', score: '', column: `heading ${index + 1}` },
      head,
      heads[index] ?? '',
    );
  });
  const expected = normSet.groups.flatMap((norms) => norms.rows.map((row) => ({ norms, row })));
  expected.forEach(({ norms, row }, index) => {
    const place = { where: `line ${index + 2}`, group: norms.group.title, score: row.scoreText };
    const cells = lines[index];
    if (cells === undefined) comparison.compare({ ...place, column: 'line' }, row.scoreText, '');
    else {
      columns.forEach(([column, cellOf], position) => {
        comparison.compare({ ...place, column }, cellOf(row, norms), cells[position] ?? '');
      });
    }
  });
  lines.slice(expected.length).forEach((cells, index) => {
    const where = `line ${expected.length + index + 2}`;
    comparison.compare({ where, group: '', score: '', column: 'line' }, '', cells.join(','));
  });
  return comparison.result('csv');
}

function columnsOf({ project, check, status }: NormSet): readonly (readonly [string, CellOf])[] {
  const number = (value: number | null | undefined): string =>
    value === null || value === undefined ? '' : String(value);
  return [
    ...project.groups.by.map((column, index): readonly [string, CellOf] => [
      safeForCsv(column),
      (_, { group }) => safeForCsv(group.values[index] ?? ''),
    ]),
    ['group-title', (_, { group }) => safeForCsv(group.title)],
    ['raw-score', ({ score }) => String(score)],
    ['n', (_, { summary }) => String(summary.n)],
    ['count', ({ count }) => String(count)],
    ['cumulative', ({ cumulative }) => String(cumulative)],
    ['percentile-rank', ({ observed }) => String(observed.percentileRank)],
    ['smoothed-percentile-rank', ({ smoothed }) => number(smoothed?.percentileRank)],
    ['smoothed-standard-error', ({ smoothed }) => number(smoothed?.standardError)],
    ['interval-low', ({ interval }) => number(interval?.low)],
    ['interval-high', ({ interval }) => number(interval?.high)],
    ['standard-error', ({ midpointError }) => String(midpointError)],
    ['printed', ({ printed }) => printed],
    ...project.table.columns.map((key): readonly [string, CellOf] => [`printed-${key}`, ({ texts }) => texts[key]]),
    ['edition', () => safeForCsv(project.release.edition)],
    ['definition', () => definitionKey(project.curve.definition)],
    ['check', () => check],
    [
      'adjusted',
      ({ adjusted, printed }) =>
        adjusted === null ? '' : `from ${adjusted.from} to ${printed}: ${adjusted.reason} (${adjusted.by})`,
    ],
    ['status', () => status],
  ];
}
