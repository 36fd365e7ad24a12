/** What lies on the ring besides plain wall or fill: against areas and pressures of plane geometry. */
import { describe, expect, test } from 'vitest';
import type { Block, BlockForce } from '../../../core/loading/forces.ts';
import type { Scheme } from '../../../core/job/schema.ts';
import { assessed, problemsWith, type SchemeDraft } from '../../support/assessed.ts';

/** Inner radius 2, outer 2.4; the wall or fill ends 0.6 over the crown, 3.0 over the springing line. */
const OUTER = 2.4;
const TOP = 3;
const BREADTH = 0.75;

const semicircle = (above: Partial<NonNullable<Scheme['above']>> = {}, extra: Partial<Scheme> = {}): SchemeDraft => ({
  profile: { shape: 'semicircular', span: 4 },
  ring: { thickness: 0.4, voussoirs: 24, joints: 'radial' },
  breadth: BREADTH,
  masonry: { unitWeight: 22 },
  above: { kind: 'fill', height: 0.6, unitWeight: 18, ...above },
  ...extra,
});

const resting = (draft: SchemeDraft): BlockForce[] =>
  assessed(draft).model.blocks.flatMap(({ forces }: Block) => forces.filter(({ from }) => from === 'above'));
const down = (forces: readonly BlockForce[]): number => forces.reduce((sum, { fy }) => sum - fy, 0);
const lever = (forces: readonly BlockForce[]): number => forces.reduce((sum, { x, fy }) => sum - x * fy, 0);

const FILL = 18 * BREADTH * (2 * OUTER * TOP - (Math.PI * OUTER ** 2) / 2);

test('plain fill, to measure the rest against', () => expect(down(resting(semicircle()))).toBeCloseTo(FILL, 10));

describe('layers', () => {
  test('lie level over the whole ring', () => {
    const layers = [
      { name: 'sand', thickness: 0.05, unitWeight: 16 },
      { name: 'setts', thickness: 0.12, unitWeight: 26 },
    ];
    const over = 2 * OUTER * (0.05 * 16 + 0.12 * 26) * BREADTH;
    expect(down(resting(semicircle({ layers })))).toBeCloseTo(FILL + over, 10);
  });
});

describe('openings', () => {
  const opening = { from: -0.8, to: 0.1, sill: 2.5, head: 2.9 };

  test('take their own rectangle off, at its own place', () => {
    const before = resting(semicircle());
    const after = resting(semicircle({ openings: [opening] }));
    const area = 0.9 * 0.4;
    expect(down(after)).toBeCloseTo(FILL - area * 18 * BREADTH, 10);
    expect(lever(after)).toBeCloseTo(lever(before) + area * 18 * BREADTH * 0.35, 10);
  });

  test.each([
    ['that end before they begin', { ...opening, to: -0.9 }, 'above.openings[0]'],
    ['without height', { ...opening, head: 2.5 }, 'above.openings[0]'],
    ['through the ring', { ...opening, sill: 2.1 }, 'above.openings[0]'],
    ['through the top', { ...opening, head: 3.1 }, 'above.openings[0]'],
  ])('%s are refused', (_, bad, path) => {
    const problems = problemsWith(semicircle({ openings: [bad] }));
    expect(problems.map((problem) => problem.path)).toEqual([path]);
  });
});

describe('backing', () => {
  /** Both pockets between the back of the ring and a level h, out to the plumb lines over the springings. */
  const pockets = (h: number): number => {
    const c = Math.sqrt(OUTER ** 2 - h ** 2);
    const under = (x: number): number => (x * Math.sqrt(OUTER ** 2 - x ** 2) + OUTER ** 2 * Math.asin(x / OUTER)) / 2;
    return 2 * (h * (OUTER - c) - (under(OUTER) - under(c)));
  };
  const backing = (level: number) => ({ backing: { level, counts: 'weight' as const, unitWeight: 23 } });

  test('on a bare ring: the pockets up to its level', () => {
    for (const level of [0.4, 1.3, 2.2]) {
      const forces = resting(semicircle({ kind: 'none' }, backing(level)));
      expect(down(forces)).toBeCloseTo(23 * BREADTH * pockets(level), 9);
      expect(lever(forces)).toBeCloseTo(0, 9);
    }
  });

  test('under fill it takes the place of the fill there', () => {
    expect(down(resting(semicircle({}, backing(1.3))))).toBeCloseTo(FILL + (23 - 18) * BREADTH * pockets(1.3), 9);
  });

  test('higher than what lies above is refused', () => {
    expect(problemsWith(semicircle({}, backing(3.2))).map(({ path }) => path)).toEqual(['backing.level']);
  });

  test('as weight it leaves the joints alone; as masonry it lengthens those that run into it', () => {
    const joints = (counts: 'weight' | 'masonry') =>
      assessed(semicircle({}, { backing: { level: 1.2, counts, unitWeight: 22 } })).model.joints;
    const length = ({ intrados: i, extrados: e }: ReturnType<typeof joints>[number]): number =>
      Math.hypot(e.x - i.x, e.y - i.y);
    for (const joint of joints('weight')) expect(length(joint)).toBeCloseTo(0.4, 12);
    joints('masonry').forEach((joint, j) => {
      // radial joints at 7.5° steps: one at the angle θ over the springing meets the level 1.2 at 1.2 / sin θ from the
      // centre, or the plumb line over the springing at 2.4 / cos θ
      const theta = ((j <= 12 ? j : 24 - j) * 7.5 * Math.PI) / 180;
      const reach = Math.min(1.2 / Math.sin(theta), OUTER / Math.cos(theta));
      expect(length(joint)).toBeCloseTo(Math.max(OUTER, reach) - 2, 9);
    });
  });
});

