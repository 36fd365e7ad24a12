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

/**
 * The same scheme with another ring thickness at the crown, m; at the springings it changes in proportion, and a
 * measured back gives way to an even ring.
 */
export function withThickness(resolved: ResolvedScheme, thickness: number): ResolvedScheme {
  const { ring, profile } = resolved;
  const even = ring.springingThickness === ring.thickness;
  const springingThickness = even ? thickness : (ring.springingThickness * thickness) / ring.thickness;
  const evenRing = { ...resolved, ring: { ...ring, thickness, springingThickness } };
  if (profile.shape !== 'measured') return evenRing;
  const { shape, points, step } = profile;
  return { ...evenRing, profile: { shape, points, step } };
}
