import { describe, expect, it } from 'vitest';
import { OrthonormalBasis } from '../../../shared-core/smoothing/orthonormal-basis.ts';
import { expectNear } from '../../reference/near.ts';

/** The columns, or null where the masses do not carry them. */
function basisOf(
  masses: Float64Array,
  degree: number,
  extras: readonly Float64Array[],
): readonly Float64Array[] | null {
  const basis = new OrthonormalBasis(points(masses.length), degree, extras);
  return basis.renew(masses) ? basis.columns : null;
}

const points = (cells: number): Float64Array =>
  Float64Array.from({ length: cells }, (_, k) => (2 * k - cells + 1) / (cells - 1));

const equal = (cells: number): Float64Array => new Float64Array(cells).fill(1 / cells);

/** A narrow normal curve off the middle, with masses far below what a double can add to 1. */
const narrow = (cells: number): Float64Array => {
  const raised = points(cells).map((x) => Math.exp(-0.5 * ((x - 0.3) / 0.04) ** 2));
  const sum = raised.reduce((total, mass) => total + mass, 0);
  return raised.map((mass) => mass / sum);
};

describe('the orthonormal basis', () => {
  it.each([
    ['11 equal masses', equal(11)],
    ['301 equal masses', equal(301)],
    ['301 masses on a narrow curve', narrow(301)],
    ['5001 equal masses', equal(5001)],
  ])('is orthonormal to rounding under %s', (_, masses) => {
    const basis = basisOf(masses, 10, []);
    expect(basis?.length).toBe(11);
    basis?.forEach((left, c) => {
      basis.forEach((right, d) => {
        const product = masses.reduce((sum, mass, k) => sum + mass * (left[k] ?? NaN) * (right[k] ?? NaN), 0);
        expectNear(product, c === d ? 1 : 0, 1e-13, `${c} with ${d}`);
      });
    });
  });

  it('has Legendre polynomials for its limit', () => {
    const cells = 5001;
    const basis = basisOf(equal(cells), 2, []);
    expectNear(basis?.[1]?.at(-1) ?? null, Math.sqrt(3), 1e-3, 'first degree at 1');
    expectNear(basis?.[2]?.at(-1) ?? null, Math.sqrt(5), 3e-3, 'second degree at 1');
  });

  it('is refused where the masses have no more directions', () => {
    const masses = new Float64Array(9);
    masses.set([0.5, 0.25, 0.25], 3);
    expect(basisOf(masses, 2, [])?.length).toBe(3);
    expect(basisOf(masses, 3, [])).toBeNull();
    expect(basisOf(masses, 1, [new Float64Array(9).fill(2)])).toBeNull();
  });
});
