/**
 * The ring as figures for the hinge simplex. With s = (X0, Y0, M0), the force of the left abutment on the ring at joint
 * 0 and its moment about the frame's origin, the resultant that the left part passes to the right part at joint j is
 *
 *     Xj = X0 + ΣFx,   Yj = Y0 + ΣFy,   Mj = M0 + ΣM      (sums over the blocks left of j)
 *
 * and its moment about a point P is Mj − Px·Yj + Py·Xj. Everything is scaled: lengths by the width of the ring, forces
 * by the total of all forces, so that figures are of order one.
 */
import type { Joint } from '../geometry/stations.ts';
import type { Point } from '../geometry/point.ts';
import type { Block, BlockForce } from '../loading/forces.ts';

/** Scale and origin: metres = length · scaled + origin, kilonewtons = force · scaled. */
export interface Frame {
  readonly origin: Point;
  /** m */
  readonly length: number;
  /** kN */
  readonly force: number;
}

/** Sums of forces over the blocks left of each joint, scaled, moments about the frame's origin. */
export interface Sums {
  readonly fx: Float64Array;
  readonly fy: Float64Array;
  readonly m: Float64Array;
}

export interface RingSystem {
  readonly frame: Frame;
  readonly joints: number;
  readonly ix: Float64Array;
  readonly iy: Float64Array;
  readonly ex: Float64Array;
  readonly ey: Float64Array;
  readonly sums: Sums;
}

export function ringSystem(joints: readonly Joint[], blocks: readonly Block[]): RingSystem {
  const frame = frameOf(joints, blocks);
  const n = joints.length;
  const system: RingSystem = {
    frame,
    joints: n,
    ix: new Float64Array(n),
    iy: new Float64Array(n),
    ex: new Float64Array(n),
    ey: new Float64Array(n),
    sums: sumsOf(frame, blocks, (block) => block.forces),
  };
  const { origin, length } = frame;
  joints.forEach(({ intrados, extrados }, j) => {
    system.ix[j] = (intrados.x - origin.x) / length;
    system.iy[j] = (intrados.y - origin.y) / length;
    system.ex[j] = (extrados.x - origin.x) / length;
    system.ey[j] = (extrados.y - origin.y) / length;
  });
  return system;
}

function frameOf(joints: readonly Joint[], blocks: readonly Block[]): Frame {
  let left = Infinity;
  let right = -Infinity;
  let low = Infinity;
  let high = -Infinity;
  for (const { intrados, extrados } of joints) {
    left = Math.min(left, intrados.x, extrados.x);
    right = Math.max(right, intrados.x, extrados.x);
    low = Math.min(low, intrados.y, extrados.y);
    high = Math.max(high, intrados.y, extrados.y);
  }
  let force = 0;
  for (const { forces } of blocks) for (const { fx, fy } of forces) force += Math.abs(fx) + Math.abs(fy);
  return {
    origin: { x: (left + right) / 2, y: (low + high) / 2 },
    length: Math.max(right - left, high - low),
    // a ring without any force has no scale of its own; its only line is no force at all
    force: force > 0 ? force : 1,
  };
}

/** Running sums of the forces that `pick` takes from each block. */
export function sumsOf(frame: Frame, blocks: readonly Block[], pick: (block: Block) => readonly BlockForce[]): Sums {
  const n = blocks.length + 1;
  const sums = { fx: new Float64Array(n), fy: new Float64Array(n), m: new Float64Array(n) };
  const { origin, length, force } = frame;
  let sumX = 0;
  let sumY = 0;
  let sumM = 0;
  for (let k = 0; k < blocks.length; k++) {
    for (const { x, y, fx, fy } of pick(blocks[k] as Block)) {
      sumX += fx / force;
      sumY += fy / force;
      sumM += (((x - origin.x) / length) * fy - ((y - origin.y) / length) * fx) / force;
    }
    sums.fx[k + 1] = sumX;
    sums.fy[k + 1] = sumY;
    sums.m[k + 1] = sumM;
  }
  return sums;
}

/** Moment about P of the sums left of joint j. */
export const momentAbout = (sums: Sums, j: number, px: number, py: number): number =>
  (sums.m[j] as number) - px * (sums.fy[j] as number) + py * (sums.fx[j] as number);

/** Makes something of a system the first time it is asked for, and hands out the same from then on. */
export function oncePerSystem<T extends object>(make: (system: RingSystem) => T): (system: RingSystem) => T {
  const made = new WeakMap<RingSystem, T>();
  return (system) => {
    const held = made.get(system);
    if (held !== undefined) return held;
    const fresh = make(system);
    made.set(system, fresh);
    return fresh;
  };
}
