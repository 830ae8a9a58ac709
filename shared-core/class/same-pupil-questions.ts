import type { QuestionChoice } from './class-questions.ts';
import { foldedText } from './list-text.ts';
import { LEAVE_OUT, type KeyedRow, type ListFacts } from './row-questions.ts';

export interface NamedRow extends KeyedRow {
  /** As printed, after corrections. */
  readonly name: string;
}

/** What becomes of a row because of others of the same pupil; rows that stand alone are kept. */
export type SamePupil = 'kept' | 'open' | { readonly keptLine: number } | 'none-kept';

/**
 * Rows with the same name, but for case and space, or with the same code are asked about: they may be one pupil listed
 * twice, or two people of one name. Rows that hang together by name or code are one question.
 */
export function samePupils(rows: readonly NamedRow[], { book }: ListFacts): readonly SamePupil[] {
  const outcomes: SamePupil[] = rows.map(() => 'kept');
  for (const members of setsOfSame(rows)) {
    if (members.length < 2) continue;
    const asking = members.flatMap((index) => {
      const row = rows[index];
      return row === undefined ? [] : [{ index, row }];
    });
    const choices = choicesFor(asking.map(({ row }) => row.row.line));
    const answers = asking.map(({ row }) =>
      book.ask({
        about: 'same-pupil',
        key: asking.map(({ row: { key, name } }) => [key, name]),
        line: row.row.line,
        name: row.name,
        sentence: (where) => `${where} have the same name or code.`,
        choices,
      }),
    );
    const choice = answers[0]?.choice;
    const kept = asking.find((_, place) => choice === `keep-${place + 1}`);
    for (const { index } of asking) {
      outcomes[index] =
        choice === undefined
          ? 'open'
          : choice === 'all' || index === kept?.index
            ? 'kept'
            : kept === undefined
              ? 'none-kept'
              : { keptLine: kept.row.row.line };
    }
  }
  return outcomes;
}

function choicesFor(lines: readonly number[]): readonly QuestionChoice[] {
  const two = lines.length === 2;
  return [
    { key: 'all', text: `${two ? 'Both' : 'All'} are pupils of their own` },
    ...lines.map((line, place) => ({ key: `keep-${place + 1}`, text: `One pupil: keep line ${line} only` })),
    { key: LEAVE_OUT.key, text: `Leave ${two ? 'both' : 'all'} rows out` },
  ];
}

/** Indexes of rows that hang together, each set in order of the list. */
function setsOfSame(rows: readonly NamedRow[]): readonly (readonly number[])[] {
  const leader = rows.map((_, index) => index);
  const first = new Map<string, number>();
  const leaderOf = (index: number): number => {
    const above = leader[index] ?? index;
    return above === index ? index : leaderOf(above);
  };
  rows.forEach(({ row, name }, index) => {
    const marks = [
      ...(row.name === '' && row.code !== '' ? [] : [`name ${foldedText(name)}`]),
      ...(row.code === '' ? [] : [`code ${foldedText(row.code)}`]),
    ];
    for (const mark of marks) {
      const known = first.get(mark);
      if (known === undefined) first.set(mark, index);
      else {
        const [left, right] = [leaderOf(known), leaderOf(index)];
        leader[Math.max(left, right)] = Math.min(left, right);
      }
    }
  });
  const sets = new Map<number, number[]>();
  rows.forEach((_, index) => {
    const at = leaderOf(index);
    const set = sets.get(at);
    if (set === undefined) sets.set(at, [index]);
    else set.push(index);
  });
  return [...sets.values()];
}
