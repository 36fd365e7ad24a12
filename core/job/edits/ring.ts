/** Edits of the ring, its stone and what it carries above: scheme to scheme. Units: m, kN/m³, MPa. */
import { LIMITS } from '../schema.ts';
import type { Above, Masonry, Ring, Scheme } from '../schema.ts';
import { crownHeightOf } from './opening.ts';
import type { BoardPoint } from './opening.ts';
import { held, patched } from './patch.ts';
import type { Patch } from './patch.ts';
import { SMALLEST } from './shapes.ts';

function withRing(scheme: Scheme, patch: Patch<Ring>): Scheme {
  return patched(scheme, { ring: patched(scheme.ring, patch) });
}

export function setThickness(scheme: Scheme, thickness: number): Scheme {
  return withRing(scheme, { thickness: held(thickness, SMALLEST.thickness, LIMITS.length, scheme.ring.thickness) });
}

/** The extrados handle over the crown dragged: its height over the crown of the intrados is the thickness. */
export function moveExtrados(scheme: Scheme, point: BoardPoint): Scheme {
  return setThickness(scheme, point.y - crownHeightOf(scheme.profile));
}

/** `undefined`: not counted, the default counts again. */
export function setVoussoirs(scheme: Scheme, voussoirs: number | undefined): Scheme {
  if (voussoirs === undefined) return withRing(scheme, { voussoirs });
  if (!Number.isFinite(voussoirs)) return scheme;
  return withRing(scheme, { voussoirs: held(Math.round(voussoirs), 2, LIMITS.voussoirs, 2) });
}

export function setJoints(scheme: Scheme, joints: Ring['joints']): Scheme {
  return withRing(scheme, { joints });
}

export function setBreadth(scheme: Scheme, breadth: number): Scheme {
  return patched(scheme, { breadth: held(breadth, SMALLEST.breadth, LIMITS.length, scheme.breadth) });
}

/** Greatest figures that the schema takes; the least is 0 for a weight and just above it for the others. */
const MOST = { unitWeight: 200, strength: 1_000, friction: 10 } as const;
const LEAST_ABOVE_ZERO = 1e-6;

/** Sets what is known of the stone; `null` is not known, `undefined` leaves it to the default. */
export function setMasonry(scheme: Scheme, patch: Patch<Masonry>): Scheme {
  const { masonry } = scheme;
  const before = masonry ?? {};
  const after = patched(before, {
    ...patch,
    ...heldFields(patch, before, 'unitWeight', 0),
    ...heldFields(patch, before, 'strength', LEAST_ABOVE_ZERO),
    ...heldFields(patch, before, 'friction', LEAST_ABOVE_ZERO),
  });
  return after === before ? scheme : patched(scheme, { masonry: after });
}

function heldFields(patch: Patch<Masonry>, before: Masonry, field: keyof typeof MOST, least: number): Patch<Masonry> {
  const value = patch[field];
  if (typeof value !== 'number') return {};
  return { [field]: Number.isFinite(value) ? held(value, least, MOST[field], least) : before[field] };
}

/** Sets what lies above the ring; `undefined` for the whole says nothing of it. */
export function setAbove(scheme: Scheme, patch: Patch<Above> | undefined): Scheme {
  if (patch === undefined) return patched(scheme, { above: undefined });
  const before = scheme.above ?? { kind: 'none' as const };
  const { kind = before.kind, height, unitWeight, ...others } = patch;
  const within = (field: 'height' | 'unitWeight', value: number | undefined, most: number): Patch<Above> =>
    field in patch ? { [field]: value === undefined ? undefined : held(value, 0, most, before[field] ?? 0) } : {};
  const after = patched<Above>(before, {
    ...others,
    kind,
    ...within('height', height, LIMITS.length),
    ...within('unitWeight', unitWeight, MOST.unitWeight),
  });
  return patched(scheme, { above: after });
}

/** Horizontal acceleration as a share of gravity, + to the right; `undefined` for none. */
export function setSway(scheme: Scheme, sway: number | undefined): Scheme {
  return patched(scheme, { sway: sway === undefined ? undefined : held(sway, -10, 10, scheme.sway ?? 0) });
}

/** The geometric safety asked for; `undefined` leaves it to the default. */
export function setAskedSafety(scheme: Scheme, geometricSafety: number | undefined): Scheme {
  const before = scheme.asked ?? {};
  const value = geometricSafety === undefined ? undefined : held(geometricSafety, 1, 100, before.geometricSafety ?? 1);
  const after = patched(before, { geometricSafety: value });
  return after === before ? scheme : patched(scheme, { asked: after });
}
