/**
 * What belongs in each field of the job file, in plain words with its unit: the second half of every message about
 * a field. A field's name has one meaning throughout the file, so the name alone is the key.
 */
import { JOB_FORMAT, JOB_VERSION, LIMITS } from './schema.ts';

const lengthLike = (what: string, example: string): string =>
  `give ${what} in metres, above 0 and up to ${LIMITS.length}, such as ${example}`;
const placeLike = (what: string): string =>
  `give ${what} in metres, between −${LIMITS.length} and ${LIMITS.length}, measured from mid-span, + to the right`;
const textLike = `give text in double quotes, up to ${LIMITS.text} characters`;
const identity = 'give a short name of 1 to 200 characters, used once only';
const weight = 'give kilonewtons per cubic metre, from 0 to 200, such as 22';
const pointList = (least: number): string =>
  `give ${least} to ${LIMITS.points} points, each as [x, y] in metres, left springing first`;

const RIGHT: Readonly<Record<string, string>> = {
  format: `write "${JOB_FORMAT}"`,
  version: `write ${JOB_VERSION}`,
  title: textLike,
  name: textLike,
  place: textLike,
  reference: textLike,
  surveyedBy: textLike,
  notes: textLike,
  site: 'give an object with place, reference, surveyedBy, surveyedOn and notes, or leave it out',
  surveyedOn: 'give a date as year-month-day, such as 2026-05-14, or leave it out',
  id: identity,
  arches: `give a list of 1 to ${LIMITS.arches} arches`,
  schemes: `give a list of 1 to ${LIMITS.schemes} schemes, the arch as found first`,
  role: 'write "as-found" for the first scheme and "proposal" for the others, or leave it out',
  profile: 'give an object with a shape and its measures, such as { "shape": "semicircular", "span": 3.2 }',
  span: lengthLike('the clear width between the springings', '3.2'),
  rise: lengthLike('the height of the crown over the springing line', '0.8'),
  step: `give the height of the right springing over the left in metres, between −${LIMITS.length} and ${LIMITS.length}`,
  haunchRadius: lengthLike('the radius of the haunch arcs', '0.6'),
  haunchAngle: 'give degrees from the springing line to the end of the haunch arc, above 0 and up to 90, such as 60',
  skewbackAngle: 'give degrees from the horizontal to the skewback, above 0 and up to 90, such as 70',
  camber: `give the rise of the soffit at mid-span in metres, from 0 to ${LIMITS.length}, such as 0.02`,
  points: pointList(3),
  extrados: pointList(2),
  ring: 'give an object with at least the thickness, such as { "thickness": 0.35 }',
  thickness: lengthLike('the thickness', '0.35'),
  voussoirs: `give a whole number from 2 to ${LIMITS.voussoirs}, such as 21`,
  joints: 'write "radial" or "vertical"',
  breadth: lengthLike('the breadth of the arch from face to face', '0.6'),
  masonry: 'give an object with name, unitWeight, strength and friction, each as far as known',
  unitWeight: weight,
  strength: 'give megapascals, above 0 and up to 1000, such as 5.8, or null when it is not known',
  friction: 'give a plain number, above 0 and up to 10, such as 0.6, or null when it is not known',
  above: 'give an object such as { "kind": "wall", "height": 1.2 }',
  height: `give the height in metres, from 0 to ${LIMITS.length}, such as 1.2; of what lies above, over the crown of the extrados`,
  loads: `give a list of up to ${LIMITS.loads} loads`,
  x: placeLike('the place of the load'),
  from: placeLike('the left end'),
  to: placeLike('the right end'),
  force: `give kilonewtons on the whole breadth, + downwards, between −${LIMITS.force} and ${LIMITS.force}, such as 12`,
  intensity: `give kilonewtons per square metre, + downwards, between −${LIMITS.force} and ${LIMITS.force}, such as 8`,
  sway: 'give a horizontal acceleration as a share of gravity, between −10 and 10, + to the right, such as 0.1',
  supports: 'give an object with left and right, each such as { "kind": "rigid" }',
  left: 'give an object such as { "kind": "rigid" }',
  right: 'give an object such as { "kind": "rigid" }',
  asked: 'give an object such as { "geometricSafety": 2 }',
  springingThickness: lengthLike('the thickness of the ring at its springings', '0.45'),
  courses:
    'give a whole number from 1 to 20 for the rings of an arch, such as 2, or for a support a list from the springing down, such as [{ "height": 1.5, "depth": 0.9 }]',
  lostMortar: 'give a list of joints that have lost mortar, each such as { "face": "intrados", "depth": 0.03 }',
  face: 'write "intrados" or "extrados"',
  depth: lengthLike('the depth', '0.9'),
  joint: 'give the number of a joint, counted from 0 at the left springing',
  backing: 'give an object such as { "level": 1.1, "counts": "weight" }',
  level: `give the level over the springing line in metres, between −${LIMITS.length} and ${LIMITS.length}`,
  counts: 'write "weight" where the backing only weighs, or "masonry" where it backs the ring',
  layers:
    'give a list of layers, the lowest first, each such as { "name": "paving", "thickness": 0.1, "unitWeight": 24 }',
  openings: 'give a list of openings, each such as { "from": -0.4, "to": 0.4, "sill": 1.6, "head": 2.8 }',
  sill: `give the height of the sill over the springing line in metres, between −${LIMITS.length} and ${LIMITS.length}`,
  head: `give the height of the head over the springing line in metres, between −${LIMITS.length} and ${LIMITS.length}`,
  sidePressure:
    'give the horizontal pressure of the fill over the vertical, from 0 to 10, such as 0.3, or leave it out',
  action: 'write "permanent" or "variable", or leave it out',
  patch: 'give the length of the wheel print along the span in metres, from 0, such as 0.3',
  dispersal: 'give the spread to each side for each metre down, from 0 to 5, such as 0.5',
  combinations: 'give a list of combinations, each such as { "id": "c1", "permanent": 1.2, "variable": 1.5 }',
  permanent: 'give a factor from 0 to 100, such as 1.2',
  variable: 'give a factor from 0 to 100, such as 1.5',
  load: 'give the id of a load of this scheme',
  factor: 'give a factor from 0 to 100, such as 1.5',
  road: 'give an object such as { "material": 0.9, "jointing": 0.8, "condition": 0.9 }, or leave it out',
  spanRise: 'give the span and rise factor read from the standard, above 0 and up to 1',
  material:
    'give a road factor above 0 and up to 1, such as 0.9, or for a tie an object such as { "name": "wrought iron" }',
  jointing: 'give the joint factor, above 0 and up to 1, such as 0.8',
  condition: 'give the condition factor, above 0 and up to 1, such as 0.9',
  cracks: 'give a list of openings seen, each such as { "id": "k1", "joint": 10, "face": "intrados" }',
  along: 'give the share of the way along the intrados from the left springing, from 0 to 1',
  width: `give the width in metres, from 0 to ${LIMITS.length}, such as 0.004`,
  seenOn: 'give a date as year-month-day, such as 2026-05-14, or leave it out',
  geometricSafety: 'give a plain number from 1 to 100, such as 2',
  overturning: 'give a plain number from 1 to 100, such as 2',
  baseSliding: 'give a plain number from 1 to 100, such as 1.5',
  setOffFront: `give how far the front stands forward of the course above in metres, between −${LIMITS.length} and ${LIMITS.length}`,
  setOffBack: `give how far the back stands behind the course above in metres, between −${LIMITS.length} and ${LIMITS.length}`,
  offset: `give the distance behind the front face at the springing in metres, between −${LIMITS.length} and ${LIMITS.length}`,
  push: `give kilonewtons, + away from the opening, between −${LIMITS.force} and ${LIMITS.force}, such as -20`,
  footing: 'give an object such as { "height": 0.4, "projectionFront": 0.1, "projectionBack": 0.1 }',
  projectionFront: `give metres from 0 to ${LIMITS.length}, such as 0.15`,
  projectionBack: `give metres from 0 to ${LIMITS.length}, such as 0.15`,
  ground: 'give an object such as { "name": "stiff clay", "bearing": 150, "friction": 0.3 }',
  bearing: 'give kilonewtons per square metre, above 0, such as 150, or null when it is not known',
  earth: 'give an object such as { "active": 0.33, "unitWeight": 18, "height": 1.5 }, or leave it out',
  active: 'give the horizontal over the vertical pressure of earth that leans on the body, from 0 to 10, such as 0.33',
  passive: 'give the horizontal over the vertical pressure of earth that is pushed, from 0 to 50, or leave it out',
  ties: `give a list of up to ${LIMITS.ties} ties, each such as { "id": "t1", "level": 0, "bar": { "shape": "round", "diameter": 0.03 } }`,
  bar: 'give an object such as { "shape": "round", "diameter": 0.03 } or { "shape": "flat", "width": 0.06, "thickness": 0.012 }',
  diameter: lengthLike('the diameter', '0.03'),
  count: 'give a whole number of bars from 1 to 20, such as 2',
  yield: 'give megapascals, above 0 and up to 10000, such as 235, or null for a brittle metal',
  ultimate: 'give megapascals, above 0 and up to 10000, such as 360',
  modulus: 'give megapascals, above 0 and up to 1000000, such as 210000',
  expansion: 'give the length gained for each metre and kelvin, from 0 to 0.001, such as 0.000012',
  thread: 'write the name of a coarse thread, such as "M24", or leave it out',
  age: 'write "existing" or "new", or leave it out',
  pretension: `give kilonewtons in the whole tie, from 0 to ${LIMITS.force}, such as 10`,
  warming: 'give kelvins above the day on which the tie was set, from 0 to 200, such as 30',
  length: lengthLike('the length between the anchors', '5.2'),
  corrosion: 'give metres lost from the diameter, or from width and thickness, from 0 to 1, such as 0.002',
  factors:
    'give factors: for a combination a list such as [{ "load": "l1", "factor": 1.5 }], for a tie such as { "kind": "global", "safety": 3 }',
  safety: 'give one factor on the ultimate strength, from 1 to 100, such as 3',
  forceFactor: 'give a partial factor from 0.5 to 10, such as 1.35',
  yieldFactor: 'give a partial factor from 0.5 to 10, such as 1',
  ultimateFactor: 'give a partial factor from 0.5 to 10, such as 1.25',
  plate: 'give an object such as { "width": 0.4, "height": 0.4, "thickness": 0.02, "hole": 0.032 }',
  hole: 'give the diameter of the hole in metres, from 0, such as 0.032',
  allowable:
    'give what the masonry under the plate may be pressed with in megapascals, such as 0.5, or null when it is not known',
  wall: lengthLike('the thickness of the wall behind the plate', '0.6'),
  shear: 'give what the masonry may be sheared with in megapascals, such as 0.05, or null when it is not known',
  pin: 'give an object such as { "diameter": 0.03, "planes": 2 }',
  planes: 'give the number of planes in which the pin is sheared, a whole number from 1 to 4, such as 2',
};

/** What would be right in a field, by its name; undefined for a name that the job file does not have. */
export function rightFor(field: string): string | undefined {
  return Object.hasOwn(RIGHT, field) ? RIGHT[field] : undefined;
}
