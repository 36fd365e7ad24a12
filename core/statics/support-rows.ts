/**
 * Arch and supports as one linear programme: the beds of the bodies give rows in the same three numbers as the joints
 * of the ring. If no state obeys them all, arch and support cannot stand together, whatever the thrust.
 */
import { minimise, type Rows } from './hinge-simplex.ts';
import { joined, lineRows } from './rows.ts';
import type { BedForce, Body } from './support-body.ts';
import { momentAbout, type RingSystem } from './system.ts';

export interface SidedBody {
  readonly side: 'left' | 'right';
  readonly body: Body;
}

/** Least and greatest thrust at the left springing with every body in compression alone, kN; null when none is there. */
export interface Together {
  readonly least: number | null;
  readonly greatest: number | null;
  readonly state: Float64Array | null;
}

/** All the masonry of the bodies is counted, so this is the most that they can do. Null: cannot stand together. */
export function standTogether(system: RingSystem, bodies: readonly SidedBody[]): Together | null {
  const rows = bodies.map(({ side, body }) => bodyRows(system, side, body)).reduce(joined, lineRows(system));
  const least = minimise(rows, [1, 0, 0]);
  if (least.kind === 'infeasible') return null;
  const greatest = minimise(rows, [-1, 0, 0]);
  const { force } = system.frame;
  return {
    least: least.kind === 'optimal' ? (least.s[0] as number) * force : null,
    greatest: greatest.kind === 'optimal' ? (greatest.s[0] as number) * force : null,
    state: least.kind === 'optimal' ? least.s : null,
  };
}

/**
 * Two rows a bed: M − front · N ≥ 0 and back · N − M ≥ 0. The arch's push on the body is a row of its own in s: with
 * (X, Y, M) the resultant at the springing joint and its moment about the end of the intrados, H = X, V = ±Y and the
 * moment about u = 0, z = 0 is −M on either side.
 */
function bodyRows(system: RingSystem, side: 'left' | 'right', body: Body): Rows {
  const { sums, frame } = system;
  const j = side === 'left' ? 0 : system.joints - 1;
  const sign = side === 'left' ? 1 : -1;
  const ix = system.ix[j] as number;
  const iy = system.iy[j] as number;
  const fx = sums.fx[j] as number;
  const fy = sums.fy[j] as number;
  const about = momentAbout(sums, j, ix, iy);
  const count = 2 * body.slices.length;
  const a = new Float64Array(3 * count);
  const b = new Float64Array(count);
  let weight = 0;
  let weightMoment = 0;
  body.slices.forEach((slice, i) => {
    const own = slice.unitWeight * slice.breadth * (slice.back - slice.front) * (slice.bottom - slice.top);
    weight += own;
    weightMoment += (own * (slice.front + slice.back)) / 2;
    const others = body.others[i] as BedForce;
    const z = slice.bottom / frame.length;
    const restNormal = (others.normal + weight) / frame.force + sign * fy;
    const restMoment = (others.moment + weightMoment) / (frame.force * frame.length) - about + z * fx;
    for (let face = 0; face < 2; face++) {
      const u = (face === 0 ? slice.front : slice.back) / frame.length;
      const sense = face === 0 ? 1 : -1;
      // M at the bed = −(s2 − ix s1 + iy s0) + z s0 + rest, N = ± s1 + rest
      const at = 3 * (2 * i + face);
      a[at] = sense * (z - iy);
      a[at + 1] = sense * (ix - u * sign);
      a[at + 2] = -sense;
      b[2 * i + face] = sense * (u * restNormal - restMoment);
    }
  });
  return { unknowns: 3, count, a, b };
}
