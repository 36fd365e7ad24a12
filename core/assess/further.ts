/**
 * The answers beyond the first look, for the assessment document, the sheets and the panels that ask for them: load
 * combinations, movements of the supports, cracks, and the comparisons that are no checks.
 */
import { readCracks, type CrackReading } from '../checks/crack-reading.ts';
import { proportionFacts, roadArchRises } from '../checks/profile-facts.ts';
import { proportionRules, type ProportionRule } from '../checks/proportion-rules.ts';
import { roadAxle, type RoadAxle } from '../checks/road-axle.ts';
import type { ResolvedCombination, ResolvedScheme } from '../job/defaults.ts';
import { layersHeight } from '../loading/above.ts';
import type { Block, BlockForce, BlockForces } from '../loading/forces.ts';
import { swayForces, topLevel } from '../loading/load-ring.ts';
import { addLoad } from '../loading/loads.ts';
import { skyOver } from '../loading/sky.ts';
import { crackPatterns, type CrackPattern } from '../statics/crack-pattern.ts';
import { leastMiddleShare } from '../statics/geometric-safety.ts';
import { greatestMultiplier } from '../statics/multiplier.ts';
import { ringSystem, sumsOf } from '../statics/system.ts';
import { thrustRange } from '../statics/thrust.ts';
import type { CombinationAnswer } from './assessment.ts';
import type { BuiltScheme } from './build.ts';
import { marksOf } from './marks.ts';
import { plainHinges } from './printed.ts';

/** Each combination: does the ring stand under its factors, and how far could its variable loads grow together. */
export function combinationAnswers(built: BuiltScheme): CombinationAnswer[] {
  const { joints, blocks, resolved } = built;
  return resolved.combinations.map((combination): CombinationAnswer => {
    const factor = factorsOf(combination, resolved);
    const factored = blocks.map(({ forces }): Block => ({
      forces: forces.map((force) => scaled(force, factor(force))),
    }));
    const variable = new Set(resolved.loads.filter(({ action }) => action === 'variable').map(({ id }) => id));
    const rest = ringSystem(
      joints,
      factored.map(({ forces }) => ({ forces: forces.filter(({ from }) => !variable.has(from)) })),
    );
    const set = sumsOf(rest.frame, factored, ({ forces }) => forces.filter(({ from }) => variable.has(from)));
    const system = ringSystem(joints, factored);
    const thrust = thrustRange(system);
    const middle = leastMiddleShare(system);
    const growth = variable.size === 0 ? null : greatestMultiplier(rest, set);
    return {
      combination: combination.id,
      name: combination.name,
      stands: thrust.stands,
      least: thrust.stands ? (thrust.least?.horizontal ?? null) : null,
      greatest: thrust.stands ? (thrust.greatest?.horizontal ?? null) : null,
      geometricSafety: thrust.stands && middle !== null && middle.share > 0 ? 1 / middle.share : null,
      variableFactor: growth?.kind === 'limit' ? growth.factor : null,
      hinges: growth?.kind === 'limit' ? plainHinges(growth.hinges) : [],
    };
  });
}

/** A load's own factor, else that of its action; masonry and fill as permanent; sway as it is. */
function factorsOf(combination: ResolvedCombination, { loads }: ResolvedScheme): (force: BlockForce) => number {
  const byLoad = new Map<string, number>(loads.map(({ id, action }) => [id, combination[action]]));
  for (const { load, factor } of combination.factors) byLoad.set(load, factor);
  return ({ from }) => (from === 'sway' ? 1 : (byLoad.get(from) ?? combination.permanent));
}

const scaled = (force: BlockForce, factor: number): BlockForce => ({
  ...force,
  fx: force.fx * factor,
  fy: force.fy * factor,
});

/** Places along the span at which an overload is tried. */
const OVERLOAD_PLACES = 13;

/** How the ring would open under each movement that commonly cracks an arch. */
export function movementPatterns({ system, joints, blocks, resolved, ring }: BuiltScheme): CrackPattern[] {
  const sway = sumsOf(system.frame, blocks, ({ forces }) => swayForces(forces, 1));
  const sky = skyOver(ring);
  const surface = topLevel(ring, resolved) + layersHeight(resolved.above.layers);
  const ground = { sky, breadth: resolved.breadth, surface };
  const overloads = Array.from({ length: OVERLOAD_PLACES }, (_, i) => {
    const x = sky.left.x + ((sky.right.x - sky.left.x) * (i + 1)) / (OVERLOAD_PLACES + 1);
    const forces: BlockForces = blocks.map(() => []);
    addLoad(forces, ground, { id: 'overload', name: 'overload', action: 'variable', kind: 'point', x, force: 1 });
    const loaded = forces.map((block): Block => ({ forces: block }));
    return { x, sums: sumsOf(system.frame, loaded, (block) => block.forces) };
  });
  return crackPatterns(system, joints, sway, overloads);
}

/** The movements that could have made the cracks marked in the scheme, ranked. */
export function crackReading(built: BuiltScheme, patterns = movementPatterns(built)): CrackReading {
  return readCracks(marksOf(built.resolved.cracks, built.joints), patterns, built.joints.length);
}

/** The rules of proportion beside the surveyed ring. */
export const proportions = ({ resolved }: BuiltScheme): ProportionRule[] =>
  proportionRules(proportionFacts(resolved.profile, resolved.ring.thickness));

/** The standard axle load of a road arch; null where no road is entered. */
export function roadComparison({ resolved }: BuiltScheme): RoadAxle | null {
  const { road, profile, ring, above } = resolved;
  if (road === null) return null;
  const { spanRise, material, jointing: joint, condition } = road;
  const fill = (above.kind === 'none' ? 0 : above.height) + layersHeight(above.layers);
  return roadAxle(
    { ...roadArchRises(profile), ringThickness: ring.thickness, fill },
    given({ spanRise, material, joint, condition }),
  );
}

/** The fields that have a value. */
function given<T extends Record<string, number | undefined>>(fields: T): { [Key in keyof T]?: number } {
  return Object.fromEntries(Object.entries(fields).filter(([, value]) => value !== undefined)) as {
    [Key in keyof T]?: number;
  };
}
