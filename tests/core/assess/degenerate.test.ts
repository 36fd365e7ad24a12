/** Rings at the edge of what is one: no cycling, no figure that is not a figure, and no answer where there is none. */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { SchemeAssessment } from '../../../core/assess/assessment.ts';
import type { Load, Profile } from '../../../core/job/schema.ts';
import { assessed, type SchemeDraft } from '../../support/assessed.ts';
import { randomSchemes, schemeOf, shapes } from '../../validation/random-arches.ts';

/** Paths of all figures in a document that are not finite. */
function notFinite(value: unknown, path = ''): string[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [path];
  if (value === null || typeof value !== 'object') return value === undefined ? [path] : [];
  return Object.entries(value).flatMap(([name, part]) => notFinite(part, `${path}.${name}`));
}

/** Assesses, and sees that every figure is one. */
function sound(draft: SchemeDraft): SchemeAssessment {
  const result = assessed(draft);
  expect(notFinite(result), JSON.stringify(draft)).toEqual([]);
  return result;
}

const statusOf = ({ checks }: SchemeAssessment): string | undefined =>
  checks.find(({ id }) => id === 'ring.compression-only')?.status;

const semicircle = (voussoirs: number, extra: Partial<SchemeDraft> = {}): SchemeDraft => ({
  profile: { shape: 'semicircular', span: 4 },
  ring: { thickness: 0.5, voussoirs, joints: 'radial' },
  ...extra,
});

test('no figure of any assessment is infinite or not a number', () => {
  for (const scheme of randomSchemes(12, 7)) sound(scheme);
});

test('nor of a ring pushed to extremes', () => {
  const extreme = fc.record({
    scheme: fc.constantFrom(...shapes).chain(schemeOf),
    thickness: fc.constantFrom(1e-4, 0.01, 1, 1.5),
    weight: fc.constantFrom(0, 1e-6, 1, 200),
    force: fc.constantFrom(-1e7, -1, 0, 1e-9, 1, 1e7),
    sway: fc.constantFrom(-10, 0, 1e-12, 0.3, 10),
    voussoirs: fc.constantFrom(2, 3, 4, 41),
  });
  fc.assert(
    fc.property(extreme, ({ scheme, thickness, weight, force, sway, voussoirs }) => {
      sound({
        ...scheme,
        ring: { thickness: scheme.ring.thickness * thickness, voussoirs, joints: scheme.ring.joints ?? 'radial' },
        masonry: { unitWeight: weight },
        loads: [{ id: 'l1', kind: 'point', x: 0.1, force }],
        sway,
      });
    }),
    { numRuns: 60, seed: 4 },
  );
});

describe('few blocks', () => {
  test('two blocks: three joints, and a line through the middle of each', () => {
    const result = sound(semicircle(2));
    expect(result.thrust.stands).toBe(true);
    expect(result.model.joints).toHaveLength(3);
    // there is no least share to divide by, and the ring holds with all of it in hand
    expect(result.geometricSafety).toBeNull();
    expect(statusOf(result)).toBe('holds');
    const { horizontal } = result.thrust.least ?? {};
    // half-rings of weight P, from the balance about the crown joint's extrados and the springings' outer ends
    const [R, t] = [2.25, 0.5];
    const P = 22 * t * R * (Math.PI / 2);
    const lever = R * (1 + t ** 2 / (12 * R ** 2)) * (2 / Math.PI);
    const through = (springing: number, crown: number): number => (P * (springing - lever)) / crown;
    expect(horizontal).toBeCloseTo(through(2, 2.5), 9);
    expect(result.thrust.greatest?.horizontal).toBeCloseTo(through(2.5, 2), 9);
  });

  test('three blocks', () => {
    expect(sound(semicircle(3)).thrust.stands).toBe(true);
  });

  test('two blocks that fall: a load beside the crown of a thin ring, with its joint there', () => {
    const ring = { thickness: 0.02, voussoirs: 4, joints: 'radial' as const };
    const result = sound({ ...semicircle(4), ring, loads: [{ id: 'l1', kind: 'point', x: 1, force: 100 }] });
    expect(result.thrust.stands).toBe(false);
    expect(result.thrust.least).toBeNull();
    expect(result.reactions).toBeNull();
    expect(result.geometricSafety).toBeNull();
    expect(statusOf(result)).toBe('fails');
    expect(result.proof).toEqual({ equilibriumResidual: null, static: null, kinematic: null, gap: null });
    expect(result.mechanism?.work).toBeGreaterThan(0);
  });
});

test('a thousand loads at one place are one load a thousand times as great', () => {
  const many: Load[] = Array.from({ length: 1000 }, (_, i) => ({ id: `l${i}`, kind: 'point', x: 0.7, force: 0.02 }));
  const one = sound(semicircle(21, { loads: [{ id: 'l', kind: 'point', x: 0.7, force: 20 }] }));
  const result = sound(semicircle(21, { loads: many }));
  expect(result.thrust.least?.horizontal).toBeCloseTo(one.thrust.least?.horizontal ?? NaN, 9);
  expect(result.thrust.greatest?.horizontal).toBeCloseTo(one.thrust.greatest?.horizontal ?? NaN, 9);
  expect(result.geometricSafety).toBeCloseTo(one.geometricSafety ?? NaN, 9);
});

