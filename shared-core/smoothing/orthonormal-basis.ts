/** A column after projection that is this small beside itself before has no direction of its own. */
const NO_DIRECTION = 1e-13;

/** A column and its product with the masses, cell by cell. */
interface Column {
  readonly values: Float64Array;
  readonly weighted: Float64Array;
}

function product(left: Float64Array, right: Float64Array): number {
  let sum = 0;
  for (let k = 0; k < left.length; k += 1) sum += (left[k] ?? 0) * (right[k] ?? 0);
  return sum;
}

/** target ← target + factor · column. */
export function addMultiple(target: Float64Array, factor: number, column: Float64Array): void {
  for (let k = 0; k < target.length; k += 1) target[k] = (target[k] ?? 0) + factor * (column[k] ?? 0);
}

/** Takes the parts along the given columns out of the values, one after the other (modified Gram–Schmidt). */
function clear(values: Float64Array, columns: readonly Column[]): void {
  for (let c = columns.length - 1; c >= 0; c -= 1) {
    const column = columns[c];
    if (column !== undefined) addMultiple(values, -product(column.weighted, values), column.values);
  }
}

function squareUnder(masses: Float64Array, values: Float64Array): number {
  let sum = 0;
  for (let k = 0; k < values.length; k += 1) sum += (masses[k] ?? 0) * (values[k] ?? 0) * (values[k] ?? 0);
  return sum;
}

/** The values scaled to length 1; null when next to nothing of the length before is left of them. */
function scaled(masses: Float64Array, values: Float64Array, before: number): Column | null {
  const squared = squareUnder(masses, values);
  if (!(squared > NO_DIRECTION * NO_DIRECTION * before) || !(squared < Infinity)) return null;
  const scale = 1 / Math.sqrt(squared);
  const weighted = new Float64Array(values.length);
  for (let k = 0; k < values.length; k += 1) {
    const value = (values[k] ?? 0) * scale;
    values[k] = value;
    weighted[k] = value * (masses[k] ?? 0);
  }
  return { values, weighted };
}

/**
 * Polynomials in the points of degree 0 to `degree`, and then the extra columns, orthonormal under the masses:
 * Σ m_k Q_c(x_k) Q_d(x_k) = 1 where c = d, else 0. Each polynomial is the points times the one before it, cleared of the
 * two before it (which would do in exact arithmetic) and then of all before it, so that the basis stays orthonormal to
 * rounding at every degree. Null when the masses carry fewer directions than are asked for. Masses are 0 or more and add
 * up to 1; a point without mass still gets the value of each polynomial there. The first column is the constant.
 */
export function orthonormalBasis(
  points: Float64Array,
  masses: Float64Array,
  degree: number,
  extras: readonly Float64Array[],
): readonly Float64Array[] | null {
  const constant = scaled(masses, new Float64Array(points.length).fill(1), 1);
  if (constant === null) return null;
  const columns = [constant];
  let last = constant;
  for (let c = 1; c <= degree; c += 1) {
    const values = new Float64Array(points.length);
    for (let k = 0; k < points.length; k += 1) values[k] = (points[k] ?? 0) * (last.values[k] ?? 0);
    const before = squareUnder(masses, values);
    clear(values, columns.slice(-2));
    clear(values, columns);
    const next = scaled(masses, values, before);
    if (next === null) return null;
    columns.push(next);
    last = next;
  }
  for (const extra of extras) {
    const values = extra.slice();
    clear(values, columns);
    clear(values, columns);
    const next = scaled(masses, values, squareUnder(masses, extra));
    if (next === null) return null;
    columns.push(next);
  }
  return columns.map(({ values }) => values);
}
