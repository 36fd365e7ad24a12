/** The rows of a ring that takes no tension: at every joint the resultant passes between intrados and extrados. */
import type { Hinge } from './hinge.ts';
import type { Multiplier, Rows } from './hinge-simplex.ts';
import { momentAbout, oncePerSystem, type RingSystem, type Sums } from './system.ts';

/** Two rows a joint: 2j, moment about the extrados ≥ 0, and 2j + 1, moment about the intrados ≤ 0. */
export const lineRows = oncePerSystem((system) => momentRows(system, []));

/** The same with multipliers: each (a load factor, a sway coefficient) adds an unknown whose column are its sums. */
export const lineRowsWith = (system: RingSystem, columns: readonly Sums[]): Rows => momentRows(system, columns);

function momentRows(system: RingSystem, columns: readonly Sums[]): Rows {
  const d = 3 + columns.length;
  const count = 2 * system.joints;
  const a = new Float64Array(count * d);
  const b = new Float64Array(count);
  const { ix, iy, ex, ey, sums } = system;
  for (let j = 0; j < system.joints; j++) {
    for (let side = 0; side < 2; side++) {
      const sign = side === 0 ? 1 : -1;
      const px = (side === 0 ? ex[j] : ix[j]) as number;
      const py = (side === 0 ? ey[j] : iy[j]) as number;
      const at = (2 * j + side) * d;
      a[at] = sign * py;
      a[at + 1] = -sign * px;
      a[at + 2] = sign;
      for (let k = 0; k < columns.length; k++) a[at + 3 + k] = sign * momentAbout(columns[k] as Sums, j, px, py);
      b[2 * j + side] = -sign * momentAbout(sums, j, px, py);
    }
  }
  return { unknowns: d, count, a, b };
}

/** Rows of the same unknowns, the first before the second. */
export function joined(first: Rows, second: Rows): Rows {
  const a = new Float64Array(first.a.length + second.a.length);
  a.set(first.a);
  a.set(second.a, first.a.length);
  const b = new Float64Array(first.b.length + second.b.length);
  b.set(first.b);
  b.set(second.b, first.b.length);
  return { unknowns: first.unknowns, count: first.count + second.count, a, b };
}

export const hingeOfRow = (row: number): Hinge => ({ joint: row >> 1, side: row % 2 === 0 ? 'extrados' : 'intrados' });

/** The hinges of a basis or certificate, left to right, with their relative rotations. */
export function hingesOf(
  multipliers: readonly Multiplier[],
  rotationless = 1e-9,
): { hinge: Hinge; rotation: number }[] {
  const largest = multipliers.reduce((most, { y }) => Math.max(most, y), 0);
  return multipliers
    .filter(({ y }) => y > rotationless * largest)
    .map(({ row, y }) => ({ hinge: hingeOfRow(row), rotation: y }))
    .sort((p, q) => p.hinge.joint - q.hinge.joint);
}
