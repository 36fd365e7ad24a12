/**
 * Random schemes for checks against other methods: every shape, both directions of joint, few and many voussoirs,
 * rings too thin to stand and thicker than any mason's, bare or loaded. The same seed gives the same arches.
 */
import fc from 'fast-check';
import type { Above, Load, Profile, ProfileShape, Scheme } from '../../core/job/schema.ts';

/** Every shape of the schema; a new one is a type error here until it has random arches. */
const SHAPES: Record<ProfileShape, (span: number) => fc.Arbitrary<Profile>> = {
  semicircular: (span) => fc.constant({ shape: 'semicircular', span }),
  segmental: (span) => between(0.08, 0.5).map((share) => ({ shape: 'segmental', span, rise: share * span })),
  pointed: (span) => between(0.5, 1.3).map((share) => ({ shape: 'pointed', span, rise: share * span })),
  'three-centred': (span) =>
    fc.tuple(between(0.22, 0.45), between(0.3, 0.9), fc.boolean()).map(([rise, haunch, given]) => ({
      shape: 'three-centred',
      span,
      rise: rise * span,
      ...(given ? { haunchRadius: haunch * rise * span } : {}),
    })),
  'four-centred': (span) =>
    fc
      .tuple(between(0.1, 0.25), between(35, 75), between(0, 0.3))
      .map(([haunch, haunchAngle, beyond]) => fourCentred(span, haunch * span, haunchAngle, beyond * span)),
  horseshoe: (span) => between(0.51, 0.85).map((share) => ({ shape: 'horseshoe', span, rise: share * span })),
  elliptical: (span) => between(0.2, 0.8).map((share) => ({ shape: 'elliptical', span, rise: share * span })),
  parabolic: (span) => between(0.1, 0.8).map((share) => ({ shape: 'parabolic', span, rise: share * span })),
  catenary: (span) => between(0.1, 0.8).map((share) => ({ shape: 'catenary', span, rise: share * span })),
  flat: (span) =>
    fc.tuple(between(50, 85), between(0.001, 0.03), fc.boolean()).map(([skewbackAngle, camber, level]) => ({
      shape: 'flat',
      span,
      skewbackAngle,
      camber: level ? 0 : camber * span,
    })),
  measured: (span) =>
    fc
      .tuple(between(0.15, 0.5), fc.array(between(-0.004, 0.004), { minLength: 7, maxLength: 15 }))
      .map(([rise, errors]) => ({ shape: 'measured', points: surveyed(span, rise, errors) })),
};

export const shapes = Object.keys(SHAPES) as ProfileShape[];

/** Even over the range, so that a sample covers it; fast-check's own bias to the ends is taken off by `randomSchemes`. */
export const between = (low: number, high: number): fc.Arbitrary<number> =>
  fc.integer({ min: 0, max: 1_000_000 }).map((share) => low + ((high - low) * share) / 1_000_000);

/** Set out from its upper centre, which lies `beyond` metres across the axis: the rise follows. */
function fourCentred(span: number, haunchRadius: number, haunchAngle: number, beyond: number): Profile {
  const angle = (haunchAngle * Math.PI) / 180;
  const between = (span / 2 - haunchRadius + beyond) / Math.cos(angle);
  const rise = Math.sqrt((between + haunchRadius) ** 2 - beyond ** 2) - between * Math.sin(angle);
  return { shape: 'four-centred', span, rise, haunchRadius, haunchAngle };
}

/** An ellipse as a tape would give it: levelled springings, a few millimetres out everywhere else. */
function surveyed(span: number, rise: number, errors: readonly number[]): [number, number][] {
  const last = errors.length + 1;
  return Array.from({ length: last + 1 }, (_, i) => {
    const angle = 0.25 + ((Math.PI - 0.5) * i) / last;
    const level = Math.sin(0.25);
    const error = errors[i - 1] ?? 0;
    return [-((span / 2) * Math.cos(angle)) / Math.cos(0.25), rise * span * (Math.sin(angle) - level) + error * span];
  });
}

const LOADS = (span: number): fc.Arbitrary<Load[]> => {
  const point = fc
    .tuple(between(-0.48, 0.48), between(0.5, 60))
    .map(([x, force]) => ({ kind: 'point' as const, x: x * span, force }));
  const axle = fc
    .tuple(between(-0.48, 0.48), between(5, 80), between(0, 0.05), between(0, 1))
    .map(([x, force, patch, dispersal]) => ({
      kind: 'axle' as const,
      x: x * span,
      force,
      patch: patch * span,
      dispersal,
    }));
  const strip = fc
    .tuple(between(-0.48, 0.48), between(0.05, 0.4), between(0.3, 30))
    .map(([from, width, intensity]) => ({
      kind: 'strip' as const,
      from: from * span,
      to: (from + width) * span,
      intensity,
    }));
  return fc
    .array(fc.oneof({ weight: 4, arbitrary: point }, { weight: 4, arbitrary: strip }, { weight: 1, arbitrary: axle }), {
      maxLength: 3,
    })
    .map((loads) => loads.map((load, i) => ({ id: `l${i + 1}`, ...load })));
};

