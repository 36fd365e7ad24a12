/** Questions that may take longer than a frame, for a worker: each reports its progress and can be given up. */
import { addLoad } from '../loading/loads.ts';
import { layersHeight } from '../loading/above.ts';
import { topLevel } from '../loading/load-ring.ts';
import { skyOver } from '../loading/sky.ts';
import type { BlockForces } from '../loading/forces.ts';
import type { Hinge } from '../statics/hinge.ts';
import { greatestMultiplier } from '../statics/multiplier.ts';
import { remainingSpread, type Direction, type RemainingSpread } from '../statics/remaining-spread.ts';
import { ringSystem, sumsOf } from '../statics/system.ts';
import type { BuiltScheme } from './build.ts';
import { withoutForces } from './multiples.ts';
import { plainHinges } from './printed.ts';

/** Called with the share of the way done; returning false gives the question up. */
export type Progress = (share: number) => boolean;

export interface Axle {
  /** kN on the whole breadth. */
  readonly force: number;
  /** Length of the wheels' print along the span, m. */
  readonly patch: number;
  /** Spread to each side for each metre down through the fill. */
  readonly dispersal: number;
}

export interface AxlePlace {
  readonly x: number;
  /** Null where the ring holds any multiple of the axle there. */
  readonly factor: number | null;
  readonly hinges: readonly Hinge[];
}

export interface AxleEnvelope {
  readonly places: readonly AxlePlace[];
  /** The place with the least factor; null where no place has a limit. */
  readonly worst: AxlePlace | null;
}

/**
 * The load factor of an axle at even steps across the ring, beside all loads of the scheme.
 * @param instead a load of the scheme that it stands in place of, such as the axle itself where it was entered.
 * @returns null when the ring does not stand by itself, or when it was given up.
 */
export function axleEnvelope(
  built: BuiltScheme,
  axle: Axle,
  steps: number,
  progress: Progress,
  instead?: string,
): AxleEnvelope | null {
  const { force, patch, dispersal } = axle;
  const { ring, joints, resolved } = built;
  const blocks = instead === undefined ? built.blocks : withoutForces(built.blocks, instead);
  const system = instead === undefined ? built.system : ringSystem(joints, blocks);
  const sky = skyOver(ring);
  const surface = topLevel(ring, resolved) + layersHeight(resolved.above.layers);
  const ground = { sky, breadth: resolved.breadth, surface };
  const places: AxlePlace[] = [];
  for (let i = 0; i < steps; i++) {
    if (!progress(i / steps)) return null;
    const x = sky.left.x + ((sky.right.x - sky.left.x) * (i + 0.5)) / steps;
    const forces: BlockForces = blocks.map(() => []);
    addLoad(forces, ground, { id: 'axle', name: 'axle', action: 'variable', kind: 'axle', x, force, patch, dispersal });
    const set = sumsOf(
      system.frame,
      forces.map((block) => ({ forces: block })),
      (block) => block.forces,
    );
    const answer = greatestMultiplier(system, set);
    if (answer.kind === 'never-stands') return null;
    places.push(
      answer.kind === 'limit'
        ? { x, factor: answer.factor, hinges: plainHinges(answer.hinges) }
        : { x, factor: null, hinges: [] },
    );
  }
  const limit = (place: AxlePlace): number => place.factor ?? Infinity;
  const worst = places.reduce((least, place) => (limit(place) < limit(least) ? place : least));
  return { places, worst: worst.factor === null ? null : worst };
}

/** Steps to the furthest movement asked for: at twice as many the answer changes in the third figure at most. */
const SPREAD_STEPS = 200;

/** How far the supports can still part (or go in another direction) before the ring falls; see `remainingSpread`. */
export function spreadLeft(
  { joints, blocks }: BuiltScheme,
  direction: Direction,
  furthest: number,
  progress: Progress,
): RemainingSpread | null {
  return remainingSpread(joints, blocks, direction, furthest, SPREAD_STEPS, progress);
}
