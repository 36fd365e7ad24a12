/** A tie across the arch, from the anchor on one side to the anchor on the other. */
import * as v from 'valibot';
import { id, length, LIMITS, notNegative, place, positive, text } from './schema-parts.ts';
import { THREAD_NAMES } from './tables.ts';

const count = v.optional(v.pipe(v.number(), v.integer(), v.minValue(1), v.maxValue(20)));
const stress = positive(10_000);
const partialFactor = v.optional(v.pipe(v.number(), v.finite(), v.minValue(0.5), v.maxValue(10)));

const barSchema = v.variant('shape', [
  v.looseObject({ shape: v.literal('round'), diameter: length, count }),
  v.looseObject({ shape: v.literal('flat'), width: length, thickness: length, count }),
]);

/** Either way of leaving a margin: one factor on the ultimate strength, or partial factors on force and strengths. */
const factorsSchema = v.variant('kind', [
  v.looseObject({
    kind: v.literal('global'),
    safety: v.optional(v.pipe(v.number(), v.finite(), v.minValue(1), v.maxValue(100))),
  }),
  v.looseObject({
    kind: v.literal('partial'),
    /** On the tie force. */
    forceFactor: partialFactor,
    /** On yield in the gross section. */
    yieldFactor: partialFactor,
    /** On the ultimate strength in the thread and the pin. */
    ultimateFactor: partialFactor,
  }),
]);

export const tieSchema = v.looseObject({
  id,
  name: v.optional(text),
  /** m over the springing line. */
  level: place,
  bar: barSchema,
  material: v.optional(
    v.looseObject({
      name: v.optional(text),
      /** MPa; null for a brittle metal. */
      yield: v.optional(v.nullable(stress)),
      ultimate: v.optional(stress),
      /** MPa */
      modulus: v.optional(positive(1e6)),
      /** Length gained for each metre and kelvin, 1/K. */
      expansion: v.optional(notNegative(0.001)),
    }),
  ),
  /** Coarse thread at the anchor; without one the bar is taken as whole to its end. */
  thread: v.optional(v.picklist(THREAD_NAMES)),
  age: v.optional(v.picklist(['existing', 'new'])),
  /** kN in the whole tie as left or as to be set. */
  pretension: v.optional(notNegative(LIMITS.force)),
  /** How much warmer than when it was set, K. */
  warming: v.optional(notNegative(200)),
  /** m between anchors. */
  length: v.optional(length),
  /** Lost from diameter, width and thickness, m. */
  corrosion: v.optional(notNegative(1)),
  factors: v.optional(factorsSchema),
  plate: v.optional(
    v.looseObject({
      width: length,
      height: length,
      thickness: length,
      /** Diameter of the hole, m. */
      hole: v.optional(notNegative(LIMITS.length)),
      /** What the masonry under the plate may be pressed with, MPa. */
      allowable: v.optional(v.nullable(positive(1_000))),
      /** Thickness of the wall behind the plate, m. */
      wall: v.optional(length),
      /** What the masonry may be sheared with, MPa. */
      shear: v.optional(v.nullable(positive(1_000))),
    }),
  ),
  pin: v.optional(
    v.looseObject({
      diameter: length,
      planes: v.optional(v.pipe(v.number(), v.integer(), v.minValue(1), v.maxValue(4))),
    }),
  ),
});
