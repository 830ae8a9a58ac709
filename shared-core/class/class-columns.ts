import type { ClassFile } from './class-file.ts';
import type { ClassTable, ClassTableColumn } from './class-table.ts';

const BAND = 'measurement-band';
/** Columns of a booklet that tell how the table was made, and nothing of a pupil. */
const OF_THE_TABLE: readonly string[] = [
  'count',
  'cumulative',
  'exact-rank',
  'observed-rank',
  'interval',
  'standard-error',
  'print-range',
];

/** Columns of the table that can be ticked for the report: the measurement band is printed wherever there is one. */
export function columnsToTick({ table }: Pick<ClassFile, 'table'>): readonly ClassTableColumn[] {
  return table?.columns.filter(({ key }) => key !== BAND) ?? [];
}

/** The class with a column printed or not. */
export function withColumn(file: ClassFile, key: string, isPrinted: boolean): ClassFile {
  const others = file.report.columns.filter((known) => known !== key);
  return { ...file, report: { ...file.report, columns: isPrinted ? [...others, key] : others } };
}

/**
 * The class with another table, or none. Its derived scores are printed; the group chosen for the table before is
 * forgotten, and pupils are called what the table calls them.
 */
export function withTable(file: ClassFile, table: ClassTable | null): ClassFile {
  const columns = columnsToTick({ table })
    .map(({ key }) => key)
    .filter((key) => !OF_THE_TABLE.includes(key));
  return {
    ...file,
    table,
    group: null,
    people: table?.peopleNoun ?? file.people,
    report: { ...file.report, columns },
  };
}
