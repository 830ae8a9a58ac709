import type { FileHandle, ListedFile } from '../../shared-core/desk.ts';
import { guessClassReading } from '../../shared-core/class/guess-class-reading.ts';
import { readClassList } from '../../shared-core/class/read-class-list.ts';
import type { ClassReading } from '../../shared-core/class/class-reading.ts';
import type { ListedRow } from '../../shared-core/class/pasted-rows.ts';

/** A class list on its way in: its rows, what its columns are taken for, and the list that this gives. */
export class ListReading {
  readonly rows: readonly ListedRow[];
  /** Null where the rows were pasted. */
  readonly from: { readonly handle: FileHandle; readonly listed: ListedFile } | null;
  reading = $state.raw<ClassReading>({ decimalMark: '.', headingLine: null, roles: [] });
  readonly read = $derived.by(() => readClassList(this.rows, this.reading));

  constructor(rows: readonly ListedRow[], from: ListReading['from']) {
    this.rows = rows;
    this.from = from;
    this.reading = guessClassReading(rows).reading;
  }
}
