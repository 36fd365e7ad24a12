/** Rings that are not even bands: tapered, measured on both faces, and with joints that have lost mortar. */
import { describe, expect, test } from 'vitest';
import type { Joint } from '../../../core/geometry/stations.ts';
import type { RingForm } from '../../../core/geometry/ring.ts';
import { buildRing } from '../../../core/geometry/ring.ts';
import { assessed, problemsWith, type SchemeDraft } from '../../support/assessed.ts';
import { SOFFITS } from './soffits.ts';

const length = ({ intrados: i, extrados: e }: Joint): number => Math.hypot(e.x - i.x, e.y - i.y);

describe('a ring that grows from crown to springing', () => {
  const tapered = (profile: RingForm['profile'], voussoirs: number): RingForm => ({
    profile,
    thickness: { crown: 0.3, springing: 0.5 },
    voussoirs,
    joints: 'radial',
  });

  test.each(SOFFITS.map((soffit) => [soffit.profile.shape, soffit.profile] as const))(
    '%s: joints lengthen evenly along the soffit',
    (shape, profile) => {
      const { joints } = buildRing(tapered(profile, 20));
      joints.forEach((joint, j) => {
        // at an apex the crown joint runs on to where the two backs meet
        if (j === 10 && (shape === 'pointed' || shape === 'four-centred')) return;
        expect(length(joint)).toBeCloseTo(0.3 + 0.2 * Math.abs(1 - j / 10), 7);
      });
    },
  );

  test('on a circle its area is L (a + b)/2 + L (a² + ab + b²)/6R', () => {
    const L = 2.5 * Math.PI;
    const expected = L * 0.4 + (L * (0.09 + 0.15 + 0.25)) / (6 * 2.5);
    for (const voussoirs of [2, 9, 40]) {
      const { blocks } = buildRing(tapered({ shape: 'semicircular', span: 5 }, voussoirs));
      expect(blocks.reduce((sum, { area }) => sum + area, 0)).toBeCloseTo(expected, 9);
    }
  });

  test('a measured one is the limit of an even one, wherever the survey points lie', () => {
    const points: [number, number][] = [[-2, 0], [-1.7, 0.42], [-1.1, 0.75], [-0.3, 0.98], [0.4, 0.97], [1.2, 0.7], [2, 0.02]]; // prettier-ignore
    const total = (springing: number, voussoirs: number): number =>
      buildRing({
        profile: { shape: 'measured', points },
        thickness: { crown: 0.3, springing },
        voussoirs,
        joints: 'radial',
      }).blocks.reduce((sum, { area }) => sum + area, 0);
    const even = total(0.3, 5);
    for (const voussoirs of [4, 5, 12, 31]) {
      expect(total(0.3, voussoirs)).toBeCloseTo(even, 9);
      expect(total(0.3 + 1e-9, voussoirs)).toBeCloseTo(even, 7);
      expect(total(0.4, voussoirs)).toBeCloseTo(total(0.4, 9), 9);
    }
  });

  test('the scheme gives it by two thicknesses', () => {
    const { joints } = assessed({
      profile: { shape: 'segmental', span: 4, rise: 1 },
      ring: { thickness: 0.3, springingThickness: 0.45, voussoirs: 10, joints: 'radial' },
    }).model;
    expect([joints[0]!, joints[5]!, joints[10]!].map(length)).toEqual([
      expect.closeTo(0.45, 10),
      expect.closeTo(0.3, 10),
      expect.closeTo(0.45, 10),
    ]);
  });
});

describe('a ring measured on both faces', () => {
  const arc = (radius: number, count: number): [number, number][] =>
    Array.from({ length: count }, (_, i) => {
      const angle = 0.3 + ((Math.PI - 0.6) * i) / (count - 1);
      return [-radius * Math.cos(angle), radius * Math.sin(angle)];
    });

  test('two circles about one centre give the ring between them', () => {
    const { joints, blocks } = assessed({
      profile: { shape: 'measured', points: arc(3, 25), extrados: arc(3.4, 23) },
      ring: { thickness: 0.4, voussoirs: 12, joints: 'radial' },
      masonry: { unitWeight: 20 },
    }).model;
    for (const joint of joints) expect(length(joint)).toBeCloseTo(0.4, 2);
    const weight = blocks.flatMap(({ forces }) => forces).reduce((sum, { fy }) => sum - fy, 0);
    expect(weight / (20 * ((Math.PI - 0.6) / 2) * (3.4 ** 2 - 3 ** 2))).toBeCloseTo(1, 3);
  });
});

