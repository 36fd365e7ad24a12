/** Load factors and sideways capacity of random arches against the whole block programme, and against virtual work. */
import { beforeAll, describe, expect, test, vi } from 'vitest';
import type { BlockForce, Hinge, Point, SchemeAssessment } from '../../core/assess/assessment.ts';
import { assessed } from '../support/assessed.ts';
import { EquilibriumProgramme, type Optimum, type PrintedModel } from './equilibrium-programme.ts';
import { randomSchemes } from './random-arches.ts';

// hundreds of programmes each: seconds at rest, more where the machine is busy
vi.setConfig({ testTimeout: 120_000, hookTimeout: 120_000 });

const AGREED = 1e-6;

let results: SchemeAssessment[] = [];
beforeAll(() => {
  results = randomSchemes(46, 4300).map(assessed);
});

/** Forces block by block. */
type Forces = readonly (readonly BlockForce[])[];

const forcesFrom = ({ blocks }: PrintedModel, from: string): Forces =>
  blocks.map(({ forces }) => forces.filter((force) => force.from === from));

const without = ({ joints, blocks }: PrintedModel, from: string): PrintedModel => ({
  joints,
  blocks: blocks.map(({ forces }) => ({ forces: forces.filter((force) => force.from !== from) })),
});

/** Greatest λ ≥ 0 with which equilibrium without tension is possible under the model and λ times the set. */
function greatestFactor(model: PrintedModel, set: Forces): Optimum {
  const programme = new EquilibriumProgramme(model);
  const factor = programme.addMultiplier(set);
  const answer = programme.minimise([[factor, -1]]);
  return answer.kind === 'optimal' ? { ...answer, value: -answer.value } : answer;
}

/** The factor at which four hinges turn: their turns from the three conditions of rest, then the work of both sets. */
function factorOfMechanism(model: PrintedModel, hinges: readonly Hinge[], set: Forces): number {
  const at = hinges.map(({ joint, side }) => model.joints[joint]![side]);
  const turns = turnsAtRest(at);
  const workOf = (acting: Forces): number => {
    let work = 0;
    acting.forEach((forces, k) => {
      for (const { x, y, fx, fy } of forces) {
        hinges.forEach(({ joint }, i) => {
          if (joint <= k) work += turns[i]! * (fy * (x - at[i]!.x) - fx * (y - at[i]!.y));
        });
      }
    });
    return work;
  };
  return -workOf(model.blocks.map(({ forces }) => forces)) / workOf(set);
}

/** Turns at four points with Σ turn = 0, Σ turn·x = 0 and Σ turn·y = 0: the areas of the triangles of the other three. */
function turnsAtRest(at: readonly Point[]): number[] {
  const area = (p: Point, q: Point, r: Point): number => (q.x - p.x) * (r.y - p.y) - (r.x - p.x) * (q.y - p.y);
  return at.map((_, i) => {
    const [p, q, r] = at.filter((_point, k) => k !== i) as [Point, Point, Point];
    return (i % 2 === 0 ? 1 : -1) * area(p, q, r);
  });
}

describe('load factors', () => {
  test('each agrees with the block programme; none is given where the ring holds any multiple, or none', () => {
    let limits = 0;
    let unlimited = 0;
    let never = 0;
    for (const { model, loadFactors } of results) {
      for (const { load, factor, hinges } of loadFactors ?? []) {
        const expected = greatestFactor(without(model, load), forcesFrom(model, load));
        if (factor === null) {
          if (hinges.length === 0) unlimited++;
          else never++;
          expect(expected.kind).toBe(hinges.length === 0 ? 'unbounded' : 'infeasible');
        } else {
          limits++;
          if (expected.kind !== 'optimal') throw new Error(`HiGHS finds it ${expected.kind}`);
          expect(Math.abs(factor - expected.value)).toBeLessThan(AGREED * Math.max(1, expected.value));
        }
      }
    }
    expect(limits).toBeGreaterThan(300);
    expect(Math.min(unlimited, never)).toBeGreaterThan(10);
  });

  test('the four hinges turn at just that factor, by virtual work', () => {
    let four = 0;
    for (const { model, loadFactors } of results) {
      for (const { load, factor, hinges } of loadFactors ?? []) {
        if (factor === null || factor < 1e-6 || hinges.length !== 4) continue;
        four++;
        const found = factorOfMechanism(without(model, load), hinges, forcesFrom(model, load));
        expect(Math.abs(found - factor)).toBeLessThan(AGREED * Math.max(1, factor));
      }
    }
    expect(four).toBeGreaterThan(250);
  });

  test('a ring stands under its loads exactly where every factor is at least one', () => {
    for (const { thrust, loadFactors } of results) {
      for (const { factor, hinges } of loadFactors ?? []) {
        if (factor !== null && thrust.stands) expect(factor).toBeGreaterThan(1 - AGREED);
        if (factor === null && hinges.length > 0) expect(thrust.stands).toBe(false);
      }
    }
  });
});

describe('sideways capacity', () => {
  const swaying = ({ blocks }: PrintedModel, direction: number): Forces =>
    blocks.map(({ forces }) =>
      forces
        .filter(({ from }) => from === 'self-weight' || from === 'above')
        .map((force) => ({ ...force, fx: -force.fy * direction, fy: 0 })),
    );

  test('the smaller of both directions agrees with the block programme, from the ring upright', () => {
    let limits = 0;
    for (const { model, swayCapacity } of results) {
      const upright = without(model, 'sway');
      const both = [1, -1].map((direction) => greatestFactor(upright, swaying(upright, direction)));
      const found = both.flatMap((answer) => (answer.kind === 'optimal' ? [answer.value] : []));
      if (both.some(({ kind }) => kind === 'infeasible') || found.length === 0) {
        expect(swayCapacity).toBeNull();
      } else {
        limits++;
        const least = Math.min(...found);
        expect(Math.abs((swayCapacity ?? NaN) - least)).toBeLessThan(AGREED * Math.max(1, least));
      }
    }
    expect(limits).toBeGreaterThan(300);
  });

  test('vertical joints lower it slightly against radial ones', () => {
    // Alexakis & Makris 2014, abstract: slightly lower capacity with vertical cracks; a semicircle under its own weight
    const capacity = (joints: 'radial' | 'vertical'): number =>
      assessed({
        profile: { shape: 'semicircular', span: 4 },
        ring: { thickness: 0.5, voussoirs: 200, joints },
      }).swayCapacity ?? NaN;
    const [radial, vertical] = [capacity('radial'), capacity('vertical')];
    expect(vertical).toBeLessThan(radial);
    expect(vertical).toBeGreaterThan(0.8 * radial);
  });

  test('it takes no notice of the unit of weight', () => {
    const capacity = (unitWeight: number): number =>
      assessed({
        profile: { shape: 'segmental', span: 4, rise: 1 },
        ring: { thickness: 0.4, voussoirs: 30, joints: 'radial' },
        masonry: { unitWeight },
      }).swayCapacity ?? NaN;
    expect(capacity(27)).toBeCloseTo(capacity(13), 10);
  });
});
