/** A line of thrust that was chosen or drawn by hand: solid, with each place where it leaves the ring and by how much. */
import { distance, type Point } from '../geometry/point.ts';
import type { Side } from '../statics/hinge.ts';
import { millimetres } from './entered.ts';
import { put, type Draught } from './draught.ts';
import { along, circle, lettering, polyline, stroke } from './path.ts';
import type { Placing } from './places.ts';
import type { About } from './scene.ts';
import { unbroken } from './thrust.ts';

export interface ChosenLine {
  /** Where the resultant crosses each joint, joint 0 first; null where it runs parallel to the joint. */
  readonly line: readonly (Point | null)[];
  /** What the line is, in few words. */
  readonly label: string;
}

const ABOUT: About = { kind: 'thrust', state: 'chosen' };

/** What was drawn of a chosen line, to be lettered when all other lines are there. */
export interface DrawnChosen {
  readonly outside: readonly Excursion[];
}

export function drawChosen(draught: Draught, { line }: ChosenLine): DrawnChosen {
  const outside = excursions(draught, line);
  const drawn = new Set([...draught.joints, ...outside.map(({ joint }) => joint)]);
  const shown = line.filter((_, joint) => drawn.has(joint));
  for (const run of unbroken(shown)) {
    const path = polyline('thrust-chosen', run, ABOUT);
    put(draught, 'thrust-chosen', path);
    draught.places.blockPath(path);
  }
  for (const place of outside) drawExcursion(draught, place);
  return { outside };
}

export function letterChosen(draught: Draught, chosen: ChosenLine, { outside }: DrawnChosen): void {
  for (const place of furthest(outside)) letterExcursion(draught, place);
  if (chosen.label !== '') letterLine(draught, chosen);
}

interface Excursion {
  readonly joint: number;
  readonly side: Side;
  readonly at: Point;
  /** Where the ring can still carry, and how far beyond it the line runs, m. */
  readonly from: Point;
  readonly by: number;
}

/** Share of a joint beyond its end that is rounding only. */
const ON_END = 1e-9;

function excursions({ built }: Draught, line: readonly (Point | null)[]): Excursion[] {
  return line.flatMap((at, joint): Excursion[] => {
    const bearing = built.joints[joint];
    if (at === null || bearing === undefined) return [];
    const { intrados, extrados } = bearing;
    const length = distance(intrados, extrados);
    const share =
      ((at.x - intrados.x) * (extrados.x - intrados.x) + (at.y - intrados.y) * (extrados.y - intrados.y)) / length ** 2;
    if (share >= -ON_END && share <= 1 + ON_END) return [];
    const side = share < 0 ? 'intrados' : 'extrados';
    return [{ joint, side, at, from: bearing[side], by: distance(at, bearing[side]) }];
  });
}

/** A short line from the face out to where the line runs, with an open dot there. */
function drawExcursion(draught: Draught, { joint, at, from }: Excursion): void {
  const { mm, places } = draught;
  const about: About = { kind: 'joint', joint };
  const out = stroke('thrust-outside', from, at, about);
  put(draught, 'thrust-chosen', out, circle('thrust-outside', at, mm(0.9), about));
  places.blockPath(out);
  places.block([0, 1, 2, 3].map((k) => along(at, (k * Math.PI) / 2, mm(0.9))));
}

/** The furthest place of each stretch of joints that the line leaves on one side. */
function furthest(outside: readonly Excursion[]): Excursion[] {
  const worst: Excursion[] = [];
  outside.forEach((place, i) => {
    const before = outside[i - 1];
    const goesOn = before !== undefined && before.joint === place.joint - 1 && before.side === place.side;
    if (!goesOn) worst.push(place);
    else if (place.by > worst.at(-1)!.by) worst[worst.length - 1] = place;
  });
  return worst;
}

function letterExcursion(draught: Draught, { joint, at, from, by }: Excursion): void {
  const { mm, places } = draught;
  const outwards = Math.atan2(at.y - from.y, at.x - from.x);
  const align = Math.cos(outwards) >= 0 ? 'start' : 'end';
  const text = `${millimetres(by)} outside`;
  const placings = [2, 4, 7].flatMap((away) =>
    [0, 0.6, -0.6, 1.2, -1.2].map((aside): Placing => {
      const { x, y } = along(at, outwards + aside, mm(away));
      return [lettering(text, { x, y: y - mm(1.25) }, { align, role: 'text-fails', about: { kind: 'joint', joint } })];
    }),
  );
  const placed = places.placeSurely(placings, at);
  put(draught, 'thrust-chosen', ...placed.texts, ...(placed.leader === null ? [] : [placed.leader]));
}

/** In the opening, where it is widest and free. */
function letterLine(draught: Draught, { line, label }: ChosenLine): void {
  const { ring, places } = draught;
  const at = line.find((point) => point !== null);
  if (at === undefined) return;
  const left = ring.joints[0]!.intrados;
  const right = ring.joints.at(-1)!.intrados;
  const crown = ring.crownIntrados.y;
  const placings = [0.3, 0.2, 0.45, 0.1, 0.6].flatMap((up) =>
    [0.27, 0.73].map((across): Placing => {
      const foot = left.y + across * (right.y - left.y);
      const place = { x: left.x + across * (right.x - left.x), y: foot + up * (crown - foot) };
      return [lettering(label, place, { align: 'middle', role: 'text-force', about: ABOUT })];
    }),
  );
  const placed = places.placeSurely(placings, at);
  put(draught, 'thrust-chosen', ...placed.texts, ...(placed.leader === null ? [] : [placed.leader]));
}
