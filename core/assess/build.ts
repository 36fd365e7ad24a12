/** From a scheme with its defaults filled to figures for the statics: ring, forces and system. */
import { buildRing, type RingForm, type RingGeometry } from '../geometry/ring.ts';
import type { ResolvedScheme } from '../job/defaults.ts';
import type { Block } from '../loading/forces.ts';
import { loadRing } from '../loading/load-ring.ts';
import { ringSystem, type RingSystem } from '../statics/system.ts';

export interface BuiltScheme {
  readonly resolved: ResolvedScheme;
  readonly ring: RingGeometry;
  readonly blocks: readonly Block[];
  readonly system: RingSystem;
}

/** @throws ProblemError with paths from the scheme's root. */
export function buildScheme(resolved: ResolvedScheme): BuiltScheme {
  const ring = buildRing(ringForm(resolved));
  const blocks = loadRing(ring, resolved);
  return { resolved, ring, blocks, system: ringSystem(ring.joints, blocks) };
}

export function ringForm({ profile, ring }: ResolvedScheme): RingForm {
  return {
    profile,
    thickness: { crown: ring.thickness, springing: ring.thickness },
    voussoirs: ring.voussoirs,
    joints: ring.joints,
  };
}

/** The same scheme with another ring thickness, m. */
export const withThickness = (resolved: ResolvedScheme, thickness: number): ResolvedScheme => ({
  ...resolved,
  ring: { ...resolved.ring, thickness },
});
