const text = { type: 'string' } as const;
const flag = { type: 'boolean' } as const;

/** Options by name, and whether a value follows them. */
export type OptionNames = Readonly<Record<string, { readonly type: 'string' | 'boolean' }>>;

export const GENERAL = { help: flag, version: flag } as const satisfies OptionNames;

const COHORT = {
  ...GENERAL,
  score: text,
  count: text,
  weight: text,
  id: text,
  cluster: text,
  by: text,
  scale: text,
  'low-is-good': flag,
  missing: text,
} as const satisfies OptionNames;

export const TABLE = {
  ...COHORT,
  definition: text,
  smooth: text,
  interval: text,
  level: text,
  reliability: text,
  bootstrap: text,
  seed: text,
  points: text,
  'point-definition': text,
  columns: text,
  format: text,
} as const satisfies OptionNames;

export const DIFFER = { ...COHORT, group: text, ranks: text, format: text } as const satisfies OptionNames;

export const PRESS = { ...GENERAL, into: text } as const satisfies OptionNames;

export const RELEASE = { ...PRESS, analyst: text, checker: text } as const satisfies OptionNames;

export const READ_BACK = { ...GENERAL, against: text, format: text } as const satisfies OptionNames;

export const COMPARE = { ...GENERAL, format: text } as const satisfies OptionNames;

export const ERRATUM = {
  ...GENERAL,
  roster: text,
  score: text,
  by: text,
  person: text,
  cut: text,
} as const satisfies OptionNames;

export const CLASS = {
  ...GENERAL,
  table: text,
  group: text,
  'low-is-good': flag,
  into: text,
  codes: flag,
  seed: text,
  summary: flag,
  slips: text,
  title: text,
  date: text,
  name: text,
  score: text,
  by: text,
  status: text,
  language: text,
} as const satisfies OptionNames;

export const QUERIES = { ...GENERAL, format: text } as const satisfies OptionNames;
