import type { ClassTable } from '../class/class-table.ts';
import type { PhraseKey } from '../languages/phrases.ts';

/** A sentence of the slips that can be said in other words. */
export interface SlipSentence {
  readonly key: PhraseKey;
  /** What it is about, to stand above it on screen. */
  readonly name: string;
}

/** The sentences that slips of a table can hold, in the order in which they stand there. */
export function slipSentences(table: ClassTable): readonly SlipSentence[] {
  const rows = table.groups.flatMap((group) => group.rows);
  const banded = rows.some(({ band }) => band !== null);
  const when = (isSaid: boolean, key: PhraseKey, name: string): readonly SlipSentence[] =>
    isSaid ? [{ key, name }] : [];
  return [
    { key: 'slip.means', name: 'First heading' },
    { key: 'slip.score', name: 'The score' },
    ...when(table.scale.direction === 'low-is-good', 'slip.low-is-good', 'That low scores are good'),
    { key: 'slip.group', name: 'Whom it is compared with' },
    ...when(
      table.groups.some(({ population }) => population.trim() !== ''),
      'slip.population',
      'Whom they stand for',
    ),
    { key: `slip.rank-${table.definitionKind}`, name: 'The percentile rank' },
    ...when(
      table.groups.some(({ note }) => note !== ''),
      'slip.adjusted',
      'A rank set by hand',
    ),
    ...when(banded, 'slip.band', 'The band'),
    ...when(
      rows.some(({ band }) => band === null),
      'slip.no-band',
      'No band',
    ),
    { key: 'slip.picture-dot', name: 'Under the picture: the dot' },
    { key: 'slip.picture-ring', name: 'Under the picture: a ring' },
    ...when(banded, 'slip.picture-bar', 'Under the picture: the bar'),
    { key: 'slip.picture-scale', name: 'Under the picture: the scale' },
    { key: 'slip.means-not', name: 'Second heading' },
    { key: 'slip.not-per-cent', name: 'Not a per cent of right answers' },
    { key: 'slip.not-judgement', name: 'Not a judgement' },
    { key: 'slip.not-alone', name: 'Not alone' },
    { key: 'slip.ask', name: 'Whom to ask' },
  ];
}
