/**
 * Edits of the opening: the intrados by its shape, span and rise. Each takes a scheme and returns a scheme that is
 * valid again; what a shape cannot be is held at its nearest. Units: m, degrees. Axes: x right, y up, origin midway
 * between the springings.
 *
 * A measured profile is what was measured: span, rise and handles leave its points alone.
 */
import { LIMITS } from '../schema.ts';
import type { Profile, ProfileShape, Scheme } from '../schema.ts';
import { held, patched, unlessSame } from './patch.ts';
import { PROFILE_FIELDS, SMALLEST, drawnProfile, settledProfile, usualProfile } from './shapes.ts';

export interface BoardPoint {
  readonly x: number;
  readonly y: number;
}

/** Shapes that are set out from a few measures, and so can be chosen. */
export type DrawnShape = Exclude<ProfileShape, 'measured'>;

function withProfile(scheme: Scheme, profile: Profile): Scheme {
  return patched(scheme, { profile: unlessSame(scheme.profile, profile) });
}

/** Span between the springings of any profile, m. */
export function spanOf(profile: Profile): number {
  if (profile.shape !== 'measured') return profile.span;
  const xs = profile.points.map(([x]) => x);
  return Math.abs((xs.at(-1) ?? 0) - (xs[0] ?? 0));
}

/** Height of the crown of the intrados over the springing line, m; of a flat arch its camber. */
export function crownHeightOf(profile: Profile): number {
  switch (profile.shape) {
    case 'semicircular':
      return profile.span / 2;
    case 'flat':
      return profile.camber;
    case 'measured':
      return Math.max(...profile.points.map(([, y]) => y));
    default:
      return profile.rise;
  }
}

/**
 * Another shape over the same springings. The rise is kept where the new shape can have it and still look like itself;
 * otherwise the shape's usual proportion is taken. Fields that only the old shape has go; unknown ones stay.
 */
export function setProfileShape(scheme: Scheme, shape: DrawnShape): Scheme {
  const { profile } = scheme;
  if (profile.shape === shape) return scheme;
  const span = held(spanOf(profile), SMALLEST.span, LIMITS.length, SMALLEST.span);
  const unknown = Object.fromEntries(Object.entries(profile).filter(([field]) => !PROFILE_FIELDS.has(field)));
  const step = profile.step === undefined ? {} : { step: profile.step };
  const next = drawnProfile(shape, span, crownHeightOf(profile)) ?? usualProfile(shape, span);
  return patched(scheme, { profile: { ...next, ...step, ...unknown } });
}

/** Points of a measured intrados, left springing first; at least three. */
export function setMeasuredPoints(
  scheme: Scheme,
  points: readonly (readonly [number, number])[],
  extrados?: readonly (readonly [number, number])[],
): Scheme {
  if (points.length < 3 || points.flat().some((figure) => !Number.isFinite(figure))) return scheme;
  const outer = extrados === undefined ? {} : { extrados };
  return patched(scheme, { profile: { shape: 'measured', points, ...outer } });
}

/** Keeps the rise as far as the shape can have it over the new span; a semicircle follows its span. */
export function setSpan(scheme: Scheme, span: number): Scheme {
  const { profile } = scheme;
  if (profile.shape === 'measured') return scheme;
  const next = held(span, SMALLEST.span, LIMITS.length, profile.span);
  return next === profile.span ? scheme : withProfile(scheme, settledProfile({ ...profile, span: next }));
}

/** Keeps the span; but a semicircle's span is twice its rise, and a flat arch takes the rise as its camber. */
export function setRise(scheme: Scheme, rise: number): Scheme {
  const { profile } = scheme;
  if (!Number.isFinite(rise)) return scheme;
  switch (profile.shape) {
    case 'measured':
      return scheme;
    case 'semicircular':
      return setSpan(scheme, 2 * rise);
    case 'flat':
      return withProfile(scheme, settledProfile({ ...profile, camber: rise }));
    default:
      return rise === profile.rise ? scheme : withProfile(scheme, settledProfile({ ...profile, rise }));
  }
}

/** The measures that only some shapes have, and the step of the springings. */
export type ShapeMeasure = 'haunchRadius' | 'haunchAngle' | 'skewbackAngle' | 'camber' | 'step';

/** Sets a measure where the shape has it; `undefined` takes an optional one away. Other shapes stay as they are. */
export function setShapeMeasure(scheme: Scheme, measure: ShapeMeasure, value: number | undefined): Scheme {
  const { profile } = scheme;
  const optional = measure === 'step' || profile.shape === 'three-centred';
  const has =
    measure === 'step' || measure in profile || (measure === 'haunchRadius' && profile.shape === 'three-centred');
  if (!has || (value === undefined ? !optional : !Number.isFinite(value))) return scheme;
  const next = patched<Profile>(profile, { [measure]: value });
  return withProfile(scheme, next.shape === 'measured' ? next : settledProfile(next));
}

/** The crown handle dragged: its height is the rise. */
export function moveCrown(scheme: Scheme, point: BoardPoint): Scheme {
  return setRise(scheme, point.y);
}

/** A springing handle dragged: the opening grows or shrinks alike on both sides of its middle. */
export function moveSpringing(scheme: Scheme, side: 'left' | 'right', point: BoardPoint): Scheme {
  return setSpan(scheme, 2 * (side === 'left' ? -point.x : point.x));
}
