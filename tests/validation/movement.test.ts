/** Movements of the supports: the line that random arches answer with, where they open, and how far they can go. */
import { describe, expect, test, vi } from 'vitest';
import { assessScheme } from '../../core/assess/assess.ts';
import type { Point } from '../../core/assess/assessment.ts';
import { jointForce } from '../../core/statics/line.ts';
import { remainingSpread, type RemainingSpread } from '../../core/statics/remaining-spread.ts';
import { answerToMovement, type SupportMovement } from '../../core/statics/support-movement.ts';
import { ringSystem } from '../../core/statics/system.ts';
import { assessed, type SchemeDraft } from '../support/assessed.ts';
import {
  EquilibriumProgramme,
  EXTRADOS_PUSH,
  INTRADOS_PUSH,
  SHEAR,
  type Optimum,
  type PrintedModel,
} from './equilibrium-programme.ts';
import { randomSchemes } from './random-arches.ts';
import { totalLoad } from './total-load.ts';

// hundreds of programmes each: seconds at rest, more where the machine is busy
vi.setConfig({ testTimeout: 120_000, hookTimeout: 120_000 });

const AGREED = 1e-6;

/** Movements of all sorts: along, up and down, turning, at either side, and mixed. */
const MOVEMENTS: readonly SupportMovement[] = [
  { side: 'left', dx: -1, dy: 0, turn: 0 },
  { side: 'left', dx: 1, dy: 0, turn: 0 },
  { side: 'right', dx: 0.6, dy: -0.8, turn: 0 },
  { side: 'left', dx: 0, dy: -1, turn: 0 },
  { side: 'right', dx: 0, dy: 0, turn: -0.5 },
  { side: 'left', dx: -0.3, dy: -0.2, turn: 0.25 },
  { side: 'right', dx: 0.1, dy: 0.4, turn: 0.3 },
];

const modelsOf = (each: number, seed: number): PrintedModel[] =>
  randomSchemes(each, seed).map((scheme) => assessed(scheme).model);

const jointOf = ({ joints }: PrintedModel, side: 'left' | 'right') => (side === 'left' ? 0 : joints.length - 1);
const middleOf = ({ joints }: PrintedModel, j: number): Point => {
  const { intrados, extrados } = joints[j]!;
  return { x: (intrados.x + extrados.x) / 2, y: (intrados.y + extrados.y) / 2 };
};

interface Ways {
  readonly normal: number;
  readonly shear: number;
  readonly moment: number;
}

/** How far the support goes square to its joint, along it, and round its middle, as the ring's force on it works. */
function waysOf(model: PrintedModel, { side, dx, dy, turn }: SupportMovement): Ways {
  const { intrados: i, extrados: e } = model.joints[jointOf(model, side)]!;
  const t = Math.hypot(e.x - i.x, e.y - i.y);
  const along = { x: (e.x - i.x) / t, y: (e.y - i.y) / t };
  // the ring pushes the left support backwards, the right one forwards
  const sign = side === 'left' ? -1 : 1;
  return {
    normal: sign * (along.y * dx - along.x * dy),
    shear: sign * (along.x * dx + along.y * dy),
    moment: sign * turn,
  };
}

/** The least work that the ring can do on the moving support, by the block programme. */
function leastWork(model: PrintedModel, movement: SupportMovement): Optimum {
  const programme = new EquilibriumProgramme(model);
  const j = jointOf(model, movement.side);
  const { intrados: i, extrados: e } = model.joints[j]!;
  const reach = Math.hypot(e.x - i.x, e.y - i.y) / 2;
  const { normal, shear, moment } = waysOf(model, movement);
  const answer = programme.minimise([
    [3 * j + INTRADOS_PUSH, normal + moment * reach],
    [3 * j + EXTRADOS_PUSH, normal - moment * reach],
    [3 * j + SHEAR, shear],
  ]);
  return answer.kind === 'optimal' ? { ...answer, value: answer.value * programme.force } : answer;
}

