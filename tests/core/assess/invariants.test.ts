/** What must not depend on the scale, the hand, the unit of force or the manner of entry. */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { SchemeAssessment } from '../../../core/assess/assessment.ts';
import type { Above, Load, Profile, Ring, Scheme } from '../../../core/job/schema.ts';
import { assessed } from '../../support/assessed.ts';
import { between, schemeOf, shapes } from '../../validation/random-arches.ts';
import { totalLoad } from '../../validation/total-load.ts';

const anyScheme = fc.constantFrom(...shapes).chain(schemeOf);
const RUNS = { numRuns: 40, seed: 51 };

/** Thrusts agree within this share of the total load, safeties within this share of themselves: roundings, no more. */
const ROUNDING = 1e-9;
/** A ring this close to falling may stand in one form and fall in the other by rounding alone. */
const TIE = 1e-9;

/** Both extremes and the safety of `b`, with forces over `scale`, against those of `a`; thrusts also shifted. */
function expectSame(a: SchemeAssessment, b: SchemeAssessment, scale = 1, shift = 0): void {
  const load = totalLoad(a.model.blocks);
  if (Math.abs((a.geometricSafety ?? 2) - 1) < TIE) return;
  expect(b.thrust.stands).toBe(a.thrust.stands);
  for (const which of ['least', 'greatest'] as const) {
    const before = a.thrust[which]?.horizontal ?? null;
    const after = b.thrust[which]?.horizontal ?? null;
    if (before === null || after === null) expect(after).toBe(before);
    else expect(Math.abs(after / scale - before - shift)).toBeLessThan(ROUNDING * Math.max(load, Math.abs(before)));
  }
  if (a.geometricSafety === null || b.geometricSafety === null) expect(b.geometricSafety).toBe(a.geometricSafety);
  else expect(Math.abs(b.geometricSafety / a.geometricSafety - 1)).toBeLessThan(ROUNDING);
}

/** Every length of a profile times k; angles stay. */
function scaledProfile(profile: Profile, k: number): Profile {
  if (profile.shape === 'measured') {
    return { ...profile, points: profile.points.map(([x, y]): [number, number] => [x * k, y * k]) };
  }
  const lengths = ['span', 'rise', 'step', 'haunchRadius', 'camber'];
  const scaled = Object.entries(profile).map(([name, value]) => [
    name,
    lengths.includes(name) && typeof value === 'number' ? value * k : value,
  ]);
  return Object.fromEntries(scaled) as Profile;
}

const scaledAbove = (above: Above, k: number): Above => ({
  ...above,
  height: (above.height ?? 0) * k,
  layers: (above.layers ?? []).map((layer) => ({ ...layer, thickness: layer.thickness * k })),
});

const scaledRing = ({ thickness, springingThickness, lostMortar, ...ring }: Ring, k: number): Ring => ({
  ...ring,
  thickness: thickness * k,
  springingThickness: (springingThickness ?? thickness) * k,
  lostMortar: (lostMortar ?? []).map((lost) => ({ ...lost, depth: lost.depth * k })),
});

/** Lengths in the plane times k, masonry the same: its weights grow as k², and loads are made to. */
function scaledLoad(load: Load, k: number): Load {
  if (load.kind === 'strip') {
    return { ...load, from: load.from * k, to: load.to * k, intensity: load.intensity * k };
  }
  const moved = { ...load, x: load.x * k, force: load.force * k * k };
  return moved.kind === 'axle' ? { ...moved, patch: (moved.patch ?? 0) * k } : moved;
}

function scaledScheme(scheme: Scheme, k: number): Scheme {
  const { above, backing } = scheme;
  return {
    ...scheme,
    profile: scaledProfile(scheme.profile, k),
    ring: scaledRing(scheme.ring, k),
    ...(above ? { above: scaledAbove(above, k) } : {}),
    ...(backing ? { backing: { ...backing, level: backing.level * k } } : {}),
    loads: (scheme.loads ?? []).map((load) => scaledLoad(load, k)),
  };
}

