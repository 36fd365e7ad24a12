/**
 * The movement of a ring that turns about hinges, as rigid motions of its blocks, and the work that the forces do.
 *
 * At a hinge on the extrados the joint opens at the intrados: the part to its left turns clockwise against the part to
 * its right; on the intrados it turns the other way. Small rotations: a motion is a turn about the origin and a shift.
 */
import type { Joint } from '../geometry/stations.ts';
import type { Block } from '../loading/forces.ts';
import type { TurningHinge } from './thrust.ts';

/** Small motion of a rigid part: every point (x, y) moves by (dx − turn·y, dy + turn·x). Radians and metres. */
export interface Motion {
  readonly turn: number;
  readonly dx: number;
  readonly dy: number;
}

const REST: Motion = { turn: 0, dx: 0, dy: 0 };

/**
 * Motions of the left abutment (index 0), the blocks from left to right (1 … n) and the right abutment (n + 1), the
 * right abutment at rest.
 */
export function motionsOf(joints: readonly Joint[], hinges: readonly TurningHinge[]): Motion[] {
  const motions: Motion[] = [REST];
  let motion = REST;
  let next = hinges.length - 1;
  for (let j = joints.length - 1; j >= 0; j--) {
    for (; next >= 0 && hinges[next]?.joint === j; next--) {
      const { side, rotation } = hinges[next] as TurningHinge;
      const about = (joints[j] as Joint)[side];
      const turn = side === 'extrados' ? -rotation : rotation;
      motion = { turn: motion.turn + turn, dx: motion.dx + turn * about.y, dy: motion.dy - turn * about.x };
    }
    motions.push(motion);
  }
  return motions.reverse();
}

/** Work of all forces on the blocks for these motions, kN·m. */
export function workOf(blocks: readonly Block[], motions: readonly Motion[]): number {
  let work = 0;
  blocks.forEach(({ forces }, k) => {
    const { turn, dx, dy } = motions[k + 1] as Motion;
    for (const { x, y, fx, fy } of forces) work += fx * (dx - turn * y) + fy * (dy + turn * x);
  });
  return work;
}

/**
 * The thrust that the mechanism gives by virtual work: the hinges turn so that the left abutment moves outwards
 * without rising or turning, and X0 times that movement is the work of the forces. Null when the hinges do not move so.
 */
export function thrustByVirtualWork(
  joints: readonly Joint[],
  blocks: readonly Block[],
  hinges: readonly TurningHinge[],
): number | null {
  const motions = motionsOf(joints, hinges);
  const { dx } = motions[0] as Motion;
  return dx === 0 ? null : -workOf(blocks, motions) / dx;
}
