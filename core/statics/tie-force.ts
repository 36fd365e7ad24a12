/**
 * The force in ties that hold the whole thrust, so that nothing is left for the supports. At the springings it is the
 * thrust itself. A tie above them takes hold of the ring there and has a shorter lever under the crown, so it needs
 * more: one more unknown beside the three of the ring, with the push on the supports set to nothing.
 */
import type { Joint } from '../geometry/stations.ts';
import type { Block, BlockForce } from '../loading/forces.ts';
import { minimise, type Rows } from './hinge-simplex.ts';
import { joined, lineRowsWith } from './rows.ts';
import { sumsOf, type RingSystem } from './system.ts';
import type { ThrustAnswer } from './thrust.ts';

/** A tie's level over the springing line, m, and its share of the force of all ties. */
export interface TieShare {
  readonly level: number;
  readonly share: number;
}

/** kN in all ties together; null where no force does, or none is the greatest. */
export interface TieForce {
  readonly least: number | null;
  readonly greatest: number | null;
  /** What the supports must still take whatever the ties do, kN: a raised tie does nothing for the ring under it. */
  readonly leftPush: number;
}

export function tieForce(
  system: RingSystem,
  joints: readonly Joint[],
  answer: ThrustAnswer,
  ties: readonly TieShare[],
): TieForce {
  if (!answer.stands || answer.least === null) return { least: null, greatest: null, leftPush: 0 };
  const raised = ties.some(({ level }) => blockAt(joints, level, 'left') !== null);
  if (!raised) {
    return {
      least: Math.max(0, answer.least.horizontal),
      greatest: answer.greatest === null ? null : Math.max(0, answer.greatest.horizontal),
      leftPush: 0,
    };
  }
  const { frame } = system;
  const blocks: Block[] = joints.slice(1).map((_, k) => ({ forces: forcesOn(k, joints, ties, frame.force) }));
  const ring = lineRowsWith(system, [sumsOf(frame, blocks, ({ forces }) => forces)]);
  const onBodies = ties.reduce(
    (sum, { level, share }) => (blockAt(joints, level, 'left') === null ? sum + share : sum),
    0,
  );
  // first the least push that ties can leave to the supports, then the forces that leave no more
  const left = minimise(joined(ring, pushRows(onBodies, null)), [1, 0, 0, -onBodies]);
  if (left.kind !== 'optimal') return { least: null, greatest: null, leftPush: 0 };
  const rows = joined(ring, pushRows(onBodies, left.value));
  const force = (sign: 1 | -1): number | null => {
    const outcome = minimise(rows, [0, 0, 0, sign]);
    return outcome.kind === 'optimal' ? (outcome.s[3] as number) * frame.force : null;
  };
  return { least: force(1), greatest: force(-1), leftPush: Math.max(0, left.value * frame.force) };
}

/** Share of the total weight within which a push counts as the least. */
const AS_LEAST = 1e-9;

/** A tie pulls and a support pushes back, and no harder than `most` where it is given: X0 less what ties at the springings take. */
function pushRows(onBodies: number, most: number | null): Rows {
  const rows = [
    { a: [0, 0, 0, 1], b: 0 },
    { a: [1, 0, 0, -onBodies], b: 0 },
    ...(most === null ? [] : [{ a: [-1, 0, 0, onBodies], b: -most - AS_LEAST }]),
  ];
  return {
    unknowns: 4,
    count: rows.length,
    a: Float64Array.from(rows.flatMap(({ a }) => a)),
    b: Float64Array.from(rows, ({ b }) => b),
  };
}

/** The block whose middle line crosses the level on that side, from the springing up; null below the springing. */
function blockAt(joints: readonly Joint[], level: number, side: 'left' | 'right'): number | null {
  const n = joints.length - 1;
  const height = (i: number): number => {
    const { intrados, extrados } = joints[side === 'left' ? i : n - i] as Joint;
    return (intrados.y + extrados.y) / 2;
  };
  if (level <= height(0)) return null;
  for (let k = 0; k < n; k++) {
    if (height(k + 1) >= level) return side === 'left' ? k : n - 1 - k;
    if (height(k + 1) < height(k)) return null;
  }
  return null;
}

/** The tie pulls the left of the ring to the right and the right of it to the left. */
function forcesOn(block: number, joints: readonly Joint[], ties: readonly TieShare[], unit: number): BlockForce[] {
  return ties.flatMap(({ level, share }) =>
    (['left', 'right'] as const).flatMap((side) => {
      if (blockAt(joints, level, side) !== block) return [];
      const fx = (side === 'left' ? 1 : -1) * share * unit;
      // a level force has the same moment wherever along its line it takes hold
      return [{ x: joints[block]!.intrados.x, y: level, fx, fy: 0, from: 'tie' }];
    }),
  );
}
