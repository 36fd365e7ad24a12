/**
 * The hinge simplex: minimise c·s over rows A s ≥ b in three to five unknowns, by exchanging one row of the basis for
 * the row that the present answer violates most. It reads as the classical hand method: move the hinge to the joint
 * where the line leaves the ring furthest. The cost of an exchange is one pass over the rows.
 *
 * A dual simplex with a lexicographic ratio test, which cannot cycle on ties (Dantzig, Orden & Wolfe 1955; the dual
 * form is standard). On leaving, s is the static answer and the multipliers y ≥ 0 with Aᵀy = c are the kinematic one;
 * when no row can leave, the multipliers are a mechanism under which the loads do positive work (Farkas).
 *
 * Figures are expected to be of order one: lengths over the span, forces over the total weight.
 */

import { invert, refine } from './small-matrix.ts';

/** Rows a·s ≥ b, stored one after the other. */
export interface Rows {
  readonly unknowns: number;
  readonly count: number;
  /** count × unknowns. */
  readonly a: Float64Array;
  readonly b: Float64Array;
}

/** A row of the basis and its multiplier. */
export interface Multiplier {
  readonly row: number;
  readonly y: number;
}

export type SimplexOutcome =
  | {
      readonly kind: 'optimal';
      readonly s: Float64Array;
      readonly value: number;
      readonly basis: readonly Multiplier[];
    }
  /** The value has no bound, or none within the box. */
  | { readonly kind: 'unbounded' }
  /** Σ y a = 0 with Σ y b > 0: no s obeys these rows together. */
  | { readonly kind: 'infeasible'; readonly certificate: readonly Multiplier[] };

/**
 * A row counts as violated beyond this, on figures of order one: some thousand roundings (2⁻⁵³ each) of the sums along
 * a ring, and far below the six figures that any survey can give.
 */
const VIOLATION = 1e-12;
/** Multipliers below this share of the largest are ties. */
const TIE = 1e-11;
/** Half-width of the box from which the search starts, in the unknowns' own scale; widened once if it binds. */
const BOXES = [1e5, 1e9];
/** Exchanges after which rounding, not the method, must be at fault. */
const MOST_EXCHANGES = 20_000;

/** The rows were too ill-conditioned to be decided; never seen on a ring, but named so that it can never pass as an answer. */
export class UndecidedError extends Error {
  override readonly name = 'UndecidedError';
}

/**
 * @param start rows of a basis to begin from, such as that of a neighbouring question; used where its multipliers are
 * still positive, and otherwise passed over without a word.
 */
export function minimise(rows: Rows, c: readonly number[], start?: readonly Multiplier[]): SimplexOutcome {
  let outcome: SimplexOutcome = { kind: 'unbounded' };
  for (const box of BOXES) {
    const { answer, touchesBox } = search(rows, c, box, start);
    outcome = answer;
    if (!touchesBox) return answer;
  }
  return outcome;
}

function search(
  rows: Rows,
  c: readonly number[],
  box: number,
  start?: readonly Multiplier[],
): { answer: SimplexOutcome; touchesBox: boolean } {
  const d = rows.unknowns;
  const { basis, matrix, right, inverse, s, y, w } = deskFor(d);
  for (let i = 0; i < d; i++) {
    basis[i] = -1 - i;
    matrix[i * d + i] = (c[i] as number) < 0 ? -1 : 1;
    right[i] = -box;
  }
  if (start?.length === d) beginFrom(start, rows, c, { basis, matrix, right, inverse });
  for (let exchange = 0; exchange < MOST_EXCHANGES; exchange++) {
    if (!invert(matrix, inverse, d)) throw new UndecidedError('two hinges of the search fell together');
    for (let i = 0; i < d; i++) {
      let si = 0;
      let yi = 0;
      for (let k = 0; k < d; k++) {
        si += (inverse[i * d + k] as number) * (right[k] as number);
        yi += (c[k] as number) * (inverse[k * d + i] as number);
      }
      s[i] = si;
      y[i] = yi;
    }
    const entering = mostViolated(rows, s);
    // a row of the basis holds exactly but for rounding; when it is the worst, nothing is left to exchange
    if (entering < 0 || basis.includes(entering)) return settled(rows, basis, matrix, right, inverse, s, y, c);
    let largest = 0;
    for (let i = 0; i < d; i++) {
      let wi = 0;
      for (let k = 0; k < d; k++) wi += (rows.a[entering * d + k] as number) * (inverse[k * d + i] as number);
      w[i] = wi;
      largest = Math.max(largest, Math.abs(wi));
    }
    const leaving = rowToLeave(w, y, inverse, d, largest * TIE);
    if (leaving < 0) return noneLeaves(basis, w, entering, largest);
    basis[leaving] = entering;
    for (let k = 0; k < d; k++) matrix[leaving * d + k] = rows.a[entering * d + k] as number;
    right[leaving] = rows.b[entering] as number;
  }
  throw new UndecidedError('the hinge search did not settle');
}

/** Where one search writes: kept from one to the next, since a drag makes some fifty of them a frame. */
interface Desk {
  /** 0 … count − 1 are rows, −1 − i is the side of the box that bounds unknown i. */
  readonly basis: Int32Array;
  readonly matrix: Float64Array;
  readonly right: Float64Array;
  readonly inverse: Float64Array;
  readonly s: Float64Array;
  readonly y: Float64Array;
  readonly w: Float64Array;
}