describe('a sparse survey', () => {
  test('seven points of a semicircle: the soffit between them is out by a millimetre, the springing joints point right', () => {
    const points = Array.from({ length: 7 }, (_, i): [number, number] => {
      const angle = (Math.PI * i) / 6;
      return [-3 * Math.cos(angle), 3 * Math.sin(angle)];
    });
    const { joints } = buildRing({
      profile: { shape: 'measured', points },
      thickness: { crown: 0.3, springing: 0.3 },
      voussoirs: 40,
      joints: 'radial',
    });
    for (const { intrados } of joints) expect(Math.hypot(intrados.x, intrados.y)).toBeCloseTo(3, 2);
    // level springing joints, within a degree
    expect(Math.abs(joints[0]!.extrados.y)).toBeLessThan(0.3 * Math.sin(Math.PI / 180));
  });
});

describe('joints that have lost mortar', () => {
  const RING: SchemeDraft = {
    profile: { shape: 'semicircular', span: 4 },
    ring: { thickness: 0.4, voussoirs: 12, joints: 'radial' },
  };
  type Lost = NonNullable<SchemeDraft['ring']['lostMortar']>;
  const recessed = (...lostMortar: Lost): SchemeDraft => ({
    ...RING,
    ring: { ...RING.ring, lostMortar },
  });

  test('carry on what is left: everywhere where no joint is named', () => {
    const whole = assessed(RING).model.joints;
    const { joints } = assessed(recessed({ face: 'intrados', depth: 0.05 })).model;
    joints.forEach((joint, j) => {
      expect(length(joint)).toBeCloseTo(0.35, 12);
      expect(joint.extrados).toEqual(whole[j]!.extrados);
    });
  });

  test('at one joint and face only', () => {
    const { joints } = assessed(recessed({ face: 'extrados', depth: 0.1, joint: 3 })).model;
    expect(joints.map((joint) => Number(length(joint).toFixed(6)))).toEqual(
      joints.map((_, j) => (j === 3 ? 0.3 : 0.4)),
    );
  });

  test('the weights stay, the safety falls, and the thrust has less room', () => {
    const [before, after] = [assessed(RING), assessed(recessed({ face: 'intrados', depth: 0.05 }))];
    expect(after.model.blocks).toEqual(before.model.blocks);
    expect(after.geometricSafety).toBeLessThan(before.geometricSafety ?? NaN);
    expect(after.thrust.least?.horizontal).toBeGreaterThan(before.thrust.least?.horizontal ?? NaN);
    expect(after.thrust.greatest?.horizontal).toBeLessThanOrEqual(before.thrust.greatest?.horizontal ?? NaN);
  });

  test('of two losses at one face the deeper counts', () => {
    const { joints } = assessed(
      recessed({ face: 'intrados', depth: 0.02 }, { face: 'intrados', depth: 0.06, joint: 5 }),
    ).model;
    expect(length(joints[5]!)).toBeCloseTo(0.34, 12);
    expect(length(joints[6]!)).toBeCloseTo(0.38, 12);
  });

  test('through the whole joint, or at a joint that is not there, are refused', () => {
    const paths = (...lost: Lost): string[] => problemsWith(recessed(...lost)).map(({ path }) => path);
    expect(paths({ face: 'intrados', depth: 0.4, joint: 2 })).toEqual(['ring.lostMortar']);
    expect(paths({ face: 'intrados', depth: 0.2 }, { face: 'extrados', depth: 0.25, joint: 2 })).toEqual([
      'ring.lostMortar',
    ]);
    expect(paths({ face: 'intrados', depth: 0.1, joint: 13 })).toEqual(['ring.lostMortar[0].joint']);
  });
});
