/** All forces on the ring of a scheme, block by block. */
import type { RingGeometry } from '../geometry/ring.ts';
import type { ResolvedScheme } from '../job/defaults.ts';
import { ProblemError, underPath, type Problem } from '../job/problem.ts';
import { addBacking, addColumns, addLayers, addSidePressure, layersHeight, takeOutOpenings } from './above.ts';
import type { Block, BlockForce, BlockForces } from './forces.ts';
import { addLoad } from './loads.ts';
import { addSelfWeight } from './self-weight.ts';
import { skyOver, type Sky } from './sky.ts';

/** Top level of the wall or fill, m: its height over the crown extrados. */
export function topLevel(ring: RingGeometry, scheme: Pick<ResolvedScheme, 'above'>): number {
  return ring.crownExtrados.y + (scheme.above.kind === 'none' ? 0 : scheme.above.height);
}

/**
 * Weights, what lies above, loads and sway on each block of the ring. Sway pushes every weight of masonry and fill
 * sideways at its own place; named loads are taken as not fixed to the arch and are not swayed.
 * @param offTheRing what to make of loads that stand beside the ring: a slip to refuse, or, for a trial ring thinner
 * than the one surveyed, a load that rests on what holds the arch.
 * @throws ProblemError when a load does not stand on the arch; paths from the scheme's root.
 */
export function loadRing(
  ring: RingGeometry,
  scheme: ResolvedScheme,
  offTheRing: 'refused' | 'rests-beside' = 'refused',
): Block[] {
  const forces: BlockForces = ring.blocks.map(() => []);
  const { above, backing, breadth, masonry, loads, sway } = scheme;
  addSelfWeight(forces, ring, masonry.unitWeight, breadth);
  if (above.kind !== 'none' || backing !== null || loads.length > 0) {
    const sky = skyOver(ring);
    const problems: Problem[] = [];
    if (above.kind !== 'none') problems.push(...addWhatLiesAbove(forces, ring, sky, scheme));
    if (backing !== null) addBacking(forces, ring, backing, above.unitWeight, breadth);
    const ground = { sky, breadth, surface: topLevel(ring, scheme) + layersHeight(above.layers) };
    loads.forEach((load, i) => {
      const slips = addLoad(forces, ground, load);
      if (offTheRing === 'refused') problems.push(...underPath(`loads[${i}]`, slips));
    });
    if (problems.length > 0) throw new ProblemError(problems);
  }
  if (sway !== 0) for (const block of forces) block.push(...swayForces(block, sway));
  return forces.map((block) => ({ forces: block }));
}

function addWhatLiesAbove(
  forces: BlockForces,
  ring: RingGeometry,
  sky: Sky,
  { above, backing, breadth }: Pick<ResolvedScheme, 'above' | 'backing' | 'breadth'>,
): Problem[] {
  const top = topLevel(ring, { above });
  const problems: Problem[] = [];
  if (backing !== null && backing.level > top) {
    problems.push({
      path: 'backing.level',
      value: `${backing.level} m`,
      wrong: 'the backing stands higher than what lies above the ring',
      right: `at most ${Number(top.toPrecision(4))} m here`,
    });
  }
  addColumns(forces, sky, top, above.unitWeight, breadth);
  addLayers(forces, sky, above.layers, breadth);
  addSidePressure(forces, sky, top, above.sidePressure, above.unitWeight, breadth);
  return [...problems, ...underPath('above', takeOutOpenings(forces, sky, above, top, breadth))];
}

/** Horizontal forces of `sway` times the weight of masonry and fill among these forces, at their places. */
export function swayForces(forces: readonly BlockForce[], sway: number): BlockForce[] {
  return forces
    .filter(({ from, fy }) => (from === 'self-weight' || from === 'above') && fy !== 0)
    .map(({ x, y, fy }) => ({ x, y, fx: -fy * sway, fy: 0, from: 'sway' }));
}
