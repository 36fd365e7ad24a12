import type { Profile } from '../job/schema.ts';
import type { Curve } from './curve.ts';
import type { Point } from './point.ts';
import { circleOver } from './profile.ts';
import { Straight } from './straight.ts';

/**
 * The faces of a flat arch: soffit straight or with a slight camber, straight top, joints that all point at the place
 * where the two skewbacks meet. Thickness is measured at mid-span. Common practice.
 */
export function flatFaces(profile: Extract<Profile, { readonly shape: 'flat' }>, thickness: number) {
  const a = profile.span / 2;
  const { camber } = profile;
  const slope = (profile.step ?? 0) / profile.span;
  const raised = (point: Point): Point => ({ x: point.x, y: point.y + slope * point.x });
  const depth = a * Math.tan((profile.skewbackAngle * Math.PI) / 180);
  const vertical = profile.skewbackAngle === 90;
  const top = camber + thickness;
  // where the joint through a point of the level soffit meets the level top: straight up, or along the ray from below
  const topX = (x: number, y: number): number => (vertical ? x : (x * (top + depth)) / (y + depth));
  const topEnd = topX(a, 0);
  const intrados: Curve =
    camber === 0 ? new Straight(raised({ x: -a, y: 0 }), raised({ x: a, y: 0 })) : circleOver(a, camber).sheared(slope);
  const extrados = new Straight(raised({ x: -topEnd, y: top }), raised({ x: topEnd, y: top }));
  const across = (u: number): number => {
    const point = intrados.at(u);
    return extrados.parameterAtX(topX(point.x, point.y - slope * point.x));
  };
  return { intrados, extrados, across };
}
