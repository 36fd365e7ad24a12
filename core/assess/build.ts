/** From a scheme with its defaults filled to figures for the statics: ring, forces and system. */
import { bearingJoints } from '../geometry/bearing.ts';
import { buildRing, type RingForm, type RingGeometry } from '../geometry/ring.ts';
import type { Joint } from '../geometry/stations.ts';
import type { ResolvedScheme } from '../job/defaults.ts';
import type { Block } from '../loading/forces.ts';
import { loadRing } from '../loading/load-ring.ts';
import { ringSystem, type RingSystem } from '../statics/system.ts';

export interface BuiltScheme {
  readonly resolved: ResolvedScheme;
  readonly ring: RingGeometry;
  /** What each joint carries on: the ring's joints, less lost mortar, with backing that counts as masonry. */
  readonly joints: readonly Joint[];
  readonly blocks: readonly Block[];
  readonly system: RingSystem;
}

/** @throws ProblemError with paths from the scheme's root. */
export function buildScheme(
  resolved: ResolvedScheme,
  offTheRing: Parameters<typeof loadRing>[2] = 'refused',
): BuiltScheme {
  const ring = buildRing(ringForm(resolved));
  const joints = bearingJoints(ring.joints, {
    lostMortar: resolved.ring.lostMortar,
    backingLevel: resolved.backing?.counts === 'masonry' ? resolved.backing.level : null,
  });
  const blocks = loadRing(ring, resolved, offTheRing);
  return { resolved, ring, joints, blocks, system: ringSystem(joints, blocks) };
}

function ringForm({ profile, ring }: ResolvedScheme): RingForm {
  return {
    profile,
    thickness: { crown: ring.thickness, springing: ring.springingThickness },
    voussoirs: ring.voussoirs,
    joints: ring.joints,
  };
}

/** The same scheme with another ring thickness at the crown, m; at the springings it changes in proportion. */
export function withThickness(resolved: ResolvedScheme, thickness: number): ResolvedScheme {
  const { ring } = resolved;
  const even = ring.springingThickness === ring.thickness;
  const springingThickness = even ? thickness : (ring.springingThickness * thickness) / ring.thickness;
  return { ...resolved, ring: { ...ring, thickness, springingThickness } };
}

/** The same scheme with a ring as thick as entered in place of a back that was measured. */
export function withoutMeasuredBack(resolved: ResolvedScheme): ResolvedScheme {
  const { profile } = resolved;
  if (profile.shape !== 'measured' || profile.extrados === undefined) return resolved;
  const { shape, points, step } = profile;
  return { ...resolved, profile: { shape, points, step } };
}
