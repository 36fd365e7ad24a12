import { describe, expect, test } from 'vitest';
import type { Block, BlockForce } from '../../../core/loading/forces.ts';
import { assessed, problemsWith, type SchemeDraft } from '../../support/assessed.ts';
import { integral } from '../geometry/soffits.ts';

const forcesFrom = (blocks: readonly Block[], from: string): BlockForce[] =>
  blocks.flatMap(({ forces }) => forces.filter((force) => force.from === from));
const down = (forces: readonly BlockForce[]): number => forces.reduce((sum, { fy }) => sum - fy, 0);
const about = (forces: readonly BlockForce[]): number => forces.reduce((sum, { x, fy }) => sum - x * fy, 0);
const blocksOf = (draft: SchemeDraft): readonly Block[] => assessed(draft).model.blocks;

/** Inner radius 2, outer 2.4. */
const SEMICIRCLE: SchemeDraft = {
  profile: { shape: 'semicircular', span: 4 },
  ring: { thickness: 0.4, voussoirs: 12, joints: 'radial' },
  breadth: 0.75,
  masonry: { unitWeight: 22 },
};
const above = (kind: 'wall' | 'fill', height: number, unitWeight: number) => ({ above: { kind, height, unitWeight } });

describe('self-weight', () => {
  test('half a circular band times breadth and unit weight, one force a block', () => {
    const weights = forcesFrom(blocksOf(SEMICIRCLE), 'self-weight');
    expect(weights).toHaveLength(12);
    expect(down(weights)).toBeCloseTo((22 * 0.75 * Math.PI * (2.4 ** 2 - 2 ** 2)) / 2, 11);
    expect(about(weights)).toBeCloseTo(0, 11);
  });

  test('a weightless ring has no forces of its own', () => {
    const blocks = blocksOf({ ...SEMICIRCLE, masonry: { unitWeight: 0 } });
    expect(blocks.every(({ forces }) => forces.length === 0)).toBe(true);
  });
});

