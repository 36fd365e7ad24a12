/** How far each load, and a sideways acceleration, could grow before the ring becomes a mechanism. */
import { swayForces } from '../loading/load-ring.ts';
import type { Block } from '../loading/forces.ts';
import { greatestMultiplier } from '../statics/multiplier.ts';
import { ringSystem, sumsOf } from '../statics/system.ts';
import type { LoadFactor } from './assessment.ts';
import type { BuiltScheme } from './build.ts';
import { plainHinges } from './printed.ts';

/** The blocks without the forces that come from one source. */
export const withoutForces = (blocks: readonly Block[], from: string): Block[] =>
  blocks.map(({ forces }) => ({ forces: forces.filter((force) => force.from !== from) }));

/** The factor of each load by itself, the others staying as they are. */
export function loadFactors({ resolved, joints, blocks }: BuiltScheme): LoadFactor[] {
  return resolved.loads.map(({ id }) => {
    const rest = ringSystem(joints, withoutForces(blocks, id));
    const set = sumsOf(rest.frame, blocks, ({ forces }) => forces.filter(({ from }) => from === id));
    const answer = greatestMultiplier(rest, set);
    return answer.kind === 'limit'
      ? { load: id, factor: answer.factor, hinges: plainHinges(answer.hinges) }
      : { load: id, factor: null, hinges: answer.kind === 'unlimited' ? [] : plainHinges(answer.hinges) };
  });
}

/**
 * The sideways acceleration over gravity, either way, at which the ring becomes a mechanism: the smaller of the two.
 * Null when the ring does not stand upright, or when no acceleration moves it.
 */
export function swayCapacity({ joints, blocks }: BuiltScheme): number | null {
  const rest = ringSystem(joints, withoutForces(blocks, 'sway'));
  let least: number | null = null;
  for (const direction of [1, -1]) {
    const set = sumsOf(rest.frame, blocks, ({ forces }) => swayForces(forces, direction));
    const answer = greatestMultiplier(rest, set);
    if (answer.kind === 'never-stands') return null;
    if (answer.kind === 'limit') least = least === null ? answer.factor : Math.min(least, answer.factor);
  }
  return least;
}
