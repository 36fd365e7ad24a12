/** Edits of what only some rings need: their thickness at the springings, courses, and joints that lost their mortar. m. */
import { LIMITS } from '../schema.ts';
import type { Ring, Scheme } from '../schema.ts';
import { withChanged, withEntry, without } from './entries.ts';
import { held, patched } from './patch.ts';
import type { Patch } from './patch.ts';
import { SMALLEST } from './shapes.ts';

export type LostMortar = NonNullable<Ring['lostMortar']>[number];

function withRing(scheme: Scheme, patch: Patch<Ring>): Scheme {
  return patched(scheme, { ring: patched(scheme.ring, patch) });
}

/** `undefined`: as thick at the springings as at the crown. */
export function setSpringingThickness(scheme: Scheme, thickness: number | undefined): Scheme {
  const before = scheme.ring.springingThickness ?? scheme.ring.thickness;
  return withRing(scheme, {
    springingThickness:
      thickness === undefined ? undefined : held(thickness, SMALLEST.thickness, LIMITS.length, before),
  });
}

const MOST_COURSES = 20;

/** Rings of brick or stone over one another; `undefined` for one. */
export function setCourses(scheme: Scheme, courses: number | undefined): Scheme {
  if (courses === undefined) return withRing(scheme, { courses });
  if (!Number.isFinite(courses)) return scheme;
  return withRing(scheme, { courses: held(Math.round(courses), 1, MOST_COURSES, 1) });
}

export function addLostMortar(scheme: Scheme, lost: LostMortar): Scheme {
  return withRing(scheme, {
    lostMortar: withEntry(scheme.ring.lostMortar, heldLost(lost, { face: lost.face, depth: LEAST_DEPTH })),
  });
}

/** The loss at a place of the list changed; without a joint it is on every joint. */
export function setLostMortar(scheme: Scheme, place: number, patch: Patch<LostMortar>): Scheme {
  const edit = (lost: LostMortar): LostMortar =>
    heldLost(patched(lost, { ...patch, face: patch.face ?? lost.face }), lost);
  return withRing(scheme, { lostMortar: withChanged(scheme.ring.lostMortar, place, edit) });
}

export function removeLostMortar(scheme: Scheme, place: number): Scheme {
  return withRing(scheme, { lostMortar: without(scheme.ring.lostMortar, place) });
}

function heldLost(lost: LostMortar, before: LostMortar): LostMortar {
  const { joint } = lost;
  return patched(lost, {
    depth: held(lost.depth, LEAST_DEPTH, LIMITS.length, before.depth),
    joint: joint === undefined ? undefined : held(Math.round(joint), 0, LIMITS.voussoirs, before.joint ?? 0),
  });
}

/** m: less cannot be felt with a rule. */
const LEAST_DEPTH = 0.0001;
