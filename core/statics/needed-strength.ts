/**
 * The least strength with which a line of thrust crushes no joint: the least, over all lines in the ring, of the
 * greatest N / (b (t − 2|e|)), the mean stress of the block centred on the resultant.
 *
 * N²/(b v), v = N t − 2|m|, is convex in the state, so the least is closed in on by its tangent planes (Kelley 1960;
 * from memory): the last programme's value is a bound from below, the state's own stress one from above.
 */
import { minimise, type Multiplier } from './hinge-simplex.ts';
import { jointLengths, momentForms, normalForms } from './joint-forms.ts';
import { valueAt } from './ratio.ts';
import { lineRows } from './rows.ts';
import type { State } from './line.ts';
import type { RingSystem } from './system.ts';

export interface NeededStrength {
  /** MPa */
  readonly strength: number;
  /** (X0, Y0, M0), scaled. */
  readonly state: Float64Array;
  /** The most stressed joint of that state. */
  readonly joint: number;
}

/** Relative gap between the two bounds that counts as met; the figure is printed to three figures. */
const MET = 1e-7;
const MOST_PLANES = 600;
/**
 * Near an edge the stress has no bound, and a plane laid there says no more than the edge does. A trial is drawn back
 * towards the best state until its stress is at most this many times the best: its plane then still cuts the trial off,
 * because it rises all the way from the best state.
 */
const STEEPEST = 4;

/**
 * @param inside a state whose line stays clear of every edge; @param breadth m.
 * @returns null when that state lies on an edge after all, as where joints carry next to nothing.
 */
export function neededStrength(system: RingSystem, inside: State, breadth: number): NeededStrength | null {
  const normal = normalForms(system);
  const moment = momentForms(system);
  const length = jointLengths(system);
  const line = lineRows(system);
  const capacity = line.count + MOST_PLANES + length.length;
  const a = new Float64Array(4 * capacity);
  const b = new Float64Array(capacity);
  for (let r = 0; r < line.count; r++) {
    for (let k = 0; k < 3; k++) a[4 * r + k] = line.a[3 * r + k] as number;
    b[r] = line.b[r] as number;
  }
  let count = line.count;

  /** N²/v at one joint; infinite on an edge. */
  const stressAt = (s: State, j: number): number => {
    const n = valueAt(normal, s, j);
    const v = n * (length[j] as number) - 2 * Math.abs(valueAt(moment, s, j));
    return n <= 0 ? 0 : v <= 0 ? Infinity : (n * n) / v;
  };

  /** The greatest N²/v over the joints, and where. */
  const worst = (s: State): { stress: number; joint: number } => {
    let stress = 0;
    let joint = 0;
    for (let j = 0; j < length.length; j++) {
      const here = stressAt(s, j);
      if (here > stress) [stress, joint] = [here, j];
    }
    return { stress, joint };
  };

  /** φ ≥ (2 N0/v0) N − (N0/v0)² v: the tangent plane at a state, through the origin as N²/v is homogeneous. */
  const addPlane = (s: State, joint: number): void => {
    const n = valueAt(normal, s, joint);
    const m = valueAt(moment, s, joint);
    const t = length[joint] as number;
    const sign = m < 0 ? -1 : 1;
    const v = n * t - 2 * Math.abs(m);
    if (!(v > 0)) return;
    const slope = n / v;
    // divided through by the larger coefficient, so that a plane near an edge is of order one like every row
    const scale = 1 / Math.max(1, slope * slope);
    const byNormal = scale * (2 * slope - slope * slope * t);
    const byMoment = scale * 2 * sign * slope * slope;
    for (let k = 0; k < 3; k++) {
      a[4 * count + k] =
        -byNormal * (normal.a[3 * joint + k] as number) - byMoment * (moment.a[3 * joint + k] as number);
    }
    a[4 * count + 3] = scale;
    b[count] = byNormal * (normal.b[joint] as number) + byMoment * (moment.b[joint] as number);
    count++;
  };

  let best = Float64Array.from({ length: 3 }, (_, k) => inside[k] as number);
  let top = worst(best);
  if (!Number.isFinite(top.stress)) return null;
  addPlane(best, top.joint);
  let basis: readonly Multiplier[] = [];
  while (count + length.length < capacity) {
    const outcome = minimise({ unknowns: 4, count, a, b }, [0, 0, 0, 1], basis);
    if (outcome.kind !== 'optimal') break;
    basis = outcome.basis;
    if (top.stress - (outcome.s[3] as number) <= MET * top.stress) break;
    let trial = outcome.s.slice(0, 3);
    let found = worst(trial);
    for (let share = 0.5; found.stress > STEEPEST * top.stress; share /= 2) {
      trial = best.map((value, k) => value + share * ((outcome.s[k] as number) - value));
      found = worst(trial);
    }
    // a plane at every joint that stands out there beyond its neighbours and the bound from below
    for (let j = 0; j < length.length; j++) {
      const here = stressAt(trial, j);
      const peak =
        here >= stressAt(trial, Math.max(0, j - 1)) && here >= stressAt(trial, Math.min(length.length - 1, j + 1));
      if (peak && here > (outcome.s[3] as number)) addPlane(trial, j);
    }
    if (found.stress < top.stress) [best, top] = [trial, found];
  }
  const { force, length: unit } = system.frame;
  return { strength: (top.stress * force) / (unit * breadth * 1000), state: best, joint: top.joint };
}
