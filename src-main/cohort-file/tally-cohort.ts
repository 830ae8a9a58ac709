import { statSync } from 'node:fs';
import type { Reply, TalliedCohort } from '../../shared-core/desk.ts';
import type { Reading } from '../../shared-core/norms/reading.ts';
import { cohortCounter, type CohortCounter, type CountedCohort } from '../../shared-core/tally/cohort-counter.ts';
import {
  FirstIdentities,
  RepeatedIdentities,
  SeenFilter,
  SuspectIdentities,
  UniqueIdentities,
  type Identities,
} from '../../shared-core/tally/cohort-counter-identities.ts';
import { knowFile, type KnownFile } from './file-kind.ts';
import { readRows } from './read-rows.ts';

export interface TallyHooks {
  /** 0–1 within what is being done, and what that is, as it is shown. */
  readonly onProgress: (done: number, doing: string) => void;
  readonly signal: AbortSignal;
}

/** Bits of the filter for identifiers, as a power of two: 32 MB for large files, less for small ones. */
const LARGEST_FILTER = 28;
const SMALLEST_FILTER = 16;

/**
 * Reads a cohort file into its tally. Memory does not grow with the number of rows: identifiers are first held in a
 * filter of fixed size, and only where that suspects duplicates the file is read again to count the suspects exactly.
 * The answer is the same for every filter size.
 */
export async function tallyCohort(
  path: string,
  file: string,
  reading: Reading,
  hooks: TallyHooks,
  filterBits?: number,
): Promise<Reply<TalliedCohort>> {
  const known = await knowFile(path, file);
  if (!known.ok) return known;
  const pass = (identities: Identities | null, doing: string): Promise<Reply<Pass>> =>
    countPass(known.value, reading, identities, hooks, doing);
  const looksAtIds = reading.decisions.duplicateId !== 'keep-all' && reading.roles.some(({ role }) => role === 'id');
  if (!looksAtIds) return talliedBy(known.value, reading, await pass(null, COUNTING));

  const first = new SuspectIdentities(new SeenFilter(filterBits ?? filterBitsFor(known.value)));
  const counted = await pass(first, COUNTING);
  if (!counted.ok || first.suspects.size === 0) return talliedBy(known.value, reading, counted);
  let last: Reply<Pass>;
  if (reading.decisions.duplicateId === 'keep-first') {
    last = await pass(new FirstIdentities(first.suspects), CHECKING);
  } else {
    const repeats = new RepeatedIdentities(first.suspects);
    const checked = await pass(repeats, CHECKING);
    if (!checked.ok) return checked;
    last = repeats.repeated.size === 0 ? checked : await pass(new UniqueIdentities(repeats.repeated), COUNTING_AGAIN);
  }
  if (last.ok && last.value.sha256 !== counted.value.sha256) return { ok: false, problem: changed(file) };
  return talliedBy(known.value, reading, last);
}

const COUNTING = 'Counting the rows';
const CHECKING = 'Looking for identifiers that occur twice';
const COUNTING_AGAIN = 'Counting the rows without duplicates';

interface Pass {
  readonly counted: CountedCohort;
  readonly sha256: string;
}

async function countPass(
  known: KnownFile,
  reading: Reading,
  identities: Identities | null,
  { onProgress, signal }: TallyHooks,
  doing: string,
): Promise<Reply<Pass>> {
  let made: Reply<CohortCounter> | null = null;
  const end = await readRows(
    known,
    reading,
    {
      columns: (names) => {
        made = cohortCounter(reading, names, identities);
        return made.ok;
      },
      rows: (rows, firstNumber) => {
        if (made === null || !made.ok) return false;
        const counter = made.value;
        for (let index = 0; index < rows.length; index += 1) {
          const row = rows[index];
          if (row !== undefined) counter.add(row, firstNumber + index);
        }
        return counter.problem === null;
      },
    },
    { onProgress: (done) => onProgress(done, doing), signal },
  );
  if (!end.ok) return end;
  return passOf(made, end.value.sha256);
}

function passOf(made: Reply<CohortCounter> | null, sha256: string | null): Reply<Pass> {
  if (made === null) throw new RangeError('a file that was read has columns');
  if (!made.ok) return made;
  const counted = made.value.finish();
  if (!counted.ok) return counted;
  if (sha256 === null) throw new RangeError('a counter without a problem reads to the end');
  return { ok: true, value: { counted: counted.value, sha256 } };
}

function talliedBy(known: KnownFile, reading: Reading, pass: Reply<Pass>): Reply<TalliedCohort> {
  if (!pass.ok) return pass;
  const { counted, sha256 } = pass.value;
  const { file, bytes } = known;
  if (statSync(known.path, { throwIfNoEntry: false })?.size !== bytes) return { ok: false, problem: changed(file) };
  const { scaleInferred, flow, tally } = counted;
  return { ok: true, value: { source: { kind: reading.layout, file, sha256, bytes, ...flow, scaleInferred }, tally } };
}

function changed(file: string): string {
  return `${file} was changed while it was read. Read it again when nobody writes to it.`;
}

/** About 60 bits for each row of usual length, so that the filter hardly ever suspects without ground. */
function filterBitsFor({ bytes, kind }: KnownFile): number {
  const bits = Math.ceil(Math.log2(bytes * (kind === 'text' ? 2 : 16)));
  return Math.min(LARGEST_FILTER, Math.max(SMALLEST_FILTER, bits));
}
