import type { Reading } from '../../shared-core/norms/reading.ts';
import { guessDecimalMark, guessHeader, guessMissingCodes } from '../../shared-core/tally/guess-numbers.ts';
import { guessRoles } from '../../shared-core/tally/guess-roles.ts';
import { SEPARATOR_WORDS } from '../../shared-core/tally/guess-separator.ts';
import { columnNames } from './column-names.ts';
import { ENCODING_WORDS } from './text-encoding.ts';

export interface ReadingGuess {
  readonly reading: Reading;
  readonly remarks: readonly string[];
}

type Split = Pick<Reading, 'encoding' | 'separator' | 'sheet'>;

/** A reading that splits a file and takes all of it as data; everything else is still to be guessed. */
export function plainReading(split: Split): Reading {
  return {
    layout: 'people',
    ...split,
    decimalMark: '.',
    header: false,
    roles: [],
    missing: [],
    scale: null,
    decisions: { duplicateId: 'keep-first', raggedRow: 'leave-out', blankGroup: 'leave-out', blankCluster: 'alone' },
  };
}

/**
 * Guesses the reading of a file from its first records, the heading among them. The scale stays undeclared: its ends
 * can be seen in the scores, but what could have been scored cannot.
 */
export function guessReading(records: readonly (readonly string[])[], split: Split): ReadingGuess {
  const decimalMark = guessDecimalMark(records);
  const header = guessHeader(records, decimalMark);
  const [first = []] = records;
  const columns = columnNames(header ? first : null, first.length);
  const rows = header ? records.slice(1) : records;
  const { layout, roles, remarks } = guessRoles(columns, rows, decimalMark);
  const scoreIndex = roles.findIndex(({ role }) => role === 'score');
  const missing =
    scoreIndex < 0
      ? []
      : guessMissingCodes(
          rows.map((row) => row[scoreIndex] ?? ''),
          decimalMark,
        );
  return {
    reading: { ...plainReading(split), layout, decimalMark, header, roles, missing },
    remarks: [
      ...(split.sheet === null
        ? [
            `The text is read as ${ENCODING_WORDS[split.encoding]} with the ${SEPARATOR_WORDS[split.separator]} as separator.`,
          ]
        : []),
      header
        ? 'The first row is taken as the heading, because it holds names over the data.'
        : 'The first row is taken as data, because it holds numbers like the rows below.',
      ...(decimalMark === ',' ? ['The decimal mark is taken to be a comma, because cells such as 12,5 occur.'] : []),
      ...remarks,
      ...missingRemark(missing),
    ],
  };
}

function missingRemark(missing: readonly string[]): readonly string[] {
  if (missing.length === 0) return [];
  const taken =
    missing.length === 1 ? 'is taken as a code for a missing score' : 'are taken as codes for missing scores';
  return [
    `${missing.join(', ')} ${taken}, because nothing else in the column is like ${missing.length === 1 ? 'it' : 'them'}.`,
  ];
}

/** A given reading fitted to the columns that the file has now: their roles are kept, new columns are left unused. */
export function refitReading(
  reading: Reading,
  columns: readonly string[],
  rows: readonly (readonly string[])[],
): ReadingGuess {
  const known = new Map(reading.roles.map(({ column, role }) => [column, role]));
  const kept = columns.filter((column) => known.has(column));
  if (kept.length === 0) {
    const { layout, roles, remarks } = guessRoles(columns, rows, reading.decimalMark);
    return { reading: { ...reading, layout, roles }, remarks };
  }
  const gone = reading.roles.filter(({ column, role }) => role !== 'unused' && !columns.includes(column));
  return {
    reading: { ...reading, roles: columns.map((column) => ({ column, role: known.get(column) ?? 'unused' })) },
    remarks: gone.map(({ column, role }) => `The file has no column "${column}" now, which was the ${role} column.`),
  };
}
