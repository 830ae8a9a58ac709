import * as v from 'valibot';

/** What a policy may require a reader to be told. Definition and descriptive statistics print on every sheet. */
export const REQUIRED_FIELDS = [
  'population',
  'sampling',
  'participation',
  'test-dates',
  'weighting',
  'precision',
] as const;

const source = v.pipe(
  v.string(),
  v.check((text) => text.trim() !== '', 'say where the value comes from'),
  v.maxLength(400, 'at most 400 letters'),
);

/** A value with the text that it is taken from. */
function cited<const Value extends v.GenericSchema>(value: Value) {
  return v.pipe(v.object({ value, source }), v.readonly());
}

const people = v.pipe(v.number(), v.safeInteger('a whole number of people'), v.minValue(0, 'a number of 0 or more'));
const share = v.pipe(v.number(), v.minValue(0, 'a share from 0 to 1'), v.maxValue(1, 'a share from 0 to 1'));
const points = v.pipe(v.number(), v.minValue(0, 'points from 0 to 100'), v.maxValue(100, 'points from 0 to 100'));
const least1 = v.pipe(v.number(), v.safeInteger('a whole number'), v.minValue(1, 'a number of 1 or more'));

/** The thresholds by which queries are asked; the words for each stand in `policyLines`. */
export const policySchema = v.pipe(
  v.object({
    title: v.pipe(v.string(), v.maxLength(400)),
    /** People in a group: below the first a reason must be given, below the second a look is wanted. */
    smallestMust: cited(people),
    smallestShould: cited(people),
    /** Effective n against n. */
    leastEffective: cited(share),
    /** Share of the rows read. */
    mostLeftOut: cited(share),
    /** Share of a group at one end of the scale. */
    crowdedEnd: cited(share),
    /** Percentile-rank points between neighbouring scores. */
    wideStep: cited(points),
    /** Scores in a row that nobody obtained, between the lowest and the highest that somebody did. */
    longestGap: cited(least1),
    /** People at the scores on both sides from which such a gap is asked about; thin ends have gaps by chance. */
    gapNeighbours: cited(least1),
    /** People in a printed cell of counts; cells of 0 are not meant. */
    smallestCell: cited(people),
    /** Percentile-rank points by which a later group may stand higher at the same raw score. */
    rankReversal: cited(points),
    /** Years from the last testing to the edition. */
    oldestYears: cited(people),
    rounding: cited(v.picklist(['half-up', 'half-even', 'either'])),
    ends: cited(v.picklist(['signs', 'held', 'either'])),
    documentation: cited(v.pipe(v.array(v.picklist(REQUIRED_FIELDS)), v.readonly())),
  }),
  v.check(
    ({ smallestMust, smallestShould }) => smallestMust.value <= smallestShould.value,
    'smallest-must may not be above smallest-should',
  ),
  v.readonly(),
);

export type Policy = v.InferOutput<typeof policySchema>;
export type RequiredField = (typeof REQUIRED_FIELDS)[number];
