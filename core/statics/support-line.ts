/**
 * The line of pressure in a body that holds the arch: the resultant at every bed from the springing to the ground.
 *
 * Masonry that takes no tension opens where the line leaves the middle third, and what stands on the open side of the
 * crack no longer helps: a leaning buttress loses a wedge of its masonry. Each bed is solved for the edge of its
 * compressed part with the masonry on the open side left out, from the top down (S. Huerta 2010; J. A. Ochsendorf,
 * J. I. Hernando & S. Huerta 2004; from memory). Masonry left out bears again where a bed below is pressed on that side.
 */
import type { BedForce, Body, Push, Slice } from './support-body.ts';

/** The resultant at the lower bed of a slice. */
export interface Bed {
  readonly slice: Slice;
  /** kN on the bed, down. */
  readonly normal: number;
  /** kN along the bed, away from the opening. */
  readonly shear: number;
  /** Where the resultant crosses the bed, u in m; null where nothing presses on it. */
  readonly at: number | null;
  /** From the middle of the bed, positive away from the opening, m. */
  readonly eccentricity: number | null;
  /** The compressed part, u from and to; null where the resultant is outside the bed. */
  readonly compressed: readonly [number, number] | null;
  /** kN/m² at the front and the back of the bed; null as above. */
  readonly stress: readonly [number, number] | null;
}

export interface SupportLine {
  readonly beds: readonly Bed[];
  /** Whether every bed is in compression alone, this masonry and no more counted. */
  readonly stands: boolean;
  /** First bed at which it is not; null when it stands. */
  readonly fallsAt: number | null;
  /** Masonry left out on the open side of the crack, kN. */
  readonly wedge: number;
}

/** The line with all the masonry counted at every bed, wherever it runs. */
export function wholeLine(body: Body, push: Push): SupportLine {
  const beds: Bed[] = [];
  let weight = 0;
  let weightMoment = 0;
  body.slices.forEach((slice, i) => {
    const { front, back } = slice;
    const start = startOf(slice, body.others[i] as BedForce, push, weight, weightMoment, front, back);
    const own = counted(start, front, back);
    weight += own.weight;
    weightMoment += own.moment;
    beds.push(bedUnder(start, own, push, body.others[i] as BedForce));
  });
  const fallsAt = beds.findIndex(({ compressed }) => compressed === null);
  return { beds, stands: fallsAt < 0, fallsAt: fallsAt < 0 ? null : fallsAt, wedge: 0 };
}

/** The line with the wedge left out; it ends at the bed where the body falls. */
export function crackedLine(body: Body, push: Push): SupportLine {
  const beds: Bed[] = [];
  const { fallsAt, wedge } = followCrack(body, push, beds);
  return { beds, stands: fallsAt === null, fallsAt, wedge };
}

/** Whether the body stands with the wedge left out. */
export const standsCracked = (body: Body, push: Push): boolean => followCrack(body, push, null).fallsAt === null;

/** Weight, kN, and its moment about u = 0. */
interface Weight {
  weight: number;
  moment: number;
}

const NONE: Readonly<Weight> = { weight: 0, moment: 0 };

function add(sum: Weight, more: Readonly<Weight>): void {
  sum.weight += more.weight;
  sum.moment += more.moment;
}

/** Takes all of one sum over into another. */
function move(from: Weight, to: Weight): void {
  add(to, from);
  from.weight = 0;
  from.moment = 0;
}

/** @param beds filled with the bed of each slice where a list is given. */
function followCrack(body: Body, push: Push, beds: Bed[] | null): Pick<SupportLine, 'fallsAt' | 'wedge'> {
  const pressing = { ...NONE };
  // left out on the open side of a crack, in front and behind
  const inFront = { ...NONE };
  const behind = { ...NONE };
  let from = -Infinity;
  let to = Infinity;
  let above: Slice | null = null;
  for (let i = 0; i < body.slices.length; i++) {
    const slice = body.slices[i] as Slice;
    const { front, back } = slice;
    const others = body.others[i] as BedForce;
    const lean = leanOf(
      slice,
      others,
      push,
      pressing.weight + inFront.weight + behind.weight,
      pressing.moment + inFront.moment + behind.moment,
    );
    // what stands on the pressed side bears again
    if (lean !== 'outwards') {
      move(inFront, pressing);
      from = front;
    }
    if (lean !== 'inwards') {
      move(behind, pressing);
      to = back;
    }
    // an edge that has not opened follows the face of the course, set-off or not
    from = above === null || from <= above.front ? front : Math.min(Math.max(from, front), back);
    to = above === null || to >= above.back ? back : Math.min(Math.max(to, from), back);
    const start = startOf(slice, others, push, pressing.weight, pressing.moment, from, to);
    const end: readonly [number, number] | null =
      lean === 'whole' ? [front, back] : opened(start, lean === 'outwards' ? 1 : -1);
    if (end === null) {
      beds?.push(bedUnder(start, NONE, push, others));
      return { fallsAt: i, wedge: inFront.weight + behind.weight };
    }
    const own = counted(start, end[0], end[1]);
    if (lean !== 'whole') {
      const block = blockWeight(slice);
      const parted = lean === 'outwards' ? inFront : behind;
      add(parted, { weight: block - own.weight, moment: (block * (front + back)) / 2 - own.moment });
    }
    add(pressing, own);
    beds?.push(bedUnder(start, own, push, others));
    [from, to] = end;
    above = slice;
  }
  return { fallsAt: null, wedge: inFront.weight + behind.weight };
}

