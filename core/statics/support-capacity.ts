/**
 * The thrust that a body can take with the vertical load and the place of the push as they are: closed forms bed by
 * bed with all the masonry counted, and a bisection on them with the wedge left out.
 */
import type { BedForce, Body, Push } from './support-body.ts';
import { standsCracked } from './support-line.ts';

export interface Capacity {
  /** Horizontal thrust that the body needs and can take in compression alone as one piece, kN; null where none does. */
  readonly whole: { readonly least: number; readonly greatest: number } | null;
  /** The greatest with the wedge left out; null where none does. */
  readonly cracked: number | null;
  /** The slice whose lower bed limits it as one piece. */
  readonly governs: number;
}

export function thrustCapacity(body: Body, push: Push): Capacity {
  const { least, greatest, governs } = wholeRange(body, push);
  if (!(least <= greatest) || greatest === -Infinity) return { whole: null, cracked: null, governs };
  return { whole: { least, greatest }, cracked: crackedGreatest(body, push, least, greatest), governs };
}

/** At every bed front · N ≤ M ≤ back · N, and M grows with the thrust by the depth under it. */
function wholeRange(body: Body, push: Push): { least: number; greatest: number; governs: number } {
  let least = -Infinity;
  let greatest = Infinity;
  let governs = 0;
  let weight = 0;
  let weightMoment = 0;
  body.slices.forEach(({ front, back, top, bottom, breadth, unitWeight }, i) => {
    const own = unitWeight * breadth * (back - front) * (bottom - top);
    weight += own;
    weightMoment += (own * (front + back)) / 2;
    const others = body.others[i] as BedForce;
    const normal = push.vertical + others.normal + weight;
    const moment = push.vertical * push.u + others.moment + weightMoment;
    const lever = bottom - push.z;
    if (!(normal > 0) || !(back > front) || !(lever > 0)) {
      // without weight or depth no thrust fits; a bed over the push does not feel it
      if (!(normal > 0) || !(back > front) || moment < front * normal || moment > back * normal) greatest = -Infinity;
      return;
    }
    least = Math.max(least, (front * normal - moment) / lever);
    const most = (back * normal - moment) / lever;
    if (most < greatest) {
      greatest = most;
      governs = i;
    }
  });
  return { least, greatest, governs };
}

/** Halvings: the range to some parts in 10⁸. */
const HALVINGS = 26;
/** Places tried for a thrust that stands, from the least to the greatest as one piece. */
const TRIALS = 8;

function crackedGreatest(body: Body, push: Push, least: number, greatest: number): number | null {
  const stands = (horizontal: number): boolean => standsCracked(body, { ...push, horizontal });
  const trials = Array.from({ length: TRIALS }, (_, i) => greatest - ((greatest - least) * (i + 0.5)) / TRIALS);
  const low = trials.find(stands);
  if (low === undefined) return null;
  return halved(low, greatest, stands);
}

/** The last place from `stands` on towards `fails` that stands. */
function halved(standing: number, falling: number, stands: (horizontal: number) => boolean): number {
  let low = standing;
  let high = falling;
  for (let i = 0; i < HALVINGS; i++) {
    const middle = (low + high) / 2;
    if (stands(middle)) low = middle;
    else high = middle;
  }
  return low;
}
