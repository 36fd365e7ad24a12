/** Edits of the road over the arch: the factors that the assessor judges for the standard axle load, each above 0 to 1. */
import type { Road, Scheme } from '../schema.ts';
import { held, patched } from './patch.ts';
import type { Patch } from './patch.ts';

const LEAST_FACTOR = 0.001;
const FACTORS = ['spanRise', 'material', 'jointing', 'condition'] as const;

/** Sets the factors given, and a road where there was none; `undefined` for the whole: no road goes over. */
export function setRoad(scheme: Scheme, patch: Patch<Road> | undefined): Scheme {
  if (patch === undefined) return patched(scheme, { road: undefined });
  const before = scheme.road ?? {};
  const factors = FACTORS.filter((field) => patch[field] !== undefined).map((field) => [
    field,
    held(patch[field] as number, LEAST_FACTOR, 1, before[field] ?? 1),
  ]);
  return patched(scheme, { road: patched(before, { ...patch, ...(Object.fromEntries(factors) as Patch<Road>) }) });
}
