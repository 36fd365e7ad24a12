/** Answers of the statics in the words and units of the assessment document. */
import type { Point } from '../geometry/point.ts';
import type { Joint } from '../geometry/stations.ts';
import { lineOfThrust } from '../statics/line.ts';
import { motionsOf, thrustByVirtualWork, workOf } from '../statics/mechanism.ts';
import { equilibriumResidual, type SpringingForce } from '../statics/proof.ts';
import type { RingSystem } from '../statics/system.ts';
import type { Extreme, ThrustAnswer, TurningHinge } from '../statics/thrust.ts';
import type { UsableThrust } from '../statics/usable-thrust.ts';
import type { Block, Hinge, Mechanism, Proof, Reaction, Thrust, ThrustState } from './assessment.ts';

export const plainHinges = (hinges: readonly TurningHinge[]): Hinge[] =>
  hinges.map(({ joint, side }) => ({ joint, side }));

export function printedThrust(
  system: RingSystem,
  joints: readonly Joint[],
  answer: ThrustAnswer,
  leastLine: readonly (Point | null)[],
  usable: UsableThrust | null,
): Thrust {
  if (!answer.stands) return { stands: false, least: null, greatest: null, usable: null };
  const printed = (extreme: Extreme | null, line: readonly (Point | null)[]): ThrustState | null =>
    extreme && {
      horizontal: extreme.horizontal,
      line: line.map((point) => point ?? { x: null, y: null }),
      hinges: plainHinges(extreme.hinges),
    };
  return {
    stands: true,
    least: printed(answer.least, leastLine),
    greatest: printed(answer.greatest, answer.greatest ? lineOfThrust(system, joints, answer.greatest.state) : []),
    usable,
  };
}

export interface Springings {
  readonly left: SpringingForce;
  readonly right: SpringingForce;
}

export function springingForces(system: RingSystem, { state }: Extreme, line: readonly (Point | null)[]): Springings {
  const last = system.joints - 1;
  const { force } = system.frame;
  const horizontal = state[0] as number;
  const vertical = state[1] as number;
  return {
    left: { horizontal: horizontal * force, vertical: vertical * force, at: line[0] ?? null },
    right: {
      horizontal: (horizontal + (system.sums.fx[last] as number)) * force,
      vertical: -(vertical + (system.sums.fy[last] as number)) * force,
      at: line[last] ?? null,
    },
  };
}

export const printedReaction = ({ horizontal, vertical, at }: SpringingForce): Reaction => ({
  horizontal,
  vertical,
  x: at?.x ?? null,
  y: at?.y ?? null,
});

export function printedMechanism(
  joints: readonly Joint[],
  blocks: readonly Block[],
  hinges: readonly TurningHinge[],
): Mechanism {
  return { hinges, work: workOf(blocks, motionsOf(joints, hinges)) };
}

export function printedProof(
  joints: readonly Joint[],
  system: RingSystem,
  blocks: readonly Block[],
  least: Extreme | null,
  line: readonly (Point | null)[],
  springings: Springings | null,
): Proof {
  if (least === null || springings === null) {
    return { equilibriumResidual: null, static: null, kinematic: null, gap: null };
  }
  const kinematic = thrustByVirtualWork(joints, blocks, least.hinges);
  const size = Math.max(Math.abs(least.horizontal), system.frame.force);
  return {
    equilibriumResidual: equilibriumResidual(blocks, line, springings.left, springings.right),
    static: least.horizontal,
    kinematic,
    gap: kinematic === null ? null : Math.abs(least.horizontal - kinematic) / size,
  };
}
