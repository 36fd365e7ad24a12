/** Edits of the crack marks: scheme to scheme. Joints count from 0 at the left springing; widths in m. */
import { LIMITS } from '../schema.ts';
import type { Crack, Scheme } from '../schema.ts';
import { nextId } from './ids.ts';
import { held, patched } from './patch.ts';
import type { Patch } from './patch.ts';

export type CrackPatch = Patch<Omit<Crack, 'id'>>;

/** Adds a mark after the others; the scheme as it is where it holds as many as it may. */
export function addCrack(scheme: Scheme, crack: Omit<Crack, 'id'>): Scheme {
  const before = scheme.cracks ?? [];
  if (before.length >= LIMITS.marks) return scheme;
  return patched(scheme, {
    cracks: [...before, heldCrack({ id: nextId('k', before), ...crack }, { face: crack.face })],
  });
}

/** Sets what is known of a mark. A joint takes the place of a share along the intrados, and the other way round. */
export function setCrack(scheme: Scheme, id: string, patch: CrackPatch): Scheme {
  const cracks = scheme.cracks ?? [];
  const before = cracks.find((crack) => crack.id === id);
  if (before === undefined) return scheme;
  const place: CrackPatch =
    patch.joint !== undefined ? { along: undefined } : patch.along !== undefined ? { joint: undefined } : {};
  const after = heldCrack(patched<Crack>(before, { ...patch, face: patch.face ?? before.face, ...place }), before);
  const changed = patched(before, after) === before && Object.keys(after).length === Object.keys(before).length;
  return changed ? scheme : patched(scheme, { cracks: cracks.map((crack) => (crack === before ? after : crack)) });
}

export function removeCrack(scheme: Scheme, id: string): Scheme {
  const before = scheme.cracks ?? [];
  const left = before.filter((crack) => crack.id !== id);
  if (left.length === before.length) return scheme;
  return patched(scheme, { cracks: left.length === 0 ? undefined : left });
}

function heldCrack(crack: Crack, before: Omit<Crack, 'id'>): Crack {
  const { joint, along, width } = crack;
  return patched(crack, {
    joint: joint === undefined ? undefined : held(Math.round(joint), 0, LIMITS.voussoirs, before.joint ?? 0),
    along: along === undefined ? undefined : held(along, 0, 1, before.along ?? 0),
    width: width === undefined ? undefined : held(width, 0, LIMITS.length, before.width ?? 0),
  });
}
