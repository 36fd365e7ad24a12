/**
 * Geometric factor of safety (Heyman 1966; from memory): shrink every joint about its middle to the smallest share in
 * which a line of thrust still fits; the factor is the inverse of that share. The share of a state is the largest
 * |m| / (N t/2) over the joints, m about mid-joint.
 */
import type { Hinge } from './hinge.ts';
import { halfMomentForms, jointLengths, momentForms } from './joint-forms.ts';
import { leastRatio } from './ratio.ts';
import { hingesOf } from './rows.ts';
import type { RingSystem } from './system.ts';

export interface MiddleShare {
  /** Smallest share of every joint, about its middle, in which a line fits; above 1 the ring does not stand. */
  readonly share: number;
  /** (X0, Y0, M0), scaled: the line that stays nearest the middle; null when it is only approached as the thrust grows. */
  readonly state: Float64Array | null;
  /** Where the state goes as the thrust grows, when the share is only approached so; else null. */
  readonly direction: Float64Array | null;
  /** Where that line touches the shrunken joints, left to right. */
  readonly touches: readonly Hinge[];
}

/** The smallest share, or null when no line crosses every joint in compression, however thick the ring were made. */
export function leastMiddleShare(system: RingSystem): MiddleShare | null {
  const least = leastRatio(momentForms(system), halfMomentForms(system), jointLengths(system));
  if (least === null) return null;
  // rows +m and −m are the extrados and the intrados of the shrunken joint, in the order of the line's own rows
  const touching = least.ratio === 0 ? [] : least.basis.filter(({ row }) => row < 2 * system.joints);
  const { ratio: share, state, direction } = least;
  return { share, state, direction, touches: hingesOf(touching).map(({ hinge }) => hinge) };
}
