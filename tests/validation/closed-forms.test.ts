/**
 * Closed forms of statics and calculus. Each holds exactly, so the tolerances are rounding, unless a line says that the
 * ring on the drawing is only near the line of the formula.
 */
import { describe, expect, test } from 'vitest';
import type { Profile } from '../../core/job/schema.ts';
import { catenaryParameter } from '../../core/geometry/profile.ts';
import { buildRing } from '../../core/geometry/ring.ts';
import { leastMiddleShare } from '../../core/statics/geometric-safety.ts';
import { stressBlock } from '../../core/statics/stress-block.ts';
import { ringSystem } from '../../core/statics/system.ts';
import { assessed, type SchemeDraft } from '../support/assessed.ts';
import { jointAcross, weightAt, type HandBuiltRing } from './centre-line-ring.ts';

/** The thrust of the line that stays nearest the middle, kN, and the share of the joints that it needs. */
function middleLine({ joints, blocks }: HandBuiltRing): { horizontal: number; share: number } {
  const system = ringSystem(joints, blocks);
  const middle = leastMiddleShare(system);
  if (!middle?.state) throw new Error('no line stays in the middle');
  return { horizontal: middle.state[0]! * system.frame.force, share: middle.share };
}

const crownOf = (draft: SchemeDraft) => {
  const { crown } = assessed(draft);
  if (crown === null) throw new Error('no crown balance');
  return crown;
};

describe('parabola under uniform load w: H = wL²/8f, line of thrust on the parabola (standard statics)', () => {
  const [span, rise, w] = [12, 2.5, 8];
  const expected = (w * span ** 2) / (8 * rise);

  test('loads in twelve equal widths, joints on the parabola', () => {
    // between two joints the load counts as one force midway, so the line passes exactly through the joints
    const height = (x: number): number => rise * (1 - ((2 * x) / span) ** 2);
    const places = Array.from({ length: 13 }, (_, i) => i - 6);
    const { horizontal, share } = middleLine({
      joints: places.map((x) => jointAcross({ x, y: height(x) }, { x: span ** 2, y: -8 * rise * x }, 0.4)),
      blocks: places.slice(1).map((x) => weightAt({ x: x - 0.5, y: height(x - 0.5) }, w)),
    });
    expect(share).toBe(0);
    expect(horizontal).toBeCloseTo(expected, 9);
  });

  test('a thin weightless ring of that profile pushes so', () => {
    const { thrust } = assessed({
      profile: { shape: 'parabolic', span, rise },
      ring: { thickness: 0.02, voussoirs: 60, joints: 'vertical' },
      masonry: { unitWeight: 0 },
      loads: [{ id: 'l1', kind: 'strip', from: -span, to: span, intensity: w }],
    });
    // the ring reaches from one centimetre inside the parabola to one outside: 0.02/2.5 of the thrust either way
    expect(thrust.least?.horizontal).toBeGreaterThan(expected * 0.99);
    expect(thrust.greatest?.horizontal).toBeLessThan(expected * 1.02);
  });
});

