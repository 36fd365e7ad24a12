/** The thrust that a body can take, and what would be enough, against closed forms. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { supportBody, type Push } from '../../../core/statics/support-body.ts';
import { thrustCapacity } from '../../../core/statics/support-capacity.ts';
import { enough, shortcoming } from '../../../core/statics/support-enough.ts';
import { standsCracked, wholeLine } from '../../../core/statics/support-line.ts';
import { standTogether } from '../../../core/statics/support-rows.ts';
import { thrustRange } from '../../../core/statics/thrust.ts';
import { builtFrom } from '../../support/assessed.ts';
import { bodyOf, course } from '../../support/bodies.ts';

const push: Push = { horizontal: 12, vertical: 40, u: 0.2, z: 0 };
const asked = { overturning: 1, baseSliding: 1 };

describe('the thrust that a body can take', () => {
  it('as one piece is 20.67 kN at the top of a body of 60 kN with 40 kN on it', () => {
    // the resultant at the toe: H × 3 = 40 × 0.8 + 60 × 0.5 = 62; inwards: H × 3 = −(40 × 0.2 + 60 × 0.5) = −38
    const { whole } = thrustCapacity(supportBody(bodyOf()), push);
    expect(whole!.greatest).toBeCloseTo(62 / 3, 10);
    expect(whole!.least).toBeCloseTo(-38 / 3, 10);
  });

  it('does not depend on the thrust that is there', () => {
    const body = supportBody(bodyOf());
    expect(thrustCapacity(body, { ...push, horizontal: 500 })).toEqual(thrustCapacity(body, push));
  });

  it('with the wedge left out is less, and is where it stops to stand', () => {
    const body = supportBody(bodyOf());
    const { cracked, whole } = thrustCapacity(body, push);
    expect(cracked).toBeLessThan(whole!.greatest);
    expect(standsCracked(body, { ...push, horizontal: cracked! - 1e-6 })).toBe(true);
    expect(standsCracked(body, { ...push, horizontal: cracked! + 1e-6 })).toBe(false);
  });

  it('is none for a body of no depth', () => {
    const body = supportBody(bodyOf({ courses: [course({ depth: 0 })] }));
    expect(thrustCapacity(body, push)).toMatchObject({ whole: null, cracked: null });
  });

  it('stands up to it and not beyond, for any body', () => {
    const draws = {
      depth: fc.double({ min: 0.3, max: 3, noNaN: true }),
      height: fc.double({ min: 0.5, max: 8, noNaN: true }),
      step: fc.double({ min: 0, max: 1, noNaN: true }),
    };
    fc.assert(
      fc.property(fc.record(draws), ({ depth, height, step }) => {
        const courses = [course({ height: height / 2, depth }), course({ height: height / 2, depth: depth + step })];
        const body = supportBody(bodyOf({ courses }));
        const { whole } = thrustCapacity(body, { ...push, u: depth / 5 });
        const stands = (horizontal: number): boolean => wholeLine(body, { ...push, u: depth / 5, horizontal }).stands;
        expect(stands(whole!.greatest * (1 - 1e-9))).toBe(true);
        expect(stands(whole!.greatest * (1 + 1e-9))).toBe(false);
      }),
      { numRuns: 100 },
    );
  });
});

describe('what would be enough', () => {
  const holding = { support: bodyOf(), push, asked, level: 0 };

  it('is a depth that leaves the safety against overturning at the figure asked for', () => {
    // weightless beyond doubt of a wedge: asked 2 about the back of a body d deep with 40 kN at 0.2:
    // 40 (d − 0.2) + 60 d × d / 2 = 2 × 36, so 30 d² + 40 d − 80 = 0, d = (−40 + √(1600 + 9600)) / 60 = 1.0972
    const { depth } = enough({ ...holding, asked: { overturning: 2, baseSliding: 1 } });
    const closed = (-40 + Math.sqrt(11_200)) / 60;
    expect(depth.value).toBeGreaterThanOrEqual(closed - 1e-6);
    // the wedge left out asks for a little more
    expect(depth.value).toBeLessThan(closed * 1.1);
  });

  it('is a weight that brings the friction on the ground to what is needed', () => {
    // 9 kN × 1.5 = 0.12 (100 + W): W = 12.5
    const ground = { name: 'wet clay', bearing: null, friction: 0.12 };
    const calm = { ...push, horizontal: 9 };
    const { weight } = enough({
      ...holding,
      push: calm,
      support: bodyOf({ ground }),
      asked: { overturning: 1, baseSliding: 1.5 },
    });
    expect(weight.value).toBeCloseTo(12.5, 4);
  });

  it('is a width of footing that brings the pressure down to what the ground bears', () => {
    const support = bodyOf({
      footing: course({ height: 0.4 }),
      ground: { name: 'sand', bearing: 150, friction: null },
    });
    const short = { ...holding, support };
    expect(shortcoming(short)).toBe('bearing');
    const { value } = enough(short).footing;
    const wide = (depth: number) => ({ ...support, footing: { ...support.footing!, depth } });
    expect(shortcoming({ ...short, support: wide(value!) })).toBeNull();
    expect(shortcoming({ ...short, support: wide(value! - 1e-4) })).toBe('bearing');
  });

  it('is nothing more where the body is enough already', () => {
    const calm = enough({ ...holding, push: { ...push, horizontal: 2 } });
    expect(calm.weight.value).toBe(0);
    expect(calm.depth.value).toBeLessThan(1);
  });

  it('is no figure, with the reason, where none does', () => {
    const ground = { name: 'mud', bearing: 10, friction: null };
    const { weight, footing } = enough({ ...holding, support: bodyOf({ ground }) });
    expect(weight).toEqual({
      value: null,
      because: expect.stringContaining('the pressure on the ground stays too high'),
    });
    expect(footing).toEqual({ value: null, because: 'No footing is described.' });
  });
});

describe('arch and support in one programme', () => {
  const draft = {
    profile: { shape: 'segmental', span: 4, rise: 1 },
    ring: { thickness: 0.35, voussoirs: 21 },
    breadth: 0.6,
    above: { kind: 'wall', height: 0.8, unitWeight: 20 },
  } as const;
  const { system } = builtFrom(draft);
  const range = thrustRange(system);
  const sided = (depth: number) =>
    (['left', 'right'] as const).map((side) => ({
      side,
      body: supportBody(bodyOf({ courses: [course({ height: 2.5, depth, breadth: 0.6 })] })),
    }));

  it('leaves the arch its own range on bodies as deep as hills', () => {
    const together = standTogether(system, sided(30));
    expect(range.stands && range.least!.horizontal).toBeCloseTo(together!.least!, 8);
    expect(range.stands && range.greatest!.horizontal).toBeCloseTo(together!.greatest!, 8);
  });

  it('brings the greatest thrust down to what the bodies take', () => {
    const together = standTogether(system, sided(1.3));
    expect(range.stands && range.greatest!.horizontal).toBeGreaterThan(together!.greatest!);
    expect(range.stands && range.least!.horizontal).toBeCloseTo(together!.least!, 8);
  });

  it('finds the pair that cannot stand together', () => {
    expect(standTogether(system, sided(0.4))).toBeNull();
  });

  it('does not mind which side is weak', () => {
    const [left, right] = sided(1.2) as [ReturnType<typeof sided>[0], ReturnType<typeof sided>[0]];
    expect(standTogether(system, [left])!.greatest).toBeCloseTo(standTogether(system, [right])!.greatest!, 8);
  });
});
