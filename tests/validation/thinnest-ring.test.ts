/**
 * The thinnest ring of random arches: the ring so thick stands by the block programme, one a millionth thinner does not,
 * and none of a row of thinner ones does. Weights and what lies above follow the thickness.
 */
import { describe, expect, test, vi } from 'vitest';
import type { Scheme } from '../../core/job/schema.ts';
import { assessed } from '../support/assessed.ts';
import { leastPull } from './equilibrium-programme.ts';
import { randomSchemes } from './random-arches.ts';

// hundreds of programmes each: seconds at rest, more where the machine is busy
vi.setConfig({ testTimeout: 120_000, hookTimeout: 120_000 });

/** Relative distance to either side at which the answer must differ. */
const CLOSE = 2e-6;
const THINNER = [0.3, 0.6, 0.8, 0.9, 0.97, 0.995];

const pullAt = (scheme: Scheme, thickness: number): number =>
  leastPull(assessed({ ...scheme, ring: { ...scheme.ring, thickness } }).model, 1);

describe('thinnest ring', () => {
  const cases = randomSchemes(46, 61)
    // a load near a springing stands beside a thinner ring, and lost mortar may leave it nothing: both are refused
    .map(({ ring: { thickness, voussoirs, joints }, loads, ...scheme }): Scheme => ({
      ...scheme,
      ring: { thickness, ...(voussoirs ? { voussoirs } : {}), ...(joints ? { joints } : {}) },
      loads: (loads ?? []).filter((load) => load.kind === 'strip' && load.from < 0),
    }))
    .map((scheme) => ({
      scheme,
      thinnest: assessed(scheme).thinnestRing ?? null,
      stands: assessed(scheme).thrust.stands,
    }));

  test('stands, and a millionth thinner does not', () => {
    let asked = 0;
    for (const { scheme, thinnest } of cases) {
      if (thinnest === null || thinnest === 0) continue;
      asked++;
      expect(pullAt(scheme, thinnest * (1 + CLOSE)), JSON.stringify(scheme)).toBeLessThan(0);
      expect(pullAt(scheme, thinnest * (1 - CLOSE)), JSON.stringify(scheme)).toBeGreaterThan(0);
    }
    expect(asked).toBeGreaterThan(300);
  });

  test('nothing thinner stands', () => {
    for (const { scheme, thinnest } of cases.filter((_, i) => i % 4 === 0)) {
      if (thinnest === null || thinnest === 0) continue;
      for (const share of THINNER) {
        expect(pullAt(scheme, thinnest * share), JSON.stringify([share, scheme])).toBeGreaterThan(0);
      }
    }
  });

  test('is thinner than the ring that stands, and thicker than the one that falls', () => {
    for (const { scheme, thinnest, stands } of cases) {
      if (thinnest === null) continue;
      if (stands) expect(thinnest).toBeLessThanOrEqual(scheme.ring.thickness * (1 + CLOSE));
      else expect(thinnest).toBeGreaterThan(scheme.ring.thickness * (1 - CLOSE));
    }
  });

  test('is given for every ring that stands', () => {
    for (const { scheme, thinnest, stands } of cases) {
      if (stands) expect(thinnest, JSON.stringify(scheme)).not.toBeNull();
    }
  });

  test('a load over a skewback does not stop the search: beside a thinner ring it rests on the support', () => {
    const { thinnestRing } = assessed({
      profile: { shape: 'semicircular', span: 4 },
      ring: { thickness: 0.5, voussoirs: 20, joints: 'radial' },
      loads: [{ id: 'l1', kind: 'point', x: 2.2, force: 5 }],
    });
    expect(thinnestRing).toBeGreaterThan(0.2);
    expect(thinnestRing).toBeLessThan(0.3);
  });

  test('a flat arch holds a straight line however thin it is', () => {
    const { thinnestRing } = assessed({
      profile: { shape: 'flat', span: 2, skewbackAngle: 60, camber: 0 },
      ring: { thickness: 0.3, voussoirs: 9, joints: 'radial' },
    });
    expect(thinnestRing).toBe(0);
  });
});
