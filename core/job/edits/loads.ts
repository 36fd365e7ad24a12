/** Edits of the loads: scheme to scheme. Units: m from mid-span, kN, kN/m² on the whole breadth, + downwards. */
import { LIMITS } from '../schema.ts';
import type { Load, Scheme } from '../schema.ts';
import { withoutLoadFactors } from './combinations.ts';
import { nextId } from './ids.ts';
import { held, patched, unlessSame } from './patch.ts';
import type { Patch } from './patch.ts';
import { SMALLEST } from './shapes.ts';

type Point = Extract<Load, { readonly kind: 'point' }>;
type Strip = Extract<Load, { readonly kind: 'strip' }>;
type Axle = Extract<Load, { readonly kind: 'axle' }>;

/** A load before it has its id. */
export type NewLoad = Omit<Point, 'id'> | Omit<Strip, 'id'> | Omit<Axle, 'id'>;

/** The fields of a load that can be typed; those that its kind does not have are passed over. */
export type LoadPatch = Patch<Omit<Point, 'id' | 'kind'> & Omit<Strip, 'id' | 'kind'> & Omit<Axle, 'id' | 'kind'>>;

/** The id that the next added load will have. */
export function nextLoadId(scheme: Scheme): string {
  return nextId('l', scheme.loads ?? []);
}

/** Adds at the end; the scheme as it is where it holds as many loads as it may. */
export function addLoad(scheme: Scheme, load: NewLoad): Scheme {
  const loads = scheme.loads ?? [];
  if (loads.length >= LIMITS.loads) return scheme;
  return patched(scheme, { loads: [...loads, heldLoad({ id: nextLoadId(scheme), ...load })] });
}

/** Its own factors in the combinations go with it. */
export function removeLoad(scheme: Scheme, loadId: string): Scheme {
  const loads = scheme.loads ?? [];
  const left = loads.filter(({ id }) => id !== loadId);
  return left.length === loads.length ? scheme : patched(withoutLoadFactors(scheme, loadId), { loads: left });
}

/** Sets the fields given; a strip whose ends cross is turned the right way round. */
export function setLoad(scheme: Scheme, loadId: string, patch: LoadPatch): Scheme {
  return withLoad(scheme, loadId, (load) => {
    const { name, action, x, force, from, to, intensity } = patch;
    const named: Load = patched<Load>(load, {
      ...('name' in patch ? { name } : {}),
      ...('action' in patch ? { action } : {}),
    });
    if (named.kind !== 'strip') {
      const placed = { ...named, x: known(x, named.x), force: known(force, named.force) };
      return heldLoad(placed.kind === 'axle' ? patched(placed, wheels(placed, patch)) : placed);
    }
    const [left, right] = [known(from, named.from), known(to, named.to)].sort((a, b) => a - b) as [number, number];
    return heldLoad({ ...named, from: left, to: right, intensity: known(intensity, named.intensity) });
  });
}

/** A load dragged along: `x` is where a point load goes, or the middle of a strip. */
export function moveLoad(scheme: Scheme, loadId: string, x: number): Scheme {
  return withLoad(scheme, loadId, (load) => {
    if (!Number.isFinite(x)) return load;
    if (load.kind !== 'strip') return heldLoad({ ...load, x });
    const half = (load.to - load.from) / 2;
    const middle = held(x, half - LIMITS.length, LIMITS.length - half, x);
    return heldLoad({ ...load, from: middle - half, to: middle + half });
  });
}

/** One end of a strip dragged; it stops short of the other end. Point loads have no ends and stay. */
export function resizeStrip(scheme: Scheme, loadId: string, end: 'from' | 'to', x: number): Scheme {
  return withLoad(scheme, loadId, (load) => {
    if (load.kind !== 'strip' || !Number.isFinite(x)) return load;
    return end === 'from'
      ? heldLoad({ ...load, from: Math.min(x, load.to - SMALLEST.strip) })
      : heldLoad({ ...load, to: Math.max(x, load.from + SMALLEST.strip) });
  });
}

function withLoad(scheme: Scheme, loadId: string, edit: (load: Load) => Load): Scheme {
  const loads = scheme.loads ?? [];
  const before = loads.find(({ id }) => id === loadId);
  if (before === undefined) return scheme;
  const after = unlessSame(before, edit(before));
  return after === before ? scheme : patched(scheme, { loads: loads.map((load) => (load === before ? after : load)) });
}

function known(value: number | undefined, otherwise: number): number {
  return value !== undefined && Number.isFinite(value) ? value : otherwise;
}

const MOST_DISPERSAL = 5;

/** Print and spread of an axle where the patch names them; `undefined` leaves them to what is usually taken. */
function wheels(axle: Axle, given: LoadPatch): Patch<Axle> {
  const field = (name: 'patch' | 'dispersal', most: number): Patch<Axle> => {
    if (!(name in given)) return {};
    const value = given[name];
    return { [name]: value === undefined ? undefined : held(value, 0, most, axle[name] ?? 0) };
  };
  return { ...field('patch', LIMITS.length), ...field('dispersal', MOST_DISPERSAL) };
}

function heldLoad(load: Load): Load {
  if (load.kind !== 'strip') {
    const { x, force } = load;
    return {
      ...load,
      x: held(x, -LIMITS.length, LIMITS.length, 0),
      force: held(force, -LIMITS.force, LIMITS.force, 0),
    };
  }
  const from = held(load.from, -LIMITS.length, LIMITS.length - SMALLEST.strip, 0);
  const to = held(load.to, from + SMALLEST.strip, LIMITS.length, from + SMALLEST.strip);
  return { ...load, from, to, intensity: held(load.intensity, -LIMITS.force, LIMITS.force, 0) };
}
