import type { BlockForces } from './forces.ts';
import { backAt, type Sky } from './sky.ts';

/**
 * Spreads an even weight over the blocks between two places; each part acts at its middle. What lies beyond the ring
 * rests on what holds the arch. `perMetre` kN/m, downwards; `height` of the weight's middle, m, the back where not given.
 */
export function addEvenly(
  forces: BlockForces,
  sky: Sky,
  from: number,
  to: number,
  perMetre: number,
  source: string,
  height?: number,
): void {
  for (const block of sky.open) {
    const face = sky.faces[block];
    if (!face) continue;
    const a = Math.max(from, face.from.x);
    const b = Math.min(to, face.to.x);
    if (!(a < b)) continue;
    const x = (a + b) / 2;
    forces[block]?.push({ x, y: height ?? backAt(sky, block, x), fx: 0, fy: -perMetre * (b - a), from: source });
  }
}
