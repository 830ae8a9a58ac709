/** A column after projection that is this small beside itself before has no direction of its own. */
const NO_DIRECTION = 1e-13;

export function product(left: Float64Array, right: Float64Array): number {
  let sum = 0;
  for (let k = 0; k < left.length; k += 1) sum += (left[k] ?? 0) * (right[k] ?? 0);
  return sum;
}

/** target ← target + factor · column. */
export function addMultiple(target: Float64Array, factor: number, column: Float64Array): void {
  for (let k = 0; k < target.length; k += 1) target[k] = (target[k] ?? 0) + factor * (column[k] ?? 0);
}

function squareUnder(masses: Float64Array, values: Float64Array): number {
  let sum = 0;
  for (let k = 0; k < values.length; k += 1) {
    const value = values[k] ?? 0;
    sum += (masses[k] ?? 0) * value * value;
  }
  return sum;
}

/**
 * Polynomials in the points of degree 0 to `degree`, and then the extra columns, orthonormal under masses that change:
 * Σ m_k Q_c(x_k) Q_d(x_k) = 1 where c = d, else 0. The first column is the constant. The columns are made anew in the
 * same memory each time, since a fit makes a dozen bases and its memory would cost more than its arithmetic.
 */
export class OrthonormalBasis {
  readonly columns: readonly Float64Array[];
  /** Each column's product with the masses, cell by cell. */
  readonly weighted: readonly Float64Array[];

  constructor(
    private readonly points: Float64Array,
    private readonly degree: number,
    private readonly extras: readonly Float64Array[],
  ) {
    const { length } = points;
    const count = degree + 1 + extras.length;
    const room = new Float64Array(2 * count * length);
    const place = (at: number): Float64Array => room.subarray(at * length, (at + 1) * length);
    this.columns = Array.from({ length: count }, (_, c) => place(c));
    this.weighted = Array.from({ length: count }, (_, c) => place(count + c));
  }

  /**
   * Makes the columns orthonormal under masses of 0 or more that add up to 1. Each polynomial is the points times the one
   * before it, cleared of all before it (modified Gram–Schmidt) and once more of the two nearest, the only ones that it
   * meets in exact arithmetic; an extra column is cleared of all twice. The basis stays orthonormal to rounding at every degree. A point
   * without mass still gets the value of each polynomial there. False when the masses carry fewer directions.
   */
  renew(masses: Float64Array): boolean {
    const { points, columns, degree, extras } = this;
    for (let c = 0; c < columns.length; c += 1) {
      const values = columns[c];
      const before = columns[c - 1];
      const extra = extras[c - degree - 1];
      if (values === undefined) return false;
      if (extra !== undefined) values.set(extra);
      else if (before === undefined) values.fill(1);
      else for (let k = 0; k < values.length; k += 1) values[k] = (points[k] ?? 0) * (before[k] ?? 0);
      const length = squareUnder(masses, values);
      this.clear(values, c - 1, 0);
      this.clear(values, c - 1, extra === undefined ? Math.max(0, c - 2) : 0);
      if (!this.scale(values, c, masses, length)) return false;
    }
    return true;
  }

  /** Takes the parts along the columns `from` down to `to` out of the values, one after the other. */
  private clear(values: Float64Array, from: number, to: number): void {
    for (let c = from; c >= to; c -= 1) {
      const column = this.columns[c];
      const weighted = this.weighted[c];
      if (column !== undefined && weighted !== undefined) addMultiple(values, -product(weighted, values), column);
    }
  }

  /** Scales a column to length 1; false when next to nothing of its length before is left. */
  private scale(values: Float64Array, c: number, masses: Float64Array, before: number): boolean {
    const squared = squareUnder(masses, values);
    const weighted = this.weighted[c];
    if (weighted === undefined || !(squared > NO_DIRECTION * NO_DIRECTION * before && squared < Infinity)) return false;
    const factor = 1 / Math.sqrt(squared);
    for (let k = 0; k < values.length; k += 1) {
      const value = (values[k] ?? 0) * factor;
      values[k] = value;
      weighted[k] = value * (masses[k] ?? 0);
    }
    return true;
  }
}