describe('the answer to a movement', () => {
  const models = modelsOf(48, 71);

  test('does the least work on the support that the block programme allows, or none exists', () => {
    let opens = 0;
    models.forEach((model, i) => {
      const movement = MOVEMENTS[i % MOVEMENTS.length]!;
      const system = ringSystem(model.joints, model.blocks);
      const answer = answerToMovement(system, model.joints, movement);
      const expected = leastWork(model, movement);
      switch (answer.kind) {
        case 'no-line':
          expect(expected.kind).toBe('infeasible');
          break;
        case 'locked':
          expect(expected.kind).toBe('unbounded');
          break;
        case 'opens': {
          opens++;
          if (expected.kind !== 'optimal') throw new Error(`HiGHS finds it ${expected.kind}`);
          const force = jointForce(system, answer.state, jointOf(model, movement.side));
          const ways = waysOf(model, movement);
          const work = ways.normal * force.normal + ways.shear * force.shear + ways.moment * force.moment;
          const size = Math.max(totalLoad(model.blocks), Math.abs(expected.value));
          expect(Math.abs(work - expected.value) / size).toBeLessThan(10 * AGREED);
        }
      }
    });
    expect(opens).toBeGreaterThan(300);
  });

  test('the openings add up to the movement', () => {
    for (const [i, model] of models.entries()) {
      const movement = MOVEMENTS[i % MOVEMENTS.length]!;
      const answer = answerToMovement(ringSystem(model.joints, model.blocks), model.joints, movement);
      if (answer.kind !== 'opens') continue;
      // the right abutment against the left one: the turns of all hinges, each about its own place
      let [turn, dx, dy] = [0, 0, 0];
      const at = middleOf(model, jointOf(model, movement.side));
      for (const { joint, side, rotation, width } of answer.openings) {
        const about = model.joints[joint]![side];
        const by = side === 'extrados' ? rotation : -rotation;
        turn += by;
        dx -= by * (at.y - about.y);
        dy += by * (at.x - about.x);
        const { intrados, extrados } = model.joints[joint]!;
        expect(width).toBeCloseTo(rotation * Math.hypot(extrados.x - intrados.x, extrados.y - intrados.y), 9);
      }
      const sign = movement.side === 'right' ? 1 : -1;
      expect(turn).toBeCloseTo(sign * movement.turn, 7);
      expect(dx).toBeCloseTo(sign * movement.dx, 7);
      expect(dy).toBeCloseTo(sign * movement.dy, 7);
    }
  });

  test('spreading gives the least thrust, closing the greatest (Heyman, from memory)', () => {
    for (const scheme of randomSchemes(4, 72)) {
      const { model, thrust } = assessed(scheme);
      if (!thrust.stands) continue;
      const system = ringSystem(model.joints, model.blocks);
      const [spreading, closing] = [-1, 1].map((dx) =>
        answerToMovement(system, model.joints, { side: 'left', dx, dy: 0, turn: 0 }),
      );
      const thrustOf = (answer: typeof spreading): number | null =>
        answer?.kind === 'opens' ? answer.horizontal : null;
      expect(thrustOf(spreading)).toBeCloseTo(thrust.least?.horizontal ?? NaN, 7);
      if (thrust.greatest === null) expect(closing?.kind).toBe('locked');
      else expect(thrustOf(closing) ?? NaN).toBeCloseTo(thrust.greatest.horizontal ?? NaN, 6);
    }
  });
});

const SPREADING = { x: -1, y: 0 };

function spread(draft: SchemeDraft, furthest: number, steps: number): RemainingSpread {
  const { joints, blocks } = assessed(draft).model;
  const found = remainingSpread(joints, blocks, SPREADING, furthest, steps);
  if (found === null) throw new Error('the ring does not stand to begin with');
  return found;
}

