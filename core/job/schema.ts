/**
 * The job document: one source for its types, its validation and the published JSON Schema.
 *
 * Plain readonly JSON, only what a person entered, nothing computed. Units: m, kN, kN/m², kN/m³; strengths and moduli
 * in MPa; angles in degrees. Axes: x to the right, y up, origin on the springing line of the intrados midway between
 * the springings. Forces are for the whole breadth. Unknown fields are kept on rewriting (`looseObject`), so that a
 * file from a newer minor edition loses nothing here.
 */
import * as v from 'valibot';
import { finite, id, length, LIMITS, notNegative, place, positive, text, within } from './schema-parts.ts';
import { supportSchema } from './support-schema.ts';
import { tieSchema } from './tie-schema.ts';

export { LIMITS };

export const JOB_FORMAT = 'skewback.job';
export const JOB_VERSION = 1;

const point = v.strictTuple([place, place]);

const span = { span: length, step: v.optional(place) };
const spanAndRise = { ...span, rise: length };

export const profileSchema = v.variant('shape', [
  v.looseObject({ shape: v.literal('semicircular'), ...span }),
  v.looseObject({ shape: v.literal('segmental'), ...spanAndRise }),
  v.looseObject({ shape: v.literal('pointed'), ...spanAndRise }),
  v.looseObject({ shape: v.literal('three-centred'), ...spanAndRise, haunchRadius: v.optional(length) }),
  v.looseObject({
    shape: v.literal('four-centred'),
    ...spanAndRise,
    haunchRadius: length,
    /** Degrees from the springing line to the joint between haunch arc and crown arc. */
    haunchAngle: positive(90),
  }),
  v.looseObject({ shape: v.literal('horseshoe'), ...spanAndRise }),
  v.looseObject({ shape: v.literal('elliptical'), ...spanAndRise }),
  v.looseObject({ shape: v.literal('parabolic'), ...spanAndRise }),
  v.looseObject({ shape: v.literal('catenary'), ...spanAndRise }),
  v.looseObject({
    shape: v.literal('flat'),
    ...span,
    /** Degrees from the horizontal to the skewback; 90 is a vertical end. */
    skewbackAngle: positive(90),
    /** Rise of the soffit at mid-span, m. */
    camber: notNegative(LIMITS.length),
  }),
  v.looseObject({
    shape: v.literal('measured'),
    /** Intrados, left springing to right springing. */
    points: v.pipe(v.array(point), v.minLength(3), v.maxLength(LIMITS.points)),
    extrados: v.optional(v.pipe(v.array(point), v.minLength(2), v.maxLength(LIMITS.points))),
    step: v.optional(place),
  }),
]);

const jointNumber = v.pipe(v.number(), v.integer(), v.minValue(0), v.maxValue(LIMITS.voussoirs));

export const ringSchema = v.looseObject({
  /** Radial thickness, m; at the crown where `springingThickness` differs. */
  thickness: length,
  /** Thickness at both springings, m; the ring changes evenly along its intrados between them and the crown. */
  springingThickness: v.optional(length),
  voussoirs: v.optional(v.pipe(v.number(), v.integer(), v.minValue(2), v.maxValue(LIMITS.voussoirs))),
  joints: v.optional(v.picklist(['radial', 'vertical'])),
  /** Rings of brick or stone laid one over the other; drawn, and taken to act together. */
  courses: v.optional(v.pipe(v.number(), v.integer(), v.minValue(1), v.maxValue(20))),
  /** Joints that have lost mortar: the depth from that face carries nothing. Without `joint`, every joint. */
  lostMortar: v.optional(
    v.pipe(
      v.array(
        v.looseObject({
          face: v.picklist(['intrados', 'extrados']),
          depth: length,
          joint: v.optional(jointNumber),
        }),
      ),
      v.maxLength(LIMITS.marks),
    ),
  ),
});

