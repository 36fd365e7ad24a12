/** The part of each joint that can carry: less lost mortar at its faces, and on through backing that counts as masonry. */
import { ProblemError, type Problem } from '../job/problem.ts';
import type { Ring } from '../job/schema.ts';
import { between, distance, type Point } from './point.ts';
import type { Joint } from './stations.ts';

export interface BearingLimits {
  readonly lostMortar: NonNullable<Ring['lostMortar']>;
  /** Top of backing that counts as masonry, m; null where there is none. */
  readonly backingLevel: number | null;
}

/** @throws ProblemError when a joint is named that the ring does not have, or mortar is lost through a whole joint. */
export function bearingJoints(joints: readonly Joint[], { lostMortar, backingLevel }: BearingLimits): readonly Joint[] {
  if (lostMortar.length === 0 && backingLevel === null) return joints;
  const depths = lostDepths(joints, lostMortar);
  const left = joints[0]?.extrados.x ?? 0;
  const right = joints[joints.length - 1]?.extrados.x ?? 0;
  return joints.map((joint, j) => {
    const length = distance(joint.intrados, joint.extrados);
    const { intrados: atIntrados, extrados: atExtrados } = depths[j] as { intrados: number; extrados: number };
    const onward = atExtrados > 0 || backingLevel === null ? 0 : backedLength(joint, length, backingLevel, left, right);
    return {
      intrados: between(joint.intrados, joint.extrados, atIntrados / length),
      extrados: between(joint.intrados, joint.extrados, 1 - (atExtrados - onward) / length),
    };
  });
}

/** How far a joint runs on into the backing: to its top, or to the plumb line over the springing's extrados. */
function backedLength(
  { intrados, extrados }: Joint,
  length: number,
  level: number,
  left: number,
  right: number,
): number {
  const dx = (extrados.x - intrados.x) / length;
  const dy = (extrados.y - intrados.y) / length;
  const up = dy > 0 ? (level - extrados.y) / dy : Infinity;
  const out = dx < 0 ? (left - extrados.x) / dx : dx > 0 ? (right - extrados.x) / dx : Infinity;
  const onward = Math.min(up, out);
  return Number.isFinite(onward) ? Math.max(0, onward) : 0;
}

function lostDepths(joints: readonly Joint[], lostMortar: BearingLimits['lostMortar']) {
  const depths = joints.map(() => ({ intrados: 0, extrados: 0 }));
  const problems: Problem[] = [];
  lostMortar.forEach(({ face, depth, joint }, i) => {
    if (joint !== undefined && joint >= joints.length) {
      problems.push({
        path: `ring.lostMortar[${i}].joint`,
        value: String(joint),
        wrong: 'the ring has no such joint',
        right: `0 to ${joints.length - 1} here`,
      });
      return;
    }
    depths.forEach((lost, j) => {
      if (joint === undefined || joint === j) lost[face] = Math.max(lost[face], depth);
    });
  });
  depths.forEach((lost, j) => {
    const { intrados, extrados } = joints[j] as { intrados: Point; extrados: Point };
    if (lost.intrados + lost.extrados < distance(intrados, extrados) || problems.length > 0) return;
    problems.push({
      path: 'ring.lostMortar',
      value: `${lost.intrados + lost.extrados} m`,
      wrong: `the mortar lost at joint ${j} leaves nothing to carry`,
      right: `less than ${Number(distance(intrados, extrados).toPrecision(4))} m in all`,
    });
  });
  if (problems.length > 0) throw new ProblemError(problems);
  return depths;
}
