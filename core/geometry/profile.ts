/**
 * The intrados of every shape, as smooth curves from left springing to right springing.
 * Formulas: plane geometry of the shapes as masons set them out (a = half-span, f = rise); common practice.
 */
import { classicalHaunchRadius } from '../job/defaults.ts';
import { ProblemError, type Problem } from '../job/problem.ts';
import type { Profile, ProfileShape } from '../job/schema.ts';
import { Arc } from './arc.ts';
import type { OffsettableCurve } from './curve.ts';
import { measuredIntrados } from './measured.ts';
import { SmoothCurve } from './smooth-curve.ts';

type Of<Shape extends ProfileShape> = Extract<Profile, { readonly shape: Shape }>;
/** Shapes whose ring is the intrados carried outwards along its normals; a flat arch is built otherwise. */
export type CurvedProfile = Exclude<Profile, Of<'flat'>>;

/** Angle within which two directions count as one: rounding of atan2 and acos on figures of order one, with room. */
const SAME_ANGLE = 1e-9;

/** The intrados of a profile, left springing first; made once for a profile, as rings of many thicknesses stand on it. */
export function intradosCurves(profile: CurvedProfile): readonly OffsettableCurve[] {
  const held = MADE.get(profile);
  if (held !== undefined) return held;
  const curves = makeCurves(profile);
  MADE.set(profile, curves);
  return curves;
}

const MADE = new WeakMap<CurvedProfile, readonly OffsettableCurve[]>();

function makeCurves(profile: CurvedProfile): OffsettableCurve[] {
  const curves = curvesWithLevelSprings(profile);
  const step = profile.shape === 'measured' ? 0 : (profile.step ?? 0);
  if (step === 0) return curves;
  const slope = step / profileSpan(profile);
  return curves.map((curve) => curve.sheared(slope));
}

/** Distance between the springings along the horizontal, m. */
export function profileSpan(profile: Profile): number {
  if (profile.shape !== 'measured') return profile.span;
  const first = profile.points[0] as readonly [number, number];
  const last = profile.points[profile.points.length - 1] as readonly [number, number];
  return last[0] - first[0];
}

function curvesWithLevelSprings(profile: CurvedProfile): OffsettableCurve[] {
  switch (profile.shape) {
    case 'semicircular':
      return [new Arc({ x: 0, y: 0 }, profile.span / 2, Math.PI, 0)];
    case 'segmental':
      return segmental(profile);
    case 'pointed':
      return pointed(profile);
    case 'three-centred':
      return threeCentred(profile);
    case 'four-centred':
      return fourCentred(profile);
    case 'horseshoe':
      return horseshoe(profile);
    case 'elliptical':
      return elliptical(profile);
    case 'parabolic':
      return parabolic(profile);
    case 'catenary':
      return catenary(profile);
    case 'measured':
      return [measuredIntrados(profile)];
  }
}

function refuse(problem: Problem): never {
  throw new ProblemError([problem]);
}

/** Circle through both springings and the crown: R = (a² + f²)/2f. */
export function circleOver(halfSpan: number, rise: number): Arc {
  const radius = (halfSpan * halfSpan + rise * rise) / (2 * rise);
  const centre = { x: 0, y: rise - radius };
  const left = Math.PI - Math.atan2(-centre.y, halfSpan);
  return new Arc(centre, radius, left, Math.PI - left);
}

function segmental({ span, rise }: Of<'segmental'>): Arc[] {
  if (rise > span / 2) {
    refuse({
      path: 'profile.rise',
      value: `${rise} m`,
      wrong: 'a segmental arch cannot rise more than half its span',
      right: `at most ${span / 2} m here, or choose a horseshoe or pointed profile`,
    });
  }
  return [circleOver(span / 2, rise)];
}

function horseshoe({ span, rise }: Of<'horseshoe'>): Arc[] {
  if (rise <= span / 2) {
    refuse({
      path: 'profile.rise',
      value: `${rise} m`,
      wrong: 'a horseshoe arch rises more than half its span',
      right: `more than ${span / 2} m here, or choose a segmental profile`,
    });
  }
  return [circleOver(span / 2, rise)];
}

/** Two arcs with centres on the springing line: R = (f² + a²)/s. */
function pointed({ span, rise }: Of<'pointed'>): Arc[] {
  const a = span / 2;
  if (rise < a) {
    refuse({
      path: 'profile.rise',
      value: `${rise} m`,
      wrong: 'a pointed arch with its centres on the springing line rises at least half its span',
      right: `at least ${a} m here, or choose a segmental or four-centred profile`,
    });
  }
  const radius = (rise * rise + a * a) / span;
  const apex = Math.atan2(rise, radius - a);
  return mirrored([new Arc({ x: radius - a, y: 0 }, radius, Math.PI, Math.PI - apex)]);
}

/** The left half given from springing to crown; the right half is its mirror image. */
function mirrored(left: readonly Arc[]): Arc[] {
  const right = left
    .map(({ centre, radius, from, to }) => new Arc({ x: -centre.x, y: centre.y }, radius, Math.PI - to, Math.PI - from))
    .reverse();
  return [...left, ...right];
}

