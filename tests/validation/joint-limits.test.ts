/** Sliding and crushing of random arches against the whole block programme. */
import { describe, expect, test, vi } from 'vitest';
import type { SchemeAssessment } from '../../core/assess/assessment.ts';
import type { Scheme } from '../../core/job/schema.ts';
import { assessed } from '../support/assessed.ts';
import { EquilibriumProgramme, inKilonewtons, leastOf, times, type Optimum } from './equilibrium-programme.ts';
import { addFriction, addMomentLimit, extremeUncrushed, polygon } from './joint-limits.ts';
import { randomSchemes } from './random-arches.ts';
import { totalLoad } from './total-load.ts';

// hundreds of programmes each: seconds at rest, more where the machine is busy
vi.setConfig({ testTimeout: 120_000, hookTimeout: 120_000 });

const AGREED = 1e-6;
const EACH = 40;
const FRICTIONS = [0.15, 0.25, 0.35, 0.45, 0.6, 0.8];
/** MPa: from crumbling to sound. */
const STRENGTHS = [0.05, 0.3, 1, 4];

interface Limited {
  readonly scheme: Scheme;
  readonly result: SchemeAssessment;
  readonly friction: number | null;
  readonly strength: number | null;
}

const withLimits = (scheme: Scheme, friction: number | null, strength: number | null): Limited => {
  const limited = { ...scheme, masonry: { ...scheme.masonry, friction, strength } };
  return { scheme: limited, result: assessed(limited), friction, strength };
};

/** Made when first asked for, and kept. */
function once<Value>(make: () => Value): () => Value {
  let made: Value | undefined;
  return () => (made ??= make());
}

const lengthsOf = ({ model }: SchemeAssessment): number[] =>
  model.joints.map(({ intrados: i, extrados: e }) => Math.hypot(e.x - i.x, e.y - i.y));

/** Checks one end of the usable range; null stands for no bound. */
function expectEnd(one: Limited, found: number | null, expected: Optimum, tolerance = AGREED): void {
  const load = totalLoad(one.result.model.blocks);
  const drawn = JSON.stringify(one.scheme);
  if (found === null) {
    expect(expected.kind, drawn).toBe('unbounded');
  } else {
    if (expected.kind !== 'optimal') throw new Error(`HiGHS finds it ${expected.kind}: ${drawn}`);
    const off = Math.abs(found - expected.value) / Math.max(load, Math.abs(expected.value));
    expect(off, drawn).toBeLessThan(tolerance);
  }
}

describe('sliding', () => {
  const cases = once((): Limited[] =>
    randomSchemes(EACH, 88).map((scheme, i) => withLimits(scheme, FRICTIONS[i % FRICTIONS.length]!, null)),
  );

  const programmeOf = ({ result }: Limited): EquilibriumProgramme => new EquilibriumProgramme(result.model);

  test('least and greatest thrust of joints that slide agree; there is none where the block programme finds none', () => {
    let slides = 0;
    let holds = 0;
    for (const one of cases()) {
      const { usable } = one.result.thrust;
      const solve = (sign: 1 | -1): Optimum => {
        const programme = programmeOf(one);
        addFriction(programme, one.result.model.joints.length, one.friction!);
        return inKilonewtons(programme, programme.minimise(times(sign, programme.horizontal)), sign);
      };
      if (!usable) {
        slides++;
        expect(solve(1).kind, JSON.stringify(one.scheme)).toBe('infeasible');
      } else {
        holds++;
        expectEnd(one, usable.least, solve(1));
        expectEnd(one, usable.greatest, solve(-1));
      }
    }
    expect(slides).toBeGreaterThan(50);
    expect(holds).toBeGreaterThan(100);
  });

  test('the friction that the ring needs is the least with which equilibrium is possible', () => {
    let asked = 0;
    for (const one of cases()) {
      const { demand } = one.result.checks.find(({ id }) => id === 'ring.sliding') ?? {};
      if (demand === null || demand === undefined) {
        expect(one.result.thrust.stands).toBe(false);
        continue;
      }
      asked++;
      const slackAt = (friction: number): number => {
        const programme = programmeOf(one);
        const slack = programme.addUnknown(-Infinity);
        addFriction(programme, one.result.model.joints.length, friction, slack);
        return leastOf(programme.minimise([[slack, 1]]));
      };
      const drawn = JSON.stringify(one.scheme);
      expect(slackAt(demand * (1 + AGREED) + 1e-9), drawn).toBeLessThan(1e-9);
      if (demand > AGREED) expect(slackAt(demand * (1 - AGREED)), drawn).toBeGreaterThan(0);
    }
    expect(asked).toBeGreaterThan(300);
  });
});

