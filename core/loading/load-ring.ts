/** All forces on the ring of a scheme, block by block. */
import type { RingGeometry } from '../geometry/ring.ts';
import type { ResolvedScheme } from '../job/defaults.ts';
import { ProblemError, underPath, type Problem } from '../job/problem.ts';
import type { Block, BlockForce, BlockForces } from './forces.ts';
import { addLoad } from './loads.ts';
import { addAbove, addSelfWeight } from './masonry.ts';
import { skyOver } from './sky.ts';

/** Top level of what lies above, m: the wall's or fill's height over the crown extrados. */
export function topLevel(ring: RingGeometry, scheme: Pick<ResolvedScheme, 'above'>): number {
  return ring.crownExtrados.y + (scheme.above.kind === 'none' ? 0 : scheme.above.height);
}

/**
 * Weights, what lies above, loads and sway on each block of the ring. Sway pushes every weight of masonry and fill
 * sideways at its own place; named loads are taken as not fixed to the arch and are not swayed.
 * @throws ProblemError when a load does not stand on the arch; paths from the scheme's root.
 */
export function loadRing(ring: RingGeometry, scheme: ResolvedScheme): Block[] {
  const forces: BlockForces = ring.blocks.map(() => []);
  const { above, breadth, masonry, loads, sway } = scheme;
  addSelfWeight(forces, ring, masonry.unitWeight, breadth);
  if (above.kind !== 'none' || loads.length > 0) {
    const sky = skyOver(ring);
    if (above.kind !== 'none') addAbove(forces, sky, topLevel(ring, scheme), above.unitWeight, breadth);
    const problems: Problem[] = [];
    loads.forEach((load, i) => {
      problems.push(...underPath(`loads[${i}]`, addLoad(forces, sky, load, breadth)));
    });
    if (problems.length > 0) throw new ProblemError(problems);
  }
  if (sway !== 0) for (const block of forces) block.push(...swayForces(block, sway));
  return forces.map((block) => ({ forces: block }));
}

/** Horizontal forces of `sway` times the weight of masonry and fill among these forces, at their places. */
export function swayForces(forces: readonly BlockForce[], sway: number): BlockForce[] {
  return forces
    .filter(({ from }) => from === 'self-weight' || from === 'above')
    .map(({ x, y, fy }) => ({ x, y, fx: -fy * sway, fy: 0, from: 'sway' }));
}
