/** A quarter of the norm group by printed rank. */
export type Quarter = 1 | 2 | 3 | 4;

export interface QuarterCount {
  readonly quarter: Quarter;
  /** "1–24". */
  readonly ranks: string;
  /** Pupils of the class. */
  readonly count: number;
}

/** The quarters lowest first, with the printed ranks that begin and end them. */
const QUARTERS = [
  { quarter: 1, from: 1, to: 24 },
  { quarter: 2, from: 25, to: 49 },
  { quarter: 3, from: 50, to: 74 },
  { quarter: 4, from: 75, to: 99 },
] as const;

/**
 * The quarter of a rank as it is printed, so that a reader can count again: "<1" belongs to the lowest, ">99" to the
 * highest, and 24.9 to the quarter that begins at 1. Throws on a text that is no printed rank.
 */
export function quarterOf(printed: string): Quarter {
  const found = /^([<>]?)(\d+(?:\.\d+)?)\u2020?$/.exec(printed);
  if (found === null) throw new RangeError(`not a printed percentile rank: ${printed}`);
  if (found[1] === '<') return 1;
  if (found[1] === '>') return 4;
  const rank = Number(found[2]);
  return QUARTERS.findLast(({ from }) => rank >= from)?.quarter ?? 1;
}

/** How many printed ranks lie in each quarter; always four, lowest first. */
export function quarterCounts(printed: readonly string[]): readonly QuarterCount[] {
  const quarters = printed.map(quarterOf);
  return QUARTERS.map(({ quarter, from, to }) => ({
    quarter,
    ranks: `${from}\u2013${to}`,
    count: quarters.filter((one) => one === quarter).length,
  }));
}
