import type { GroupNorms } from '../../shared-core/norms/group-norms.ts';
import type { SmoothedCurve } from '../../shared-core/norms/group-smoothing.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import { parseOffset, scoresPerClass, type RankDefinition } from '../../shared-core/percentile/percentile-rank.ts';
import { powerOfTen } from '../../shared-core/scale/decimal.ts';
import type { ExactRatio } from '../../shared-core/percentile/exact-ratio.ts';

/** Columns that a sheet of workings can have. */
export type WorkingsKey =
  | 'score'
  | 'count'
  | 'weight'
  | 'share'
  | 'curve-low'
  | 'curve-middle'
  | 'curve-high'
  | 'below'
  | 'up-to'
  | 'class-below'
  | 'in-class'
  | 'place'
  | 'numerator'
  | 'rank'
  | 'rest'
  | 'whole'
  | 'rounded'
  | 'printed'
  | 'table'
  | 'same';

/** Numbers of the whole group, each in a cell of its own above the table. */
export type FactKey =
  'people' | 'weight-sum' | 'offset-top' | 'offset-bottom' | 'class-size' | 'divisor' | 'steps' | 'highest';

/**
 * What ranks are made from: whole counts or weights; shares of a smoothed distribution that add up to its cumulative
 * ones; a smoothed curve read off half a step below, at and half a step above each score; or, where whole numbers grow
 * beyond what spreadsheet programs carry, nothing: ranks are then values.
 */
export type WorkingsRoute = 'counts' | 'shares' | 'curve' | 'values';

/** Everything that decides which formulas a sheet of workings has. */
export interface WorkingsPlan {
  readonly project: NormProject;
  readonly norms: GroupNorms;
  readonly route: WorkingsRoute;
  readonly definition: RankDefinition;
  /** Whether the poor end of the scale is its low one. */
  readonly good: boolean;
  readonly weighted: boolean;
  /** Null where the group is not smoothed. */
  readonly curve: SmoothedCurve | null;
  /** Of a plotting position, otherwise null. */
  readonly offset: ExactRatio | null;
  /** Attainable scores in a class of a grouped definition, otherwise null. */
  readonly perClass: number | null;
  /** Printed steps in a point: 1, or 10 with one decimal. */
  readonly steps: number;
  /** What the numerators are divided by: each rank is numerator / divisor steps. */
  readonly divisor: bigint;
  readonly keys: readonly WorkingsKey[];
  readonly facts: readonly FactKey[];
}

/** Spreadsheet programs compare and subtract on 15 decimal digits; whole numbers up to this are safe in all of them. */
const LARGEST_NUMERATOR = 10n ** 14n;
/** Smoothed ranks are held to so many parts of a point. */
const PARTS_OF_A_POINT = 10n ** 9n;
/** How far sums of shares may lie from the curve, in shares, before the curve is no sum of them. */
const SUM_TOLERANCE = 1e-12;

const PRINTING: readonly WorkingsKey[] = ['rank', 'rest', 'whole', 'rounded', 'printed', 'table', 'same'];
const TAKEN_OVER: readonly WorkingsKey[] = ['rank', 'printed', 'table', 'same'];

/** Chooses columns and facts for a group. Throws on a definition that cannot be used on the scale. */
export function workingsPlan(project: NormProject, norms: GroupNorms): WorkingsPlan {
  const { definition } = project.curve;
  const { table } = norms.group;
  const curve = norms.smoothing.state === 'smoothed' ? norms.smoothing.curve : null;
  const offset = definition.kind === 'plotting-position' ? parseOffset(definition.offset) : null;
  const perClass = definition.kind === 'grouped' ? scoresPerClass(table.scale, definition.width) : null;
  const steps = 10 ** project.table.decimals;
  const { weighted } = table;
  const divisor = curve === null ? divisorOf(norms, definition, offset, perClass) : PARTS_OF_A_POINT;
  const tooLarge = 100n * powerOfTen(project.table.decimals) * divisor > LARGEST_NUMERATOR;
  const route = tooLarge ? 'values' : curve === null ? 'counts' : addsUp(curve) ? 'shares' : 'curve';
  const weights: readonly WorkingsKey[] = weighted && curve === null ? ['weight'] : [];
  const classes: readonly WorkingsKey[] =
    perClass === null ? [] : route === 'counts' ? ['class-below', 'in-class', 'place'] : ['place'];
  return {
    project,
    norms,
    route,
    definition,
    good: table.scale.direction === 'high-is-good',
    weighted,
    curve,
    offset,
    perClass,
    steps,
    divisor,
    keys: ['score', 'count', ...weights, ...keysOf(route, classes)],
    facts: factsOf(route, weighted && curve === null, offset !== null, perClass !== null),
  };
}

function keysOf(route: WorkingsRoute, classes: readonly WorkingsKey[]): readonly WorkingsKey[] {
  switch (route) {
    case 'counts':
      return ['below', 'up-to', ...classes, 'numerator', ...PRINTING];
    case 'shares':
      return ['share', 'below', 'up-to', ...classes, 'numerator', ...PRINTING];
    case 'curve':
      return ['curve-low', 'curve-middle', 'curve-high', ...classes, 'numerator', ...PRINTING];
    case 'values':
      return TAKEN_OVER;
  }
}

function factsOf(route: WorkingsRoute, weights: boolean, offset: boolean, classes: boolean): readonly FactKey[] {
  if (route === 'values') return ['people'];
  return [
    'people',
    ...(weights ? (['weight-sum'] as const) : []),
    ...(offset ? (['offset-top', 'offset-bottom'] as const) : []),
    ...(classes ? (['class-size'] as const) : []),
    'divisor',
    'steps',
    'highest',
  ];
}

/** The divisor of the exact ranks; people cancel out of plotting positions without weights. */
function divisorOf(
  { summary, rows, group }: GroupNorms,
  definition: RankDefinition,
  offset: ExactRatio | null,
  perClass: number | null,
): bigint {
  const all = rows[0]?.parts.all ?? 0n;
  switch (definition.kind) {
    case 'midpoint':
      return 2n * all;
    case 'at-or-below':
    case 'below':
      return all;
    case 'plotting-position': {
      if (offset === null) throw new RangeError('unusable offset');
      const positions = (BigInt(summary.n) + 1n) * offset.denominator - 2n * offset.numerator;
      return 2n * (group.table.weighted ? all : 1n) * positions;
    }
    case 'grouped':
      if (perClass === null) throw new RangeError('unusable width');
      return 2n * BigInt(perClass) * all;
  }
}

/** Whether the cumulative shares are sums of the shares, a score's own counted half at it: not so for a kernel. */
function addsUp({ probabilities, below, middle, atOrBelow }: SmoothedCurve): boolean {
  let sum = 0;
  return probabilities.every((share, position) => {
    const lists = [
      [below, sum],
      [middle, sum + share / 2],
      [atOrBelow, sum + share],
    ] as const;
    sum += share;
    return lists.every(([list, expected]) => Math.abs((list[position] ?? NaN) - expected) < SUM_TOLERANCE);
  });
}