describe('inverted catenary under its own weight q: H = q·a, a (cosh(L/2a) − 1) = f (standard statics)', () => {
  const [span, rise] = [10, 3];
  const [a, halfLength] = [4.59447, 6.04705];

  test('the parameter and the length of the curve, L 10 and f 3', () => {
    expect(catenaryParameter(span / 2, rise)).toBeCloseTo(a, 5);
    const { blocks } = buildRing({
      profile: { shape: 'catenary', span, rise },
      thickness: { crown: 1e-4, springing: 1e-4 },
      voussoirs: 8,
      joints: 'radial',
    });
    // area over thickness is the length of mid-ring: longer than the soffit by half the thickness times its turning
    const turning = 2 * Math.atan(Math.sinh(span / 2 / a));
    const length = blocks.reduce((sum, { area }) => sum + area, 0) / 1e-4 - (1e-4 * turning) / 2;
    expect(length / 2).toBeCloseTo(halfLength, 5);
  });

  test('ten pieces of a heavy curve hang in balance through their joints, upside down', () => {
    const c = catenaryParameter(span / 2, rise);
    const height = (x: number): number => rise + c - c * Math.cosh(x / c);
    const places = Array.from({ length: 11 }, (_, i) => i - 5);
    // centroid of the piece between two joints: ∫x ds / ∫ds with ds = cosh(x/c) dx
    const first = (x: number): number => x * c * Math.sinh(x / c) - c * c * Math.cosh(x / c);
    const arc = (x: number): number => c * Math.sinh(x / c);
    const { horizontal, share } = middleLine({
      joints: places.map((x) => jointAcross({ x, y: height(x) }, { x: 1, y: -Math.sinh(x / c) }, 0.3)),
      blocks: places.slice(1).map((x) => {
        const weight = arc(x) - arc(x - 1);
        return weightAt({ x: (first(x) - first(x - 1)) / weight, y: height(x - 0.5) }, weight);
      }),
    });
    expect(share).toBe(0);
    expect(horizontal).toBeCloseTo(c, 9);
  });

  test('a thin ring on that profile pushes q·a', () => {
    const t = 0.01;
    const { thrust } = assessed({
      profile: { shape: 'catenary', span, rise },
      ring: { thickness: t, voussoirs: 100, joints: 'radial' },
      masonry: { unitWeight: 20 },
    });
    // the sag of the line may differ by the ring's own thickness at crown and springing, either way
    expect(thrust.least?.horizontal).toBeGreaterThan(20 * t * a * (1 - (2 * t) / rise));
    expect(thrust.greatest?.horizontal).toBeLessThan(20 * t * a * (1 + (2 * t) / rise));
  });
});

describe('moment balance about the crown: H = P (a − x̄)/h (common practice)', () => {
  test('three-hinged semicircle of weight w a metre: H = wR(π/2 − 1) as the ring grows thin', () => {
    // the centroid of true blocks lies t²/12R² outside the centre line (ring sector, below), which lowers H by as much
    for (const t of [0.4, 0.1, 0.001]) {
      const { horizontal, lever } = crownOf({
        profile: { shape: 'semicircular', span: 4 - t },
        ring: { thickness: t, voussoirs: 12 },
        masonry: { unitWeight: 1 / t },
      });
      expect(lever).toBeCloseTo(2, 12);
      expect(horizontal).toBeCloseTo(2 * (Math.PI / 2 - 1 - t ** 2 / 48), 10);
      if (t === 0.001) expect(horizontal).toBeCloseTo(2 * (Math.PI / 2 - 1), 6);
    }
  });

  const twoLoads = (rise: number, left = 10, right = 10): SchemeDraft => ({
    profile: { shape: 'elliptical', span: 3.6, rise },
    ring: { thickness: 0.4, voussoirs: 24 },
    masonry: { unitWeight: 0 },
    loads: [
      { id: 'l1', kind: 'point', x: -0.5, force: left },
      { id: 'l2', kind: 'point', x: 0.5, force: right },
    ],
  });

  test('a half of 10 kN half a metre from the crown, springing at 2 m, rise of mid-ring 1 m: 15 kN', () => {
    const { horizontal, leftVertical, rightVertical, lever } = crownOf(twoLoads(0.8));
    expect(lever).toBeCloseTo(1, 12);
    expect(horizontal).toBeCloseTo((10 * (2 - 0.5)) / 1, 10);
    expect(leftVertical).toBeCloseTo(10, 10);
    expect(rightVertical).toBeCloseTo(10, 10);
  });

  test('doubling the rise at the same weight and levers halves the thrust', () => {
    expect(crownOf(twoLoads(1.8)).horizontal).toBeCloseTo(crownOf(twoLoads(0.8)).horizontal / 2, 10);
  });

  test('unequal halves: the verticals follow from the moments about the springings', () => {
    // 6 and 18 kN at ∓0.5 m over 4 m between mid-rings: left 6·2.5/4 + 18·1.5/4, H = (left·2 − 6·0.5)/1
    const { horizontal, leftVertical, rightVertical } = crownOf(twoLoads(0.8, 6, 18));
    expect(leftVertical).toBeCloseTo(10.5, 10);
    expect(rightVertical).toBeCloseTo(13.5, 10);
    expect(horizontal).toBeCloseTo(10.5 * 2 - 6 * 0.5, 10);
  });
});

