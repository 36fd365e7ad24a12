/** Plane geometry of the shapes; each value by hand beside it. */
import { describe, expect, test } from 'vitest';
import { proportionFacts, roadArchRises } from '../../../core/checks/profile-facts.ts';
import type { Profile } from '../../../core/job/schema.ts';

const radius = (profile: Profile): number | null => proportionFacts(profile, null).crownRadius;

describe('radius of the intrados at the crown', () => {
  test.each<[string, Profile, number]>([
    ['semicircle: half the span', { shape: 'semicircular', span: 5 }, 2.5],
    ['segmental: (2² + 1²)/2 = 2.5', { shape: 'segmental', span: 4, rise: 1 }, 2.5],
    ['horseshoe: (1² + 2²)/4 = 1.25', { shape: 'horseshoe', span: 2, rise: 2 }, 1.25],
    // a 3, f 2, r 1: (9 − 6 + 4)/(2 × 1) = 3.5
    ['three-centred: the middle arc', { shape: 'three-centred', span: 6, rise: 2, haunchRadius: 1 }, 3.5],
    ['ellipse: a²/f = 9/2', { shape: 'elliptical', span: 6, rise: 2 }, 4.5],
    ['parabola: a²/2f = 9/4', { shape: 'parabolic', span: 6, rise: 2 }, 2.25],
    // L 10, f 3: c 4.59447, the closed form of the inverted catenary
    ['catenary: its parameter', { shape: 'catenary', span: 10, rise: 3 }, 4.59447],
    // (1² + 0.02²)/0.04
    ['cambered flat arch: the camber’s circle', { shape: 'flat', span: 2, skewbackAngle: 70, camber: 0.02 }, 25.01],
  ])('%s', (_, profile, expected) => {
    expect(radius(profile)).toBeCloseTo(expected, 5);
  });

  test.each<[string, Profile]>([
    ['a pointed crown', { shape: 'pointed', span: 4, rise: 3 }],
    ['a straight soffit', { shape: 'flat', span: 2, skewbackAngle: 70, camber: 0 }],
    ['a rampant arch', { shape: 'semicircular', span: 4, step: 0.5 }],
    [
      'measured points',
      {
        shape: 'measured',
        points: [
          [-1, 0],
          [0, 0.8],
          [1, 0],
        ],
      },
    ],
  ])('%s has none', (_, profile) => {
    expect(radius(profile)).toBeNull();
  });
});

describe('places along the intrados by its length', () => {
  test('a third and two thirds of a pointed arch mirror one another', () => {
    const { pointAtShare } = proportionFacts({ shape: 'pointed', span: 4, rise: 3 }, null);
    const [left, right] = [pointAtShare(1 / 3), pointAtShare(2 / 3)];
    expect(left.x).toBeCloseTo(-right.x, 12);
    expect(left.y).toBeCloseTo(right.y, 12);
  });

  test('shares of 0, ½ and 1 are the springings and the crown', () => {
    const { pointAtShare } = proportionFacts({ shape: 'three-centred', span: 6, rise: 2 }, null);
    for (const [share, x, y] of [
      [0, -3, 0],
      [0.5, 0, 2],
      [1, 3, 0],
    ] as const) {
      expect(pointAtShare(share).x).toBeCloseTo(x, 12);
      expect(pointAtShare(share).y).toBeCloseTo(y, 12);
    }
  });
});

describe('rises for the road axle method', () => {
  test('parabola: three quarters of the rise at the quarter points', () => {
    const { span, rise, quarterRise } = roadArchRises({ shape: 'parabolic', span: 8, rise: 2 });
    expect([span, rise]).toEqual([8, 2]);
    expect(quarterRise).toBeCloseTo(1.5, 12);
  });

  test('semicircle: R sin 60° at the quarter points', () => {
    expect(roadArchRises({ shape: 'semicircular', span: 4 }).quarterRise).toBeCloseTo(Math.sqrt(3), 12);
  });

  test('a rampant arch is measured over the line between its springings', () => {
    const { rise, quarterRise } = roadArchRises({ shape: 'parabolic', span: 8, rise: 2, step: 1 });
    expect(quarterRise).toBeCloseTo(1.5, 12);
    expect(rise).toBeCloseTo(2, 12);
  });

  test('of unlike quarter points in a survey the higher counts', () => {
    const points = [
      [-4, 0],
      [-2, 1.4],
      [0, 2],
      [2, 1.7],
      [4, 0],
    ] as const;
    expect(roadArchRises({ shape: 'measured', points }).quarterRise).toBeCloseTo(1.7, 9);
  });
});