/** Masonry over the haunches up to a level: weight only, or counted as part of the ring where it backs it. */
export const backingSchema = v.looseObject({
  /** Top of the backing over the springing line, m. */
  level: place,
  counts: v.picklist(['weight', 'masonry']),
  /** kN/m³ */
  unitWeight: v.optional(notNegative(200)),
});

export const masonrySchema = v.looseObject({
  name: v.optional(text),
  /** kN/m³. */
  unitWeight: v.optional(notNegative(200)),
  /** Compressive strength, MPa; null when it is not known. */
  strength: v.optional(v.nullable(positive(1_000))),
  /** Coefficient of friction of the joints; null when it is not known. */
  friction: v.optional(v.nullable(positive(10))),
});

export const aboveSchema = v.looseObject({
  kind: v.picklist(['none', 'wall', 'fill']),
  /** Height over the crown extrados, m. */
  height: v.optional(notNegative(LIMITS.length)),
  unitWeight: v.optional(notNegative(200)),
  /** Paving, floors, copings on top, bottom layer first. */
  layers: v.optional(
    v.pipe(
      v.array(v.looseObject({ name: v.optional(text), thickness: length, unitWeight: notNegative(200) })),
      v.maxLength(LIMITS.marks),
    ),
  ),
  /** Holes through what lies above, such as windows: from and to along x, sill and head as heights, m. */
  openings: v.optional(
    v.pipe(v.array(v.looseObject({ from: place, to: place, sill: place, head: place })), v.maxLength(LIMITS.marks)),
  ),
  /** Horizontal over vertical pressure of the fill on the back of the ring; off where it is not given. */
  sidePressure: v.optional(notNegative(10)),
});

/** Permanent or variable, for combinations; variable where it is not said. */
const action = v.optional(v.picklist(['permanent', 'variable']));

export const loadSchema = v.variant('kind', [
  v.looseObject({
    id,
    name: v.optional(text),
    action,
    kind: v.literal('point'),
    x: place,
    /** kN, downwards, on the whole breadth. */
    force: within(LIMITS.force),
  }),
  v.looseObject({
    id,
    name: v.optional(text),
    action,
    kind: v.literal('strip'),
    from: place,
    to: place,
    /** kN/m² on the whole breadth, downwards. */
    intensity: within(LIMITS.force),
  }),
  v.looseObject({
    id,
    name: v.optional(text),
    action,
    kind: v.literal('axle'),
    /** Middle of the axle at the top of what lies above, m. */
    x: place,
    /** kN on the whole breadth, downwards. */
    force: within(LIMITS.force),
    /** Length of the wheels' print along the span, m. */
    patch: v.optional(notNegative(LIMITS.length)),
    /** How far the load spreads to each side for each metre down through the fill. */
    dispersal: v.optional(notNegative(5)),
  }),
]);

/** Loads taken together with factors; a load's own factor goes before that of its action. */
export const combinationSchema = v.looseObject({
  id,
  name: v.optional(text),
  /** Factor on masonry, fill and permanent loads. */
  permanent: v.optional(notNegative(100)),
  /** Factor on variable loads. */
  variable: v.optional(notNegative(100)),
  factors: v.optional(
    v.pipe(v.array(v.looseObject({ load: id, factor: notNegative(100) })), v.maxLength(LIMITS.loads)),
  ),
});

const share = v.optional(v.pipe(v.number(), v.finite(), v.gtValue(0), v.maxValue(1)));

/** A road over the arch: what the assessor judges for the standard axle load, each from 0 to 1. */
export const roadSchema = v.looseObject({
  /** Read from the standard for a span of more than four rises. */
  spanRise: share,
  material: share,
  jointing: share,
  condition: share,
});

/** An opening seen at a joint of the ring. Its place: the joint's number, or its share of the way along the intrados. */
export const crackSchema = v.looseObject({
  id,
  joint: v.optional(jointNumber),
  along: v.optional(v.pipe(v.number(), v.finite(), v.minValue(0), v.maxValue(1))),
  /** The face at which it gapes. */
  face: v.picklist(['intrados', 'extrados']),
  /** m */
  width: v.optional(notNegative(LIMITS.length)),
  /** Date on which it was seen, year-month-day. */
  seenOn: v.optional(text),
  notes: v.optional(text),
});