describe('remaining spread', () => {
  test('two blocks between vertical ends: until the hinge at their heads has sunk to the line of the end hinges', () => {
    // each half is a stay from the foot of its end to the head of the middle joint: a = 1, h = 0.3. The stays lie
    // flat when the ends are 2 √(a² + h²) apart
    const found = spread(
      {
        profile: { shape: 'flat', span: 2, skewbackAngle: 90, camber: 0 },
        ring: { thickness: 0.3, voussoirs: 2, joints: 'vertical' },
        masonry: { unitWeight: 0 },
        loads: [{ id: 'l1', kind: 'point', x: 0, force: 10 }],
      },
      0.2,
      50,
    );
    expect(found.collapse).toBeCloseTo(2 * Math.hypot(1, 0.3) - 2, 4);
    // on the way the thrust is that of a three-hinged frame: P (2a + s)/4 over the height left
    for (const { moved, horizontal } of found.places.slice(0, -5)) {
      const half = 1 + moved / 2;
      const height = Math.sqrt(1 + 0.09 - half ** 2);
      expect(horizontal / ((5 * half) / height)).toBeCloseTo(1, 6);
    }
  });

  const semicircle: SchemeDraft = {
    profile: { shape: 'semicircular', span: 4 },
    ring: { thickness: 0.5, voussoirs: 30, joints: 'radial' },
  };

  test('begins at the least thrust, which grows as the ring opens', () => {
    const { places, collapse } = spread(semicircle, 1, 100);
    expect(places[0]?.moved).toBe(0);
    expect(places[0]?.horizontal).toBeCloseTo(assessed(semicircle).thrust.least?.horizontal ?? NaN, 9);
    expect(collapse).toBeGreaterThan(0);
    expect(places.at(-1)!.horizontal).toBeGreaterThan(places[0]!.horizontal);
    expect(places.at(-1)?.moved).toBe(collapse);
  });

  test('settles as the steps are halved', () => {
    // a metre in 50, 100, 200 and 400 steps; hinges move from joint to joint, so the change need not halve each time
    const collapses = [50, 100, 200, 400].map((steps) => spread(semicircle, 1, steps).collapse ?? NaN);
    const changes = collapses.slice(1).map((value, i) => Math.abs(value - collapses[i]!) / value);
    expect(Math.max(...changes)).toBeLessThan(0.05);
    expect(changes.at(-1)).toBeLessThan(0.005);
  });

  test('a thicker ring can go further', () => {
    const collapseAt = (thickness: number): number =>
      spread({ ...semicircle, ring: { ...semicircle.ring, thickness } }, 2, 100).collapse ?? Infinity;
    expect(collapseAt(0.4)).toBeLessThan(collapseAt(0.5));
    expect(collapseAt(0.5)).toBeLessThan(collapseAt(0.6));
  });

  test('all places are rings of the same blocks: joints keep their lengths where they have not opened', () => {
    const { places } = spread(semicircle, 0.05, 10);
    const lengths = (which: number): number[] =>
      places[which]!.joints.map(({ intrados: i, extrados: e }) => Math.hypot(e.x - i.x, e.y - i.y));
    const hinged = new Set(places.flatMap(({ hinges }) => hinges.map(({ joint }) => joint)));
    lengths(places.length - 1).forEach((length, j) => {
      if (!hinged.has(j)) expect(length).toBeCloseTo(lengths(0)[j]!, 12);
    });
  });

  test('a ring that does not stand has none', () => {
    const scheme = { ...semicircle, id: 's1', breadth: 1, ring: { ...semicircle.ring, thickness: 0.1 } };
    const outcome = assessScheme({ id: 'a1', schemes: [scheme] }, scheme);
    if (!outcome.ok) throw new Error('the ring was refused');
    const { joints, blocks } = outcome.assessed.result.model;
    expect(remainingSpread(joints, blocks, SPREADING, 1, 10)).toBeNull();
  });
});
