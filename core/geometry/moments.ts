/**
 * Area and first moments of a plane figure as integrals along its boundary (Green's theorem):
 *
 *     area = ½ ∮ (x dy − y dx),   sx = ∫ x dA = ½ ∮ x² dy,   sy = ∫ y dA = −½ ∮ y² dx
 *
 * Each stretch of boundary adds its own part, so a block is exact as soon as its stretches are. Coordinates are taken
 * from an origin near the figure: with a far origin a thin block would be the small difference of large numbers.
 */
import type { Point } from './point.ts';

export interface Moments {
  /** m² */
  readonly area: number;
  /** m³, about the y axis through the origin chosen. */
  readonly sx: number;
  /** m³, about the x axis through the origin chosen. */
  readonly sy: number;
}

/** The stretch of boundary run straight from a to b. */
export function lineMoments(a: Point, b: Point, origin: Point): Moments {
  const ax = a.x - origin.x;
  const ay = a.y - origin.y;
  const bx = b.x - origin.x;
  const by = b.y - origin.y;
  return {
    area: (ax * by - ay * bx) / 2,
    sx: ((by - ay) * (ax * ax + ax * bx + bx * bx)) / 6,
    sy: (-(bx - ax) * (ay * ay + ay * by + by * by)) / 6,
  };
}

/** An angle (rad, anticlockwise positive) with its sine and cosine, which neighbouring stretches share. */
export interface Angle {
  readonly angle: number;
  readonly sin: number;
  readonly cos: number;
}

export const angleOf = (angle: number): Angle => ({ angle, sin: Math.sin(angle), cos: Math.cos(angle) });

/** The stretch of boundary along a circle about `centre` from one angle to another. */
export function arcMoments(centre: Point, radius: number, from: Angle, to: Angle, origin: Point): Moments {
  const cx = centre.x - origin.x;
  const cy = centre.y - origin.y;
  const { sin: sin0, cos: cos0 } = from;
  const { sin: sin1, cos: cos1 } = to;
  const turn = to.angle - from.angle;
  const dSin = sin1 - sin0;
  const dCos = cos1 - cos0;
  // ∫cos² , ∫sin² , ∫cos³ , ∫sin³ over the arc
  const halfSin2 = (sin1 * cos1 - sin0 * cos0) / 2;
  const cos2 = turn / 2 + halfSin2;
  const sin2 = turn / 2 - halfSin2;
  const cos3 = dSin - (sin1 ** 3 - sin0 ** 3) / 3;
  const sin3 = -dCos + (cos1 ** 3 - cos0 ** 3) / 3;
  return {
    area: (radius * (cx * dSin - cy * dCos + radius * turn)) / 2,
    sx: (radius * (cx * cx * dSin + 2 * cx * radius * cos2 + radius * radius * cos3)) / 2,
    sy: (radius * (-cy * cy * dCos + 2 * cy * radius * sin2 + radius * radius * sin3)) / 2,
  };
}

export function centroid(moments: Moments, origin: Point): Point {
  return { x: origin.x + moments.sx / moments.area, y: origin.y + moments.sy / moments.area };
}
