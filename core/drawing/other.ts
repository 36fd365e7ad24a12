/**
 * Another scheme laid over the elevation to compare the two: the outline of its ring and its lines of least and greatest
 * thrust, in lighter pens with a dot between their dashes. It is put where the springings of both fall together.
 */
import type { AssessedScheme } from '../assess/assess.ts';
import { midpoint, type Point } from '../geometry/point.ts';
import type { RingGeometry } from '../geometry/ring.ts';
import { put, type Draught } from './draught.ts';
import { bodyOutline } from './faces.ts';
import { outlined, polyline, shifted } from './path.ts';
import { unbroken } from './thrust.ts';

export interface OtherScheme {
  readonly assessed: AssessedScheme;
  /** By which the legend tells it from the scheme that is shown. */
  readonly name: string;
}

export function drawOther(draught: Draught, { assessed }: OtherScheme): void {
  const { ring, result } = assessed;
  const here = betweenSpringings(draught.ring);
  const there = betweenSpringings(ring);
  const by = { x: here.x - there.x, y: here.y - there.y };
  const lines = (['least', 'greatest'] as const).flatMap((state) =>
    unbroken(result.thrust[state]?.line ?? []).map((run) => polyline(`other-${state}`, run)),
  );
  const outline = outlined('other-outline', bodyOutline(ring, 0, ring.blocks.length));
  for (const path of [outline, ...lines]) {
    put(draught, 'other-scheme', shifted(path, by));
  }
}

/** Midway between the springings of the intrados. */
function betweenSpringings({ joints }: RingGeometry): Point {
  return midpoint(joints[0]!.intrados, joints.at(-1)!.intrados);
}