/** R = (a² − 2ar + f²)/(2(f − r)); haunch centres (±(a − r), 0), crown centre (0, f − R). */
function threeCentred({ span, rise, haunchRadius }: Of<'three-centred'>): Arc[] {
  const a = span / 2;
  if (rise >= a) {
    refuse({
      path: 'profile.rise',
      value: `${rise} m`,
      wrong: 'a three-centred arch rises less than half its span',
      right: `less than ${a} m here, or choose a semicircular or pointed profile`,
    });
  }
  const r = haunchRadius ?? classicalHaunchRadius(span, rise);
  if (r >= rise) {
    refuse({
      path: 'profile.haunchRadius',
      value: `${r} m`,
      wrong: 'the haunch radius of a three-centred arch is smaller than its rise',
      right: `less than ${rise} m here`,
    });
  }
  const radius = (a * a - 2 * a * r + rise * rise) / (2 * (rise - r));
  const turn = Math.atan2(radius - rise, a - r);
  return [
    new Arc({ x: r - a, y: 0 }, r, Math.PI, Math.PI - turn),
    new Arc({ x: 0, y: rise - radius }, radius, Math.PI - turn, turn),
    new Arc({ x: a - r, y: 0 }, r, turn, 0),
  ];
}

/** k = ((a − r)² + f² − r²)/(2(r + (a − r)cos θ − f sin θ)), R = k + r; upper centre (−(a − r) + k cos θ, −k sin θ). */
function fourCentred({ span, rise, haunchRadius: r, haunchAngle }: Of<'four-centred'>): Arc[] {
  const a = span / 2;
  if (r >= a) {
    refuse({
      path: 'profile.haunchRadius',
      value: `${r} m`,
      wrong: 'the haunch radius of a four-centred arch is smaller than half its span',
      right: `less than ${a} m here`,
    });
  }
  const theta = (haunchAngle * Math.PI) / 180;
  const k = ((a - r) ** 2 + rise * rise - r * r) / (2 * (r + (a - r) * Math.cos(theta) - rise * Math.sin(theta)));
  const centre = { x: r - a + k * Math.cos(theta), y: -k * Math.sin(theta) };
  if (!(k > 0) || !(centre.x >= 0)) {
    refuse({
      path: 'profile.haunchAngle',
      value: `${haunchAngle}°`,
      wrong: 'no upper arc meets the haunch arc there and the crown at this rise',
      right: 'change the haunch angle, the haunch radius or the rise until the upper centre lies beyond the axis',
    });
  }
  const apex = Math.atan2(rise - centre.y, -centre.x);
  if (apex > Math.PI - theta + SAME_ANGLE) {
    refuse({
      path: 'profile.haunchAngle',
      value: `${haunchAngle}°`,
      wrong: 'the haunch arc would pass the crown',
      right: 'choose a smaller haunch angle or a greater rise',
    });
  }
  return mirrored([
    new Arc({ x: r - a, y: 0 }, r, Math.PI, Math.PI - theta),
    new Arc(centre, k + r, Math.PI - theta, apex),
  ]);
}

function elliptical({ span, rise }: Of<'elliptical'>): SmoothCurve[] {
  const a = span / 2;
  return [
    new SmoothCurve(0, Math.PI, (u) => {
      const x = -a * Math.cos(u);
      const y = rise * Math.sin(u);
      return { x, y, dx: a * Math.sin(u), dy: rise * Math.cos(u), ddx: -x, ddy: -y };
    }),
  ];
}

function parabolic({ span, rise }: Of<'parabolic'>): SmoothCurve[] {
  const a = span / 2;
  const bend = rise / (a * a);
  return [
    new SmoothCurve(-a, a, (x) => ({ x, y: rise - bend * x * x, dx: 1, dy: -2 * bend * x, ddx: 0, ddy: -2 * bend })),
  ];
}

/** f = c (cosh(a/c) − 1), solved for the parameter c. */
export function catenaryParameter(halfSpan: number, rise: number): number {
  // in z = a/c: (cosh z − 1)/z = f/a, rising from 0; Newton from the parabola's z = 2f/a, which lies above the root
  const ratio = rise / halfSpan;
  let z = Math.min(2 * ratio, 2 + Math.log1p(2 * ratio) * 2);
  for (let step = 0; step < 100; step++) {
    const f = 2 * Math.sinh(z / 2) ** 2 - ratio * z;
    const next = z - f / (Math.sinh(z) - ratio);
    if (Math.abs(next - z) <= 4 * Number.EPSILON * z) break;
    z = next;
  }
  return halfSpan / z;
}

function catenary({ span, rise }: Of<'catenary'>): SmoothCurve[] {
  const a = span / 2;
  const c = catenaryParameter(a, rise);
  return [
    new SmoothCurve(-a, a, (x) => {
      const sinh = Math.sinh(x / c);
      const cosh = Math.cosh(x / c);
      return { x, y: rise - 2 * c * Math.sinh(x / (2 * c)) ** 2, dx: 1, dy: -sinh, ddx: 0, ddy: -cosh / c };
    }),
  ];
}