describe('ring sector of angle φ: area φRt, centroid at R (1 + t²/12R²) sin(φ/2)/(φ/2) (calculus)', () => {
  const sectors: [Profile, number, number, number][] = [
    [{ shape: 'semicircular', span: 3.2 }, 5, 1.6, 0],
    // R = (a² + f²)/2f = 2.9, a = 2, f = 0.8; centre f − R below the springing line
    [{ shape: 'segmental', span: 4, rise: 0.8 }, 7, 2.9, -2.1],
    // the same circle carried on below its middle: a = 2.1, R = 2.9, f = 2.9 + 2
    [{ shape: 'horseshoe', span: 4.2, rise: 4.9 }, 9, 2.9, 2],
  ];
  test.each(sectors)('%j in %i blocks', (profile, voussoirs, soffit, centre) => {
    const t = 0.4;
    const { joints, blocks } = buildRing({
      profile,
      thickness: { crown: t, springing: t },
      voussoirs,
      joints: 'radial',
    });
    const bearing = ({ x, y }: { x: number; y: number }): number => Math.atan2(x, y - centre);
    const R = soffit + t / 2;
    blocks.forEach(({ area, centroid }, k) => {
      const phi = bearing(joints[k + 1]!.intrados) - bearing(joints[k]!.intrados);
      expect(area).toBeCloseTo(phi * R * t, 12);
      const radius = R * (1 + t ** 2 / (12 * R ** 2)) * (Math.sin(phi / 2) / (phi / 2));
      expect(Math.hypot(centroid.x, centroid.y - centre)).toBeCloseTo(radius, 11);
      expect(bearing(centroid)).toBeCloseTo((bearing(joints[k + 1]!.intrados) + bearing(joints[k]!.intrados)) / 2, 12);
    });
  });
});

describe('joint without tension (standard statics)', () => {
  test('e ≤ t/6: N (1 ± 6e/t)/(b t) over the whole joint', () => {
    // N 60, t 0.5, b 1.2, e 0.05: 100 (1 ± 0.6)
    const block = stressBlock(60, 60 * 0.05, 0.5, 1.2);
    expect(block?.intradosStress).toBeCloseTo(160, 10);
    expect(block?.extradosStress).toBeCloseTo(40, 10);
    expect(block?.compressed).toBe(0.5);
  });

  test('beyond: 2N/(3b(t/2 − e)) over 3(t/2 − e); N 100, t 0.5, b 1, e 0.1 gives 444.4 kPa over 0.45 m', () => {
    const block = stressBlock(100, -100 * 0.1, 0.5, 1);
    expect(block?.extradosStress).toBeCloseTo(444.4, 1);
    expect(block?.intradosStress).toBe(0);
    expect(block?.compressed).toBeCloseTo(0.45, 12);
  });

  test('at e = t/6 both forms say twice the mean, and nothing at the far edge', () => {
    for (const e of [0.1 * (1 - 1e-12), 0.1 * (1 + 1e-12)]) {
      const block = stressBlock(30, 30 * e, 0.6, 1);
      expect(block?.intradosStress).toBeCloseTo(100, 8);
      expect(block?.extradosStress).toBeCloseTo(0, 8);
      expect(block?.compressed).toBeCloseTo(0.6, 8);
    }
  });
});

test('radius of a segmental arch: (s²/4 + f²)/(2f) (geometry)', () => {
  const { joints } = buildRing({
    profile: { shape: 'segmental', span: 6, rise: 1 },
    thickness: { crown: 0.5, springing: 0.5 },
    voussoirs: 11,
    joints: 'radial',
  });
  // (9 + 1)/2 = 5, so the centre lies 4 m below the springing line
  for (const { intrados, extrados } of joints) {
    expect(Math.hypot(intrados.x, intrados.y + 4)).toBeCloseTo(5, 12);
    expect(Math.hypot(extrados.x, extrados.y + 4)).toBeCloseTo(5.5, 12);
  }
});
