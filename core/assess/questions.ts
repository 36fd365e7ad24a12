/**
 * Questions asked of an assessed scheme one by one: a chosen thrust, a line drawn by hand, a movement of a support.
 * Pure and synchronous; what takes longer than a frame is in `long-questions.ts`.
 */
import { distance, type Point } from '../geometry/point.ts';
import { crossing, jointForce, lineOfThrust, type State } from '../statics/line.ts';
import type { Side } from '../statics/hinge.ts';
import { stateBetween, stateThrough, type Passage } from '../statics/states.ts';
import { stressBlock, type StressBlock } from '../statics/stress-block.ts';
import { answerToMovement, type MovementAnswer, type SupportMovement } from '../statics/support-movement.ts';
import { thrustRange } from '../statics/thrust.ts';
import type { BuiltScheme } from './build.ts';

/** One joint under one state: kN, m, kN/m². */
export interface JointReport {
  readonly joint: number;
  /** Where the resultant crosses the joint; null where it runs parallel to it. */
  readonly at: Point | null;
  /** Share of the way from intrados to extrados at which it crosses; outside 0…1 it has left the ring. */
  readonly share: number | null;
  readonly length: number;
  readonly normal: number;
  /** Positive towards the extrados on the right part. */
  readonly shear: number;
  /** |shear| / normal: the friction that this joint needs; null without compression. */
  readonly friction: number | null;
  /** Null where the resultant is outside the joint or pulls on it. */
  readonly stress: StressBlock | null;
}

export interface LineReport {
  /** Horizontal thrust at the left springing, kN. */
  readonly horizontal: number;
  readonly line: readonly (Point | null)[];
  readonly joints: readonly JointReport[];
  /** Joints at which the line has left the ring, with how far beyond the nearer face, m. */
  readonly outside: readonly Excursion[];
}

export interface Excursion {
  readonly joint: number;
  readonly side: Side;
  readonly by: number;
}

/**
 * The line a share of the way from the least thrust to the greatest; where the greatest has no bound, from the least
 * to twice the least. Null when no line fits.
 */
export function lineAtShare(built: BuiltScheme, share: number): LineReport | null {
  const answer = thrustRange(built.system);
  if (!answer.stands || answer.least === null) return null;
  const { least, greatest } = answer;
  if (greatest !== null) return report(built, stateBetween(least.state, greatest.state, share));
  return share === 0 ? report(built, least.state) : null;
}

/** The line through three places, wherever it runs; null when the three stand in one line. */
export function lineThrough(built: BuiltScheme, passages: readonly [Passage, Passage, Passage]): LineReport | null {
  const state = stateThrough(built.system, passages);
  return state && report(built, state);
}

function report(built: BuiltScheme, state: State): LineReport {
  const { system, joints, resolved } = built;
  const line = lineOfThrust(system, joints, state);
  const reports = joints.map((joint, j): JointReport => {
    const { normal, shear, moment } = jointForce(system, state, j);
    const length = distance(joint.intrados, joint.extrados);
    return {
      joint: j,
      at: line[j] ?? null,
      share: crossing(system, state, j),
      length,
      normal,
      shear,
      friction: normal > 0 ? Math.abs(shear) / normal : null,
      stress: stressBlock(normal, moment, length, resolved.breadth),
    };
  });
  return {
    horizontal: (state[0] as number) * system.frame.force,
    line,
    joints: reports,
    outside: reports.flatMap(({ joint, share, length }): Excursion[] => {
      if (share === null || (share >= -ON_FACE && share <= 1 + ON_FACE)) return [];
      return share < 0
        ? [{ joint, side: 'intrados', by: -share * length }]
        : [{ joint, side: 'extrados', by: (share - 1) * length }];
    }),
  };
}

/** A share of a joint beyond its face that is rounding only. */
const ON_FACE = 1e-9;

/** Where the ring opens, and how far, when a support moves. */
export const movement = ({ system, joints }: BuiltScheme, moved: SupportMovement): MovementAnswer =>
  answerToMovement(system, joints, moved);
