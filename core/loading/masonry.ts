/** Weights of the ring and of what lies on it, with their places: exact areas and centroids, kN on the whole breadth. */
import { centroid, lineMoments, type Moments } from '../geometry/moments.ts';
import type { RingGeometry, SkyFace } from '../geometry/ring.ts';
import type { BlockForces } from './forces.ts';
import type { Sky } from './sky.ts';

/** The ring's own weight. `unitWeight` kN/m³, `breadth` m. */
export function addSelfWeight(forces: BlockForces, ring: RingGeometry, unitWeight: number, breadth: number): void {
  if (unitWeight === 0) return;
  ring.blocks.forEach(({ area, centroid: { x, y } }, k) => {
    forces[k]?.push({ x, y, fx: 0, fy: -area * unitWeight * breadth, from: 'self-weight' });
  });
}

/** What stands between the back of the ring and a level top at `top` (m). `unitWeight` kN/m³, `breadth` m. */
export function addAbove(
  forces: BlockForces,
  sky: Sky,
  top: number,
  unitWeight: number,
  breadth: number,
): void {
  if (unitWeight === 0) return;
  for (const k of sky.open) {
    const face = sky.faces[k];
    if (!face) continue;
    const column = columnMoments(face, top);
    if (!(column.area > 0)) continue;
    const { x, y } = centroid(column, face.origin);
    forces[k]?.push({ x, y, fx: 0, fy: -column.area * unitWeight * breadth, from: 'above' });
  }
}

/** The column between a stretch of the back and the level top: along the back, up, back along the top, down. */
function columnMoments(face: SkyFace, top: number): Moments {
  const { origin } = face;
  const right = { x: face.to.x, y: top };
  const left = { x: face.from.x, y: top };
  const parts = [
    face.moments,
    lineMoments(face.to, right, origin),
    lineMoments(right, left, origin),
    lineMoments(left, face.from, origin),
  ];
  return {
    area: parts.reduce((sum, part) => sum + part.area, 0),
    sx: parts.reduce((sum, part) => sum + part.sx, 0),
    sy: parts.reduce((sum, part) => sum + part.sy, 0),
  };
}
