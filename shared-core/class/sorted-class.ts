import type { ClassFile } from './class-file.ts';
import type { ClassListRow, MissedStatus } from './class-list.ts';
import { QuestionBook, type ClassQuestion } from './class-questions.ts';
import type { ClassTableGroup, ClassTableRow } from './class-table.ts';
import { groupIn, groupRule, type GroupRule } from './group-questions.ts';
import { nameIn, scoreIn, type Known, type KeyedRow, type ListFacts } from './row-questions.ts';
import { samePupils, type NamedRow, type SamePupil } from './same-pupil-questions.ts';

/** What becomes of a row of the list. */
export type RowOutcome =
  | {
      readonly kind: 'scored';
      /** Raw-score points. */
      readonly score: number;
      /** True where the score was typed anew in an answer. */
      readonly corrected: boolean;
      /** Where it was found; null where there is no table. */
      readonly found: { readonly table: ClassTableGroup; readonly row: ClassTableRow } | null;
    }
  | { readonly kind: 'missed'; readonly status: MissedStatus }
  | { readonly kind: 'left-out'; readonly why: string }
  | { readonly kind: 'open'; readonly why: string };

export interface SortedRow {
  /** Place in the list, from 0. */
  readonly index: number;
  readonly row: ClassListRow;
  /** As printed; empty as long as it is asked about. */
  readonly name: string;
  readonly outcome: RowOutcome;
}

export interface SortedClass {
  /** One for each row of the list, in its order. */
  readonly rows: readonly SortedRow[];
  /** All questions, answered or not, in order of lines. */
  readonly questions: readonly ClassQuestion[];
}

/**
 * Sorts the rows of a list into those with a score that can be used, those without one, those left out by an answer and
 * those with an open question. Nothing is guessed: what the list and the answers do not say is a question.
 */
export function sortClass({
  list,
  table,
  group,
  answers,
}: Pick<ClassFile, 'list' | 'table' | 'group' | 'answers'>): SortedClass {
  const facts: ListFacts = { mark: list.decimalMark, scale: table?.scale ?? null, book: new QuestionBook(answers) };
  const rule =
    table === null
      ? null
      : groupRule(
          table,
          group,
          list.rows.some((row) => row.group !== ''),
        );
  const keyed = keyedRows(list.rows);
  const names = keyed.map((row) => nameIn(row, facts.book));
  const named = keyed.flatMap((row, index): (NamedRow & { readonly index: number })[] => {
    const name = names[index];
    return name?.state === 'known' ? [{ ...row, index, name: name.value }] : [];
  });
  const same = new Map(samePupils(named, facts).map((outcome, place) => [named[place]?.index ?? -1, outcome]));
  const rows = keyed.map((row, index): SortedRow => {
    const name = names[index] ?? { state: 'open' };
    return {
      index,
      row: row.row,
      name: name.state === 'known' ? name.value : row.row.name || row.row.code,
      outcome: outcomeOf(row, name, same.get(index) ?? 'kept', rule, facts),
    };
  });
  return { rows, questions: facts.book.questions };
}

const OPEN: RowOutcome = { kind: 'open', why: 'A question about this row is open.' };

function outcomeOf(
  row: KeyedRow,
  name: Known<string>,
  same: SamePupil,
  rule: GroupRule | null,
  facts: ListFacts,
): RowOutcome {
  if (name.state === 'left-out') return { kind: 'left-out', why: name.why };
  if (same === 'none-kept') return { kind: 'left-out', why: 'It has the name or code of another row.' };
  if (typeof same === 'object') return { kind: 'left-out', why: `Line ${same.keptLine} is kept for the same pupil.` };
  // The score and the group of a row with an open question are asked about too, so that all can be answered at once.
  const score = scoreIn(row, facts);
  if (score.state === 'left-out') return { kind: 'left-out', why: score.why };
  const open = name.state === 'open' || same === 'open';
  const found = score.state === 'known' ? score.value : null;
  if (found?.kind === 'missed') return open ? OPEN : { kind: 'missed', status: found.status };
  const group = rule === null ? null : groupIn(row, rule, facts);
  if (group?.state === 'left-out') return { kind: 'left-out', why: group.why };
  if (open || found === null || group?.state === 'open') return OPEN;
  const { points, corrected } = found;
  return { kind: 'scored', score: points, corrected, found: group === null ? null : foundIn(group.value, points) };
}

function foundIn(
  table: ClassTableGroup,
  score: number,
): { readonly table: ClassTableGroup; readonly row: ClassTableRow } {
  const row = table.rows.find(({ low, high }) => low <= score && score <= high);
  if (row === undefined) throw new RangeError('a table without a row for a score of its scale');
  return { table, row };
}

/** Every row with its texts and how many before it say exactly the same. */
function keyedRows(rows: readonly ClassListRow[]): readonly KeyedRow[] {
  const met = new Map<string, number>();
  return rows.map((row) => {
    const texts = [row.name, row.code, row.scoreText, row.group, row.statusText];
    const text = JSON.stringify(texts);
    const before = met.get(text) ?? 0;
    met.set(text, before + 1);
    return { row, key: [...texts, before] };
  });
}
