import type { StandingPupil } from '../class/class-standing.ts';
import { figure, say, type PrintWords } from '../languages/phrases.ts';
import { printCount } from '../scores/printed-number.ts';
import { inChosenOrder, labelOf, type StandingPrint } from './class-print.ts';
import { column } from './class-sections.ts';
import { RANGE_DASH } from './range-cell.ts';
import { figureInWords } from './class-words.ts';
import type { RowTable, RowTableColumn } from './row-table.ts';

/** A column of the standing: its key in files, its heading, and the text of a pupil. */
export interface StandingColumn {
  readonly key: string;
  readonly heading: readonly string[];
  readonly kind: RowTableColumn['kind'];
  readonly textOf: (pupil: StandingPupil) => string;
}

/** The pupils of the standing in the order of print. */
export function standingInOrder(print: StandingPrint): readonly StandingPupil[] {
  const { pupils, direction } = print.standing;
  return inChosenOrder(print, pupils, direction, ({ firstPlace }) => -firstPlace);
}

/** Who, the group where the list names some, raw score, place and share. */
export function standingColumns(print: StandingPrint, words: PrintWords): readonly StandingColumn[] {
  const { pupils, direction } = print.standing;
  const codes = print.file.sharing.as === 'codes';
  return [
    {
      key: codes ? 'code' : 'name',
      heading: say(words, codes ? 'class.column-code' : 'class.column-name').split('\n'),
      kind: 'words',
      textOf: (pupil) => labelOf(print, pupil),
    },
    ...(pupils.some(({ group }) => group !== '')
      ? [
          {
            key: 'group',
            heading: say(words, 'class.column-group').split('\n'),
            kind: 'words',
            textOf: ({ group }: StandingPupil) => group,
          } as const,
        ]
      : []),
    {
      key: 'raw-score',
      heading: say(words, 'class.column-score').split('\n'),
      kind: 'figures',
      textOf: ({ scoreText }) => scoreText,
    },
    {
      key: 'place',
      heading: say(words, 'standing.place').split('\n'),
      kind: 'figures',
      textOf: ({ firstPlace, lastPlace }) =>
        firstPlace === lastPlace
          ? printCount(firstPlace)
          : `${printCount(firstPlace)}${RANGE_DASH}${printCount(lastPlace)}`,
    },
    {
      key: 'per-cent',
      heading: say(words, direction === 'high-is-good' ? 'standing.share-low' : 'standing.share-high').split('\n'),
      kind: 'figures',
      textOf: ({ percentText }) => percentText,
    },
  ];
}

/** Everybody with a score, with place and share. */
export function standingTable(print: StandingPrint, words: PrintWords): RowTable {
  const pupils = standingInOrder(print);
  return {
    name: 'standing',
    fives: true,
    columns: standingColumns(print, words).map(({ heading, kind, textOf }, index) => ({
      ...column(
        heading.join('\n'),
        kind,
        pupils.map((pupil) => (kind === 'figures' ? figure(words, textOf(pupil)) : textOf(pupil))),
        (text) => (kind === 'figures' && text.includes(RANGE_DASH) ? figureInWords(words, text) : null),
      ),
      bold: index === 0,
    })),
    chart: null,
  };
}
