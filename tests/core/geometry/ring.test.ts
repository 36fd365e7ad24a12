import { describe, expect, test } from 'vitest';
import type { Profile } from '../../../core/job/schema.ts';
import type { RingForm } from '../../../core/geometry/ring.ts';
import { buildRing } from '../../../core/geometry/ring.ts';
import { SOFFITS, type Soffit } from './soffits.ts';

const T = 0.3;
const form = (profile: Profile, voussoirs: number, joints: RingForm['joints'] = 'radial', t = T): RingForm => ({
  profile,
  thickness: { crown: t, springing: t },
  voussoirs,
  joints,
});

const totalArea = (of: RingForm): number => buildRing(of).blocks.reduce((sum, { area }) => sum + area, 0);

/** The direction square to the curve, outwards, from the gradient of its equation. */
function squareTo({ equation }: Soffit, x: number, y: number): { x: number; y: number } {
  const h = 1e-6;
  const gx = equation(x + h, y) - equation(x - h, y);
  const gy = equation(x, y + h) - equation(x, y - h);
  return { x: gx / Math.hypot(gx, gy), y: gy / Math.hypot(gx, gy) };
}

const named = SOFFITS.map((soffit) => [soffit.profile.shape, soffit] as const);

describe.each(named)('%s', (shape, soffit) => {
  const { profile, equation, crown, length, turning } = soffit;
  const pointedCrown = shape === 'pointed' || shape === 'four-centred';

  test('the joints stand on the soffit, from springing to springing', () => {
    const { joints, crownIntrados } = buildRing(form(profile, 16));
    expect(joints).toHaveLength(17);
    for (const { intrados } of joints) expect(equation(intrados.x, intrados.y)).toBeCloseTo(0, 10);
    expect(joints[0]!.intrados.x).toBeCloseTo(-profile.span / 2, 12);
    expect(joints[0]!.intrados.y).toBeCloseTo(0, 12);
    expect(joints[16]!.intrados.x).toBeCloseTo(profile.span / 2, 12);
    expect(joints[16]!.intrados.y).toBeCloseTo(0, 12);
    expect(crownIntrados.x).toBeCloseTo(0, 7);
    expect(crownIntrados.y).toBeCloseTo(crown, 12);
  });

  test('radial joints stand square on the soffit, as long as the ring is thick', () => {
    for (const { intrados, extrados } of buildRing(form(profile, 15)).joints) {
      const outwards = squareTo(soffit, intrados.x, intrados.y);
      expect(extrados.x - intrados.x).toBeCloseTo(T * outwards.x, 6);
      expect(extrados.y - intrados.y).toBeCloseTo(T * outwards.y, 6);
    }
  });

  test('an even number of voussoirs puts a joint at the crown, plumb there', () => {
    const { intrados, extrados } = buildRing(form(profile, 16)).joints[8]!;
    expect(intrados.x).toBeCloseTo(0, 9);
    expect(intrados.y).toBeCloseTo(crown, 12);
    expect(extrados.x).toBeCloseTo(0, 9);
    if (!pointedCrown) expect(extrados.y).toBeCloseTo(crown + T, 12);
  });

  test('an odd number puts a keystone across the crown', () => {
    const { joints } = buildRing(form(profile, 15));
    expect(joints[7]!.intrados.x).toBeCloseTo(-joints[8]!.intrados.x, 9);
    expect(joints[7]!.intrados.x).toBeLessThan(0);
  });

  if (shape !== 'horseshoe') {
    test('vertical joints are plumb but for the skewbacks, and end on the same extrados', () => {
      const { joints } = buildRing(form(profile, 14, 'vertical'));
      const square = buildRing(form(profile, 14)).joints;
      expect(joints[0]).toEqual(square[0]);
      expect(joints[14]).toEqual(square[14]);
      for (const { intrados, extrados } of joints.slice(1, -1)) {
        expect(extrados.x).toBeCloseTo(intrados.x, 9);
        expect(extrados.y).toBeGreaterThan(intrados.y + T * 0.999);
      }
    });
  }

  if (!pointedCrown) {
    test('the ring has the area of a band: length of soffit × t + turning × t²/2 (Steiner)', () => {
      expect(totalArea(form(profile, 9))).toBeCloseTo(length * T + (turning * T * T) / 2, 10);
    });
  }

  test('its area and its centre do not depend on how it is cut into blocks', () => {
    const whole = (of: RingForm): number[] => {
      const { blocks } = buildRing(of);
      return [
        blocks.reduce((sum, { area }) => sum + area, 0),
        blocks.reduce((sum, { area, centroid }) => sum + area * centroid.x, 0),
        blocks.reduce((sum, { area, centroid }) => sum + area * centroid.y, 0),
      ];
    };
    const once = whole(form(profile, 2));
    const cuts = [form(profile, 7), form(profile, 300)];
    if (shape !== 'horseshoe') cuts.push(form(profile, 12, 'vertical'), form(profile, 301, 'vertical'));
    for (const cut of cuts) whole(cut).forEach((value, i) => expect(value).toBeCloseTo(once[i]!, 11));
  });

  test('the blocks are equally long on the soffit', () => {
    // the area of a sliver over the soffit is its length
    const slivers = buildRing(form(profile, 11, 'radial', 1e-7)).blocks.map(({ area }) => area / 1e-7);
    for (const sliver of slivers) expect(sliver).toBeCloseTo(length / 11, 5);
  });
});

