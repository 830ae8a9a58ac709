import { groupKey } from '../norms/norm-groups.ts';
import type { QuestionChoice, UsableAnswer } from './class-questions.ts';
import type { ClassTable, ClassTableGroup } from './class-table.ts';
import { foldedText } from './list-text.ts';
import { known, LEAVE_OUT, unsettled, type Known, type KeyedRow, type ListFacts } from './row-questions.ts';

/** How the rows of a list find their table. */
export interface GroupRule {
  readonly table: ClassTable;
  /** The table for rows that name no group: chosen for the class, or else the default of the table. */
  readonly standing: ClassTableGroup | null;
  /** True where at least one row names a group. */
  readonly anyNamed: boolean;
}

/** `chosen` are the values of the table chosen for the class; null where none is. */
export function groupRule(table: ClassTable, chosen: readonly string[] | null, anyNamed: boolean): GroupRule {
  const byValues = (values: readonly string[] | null): ClassTableGroup | undefined =>
    values === null ? undefined : table.groups.find((group) => groupKey(group.values) === groupKey(values));
  const only = table.groups.length === 1 ? table.groups[0] : undefined;
  return { table, standing: byValues(chosen) ?? byValues(table.defaultGroup) ?? only ?? null, anyNamed };
}

/**
 * The table that a row is looked up in. A group that the list names is taken only where it names exactly one table; where
 * the table knows no groups, those of the list say nothing about it. Rows that name none take the standing table.
 */
export function groupIn({ row, key }: KeyedRow, rule: GroupRule, { book }: ListFacts): Known<ClassTableGroup> {
  const { table, standing, anyNamed } = rule;
  const [first] = table.groups;
  if (first !== undefined && table.groupColumns.length === 0) return known(first);
  const choices = [...table.groups.map(choiceOf), LEAVE_OUT];
  const asked = { about: 'group' as const, line: row.line, name: row.name || row.code, choices };
  if (row.group === '') {
    if (standing !== null) return known(standing);
    const answer = book.ask({
      ...asked,
      // Where no row names a group, one answer is for all.
      key: anyNamed ? ['none', ...key] : ['none-anywhere'],
      sentence: (where) => `${where}: no group is named, and there are several tables.`,
    });
    return chosenTable(table, answer, 'names no group');
  }
  const [match, ...more] = groupsNamed(table, row.group);
  if (match !== undefined && more.length === 0) return known(match);
  const partly = match !== undefined || table.groups.some((group) => namedInPart(table, group, row.group));
  const answer = book.ask({
    ...asked,
    key: ['named', foldedText(row.group), ...table.groups.map(({ values }) => groupKey(values))],
    sentence: (where) =>
      `${where}: the group \u201c${row.group}\u201d ${partly ? 'does not say which table is meant' : 'has no table'}.`,
  });
  return chosenTable(table, answer, 'names a group without a table');
}

function choiceOf({ values, title }: ClassTableGroup): QuestionChoice {
  return { key: `table:${groupKey(values)}`, text: `Look up in the table \u201c${title}\u201d` };
}

function chosenTable(table: ClassTable, answer: UsableAnswer | null, what: string): Known<ClassTableGroup> {
  const group = table.groups.find((one) => choiceOf(one).key === answer?.choice);
  return group === undefined ? unsettled(answer, what) : known(group);
}

/** Tables that a text names: by title, or by the values of all grouping columns, with or without the columns' names. */
function groupsNamed(table: ClassTable, text: string): readonly ClassTableGroup[] {
  const wanted = foldedText(text);
  return table.groups.filter(({ title, values }) => {
    const names = values.map((value, index) => `${foldedText(table.groupColumns[index] ?? '')} ${foldedText(value)}`);
    const all = [title, values.join(', '), values.join(' '), values.join('/'), names.join(', ')];
    return all.some((one) => sameValue(foldedText(one), wanted));
  });
}

/** True where a text gives some of the values of a table. */
function namedInPart({ groupColumns }: ClassTable, { values }: ClassTableGroup, text: string): boolean {
  return foldedText(text)
    .split(/\s*[,;/]\s*/)
    .every((part) =>
      values.some((value, index) => {
        const folded = foldedText(value);
        return sameValue(folded, part) || `${foldedText(groupColumns[index] ?? '')} ${folded}` === part;
      }),
    );
}

/** "5", "05" and "5.0" are one value. */
function sameValue(left: string, right: string): boolean {
  const plain = /^\d+(?:[.,]0+)?$/;
  if (plain.test(left) && plain.test(right)) return parseInt(left, 10) === parseInt(right, 10);
  return left === right;
}
