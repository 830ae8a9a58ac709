import type { Reading } from '../../shared-core/norms/reading.ts';
import { columnNames } from './column-names.ts';
import type { RowTaker } from './row-taker.ts';

/**
 * Numbers the records of a file from 1 and takes the heading out: the first record that is not blank, where the reading
 * has one. Blank records before it are no rows; records keep their number in the file all the same.
 */
export class RowNumbering {
  /** Records seen so far. */
  records = 0;
  private started = false;

  constructor(
    private readonly reading: Pick<Reading, 'header'>,
    private readonly taker: RowTaker,
  ) {}

  /** Hands on the next records of the file; answers whether to go on. */
  take(records: readonly (readonly string[])[]): boolean {
    const first = this.records + 1;
    this.records += records.length;
    if (this.started) return records.length === 0 || this.taker.rows(records, first);
    const start = records.findIndex((record) => record.some((cell) => cell.trim() !== ''));
    const record = records[start];
    if (record === undefined) return true;
    this.started = true;
    const names = columnNames(this.reading.header ? record : null, record.length);
    if (!this.taker.columns(names)) return false;
    const rest = records.slice(this.reading.header ? start + 1 : start);
    return rest.length === 0 || this.taker.rows(rest, this.records - rest.length + 1);
  }

  /** False when the file held nothing but blanks. */
  get foundColumns(): boolean {
    return this.started;
  }
}

export const NOTHING_IN_FILE = 'There is nothing in the file. Choose the file that holds the scores.';