describe('pointed rings', () => {
  /** Half the area above the springing line within an arc about (c, y0) from a level or joint at `angle` to the axis. */
  const halfBand = (c: number, inner: number, outer: number, angle: number): number => {
    const sector = (radius: number): number => (radius ** 2 * (Math.acos(c / radius) - angle)) / 2;
    const apex = (radius: number): number => Math.sqrt(radius ** 2 - c ** 2);
    return sector(outer) - sector(inner) - (c * (apex(outer) - apex(inner))) / 2;
  };

  test('equilateral: sectors about the springings, less the triangles beyond the axis', () => {
    const { profile } = SOFFITS.find((soffit) => soffit.profile.shape === 'pointed')!;
    expect(totalArea(form(profile, 8))).toBeCloseTo(2 * halfBand(2, 4, 4 + T, 0), 11);
    const crownJoint = buildRing(form(profile, 8)).joints[4]!;
    expect(crownJoint.extrados.y).toBeCloseTo(Math.sqrt((4 + T) ** 2 - 4), 11);
  });

  test('four-centred: two haunch sectors and two upper bands', () => {
    const { profile } = SOFFITS.find((soffit) => soffit.profile.shape === 'four-centred')!;
    const haunchAngle = Math.atan2(4, 3);
    const haunches = haunchAngle * ((1 + T) ** 2 - 1);
    expect(totalArea(form(profile, 9))).toBeCloseTo(haunches + 2 * halfBand(1, 6, 6 + T, haunchAngle), 11);
  });
});

describe('flat arch', () => {
  test('level: joints point at the meeting of the skewbacks, the top is level, the area a trapezium', () => {
    // skewback 60°: the joints meet 3√3 under a span of 6
    const ring = buildRing(form({ shape: 'flat', span: 6, skewbackAngle: 60, camber: 0 }, 9));
    for (const { intrados, extrados } of ring.joints) {
      expect(intrados.y).toBeCloseTo(0, 12);
      expect(extrados.y).toBeCloseTo(T, 12);
      expect(extrados.x * 3 * Math.sqrt(3)).toBeCloseTo(intrados.x * (3 * Math.sqrt(3) + T), 11);
    }
    const area = ring.blocks.reduce((sum, block) => sum + block.area, 0);
    expect(area).toBeCloseTo(T * (6 + T / Math.sqrt(3)), 12);
  });

  test('cambered: the trapezium less the segment under the soffit', () => {
    // span 6, camber 1: R 5, segment R²(φ − sin φ cos φ) with φ = asin 0.6
    const phi = Math.asin(0.6);
    const segment = 25 * (phi - 0.6 * 0.8);
    const area = totalArea(form({ shape: 'flat', span: 6, skewbackAngle: 45, camber: 1 }, 12));
    expect(area).toBeCloseTo((1 + T) * (6 + 1 + T) - segment, 11);
  });

  test('vertical ends: a plain beam', () => {
    const { joints } = buildRing(form({ shape: 'flat', span: 4, skewbackAngle: 90, camber: 0 }, 4));
    for (const { intrados, extrados } of joints) expect(extrados.x).toBe(intrados.x);
  });
});

describe('rampant ring', () => {
  test.each(named)('%s: the soffit of the level arch, raised evenly from left to right', (_, { profile, equation }) => {
    const step = 0.2 * profile.span;
    const { joints } = buildRing(form({ ...profile, step }, 12));
    for (const { intrados } of joints) {
      expect(equation(intrados.x, intrados.y - 0.2 * intrados.x)).toBeCloseTo(0, 10);
    }
    expect(joints[12]!.intrados.y - joints[0]!.intrados.y).toBeCloseTo(step, 11);
  });
});

describe('measured ring', () => {
  const circle = (count: number): [number, number][] =>
    Array.from({ length: count }, (_, i) => {
      const angle = 0.4 + ((Math.PI - 0.8) * i) / (count - 1);
      return [-3 * Math.cos(angle), 3 * Math.sin(angle)];
    });

  test('the springing joints stand at the first and last point', () => {
    const points: [number, number][] = [[-2, 0], [-1.2, 0.9], [0.1, 1.3], [1.3, 0.8], [2, 0.1]]; // prettier-ignore
    const { joints } = buildRing(form({ shape: 'measured', points }, 10));
    expect([joints[0]!.intrados.x, joints[0]!.intrados.y]).toEqual([-2, 0]);
    expect(joints[10]!.intrados.x).toBeCloseTo(2, 12);
    expect(joints[10]!.intrados.y).toBeCloseTo(0.1, 12);
  });

  test('many points of a circle give the ring of that circle', () => {
    const arc = (Math.PI - 0.8) * 3 * T + ((Math.PI - 0.8) * T * T) / 2;
    const off = (count: number): number =>
      Math.abs(totalArea(form({ shape: 'measured', points: circle(count) }, 12)) / arc - 1);
    // at worst the direction at the springings is out in proportion to the distance between the points
    expect(off(41)).toBeLessThan(1e-3);
    expect(off(321)).toBeLessThan(1.2e-4);
  });
});
