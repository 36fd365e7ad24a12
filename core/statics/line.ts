/** The line of thrust of one state: where the resultant crosses each joint, and with what force. */
import { between, type Point } from '../geometry/point.ts';
import type { Joint } from '../geometry/stations.ts';
import { momentAbout, type RingSystem } from './system.ts';

/** s = (X0, Y0, M0), scaled as the system is. */
export type State = ArrayLike<number>;

/** The resultant passed on at one joint: kN, and kN·m about mid-joint. */
export interface JointForce {
  /** Square to the joint, positive in compression. */
  readonly normal: number;
  /** Along the joint, positive when it pushes the right part outwards. */
  readonly shear: number;
  /** About mid-joint, positive when the resultant passes towards the intrados. */
  readonly moment: number;
}

/** Share of the total force under which a joint counts as passing on nothing square to itself. */
const NO_FORCE = 1e-12;

const parts = (system: RingSystem, s: State, j: number): { x: number; y: number } => ({
  x: (s[0] as number) + (system.sums.fx[j] as number),
  y: (s[1] as number) + (system.sums.fy[j] as number),
});

/** Moment of the resultant at joint j about (px, py), all scaled. */
function resultantMoment(system: RingSystem, s: State, j: number, px: number, py: number): number {
  return (s[2] as number) - px * (s[1] as number) + py * (s[0] as number) + momentAbout(system.sums, j, px, py);
}

/** Where the resultant crosses joint j, as a share of the joint from intrados to extrados; null where it runs parallel to it. */
export function crossing(system: RingSystem, s: State, j: number): number | null {
  const ix = system.ix[j] as number;
  const iy = system.iy[j] as number;
  const { x, y } = parts(system, s, j);
  // moments about the two ends differ by normal force times joint length
  const across = ((system.ey[j] as number) - iy) * x - ((system.ex[j] as number) - ix) * y;
  if (Math.abs(across) <= NO_FORCE) return null;
  return -resultantMoment(system, s, j, ix, iy) / across;
}

export function jointForce(system: RingSystem, s: State, j: number): JointForce {
  const { x, y } = parts(system, s, j);
  const dx = (system.ex[j] as number) - (system.ix[j] as number);
  const dy = (system.ey[j] as number) - (system.iy[j] as number);
  const t = Math.hypot(dx, dy);
  const middleX = ((system.ex[j] as number) + (system.ix[j] as number)) / 2;
  const middleY = ((system.ey[j] as number) + (system.iy[j] as number)) / 2;
  const { force, length } = system.frame;
  return {
    normal: (force * (dy * x - dx * y)) / t,
    shear: (force * (dx * x + dy * y)) / t,
    moment: force * length * resultantMoment(system, s, j, middleX, middleY),
  };
}

/** The crossing points in metres, joint 0 first. */
export function lineOfThrust(system: RingSystem, joints: readonly Joint[], s: State): (Point | null)[] {
  return joints.map(({ intrados, extrados }, j) => {
    const share = crossing(system, s, j);
    return share === null ? null : between(intrados, extrados, share);
  });
}
