/** Point and strip loads on the ring, kN on the whole breadth. */
import type { ResolvedLoad } from '../job/defaults.ts';
import type { Problem } from '../job/problem.ts';
import type { BlockForces } from './forces.ts';
import { backAt, blocksUnder, type Sky } from './sky.ts';

const figure = (value: number): string => String(Number(value.toPrecision(4)));

/** Adds one load to the blocks beneath it; what is wrong with its place comes back as problems. `breadth` m. */
export function addLoad(forces: BlockForces, sky: Sky, load: ResolvedLoad, breadth: number): Problem[] {
  switch (load.kind) {
    case 'point':
      return addPoint(forces, sky, load);
    case 'strip':
      return addStrip(forces, sky, load, breadth);
  }
}

function addPoint(forces: BlockForces, sky: Sky, load: Extract<ResolvedLoad, { kind: 'point' }>): Problem[] {
  const under = blocksUnder(sky, load.x);
  if (under.length === 0) {
    return [
      {
        path: 'x',
        value: `${load.x} m`,
        wrong: `the load "${load.name}" stands off the arch`,
        right: `between ${figure(sky.left.x)} and ${figure(sky.right.x)} m`,
      },
    ];
  }
  for (const { block, share } of under) {
    forces[block]?.push({ x: load.x, y: backAt(sky, block, load.x), fx: 0, fy: -load.force * share, from: load.id });
  }
  return [];
}

/** The part of a strip beyond the ring rests on what holds the arch, not on the arch; a strip wholly off it is a slip. */
function addStrip(
  forces: BlockForces,
  sky: Sky,
  load: Extract<ResolvedLoad, { kind: 'strip' }>,
  breadth: number,
): Problem[] {
  const from = Math.max(load.from, sky.left.x);
  const to = Math.min(load.to, sky.right.x);
  if (!(load.from < load.to)) {
    return [
      { path: 'to', value: `${load.to} m`, wrong: `the strip "${load.name}" ends where it begins or before`, right: `more than ${load.from} m` },
    ];
  }
  if (!(from < to)) {
    return [
      {
        path: 'from',
        value: `${load.from} to ${load.to} m`,
        wrong: `the strip "${load.name}" lies off the arch`,
        right: `let it lie at least partly between ${figure(sky.left.x)} and ${figure(sky.right.x)} m`,
      },
    ];
  }
  for (const block of sky.open) {
    const face = sky.faces[block];
    if (!face) continue;
    const a = Math.max(from, face.from.x);
    const b = Math.min(to, face.to.x);
    if (!(a < b)) continue;
    const x = (a + b) / 2;
    forces[block]?.push({ x, y: backAt(sky, block, x), fx: 0, fy: -load.intensity * breadth * (b - a), from: load.id });
  }
  return [];
}
