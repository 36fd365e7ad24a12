/** The rows of a ring that takes no tension: at every joint the resultant passes between intrados and extrados. */
import type { Hinge } from './hinge.ts';
import type { Multiplier, Rows } from './hinge-simplex.ts';
import { momentAbout, type RingSystem, type Sums } from './system.ts';

/**
 * Two rows a joint: 2j, moment about the extrados ≥ 0, and 2j + 1, moment about the intrados ≤ 0. Each multiplier (a
 * load factor, a sway coefficient) adds an unknown whose column are the sums it multiplies.
 */
export function lineRows(system: RingSystem, columns: readonly Sums[] = []): Rows {
  const d = 3 + columns.length;
  const count = 2 * system.joints;
  const a = new Float64Array(count * d);
  const b = new Float64Array(count);
  const { ix, iy, ex, ey, sums } = system;
  for (let j = 0; j < system.joints; j++) {
    setMomentRow(a, b, 2 * j, 1, ex[j] as number, ey[j] as number);
    setMomentRow(a, b, 2 * j + 1, -1, ix[j] as number, iy[j] as number);
  }
  return { unknowns: d, count, a, b };

  function setMomentRow(
    to: Float64Array,
    limit: Float64Array,
    row: number,
    sign: number,
    px: number,
    py: number,
  ): void {
    const j = row >> 1;
    const at = row * d;
    to[at] = sign * py;
    to[at + 1] = -sign * px;
    to[at + 2] = sign;
    for (let k = 0; k < columns.length; k++) to[at + 3 + k] = sign * momentAbout(columns[k] as Sums, j, px, py);
    limit[row] = -sign * momentAbout(sums, j, px, py);
  }
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