const heavier = <Part extends { readonly unitWeight?: number | undefined }>(part: Part, c: number) => ({
  ...part,
  unitWeight: (part.unitWeight ?? 0) * c,
});

describe('scale', () => {
  test('lengths times k at one breadth: thrusts times k², the same safety', () => {
    fc.assert(
      fc.property(anyScheme, between(0.1, 8), (scheme, k) => {
        expectSame(assessed(scheme), assessed(scaledScheme(scheme, k)), k * k);
      }),
      RUNS,
    );
  });

  test('breadth and point loads times k: all thrusts times k', () => {
    fc.assert(
      fc.property(anyScheme, between(0.1, 8), (scheme, k) => {
        const loads = (scheme.loads ?? []).map((load) =>
          load.kind === 'strip' ? load : { ...load, force: load.force * k },
        );
        expectSame(assessed(scheme), assessed({ ...scheme, breadth: scheme.breadth * k, loads }), k);
      }),
      RUNS,
    );
  });

  test('all weights and loads times c: all thrusts times c, the same line', () => {
    fc.assert(
      fc.property(anyScheme, between(0.05, 7), (scheme, c) => {
        const { above, backing } = scheme;
        const weighted: Scheme = {
          ...scheme,
          masonry: heavier(scheme.masonry ?? {}, c),
          ...(above
            ? { above: { ...heavier(above, c), layers: (above.layers ?? []).map((layer) => heavier(layer, c)) } }
            : {}),
          ...(backing ? { backing: heavier(backing, c) } : {}),
          loads: (scheme.loads ?? []).map((load) =>
            load.kind === 'strip' ? { ...load, intensity: load.intensity * c } : { ...load, force: load.force * c },
          ),
        };
        expectSame(assessed(scheme), assessed(weighted), c);
      }),
      RUNS,
    );
  });
});

describe('hand', () => {
  const mirroredProfile = (profile: Profile): Profile => {
    if (profile.shape !== 'measured') return 'step' in profile ? { ...profile, step: -(profile.step ?? 0) } : profile;
    return { ...profile, points: profile.points.map(([x, y]): [number, number] => [-x, y]).reverse() };
  };
  const mirrored = (scheme: Scheme): Scheme => ({
    ...scheme,
    profile: mirroredProfile(scheme.profile),
    loads: (scheme.loads ?? []).map((load) =>
      load.kind === 'strip' ? { ...load, from: -load.to, to: -load.from } : { ...load, x: -load.x },
    ),
    ring: {
      ...scheme.ring,
      lostMortar: (scheme.ring.lostMortar ?? []).map(({ joint, ...lost }) =>
        joint === undefined ? lost : { ...lost, joint: (scheme.ring.voussoirs ?? 0) - joint },
      ),
    },
    sway: -(scheme.sway ?? 0),
  });

  test('seen from behind, the left thrust is the right one', () => {
    fc.assert(
      fc.property(anyScheme, (scheme) => {
        const front = assessed(scheme);
        // the right springing takes the left one's thrust and all that pushes sideways on the way
        const sideways = front.model.blocks.flatMap(({ forces }) => forces).reduce((sum, { fx }) => sum + fx, 0);
        expectSame(front, assessed(mirrored(scheme)), 1, sideways);
      }),
      RUNS,
    );
  });

  test('the verticals change places, and the reaction points with them', () => {
    fc.assert(
      fc.property(between(0.1, 0.45), between(-1.5, 1.5), between(1, 30), (rise, x, force) => {
        const scheme = (sign: number): SchemeAssessment =>
          assessed({
            profile: { shape: 'segmental', span: 4, rise: rise * 4 },
            ring: { thickness: 0.5, voussoirs: 15, joints: 'radial' },
            loads: [{ id: 'l1', kind: 'point', x: sign * x, force }],
          });
        const front = scheme(1).reactions;
        const back = scheme(-1).reactions;
        if (front === null || back === null) throw new Error('the ring falls');
        expect(back.left.vertical).toBeCloseTo(front.right.vertical, 9);
        expect(back.left.x).toBeCloseTo(-(front.right.x ?? NaN), 9);
        expect(back.left.y).toBeCloseTo(front.right.y ?? NaN, 9);
      }),
      RUNS,
    );
  });
});

