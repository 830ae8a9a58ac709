import { columnOf } from './table-columns.ts';
import { missingDocumentation } from './norm-groups.ts';
import type { GroupNorms } from './group-norms.ts';
import type { Documentation, NormProject } from './norm-project.ts';
import { policySays } from './policy.ts';
import type { RequiredField } from './policy-schema.ts';
import type { Asked } from './queries.ts';

/** What a proof-reader would ask of what is told beside the numbers: the group, dates, cautions, titles, print rules. */
export function descriptionQueries(project: NormProject, groups: readonly GroupNorms[]): readonly Asked[] {
  return [
    ...documentationQueries(project),
    ...precisionQueries(project, groups),
    ...dateQueries(project),
    ...cautionQueries(project),
    ...printQueries(project),
    ...titleQueries(groups),
  ];
}

const FIELDS: Readonly<Record<Exclude<RequiredField, 'precision'>, keyof Documentation>> = {
  population: 'population',
  sampling: 'sampling',
  participation: 'participation',
  'test-dates': 'testDates',
  weighting: 'weighting',
};

function documentationQueries({ groups, policy }: NormProject): readonly Asked[] {
  const required = policy.documentation.value.flatMap((field) => (field === 'precision' ? [] : [FIELDS[field]]));
  const told = Object.fromEntries(
    Object.entries(groups.documentation).map(([field, text]) => [
      field,
      required.some((wanted) => wanted === field) ? text : 'not required',
    ]),
  );
  const missing = missingDocumentation({ ...groups.documentation, ...told });
  if (missing.length === 0) return [];
  return [
    {
      id: 'documentation',
      station: 'groups',
      weight: 'should',
      group: null,
      lead: 'Whom does the table speak of?',
      why:
        `Not told yet: ${missing.join('; ')}. Until then it is headed “sample”, not “norm group”. ` +
        policySays(policy, 'documentation'),
      whatToDo: 'Describe the group at the Groups station.',
    },
  ];
}

/** Error of sampling prints as a column, or as the band of the picture. */
function precisionQueries(project: NormProject, groups: readonly GroupNorms[]): readonly Asked[] {
  const { policy, table, sheet } = project;
  if (!policy.documentation.value.includes('precision')) return [];
  const banded = sheet.ogive && groups.every(({ precision }) => precision.intervals !== null);
  if (banded || table.columns.some((column) => column === 'interval' || column === 'standard-error')) return [];
  return [
    {
      id: 'no-precision',
      station: 'table',
      weight: 'should',
      group: null,
      lead: 'How sure the ranks are is not printed.',
      why: `A reader takes each rank as exact. ${policySays(policy, 'documentation')}`,
      whatToDo:
        `Let the column “${columnOf('interval', project).name}” or “${columnOf('standard-error', project).name}” print, ` +
        'or the picture with its band.',
    },
  ];
}

function dateQueries({ release, groups, policy }: NormProject): readonly Asked[] {
  if (release.date === '') {
    return [
      {
        id: 'edition-date',
        station: 'release',
        weight: 'should',
        group: null,
        lead: 'The edition has no date.',
        why: 'A reader cannot tell how old the table is.',
        whatToDo: 'Give the date of the edition.',
      },
    ];
  }
  const tested = lastYearIn(groups.documentation.testDates);
  const age = tested === null ? 0 : Number(release.date.slice(0, 4)) - tested;
  if (age <= policy.oldestYears.value) return [];
  return [
    {
      id: 'stale-norms',
      station: 'release',
      weight: 'should',
      group: null,
      lead: `The group was tested in ${tested}, ${age} years before this edition.`,
      why: `What people can do shifts over the years, and with it every rank. ${policySays(policy, 'oldestYears')}`,
      whatToDo: 'Test again, or give the reason why the old group still serves.',
    },
  ];
}

/** The latest year that a text names with four digits; null where it names none. */
function lastYearIn(text: string): number | null {
  const years = text.match(/(?<!\d)(?:19|20)\d{2}(?!\d)/g);
  return years === null ? null : Math.max(...years.map(Number));
}

function cautionQueries({ sheet }: NormProject): readonly Asked[] {
  if (sheet.cautions.trim() !== '') return [];
  return [
    {
      id: 'no-cautions',
      station: 'sheet',
      weight: 'must',
      group: null,
      lead: 'The cautions are gone.',
      why: 'A table without them is read as per cent correct, averaged, and used alone.',
      whatToDo: 'Put cautions back, or give the reason for printing none.',
    },
  ];
}

/** Rounding and ends against those the policy wants. */
function printQueries({ table, policy }: NormProject): readonly Asked[] {
  const asked: Asked[] = [];
  if (policy.rounding.value !== 'either' && policy.rounding.value !== table.rounding) {
    asked.push({
      id: 'policy-rounding',
      station: 'table',
      weight: 'must',
      group: null,
      lead: 'The table rounds in another way than the policy.',
      why: `A rank that ends in a half prints one unit away from the office’s other tables. ${policySays(policy, 'rounding')}`,
      whatToDo: 'Change the rounding, or give the reason.',
    });
  }
  if (policy.ends.value !== 'either' && policy.ends.value !== table.ends) {
    asked.push({
      id: 'policy-ends',
      station: 'table',
      weight: 'must',
      group: null,
      lead: 'The ends of the table print in another way than the policy.',
      why: `Readers of several tables take one way of writing the ends for another. ${policySays(policy, 'ends')}`,
      whatToDo: 'Change the ends, or give the reason.',
    });
  }
  return asked;
}

function titleQueries(groups: readonly GroupNorms[]): readonly Asked[] {
  const titles = groups.map(({ group }) => group.title);
  return [...new Set(titles.filter((title, index) => titles.indexOf(title) !== index))].map((title) => ({
    id: `same-title:${title}`,
    station: 'groups',
    weight: 'must',
    group: null,
    lead: `More than one table is called ${title}.`,
    why: 'A reader cannot tell which of them a person belongs to.',
    whatToDo: 'Give each a title of its own.',
  }));
}