/** One in `weight` has it, the rest go without. */
const atTimes = <Value>(weight: number, arbitrary: fc.Arbitrary<Value>): fc.Arbitrary<Value | null> =>
  fc.oneof({ weight: weight - 1, arbitrary: fc.constant(null) }, { weight: 1, arbitrary });

const LAYERS = fc.array(fc.record({ thickness: between(0.02, 0.2), unitWeight: between(16, 26) }), {
  minLength: 1,
  maxLength: 2,
});

const ABOVE: fc.Arbitrary<Above | null> = fc.oneof(
  fc.constant(null),
  fc
    .record({
      kind: fc.constantFrom('wall' as const, 'fill' as const),
      height: between(0, 2),
      unitWeight: between(12, 24),
      layers: atTimes(4, LAYERS),
      sidePressure: atTimes(4, between(0, 0.5)),
    })
    .map(({ layers, sidePressure, ...above }) => ({
      ...above,
      ...(layers ? { layers } : {}),
      ...(sidePressure !== null ? { sidePressure } : {}),
    })),
);

/** Up to a fifth of the span over the springing line: below the crown of every shape but the flat one. */
const BACKING = (span: number): fc.Arbitrary<NonNullable<Scheme['backing']>> =>
  fc.record({
    level: between(0, 0.1).map((share) => share * span),
    counts: fc.constantFrom('weight' as const, 'masonry' as const),
    unitWeight: between(18, 26),
  });

interface Figures {
  readonly profile: Profile;
  readonly step: number;
  readonly slenderness: number;
  readonly taper: number | null;
  readonly lost: {
    readonly face: 'intrados' | 'extrados';
    readonly share: number;
    readonly everywhere: boolean;
  } | null;
  readonly voussoirs: number;
  readonly vertical: boolean;
}

function ringOf(span: number, { profile, slenderness, taper, lost, voussoirs, vertical }: Figures): Scheme['ring'] {
  const thickness = slenderness * span;
  return {
    thickness,
    voussoirs,
    joints: vertical && profile.shape !== 'horseshoe' ? 'vertical' : 'radial',
    ...(taper !== null && profile.shape !== 'flat' ? { springingThickness: taper * thickness } : {}),
    ...(lost
      ? {
          lostMortar: [
            { face: lost.face, depth: lost.share * thickness, ...(lost.everywhere ? {} : { joint: voussoirs >> 1 }) },
          ],
        }
      : {}),
  };
}

/** One scheme of the shape; thickness from far too thin to a fifth of the span. */
export function schemeOf(shape: ProfileShape): fc.Arbitrary<Scheme> {
  return between(1, 12).chain((span) =>
    fc
      .record({
        profile: SHAPES[shape](span),
        step: fc.oneof({ weight: 3, arbitrary: fc.constant(0) }, { weight: 1, arbitrary: between(-0.15, 0.15) }),
        slenderness: between(0.02, 0.2),
        taper: atTimes(4, between(1, 1.8)),
        lost: atTimes(
          6,
          fc.record({
            face: fc.constantFrom('intrados' as const, 'extrados' as const),
            share: between(0.02, 0.2),
            everywhere: fc.boolean(),
          }),
        ),
        voussoirs: fc.integer({ min: 4, max: 80 }),
        vertical: fc.boolean(),
        breadth: between(0.3, 4),
        unitWeight: between(16, 27),
        above: ABOVE,
        backing: atTimes(5, BACKING(span)),
        loads: LOADS(span),
        sway: fc.oneof({ weight: 2, arbitrary: fc.constant(0) }, { weight: 1, arbitrary: between(-0.3, 0.3) }),
      })
      .map(({ breadth, unitWeight, above, backing, loads, sway, ...figures }) => ({
        id: 's1',
        profile: steppedProfile(figures, span),
        ring: ringOf(span, figures),
        breadth,
        masonry: { unitWeight },
        ...(above ? { above } : {}),
        ...(backing && shape !== 'flat' && shape !== 'measured' ? { backing } : {}),
        loads,
        sway,
      })),
  );
}

const steppedProfile = ({ profile, step }: Figures, span: number): Profile =>
  profile.shape === 'measured' || step === 0 ? profile : { ...profile, step: step * span };

/** `each` schemes of every shape, the same for the same seed. */
export function randomSchemes(each: number, seed: number): Scheme[] {
  return shapes.flatMap((shape, i) => fc.sample(fc.noBias(schemeOf(shape)), { numRuns: each, seed: seed + i }));
}
