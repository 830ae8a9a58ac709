import type { FitEvidence } from '../norms/fit-evidence.ts';
import type { GroupNorms } from '../norms/group-norms.ts';
import type { SmoothedCurve } from '../norms/group-smoothing.ts';
import type { NormProject } from '../norms/norm-project.ts';
import { joined } from '../norms/statements.ts';
import { printNumber } from '../scores/printed-number.ts';
import type { DegreeLine } from '../smoothing/smoothing.ts';
import type { NoteTable } from './note-table.ts';
import type { Paragraph } from './paragraph.ts';

/** What a smoothed group's technical notes say, before it is placed. */
export interface FitNotes {
  /** The degrees that were compared; null where the method compares none. */
  readonly degrees: NoteTable | null;
  readonly moments: NoteTable;
  /** What is to be said of the tables and of the fit. */
  readonly paragraphs: readonly Paragraph[];
}

const NO_VALUE = '\u2013';
/** Figures of misfit from here on are as good as without bound. */
const BEYOND = 99_999;
const LEAST_P = 0.001;
/** Longer lists of scores are cut. */
const MOST_NAMED = 10;

/** The technical notes of a group, or null where it is not smoothed. */
export function fitNotesOf({ people }: NormProject, { smoothing, evidence }: GroupNorms): FitNotes | null {
  if (smoothing.state !== 'smoothed' || evidence === null) return null;
  const { curve } = smoothing;
  const compared = curve.degrees.length > 0;
  return {
    degrees: compared ? degreeTable(curve) : null,
    moments: momentTable(curve),
    paragraphs: [
      ...(compared ? [{ lead: 'Degrees.', text: aboutDegrees(curve, evidence) }] : []),
      { lead: 'Fit.', text: [...fitSentences(curve), ...moveSentences(evidence)].join(' ') },
      ...warnings(evidence, people).map((text) => ({ lead: 'Beware.', text })),
    ],
  };
}

function degreeTable({ degrees, degree }: SmoothedCurve): NoteTable {
  return {
    name: 'degrees',
    heads: ['Degree', 'G²', 'X²', 'df', 'AIC', 'BIC', 'p'],
    firstColumn: 'figures',
    rows: degrees.map((line) => ({ cells: degreeCells(line), marked: line.degree === degree })),
  };
}

function degreeCells({ degree, converged, g2, x2, df, aic, bic, p }: DegreeLine): readonly string[] {
  if (!converged) return [String(degree), ...Array.from({ length: 6 }, () => NO_VALUE)];
  return [String(degree), misfit(g2), misfit(x2), String(df), misfit(aic), misfit(bic), printP(p)];
}

function misfit(value: number): string {
  return value > BEYOND ? `>${BEYOND}` : printNumber(value, 1);
}

function printP(p: number | null): string {
  if (p === null) return NO_VALUE;
  return p < LEAST_P ? `<${LEAST_P}` : printNumber(p, 3);
}

function aboutDegrees({ degrees }: SmoothedCurve, { nearlyAsGood }: FitEvidence): string {
  return [
    'G² and X² tell how far the fitted frequencies lie from the observed ones. AIC and BIC add a charge for each ' +
      'parameter; less is better. p tests a degree against the one below it. The degree taken is in bold, above a rule.',
    ...(degrees.every(({ converged }) => converged) ? [] : ['Where dashes stand, no fit was found.']),
    ...(nearlyAsGood.length === 0
      ? []
      : [`As good by BIC, lower or at most 2 higher: degree ${joined(nearlyAsGood.map(String))}.`]),
  ].join(' ');
}

function momentTable({ momentsObserved, momentsFitted }: SmoothedCurve): NoteTable {
  const row = (name: string, key: keyof typeof momentsObserved, decimals: number): NoteTable['rows'][number] => ({
    cells: [name, printNumber(momentsObserved[key], decimals), printNumber(momentsFitted[key], decimals)],
    marked: false,
  });
  return {
    name: 'moments',
    heads: ['Moment', 'Observed', 'Smoothed'],
    firstColumn: 'words',
    rows: [
      row('Mean', 'mean', 3),
      row('SD, dividing by n', 'sd', 3),
      row('Skewness', 'skewness', 3),
      row('Excess kurtosis', 'excessKurtosis', 3),
    ],
  };
}

/** All the figures of a group's notes in sentences, the other degrees left out; empty where it is not smoothed. */
export function fitFacts({ people }: NormProject, { smoothing, evidence }: GroupNorms): string {
  if (smoothing.state !== 'smoothed' || evidence === null) return '';
  const { curve } = smoothing;
  const figures = [
    ['G²', curve.g2],
    ['X²', curve.x2],
    ['df', curve.df],
    ['AIC', curve.aic],
    ['BIC', curve.bic],
  ] as const;
  const known = figures.flatMap(([name, value]) =>
    value === null ? [] : [`${name} ${name === 'df' ? value : misfit(value)}`],
  );
  const moments = momentTable(curve).rows.map(({ cells: [name = '', observed = '', smoothed = ''] }) => {
    return `${name} ${observed} observed, ${smoothed} smoothed`;
  });
  return [
    ...(known.length === 0 ? [] : [`${known.join(', ')}.`]),
    ...bandwidthSentence(curve),
    `${moments.join('; ')}.`,
    ...moveSentences(evidence),
    ...warnings(evidence, people),
  ].join(' ');
}

/** Fit and bandwidth, where no table of degrees tells it. */
function fitSentences(curve: SmoothedCurve): readonly string[] {
  const { degrees, g2, x2, df } = curve;
  const told = degrees.length > 0 || g2 === null || x2 === null || df === null;
  return [
    ...(told ? [] : [`G² is ${misfit(g2)} and X² ${misfit(x2)}, on ${df} degrees of freedom.`]),
    ...bandwidthSentence(curve),
  ];
}

function bandwidthSentence({ choice, bandwidth }: SmoothedCurve): readonly string[] {
  if (bandwidth === null) return [];
  const found = choice.kind === 'kernel' && choice.bandwidth === 'auto';
  const points = found
    ? `${printNumber(bandwidth, 4)} raw-score points, found from the data`
    : `${bandwidth} raw-score points`;
  return [`The bandwidth of the kernel is ${points}.`];
}

/** What smoothing did to the printed table. */
function moveSentences({ largestMove, changed, of }: FitEvidence): readonly string[] {
  return [
    `The largest move of a rank is ${printNumber(largestMove.points, 2)} percentile-rank points, at raw score ${largestMove.scoreText}.`,
    `Smoothing changes ${changed} of ${of} printed ranks.`,
  ];
}

function warnings({ filledGaps, inventedDips }: FitEvidence, people: NormProject['people']): readonly string[] {
  return [
    ...(filledGaps.length === 0
      ? []
      : [`The curve expects five ${people} or more at ${named(filledGaps)}, where there are none.`]),
    ...(inventedDips.length === 0 ? [] : [`The curve dips at ${named(inventedDips)}; the data do not.`]),
  ];
}

/** "7, 9 and 12", or the first few and how many more there are. */
function named(scores: readonly string[]): string {
  const left = scores.length - MOST_NAMED;
  return joined(left > 1 ? [...scores.slice(0, MOST_NAMED), `${left} more`] : scores);
}