describe('side pressure', () => {
  const K = 0.3;
  const forces = (): BlockForce[] => resting(semicircle({ sidePressure: K })).filter(({ fx }) => fx !== 0);

  test('is off unless it is asked for', () => {
    expect(resting(semicircle()).every(({ fx }) => fx === 0)).toBe(true);
  });

  test('pushes each half towards the crown with K γ ∫ (top − y) dy', () => {
    const push = K * 18 * BREADTH * (TOP * OUTER - OUTER ** 2 / 2);
    const side = (sign: number): number =>
      forces()
        .filter(({ x }) => x * sign > 0)
        .reduce((sum, { fx }) => sum + fx, 0);
    expect(side(-1)).toBeCloseTo(push, 10);
    expect(side(1)).toBeCloseTo(-push, 10);
  });

  test('at its centre of pressure: moment K γ ∫ y (top − y) dy about the springing line', () => {
    const left = forces().filter(({ x }) => x < 0);
    const moment = left.reduce((sum, { y, fx }) => sum + y * fx, 0);
    expect(moment).toBeCloseTo(K * 18 * BREADTH * ((TOP * OUTER ** 2) / 2 - OUTER ** 3 / 3), 10);
  });

  test('is not swayed: it is no weight', () => {
    const { blocks } = assessed(semicircle({ sidePressure: K }, { sway: 0.1 })).model;
    const all = blocks.flatMap((block) => block.forces);
    const swayed = all.filter(({ from }) => from === 'sway').reduce((sum, { fx }) => sum + fx, 0);
    const weight = all.reduce((sum, { fy }) => sum - fy, 0);
    expect(swayed).toBeCloseTo(0.1 * weight, 9);
  });
});

describe('axles', () => {
  const axle = (x: number, extra: { patch?: number; dispersal?: number } = {}) => ({
    loads: [{ id: 'a', kind: 'axle' as const, x, force: 80, ...extra }],
  });
  const parts = (draft: SchemeDraft): BlockForce[] =>
    assessed(draft).model.blocks.flatMap((block) => block.forces.filter(({ from }) => from === 'a'));

  test('spread through the fill by half its depth to each side unless told otherwise', () => {
    // over the crown the fill is 0.6 m deep: 0.3 m to each side, and the print of 0.2 m between
    const forces = parts(semicircle({}, axle(0, { patch: 0.2, dispersal: 0.5 })));
    expect(down(forces)).toBeCloseTo(80, 10);
    expect(lever(forces)).toBeCloseTo(0, 9);
    // 80 kN over 0.8 m; the first block right of the crown joint ends at 2.4 sin 7.5°
    const first = forces.find(({ x }) => x > 0 && x < 0.2);
    expect(first?.fy).toBeCloseTo((-80 / 0.8) * OUTER * Math.sin((7.5 * Math.PI) / 180), 8);
    expect(parts(semicircle({}, axle(0, { patch: 0.2 })))).toEqual(forces);
  });

  test('count the layers in the depth', () => {
    const layers = [{ thickness: 0.2, unitWeight: 24 }];
    const forces = parts(semicircle({ layers }, axle(0, { patch: 0, dispersal: 0.5 })));
    const first = forces.find(({ x }) => x > 0 && x < 0.2);
    expect(first?.fy).toBeCloseTo((-80 / 0.8) * OUTER * Math.sin((7.5 * Math.PI) / 180), 8);
  });

  test('stand as a point on a bare ring', () => {
    const forces = parts(semicircle({ kind: 'none' }, axle(0.5, { patch: 0, dispersal: 0.5 })));
    expect(forces).toHaveLength(1);
    expect(forces[0]).toMatchObject({ x: 0.5, fy: -80 });
  });

  test('off the arch are refused', () => {
    expect(problemsWith(semicircle({}, axle(2.6))).map(({ path }) => path)).toEqual(['loads[0].x']);
  });
});