describe('manner of entry', () => {
  test('a load split in two is the same load', () => {
    fc.assert(
      fc.property(anyScheme, between(0.05, 0.95), (scheme, share) => {
        const loads = (scheme.loads ?? []).flatMap((load): Load[] =>
          load.kind === 'strip'
            ? [
                { ...load, to: load.from + share * (load.to - load.from) },
                { ...load, id: `${load.id}b`, from: load.from + share * (load.to - load.from) },
              ]
            : [
                { ...load, force: load.force * share },
                { ...load, id: `${load.id}b`, force: load.force * (1 - share) },
              ],
        );
        // a part of a strip may lie wholly beside the arch, which is refused
        const reach = Math.max(...assessed(scheme).model.joints.map(({ extrados }) => extrados.x));
        fc.pre(loads.every((load) => load.kind !== 'strip' || load.from < reach * 0.95));
        expectSame(assessed(scheme), assessed({ ...scheme, loads }));
      }),
      RUNS,
    );
  });

  test('the order of the loads does not matter', () => {
    fc.assert(
      fc.property(anyScheme, (scheme) => {
        expectSame(assessed(scheme), assessed({ ...scheme, loads: [...(scheme.loads ?? [])].reverse() }));
      }),
      RUNS,
    );
  });

  test('a load of nothing changes nothing', () => {
    fc.assert(
      fc.property(anyScheme, (scheme) => {
        const nothing: Load = { id: 'n', kind: 'point', x: 0, force: 0 };
        expectSame(assessed(scheme), assessed({ ...scheme, loads: [...(scheme.loads ?? []), nothing] }));
      }),
      RUNS,
    );
  });
});

describe('more joints', () => {
  test('each voussoir cut in two: the range of thrust can only narrow and the safety only fall', () => {
    fc.assert(
      fc.property(anyScheme, (scheme) => {
        const few = assessed(scheme);
        const voussoirs = 2 * (scheme.ring.voussoirs ?? 0);
        // mortar lost at one joint is lost at the same place
        const lostMortar = (scheme.ring.lostMortar ?? []).map((lost) =>
          lost.joint === undefined ? lost : { ...lost, joint: 2 * lost.joint },
        );
        const many = assessed({ ...scheme, ring: { ...scheme.ring, voussoirs, lostMortar } });
        const slack = ROUNDING * totalLoad(few.model.blocks);
        if (many.thrust.stands && Math.abs((many.geometricSafety ?? 2) - 1) > TIE) expect(few.thrust.stands).toBe(true);
        if (!few.thrust.stands || !many.thrust.stands) return;
        const inOrder = (value: number | null | undefined, whenNone: number): number => value ?? whenNone;
        expect(inOrder(many.thrust.least?.horizontal, -Infinity)).toBeGreaterThanOrEqual(
          inOrder(few.thrust.least?.horizontal, -Infinity) - slack,
        );
        const before = inOrder(few.thrust.greatest?.horizontal, Infinity);
        expect(inOrder(many.thrust.greatest?.horizontal, Infinity)).toBeLessThanOrEqual(
          before + ROUNDING * Math.abs(before),
        );
        expect(inOrder(many.geometricSafety, Infinity)).toBeLessThanOrEqual(
          inOrder(few.geometricSafety, Infinity) * (1 + ROUNDING),
        );
      }),
      RUNS,
    );
  });
});
