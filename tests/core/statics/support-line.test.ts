/** The line of pressure in a body, worked by hand: kN and m, u from the front face, z down from the springing. */
import { describe, expect, it } from 'vitest';
import { baseOf } from '../../../core/statics/support-base.ts';
import { supportBody, withLoadOnTop, type Push } from '../../../core/statics/support-body.ts';
import { crackedLine, standsCracked, wholeLine } from '../../../core/statics/support-line.ts';
import { bodyOf, course } from '../../support/bodies.ts';

const push: Push = { horizontal: 12, vertical: 40, u: 0.2, z: 0 };

describe('a body of 60 kN under 40 kN at 0.2 m and a thrust of 12 kN at its top', () => {
  const body = supportBody(bodyOf());
  const line = wholeLine(body, push);
  const base = line.beds.at(-1)!;

  it('has its resultant 0.74 m from the front at the base', () => {
    // N = 40 + 60 = 100; M = 40 × 0.2 + 60 × 0.5 + 12 × 3 = 8 + 30 + 36 = 74; u = 0.74, e = 0.24
    expect(base.normal).toBeCloseTo(100, 10);
    expect(base.at).toBeCloseTo(0.74, 10);
    expect(base.eccentricity).toBeCloseTo(0.24, 10);
    expect(base.shear).toBeCloseTo(12, 10);
  });

  it('presses the base over a triangle beyond the middle third (standard statics)', () => {
    // e = 0.24 > 1/6: over 3 (0.5 − 0.24) = 0.78 m, 2 × 100 / 0.78 = 256.41 kN/m²
    expect(base.compressed![0]).toBeCloseTo(0.22, 10);
    expect(base.stress![0]).toBe(0);
    expect(base.stress![1]).toBeCloseTo(256.41, 2);
  });

  it('touches the middle third with a thrust of 9.5556 kN (middle third, standard statics)', () => {
    // u = 2/3: H = (100 × 2/3 − 38) / 3
    const third = wholeLine(body, { ...push, horizontal: (200 / 3 - 38) / 3 }).beds.at(-1)!;
    expect(third.stress![0]).toBeCloseTo(0, 8);
    // the mean of 100 kN/m² twice over
    expect(third.stress![1]).toBeCloseTo(200, 8);
  });

  it('resists overturning 1.722 times', () => {
    // about the back: (40 × 0.8 + 60 × 0.5) / (12 × 3) = 62 / 36
    expect(baseOf(body, push, line)!.overturning).toBeCloseTo(62 / 36, 10);
  });

  it('is steadied by a load on top', () => {
    // 50 kN at 0.5: M = 99, N = 150
    expect(wholeLine(withLoadOnTop(body, 50, 0.5), push).beds.at(-1)!.at).toBeCloseTo(99 / 150, 10);
  });
});

describe('courses that step out', () => {
  const stepped = bodyOf({
    courses: [course({ height: 1, depth: 0.6 }), course({ height: 1, depth: 1 })],
    footing: course({ height: 0.5, depth: 1.4, front: -0.2, unitWeight: 24 }),
  });
  const { beds } = wholeLine(supportBody(stepped), push);
  const ends = beds.filter(({ slice }) => slice.isBed);

  it('have one bed each, the footing last', () => {
    expect(ends.map(({ slice }) => [slice.course, slice.bottom])).toEqual([
      [0, 1],
      [1, 2],
      [2, 2.5],
    ]);
  });

  it('weigh where they stand', () => {
    // 12 at 0.3, 20 at 0.5, footing 1.4 × 0.5 × 24 = 16.8 at 0.5
    // N = 40 + 12 + 20 + 16.8 = 88.8; M = 8 + 3.6 + 10 + 8.4 + 12 × 2.5 = 60
    expect(ends[2]!.normal).toBeCloseTo(88.8, 10);
    expect(ends[2]!.at).toBeCloseTo(60 / 88.8, 10);
    // middle of the footing at −0.2 + 0.7 = 0.5
    expect(ends[2]!.eccentricity).toBeCloseTo(60 / 88.8 - 0.5, 10);
  });
});

describe('earth behind', () => {
  const earth = { active: 0.3, passive: null, unitWeight: 18, height: 2 };

  it('leans back with a triangle of active pressure', () => {
    // 0.3 × 18 × 2² / 2 = 10.8 kN at 2/3 m: M = 74 − 7.2, shear 12 − 10.8
    const base = wholeLine(supportBody(bodyOf({ earth })), push).beds.at(-1)!;
    expect(base.at).toBeCloseTo(0.668, 10);
    expect(base.shear).toBeCloseTo(1.2, 10);
  });

  it('above the springing presses with what is over the top too', () => {
    // surface 1 m over the top, from 5.4 to 21.6 kN/m² over 3 m: 40.5 kN; 16.2 × 1.5 + 24.3 × 1 = 48.6 kN·m
    const base = wholeLine(supportBody(bodyOf({ earth: { ...earth, height: 4 } })), push).beds.at(-1)!;
    expect(base.shear).toBeCloseTo(12 - 40.5, 10);
    expect(base.at).toBeCloseTo((74 - 48.6) / 100, 10);
  });

  it('is called upon beyond that only where passive pressure was entered', () => {
    const held = bodyOf({ earth: { ...earth, passive: 3 } });
    const pushed = { ...push, horizontal: 20 };
    const passive = (support: typeof held): number => {
      const body = supportBody(support);
      return baseOf(body, pushed, wholeLine(body, pushed))!.passive;
    };
    // (3 − 0.3) × 18 × 2² / 2
    expect(passive(held)).toBeCloseTo(97.2, 10);
    expect(passive(bodyOf({ earth }))).toBe(0);
  });
});

