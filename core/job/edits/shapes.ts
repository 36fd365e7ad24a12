/**
 * What each shape of profile can be: how high it may rise over its span, and the proportions it usually has.
 * Keeps edits within the valid; the curves themselves are geometry's. a = half-span, f = rise, r = haunch radius.
 */
import { LIMITS, profileSchema } from '../schema.ts';
import type { Profile } from '../schema.ts';
import { held } from './patch.ts';

type Drawn = Exclude<Profile, { readonly shape: 'measured' }>;
type DrawnShape = Drawn['shape'];
type Risen = Extract<Drawn, { readonly rise: number }>;
type RisenShape = Risen['shape'];

/** The least that an edit by hand will go to, m; a stone smaller than a thumb is a slip of the pointer. */
export const SMALLEST = { span: 0.05, rise: 0.005, thickness: 0.005, breadth: 0.005, strip: 0.001 } as const;

/** Names of the fields that profiles have, of whatever shape. */
export const PROFILE_FIELDS: ReadonlySet<string> = new Set(
  profileSchema.options.flatMap((option) => Object.keys(option.entries)),
);

/** Least and greatest rise over the half-span. Strict limits are kept a hundredth away, where the shape still shows. */
const RISE_OVER_HALF_SPAN: Readonly<Record<RisenShape, readonly [number, number]>> = {
  segmental: [0, 1],
  pointed: [1, Infinity],
  'three-centred': [0, 0.99],
  'four-centred': [0.4, 0.9],
  horseshoe: [1.01, 6],
  elliptical: [0, Infinity],
  parabolic: [0, Infinity],
  catenary: [0, 20],
};

/** Usual rise over the half-span (common practice; the equilateral for the pointed). */
const USUAL_RISE: Readonly<Record<RisenShape, number>> = {
  segmental: 0.5,
  pointed: Math.sqrt(3),
  'three-centred': 0.7,
  'four-centred': 0.65,
  horseshoe: 1.4,
  elliptical: 0.7,
  parabolic: 1,
  catenary: 1,
};

/** Skewback and camber of a flat arch as commonly built: 70°, one part in a hundred of the span. */
const USUAL_FLAT = { skewbackAngle: 70, camberOverSpan: 0.01 } as const;

function riseRange(shape: RisenShape, span: number): readonly [number, number] {
  const [least, most] = RISE_OVER_HALF_SPAN[shape].map((ratio) => (ratio * span) / 2) as [number, number];
  return [Math.max(least, SMALLEST.rise), Math.min(most, LIMITS.length)];
}

/** The shape in its usual proportions over a span, m. */
export function usualProfile(shape: DrawnShape, span: number): Drawn {
  if (shape === 'semicircular') return { shape, span };
  if (shape === 'flat') {
    const { skewbackAngle, camberOverSpan } = USUAL_FLAT;
    return { shape, span, skewbackAngle, camber: rounded(camberOverSpan * span) };
  }
  return risenProfile(shape, span, rounded((USUAL_RISE[shape] * span) / 2));
}

/** The shape with this rise, or undefined where the rise is at or beyond what the shape can have. */
export function drawnProfile(shape: DrawnShape, span: number, rise: number): Drawn | undefined {
  if (shape === 'semicircular' || shape === 'flat') return undefined;
  const [least, most] = riseRange(shape, span);
  return rise > least && rise < most ? risenProfile(shape, span, rise) : undefined;
}

function risenProfile(shape: RisenShape, span: number, rise: number): Drawn {
  if (shape !== 'four-centred') return { shape, span, rise };
  return settledProfile({ shape, span, rise, haunchRadius: span / 8, haunchAngle: 60 });
}

/** The same profile with every measure brought within what its shape can be over its present span. */
export function settledProfile(profile: Drawn): Drawn {
  switch (profile.shape) {
    case 'semicircular':
      return profile;
    case 'flat':
      return {
        ...profile,
        camber: held(profile.camber, 0, profile.span / 2, 0),
        skewbackAngle: held(profile.skewbackAngle, 10, 90, USUAL_FLAT.skewbackAngle),
      };
    default:
      return settledHaunch({ ...profile, rise: heldRise(profile) });
  }
}

function heldRise({ shape, span, rise }: Risen): number {
  const [least, most] = riseRange(shape, span);
  return held(rise, least, most, least);
}

function settledHaunch(profile: Risen): Risen {
  if (profile.shape === 'four-centred') return settledFourCentred(profile);
  if (profile.shape !== 'three-centred' || profile.haunchRadius === undefined) return profile;
  return {
    ...profile,
    haunchRadius: held(profile.haunchRadius, SMALLEST.rise / 2, 0.99 * profile.rise, profile.rise / 2),
  };
}

type FourCentred = Extract<Drawn, { readonly shape: 'four-centred' }>;

/** Keeps radius and angle where an arch with them exists; else the nearest angle, or else the nearest radius and angle. */
function settledFourCentred(profile: FourCentred): FourCentred {
  const half = profile.span / 2;
  const haunchRadius = held(profile.haunchRadius, 0.02 * half, 0.98 * half, half / 4);
  const haunchAngle = held(profile.haunchAngle, 1, 90, 60);
  const wanted = { ...profile, haunchRadius, haunchAngle };
  if (fourCentredExists(wanted)) return wanted;
  const tries = [haunchRadius, ...steps(0.02, 0.98, 49).map((share) => share * half)].flatMap((radius) =>
    steps(1, 90, 90).map((angle) => ({ ...wanted, haunchRadius: radius, haunchAngle: angle })),
  );
  const distance = (other: FourCentred): number =>
    Math.abs(other.haunchRadius - haunchRadius) / half + Math.abs(other.haunchAngle - haunchAngle) / 1_000;
  return tries
    .filter(fourCentredExists)
    .reduce<FourCentred>(
      (nearest, other) => (nearest === wanted || distance(other) < distance(nearest) ? other : nearest),
      wanted,
    );
}

/**
 * Whether upper arcs meet the haunch arcs smoothly and the crown, with their centres beyond the axis and not so far
 * that they are straight. k = ((a − r)² + f² − r²)/(2(r + (a − r) cos θ − f sin θ)), centre −(a − r) + k cos θ.
 */
function fourCentredExists({ span, rise, haunchRadius: r, haunchAngle }: FourCentred): boolean {
  const half = span / 2;
  const angle = (haunchAngle * Math.PI) / 180;
  const flat = half - r;
  const k = (flat ** 2 + rise ** 2 - r ** 2) / (2 * (r + flat * Math.cos(angle) - rise * Math.sin(angle)));
  return k > 0 && k < 25 * half && k * Math.cos(angle) > flat && r * Math.sin(angle) < rise;
}

function steps(from: number, to: number, count: number): number[] {
  return Array.from({ length: count }, (_, index) => from + ((to - from) * index) / (count - 1));
}

/** Whole millimetres, as one would write a chosen measure down. */
function rounded(length: number): number {
  return Math.max(Math.round(length * 1_000) / 1_000, SMALLEST.rise);
}
