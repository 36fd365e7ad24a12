/**
 * The least strength with which a line of thrust crushes no joint: the least, over all lines in the ring, of the
 * greatest N / (b (t − 2|e|)), the mean stress of the block centred on the resultant.
 *
 * With v = N t − 2|m| and q the force that crushes a unit of joint, the demand N² ≤ q v is a cone in the state and q
 * together, so the least q is closed in on by planes that touch the cone where the last answer leaves it (Kelley 1960;
 * the cone as ‖(2N, q − v)‖ ≤ q + v; both from memory). The last programme's value is a bound from below, the state's
 * own stress one from above.
 */
import { minimise, type Multiplier } from './hinge-simplex.ts';
import { jointLengths, momentForms, normalForms } from './joint-forms.ts';
import type { State } from './line.ts';
import { valueAt } from './ratio.ts';
import { lineRows } from './rows.ts';
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
const MET = 1e-6;
/** Planes laid at most; an ordinary ring wants some thirty. */
const MOST_PLANES = 800;
const KILONEWTON_PER_SQUARE_METRE_IN_MPA = 1000;

/**
 * @param inside a state whose line stays clear of every edge; @param breadth m.
 * @returns null when that state lies on an edge after all, as where joints carry next to nothing.
 */
export function neededStrength(system: RingSystem, inside: State, breadth: number): NeededStrength | null {
  const joints = jointLengths(system).length;
  let best = {
    state: Float64Array.from({ length: 3 }, (_, k) => inside[k] as number),
    ...mostStressed(system, inside),
  };
  if (!Number.isFinite(best.stress)) return null;
  const planes = new Planes(system, scaleOf(system, inside, best.joint), best.stress);
  let basis: readonly Multiplier[] = [];
  while (best.stress > 0 && planes.room >= joints) {
    const outcome = planes.least(basis);
    if (outcome.kind !== 'optimal') break;
    basis = outcome.basis;
    const bound = (outcome.s[3] as number) * planes.unit;
    const found = mostStressed(system, outcome.s);
    if (found.stress < best.stress) best = { state: outcome.s.slice(0, 3), ...found };
    if (best.stress - bound <= MET * best.stress) break;
    planes.layWhereLeft(outcome.s, bound);
  }
  const { force, length } = system.frame;
  return {
    strength: (best.stress * force) / (length * breadth * KILONEWTON_PER_SQUARE_METRE_IN_MPA),
    state: best.state,
    joint: best.joint,
  };
}

/** N and v at one joint, scaled. */
function pressAt(system: RingSystem, s: State, j: number): { n: number; v: number; sign: number } {
  const n = valueAt(normalForms(system), s, j);
  const m = valueAt(momentForms(system), s, j);
  return { n, v: n * (jointLengths(system)[j] as number) - 2 * Math.abs(m), sign: m < 0 ? -1 : 1 };
}

/** The greatest N²/v over the joints, and where; infinite on an edge. */
function mostStressed(system: RingSystem, s: State): { stress: number; joint: number } {
  const normal = normalForms(system);
  const moment = momentForms(system);
  const lengths = jointLengths(system);
  let stress = 0;
  let joint = 0;
  for (let j = 0; j < system.joints; j++) {
    const n = valueAt(normal, s, j);
    if (n <= 0) continue;
    const v = n * (lengths[j] as number) - 2 * Math.abs(valueAt(moment, s, j));
    const here = v <= 0 ? Infinity : (n * n) / v;
    if (here > stress) {
      stress = here;
      joint = j;
    }
  }
  return { stress, joint };
}

/** q is of the order of N²/v; with both brought to the order of N the cone is round. */
function scaleOf(system: RingSystem, s: State, joint: number): number {
  const { n, v } = pressAt(system, s, joint);
  return n > 0 && v > 0 ? v / n : 1;
}

/** The programme min q over the line's rows and the planes laid so far, in (X0, Y0, M0, q over its unit). */
class Planes {
  private readonly a: Float64Array;
  private readonly b: Float64Array;
  private count: number;

  constructor(
    private readonly system: RingSystem,
    private readonly scale: number,
    /** What q is counted in, so that it is of order one like the other unknowns. */
    readonly unit: number,
  ) {
    const line = lineRows(system);
    this.a = new Float64Array(4 * (line.count + 1 + MOST_PLANES));
    this.b = new Float64Array(line.count + 1 + MOST_PLANES);
    for (let r = 0; r < line.count; r++) {
      for (let k = 0; k < 3; k++) this.a[4 * r + k] = line.a[3 * r + k] as number;
      this.b[r] = line.b[r] as number;
    }
    this.a[4 * line.count + 3] = 1;
    this.count = line.count + 1;
  }

  get room(): number {
    return this.b.length - this.count;
  }

  least(start: readonly Multiplier[]) {
    return minimise({ unknowns: 4, count: this.count, a: this.a, b: this.b }, [0, 0, 0, 1], start);
  }

  /** A plane at every joint that leaves its cone further than its neighbours do. */
  layWhereLeft(s: State, q: number): void {
    const { joints } = this.system;
    const normal = normalForms(this.system);
    const moment = momentForms(this.system);
    const lengths = jointLengths(this.system);
    const left = new Float64Array(joints);
    for (let j = 0; j < joints; j++) {
      const n = valueAt(normal, s, j);
      const v = n * (lengths[j] as number) - 2 * Math.abs(valueAt(moment, s, j));
      left[j] = n <= 0 ? 0 : n * n - q * Math.max(0, v);
    }
    for (let j = 0; j < joints; j++) {
      const here = left[j] as number;
      if (here > 0 && here >= (left[j - 1] ?? 0) && here >= (left[j + 1] ?? 0)) this.lay(s, q, j);
    }
  }

  /** q'(r − d) + v'(r + d) ≥ 4 N N', with d = q − v and r = ‖(2N, d)‖: the cone's plane below the point (N, q, v). */
  private lay(s: State, q: number, j: number): void {
    const { n, v, sign } = pressAt(this.system, s, j);
    const roundQ = q * this.scale;
    const roundV = v / this.scale;
    const d = roundQ - roundV;
    const r = Math.sqrt(4 * n * n + d * d);
    const byQ = ((r - d) / r) * this.scale;
    const byV = (r + d) / r / this.scale;
    const t = jointLengths(this.system)[j] as number;
    const byNormal = byV * t - (4 * n) / r;
    const byMoment = -2 * sign * byV;
    const normal = normalForms(this.system);
    const moment = momentForms(this.system);
    const size = Math.max(Math.abs(byQ * this.unit), Math.abs(byNormal), Math.abs(byMoment));
    const row = this.count++;
    for (let k = 0; k < 3; k++) {
      this.a[4 * row + k] =
        (byNormal * (normal.a[3 * j + k] as number) + byMoment * (moment.a[3 * j + k] as number)) / size;
    }
    this.a[4 * row + 3] = (byQ * this.unit) / size;
    this.b[row] = -(byNormal * (normal.b[j] as number) + byMoment * (moment.b[j] as number)) / size;
  }
}