const safetyFactor = v.optional(v.pipe(finite, v.minValue(1), v.maxValue(100)));

export const schemeSchema = v.looseObject({
  id,
  name: v.optional(text),
  role: v.optional(v.picklist(['as-found', 'proposal'])),
  profile: profileSchema,
  ring: ringSchema,
  breadth: length,
  masonry: v.optional(masonrySchema),
  above: v.optional(aboveSchema),
  backing: v.optional(backingSchema),
  loads: v.optional(v.pipe(v.array(loadSchema), v.maxLength(LIMITS.loads))),
  /** Horizontal acceleration as a share of gravity, + to the right. */
  sway: v.optional(within(10)),
  supports: v.optional(v.looseObject({ left: v.optional(supportSchema), right: v.optional(supportSchema) })),
  ties: v.optional(v.pipe(v.array(tieSchema), v.maxLength(LIMITS.ties))),
  combinations: v.optional(v.pipe(v.array(combinationSchema), v.maxLength(LIMITS.marks))),
  road: v.optional(roadSchema),
  cracks: v.optional(v.pipe(v.array(crackSchema), v.maxLength(LIMITS.marks))),
  /** What the assessor asks for beyond standing; a ring that holds with less is called narrow. */
  asked: v.optional(
    v.looseObject({
      geometricSafety: safetyFactor,
      /** Of the supports about their toe: resisting moment over overturning moment. */
      overturning: safetyFactor,
      /** Of the supports on the ground: resistance over the force that drives them. */
      baseSliding: safetyFactor,
    }),
  ),
});

export const archSchema = v.looseObject({
  id,
  name: v.optional(text),
  schemes: v.pipe(v.array(schemeSchema), v.minLength(1), v.maxLength(LIMITS.schemes)),
});

export const siteSchema = v.looseObject({
  place: v.optional(text),
  reference: v.optional(text),
  surveyedBy: v.optional(text),
  surveyedOn: v.optional(text),
  notes: v.optional(text),
});

export const jobSchema = v.looseObject({
  format: v.literal(JOB_FORMAT),
  version: v.literal(JOB_VERSION),
  title: v.optional(text),
  site: v.optional(siteSchema),
  arches: v.pipe(v.array(archSchema), v.minLength(1), v.maxLength(LIMITS.arches)),
});

/** Readonly all the way down, with the index signature of loose objects taken off so that a misspelt field is an error. */
type Deep<T> = T extends readonly unknown[]
  ? { readonly [Key in keyof T]: Deep<T[Key]> }
  : T extends object
    ? { readonly [Key in keyof T as string extends Key ? never : Key]: Deep<T[Key]> }
    : T;

export type Job = Deep<v.InferOutput<typeof jobSchema>>;
export type Site = Deep<v.InferOutput<typeof siteSchema>>;
export type Arch = Deep<v.InferOutput<typeof archSchema>>;
export type Scheme = Deep<v.InferOutput<typeof schemeSchema>>;
export type Profile = Deep<v.InferOutput<typeof profileSchema>>;
export type ProfileShape = Profile['shape'];
export type Ring = Deep<v.InferOutput<typeof ringSchema>>;
export type Masonry = Deep<v.InferOutput<typeof masonrySchema>>;
export type Above = Deep<v.InferOutput<typeof aboveSchema>>;
export type Backing = Deep<v.InferOutput<typeof backingSchema>>;
export type Combination = Deep<v.InferOutput<typeof combinationSchema>>;
export type Road = Deep<v.InferOutput<typeof roadSchema>>;
export type Crack = Deep<v.InferOutput<typeof crackSchema>>;
export type Load = Deep<v.InferOutput<typeof loadSchema>>;
export type Support = Deep<v.InferOutput<typeof supportSchema>>;
export type Tie = Deep<v.InferOutput<typeof tieSchema>>;
