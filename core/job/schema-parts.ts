/** Figures, texts and limits that the parts of the schema are made of. */
import * as v from 'valibot';

/** Upper limits that keep a hostile or mistaken file from costing minutes or memory. */
export const LIMITS = {
  /** Voussoirs in one ring; the solver is linear in them, the drawing is not meant for more. */
  voussoirs: 100_000,
  arches: 200,
  schemes: 200,
  loads: 5_000,
  marks: 5_000,
  courses: 200,
  ties: 50,
  points: 20_000,
  text: 20_000,
  /** Any length, m, and any force or intensity, kN. */
  length: 1_000,
  force: 1e7,
} as const;

export const text = v.pipe(v.string(), v.maxLength(LIMITS.text));
export const finite = v.pipe(v.number(), v.finite());
export const positive = (max: number) => v.pipe(v.number(), v.finite(), v.gtValue(0), v.maxValue(max));
export const notNegative = (max: number) => v.pipe(v.number(), v.finite(), v.minValue(0), v.maxValue(max));
export const within = (limit: number) => v.pipe(v.number(), v.finite(), v.minValue(-limit), v.maxValue(limit));
export const length = positive(LIMITS.length);
export const place = within(LIMITS.length);
export const id = v.pipe(v.string(), v.minLength(1), v.maxLength(200));