describe('crushing', () => {
  const cases = once((): Limited[] =>
    randomSchemes(EACH, 90).map((scheme, i) =>
      withLimits(
        {
          ...scheme,
          ring: { thickness: scheme.ring.thickness, voussoirs: 4 + (i % 20), joints: scheme.ring.joints ?? 'radial' },
        },
        i % 3 === 0 ? 0.6 : null,
        STRENGTHS[i % STRENGTHS.length]!,
      ),
    ),
  );

  /** The programme, with friction where it is given, the joint lengths in its units, and the force that crushes one. */
  function prepared(one: Limited): { programme: EquilibriumProgramme; lengths: number[]; p: number } {
    const programme = new EquilibriumProgramme(one.result.model);
    if (one.friction !== null) addFriction(programme, one.result.model.joints.length, one.friction);
    return {
      programme,
      lengths: lengthsOf(one.result).map((t) => t / programme.length),
      p: ((one.strength ?? NaN) * 1000 * one.scheme.breadth * programme.length) / programme.force,
    };
  }

  test('least and greatest thrust agree with tangents to the curve, made as they are needed', () => {
    let crushed = 0;
    let holds = 0;
    for (const one of cases()) {
      const { usable } = one.result.thrust;
      const solve = (sign: 1 | -1): Optimum => {
        const { programme, lengths, p } = prepared(one);
        return extremeUncrushed(programme, lengths, p, sign);
      };
      if (!usable) {
        crushed++;
        expect(solve(1).kind, JSON.stringify(one.scheme)).toBe('infeasible');
      } else {
        holds++;
        expectEnd(one, usable.least, solve(1));
        expectEnd(one, usable.greatest, solve(-1));
        // no joint carries more than its strength, so no thrust is without limit
        expect(usable.greatest, JSON.stringify(one.scheme)).not.toBeNull();
      }
    }
    expect(crushed).toBeGreaterThan(50);
    expect(holds).toBeGreaterThan(100);
  });

  test('the strength that the ring needs is the least with which equilibrium is possible', () => {
    let asked = 0;
    for (const one of cases()) {
      const { demand } = one.result.checks.find(({ id }) => id === 'ring.crushing') ?? {};
      if (demand === null || demand === undefined) continue;
      asked++;
      const possible = (strength: number): boolean => {
        const { programme, lengths, p } = prepared({ ...one, friction: null, strength });
        return extremeUncrushed(programme, lengths, p, 1).kind === 'optimal';
      };
      expect(possible(demand * (1 + 1e-5)), JSON.stringify(one.scheme)).toBe(true);
      expect(possible(demand * (1 - 1e-5)), JSON.stringify(one.scheme)).toBe(false);
    }
    expect(asked).toBeGreaterThan(300);
  });

  test('a fine polygon outside the curve gives a little more room, one inside a little less', () => {
    let asked = 0;
    for (const one of cases().slice(0, 90)) {
      const { usable } = one.result.thrust;
      if (!usable) continue;
      const least = (side: 'outside' | 'inside'): number => {
        const { programme, lengths, p } = prepared(one);
        lengths.forEach((t, j) => {
          for (const chord of polygon(side, 150, t, p)) addMomentLimit(programme, j, t, chord);
        });
        return leastOf(programme.minimise(programme.horizontal)) * programme.force;
      };
      const slack = AGREED * totalLoad(one.result.model.blocks);
      const [outside, inside] = [least('outside'), least('inside')];
      asked++;
      expect(usable.least, JSON.stringify(one.scheme)).toBeGreaterThan(outside - slack);
      expect(usable.least, JSON.stringify(one.scheme)).toBeLessThan(inside + slack);
    }
    expect(asked).toBeGreaterThan(20);
  });

  test('one joint by hand: N and e with a block of stress f·b·(t − 2e) at most', () => {
    // two square blocks of 1 m between vertical ends, no weight, one load P at the middle joint: the line falls from
    // the extrados there to the intrados at the ends. With f it cannot reach either face: at 100 kN/m² and b 1 m the
    // block of stress is N/100 deep, so the sag is 1 − N/100 and N = (P·2/4)/(1 − N/100)
    const P = 20;
    const { thrust } = assessed({
      profile: { shape: 'flat', span: 2, skewbackAngle: 90, camber: 0 },
      ring: { thickness: 1, voussoirs: 2, joints: 'vertical' },
      masonry: { unitWeight: 0, friction: null, strength: 0.1 },
      loads: [{ id: 'l1', kind: 'point', x: 0, force: P }],
    });
    // N (1 − N/100) = 10: N = 50 (1 ∓ √(1 − 0.4))
    expect(thrust.usable?.least).toBeCloseTo(50 * (1 - Math.sqrt(0.6)), 6);
    expect(thrust.usable?.greatest).toBeCloseTo(50 * (1 + Math.sqrt(0.6)), 6);
    expect(thrust.least?.horizontal).toBeCloseTo(10, 9);
  });
});
