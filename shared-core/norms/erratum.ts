import { printCount } from '../scores/printed-number.ts';
import { COHORT_FINGERPRINT, type TextChange } from './edition-compare-choices.ts';
import {
  cellsInWords,
  changeInWords,
  columnLines,
  counted,
  differencesInWords,
  editionInWords,
  groupLines,
} from './edition-compare-words.ts';
import { printsTheSame, type EditionComparison } from './edition-compare.ts';
import type { ChangedPerson, FollowedRoster, RosterPerson } from './erratum-roster.ts';

/**
 * The erratum of an edition as plain text: which edition corrects which, what changed, what a user of the old table must
 * do, and cautions; with a roster also the people whom it concerns. Nothing but the roster puts a name into it.
 */
export function erratumText(comparison: EditionComparison, roster: FollowedRoster | null): string {
  const { before, after, choices } = comparison;
  const lines = [
    'Erratum',
    '',
    `This corrects: ${editionInWords(before)}.`,
    `Corrected by: ${editionInWords(after)}.`,
    differencesInWords(comparison),
    '',
    'What to do',
    `  ${whatToDo(comparison)}`,
    ...headed('What was decided otherwise (old → new)', choices.map(changeInWords)),
    ...columnLines(comparison),
    ...headed('Changed tables (old → new)', comparison.groups.flatMap(groupLines)),
    ...(roster === null ? [] : rosterLines(roster)),
    ...headed('Cautions', cautionsOf(comparison, roster)),
  ];
  return lines.map((line) => `${line}\n`).join('');
}

function whatToDo(comparison: EditionComparison): string {
  if (printsTheSame(comparison)) return 'Nothing: what was read off the old table stands, and it may go on being used.';
  return (
    'Put the old table out of use, read every raw score that is listed here again in the new table, and correct every ' +
    'report in which the old number stands.'
  );
}

/** Choices of which a change makes the numbers of two editions answer different questions. */
const OTHER_QUESTION: ReadonlySet<string> = new Set([
  'definition: the share of the group scoring',
  'which scores are good',
  'scale',
]);

function cautionsOf(comparison: EditionComparison, roster: FollowedRoster | null): readonly string[] {
  const { before, after, choices } = comparison;
  const cut = roster?.cut ?? null;
  const changed = (wanted: (change: TextChange) => boolean): boolean => choices.some(wanted);
  return [
    ...(before.edition.trim() === after.edition.trim() && before.check !== after.check
      ? ['Both editions carry the same number. Give the new one a number of its own before it is handed out.']
      : []),
    ...(changed(({ what }) => what === 'title' || what === 'form or season')
      ? ['The two editions do not have the same title. Make sure that they are editions of one table.']
      : []),
    ...(changed(({ what }) => what === COHORT_FINGERPRINT)
      ? ['The new edition was made from another file: the numbers may differ because the people do.']
      : []),
    ...(changed(({ what }) => OTHER_QUESTION.has(what))
      ? ['Definition, direction or scale changed: a new rank beside an old one is no gain or loss of anybody.']
      : []),
    ...(cut === null
      ? []
      : [
          'The side of the cut is decided by the computed rank before rounding; ' +
            `one that prints as ${cut.text}, or was adjusted by hand, can lie on either side.`,
        ]),
    ...(roster === null ? [] : ['This text holds data about persons. Keep it as you keep the roster.']),
    'No single score is ground enough for a decision about a person, the corrected one neither.',
  ];
}

function rosterLines({ people, cut, unchanged, changed, unplaced }: FollowedRoster): readonly string[] {
  const parts = [
    `${printCount(unchanged)} unchanged`,
    `${printCount(changed.length)} changed`,
    `${printCount(unplaced.length)} not found in both editions`,
  ];
  const crossing = changed.filter(({ side }) => side !== null).length;
  const verb = crossing === 1 ? 'changes' : 'change';
  const crossed = cut === null ? '' : `; ${printCount(crossing)} ${verb} the side of ${cut.text}`;
  return [
    ...headed('People of the roster', [`${counted(people, 'row')}: ${parts.join(', ')}${crossed}.`]),
    ...headed(
      'Changed for',
      changed.map((person) => changedInWords(person, cut?.text ?? '')),
    ),
    ...headed(
      'Not found in both editions',
      unplaced.map(({ of, problem }) => `${personInWords(of)}: ${problem}`),
    ),
  ];
}

function changedInWords({ of, group, scoreText, ranks, cells, side }: ChangedPerson, cut: string): string {
  const rankStays = !cells.some(({ column }) => column === 'rank');
  const parts = [
    ...(rankStays ? [`percentile rank stays ${ranks.after}`] : []),
    ...(cells.length === 0 ? [] : [cellsInWords(cells)]),
    ...(side === null ? [] : [`${side.before} ${cut} → ${side.after} ${cut}`]),
  ];
  return `${personInWords(of)} (${group}, raw score ${scoreText}): ${parts.join('; ')}`;
}

/** The person's name or code in one line, or the row where there is none. */
function personInWords({ person, row }: RosterPerson): string {
  return person.replace(/\s+/g, ' ').trim() || `row ${row}`;
}

function headed(heading: string, lines: readonly string[]): readonly string[] {
  return lines.length === 0 ? [] : ['', heading, ...lines.map((line) => `  ${line}`)];
}