const DESKS = new Map<number, Desk>();

function deskFor(d: number): Desk {
  let desk = DESKS.get(d);
  if (desk === undefined) {
    const vector = (): Float64Array => new Float64Array(d);
    const square = (): Float64Array => new Float64Array(d * d);
    desk = {
      basis: new Int32Array(d),
      matrix: square(),
      right: vector(),
      inverse: square(),
      s: vector(),
      y: vector(),
      w: vector(),
    };
    DESKS.set(d, desk);
  }
  desk.matrix.fill(0);
  return desk;
}

/** A starting basis whose multipliers fall below this share of the largest is not trusted. */
const CLEARLY_POSITIVE = 1e-7;

/** Puts the rows of `start` into the basis if they are independent and their multipliers clearly positive. */
function beginFrom(
  start: readonly Multiplier[],
  rows: Rows,
  c: readonly number[],
  to: { basis: Int32Array; matrix: Float64Array; right: Float64Array; inverse: Float64Array },
): void {
  const d = rows.unknowns;
  const trial = new Float64Array(d * d);
  for (let i = 0; i < d; i++) {
    const { row } = start[i] as Multiplier;
    if (row >= rows.count) return;
    for (let k = 0; k < d; k++) trial[i * d + k] = rows.a[row * d + k] as number;
  }
  if (!invert(trial, to.inverse, d)) return;
  let least = Infinity;
  let largest = 0;
  for (let i = 0; i < d; i++) {
    let y = 0;
    for (let k = 0; k < d; k++) y += (c[k] as number) * (to.inverse[k * d + i] as number);
    least = Math.min(least, y);
    largest = Math.max(largest, y);
  }
  if (!(least > CLEARLY_POSITIVE * largest)) return;
  to.matrix.set(trial);
  start.forEach(({ row }, i) => {
    to.basis[i] = row;
    to.right[i] = rows.b[row] as number;
  });
}

/** The row that s violates most, or −1. */
function mostViolated(rows: Rows, s: Float64Array): number {
  const { a, b, count, unknowns: d } = rows;
  const s0 = s[0] as number;
  const s1 = s[1] as number;
  const s2 = s[2] as number;
  let size = 1;
  for (let i = 0; i < d; i++) size = Math.max(size, Math.abs(s[i] as number));
  let worst = -VIOLATION * size;
  let found = -1;
  for (let r = 0, at = 0; r < count; r++, at += d) {
    let value = (a[at] as number) * s0 + (a[at + 1] as number) * s1 + (a[at + 2] as number) * s2 - (b[r] as number);
    for (let k = 3; k < d; k++) value += (a[at + k] as number) * (s[k] as number);
    if (value < worst) {
      worst = value;
      found = r;
    }
  }
  return found;
}

/** The ratio test: least y/w over w > 0, ties broken as if c carried ever smaller additions to its components. */
function rowToLeave(w: Float64Array, y: Float64Array, inverse: Float64Array, d: number, zero: number): number {
  let best = -1;
  for (let i = 0; i < d; i++) {
    if ((w[i] as number) <= zero) continue;
    if (best < 0 || comesBefore(i, best, w, y, inverse, d)) best = i;
  }
  return best;
}

function comesBefore(
  i: number,
  j: number,
  w: Float64Array,
  y: Float64Array,
  inverse: Float64Array,
  d: number,
): boolean {
  const wi = w[i] as number;
  const wj = w[j] as number;
  let left = (y[i] as number) / wi;
  let rightSide = (y[j] as number) / wj;
  for (let k = 0; k <= d; k++) {
    if (Math.abs(left - rightSide) > TIE * (1e-3 + Math.abs(left) + Math.abs(rightSide))) return left < rightSide;
    if (k === d) break;
    left = (inverse[k * d + i] as number) / wi;
    rightSide = (inverse[k * d + j] as number) / wj;
  }
  return false;
}

function settled(
  rows: Rows,
  basis: Int32Array,
  matrix: Float64Array,
  right: Float64Array,
  inverse: Float64Array,
  s: Float64Array,
  y: Float64Array,
  c: readonly number[],
): { answer: SimplexOutcome; touchesBox: boolean } {
  const d = rows.unknowns;
  refine(matrix, right, inverse, s, d);
  const largest = y.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  const onBox = basis.some((row, i) => row < 0 && (y[i] as number) > largest * TIE);
  if (onBox) return { answer: { kind: 'unbounded' }, touchesBox: true };
  const multipliers: Multiplier[] = [];
  basis.forEach((row, i) => {
    if (row >= 0) multipliers.push({ row, y: Math.max(0, y[i] as number) });
  });
  const value = s.reduce((sum, si, i) => sum + si * (c[i] as number), 0);
  return { answer: { kind: 'optimal', s: s.slice(), value, basis: multipliers }, touchesBox: false };
}

function noneLeaves(
  basis: Int32Array,
  w: Float64Array,
  entering: number,
  largest: number,
): { answer: SimplexOutcome; touchesBox: boolean } {
  const certificate: Multiplier[] = [{ row: entering, y: 1 }];
  let touchesBox = false;
  basis.forEach((row, i) => {
    const y = -(w[i] as number);
    if (y <= largest * TIE) return;
    if (row < 0) touchesBox = true;
    else certificate.push({ row, y });
  });
  return { answer: { kind: 'infeasible', certificate }, touchesBox };
}
