import { scaleProblems, type Direction, type ScoreScale } from '../../shared-core/scale/score-scale.ts';
import { listOf, numberIn, textGiven, WrongOption, type OptionValues } from './option-values.ts';

/** Columns of the file by the work they do; null where there is none. */
export interface NamedColumns {
  readonly score: string;
  readonly count: string | null;
  readonly weight: string | null;
  readonly id: string | null;
  readonly cluster: string | null;
  readonly by: readonly string[];
}

/** How a cohort file is read. */
export interface CohortOptions {
  readonly named: NamedColumns;
  /** Null: taken from the scores. */
  readonly scale: ScoreScale | null;
  readonly direction: Direction;
  readonly missing: readonly string[];
}

/** Throws `WrongOption`. */
export function cohortOptions(values: OptionValues): CohortOptions {
  const direction = values['low-is-good'] === true ? 'low-is-good' : 'high-is-good';
  const scale = textGiven(values, 'scale');
  return {
    named: namedColumns(values),
    scale: scale === null ? null : readScale(scale, direction),
    direction,
    missing: listOf('missing', textGiven(values, 'missing')).filter((text) => text !== ''),
  };
}

function namedColumns(values: OptionValues): NamedColumns {
  const score = textGiven(values, 'score');
  if (score === null) throw new WrongOption('Name the column of raw scores with --score COL.');
  const named = {
    score,
    count: textGiven(values, 'count'),
    weight: textGiven(values, 'weight'),
    id: textGiven(values, 'id'),
    cluster: textGiven(values, 'cluster'),
    by: listOf('by', textGiven(values, 'by')),
  };
  const all = [score, named.count, named.weight, named.id, named.cluster, ...named.by].filter((name) => name !== null);
  const twice = all.find((name, index) => all.indexOf(name) !== index);
  if (twice !== undefined) throw new WrongOption(`Column "${twice}" is given two kinds of work. Keep one of them.`);
  return named;
}

function readScale(text: string, direction: Direction): ScoreScale {
  const parts = text.split(':');
  const [min = null, max = null, step] = parts.map(numberIn);
  if (parts.length > 3 || min === null || max === null || step === null) {
    throw new WrongOption(`--scale is MIN:MAX or MIN:MAX:STEP, such as 0:40 or 0:20:0.5, not "${text}".`);
  }
  const scale = { min, max, step: step ?? 1, direction };
  const problems = scaleProblems(scale);
  if (problems.length > 0) throw new WrongOption(`--scale ${text}: ${problems.join(' ')}`);
  return scale;
}
