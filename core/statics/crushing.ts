/**
 * Crushing of a joint without tension: the stress block of strength f beside one edge carries N at most at
 * |m| ≤ N/2 · (t − N/(f b)), m about mid-joint (plastic stress block; standard statics of masonry). The limit is a
 * curve, so its rows are made as they are needed: the tangent at the normal force where the present answer violates it
 * most, again and again. Each tangent lies outside the curve, so an answer that none can be found to violate is exact.
 */
import { minimise, type Rows, type SimplexOutcome } from './hinge-simplex.ts';
import { jointLengths, momentForms, normalForms } from './joint-forms.ts';
import { valueAt, type JointForms } from './ratio.ts';
import type { State } from './line.ts';
import type { RingSystem } from './system.ts';

export interface CrushingLimit {
  readonly normal: JointForms;
  readonly moment: JointForms;
  /** Joint lengths, scaled. */
  readonly length: Float64Array;
  /** Force that crushes a unit of joint, scaled: f·b. */
  readonly perLength: number;
}

/** @param strength MPa; @param breadth m. */
export function crushingLimit(system: RingSystem, strength: number, breadth: number): CrushingLimit {
  const { force, length } = system.frame;
  return {
    normal: normalForms(system),
    moment: momentForms(system),
    length: jointLengths(system),
    perLength: (strength * KILONEWTON_PER_SQUARE_METRE_IN_MPA * breadth * length) / force,
  };
}

const KILONEWTON_PER_SQUARE_METRE_IN_MPA = 1000;
/** Violation of the curve, on figures of order one, that counts as none: well below any figure printed. */
const ON_CURVE = 1e-11;
/** Tangents after which the curve must be met; each is a Newton step at the corner of the answer, so some ten are. */
const MOST_TANGENTS = 400;

/** Minimise c·s over the rows given and the crushing limit of every joint. */
export function minimiseUncrushed(rows: Rows, limit: CrushingLimit, c: readonly number[]): SimplexOutcome {
  const d = rows.unknowns;
  const joints = limit.length.length;
  const a = new Float64Array((rows.count + joints + MOST_TANGENTS) * d);
  const b = new Float64Array(rows.count + joints + MOST_TANGENTS);
  a.set(rows.a);
  b.set(rows.b);
  let count = rows.count;
  for (let j = 0; j < joints; j++) setGreatestForce(limit, j, a, b, count++, d);
  let outcome = minimise({ unknowns: d, count, a, b }, c);
  for (let tangents = 0; tangents < MOST_TANGENTS && outcome.kind === 'optimal'; tangents++) {
    const worst = mostCrushed(limit, outcome.s);
    if (worst === null) break;
    setTangent(limit, worst, a, b, count, d);
    count++;
    outcome = minimise({ unknowns: d, count, a, b }, c, outcome.basis);
  }
  return outcome;
}

/** N ≤ f b t: what both branches of the limit come to together; it bounds the thrust before any tangent does. */
function setGreatestForce(
  limit: CrushingLimit,
  j: number,
  a: Float64Array,
  b: Float64Array,
  row: number,
  d: number,
): void {
  for (let k = 0; k < 3; k++) a[row * d + k] = -(limit.normal.a[3 * j + k] as number);
  b[row] = (limit.normal.b[j] as number) - limit.perLength * (limit.length[j] as number);
}

interface Crushed {
  readonly joint: number;
  /** +1: the resultant passes towards the intrados. */
  readonly sign: number;
  readonly normal: number;
}

function mostCrushed(limit: CrushingLimit, s: State): Crushed | null {
  let worst: Crushed | null = null;
  let most = ON_CURVE;
  for (let j = 0; j < limit.length.length; j++) {
    const n = valueAt(limit.normal, s, j);
    const m = valueAt(limit.moment, s, j);
    const excess = Math.abs(m) - (n / 2) * ((limit.length[j] as number) - n / limit.perLength);
    if (excess > most * (1 + Math.abs(n))) {
      most = excess / (1 + Math.abs(n));
      worst = { joint: j, sign: m < 0 ? -1 : 1, normal: n };
    }
  }
  return worst;
}

/** (t/2 − N0/(f b)) N ∓ m ≥ −N0²/(2 f b): the tangent of the limit at N0. */
function setTangent(limit: CrushingLimit, at: Crushed, a: Float64Array, b: Float64Array, row: number, d: number): void {
  const { joint, sign, normal } = at;
  const slope = (limit.length[joint] as number) / 2 - normal / limit.perLength;
  for (let k = 0; k < 3; k++) {
    a[row * d + k] =
      slope * (limit.normal.a[3 * joint + k] as number) - sign * (limit.moment.a[3 * joint + k] as number);
  }
  b[row] =
    -(normal * normal) / (2 * limit.perLength) -
    slope * (limit.normal.b[joint] as number) +
    sign * (limit.moment.b[joint] as number);
}
