import type { NormProject, TableChoices } from '../../../shared-core/norms/norm-project.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import type { Direction } from '../../../shared-core/scale/score-scale.ts';
import type { RankDefinition } from '../../../shared-core/percentile/percentile-rank.ts';
import { KERNEL, LOG_LINEAR, sampleNormSet, WHOLE_SCALE } from '../../shared-core/pages/sample-norm-set.ts';

export interface WorkbookCase {
  readonly name: string;
  readonly set: NormSet;
}

type Print = Pick<TableChoices, 'decimals' | 'rounding' | 'ends'>;

const HALVES = { scale: { min: -2, max: 20, step: 0.5 } } as const;
const DEFINITIONS: readonly RankDefinition[] = [
  { kind: 'midpoint' },
  { kind: 'at-or-below' },
  { kind: 'below' },
  { kind: 'plotting-position', offset: '3/8' },
  { kind: 'plotting-position', offset: '0.9' },
  { kind: 'grouped', width: 3 },
];
const PRINTS: readonly Print[] = [
  { decimals: 0, rounding: 'half-up', ends: 'signs' },
  { decimals: 0, rounding: 'half-even', ends: 'held' },
  { decimals: 1, rounding: 'half-even', ends: 'signs' },
  { decimals: 1, rounding: 'half-up', ends: 'held' },
];

function printAt(place: number): Print {
  const print = PRINTS[place % PRINTS.length];
  if (print === undefined) throw new Error('no print');
  return print;
}

function chosen(definition: RankDefinition, print: Print, also: Partial<NormProject['curve']> = {}) {
  return (project: NormProject): NormProject => ({
    ...project,
    curve: { ...project.curve, definition, ...also },
    table: { ...project.table, ...print },
  });
}

/** Counts that put many ranks of each definition exactly on a half, with a group of 8 and one of 40 people. */
function onHalves(definition: RankDefinition, print: Print, direction: Direction): NormSet {
  const cohort = { scale: { min: 0, max: 9, step: 1 }, direction };
  return sampleNormSet(cohort, (project) => {
    const changed = chosen(definition, print)(project);
    if (changed.tally === null) throw new Error('no tally');
    const counts = [
      [1, 0, 1, 1, 2, 1, 0, 1, 1, 0],
      [0, 1, 3, 5, 7, 9, 7, 5, 2, 1],
    ];
    const cells = changed.tally.cells.map((cell, index) => ({ ...cell, counts: counts[index] ?? [] }));
    return { ...changed, tally: { ...changed.tally, cells } };
  });
}

/** Each definition with every print, in both directions, with and without weights and smoothing. */
export const WORKBOOK_CASES: readonly WorkbookCase[] = DEFINITIONS.flatMap((definition, index) => {
  const print = (shift: number): Print => printAt(index + shift);
  const words = `${definition.kind} ${index}`;
  const smoothings = {
    smoothing: LOG_LINEAR,
    exceptions: [
      { values: ['5'], smoothing: { kind: 'none' } },
      { values: ['6'], smoothing: KERNEL },
    ],
  } as const;
  const three = { scale: WHOLE_SCALE, groups: ['4', '5', '6'] } as const;
  return [
    ...PRINTS.map((each, place) => {
      const direction = (index + place) % 2 === 0 ? 'high-is-good' : 'low-is-good';
      return { name: `${words}, halves, print ${place}, ${direction}`, set: onHalves(definition, each, direction) };
    }),
    { name: `${words}, steps of a half`, set: sampleNormSet(HALVES, chosen(definition, print(0))) },
    {
      name: `${words}, low is good`,
      set: sampleNormSet({ ...HALVES, direction: 'low-is-good' }, chosen(definition, print(1))),
    },
    {
      name: `${words}, weighted`,
      set: sampleNormSet(
        { scale: WHOLE_SCALE, weighted: true, direction: index % 2 === 0 ? 'high-is-good' : 'low-is-good' },
        chosen(definition, print(2)),
      ),
    },
    { name: `${words}, smoothed`, set: sampleNormSet(three, chosen(definition, print(0), smoothings)) },
    {
      name: `${words}, smoothed, low is good`,
      set: sampleNormSet({ ...three, direction: 'low-is-good' }, chosen(definition, print(2), smoothings)),
    },
    {
      name: `${words}, smoothed, weighted`,
      set: sampleNormSet({ ...three, weighted: true }, chosen(definition, print(3), smoothings)),
    },
  ];
});

/** Weights with so many decimals that their sums pass 15 digits. */
export const FINE_WEIGHTS: NormSet = sampleNormSet({ scale: WHOLE_SCALE, weighted: true }, (project) => {
  if (project.tally === null) throw new Error('no tally');
  const cells = project.tally.cells.map((cell) => ({
    ...cell,
    weights: cell.weights?.map((units) => `${units}${'0'.repeat(12)}`) ?? null,
    squares: cell.squares?.map((units) => `${units}${'0'.repeat(24)}`) ?? null,
  }));
  return { ...project, tally: { ...project.tally, weightDecimals: 14, cells } };
});
