/** The proof must be able to fail: a line or a reaction that is not the ring's own shows at once. */
import { describe, expect, test } from 'vitest';
import type { Point } from '../../../core/assess/assessment.ts';
import { motionsOf, thrustByVirtualWork, workOf } from '../../../core/statics/mechanism.ts';
import { equilibriumResidual, type SpringingForce } from '../../../core/statics/proof.ts';
import { assessed } from '../../support/assessed.ts';

const { model, thrust, reactions, proof } = assessed({
  profile: { shape: 'segmental', span: 4, rise: 1 },
  ring: { thickness: 0.4, voussoirs: 15, joints: 'radial' },
  loads: [{ id: 'l1', kind: 'point', x: 0.6, force: 20 }],
});
const line = (thrust.least?.line ?? []).map((point): Point | null => (point.x === null ? null : point));
const springing = (side: 'left' | 'right'): SpringingForce => {
  const found = reactions?.[side];
  if (!found || found.x === null || found.y === null) throw new Error('the ring does not stand');
  return { horizontal: found.horizontal, vertical: found.vertical, at: { x: found.x, y: found.y } };
};
const [left, right] = [springing('left'), springing('right')];

describe('residual of equilibrium', () => {
  test('the printed line and reactions leave nothing over', () => {
    expect(equilibriumResidual(model.blocks, line, left, right)).toBeLessThan(1e-13);
    expect(equilibriumResidual(model.blocks, line, left, right)).toBe(proof.equilibriumResidual);
  });

  test('a line out by a millimetre at one joint shows', () => {
    const bent = line.map((point, j) => (j === 7 && point ? { x: point.x, y: point.y + 0.001 } : point));
    expect(equilibriumResidual(model.blocks, bent, left, right)).toBeGreaterThan(1e-5);
  });

  test('a thrust out by a thousandth shows', () => {
    const more = { ...left, horizontal: left.horizontal * 1.001 };
    expect(equilibriumResidual(model.blocks, line, more, right)).toBeGreaterThan(1e-5);
  });

  test('a right reaction that is not the rest of the loads shows', () => {
    expect(equilibriumResidual(model.blocks, line, left, { ...right, vertical: right.vertical + 0.1 })).toBeGreaterThan(
      1e-4,
    );
  });

  test('a block that has lost a force shows', () => {
    const lost = model.blocks.map(({ forces }, k) => ({ forces: k === 9 ? forces.slice(1) : forces }));
    expect(equilibriumResidual(lost, line, left, right)).toBeGreaterThan(1e-3);
  });

  test('without the left springing’s point there is nothing to walk from', () => {
    expect(equilibriumResidual(model.blocks, line, { ...left, at: null }, right)).toBeNull();
  });
});

describe('mechanisms', () => {
  test('three hinges: the left abutment slides outwards, and virtual work gives its thrust by hand', () => {
    // crown hinged at its head (0, 3), springings at their feet (∓2, 0), 10 kN downwards at mid-height of each half:
    // H = 10 (2 − 1)/3
    const joints = [
      { intrados: { x: -2, y: 0 }, extrados: { x: -2.5, y: 0 } },
      { intrados: { x: 0, y: 2.5 }, extrados: { x: 0, y: 3 } },
      { intrados: { x: 2, y: 0 }, extrados: { x: 2.5, y: 0 } },
    ];
    const blocks = [-1, 1].map((x) => ({ forces: [{ x, y: 1.5, fx: 0, fy: -10, from: 'self-weight' }] }));
    const hinges = [
      { joint: 0, side: 'intrados' as const, rotation: 1 },
      { joint: 1, side: 'extrados' as const, rotation: 2 },
      { joint: 2, side: 'intrados' as const, rotation: 1 },
    ];
    const motions = motionsOf(joints, hinges);
    expect(motions).toHaveLength(4);
    expect(motions[0]).toEqual({ turn: 0, dx: -6, dy: 0 });
    expect(motions[3]).toEqual({ turn: 0, dx: 0, dy: 0 });
    // each half sinks by its turn times the metre from its springing
    expect(workOf(blocks, motions)).toBeCloseTo(20, 12);
    expect(thrustByVirtualWork(joints, blocks, hinges)).toBeCloseTo(10 / 3, 12);
  });

  test('no hinges, no movement, no thrust from it', () => {
    expect(thrustByVirtualWork(model.joints, model.blocks, [])).toBeNull();
    expect(motionsOf(model.joints, []).every(({ turn, dx, dy }) => turn === 0 && dx === 0 && dy === 0)).toBe(true);
  });
});
