import { printCount, printNumber, printShare } from '../scores/printed-number.ts';
import { REQUIRED_FIELDS, type Policy, type RequiredField } from './policy-schema.ts';

const USUAL = 'common practice';

/** The thresholds that hold until an office brings its own. */
export const DEFAULT_POLICY: Policy = {
  title: 'Usual thresholds',
  smallestMust: { value: 30, source: USUAL },
  smallestShould: { value: 200, source: USUAL },
  leastEffective: { value: 0.5, source: USUAL },
  mostLeftOut: { value: 0.05, source: USUAL },
  crowdedEnd: { value: 0.15, source: USUAL },
  wideStep: { value: 10, source: USUAL },
  longestGap: { value: 2, source: USUAL },
  gapNeighbours: { value: 5, source: USUAL },
  smallestCell: { value: 3, source: USUAL },
  rankReversal: { value: 2, source: USUAL },
  oldestYears: { value: 10, source: USUAL },
  rounding: { value: 'either', source: USUAL },
  ends: { value: 'either', source: USUAL },
  documentation: {
    value: ['population', 'sampling', 'participation', 'test-dates', 'weighting'],
    source: USUAL,
  },
};

/** One threshold in words: what it is about, what it asks, and the text it is taken from. */
export interface PolicyLine {
  readonly key: Exclude<keyof Policy, 'title'>;
  readonly name: string;
  readonly asks: string;
  readonly source: string;
}

const FIELD_WORDS: Readonly<Record<RequiredField, string>> = {
  population: 'population',
  sampling: 'sampling',
  participation: 'participation',
  'test-dates': 'dates of testing',
  weighting: 'weighting',
  precision: 'error of sampling',
};

/** All thresholds of a policy in words, in a fixed order. */
export function policyLines(policy: Policy): readonly PolicyLine[] {
  const line = (key: PolicyLine['key'], name: string, asks: string): PolicyLine => ({
    key,
    name,
    asks,
    source: policy[key].source,
  });
  const fields = REQUIRED_FIELDS.filter((field) => policy.documentation.value.includes(field));
  return [
    line('smallestMust', 'Smallest group', `at least ${printCount(policy.smallestMust.value)}, or a reason`),
    line('smallestShould', 'Group without a query', `at least ${printCount(policy.smallestShould.value)}`),
    line('leastEffective', 'Effective n', `at least ${printShare(policy.leastEffective.value)} of n`),
    line('mostLeftOut', 'Rows left out', `at most ${printShare(policy.mostLeftOut.value)}`),
    line('crowdedEnd', 'At an end of the scale', `at most ${printShare(policy.crowdedEnd.value)}`),
    line('wideStep', 'From score to score', `at most ${plain(policy.wideStep.value)} points of percentile rank`),
    line('longestGap', 'Scores in a row that nobody obtained', `at most ${printCount(policy.longestGap.value)}`),
    line(
      'gapNeighbours',
      'Such a gap is asked about',
      `where ${printCount(policy.gapNeighbours.value)} or more stand on each side`,
    ),
    line('smallestCell', 'Smallest printed count', `at least ${printCount(policy.smallestCell.value)}, or none`),
    line('rankReversal', 'Ranks of a later group', `at most ${plain(policy.rankReversal.value)} points higher`),
    line('oldestYears', 'Age of the norms', `at most ${printCount(policy.oldestYears.value)} years`),
    line(
      'rounding',
      'Rounding',
      { 'half-up': 'halves up', 'half-even': 'halves to even', either: 'either way' }[policy.rounding.value],
    ),
    line(
      'ends',
      'Ends of the table',
      { signs: 'with signs, as in <1', held: 'held, as in 1', either: 'either way' }[policy.ends.value],
    ),
    line('documentation', 'Told of the group', fields.map((field) => FIELD_WORDS[field]).join(', ') || 'nothing'),
  ];
}

/** What a policy says of one thing, as a query quotes it: "Policy: at most 15.0 % (common practice)." */
export function policySays(policy: Policy, key: PolicyLine['key']): string {
  const found = policyLines(policy).find((line) => line.key === key);
  if (found === undefined) throw new RangeError(`no threshold ${key}`);
  return `Policy: ${found.asks} (${found.source.trim()}).`;
}

function plain(value: number): string {
  return printNumber(value, Number.isInteger(value) ? 0 : 1);
}