describe('what lies above', () => {
  test('on a semicircle: the rectangle over the outer diameter less half the outer circle', () => {
    const resting = forcesFrom(blocksOf({ ...SEMICIRCLE, ...above('wall', 1.1, 20) }), 'above');
    expect(down(resting)).toBeCloseTo(20 * 0.75 * (4.8 * (2.4 + 1.1) - (Math.PI * 2.4 ** 2) / 2), 10);
  });

  test('up to the crown of the extrados where the height is nought', () => {
    const resting = forcesFrom(blocksOf({ ...SEMICIRCLE, ...above('fill', 0, 18) }), 'above');
    expect(down(resting)).toBeCloseTo(18 * 0.75 * (4.8 * 2.4 - (Math.PI * 2.4 ** 2) / 2), 10);
  });

  test('on a segmental ring: between the ends of the skewbacks', () => {
    // span 6, rise 1, ring 0.5: inner radius 5, outer 5.5 about a centre 4 below; skewbacks at asin 0.6, ends at ±3.3
    const blocks = blocksOf({
      profile: { shape: 'segmental', span: 6, rise: 1 },
      ring: { thickness: 0.5, voussoirs: 9, joints: 'radial' },
      ...above('fill', 0.4, 18),
    });
    const phi = Math.asin(0.6);
    const under = 5.5 ** 2 * (phi + 0.6 * 0.8) - 6.6 * 4;
    expect(down(forcesFrom(blocks, 'above'))).toBeCloseTo(18 * (6.6 * (1.5 + 0.4) - under), 10);
  });

  test('on a horseshoe: only what faces the sky, between the widest places', () => {
    // span 6, rise 9: radius 5 about (0, 4); outer 5.5
    const blocks = blocksOf({
      profile: { shape: 'horseshoe', span: 6, rise: 9 },
      ring: { thickness: 0.5, voussoirs: 31, joints: 'radial' },
      ...above('wall', 0.6, 20),
    });
    expect(down(forcesFrom(blocks, 'above'))).toBeCloseTo(20 * (11 * (5.5 + 0.6) - (Math.PI * 5.5 ** 2) / 2), 9);
  });

  test('on an ellipse: over the curve parallel to it, which is no ellipse', () => {
    const [a, b, t] = [3, 1.5, 0.4];
    const blocks = blocksOf({
      profile: { shape: 'elliptical', span: 2 * a, rise: b },
      ring: { thickness: t, voussoirs: 10, joints: 'vertical' },
      ...above('wall', 0.5, 20),
    });
    const back = (u: number): { y: number; dx: number } => {
      const size = Math.hypot(b * Math.cos(u), a * Math.sin(u));
      const bend = (a * b) / size ** 3;
      return { y: b * Math.sin(u) + (t * a * Math.sin(u)) / size, dx: a * Math.sin(u) * (1 + t * bend) };
    };
    const area = integral((u) => (b + t + 0.5 - back(u).y) * back(u).dx, 0, Math.PI);
    expect(down(forcesFrom(blocks, 'above'))).toBeCloseTo(20 * area, 8);
  });

  test('on a flat arch: a plain rectangle over the top', () => {
    const blocks = blocksOf({
      profile: { shape: 'flat', span: 2, skewbackAngle: 60, camber: 0 },
      ring: { thickness: 0.3, voussoirs: 9 },
      ...above('wall', 0.9, 20),
    });
    expect(down(forcesFrom(blocks, 'above'))).toBeCloseTo(20 * 0.9 * (2 + 0.6 / Math.sqrt(3)), 10);
  });

  test('is cut by plumb lines at the extrados ends of the joints, and each part rests on the block beneath', () => {
    const { joints, blocks } = assessed({
      profile: { shape: 'flat', span: 2, skewbackAngle: 60, camber: 0 },
      ring: { thickness: 0.3, voussoirs: 5, joints: 'radial' },
      ...above('wall', 0.9, 20),
    }).model;
    blocks.forEach((block, k) => {
      const [from, to] = [joints[k]!.extrados.x, joints[k + 1]!.extrados.x];
      const [resting] = forcesFrom([block], 'above');
      expect(resting?.fy).toBeCloseTo(-20 * 0.9 * (to - from), 11);
      expect(resting?.x).toBeCloseTo((from + to) / 2, 11);
      expect(resting?.y).toBeCloseTo(0.3 + 0.45, 11);
    });
  });

  test('the whole and its lever do not depend on where the joints are', () => {
    const cut = (voussoirs: number, joints: 'radial' | 'vertical'): BlockForce[] =>
      forcesFrom(
        blocksOf({
          profile: { shape: 'pointed', span: 4, rise: 3, step: 0.3 },
          ring: { thickness: 0.35, voussoirs, joints },
          ...above('fill', 0.7, 18),
        }),
        'above',
      );
    const once = cut(4, 'radial');
    for (const other of [cut(9, 'radial'), cut(150, 'radial'), cut(8, 'vertical'), cut(151, 'vertical')]) {
      expect(down(other)).toBeCloseTo(down(once), 9);
      expect(about(other)).toBeCloseTo(about(once), 9);
    }
  });
});

