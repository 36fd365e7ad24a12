import type { Point } from '../geometry/point.ts';

export type SupportSide = 'left' | 'right';

/**
 * Derand's and Blondel's construction: the intrados is cut in three equal lengths; the chord from the outer cut to the
 * springing is carried on by its own length, and a plumb line through its end is the back of the support. Depth of the
 * support in m, measured level from the springing; negative where the carried chord ends over the opening, as it may
 * in a horseshoe arch. From memory, recomputed from the construction.
 */
export function supportDepth(pointAtShare: (share: number) => Point, side: SupportSide): number {
  const [springing, cut, outwards] =
    side === 'left' ? [pointAtShare(0), pointAtShare(1 / 3), -1] : [pointAtShare(1), pointAtShare(2 / 3), 1];
  // springing − cut is the chord, pointing out; its end lies as far beyond the springing
  return outwards * (springing.x - cut.x);
}
