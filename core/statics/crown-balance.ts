/**
 * The moment balance about the crown as done by hand: the ring as two halves, hinged at mid-ring on both springings
 * and at the crown. Horizontal thrust H = P (a − x̄)/h for a half of weight P whose centre lies x̄ from the crown, with
 * the springing at a and the crown h above it; common practice. Halves may differ; then both balances are solved together.
 */
import { midpoint, type Point } from '../geometry/point.ts';
import type { RingGeometry } from '../geometry/ring.ts';
import type { Block } from '../loading/forces.ts';
import { crossing } from './line.ts';
import { stateThrough } from './states.ts';
import { ringSystem, type RingSystem } from './system.ts';

export interface CrownBalance {
  /** kN, at the left springing. */
  readonly horizontal: number;
  /** Vertical load on each springing, kN, positive downwards. */
  readonly leftVertical: number;
  readonly rightVertical: number;
  /** Height of mid-ring at the crown over the middle of the two springings' mid-ring, m. */
  readonly lever: number;
  /** Whether this line stays within the ring at every joint. */
  readonly inside: boolean;
}

/** A share of a joint beyond its ends that still counts as on it: rounding only. */
const ON_EDGE = 1e-9;

/**
 * @param system the ring with its loads.
 * @param load puts the same loads on the ring cut at the crown; called only where no joint stands there.
 * @returns null when the three hinges stand in one line and no balance exists.
 */
export function crownBalance(
  whole: RingGeometry,
  wholeSystem: RingSystem,
  load: (ring: RingGeometry) => readonly Block[],
): CrownBalance | null {
  const { ring, crown } = whole.splitAtCrown();
  if (crown <= 0 || crown >= ring.joints.length - 1) return null;
  const system = ring === whole ? wholeSystem : ringSystem(ring.joints, load(ring));
  const last = system.joints - 1;
  const atMidRing = (joint: number) => ({ joint, share: 0.5 });
  const state = stateThrough(system, [atMidRing(0), atMidRing(crown), atMidRing(last)]);
  if (state === null) return null;
  const middles = [0, crown, last].map((j) => {
    const joint = ring.joints[j];
    return joint ? midpoint(joint.intrados, joint.extrados) : { x: 0, y: 0 };
  }) as [Point, Point, Point];
  let inside = true;
  for (let j = 0; j <= last; j++) {
    const share = crossing(system, state, j);
    if (share !== null && (share < -ON_EDGE || share > 1 + ON_EDGE)) inside = false;
  }
  const { force } = system.frame;
  return {
    horizontal: (state[0] as number) * force,
    leftVertical: (state[1] as number) * force,
    rightVertical: -((state[1] as number) + (system.sums.fy[last] as number)) * force,
    lever: middles[1].y - (middles[0].y + middles[2].y) / 2,
    inside,
  };
}
