/**
 * What holds the arch on one side. A body of masonry is a list of courses from the springing down; its first course
 * begins at the level of the springing, its front face there is plumb under the end of the intrados unless it is set
 * off. Depth is measured level, away from the opening.
 */
import * as v from 'valibot';
import { length, LIMITS, notNegative, place, positive, text, within } from './schema-parts.ts';

const unitWeight = v.optional(notNegative(200));
const friction = v.optional(v.nullable(positive(10)));

const courseSchema = v.looseObject({
  height: length,
  /** m; may be left out below the first course: the depth above with both set-offs. */
  depth: v.optional(length),
  /** How far the front face stands forward of the course above, towards the opening, m. */
  setOffFront: v.optional(place),
  /** How far the back stands behind the course above, m; only where no depth is given. */
  setOffBack: v.optional(place),
  breadth: v.optional(length),
  unitWeight,
});

/** What else bears on the body, such as the wall above, a pinnacle, a roof, the thrust of the next arch. */
const bodyLoadSchema = v.variant('kind', [
  v.looseObject({
    kind: v.literal('vertical'),
    name: v.optional(text),
    /** kN, downwards. */
    force: within(LIMITS.force),
    /** m behind the front face of the first course. */
    offset: place,
  }),
  v.looseObject({
    kind: v.literal('horizontal'),
    name: v.optional(text),
    /** kN, + away from the opening. */
    push: within(LIMITS.force),
    /** m over the springing line; below it negative. */
    level: place,
  }),
]);

export const supportSchema = v.looseObject({
  kind: v.picklist(['rigid', 'abutment', 'pier', 'buttress']),
  courses: v.optional(v.pipe(v.array(courseSchema), v.minLength(1), v.maxLength(LIMITS.courses))),
  /** On the bed joints. */
  friction,
  loads: v.optional(v.pipe(v.array(bodyLoadSchema), v.maxLength(LIMITS.courses))),
  footing: v.optional(
    v.looseObject({
      height: length,
      /** m in front of and behind the lowest course. */
      projectionFront: v.optional(notNegative(LIMITS.length)),
      projectionBack: v.optional(notNegative(LIMITS.length)),
      breadth: v.optional(length),
      unitWeight,
    }),
  ),
  ground: v.optional(
    v.looseObject({
      name: v.optional(text),
      /** Bearing resistance, kN/m²; null when it is not known. */
      bearing: v.optional(v.nullable(positive(LIMITS.force))),
      friction,
    }),
  ),
  /** Earth behind the body. */
  earth: v.optional(
    v.looseObject({
      /** Horizontal over vertical pressure as it leans on the body. */
      active: notNegative(10),
      unitWeight,
      /** m over the underside of the footing. */
      height: length,
      /** The same where the body is pushed into it; left out of account unless given. */
      passive: v.optional(notNegative(50)),
    }),
  ),
});