describe('thrust without limit', () => {
  const lintel = (skewbackAngle: number, camber = 0): SchemeDraft => ({
    profile: { shape: 'flat', span: 2, skewbackAngle, camber },
    ring: { thickness: 0.3, voussoirs: 9, joints: 'radial' },
    masonry: { unitWeight: 20 },
  });

  test('a flat lintel between vertical ends: least as a beam with its sag in the depth, no greatest', () => {
    const result = sound(lintel(90));
    // W L/8 over the depth; the weight of nine equal blocks gives less sag at the joint beside the middle than at it:
    // with joints at ±1/9 of the half-span the moment there is W L/8 (1 − 1/81)
    const W = 20 * 0.3 * 2;
    expect(result.thrust.least?.horizontal).toBeCloseTo(((W * 2) / 8 / 0.3) * (1 - 1 / 81), 9);
    expect(result.thrust.greatest).toBeNull();
    expect(result.thrust.stands).toBe(true);
    expect(result.geometricSafety).toBeNull();
    expect(statusOf(result)).toBe('holds');
  });

  test.each([45, 60, 75])('a flat arch with skewbacks at %i°', (angle) => {
    const result = sound(lintel(angle));
    expect(result.thrust.stands).toBe(true);
    expect(result.thrust.greatest).toBeNull();
    expect(statusOf(result)).toBe('holds');
  });

  test('a cambered one: the safety is that of the straightest line, at endless thrust', () => {
    const result = sound(lintel(90, 0.1));
    expect(result.thrust.greatest).toBeNull();
    // middles rise by half the camber from end to end; the joints are 0.4 long there and 0.3 at mid-span, so that a
    // straight line leaves them by shares of 0.2 or less
    expect(result.geometricSafety).toBeGreaterThan(5);
  });

  test('a ring thick enough to hold a straight line', () => {
    const result = sound({
      profile: { shape: 'segmental', span: 4, rise: 0.4 },
      ring: { thickness: 0.8, voussoirs: 20, joints: 'radial' },
    });
    expect(result.thrust.stands).toBe(true);
    expect(result.thrust.greatest).toBeNull();
    expect(result.geometricSafety).toBeGreaterThan(1);
  });

  test('the least camber there is', () => {
    for (const camber of [1e-9, 1e-6, 1e-3]) expect(sound(lintel(60, camber)).thrust.stands).toBe(true);
  });
});

describe('no weight', () => {
  test('neither weight nor loads: nothing pushes, and nothing is claimed', () => {
    const result = sound(semicircle(9, { masonry: { unitWeight: 0 } }));
    expect(result.thrust.least?.horizontal ?? 0).toBe(0);
    expect(result.model.blocks.every(({ forces }) => forces.length === 0)).toBe(true);
  });

  test('no weight and one load: only the joints of the load carry', () => {
    const flat: SchemeDraft = {
      profile: { shape: 'segmental', span: 4, rise: 1 },
      ring: { thickness: 0.6, voussoirs: 20, joints: 'radial' },
      masonry: { unitWeight: 0 },
      loads: [{ id: 'l1', kind: 'point', x: 0, force: 10 }],
    };
    const result = sound(flat);
    expect(result.thrust.stands).toBe(true);
    expect(result.reactions?.left.vertical).toBeCloseTo(5, 9);
  });

  test('weight near the springings alone: joints between carry nothing, and no figure suffers', () => {
    sound({
      profile: { shape: 'elliptical', span: 7.6, rise: 2.4 },
      ring: { thickness: 0.17, voussoirs: 65, joints: 'radial' },
      masonry: { unitWeight: 0 },
      backing: { level: 0.24, counts: 'weight', unitWeight: 19.5 },
    });
  });

  test('an uplift alone cannot be held by compression', () => {
    const result = sound(
      semicircle(20, { masonry: { unitWeight: 0 }, loads: [{ id: 'l1', kind: 'point', x: 0.5, force: -10 }] }),
    );
    expect(result.thrust.stands).toBe(false);
    expect(result.mechanism?.work).toBeGreaterThan(0);
  });
});

describe('ties', () => {
  test.each([4, 5, 20, 21, 60, 61])('a symmetric ring of %i blocks has a symmetric answer', (voussoirs) => {
    const result = sound(semicircle(voussoirs));
    const { reactions, thrust } = result;
    expect(reactions?.left.vertical).toBeCloseTo(reactions?.right.vertical ?? NaN, 9);
    expect(thrust.stands).toBe(true);
  });

  test('square blocks in a straight row, all joints parallel', () => {
    const row: Profile = { shape: 'flat', span: 8, skewbackAngle: 90, camber: 0 };
    for (const voussoirs of [2, 3, 8, 64]) {
      const result = sound({ profile: row, ring: { thickness: 1, voussoirs, joints: 'vertical' } });
      expect(result.thrust.stands).toBe(true);
    }
  });

  test('a load on every joint of a symmetric ring', () => {
    const loads = Array.from({ length: 19 }, (_, i): Load => ({
      id: `l${i}`,
      kind: 'point',
      x: 2.5 * Math.sin(((i - 9) * Math.PI) / 20),
      force: 1,
    }));
    const result = sound(semicircle(20, { loads }));
    expect(result.reactions?.left.vertical).toBeCloseTo(result.reactions?.right.vertical ?? NaN, 9);
  });

  test('ten thousand blocks', () => {
    const result = assessed(semicircle(10_000));
    expect(result.thrust.stands).toBe(true);
    expect(result.geometricSafety).toBeCloseTo(sound(semicircle(1000)).geometricSafety ?? NaN, 4);
  });
});
