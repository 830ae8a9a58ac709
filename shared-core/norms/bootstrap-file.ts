import type { Bootstrapped } from '../precision/bootstrap.ts';

/** A group's bootstrap with the seed that draws it again. */
export interface GroupBootstrap {
  readonly seed: number;
  readonly bootstrapped: Bootstrapped;
}

/** What was drawn and fitted, as files tell it. */
export function bootstrapForFile({ seed, bootstrapped }: GroupBootstrap): unknown {
  const { drawn, fitted, failures, degrees, people } = bootstrapped;
  return { replicates: drawn, seed, fitted, failures, degrees, people };
}

/** The replicates' interval and standard error of one score, 0–100; ends are null where too few could be fitted. */
export function rowBootstrapForFile({ bootstrapped }: GroupBootstrap, position: number): unknown {
  const interval = bootstrapped.intervals?.[position] ?? null;
  return {
    low: interval?.low ?? null,
    high: interval?.high ?? null,
    'standard-error': bootstrapped.standardErrors[position] ?? null,
  };
}
