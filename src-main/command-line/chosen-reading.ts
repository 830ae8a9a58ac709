import type { CohortPreview, Reply } from '../../shared-core/desk.ts';
import type { ColumnRole, Reading } from '../../shared-core/norms/reading.ts';
import { SEPARATOR_WORDS } from '../../shared-core/tally/guess-separator.ts';
import { lookAtCohort } from '../cohort-file/look-at-cohort.ts';
import { ENCODING_WORDS } from '../cohort-file/text-encoding.ts';
import type { CohortOptions, NamedColumns } from './cohort-options.ts';

export type ReadingChosen =
  | { readonly kind: 'chosen'; readonly reading: Reading; readonly remarks: readonly string[] }
  /** The options name a column that the file does not have. */
  | { readonly kind: 'no-such-column'; readonly problem: string }
  | { readonly kind: 'unreadable'; readonly problem: string };

/**
 * How a cohort file is read: encoding, separator, decimal mark, heading and sheet as guessed; roles, scale and
 * missing codes by the options alone.
 */
export async function chosenReading(path: string, file: string, options: CohortOptions): Promise<ReadingChosen> {
  const looked = await lookWithNames(path, file, options.named);
  if (!looked.ok) return { kind: 'unreadable', problem: looked.problem };
  const { columns, reading, sheets } = looked.value;
  const unknown = namesIn(options.named).filter((name) => !columns.includes(name));
  if (unknown.length > 0) {
    const which = unknown.map((name) => `"${name}"`).join(', ');
    return { kind: 'no-such-column', problem: `${file} has no column ${which}. Its columns: ${columns.join(', ')}.` };
  }
  return {
    kind: 'chosen',
    reading: {
      ...reading,
      layout: options.named.count === null ? 'people' : 'counts',
      roles: columns.map((column) => ({ column, role: roleOf(column, options.named) })),
      missing: options.missing,
      scale: options.scale,
      decisions: { duplicateId: 'keep-first', raggedRow: 'leave-out', blankGroup: 'leave-out', blankCluster: 'alone' },
    },
    remarks: [...splitRemarks(reading, sheets), ...codeRemarks(reading, options), ...countRemarks(reading, options)],
  };
}

/** Where the guess about the heading or the sheet hides the columns named, another one may show them. */
async function lookWithNames(path: string, file: string, named: NamedColumns): Promise<Reply<CohortPreview>> {
  const guessed = await lookAtCohort(path, file, null);
  if (!guessed.ok || hasAll(guessed.value, named)) return guessed;
  const { reading, sheets } = guessed.value;
  const others = [
    { ...reading, header: !reading.header },
    ...sheets.slice(1).map((sheet) => ({ ...reading, sheet, header: true })),
  ];
  for (const asked of others) {
    const other = await lookAtCohort(path, file, asked);
    if (other.ok && hasAll(other.value, named)) return { ok: true, value: withGuesses(other.value, reading) };
  }
  return guessed;
}

/** The guess about missing codes was made for the score column of the first look. */
function withGuesses(preview: CohortPreview, { missing, roles }: Reading): CohortPreview {
  return { ...preview, reading: { ...preview.reading, missing, roles } };
}

function hasAll({ columns }: CohortPreview, named: NamedColumns): boolean {
  return namesIn(named).every((name) => columns.includes(name));
}

function namesIn({ score, count, weight, id, cluster, by }: NamedColumns): readonly string[] {
  return [score, count, weight, id, cluster, ...by].filter((name) => name !== null);
}

function roleOf(column: string, { score, count, weight, id, cluster, by }: NamedColumns): ColumnRole {
  if (column === score) return 'score';
  if (column === count) return 'count';
  if (column === weight) return 'weight';
  if (column === id) return 'id';
  if (column === cluster) return 'cluster';
  return by.includes(column) ? 'group' : 'unused';
}

/** Says how the file is cut into cells, where that is not the usual way. */
function splitRemarks(reading: Reading, sheets: readonly string[]): readonly string[] {
  const { encoding, separator, decimalMark, header, sheet } = reading;
  const parts = [
    ...(sheet !== null && sheets.length > 1 ? [`sheet "${sheet}" of ${sheets.length}`] : []),
    ...(sheet === null && encoding !== 'utf-8' ? [ENCODING_WORDS[encoding]] : []),
    ...(sheet === null && separator !== ',' ? [`the ${SEPARATOR_WORDS[separator]} as separator`] : []),
    ...(decimalMark === ',' ? ['the comma as decimal mark'] : []),
    ...(header ? [] : ['the first row as data']),
  ];
  return parts.length === 0 ? [] : [`Read with ${parts.join(', ')}.`];
}

/** A code that stands out from the scores is counted as a score unless the options say otherwise. */
function codeRemarks({ missing, roles }: Reading, { named, missing: given }: CohortOptions): readonly string[] {
  const guessedFor = roles.find(({ role }) => role === 'score')?.column;
  const codes = guessedFor === named.score ? missing.filter((code) => !given.includes(code)) : [];
  return codes.map((code) => `"${code}" looks like a code for a missing score; if it is one, give --missing ${code}.`);
}

function countRemarks({ layout, roles }: Reading, { named }: CohortOptions): readonly string[] {
  const count = roles.find(({ role }) => role === 'count')?.column;
  if (layout !== 'counts' || named.count !== null || count === undefined) return [];
  return [`Each row is read as one person; if column "${count}" holds counts, give --count ${count}.`];
}
