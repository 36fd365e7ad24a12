/**
 * What the statics cost on this machine: each question on rings of sixty blocks, beside HiGHS on the same rings in the
 * same run where it can answer, and the growth with the number of joints. Medians; nothing here fails for being slow.
 */
import { combinationAnswers, movementPatterns } from '../../core/assess/further.ts';
import { axleEnvelope, spreadLeft } from '../../core/assess/long-questions.ts';
import { loadFactors, swayCapacity } from '../../core/assess/multiples.ts';
import { leastMiddleShare } from '../../core/statics/geometric-safety.ts';
import { greatestMultiplier } from '../../core/statics/multiplier.ts';
import { neededStrength } from '../../core/statics/needed-strength.ts';
import { lineRows, lineRowsWith } from '../../core/statics/rows.ts';
import { neededFriction, slidingRows } from '../../core/statics/sliding.ts';
import { answerToMovement } from '../../core/statics/support-movement.ts';
import { ringSystem, type RingSystem } from '../../core/statics/system.ts';
import { thrustRange } from '../../core/statics/thrust.ts';
import { usableThrust } from '../../core/statics/usable-thrust.ts';
import { blockRivalBuiltAnew, joined, leastBuiltAnew, persistentRival, rivalBuiltAnew } from './rival.ts';
import { assess, benchScheme, BLOCKS, built, subjects as benchSubjects, type Subject } from './subjects.ts';
import { medianOfFew, medianTime, table, timeInWords } from './timing.ts';

interface Question {
  readonly name: string;
  readonly run: (subject: Subject) => unknown;
  readonly asked?: string;
  /** The same question put to HiGHS: the same rows, its model built anew. */
  readonly rival?: (subject: Subject) => unknown;
  /** Too slow for hundreds of runs. */
  readonly slow?: true;
}

/** The ring's figures made anew, as a drag makes them: rows and forms are kept once made, and would cost nothing here. */
const anew = ({ built: { joints, blocks } }: Subject): RingSystem => ringSystem(joints, blocks);

const yes = (): boolean => true;
const FRICTION = { friction: 0.6, strength: null, breadth: 0.6 };

const QUESTIONS: readonly Question[] = [
  { name: 'full assessment', run: ({ scheme }) => assess(scheme), asked: 'under 1 ms' },
  { name: '  ring and loads alone', run: ({ scheme }) => built(scheme) },
  {
    name: 'least and greatest thrust',
    run: (subject) => thrustRange(anew(subject)),
    asked: 'under 0.1 ms',
    rival: (subject) => rivalBuiltAnew(lineRows(anew(subject))),
  },
  { name: 'geometric safety', run: (subject) => leastMiddleShare(anew(subject)) },
  {
    name: 'load factor of one load',
    run: ({ firstLoad: { rest, set } }) => greatestMultiplier(rest, set),
    rival: ({ firstLoad: { rest, set } }) => leastBuiltAnew(lineRowsWith(rest, [set]), [0, 0, 0, -1]),
  },
  { name: '  of all loads', run: (subject) => loadFactors(subject.built) },
  {
    name: 'sideways capacity, one way',
    run: ({ sway: { rest, set } }) => greatestMultiplier(rest, set),
    rival: ({ sway: { rest, set } }) => leastBuiltAnew(lineRowsWith(rest, [set]), [0, 0, 0, -1]),
  },
  { name: '  both ways', run: (subject) => swayCapacity(subject.built) },
  {
    name: 'usable thrust, friction',
    run: (subject) => usableThrust(anew(subject), FRICTION),
    rival: (subject) => {
      const system = anew(subject);
      return rivalBuiltAnew(joined(lineRows(system), slidingRows(system, 0.6)));
    },
  },
  {
    name: 'usable thrust, friction and strength',
    run: (subject) => usableThrust(anew(subject), { ...FRICTION, strength: 5.8 }),
  },
  { name: 'friction needed', run: (subject) => neededFriction(anew(subject)) },
  {
    name: 'strength needed',
    run: (subject) => subject.middle.state && neededStrength(anew(subject), subject.middle.state, 0.6),
  },
  {
    name: 'answer to a support movement',
    run: (subject) =>
      answerToMovement(anew(subject), subject.built.joints, { side: 'left', dx: -1, dy: -0.5, turn: 0.1 }),
    rival: (subject) => leastBuiltAnew(lineRows(anew(subject)), [1, 0.5, -0.1]),
  },
  { name: 'patterns of all movements', run: (subject) => movementPatterns(subject.built) },
  { name: 'one combination', run: (subject) => combinationAnswers(subject.built) },
  {
    name: 'envelope of 200 axle places',
    run: (subject) => axleEnvelope(subject.built, { force: 60, patch: 0.3, dispersal: 0.5 }, 200, yes),
    asked: 'under 100 ms',
    slow: true,
  },
  {
    name: 'remaining spread',
    run: (subject) => spreadLeft(subject.built, { x: -1, y: 0 }, 2, yes),
    asked: 'under 50 ms',
    slow: true,
  },
];

