/**
 * How a ring answers a movement of its supports: of all lines that fit it takes the one on which the movement does the
 * least work, and the hinges of that line are where it opens (Heyman 1966; Ochsendorf 2002; from memory). Spreading
 * gives the least thrust, closing the greatest, settlement its own.
 */
import type { Joint } from '../geometry/stations.ts';
import { distance, midpoint, type Point } from '../geometry/point.ts';
import type { Hinge } from './hinge.ts';
import { minimise } from './hinge-simplex.ts';
import { hingesOf, lineRows } from './rows.ts';
import type { RingSystem } from './system.ts';

/** A small movement of one support: metres, x to the right and y up, and a turn in radians about its springing joint's middle. */
export interface SupportMovement {
  readonly side: 'left' | 'right';
  readonly dx: number;
  readonly dy: number;
  readonly turn: number;
}

/** A joint that opens, and how far for the movement given. */
export interface Opening extends Hinge {
  /** Relative turn, rad. */
  readonly rotation: number;
  /** Width of the gap at the opening face, m; the opening face is opposite the hinge. */
  readonly width: number;
}

export type MovementAnswer =
  | {
      readonly kind: 'opens';
      /** Horizontal thrust at the left springing, kN. */
      readonly horizontal: number;
      /** (X0, Y0, M0), scaled. */
      readonly state: Float64Array;
      readonly openings: readonly Opening[];
    }
  /** No line fits, or the movement drives the ring against thrusts without limit. */
  | { readonly kind: 'no-line' }
  | { readonly kind: 'locked' };

export function answerToMovement(
  system: RingSystem,
  joints: readonly Joint[],
  movement: SupportMovement,
): MovementAnswer {
  const c = workOnState(system, joints, movement);
  const size = Math.max(...c.map(Math.abs));
  if (size === 0) throw new RangeError('a movement that moves nothing has no answer');
  const outcome = minimise(
    lineRows(system),
    c.map((value) => value / size),
  );
  if (outcome.kind === 'infeasible') return { kind: 'no-line' };
  if (outcome.kind === 'unbounded') return { kind: 'locked' };
  const { length, force } = system.frame;
  const openings = hingesOf(outcome.basis).map(({ hinge, rotation }): Opening => {
    const { intrados, extrados } = joints[hinge.joint] as Joint;
    // multipliers are turns where lengths are in frame units and movements were divided by `size`
    const turn = (rotation * size) / length;
    return { ...hinge, rotation: turn, width: turn * distance(intrados, extrados) };
  });
  return { kind: 'opens', horizontal: (outcome.s[0] as number) * force, state: outcome.s, openings };
}

/**
 * Coefficients of the work that the ring does on the moving support, as a form of the state: the left support receives
 * −s, the right one s plus the loads. Movements in metres, so that the multipliers are turns times the frame's length.
 */
function workOnState(system: RingSystem, joints: readonly Joint[], { side, dx, dy, turn }: SupportMovement): number[] {
  const springing = joints[side === 'left' ? 0 : joints.length - 1] as Joint;
  const { origin, length } = system.frame;
  const about: Point = midpoint(springing.intrados, springing.extrados);
  const px = (about.x - origin.x) / length;
  const py = (about.y - origin.y) / length;
  const sign = side === 'left' ? -1 : 1;
  const turned = turn * length;
  // a turn about (px, py) moves the frame's origin by (turn·py, −turn·px)
  return [sign * (dx + turned * py), sign * (dy - turned * px), sign * turned];
}
