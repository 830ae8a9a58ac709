import { mkdir, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { ErratumPeople, PressedFile, Reply } from '../../shared-core/desk.ts';
import { comparedProjects } from '../../shared-core/norms/compared-projects.ts';
import { cutFromText, followRoster, type FollowedRoster, type Roster } from '../../shared-core/norms/erratum-roster.ts';
import { changesOf, erratumText, personInWords } from '../../shared-core/norms/erratum.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import type { Reading } from '../../shared-core/norms/reading.ts';
import { diskTrouble } from '../project-file/disk-trouble.ts';
import { fingerprintOf } from '../project-file/stored-text.ts';
import { changedCellsCsv, peopleCsv } from './erratum-csv.ts';
import { rosterPeople, type RosterColumns } from './roster-people.ts';

/** What an erratum worker is started with; plain JSON. */
export interface ErratumRequest {
  /** The earlier edition and the one that corrects it. */
  readonly before: NormProject;
  readonly after: NormProject;
  readonly roster: {
    readonly path: string;
    readonly file: string;
    readonly reading: Reading;
    readonly columns: RosterColumns;
  } | null;
  /** Percentile rank that decides something, as it was typed; empty for none. */
  readonly cut: string;
  /** Where the files are written; null where the erratum is only looked at. */
  readonly folder: string | null;
}

export interface ErratumParts {
  readonly people: ErratumPeople | null;
  readonly files: readonly PressedFile[];
}

/** How many people are sent to the screen; the files name all. */
const LISTED = 300;

/**
 * The erratum of an edition: the people of a roster whom it concerns, and, where a folder is given, its text and its
 * lists as files. People stand in these files and in the answer, nowhere else.
 */
export async function makeErratum({
  before,
  after,
  roster,
  cut,
  folder,
}: ErratumRequest): Promise<Reply<ErratumParts>> {
  const compared = comparedProjects(before, after);
  if (!compared.ok) return compared;
  const deciding = cutFromText(cut);
  if (cut.trim() !== '' && deciding === null) {
    return { ok: false, problem: `The rank that decides is a number from 0 to 100, such as 25, not “${cut.trim()}”.` };
  }
  const { by } = before.groups;
  if (roster !== null && roster.columns.by.length !== by.length) {
    return { ok: false, problem: `Choose a column of the list for each of ${by.join(', ')}.` };
  }
  let followed: FollowedRoster | null = null;
  if (roster !== null) {
    const read: Reply<Roster> = await rosterPeople(roster.path, roster.file, roster.reading, roster.columns);
    if (!read.ok) return read;
    const result = followRoster(compared.before, compared.after, read.value, deciding);
    if (!result.ok) return result;
    followed = result.followed;
  }
  const people = followed === null ? null : peopleShown(followed);
  if (folder === null) return { ok: true, value: { people, files: [] } };
  const text = new TextEncoder().encode(erratumText(compared.comparison, followed));
  const files = [
    { file: 'erratum.txt', bytes: text },
    { file: 'erratum.csv', bytes: changedCellsCsv(compared.comparison) },
    ...(followed === null ? [] : [{ file: 'erratum-people.csv', bytes: peopleCsv(followed) }]),
  ];
  try {
    await mkdir(folder, { recursive: true });
    for (const { file, bytes } of files) await writeFile(join(folder, file), bytes);
  } catch (error) {
    return { ok: false, problem: diskTrouble('The erratum', 'written', error) };
  }
  const written = files.map(({ file, bytes }) => ({ file, bytes: bytes.length, sha256: fingerprintOf(bytes) }));
  return { ok: true, value: { people, files: written } };
}

function peopleShown({ people, cut, unchanged, changed, unplaced }: FollowedRoster): ErratumPeople {
  return {
    rows: people,
    unchanged,
    changed: changed.length,
    unplaced: unplaced.length,
    crossing: changed.filter(({ side, crossed }) => side !== null || crossed.length > 0).length,
    changedFirst: changed.slice(0, LISTED).map((person) => ({
      row: person.of.row,
      person: personInWords(person.of),
      group: person.group,
      score: person.scoreText,
      changes: changesOf(person, cut?.text ?? ''),
    })),
    unplacedFirst: unplaced
      .slice(0, LISTED)
      .map(({ of, problem }) => ({ row: of.row, person: personInWords(of), problem })),
  };
}
