import type { GroupBootstrap } from '../../shared-core/norms/bootstrap-file.ts';
import type { GroupNorms } from '../../shared-core/norms/group-norms.ts';
import { countedPeople } from '../../shared-core/norms/norm-groups.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import { drawnInWords } from '../../shared-core/norms/sampling-words.ts';
import { INTERVAL_METHOD_WORDS } from '../../shared-core/precision/proportion-interval.ts';
import { RANDOM_GENERATOR } from '../../shared-core/precision/seeded-random.ts';
import { printCount, printNumber } from '../../shared-core/scores/printed-number.ts';

/** How the group is smoothed, how well that fits, and what it does to the printed ranks. */
export function smoothingLines({ smoothing, evidence }: GroupNorms): readonly string[] {
  if (smoothing.state !== 'smoothed') return ['The distribution is not smoothed.'];
  const { statement, g2, x2, df, aic, bic } = smoothing.curve;
  const figures: readonly (readonly [string, number | null, number])[] = [
    ['G²', g2, 2],
    ['X²', x2, 2],
    ['df', df, 0],
    ['AIC', aic, 2],
    ['BIC', bic, 2],
  ];
  const told = figures.flatMap(([name, value, decimals]) =>
    value === null ? [] : [`${name} ${printNumber(value, decimals)}`],
  );
  return [
    statement,
    ...(told.length === 0 ? [] : [`Fit: ${told.join(', ')}.`]),
    ...(evidence === null
      ? []
      : [
          `Smoothing moves a rank by at most ${printNumber(evidence.largestMove.points, 1)} points, at ` +
            `${evidence.largestMove.scoreText}, and changes ${evidence.changed} of ${evidence.of} printed ranks.`,
        ]),
  ];
}

/** What the columns of intervals and of measurement bands hold, where the table has them. */
export function precisionLines({ precision, table }: NormProject, norms: GroupNorms): readonly string[] {
  const { sem, intervals } = norms.precision;
  const { columns } = table;
  const level = `${precision.level} %`;
  return [
    ...(columns.includes('interval') && intervals !== null
      ? [
          `Intervals: ${level}, ${INTERVAL_METHOD_WORDS[precision.interval]}, of the observed rank; error of sampling, ` +
            `${drawnInWords('people', norms.sampling)}.`,
        ]
      : []),
    ...(columns.includes('measurement-band') && sem !== null
      ? [
          `Measurement bands: ${level}, at a reliability of ${precision.reliability ?? 0}, which is a standard error of ` +
            `${printNumber(sem, 2)} raw-score points; error of measurement.`,
        ]
      : []),
  ];
}

/** What was drawn, how many samples could be smoothed, which degrees they took, and the largest standard error. */
export function bootstrapLines(
  { people: noun }: NormProject,
  { rows, smoothing }: GroupNorms,
  made: GroupBootstrap | null,
): readonly string[] {
  if (made === null) return [];
  const { drawn, fitted, people, failures, degrees, standardErrors } = made.bootstrapped;
  const largest = Math.max(...standardErrors);
  const at = rows[standardErrors.indexOf(largest)]?.scoreText ?? '';
  const success = fitted === drawn ? 'without failure' : `${printCount(fitted)} with success`;
  const again = smoothing.state === 'smoothed' ? `, each smoothed again, ${success}` : '';
  const chosen = degrees.map(({ degree, count }) => `${degree} in ${printCount(count)}`).join(', ');
  return [
    `Bootstrap: ${printCount(drawn)} samples of ${countedPeople(printCount(people), noun)} from seed ${made.seed} ` +
      `(${RANDOM_GENERATOR})${again}. ` +
      `Largest standard error ${printNumber(largest, 1)} points, at ${at}.` +
      (degrees.length === 0 ? '' : ` Degrees taken: ${chosen}.`),
    ...failures.map(({ problem, count }) => `  ${printCount(count)} not smoothed: ${problem}`),
  ];
}
