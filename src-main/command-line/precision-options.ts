import { replicatesProblem } from '../../shared-core/precision/bootstrap.ts';
import { levelProblem } from '../../shared-core/precision/confidence-level.ts';
import { reliabilityProblem } from '../../shared-core/precision/measurement-band.ts';
import { INTERVAL_METHODS, type IntervalMethod } from '../../shared-core/precision/proportion-interval.ts';
import { seedProblem } from '../../shared-core/precision/seeded-random.ts';
import { numberIn, oneOf, textGiven, WrongOption, type OptionValues } from './option-values.ts';

export interface BootstrapOptions {
  readonly replicates: number;
  readonly seed: number;
}

/** How the errors of ranks are told. */
export interface PrecisionOptions {
  /** Null where none was asked for by name: then a definition without intervals simply has none. */
  readonly interval: IntervalMethod | null;
  /** Per cent; null for the usual one. */
  readonly level: number | null;
  /** 0–1; null where it is not known. */
  readonly reliability: number | null;
  readonly bootstrap: BootstrapOptions | null;
}

/** Throws `WrongOption`; `usual` stands in for a level and a seed that are not given. */
export function precisionOptions(
  values: OptionValues,
  usual: { readonly level: number; readonly seed: number },
): PrecisionOptions {
  const interval = textGiven(values, 'interval');
  const level = numberGiven(values, 'level', levelProblem);
  return {
    interval: interval === null ? null : oneOf('interval', INTERVAL_METHODS, interval),
    level,
    reliability: numberGiven(values, 'reliability', reliabilityProblem),
    bootstrap: bootstrapOptions(values, level ?? usual.level, usual.seed),
  };
}

function bootstrapOptions(values: OptionValues, level: number, usualSeed: number): BootstrapOptions | null {
  const replicates = numberGiven(values, 'bootstrap', (number) => replicatesProblem(number, level));
  const seed = numberGiven(values, 'seed', seedProblem);
  if (replicates === null) {
    if (seed !== null) throw new WrongOption('--seed needs --bootstrap R, such as --bootstrap 1000.');
    return null;
  }
  return { replicates, seed: seed ?? usualSeed };
}

function numberGiven(
  values: OptionValues,
  option: string,
  problemOf: (number: number) => string | null,
): number | null {
  const text = textGiven(values, option);
  if (text === null) return null;
  const number = numberIn(text) ?? NaN;
  const problem = problemOf(number);
  if (problem !== null) throw new WrongOption(`--${option} ${text}: ${problem}`);
  return number;
}
