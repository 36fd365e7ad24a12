import { crownHeightOf, spanOf, type DrawnShape } from '../../core/job/edits.ts';
import { freshScheme } from '../../core/job/fresh.ts';
import type { ProfileShape } from '../../core/job/schema.ts';
import { lengthInWords } from './preferences.ts';

interface ShapeWords {
  readonly name: string;
  /** By what one knows it, or how it is set out. */
  readonly note: string;
}

const WORDS: Readonly<Record<ProfileShape, ShapeWords>> = {
  semicircular: { name: 'Semicircular', note: 'half a circle on the span' },
  segmental: { name: 'Segmental', note: 'less than half a circle' },
  pointed: { name: 'Pointed', note: 'two arcs that meet at the crown' },
  'three-centred': { name: 'Three-centred', note: 'tight haunches under a flat crown' },
  'four-centred': { name: 'Four-centred', note: 'tight haunches under a blunt point' },
  horseshoe: { name: 'Horseshoe', note: 'more than half a circle' },
  elliptical: { name: 'Elliptical', note: 'half an ellipse' },
  parabolic: { name: 'Parabolic', note: 'a parabola on its head' },
  catenary: { name: 'Catenary', note: 'a hanging chain turned over' },
  flat: { name: 'Flat', note: 'level, with leaning joints' },
  measured: { name: 'Measured', note: 'through points that were surveyed' },
};

export const shapeName = (shape: ProfileShape): string => WORDS[shape].name;
export const shapeNote = (shape: ProfileShape): string => WORDS[shape].note;

/** Shapes that can be chosen, in the order in which they are offered. */
export const CHOOSABLE: readonly DrawnShape[] = [
  'semicircular',
  'segmental',
  'pointed',
  'three-centred',
  'four-centred',
  'elliptical',
  'parabolic',
  'catenary',
  'horseshoe',
  'flat',
];

/** The proportions in which a new arch of this shape begins: `3.00 m wide, 0.75 m high`. */
export function beginsAs(shape: DrawnShape): string {
  const { profile } = freshScheme(shape);
  return `${lengthInWords(spanOf(profile))} wide, ${lengthInWords(crownHeightOf(profile))} high`;
}
