import type { RingGeometry } from '../geometry/ring.ts';
import type { BlockForces } from './forces.ts';

/** The ring's own weight at the blocks' exact centroids. `unitWeight` kN/m³, `breadth` m. */
export function addSelfWeight(forces: BlockForces, ring: RingGeometry, unitWeight: number, breadth: number): void {
  if (unitWeight === 0) return;
  ring.blocks.forEach(({ area, centroid: { x, y } }, k) => {
    forces[k]?.push({ x, y, fx: 0, fy: -area * unitWeight * breadth, from: 'self-weight' });
  });
}
