/** Edits of what lies above beyond its height: backing, layers, openings, side pressure. Units: m, kN/m³. */
import { LIMITS } from '../schema.ts';
import type { Above, Backing, Scheme } from '../schema.ts';
import { withChanged, withEntry, without } from './entries.ts';
import { held, patched } from './patch.ts';
import type { Patch } from './patch.ts';
import { SMALLEST } from './shapes.ts';

export type LayerAbove = NonNullable<Above['layers']>[number];
export type Opening = NonNullable<Above['openings']>[number];

const MOST_WEIGHT = 200;
const MOST_SIDE_PRESSURE = 10;

/** Sets what is known of the backing, and begins one as weight only; `undefined` for the whole: there is none. */
export function setBacking(scheme: Scheme, patch: Patch<Backing> | undefined): Scheme {
  if (patch === undefined) return patched(scheme, { backing: undefined });
  const before: Backing = scheme.backing ?? { level: 0, counts: 'weight' };
  const { level = before.level, counts = before.counts, unitWeight, ...others } = patch;
  const weight =
    'unitWeight' in patch
      ? { unitWeight: unitWeight === undefined ? undefined : held(unitWeight, 0, MOST_WEIGHT, before.unitWeight ?? 0) }
      : {};
  const after = patched<Backing>(before, {
    ...others,
    level: held(level, -LIMITS.length, LIMITS.length, before.level),
    counts,
    ...weight,
  });
  return patched(scheme, { backing: after });
}

function withAbove(scheme: Scheme, patch: Patch<Above>): Scheme {
  const before: Above = scheme.above ?? { kind: 'none' };
  const after = patched(before, patch);
  return after === before ? scheme : patched(scheme, { above: after });
}

/** On top of the other layers. */
export function addLayer(scheme: Scheme, layer: LayerAbove): Scheme {
  return withAbove(scheme, {
    layers: withEntry(scheme.above?.layers, heldLayer(layer, { thickness: SMALLEST.thickness, unitWeight: 0 })),
  });
}

export function setLayer(scheme: Scheme, place: number, patch: Patch<LayerAbove>): Scheme {
  const edit = (layer: LayerAbove): LayerAbove => heldLayer(patched(layer, patch), layer);
  return withAbove(scheme, { layers: withChanged(scheme.above?.layers, place, edit) });
}

export function removeLayer(scheme: Scheme, place: number): Scheme {
  return withAbove(scheme, { layers: without(scheme.above?.layers, place) });
}

const heldLayer = (layer: LayerAbove, before: LayerAbove): LayerAbove =>
  patched(layer, {
    thickness: held(layer.thickness, SMALLEST.thickness, LIMITS.length, before.thickness),
    unitWeight: held(layer.unitWeight, 0, MOST_WEIGHT, before.unitWeight),
  });

const NOWHERE: Opening = { from: 0, to: 0, sill: 0, head: 0 };

export function addOpening(scheme: Scheme, opening: Opening): Scheme {
  return withAbove(scheme, { openings: withEntry(scheme.above?.openings, heldOpening(opening, NOWHERE)) });
}

/** An opening whose sides or heights cross is turned the right way round. */
export function setOpening(scheme: Scheme, place: number, patch: Patch<Opening>): Scheme {
  const edit = (opening: Opening): Opening => heldOpening(patched(opening, patch), opening);
  return withAbove(scheme, { openings: withChanged(scheme.above?.openings, place, edit) });
}

export function removeOpening(scheme: Scheme, place: number): Scheme {
  return withAbove(scheme, { openings: without(scheme.above?.openings, place) });
}

function heldOpening(opening: Opening, before: Opening): Opening {
  const place = (field: 'from' | 'to' | 'sill' | 'head'): number =>
    held(opening[field], -LIMITS.length, LIMITS.length, before[field]);
  const [from, to] = inOrder(place('from'), place('to'));
  const [sill, head] = inOrder(place('sill'), place('head'));
  return patched(opening, { from, to, sill, head });
}

const inOrder = (a: number, b: number): readonly [number, number] => (a <= b ? [a, b] : [b, a]);

/** Horizontal over vertical pressure of the fill on the back of the ring; `undefined` or nothing leaves it out. */
export function setSidePressure(scheme: Scheme, ratio: number | undefined): Scheme {
  const before = scheme.above?.sidePressure;
  const sidePressure = ratio === undefined ? undefined : held(ratio, 0, MOST_SIDE_PRESSURE, before ?? 0);
  return withAbove(scheme, { sidePressure: sidePressure === 0 ? undefined : sidePressure });
}
