import type { PeopleNoun } from '../../shared-core/norms/norm-project.ts';

/** "reading_survey-2026.csv" as a title: "Reading survey 2026". */
export function titleFrom(file: string): string {
  const words = file
    .replace(/\.[^.]+$/, '')
    .replaceAll(/[_-]+/g, ' ')
    .trim();
  return words.charAt(0).toUpperCase() + words.slice(1);
}

/** What the people are called, where a column says so: "pupil_id" speaks of pupils. */
export function nounFrom(columns: readonly string[]): PeopleNoun {
  const nouns = [
    ['pupil', 'pupils'],
    ['student', 'students'],
    ['candidate', 'candidates'],
  ] as const;
  return nouns.find(([one]) => columns.some((column) => column.toLowerCase().includes(one)))?.[1] ?? 'people';
}
