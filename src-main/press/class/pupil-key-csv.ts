import { csvFile } from '../csv-records.ts';
import { safeForCsv } from '../safe-text.ts';

export interface PupilKeyLine {
  readonly code: string;
  /** As it stands in the class list. */
  readonly name: string;
  /** Empty where the list has no groups. */
  readonly group: string;
}

/** The key to a report with codes, as a csv file: who has which code. It is the only file that holds both. */
export function pupilKeyCsv(lines: readonly PupilKeyLine[]): Uint8Array {
  return csvFile([
    ['code', 'name', 'group'],
    ...lines.map(({ code, name, group }) => [code, safeForCsv(name), safeForCsv(group)]),
  ]);
}
