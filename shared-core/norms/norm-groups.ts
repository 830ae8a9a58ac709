import { ENGLISH_WORDS, figure, say, sayCounted } from '../languages/phrases.ts';
import { tablesByGroup, type FrequencyTable } from '../tally/frequency-table.ts';
import type { Documentation, NormProject, PeopleNoun } from './norm-project.ts';

/** A group that gets, or may get, a table of its own. */
export interface NormGroup {
  /** The values of the grouping columns as JSON: the same text for the same group, always. */
  readonly key: string;
  /** One value for each column of `groups.by`. */
  readonly values: readonly string[];
  /** As printed: "Grade 5". */
  readonly title: string;
  /** False when the user asked for no table. */
  readonly printed: boolean;
  readonly table: FrequencyTable;
}

export function groupKey(values: readonly string[]): string {
  return JSON.stringify(values);
}

/** All groups of a project in print order; empty before a cohort was read. */
export function normGroups(project: NormProject): readonly NormGroup[] {
  if (project.tally === null) return [];
  const { by, choices } = project.groups;
  return tablesByGroup(project.tally, by).map(({ values, table }) => {
    const key = groupKey(values);
    const choice = choices.find((known) => groupKey(known.values) === key);
    const given = inOneLine(choice?.title);
    return {
      key,
      values,
      title: given === '' ? standingTitle(by, values, project.people) : given,
      printed: choice?.printed ?? true,
      table,
    };
  });
}

/** "Grade 5, Form A"; "All pupils" where there is no grouping. */
export function standingTitle(
  by: readonly string[],
  values: readonly string[],
  people: PeopleNoun,
  words = ENGLISH_WORDS,
): string {
  if (by.length === 0) return say(words, `all.${people}`);
  return by.map((column, index) => `${columnInWords(column)} ${valueInWords(values[index], words)}`).join(', ');
}

/** Cells of a file may hold line ends, which a title has no room for. */
function inOneLine(text = ''): string {
  return text.replace(/\s+/g, ' ').trim();
}

/** A value of a grouping column as it is printed. */
export function valueInWords(value = '', words = ENGLISH_WORDS): string {
  return inOneLine(value) || say(words, 'group.blank');
}

/** "age_group" as it is printed: "Age group". */
export function columnInWords(column: string): string {
  const words = inOneLine(column.replaceAll('_', ' '));
  return words.charAt(0).toUpperCase() + words.slice(1);
}

const DOCUMENTATION_WORDS: Readonly<Record<keyof Documentation, string>> = {
  population: 'the population the group stands for',
  sampling: 'how people were chosen',
  participation: 'how many of those asked took part',
  testDates: 'when they were tested',
  weighting: 'whether and how they were weighted',
};

/**
 * What is missing before a reader can tell whom the table speaks of, in words. A report of a norming study gives
 * population, sampling, participation, weighting and dates (common practice in testing standards).
 */
export function missingDocumentation(documentation: Documentation): readonly string[] {
  return Object.entries(DOCUMENTATION_WORDS)
    .filter(([field]) => documentation[field as keyof Documentation].trim() === '')
    .map(([, words]) => words);
}

/** "norm group" when its documentation is complete, otherwise "sample". */
export function groupNoun(documentation: Documentation): 'norm group' | 'sample' {
  return missingDocumentation(documentation).length === 0 ? 'norm group' : 'sample';
}

/** One of them: "pupil", "person". */
export function onePerson(people: PeopleNoun, words = ENGLISH_WORDS): string {
  return say(words, `person.${people}`);
}

/** A printed count with its noun: "1 pupil", "2 pupils". */
export function countedPeople(count: string, people: PeopleNoun, words = ENGLISH_WORDS): string {
  return sayCounted(words, `counted.${people}`, count, { count: figure(words, count) });
}