describe('named loads', () => {
  const loaded = (...loads: NonNullable<SchemeDraft['loads']>): readonly Block[] => blocksOf({ ...SEMICIRCLE, loads });

  test('a point load is the force entered, for the whole breadth, on the block beneath', () => {
    const blocks = loaded({ id: 'beam', kind: 'point', x: 0.4, force: 12 });
    const forces = forcesFrom(blocks, 'beam');
    expect(forces).toHaveLength(1);
    expect(forces[0]).toMatchObject({ x: 0.4, fx: 0, fy: -12 });
    // blocks of 15°: 0.4 m from the middle is in the first right of the crown joint, whose back ends at 2.4 sin 15°
    expect(blocks[6]?.forces.some(({ from }) => from === 'beam')).toBe(true);
  });

  test('on the crown joint it is shared by halves, so that a symmetric arch stays symmetric', () => {
    const blocks = loaded({ id: 'beam', kind: 'point', x: 0, force: 12 });
    expect([5, 6].map((k) => down(forcesFrom([blocks[k]!], 'beam')))).toEqual([6, 6]);
  });

  test('at the very ends of the ring it still stands', () => {
    for (const x of [-2.4, 2.4]) {
      expect(down(forcesFrom(loaded({ id: 'edge', kind: 'point', x, force: 5 }), 'edge'))).toBe(5);
    }
  });

  test('a strip is intensity × breadth × length, about its own middle', () => {
    const forces = forcesFrom(loaded({ id: 'floor', kind: 'strip', from: -1, to: 0.5, intensity: 8 }), 'floor');
    expect(down(forces)).toBeCloseTo(8 * 0.75 * 1.5, 12);
    expect(about(forces)).toBeCloseTo(8 * 0.75 * 1.5 * -0.25, 12);
  });

  test('of a strip that runs on past the ring, the part on the ring counts', () => {
    const forces = forcesFrom(loaded({ id: 'floor', kind: 'strip', from: 2, to: 50, intensity: 10 }), 'floor');
    expect(down(forces)).toBeCloseTo(10 * 0.75 * 0.4, 11);
  });

  test('an uplift is a load with its sign turned', () => {
    expect(down(forcesFrom(loaded({ id: 'jack', kind: 'point', x: 1, force: -3 }), 'jack'))).toBe(-3);
  });
});

describe('sway', () => {
  test('every weight of masonry and fill pushes sideways at its own place; named loads do not', () => {
    const blocks = blocksOf({
      ...SEMICIRCLE,
      ...above('fill', 0.5, 18),
      loads: [{ id: 'beam', kind: 'point', x: 0.4, force: 12 }],
      sway: -0.15,
    });
    for (const { forces } of blocks) {
      const weights = forces.filter(({ from }) => from === 'self-weight' || from === 'above');
      const pushes = forces.filter(({ from }) => from === 'sway');
      expect(pushes.map(({ x, y, fx, fy }) => [x, y, fx, fy])).toEqual(
        weights.map(({ x, y, fy }) => [x, y, -0.15 * -fy, 0]),
      );
    }
  });
});

describe('loads that are not on the arch', () => {
  const badLoads = (...loads: NonNullable<SchemeDraft['loads']>) => problemsWith({ ...SEMICIRCLE, loads });

  test('a point load off the arch: where it is and where it may be', () => {
    const problems = badLoads(
      { id: 'l1', kind: 'point', x: 1, force: 5 },
      { id: 'l2', name: 'lorry', kind: 'point', x: 2.5, force: 5 },
    );
    expect(problems).toHaveLength(1);
    expect(problems[0]?.path).toBe('loads[1].x');
    expect(problems[0]?.value).toContain('2.5');
    expect(problems[0]?.wrong).toContain('lorry');
    expect(problems[0]?.right).toMatch(/-2\.4.*2\.4/);
  });

  test('a strip wholly beside the arch', () => {
    const [problem] = badLoads({ id: 'l1', kind: 'strip', from: 3, to: 5, intensity: 5 });
    expect(problem?.path).toBe('loads[0].from');
    expect(problem?.right).toMatch(/-2\.4.*2\.4/);
  });

  test('a strip that ends before it begins', () => {
    const [problem] = badLoads({ id: 'l1', kind: 'strip', from: 1, to: -1, intensity: 5 });
    expect(problem?.path).toBe('loads[0].to');
  });

  test('all of them at once', () => {
    const problems = badLoads(
      { id: 'l1', kind: 'point', x: -9, force: 5 },
      { id: 'l2', kind: 'strip', from: 1, to: 1, intensity: 5 },
      { id: 'l3', kind: 'point', x: 9, force: 5 },
    );
    expect(problems.map(({ path }) => path)).toEqual(['loads[0].x', 'loads[1].to', 'loads[2].x']);
  });
});
