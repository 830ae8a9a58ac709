import type { PupilResult } from '../../../../shared-core/class/class-results.ts';

/**
 * What the table prints for the raw score of a pupil in the column of a key, looked up anew by the score alone; null for
 * columns that no table prints. Throws where the table has no row or more than one for the score.
 */
export function textFromTable({ table, score, scoreText }: PupilResult, key: string): string | null {
  const rows = table.rows.filter(({ low, high }) => low <= score && score <= high);
  const [row] = rows;
  if (row === undefined || rows.length > 1) throw new RangeError(`the table has ${rows.length} rows for ${score}`);
  switch (key) {
    case 'name':
    case 'code':
    case 'group':
    case 'table':
      return null;
    case 'raw-score':
      return scoreText;
    case 'percentile-rank':
      return row.printed;
    case 'measurement-band':
      return row.band?.text ?? row.texts[key] ?? '';
    default:
      return row.texts[key] ?? '';
  }
}
