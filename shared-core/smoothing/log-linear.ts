import type { LogLinearDesign } from './log-linear-design.ts';
import { addMultiple, OrthonormalBasis, product } from './orthonormal-basis.ts';

/**
 * Largest score equation allowed, as a share of N, in the basis orthonormal under the fit. In a basis P_c orthonormal on
 * the bare grid, |Σ P_c(x_k)(f_k − m_k)| is then below 1e-10 · N: each P_c is a sum of the fit's columns whose squared
 * coefficients add up to at most 1.
 */
const SCORE_EQUATION = 2e-11;
/** Mostly 5 to 15 are needed; hundreds where a far end of the scale, without people, holds an even degree down. */
const MOST_STEPS = 2000;
const MOST_HALVINGS = 60;
/** Share of the gain that the slope promises which a step must bring. */
const LEAST_GAIN = 1e-4;
const ROUNDING = 1e-14;
/** Change of a log share at a last step that shows a curve still on its way to infinity. */
const STILL_MOVING = 1e-3;

/** A state of the fit: shares of the cells that are not kept, adding up to 1 (kept cells have share 0). */
export interface LogLinearFit {
  readonly converged: boolean;
  readonly steps: number;
  /** Natural logarithms of the shares, also where a share is too small for a number. */
  readonly logs: Float64Array;
  readonly shares: Float64Array;
}

interface State {
  readonly logs: Float64Array;
  readonly shares: Float64Array;
  /** −Σ f_k log q_k: half the deviance up to a constant. */
  readonly loss: number;
}

/**
 * Log-linear model log q_k = β_0 + Σ β_c P_c(x_k) of a degree (Holland & Thayer 1987, 2000; Rosenbaum & Thayer 1987) by
 * maximum likelihood. Newton's method in the polynomials orthonormal under the present shares, in which the matrix of
 * second derivatives is N times the identity; a step is halved until the deviance falls as its slope promises. Starts
 * from the given logarithms of shares (a fit of a lower degree; without one, a normal curve of the observed mean and
 * spread) and, when that does not get there, once more from equal shares. Kept cells take no part: an indicator fits its
 * own cell, and the rest is fitted by the rest.
 */
export function fitLogLinear(design: LogLinearDesign, degree: number, start: Float64Array | null): LogLinearFit {
  const warm = start ?? (degree >= 2 ? normalLogs(design) : null);
  if (warm !== null) {
    const fit = climb(design, degree, warm);
    if (fit.converged) return fit;
  }
  return climb(design, degree, new Float64Array(design.points.length));
}

/** Logarithms of a normal curve with the mean and spread of the people who are not in kept cells. */
function normalLogs({ points, frequencies, kept, freeTotal }: LogLinearDesign): Float64Array {
  let [mean, square] = [0, 0];
  points.forEach((point, k) => {
    const share = kept[k] === true ? 0 : (frequencies[k] ?? 0) / freeTotal;
    mean += share * point;
    square += share * point * point;
  });
  // A spread of at least a step, so that people on one score alone do not make a needle of it.
  const variance = Math.max(square - mean * mean, 4 / points.length ** 2);
  return points.map((point) => (-0.5 * (point - mean) ** 2) / variance);
}

function climb(design: LogLinearDesign, degree: number, start: Float64Array): LogLinearFit {
  const extras = design.comb === null ? [] : [design.comb];
  const basis = new OrthonormalBasis(design.points, degree, extras);
  const move = new Float64Array(design.points.length);
  const gaps = new Float64Array(design.points.length);
  let state = stateOf(design, start.slice());
  for (let steps = 1; steps <= MOST_STEPS; steps += 1) {
    if (!basis.renew(state.shares)) return { ...state, converged: false, steps };
    fillGaps(gaps, design, state.shares);
    // Σ Q_c(x_k)(f_k − m_k) / N; the constant's holds by itself.
    const equations = basis.columns.map((column, c) => (c === 0 ? 0 : product(column, gaps)));
    move.fill(0);
    equations.forEach((equation, c) => {
      const column = basis.columns[c];
      if (column !== undefined) addMultiple(move, equation, column);
    });
    const next = stepFrom(design, state, move, design.freeTotal * equations.reduce((sum, e) => sum + e * e, 0));
    if (equations.every((equation) => Math.abs(equation) < SCORE_EQUATION)) {
      return { ...(next ?? state), converged: design.comb === null || standsStill(design, move), steps };
    }
    if (next === null) return { ...state, converged: false, steps };
    state = next;
  }
  return { ...state, converged: false, steps: MOST_STEPS };
}

/** (f_k − m_k) / N, 0 in kept cells. */
function fillGaps(gaps: Float64Array, { frequencies, kept, freeTotal }: LogLinearDesign, shares: Float64Array): void {
  for (let k = 0; k < gaps.length; k += 1) {
    gaps[k] = kept[k] === true ? 0 : (frequencies[k] ?? 0) / freeTotal - (shares[k] ?? 0);
  }
}

function stepFrom(design: LogLinearDesign, state: State, move: Float64Array, slope: number): State | null {
  const slack = ROUNDING * (design.freeTotal + Math.abs(state.loss));
  let length = 1;
  for (let halving = 0; halving <= MOST_HALVINGS; halving += 1) {
    const logs = state.logs.slice();
    addMultiple(logs, length, move);
    const next = stateOf(design, logs);
    if (next.loss <= state.loss - LEAST_GAIN * length * slope + slack) return next;
    length /= 2;
  }
  return null;
}

/** The state of unscaled logarithms, which are scaled in place. */
function stateOf(design: LogLinearDesign, logs: Float64Array): State {
  const { frequencies, kept } = design;
  let highest = -Infinity;
  for (let k = 0; k < logs.length; k += 1) if (kept[k] === false) highest = Math.max(highest, logs[k] ?? 0);
  const shares = new Float64Array(logs.length);
  let sum = 0;
  for (let k = 0; k < logs.length; k += 1) {
    if (kept[k] === true) continue;
    const share = Math.exp((logs[k] ?? 0) - highest);
    shares[k] = share;
    sum += share;
  }
  const shift = highest + Math.log(sum);
  let loss = 0;
  for (let k = 0; k < logs.length; k += 1) {
    const log = (logs[k] ?? 0) - shift;
    logs[k] = log;
    shares[k] = (shares[k] ?? 0) / sum;
    const frequency = frequencies[k] ?? 0;
    if (frequency > 0 && kept[k] === false) loss -= frequency * log;
  }
  return { logs, shares, loss };
}

/** False when a last step still moves the curve within the range of the observed scores: there is no maximum. */
function standsStill(design: LogLinearDesign, move: Float64Array): boolean {
  const first = design.frequencies.findIndex((frequency) => frequency > 0);
  const last = design.frequencies.findLastIndex((frequency) => frequency > 0);
  return move.slice(Math.max(0, first - 1), last + 2).every((change) => Math.abs(change) < STILL_MOVING);
}

/** Probabilities of the whole grid: kept cells at their observed shares, the others share the rest. */
export function probabilitiesOf(design: LogLinearDesign, fit: LogLinearFit): readonly number[] {
  const free = design.freeTotal / design.total;
  return design.observed.map((frequency, k) =>
    design.kept[k] === true ? frequency / design.total : (fit.shares[k] ?? 0) * free,
  );
}
