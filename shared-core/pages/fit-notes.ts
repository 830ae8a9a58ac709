import { listed } from '../languages/lists.ts';
import { figure, say, wordsOf, type PrintWords } from '../languages/phrases.ts';
import type { FitEvidence } from '../norms/fit-evidence.ts';
import type { GroupNorms } from '../norms/group-norms.ts';
import type { SmoothedCurve } from '../norms/group-smoothing.ts';
import type { NormProject } from '../norms/norm-project.ts';
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
const MOMENT_DECIMALS = 3;
/** Longer lists of scores are cut. */
const MOST_NAMED = 10;

/** The technical notes of a group, or null where it is not smoothed. */
export function fitNotesOf(project: NormProject, { smoothing, evidence }: GroupNorms): FitNotes | null {
  if (smoothing.state !== 'smoothed' || evidence === null) return null;
  const { curve } = smoothing;
  const words = wordsOf(project);
  const compared = curve.degrees.length > 0;
  return {
    degrees: compared ? degreeTable(curve, words) : null,
    moments: momentTable(curve, words),
    paragraphs: [
      ...(compared ? [{ lead: say(words, 'fit.degrees-lead'), text: aboutDegrees(curve, evidence, words) }] : []),
      {
        lead: say(words, 'fit.fit-lead'),
        text: [...fitSentences(curve, words), ...moveSentences(evidence, words)].join(' '),
      },
      ...warnings(evidence, project.people, words).map((text) => ({ lead: say(words, 'fit.beware-lead'), text })),
    ],
  };
}

function degreeTable({ degrees, degree }: SmoothedCurve, words: PrintWords): NoteTable {
  return {
    name: 'degrees',
    heads: [say(words, 'fit.degree'), 'G²', 'X²', say(words, 'fit.df'), 'AIC', 'BIC', 'p'],
    firstColumn: 'figures',
    rows: degrees.map((line) => ({
      cells: degreeCells(line).map((cell) => figure(words, cell)),
      marked: line.degree === degree,
    })),
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

function aboutDegrees({ degrees }: SmoothedCurve, { nearlyAsGood }: FitEvidence, words: PrintWords): string {
  return [
    say(words, 'fit.about-degrees'),
    ...(degrees.every(({ converged }) => converged) ? [] : [say(words, 'fit.none-found')]),
    ...(nearlyAsGood.length === 0
      ? []
      : [say(words, 'fit.nearly-as-good', { degrees: listed(words, nearlyAsGood.map(String)) })]),
  ].join(' ');
}

function momentTable({ momentsObserved, momentsFitted }: SmoothedCurve, words: PrintWords): NoteTable {
  const row = (name: string, key: keyof typeof momentsObserved): NoteTable['rows'][number] => ({
    cells: [
      name,
      ...[momentsObserved, momentsFitted].map((moments) => figure(words, printNumber(moments[key], MOMENT_DECIMALS))),
    ],
    marked: false,
  });
  return {
    name: 'moments',
    heads: [say(words, 'fit.moment'), say(words, 'fit.observed'), say(words, 'fit.smoothed')],
    firstColumn: 'words',
    rows: [
      row(say(words, 'fit.mean'), 'mean'),
      row(say(words, 'fit.sd'), 'sd'),
      row(say(words, 'fit.skewness'), 'skewness'),
      row(say(words, 'fit.excess-kurtosis'), 'excessKurtosis'),
    ],
  };
}

/** All the figures of a group's notes in sentences, the other degrees left out; empty where it is not smoothed. */
export function fitFacts(project: NormProject, { smoothing, evidence }: GroupNorms): string {
  if (smoothing.state !== 'smoothed' || evidence === null) return '';
  const { curve } = smoothing;
  const words = wordsOf(project);
  const { g2, x2, df, aic, bic } = curve;
  const figures = [
    ['G²', g2, misfit],
    ['X²', x2, misfit],
    [say(words, 'fit.df'), df, String],
    ['AIC', aic, misfit],
    ['BIC', bic, misfit],
  ] as const;
  const known = figures.flatMap(([name, value, print]) =>
    value === null ? [] : [`${name} ${figure(words, print(value))}`],
  );
  const moments = momentTable(curve, words).rows.map(({ cells: [moment = '', observed = '', smoothed = ''] }) =>
    say(words, 'fit.moment-pair', { moment, observed, smoothed }),
  );
  return [
    ...(known.length === 0 ? [] : [`${known.join(', ')}.`]),
    ...bandwidthSentence(curve, words),
    `${moments.join('; ')}.`,
    ...moveSentences(evidence, words),
    ...warnings(evidence, project.people, words),
  ].join(' ');
}

/** Fit and bandwidth, where no table of degrees tells it. */
function fitSentences(curve: SmoothedCurve, words: PrintWords): readonly string[] {
  const { degrees, g2, x2, df } = curve;
  const told = degrees.length > 0 || g2 === null || x2 === null || df === null;
  return [
    ...(told
      ? []
      : [
          say(words, 'fit.misfit', {
            g2: figure(words, misfit(g2)),
            x2: figure(words, misfit(x2)),
            df: String(df),
          }),
        ]),
    ...bandwidthSentence(curve, words),
  ];
}

function bandwidthSentence({ choice, bandwidth }: SmoothedCurve, words: PrintWords): readonly string[] {
  if (bandwidth === null) return [];
  return choice.kind === 'kernel' && choice.bandwidth === 'auto'
    ? [say(words, 'fit.bandwidth-found', { bandwidth: figure(words, printNumber(bandwidth, 4)) })]
    : [say(words, 'fit.bandwidth', { bandwidth: figure(words, String(bandwidth)) })];
}

/** What smoothing did to the printed table. */
function moveSentences({ largestMove, changed, of }: FitEvidence, words: PrintWords): readonly string[] {
  return [
    say(words, 'fit.largest-move', {
      points: figure(words, printNumber(largestMove.points, 2)),
      score: figure(words, largestMove.scoreText),
    }),
    say(words, 'fit.changed', { changed: String(changed), of: String(of) }),
  ];
}

function warnings(
  { filledGaps, inventedDips }: FitEvidence,
  noun: NormProject['people'],
  words: PrintWords,
): readonly string[] {
  const people = say(words, `people.${noun}`);
  return [
    ...(filledGaps.length === 0 ? [] : [say(words, 'fit.filled-gaps', { people, scores: named(filledGaps, words) })]),
    ...(inventedDips.length === 0 ? [] : [say(words, 'fit.invented-dips', { scores: named(inventedDips, words) })]),
  ];
}

/** "7, 9 and 12", or the first few and how many more there are. */
function named(scoreTexts: readonly string[], words: PrintWords): string {
  const scores = scoreTexts.map((score) => figure(words, score));
  const left = scores.length - MOST_NAMED;
  return listed(
    words,
    left > 1 ? [...scores.slice(0, MOST_NAMED), say(words, 'list.more', { count: String(left) })] : scores,
  );
}