const blockWeight = ({ front, back, top, bottom, breadth, unitWeight }: Slice): number =>
  unitWeight * breadth * (back - front) * (bottom - top);

/** Which way the lower bed of a slice opens with all the masonry over it counted. */
function leanOf(
  slice: Slice,
  others: BedForce,
  push: Push,
  weight: number,
  weightMoment: number,
): 'whole' | 'outwards' | 'inwards' {
  const middle = (slice.front + slice.back) / 2;
  const depth = slice.back - slice.front;
  const own = blockWeight(slice);
  const normal = push.vertical + others.normal + weight + own;
  const moment =
    push.vertical * push.u + push.horizontal * (slice.bottom - push.z) + others.moment + weightMoment + own * middle;
  const off = moment - middle * normal;
  if (depth > 0 && normal > 0 && Math.abs(off) <= (normal * depth) / 6) return 'whole';
  return off >= 0 ? 'outwards' : 'inwards';
}

function startOf(
  slice: Slice,
  others: BedForce,
  push: Push,
  weight: number,
  weightMoment: number,
  from: number,
  to: number,
): Start {
  return {
    normal: push.vertical + others.normal + weight,
    moment: push.vertical * push.u + push.horizontal * (slice.bottom - push.z) + others.moment + weightMoment,
    from,
    to,
    slice,
  };
}

const bedUnder = (start: Start, own: Weight, push: Push, others: BedForce): Bed =>
  bedOf(start.slice, start.normal + own.weight, push.horizontal + others.shear, start.moment + own.moment);

interface Start {
  /** At the lower bed, the slice's own weight left out: kN, and kN·m about u = 0. */
  readonly normal: number;
  readonly moment: number;
  /** The part of the slice's upper bed that still presses. */
  readonly from: number;
  readonly to: number;
  readonly slice: Slice;
}

/** Weight between the edges at the upper bed and those at the lower, kN, and its moment about u = 0. */
function counted({ from: a0, to: b0, slice }: Start, a1: number, b1: number): Weight {
  const k = slice.unitWeight * slice.breadth * (slice.bottom - slice.top);
  return {
    weight: (k * (b0 - a0 + b1 - a1)) / 2,
    moment: (k * (b0 * b0 + b0 * b1 + b1 * b1 - a0 * a0 - a0 * a1 - a1 * a1)) / 6,
  };
}

/** Exchanges of Newton's method; it doubles its figures at each. */
const MOST_STEPS = 30;
/** Share of the depth that is rounding only. */
const SAME = 1e-12;

/**
 * The edge a of the compressed part for which the resultant of what lies behind it stands a third of that part from
 * the pressed face: (p − a) N(a) = 3 (p N(a) − M(a)), p the pressed face. Newton's method from the whole bed on.
 * @param outwards 1 when the body leans away from the opening, −1 when into it.
 */
function opened(start: Start, outwards: 1 | -1): readonly [number, number] | null {
  const { slice } = start;
  const { front, back } = slice;
  if (!(back > front)) return null;
  const pressed = outwards === 1 ? back : front;
  const open = outwards === 1 ? front : back;
  const upper = outwards === 1 ? start.from : start.to;
  const k = slice.unitWeight * slice.breadth * (slice.bottom - slice.top) * outwards;
  let a = open;
  for (let step = 0; step < MOST_STEPS; step++) {
    const own = outwards === 1 ? counted(start, a, back) : counted(start, front, a);
    const normal = start.normal + own.weight;
    const moment = start.moment + own.moment;
    const normalSlope = -k / 2;
    const momentSlope = (-k * (upper + 2 * a)) / 6;
    const excess = (pressed - a) * normal - 3 * (pressed * normal - moment);
    const slope = -normal + (pressed - a) * normalSlope - 3 * (pressed * normalSlope - momentSlope);
    if (!(normal > 0) || slope >= 0) return null;
    const change = -excess / slope;
    a += change;
    if ((pressed - a) * outwards <= 0) return null;
    if (Math.abs(change) <= SAME * (back - front)) return outwards === 1 ? [a, back] : [front, a];
  }
  return null;
}

function bedOf(slice: Slice, normal: number, shear: number, moment: number): Bed {
  const { front, back, breadth } = slice;
  const none = { slice, normal, shear, eccentricity: null, compressed: null, stress: null };
  if (!(normal > 0)) return { ...none, at: null };
  const depth = back - front;
  const at = moment / normal;
  const eccentricity = at - (front + back) / 2;
  const e = Math.abs(eccentricity);
  if (!(e < depth / 2)) return { ...none, at, eccentricity };
  const whole = e <= depth / 6;
  const pressed = whole ? depth : 3 * (depth / 2 - e);
  const near = whole ? (normal / (breadth * depth)) * (1 + (6 * e) / depth) : (2 * normal) / (breadth * pressed);
  const far = whole ? (normal / (breadth * depth)) * (1 - (6 * e) / depth) : 0;
  return {
    slice,
    normal,
    shear,
    at,
    eccentricity,
    compressed: eccentricity >= 0 ? [back - pressed, back] : [front, front + pressed],
    stress: eccentricity >= 0 ? [far, near] : [near, far],
  };
}
