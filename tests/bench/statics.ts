/**
 * What the statics cost on this machine: each question on rings of sixty blocks, the thrust against HiGHS on the same
 * rings in the same run, and the growth with the number of joints. Medians; nothing here fails for being slow.
 */
import { assessScheme } from '../../core/assess/assess.ts';
import { buildRing } from '../../core/geometry/ring.ts';
import { resolveScheme } from '../../core/job/defaults.ts';
import type { Profile, Scheme } from '../../core/job/schema.ts';
import type { Block } from '../../core/loading/forces.ts';
import { loadRing } from '../../core/loading/load-ring.ts';
import { leastMiddleShare } from '../../core/statics/geometric-safety.ts';
import { lineRows } from '../../core/statics/rows.ts';
import { ringSystem, type RingSystem } from '../../core/statics/system.ts';
import { thrustRange } from '../../core/statics/thrust.ts';
import type { PrintedModel } from '../validation/equilibrium-programme.ts';
import { blockRivalBuiltAnew, persistentRival, rivalBuiltAnew } from './rival.ts';
import { medianOfFew, medianTime, table, timeInWords } from './timing.ts';

const BLOCKS = 60;

const PROFILES: readonly Profile[] = [
  { shape: 'semicircular', span: 4 },
  { shape: 'segmental', span: 4, rise: 1 },
  { shape: 'pointed', span: 4, rise: 2.8 },
  { shape: 'three-centred', span: 4, rise: 1.4 },
  { shape: 'elliptical', span: 4, rise: 1.4 },
  { shape: 'parabolic', span: 4, rise: 1.6 },
  { shape: 'catenary', span: 4, rise: 1.6 },
];

const schemeOf = (profile: Profile, voussoirs = BLOCKS): Scheme => ({
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
});

interface Subject {
  readonly scheme: Scheme;
  readonly model: PrintedModel;
  readonly system: RingSystem;
  /** The same ring under half as much again of its first load. */
  readonly heavier: RingSystem;
}

function subjectOf(profile: Profile): Subject {
  const scheme = schemeOf(profile);
  const { ring, blocks } = built(scheme);
  const system = ringSystem(ring.joints, blocks);
  const heavier = blocks.map((block): Block => ({
    forces: block.forces.map((force) => (force.from === 'l1' ? { ...force, fy: force.fy * 1.5 } : force)),
  }));
  const subject = { scheme, model: { joints: ring.joints, blocks }, system, heavier: ringSystem(ring.joints, heavier) };
  if (!thrustRange(subject.system).stands || !thrustRange(subject.heavier).stands) {
    throw new Error(`the ${profile.shape} ring of the bench does not stand`);
  }
  return subject;
}

function built(scheme: Scheme) {
  const { resolved } = resolveScheme(scheme);
  const ring = buildRing({
    profile: resolved.profile,
    thickness: { crown: resolved.ring.thickness, springing: resolved.ring.thickness },
    voussoirs: resolved.ring.voussoirs,
    joints: resolved.ring.joints,
  });
  return { ring, blocks: loadRing(ring, resolved) };
}

function assess(scheme: Scheme): void {
  const outcome = assessScheme({ id: 'a1', schemes: [scheme] }, scheme);
  if (!outcome.ok) throw new Error('a ring of the bench was refused');
}

function questions(subjects: readonly Subject[]): void {
  const rows: [string, number, string][] = [
    ['full assessment', medianTime(subjects, ({ scheme }) => assess(scheme)), 'under 1 ms'],
    ['  ring and loads alone', medianTime(subjects, ({ scheme }) => built(scheme)), ''],
    ['least and greatest thrust', medianTime(subjects, ({ system }) => thrustRange(system)), 'under 0.1 ms'],
    ['geometric safety', medianTime(subjects, ({ system }) => leastMiddleShare(system)), ''],
  ];
  console.log(`\nStatics, rings of ${BLOCKS} blocks (${subjects.length} shapes, two loads, wall above)`);
  console.log(
    table([['question', 'median', 'asked for'], ...rows.map(([name, us, asked]) => [name, timeInWords(us), asked])]),
  );
}

function againstHighs(subjects: readonly Subject[]): void {
  const own = medianTime(subjects, ({ system }) => thrustRange(system));
  const rivals = subjects.map(({ system, heavier }) => {
    const rows = lineRows(system);
    return { rival: persistentRival(rows), limits: [rows.b, lineRows(heavier).b] as const, system, heavier };
  });
  for (const { rival, limits, system, heavier } of rivals) {
    expectAgreement(rival.range(limits[1]), heavier);
    expectAgreement(rival.range(limits[0]), system);
  }
  for (const { model, system } of subjects) expectAgreement(blockRivalBuiltAnew(model), system);
  let turn = 0;
  const persistent = medianTime(rivals, ({ rival, limits }) => rival.range(limits[turn++ % 2 === 0 ? 0 : 1]));
  for (const { rival } of rivals) rival.dispose();
  const anew = medianTime(subjects, ({ system }) => rivalBuiltAnew(lineRows(system)));
  const blocks = medianTime(subjects, ({ model }) => blockRivalBuiltAnew(model));
  console.log('\nLeast and greatest thrust against HiGHS, the same rings in the same run');
  console.log(
    table([
      ['method', 'median', 'over ours'],
      ['hinge simplex', timeInWords(own), '1'],
      ['HiGHS, three unknowns kept alive, only bounds changed', timeInWords(persistent), (persistent / own).toFixed(0)],
      ['HiGHS, three unknowns, built anew from typed arrays', timeInWords(anew), (anew / own).toFixed(0)],
      ['HiGHS, every block and joint, built anew', timeInWords(blocks), (blocks / own).toFixed(0)],
    ]),
  );
}

/** The rival must have solved the same question, or its time says nothing. */
function expectAgreement(range: readonly [number | null, number | null], system: RingSystem): void {
  const answer = thrustRange(system);
  const found = answer.stands ? [answer.least, answer.greatest] : [];
  found.forEach((extreme, i) => {
    const own = extreme === null ? null : extreme.horizontal / system.frame.force;
    const theirs = range[i] ?? null;
    const apart = own === null || theirs === null ? (own === theirs ? 0 : Infinity) : Math.abs(own - theirs);
    if (apart > 1e-6) throw new Error(`HiGHS and the hinge simplex differ: ${theirs} and ${own}`);
  });
}

function growth(): void {
  const rows = [1e2, 1e3, 1e4, 1e5].map((joints) => {
    const scheme = schemeOf({ shape: 'segmental', span: 4, rise: 1 }, joints - 1);
    const { ring, blocks } = built(scheme);
    const system = ringSystem(ring.joints, blocks);
    const runs = joints > 1e4 ? 3 : 9;
    const thrust = medianOfFew(() => thrustRange(system), runs);
    const whole = medianOfFew(() => assess(scheme), runs);
    const each = (us: number): string => ((us * 1000) / joints).toFixed(0);
    return [String(joints), timeInWords(thrust), each(thrust), timeInWords(whole), each(whole)];
  });
  console.log('\nGrowth with the number of joints');
  console.log(table([['joints', 'thrust', 'ns a joint', 'assessment', 'ns a joint'], ...rows]));
}

const subjects = PROFILES.map(subjectOf);
questions(subjects);
againstHighs(subjects);
growth();