describe('the thrust of the next arch on one pier', () => {
  const pier = bodyOf({
    kind: 'pier',
    loads: [
      { kind: 'vertical', force: 40, offset: 0.8 },
      { kind: 'horizontal', push: -12, level: 0 },
    ],
  });

  it('brings an even pair back to the middle', () => {
    const { beds } = wholeLine(supportBody(pier), push);
    for (const { at, shear } of beds) {
      expect(at).toBeCloseTo(0.5, 10);
      expect(shear).toBeCloseTo(0, 10);
    }
  });

  it('over the top of the body has its whole lever', () => {
    // −12 kN at 0.5 m over the springing: M = 8 + 32 + 30 + 36 − 12 × 3.5 = 64, N = 140
    const high = bodyOf({ ...pier, loads: [pier.loads[0]!, { kind: 'horizontal', push: -12, level: 0.5 }] });
    expect(wholeLine(supportBody(high), push).beds.at(-1)!.at).toBeCloseTo(64 / 140, 10);
  });
});

describe('the wedge that cracks off', () => {
  /**
   * The same by quadrature, fine steps and no slices: N′ = γ c, M′ = γ c (1 − c/2) + H with c = min(1, 3 (1 − M/N)),
   * the compressed part of a bed a metre deep (after Ochsendorf, Hernando & Huerta 2004, from memory).
   */
  function byQuadrature(horizontal: number, steps = 20_000): { normal: number; at: number } {
    let normal = 40;
    let moment = 8;
    const dz = 3 / steps;
    for (let i = 0; i < steps; i++) {
      const c = Math.min(1, 3 * (1 - moment / normal));
      normal += 20 * c * dz;
      moment += (20 * c * (1 - c / 2) + horizontal) * dz;
    }
    return { normal, at: moment / normal };
  }

  it('is nothing while the line keeps to the middle third', () => {
    const line = crackedLine(supportBody(bodyOf()), { ...push, horizontal: 9 });
    expect(line.wedge).toBeCloseTo(0, 10);
    expect(line.beds.at(-1)!.normal).toBeCloseTo(100, 10);
  });

  it.each([12, 14, 16])('agrees with quadrature at a thrust of %d kN', (horizontal) => {
    const courses = Array.from({ length: 200 }, () => course({ height: 0.015 }));
    const line = crackedLine(supportBody(bodyOf({ courses })), { ...push, horizontal });
    const base = line.beds.at(-1)!;
    const exact = byQuadrature(horizontal);
    expect(line.wedge).toBeGreaterThan(0);
    // slices of 15 mm: an error of their square
    expect(base.normal).toBeCloseTo(exact.normal, 1);
    expect(base.at).toBeCloseTo(exact.at, 3);
    // left out of the weight, and so further out
    expect(line.wedge).toBeCloseTo(100 - base.normal, 8);
    expect(base.at).toBeGreaterThan(wholeLine(supportBody(bodyOf()), { ...push, horizontal }).beds.at(-1)!.at!);
  });

  it('mirrors itself under a push into the opening', () => {
    const courses = [course({ height: 1 }), course({ height: 2 })];
    const outwards = crackedLine(supportBody(bodyOf({ courses })), { ...push, horizontal: 14, u: 0.2 });
    const inwards = crackedLine(supportBody(bodyOf({ courses })), { ...push, horizontal: -14, u: 0.8 });
    expect(inwards.wedge).toBeCloseTo(outwards.wedge, 10);
    expect(inwards.beds.at(-1)!.at).toBeCloseTo(1 - outwards.beds.at(-1)!.at!, 10);
  });
});

describe('masonry behind a push at the front of the top', () => {
  it('bears again further down, where the line has come back to the middle', () => {
    const line = crackedLine(supportBody(bodyOf()), { ...push, horizontal: 9 });
    expect(line.beds[0]!.normal).toBeLessThan(40 + 20 * line.beds[0]!.slice.bottom);
    expect(line.beds.at(-1)!.normal).toBeCloseTo(100, 10);
  });
});

describe('bodies that are none', () => {
  it('of no depth hold nothing', () => {
    const body = supportBody(bodyOf({ courses: [course({ depth: 0 })] }));
    expect(wholeLine(body, push).stands).toBe(false);
    expect(standsCracked(body, push)).toBe(false);
  });

  it('without an arch stand by themselves, pressed evenly', () => {
    const line = crackedLine(supportBody(bodyOf()), { horizontal: 0, vertical: 0, u: 0, z: 0 });
    expect(line.stands).toBe(true);
    expect(line.beds.at(-1)!.stress).toEqual([60, 60]);
  });

  it('without weight and without an arch have nothing to press with', () => {
    const body = supportBody(bodyOf({ courses: [course({ unitWeight: 0 })] }));
    const { beds, stands } = wholeLine(body, { horizontal: 0, vertical: 0, u: 0, z: 0 });
    expect(stands).toBe(false);
    expect(beds.at(-1)!.at).toBeNull();
  });
});
