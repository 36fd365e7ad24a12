/** The rings that the benches ask: seven shapes of sixty blocks, a wall above, two loads; all of them stand. */
import { assessScheme } from '../../core/assess/assess.ts';
import { buildScheme, type BuiltScheme } from '../../core/assess/build.ts';
import { resolveScheme } from '../../core/job/defaults.ts';
import type { Profile, Scheme } from '../../core/job/schema.ts';
import type { Block } from '../../core/loading/forces.ts';
import { swayForces } from '../../core/loading/load-ring.ts';
import { leastMiddleShare, type MiddleShare } from '../../core/statics/geometric-safety.ts';
import { ringSystem, sumsOf, type RingSystem, type Sums } from '../../core/statics/system.ts';
import { thrustRange } from '../../core/statics/thrust.ts';

export const BLOCKS = 60;

const PROFILES: readonly Profile[] = [
  { shape: 'semicircular', span: 4 },
  { shape: 'segmental', span: 4, rise: 1 },
  { shape: 'pointed', span: 4, rise: 2.8 },
  { shape: 'three-centred', span: 4, rise: 1.4 },
  { shape: 'elliptical', span: 4, rise: 1.4 },
  { shape: 'parabolic', span: 4, rise: 1.6 },
  { shape: 'catenary', span: 4, rise: 1.6 },
];

export const benchScheme = (profile: Profile, voussoirs = BLOCKS): Scheme => ({
  id: 's1',
  profile,
  ring: { thickness: 0.45, voussoirs, joints: 'radial' },
  breadth: 0.6,
  masonry: { unitWeight: 22, strength: 5.8, friction: 0.6 },
  above: { kind: 'wall', height: 0.6, unitWeight: 20 },
  loads: [
    { id: 'l1', kind: 'point', x: 0.4, force: 8 },
    { id: 'l2', kind: 'strip', from: -1, to: 0.5, intensity: 6 },
  ],
  combinations: [{ id: 'c1', permanent: 1.35, variable: 1.5 }],
});

/** A set of forces and the ring under all others, as a multiplier asks for them. */
export interface Multiplied {
  readonly rest: RingSystem;
  readonly set: Sums;
}

export interface Subject {
  readonly scheme: Scheme;
  readonly built: BuiltScheme;
  /** The same ring under half as much again of its first load. */
  readonly heavier: RingSystem;
  readonly middle: MiddleShare;
  readonly firstLoad: Multiplied;
  readonly sway: Multiplied;
}

export const built = (scheme: Scheme): BuiltScheme => buildScheme(resolveScheme(scheme).resolved);

export function assess(scheme: Scheme): void {
  const outcome = assessScheme({ id: 'a1', schemes: [scheme] }, scheme);
  if (!outcome.ok) throw new Error('a ring of the bench was refused');
}

export const subjects = (): Subject[] => PROFILES.map(subjectOf);

function subjectOf(profile: Profile): Subject {
  const scheme = benchScheme(profile);
  const ring = built(scheme);
  const { joints, blocks, system } = ring;
  const changed = (factor: number): Block[] =>
    blocks.map(({ forces }) => ({
      forces: forces.map((force) => (force.from === 'l1' ? { ...force, fy: force.fy * factor } : force)),
    }));
  const heavier = ringSystem(joints, changed(1.5));
  const rest = ringSystem(joints, changed(0));
  const middle = leastMiddleShare(system);
  if (!thrustRange(system).stands || !thrustRange(heavier).stands || middle === null) {
    throw new Error(`the ${profile.shape} ring of the bench does not stand`);
  }
  return {
    scheme,
    built: ring,
    heavier,
    middle,
    firstLoad: { rest, set: sumsOf(rest.frame, blocks, ({ forces }) => forces.filter(({ from }) => from === 'l1')) },
    sway: { rest: system, set: sumsOf(system.frame, blocks, ({ forces }) => swayForces(forces, 1)) },
  };
}
