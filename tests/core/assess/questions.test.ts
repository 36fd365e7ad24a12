/** Chosen thrusts and lines placed by hand: joint forces against statics done on paper. */
import { describe, expect, test } from 'vitest';
import { lineAtShare, lineThrough, type LineReport } from '../../../core/assess/questions.ts';
import { assessed, builtFrom, type SchemeDraft } from '../../support/assessed.ts';

const ARCH: SchemeDraft = {
  profile: { shape: 'semicircular', span: 4 },
  ring: { thickness: 0.5, voussoirs: 20, joints: 'radial' },
  breadth: 0.8,
  masonry: { unitWeight: 22 },
  loads: [{ id: 'l1', kind: 'point', x: 0.5, force: 6 }],
};
const built = builtFrom(ARCH);
const result = assessed(ARCH);
const [least, greatest] = [result.thrust.least?.horizontal ?? NaN, result.thrust.greatest?.horizontal ?? NaN];

function given(report: LineReport | null): LineReport {
  if (report === null) throw new Error('no line');
  return report;
}

describe('a thrust between least and greatest', () => {
  test.each([0, 0.25, 0.5, 1])('a share of %d of the way', (share) => {
    const report = given(lineAtShare(built, share));
    expect(report.horizontal).toBeCloseTo(least + share * (greatest - least), 9);
    expect(report.outside).toEqual([]);
  });

  test('forces at every joint are the reaction and the loads so far, resolved on the joint', () => {
    const { joints, line, horizontal } = given(lineAtShare(built, 0.4));
    // the vertical at the left springing from the balance of moments about the right one's point
    const [first, last] = [line[0]!, line.at(-1)!];
    const forces = result.model.blocks.map((block) => block.forces);
    const turning = forces.flat().reduce((sum, { x, fy }) => sum + (x - last.x) * fy, 0);
    let up = (horizontal * (first.y - last.y) - turning) / (first.x - last.x);
    joints.forEach(({ normal, shear, friction, at, share }, j) => {
      const { intrados: i, extrados: e } = result.model.joints[j]!;
      const [ax, ay] = [(e.x - i.x) / 0.5, (e.y - i.y) / 0.5];
      expect(normal).toBeCloseTo(ay * horizontal - ax * up, 8);
      expect(shear).toBeCloseTo(ax * horizontal + ay * up, 8);
      expect(friction).toBeCloseTo(Math.abs(shear) / normal, 12);
      expect(at?.x).toBeCloseTo(i.x + (share ?? NaN) * (e.x - i.x), 12);
      for (const { fy } of forces[j] ?? []) up += fy;
    });
  });

  test('the stress block at a joint follows from its normal force and eccentricity', () => {
    for (const { share, normal, stress } of given(lineAtShare(built, 0.5)).joints) {
      const eccentricity = (0.5 - (share ?? NaN)) * 0.5;
      expect(stress?.eccentricity).toBeCloseTo(eccentricity, 10);
      // the block of stress has the volume of the normal force
      const mean = ((stress?.intradosStress ?? 0) + (stress?.extradosStress ?? 0)) / 2;
      expect(mean * (stress?.compressed ?? 0) * 0.8).toBeCloseTo(normal, 9);
    }
  });

  test('there is none for a ring that falls', () => {
    const thin = builtFrom({ ...ARCH, ring: { ...ARCH.ring, thickness: 0.1 } });
    expect(lineAtShare(thin, 0.5)).toBeNull();
  });
});

describe('a line drawn by hand', () => {
  const middle = (joint: number) => ({ joint, share: 0.5 });

  test('through mid-ring at springings and crown it is the balance about the crown', () => {
    const report = given(lineThrough(built, [middle(0), middle(10), middle(20)]));
    expect(report.horizontal).toBeCloseTo(result.crown?.horizontal ?? NaN, 9);
    expect(report.outside.length === 0).toBe(result.crown?.inside);
    for (const j of [0, 10, 20]) expect(report.joints[j]?.share).toBeCloseTo(0.5, 10);
  });

  test('that leaves the ring is drawn all the same, with where and by how much', () => {
    const report = given(lineThrough(built, [middle(0), { joint: 10, share: 1.4 }, middle(20)]));
    const crown = report.outside.find(({ joint }) => joint === 10);
    expect(crown?.side).toBe('extrados');
    expect(crown?.by).toBeCloseTo(0.4 * 0.5, 10);
    for (const { joint, side, by } of report.outside) {
      expect(by).toBeGreaterThan(0);
      expect((report.joints[joint]?.share ?? NaN) > 1).toBe(side === 'extrados');
    }
    // where the resultant is outside the joint there is no stress to speak of
    expect(report.joints[10]?.stress).toBeNull();
  });

  test('through three places in one line there is none', () => {
    const flat = builtFrom({
      profile: { shape: 'flat', span: 2, skewbackAngle: 90, camber: 0 },
      ring: { thickness: 0.3, voussoirs: 8, joints: 'vertical' },
    });
    expect(lineThrough(flat, [middle(0), middle(4), middle(8)])).toBeNull();
  });
});
