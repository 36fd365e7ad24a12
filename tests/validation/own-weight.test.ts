/**
 * The semicircle under its own weight against the literature. Published solutions let a hinge form anywhere along the
 * ring; with n equal blocks it can only form at a joint, half a block away at most. About the least thickness the error
 * is of second order in that distance: with 1000 blocks 1e-6 of t/R, and a tenth of a degree in the place of the hinge.
 */
import { describe, expect, test } from 'vitest';
import type { HandBuiltRing } from './centre-line-ring.ts';
import { semicircleOnCentreLine } from './centre-line-ring.ts';
import { assessed } from '../support/assessed.ts';
import { leastMiddleShare } from '../../core/statics/geometric-safety.ts';
import { neededFriction } from '../../core/statics/sliding.ts';
import { ringSystem } from '../../core/statics/system.ts';
import { thrustRange } from '../../core/statics/thrust.ts';

const BLOCKS = 1000;

/** Thickness at which a ring of mid-ring radius 1 m just stands, by halving. */
function leastThickness(stands: (t: number) => boolean): number {
  let falls = 0.05;
  let holds = 0.2;
  while (holds - falls > 1e-10) {
    const t = (falls + holds) / 2;
    if (stands(t)) holds = t;
    else falls = t;
  }
  return holds;
}

const semicircle = (t: number, joints: 'radial' | 'vertical') =>
  assessed({
    profile: { shape: 'semicircular', span: 2 - t },
    ring: { thickness: t, voussoirs: BLOCKS, joints },
    masonry: { unitWeight: 1 },
  });

const degreesFromCrown = (joint: number): number => Math.abs(joint - BLOCKS / 2) * (180 / BLOCKS);

describe('semicircle, true weights of the blocks', () => {
  test('radial joints: least t/R 0.1075, haunch hinges 54.48° from the crown', () => {
    // Milankovitch 1907; Makris & Alexakis 2013, abstract. To more digits, recomputed: 0.107478 and 54.48°.
    const t = leastThickness((trial) => semicircle(trial, 'radial').thrust.stands);
    expect(t).toBeCloseTo(0.107478, 6);
    const haunches = semicircle(t * (1 - 1e-6), 'radial').mechanism?.hinges.filter(
      ({ joint, side }) => side === 'intrados' && joint > 0 && joint < BLOCKS,
    );
    expect(haunches).toHaveLength(2);
    for (const { joint } of haunches ?? []) expect(Math.abs(degreesFromCrown(joint) - 54.48)).toBeLessThan(0.1);
  });

  test('vertical joints: least t/R 0.1095', () => {
    // Makris & Alexakis 2013, abstract; four figures are printed.
    const t = leastThickness((trial) => semicircle(trial, 'vertical').thrust.stands);
    expect(Math.abs(t - 0.1095)).toBeLessThan(0.00005);
  });

  test('the approximation t/R 0.106 lies below the true value, and within two per cent of it', () => {
    // Heyman 1969, Int. J. Mech. Sci. 11, from memory; a ring so thin falls.
    expect(semicircle(0.106, 'radial').thrust.stands).toBe(false);
    expect(semicircle(0.106 * 1.02, 'radial').thrust.stands).toBe(true);
  });
});

describe('semicircle, weight on the centre line', () => {
  // Cocchetti & Rizzi 2020, Frattura ed Integrità Strutturale 51, 356–375, eq. 4 and Table 3.
  const system = (t: number) => systemOf(semicircleOnCentreLine(BLOCKS, t));
  const systemOf = ({ joints, blocks }: HandBuiltRing) => ringSystem(joints, blocks);
  const t = leastThickness((trial) => thrustRange(system(trial)).stands);

  test('least t/R 0.107426', () => expect(t).toBeCloseTo(0.107426, 6));

  test('horizontal thrust 0.621772 of the weight of a radius of ring', () => {
    const answer = thrustRange(system(t));
    if (!answer.stands) throw new Error('the ring falls');
    // least and greatest meet where the ring just stands
    expect(answer.least?.horizontal).toBeCloseTo(0.621772, 5);
    expect(answer.greatest?.horizontal).toBeCloseTo(0.621772, 5);
  });

  test('haunch hinges 54.496° from the crown', () => {
    const answer = thrustRange(system(t * (1 - 1e-6)));
    if (answer.stands) throw new Error('the ring stands');
    const haunches = answer.mechanism.filter(({ joint, side }) => side === 'intrados' && joint > 0 && joint < BLOCKS);
    expect(haunches).toHaveLength(2);
    for (const { joint } of haunches) expect(Math.abs(degreesFromCrown(joint) - 54.496)).toBeLessThan(0.1);
  });

  test('no joint slides where the friction is more than 0.395832', () => {
    expect(neededFriction(system(t))?.coefficient).toBeCloseTo(0.395832, 4);
  });

  test('three times that thickness keeps the line in the middle third, twice in the middle half', () => {
    // Heyman, from memory: geometric safety 3 and 2. The loads on the centre line are the same whatever the thickness.
    expect(leastMiddleShare(system(3 * t))?.share).toBeCloseTo(1 / 3, 8);
    expect(leastMiddleShare(system(2 * t))?.share).toBeCloseTo(1 / 2, 8);
  });
});