function questions(subjects: readonly Subject[]): void {
  const rows = QUESTIONS.map(({ name, run, asked, rival, slow }) => {
    const time = slow ? medianOfFew(() => subjects.map(run)) / subjects.length : medianTime(subjects, run);
    const ratio = rival ? (medianTime(subjects, rival) / time).toFixed(0) : '';
    return [name, timeInWords(time), asked ?? '', ratio];
  });
  console.log(`\nStatics, rings of ${BLOCKS} blocks (${subjects.length} shapes, two loads, wall above)`);
  console.log(table([['question', 'median', 'asked for', 'HiGHS over ours'], ...rows]));
}

function againstHighs(subjects: readonly Subject[]): void {
  const own = medianTime(subjects, (subject) => thrustRange(anew(subject)));
  const rivals = subjects.map(({ built: { system }, heavier }) => {
    const rows = lineRows(system);
    return { rival: persistentRival(rows), limits: [rows.b, lineRows(heavier).b] as const, system, heavier };
  });
  for (const { rival, limits, system, heavier } of rivals) {
    expectAgreement(rival.range(limits[1]), heavier);
    expectAgreement(rival.range(limits[0]), system);
  }
  for (const { built: model } of subjects) expectAgreement(blockRivalBuiltAnew(model), model.system);
  let turn = 0;
  const persistent = medianTime(rivals, ({ rival, limits }) => rival.range(limits[turn++ % 2 === 0 ? 0 : 1]));
  for (const { rival } of rivals) rival.dispose();
  const threeUnknowns = medianTime(subjects, (subject) => rivalBuiltAnew(lineRows(anew(subject))));
  const blocks = medianTime(subjects, (subject) => blockRivalBuiltAnew(subject.built));
  const row = (name: string, time: number): string[] => [name, timeInWords(time), (time / own).toFixed(0)];
  console.log('\nLeast and greatest thrust against HiGHS, the same rings in the same run');
  console.log(
    table([
      ['method', 'median', 'over ours'],
      row('hinge simplex', own),
      row('HiGHS, three unknowns kept alive, only bounds changed', persistent),
      row('HiGHS, three unknowns, built anew from typed arrays', threeUnknowns),
      row('HiGHS, every block and joint, built anew', blocks),
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
    const scheme = benchScheme({ shape: 'segmental', span: 4, rise: 1 }, joints - 1);
    const { joints: places, blocks } = built(scheme);
    const runs = Math.max(3, Math.min(99, Math.round(2e5 / joints)));
    const thrust = medianOfFew(() => thrustRange(ringSystem(places, blocks)), runs);
    const whole = medianOfFew(() => assess(scheme), runs);
    const each = (us: number): string => ((us * 1000) / joints).toFixed(0);
    return [String(joints), timeInWords(thrust), each(thrust), timeInWords(whole), each(whole)];
  });
  console.log('\nGrowth with the number of joints');
  console.log(table([['joints', 'thrust', 'ns a joint', 'assessment', 'ns a joint'], ...rows]));
}

const subjects = benchSubjects();
questions(subjects);
againstHighs(subjects);
growth();
