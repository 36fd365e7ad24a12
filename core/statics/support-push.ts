/** The push of the arch on what holds it, for one state of the ring. */
import { between, type Point } from '../geometry/point.ts';
import type { Joint } from '../geometry/stations.ts';
import { crossing, type State } from './line.ts';
import type { Push } from './support-body.ts';
import type { RingSystem } from './system.ts';

/**
 * @param springing end of the intrados on that side, where u = 0 and z = 0.
 * @returns null where the resultant runs along the springing joint and crosses it nowhere.
 */
export function pushAtSpringing(
  system: RingSystem,
  joints: readonly Joint[],
  state: State,
  side: 'left' | 'right',
  springing: Point,
): Push | null {
  const j = side === 'left' ? 0 : system.joints - 1;
  const outwards = side === 'left' ? -1 : 1;
  const share = crossing(system, state, j);
  const joint = joints[j];
  if (share === null || joint === undefined) return null;
  const at = between(joint.intrados, joint.extrados, share);
  const { force } = system.frame;
  const x = (state[0] as number) + (system.sums.fx[j] as number);
  const y = (state[1] as number) + (system.sums.fy[j] as number);
  return {
    horizontal: x * force,
    vertical: -outwards * y * force,
    u: outwards * (at.x - springing.x),
    z: springing.y - at.y,
  };
}
