/** A page as it should be beside the one that was found in its place; null where one of them is missing. */
export interface PagePair {
  readonly expected: number | null;
  readonly found: number | null;
}

/**
 * Pages in order, paired so that as many as possible say the same: those of equal texts first, and between them the
 * others one by one. As many pages as there should be are paired by their places.
 */
export function pairedPages(expected: readonly string[], found: readonly string[]): readonly PagePair[] {
  if (expected.length === found.length) return expected.map((_, page) => ({ expected: page, found: page }));
  const longest = longestCommon(expected, found);
  const pairs: PagePair[] = [];
  let [left, right] = [0, 0];
  while (left < expected.length || right < found.length) {
    const same = expected[left] === found[right] && left < expected.length && right < found.length;
    const here = longest(left, right);
    if (same || here === longest(left + 1, right + 1)) {
      pairs.push({ expected: left < expected.length ? left : null, found: right < found.length ? right : null });
      [left, right] = [left + 1, right + 1];
    } else if (here === longest(left + 1, right)) {
      pairs.push({ expected: left, found: null });
      left += 1;
    } else {
      pairs.push({ expected: null, found: right });
      right += 1;
    }
  }
  return pairs;
}

/** How many pages from two places on can be paired with equal ones, in order. */
function longestCommon(expected: readonly string[], found: readonly string[]): (left: number, right: number) => number {
  const table = Array.from({ length: expected.length + 1 }, () => new Array<number>(found.length + 1).fill(0));
  const at = (left: number, right: number): number => table[left]?.[right] ?? 0;
  for (let left = expected.length - 1; left >= 0; left -= 1) {
    for (let right = found.length - 1; right >= 0; right -= 1) {
      const row = table[left];
      if (row === undefined) continue;
      row[right] =
        expected[left] === found[right]
          ? at(left + 1, right + 1) + 1
          : Math.max(at(left + 1, right), at(left, right + 1));
    }
  }
  return at;
}
