/** What shows that an answer is right without trusting the search that found it. */
import type { Point } from '../geometry/point.ts';
import type { Block } from '../loading/forces.ts';

/** The force on a support and where it crosses the springing joint. */
export interface SpringingForce {
  /** Horizontal thrust, positive in compression, kN. */
  readonly horizontal: number;
  /** Vertical load, positive downwards, kN. */
  readonly vertical: number;
  readonly at: Point | null;
}

/**
 * Walks the ring from the left springing with the printed forces alone and returns the largest want of balance of any
 * block: the force left over at the right springing over the total force, and the moment of the resultant about each
 * printed point of the line over total force times width. Null when the left springing's point is not known.
 */
export function equilibriumResidual(
  blocks: readonly Block[],
  line: readonly (Point | null)[],
  left: SpringingForce,
  right: SpringingForce,
): number | null {
  if (left.at === null) return null;
  let fx = left.horizontal;
  let fy = left.vertical;
  let moment = left.at.x * fy - left.at.y * fx;
  let total = 0;
  let worst = 0;
  const known = line.filter((point) => point !== null);
  const width = Math.max(...known.map(({ x }) => x)) - Math.min(...known.map(({ x }) => x));
  const moments: number[] = [0];
  blocks.forEach(({ forces }, k) => {
    for (const force of forces) {
      fx += force.fx;
      fy += force.fy;
      moment += force.x * force.fy - force.y * force.fx;
      total += Math.abs(force.fx) + Math.abs(force.fy);
    }
    const point = line[k + 1];
    moments.push(point ? moment - point.x * fy + point.y * fx : 0);
  });
  if (total === 0) return Math.abs(fx) + Math.abs(fy);
  for (const value of moments) worst = Math.max(worst, Math.abs(value) / (total * width));
  return Math.max(worst, Math.abs(fx - right.horizontal) / total, Math.abs(-fy - right.vertical) / total);
}
