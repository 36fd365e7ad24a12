/** Named loads on the ring, kN on the whole breadth. */
import type { ResolvedLoad } from '../job/defaults.ts';
import type { Problem } from '../job/problem.ts';
import type { BlockForces } from './forces.ts';
import { backAt, blocksUnder, type Sky } from './sky.ts';
import { addEvenly } from './strips.ts';

type Of<Kind extends ResolvedLoad['kind']> = Extract<ResolvedLoad, { readonly kind: Kind }>;

const figure = (value: number): string => String(Number(value.toPrecision(4)));

/** Where loads stand: over which ring, how broad it is, and how high the surface is that wheels run on. */
export interface LoadedGround {
  readonly sky: Sky;
  /** m */
  readonly breadth: number;
  /** Top of all that lies above, m. */
  readonly surface: number;
}

/** Adds one load to the blocks beneath it; what is wrong with its place comes back as problems. */
export function addLoad(forces: BlockForces, ground: LoadedGround, load: ResolvedLoad): Problem[] {
  switch (load.kind) {
    case 'point':
      return addPoint(forces, ground, load);
    case 'strip':
      return addStrip(forces, ground, load);
    case 'axle':
      return addAxle(forces, ground, load);
  }
}

function addPoint(forces: BlockForces, { sky }: LoadedGround, load: Of<'point'>): Problem[] {
  return standsAt(forces, sky, load, load.force) ? [] : [offTheArch(sky, load)];
}

/** False when x is off the ring. */
function standsAt(forces: BlockForces, sky: Sky, { id, x }: Of<'point' | 'axle'>, force: number): boolean {
  const under = blocksUnder(sky, x);
  for (const { block, share } of under) {
    forces[block]?.push({ x, y: backAt(sky, block, x), fx: 0, fy: -force * share, from: id });
  }
  return under.length > 0;
}

const offTheArch = (sky: Sky, { name, x }: Of<'point' | 'axle'>): Problem => ({
  path: 'x',
  value: `${x} m`,
  wrong: `the load "${name}" stands off the arch`,
  right: `between ${figure(sky.left.x)} and ${figure(sky.right.x)} m`,
});

/** The part of a strip beyond the ring rests on what holds the arch, not on the arch; a strip wholly off it is a slip. */
function addStrip(forces: BlockForces, { sky, breadth }: LoadedGround, load: Of<'strip'>): Problem[] {
  if (!(load.from < load.to)) {
    return [
      {
        path: 'to',
        value: `${load.to} m`,
        wrong: `the strip "${load.name}" ends where it begins or before`,
        right: `more than ${load.from} m`,
      },
    ];
  }
  if (!(Math.max(load.from, sky.left.x) < Math.min(load.to, sky.right.x))) {
    return [
      {
        path: 'from',
        value: `${load.from} to ${load.to} m`,
        wrong: `the strip "${load.name}" lies off the arch`,
        right: `let it lie at least partly between ${figure(sky.left.x)} and ${figure(sky.right.x)} m`,
      },
    ];
  }
  addEvenly(forces, sky, load.from, load.to, load.intensity * breadth, load.id);
  return [];
}

/** An axle spreads from its print down to the back of the ring beneath it, evenly, by `dispersal` to each side a metre. */
function addAxle(forces: BlockForces, { sky, surface }: LoadedGround, load: Of<'axle'>): Problem[] {
  const [under] = blocksUnder(sky, load.x);
  if (under === undefined) return [offTheArch(sky, load)];
  const depth = Math.max(0, surface - backAt(sky, under.block, load.x));
  const half = load.patch / 2 + load.dispersal * depth;
  if (half > 0) addEvenly(forces, sky, load.x - half, load.x + half, load.force / (2 * half), load.id);
  else standsAt(forces, sky, load, load.force);
  return [];
}
