import { expect } from 'vitest';

/** Differences allowed for counts, ranks, quantiles and moments. */
export const EXACT = 1e-9;
/** Differences allowed for what passes through a normal quantile. */
export const NORMAL = 1e-8;

/** Fails unless two numbers differ by at most the tolerance. */
export function expectNear(actual: number | null, expected: number, tolerance: number, what: string): void {
  if (actual === null) throw new Error(`${what}: nothing, not ${expected}`);
  const difference = Math.abs(actual - expected);
  expect(difference <= tolerance, `${what}: ${actual}, not ${expected}`).toBe(true);
}

/** The same for two lists of one length. */
export function expectAllNear(
  actual: readonly (number | null)[],
  expected: readonly number[],
  tolerance: number,
  what: string,
): void {
  expect(actual.length, `${what}: how many`).toBe(expected.length);
  expected.forEach((value, index) => expectNear(actual[index] ?? null, value, tolerance, `${what} [${index}]`));
}
