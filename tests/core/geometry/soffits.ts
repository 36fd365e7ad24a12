/**
 * The soffit of every shape by formulas of its own: an implicit equation F(x, y) = 0 and the place of its highest point.
 * Written from plane geometry, not from the core, so that a test against them can fail.
 */
import type { Profile } from '../../../core/job/schema.ts';

export interface Soffit {
  readonly profile: Exclude<Profile, { shape: 'measured' | 'flat' }>;
  /** Zero on the curve, positive outside; metres or a multiple of them. */
  readonly equation: (x: number, y: number) => number;
  readonly crown: number;
  /** Length of the soffit, m, and the angle through which it turns between the springings, rad. */
  readonly length: number;
  readonly turning: number;
}

const fromCentre = (cx: number, cy: number, radius: number) => (x: number, y: number) =>
  Math.hypot(x - cx, y - cy) - radius;

/** Simpson's rule, far finer than any tolerance here. */
export function integral(f: (u: number) => number, from: number, to: number, parts = 20_000): number {
  const step = (to - from) / parts;
  let sum = f(from) + f(to);
  for (let i = 1; i < parts; i++) sum += f(from + i * step) * (i % 2 === 1 ? 4 : 2);
  return (sum * step) / 3;
}

const semicircular: Soffit = {
  profile: { shape: 'semicircular', span: 5 },
  equation: fromCentre(0, 0, 2.5),
  crown: 2.5,
  length: 2.5 * Math.PI,
  turning: Math.PI,
};

// a 3, f 1: R = 5, centre 4 below; half angle asin(3/5)
const segmental: Soffit = {
  profile: { shape: 'segmental', span: 6, rise: 1 },
  equation: fromCentre(0, -4, 5),
  crown: 1,
  length: 10 * Math.asin(0.6),
  turning: 2 * Math.asin(0.6),
};

// a 3, f 9: R = 5, centre 4 above
const horseshoe: Soffit = {
  profile: { shape: 'horseshoe', span: 6, rise: 9 },
  equation: fromCentre(0, 4, 5),
  crown: 9,
  length: 10 * (Math.PI - Math.asin(0.6)),
  turning: 2 * (Math.PI - Math.asin(0.6)),
};

// equilateral: each half struck from the other springing
const pointed: Soffit = {
  profile: { shape: 'pointed', span: 4, rise: 2 * Math.sqrt(3) },
  equation: (x, y) => Math.hypot(Math.abs(x) + 2, y) - 4,
  crown: 2 * Math.sqrt(3),
  length: (8 * Math.PI) / 3,
  turning: (2 * Math.PI) / 3,
};

// a 5, f 3, r 2: R = (25 − 20 + 9)/2 = 7, crown centre 4 below; the arcs meet on the line through (3, 0) and (0, −4)
const threeCentred: Soffit = {
  profile: { shape: 'three-centred', span: 10, rise: 3, haunchRadius: 2 },
  equation: (x, y) => {
    const haunch = Math.abs(x) - 3;
    return haunch > 0 && y < (4 / 3) * haunch ? Math.hypot(haunch, y) - 2 : Math.hypot(x, y + 4) - 7;
  },
  crown: 3,
  length: 4 * Math.atan2(4, 3) + 14 * Math.atan2(3, 4),
  turning: Math.PI,
};

// haunch r 1 about (∓2, 0); upper centre (1, −4) beyond the axis, 5 from (−2, 0), so R = 6 and f = √35 − 4
const fourCentred: Soffit = {
  profile: {
    shape: 'four-centred',
    span: 6,
    rise: Math.sqrt(35) - 4,
    haunchRadius: 1,
    haunchAngle: (Math.atan2(4, 3) * 180) / Math.PI,
  },
  equation: (x, y) => {
    const out = Math.abs(x);
    return out > 2 && y < (4 / 3) * (out - 2) ? Math.hypot(out - 2, y) - 1 : Math.hypot(out + 1, y + 4) - 6;
  },
  crown: Math.sqrt(35) - 4,
  length: 2 * (Math.atan2(4, 3) + 6 * (Math.acos(1 / 6) - Math.atan2(4, 3))),
  turning: 2 * Math.acos(1 / 6),
};

const elliptical: Soffit = {
  profile: { shape: 'elliptical', span: 6, rise: 2 },
  equation: (x, y) => (x / 3) ** 2 + (y / 2) ** 2 - 1,
  crown: 2,
  length: integral((u) => Math.hypot(3 * Math.sin(u), 2 * Math.cos(u)), 0, Math.PI),
  turning: Math.PI,
};

// slope 2f/a at the springings; half length by the closed form of ∫√(1 + (2fx/a²)²) dx
const parabolic: Soffit = {
  profile: { shape: 'parabolic', span: 6, rise: 2 },
  equation: (x, y) => y - 2 * (1 - (x / 3) ** 2),
  crown: 2,
  length: 3 * Math.hypot(1, 4 / 3) + (9 / 4) * Math.asinh(4 / 3),
  turning: 2 * Math.atan(4 / 3),
};

// c 2, a 3: f = 2 (cosh 1.5 − 1)
const catenary: Soffit = {
  profile: { shape: 'catenary', span: 6, rise: 2 * (Math.cosh(1.5) - 1) },
  equation: (x, y) => y + 2 * (Math.cosh(x / 2) - Math.cosh(1.5)),
  crown: 2 * (Math.cosh(1.5) - 1),
  length: 4 * Math.sinh(1.5),
  turning: 2 * Math.atan(Math.sinh(1.5)),
};

export const SOFFITS: readonly Soffit[] = [
  semicircular,
  segmental,
  horseshoe,
  pointed,
  threeCentred,
  fourCentred,
  elliptical,
  parabolic,
  catenary,
];
