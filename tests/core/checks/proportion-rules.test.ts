import { describe, expect, test } from 'vitest';
import { proportionFacts } from '../../../core/checks/profile-facts.ts';
import { proportionRules, type ProportionFacts, type ProportionRule } from '../../../core/checks/proportion-rules.ts';
import type { Profile } from '../../../core/job/schema.ts';

const FOOT = 0.3048;
const INCH = 0.0254;

const rulesFor = (profile: Profile, ringThickness: number | null = null): ProportionRule[] =>
  proportionRules(proportionFacts(profile, ringThickness));

function ruleOf(rules: readonly ProportionRule[], id: string): ProportionRule {
  const rule = rules.find((each) => each.id === id);
  if (rule === undefined) throw new Error(`no rule ${id} among ${rules.map((each) => each.id).join(', ')}`);
  return rule;
}

const value = (profile: Profile, id: string): number | null => ruleOf(rulesFor(profile), id).value;

const semicircle = (span: number): Profile => ({ shape: 'semicircular', span });

describe('Rankine, Manual of Civil Engineering: √(0.12 R) for a single arch, √(0.17 R) in a series, in feet', () => {
  // s 40 ft, f 10 ft: R = (s²/4 + f²)/(2f) = (400 + 100)/20 = 25 ft
  const profile: Profile = { shape: 'segmental', span: 40 * FOOT, rise: 10 * FOOT };

  test('single arch (0.12 from memory): √(0.12 × 25) = √3 = 1.7321 ft = 0.52793 m', () => {
    expect(value(profile, 'rankine.single')).toBeCloseTo(0.52793, 5);
  });

  test('in a series (0.17 read): √(0.17 × 25) = √4.25 = 2.0616 ft = 0.62836 m', () => {
    expect(value(profile, 'rankine.series')).toBeCloseTo(0.62836, 5);
  });

  test('the radius is the one at the crown, so a flat ellipse asks for more than the circle through its crown', () => {
    // ellipse, s 40 ft, f 10 ft: R = a²/f = 400/10 = 40 ft; √(0.12 × 40) = 2.1909 ft = 0.66778 m
    expect(value({ ...profile, shape: 'elliptical' }, 'rankine.single')).toBeCloseTo(0.66778, 5);
  });

  test('a pointed crown has no radius, and the rule says so', () => {
    const rule = ruleOf(rulesFor({ shape: 'pointed', span: 4, rise: 3 }), 'rankine.single');
    expect(rule).toMatchObject({ value: null, working: null });
    expect(rule.outside).toContain('the crown is a point');
  });
});

describe('Trautwine, Civil Engineer’s Pocket-Book (read, quoted): √(R + s/2)/4 + 0.2, in feet', () => {
  test('semicircle of 6 ft: √(3 + 3)/4 + 0.2 = 0.81 ft', () => {
    const thickness = value(semicircle(6 * FOOT), 'trautwine');
    expect(thickness! / FOOT).toBeCloseTo(0.81, 2);
    expect(thickness).toBeCloseTo((Math.sqrt(6) / 4 + 0.2) * FOOT, 12);
  });

  test('rise of a segmental arch gives R = (s²/4 + f²)/(2f): s 40 ft, f 10 ft, √(25 + 20)/4 + 0.2 = 1.8771 ft = 0.57213 m', () => {
    expect(value({ shape: 'segmental', span: 40 * FOOT, rise: 10 * FOOT }, 'trautwine')).toBeCloseTo(0.57213, 5);
  });

  test('an elliptical arch goes by the circle through springings and crown (from memory)', () => {
    expect(value({ shape: 'elliptical', span: 40 * FOOT, rise: 10 * FOOT }, 'trautwine')).toBeCloseTo(0.57213, 5);
  });
});

test('Perronet (memory): 0.325 + 0.0347 s in metres; s 10 m gives 0.672 m', () => {
  const rule = ruleOf(rulesFor(semicircle(10)), 'perronet');
  expect(rule.value).toBeCloseTo(0.672, 12);
  expect(rule.confidence).toBe('from memory');
});

describe('Vose, 1873 manual (read); Gauthey’s rule in another dress', () => {
  // thicknesses of the table in his Handbook of Railroad Construction, 1857 (read), in inches, at spans that 48 divides
  test.each([
    [12, 16],
    [40, 23],
    [60, 30],
  ])('a span of %d ft: %d in', (feet, inches) => {
    expect(value(semicircle(feet * FOOT), 'vose')).toBeCloseTo(inches * INCH, 12);
  });

  test('13 in + s/48 reaches from 6 ft to 50 ft, both included', () => {
    expect(value(semicircle(6 * FOOT), 'vose')).toBeCloseTo((13 + 72 / 48) * INCH, 12);
    expect(value(semicircle(50 * FOOT), 'vose')).toBeCloseTo((13 + 600 / 48) * INCH, 12);
  });

  test('s/24 reaches from there to 100 ft, included', () => {
    expect(value(semicircle(50.1 * FOOT), 'vose')).toBeCloseTo((50.1 * 12 * INCH) / 24, 12);
    expect(value(semicircle(100 * FOOT), 'vose')).toBeCloseTo(50 * INCH, 12);
  });

  test.each([5.9, 100.1])('a span of %d ft is outside, and the rule says within what it speaks', (feet) => {
    const rule = ruleOf(rulesFor(semicircle(feet * FOOT)), 'vose');
    expect(rule.value).toBeNull();
    expect(rule.outside).toContain('6 to 100 ft (1.83 to 30.48 m)');
  });
});

describe('Derand, Blondel (memory; recomputed from the construction)', () => {
  test.each<[string, Profile, number, number]>([
    ['semicircle: s/4', semicircle(4), 0.25, 12],
    ['equilateral pointed: 0.2340 s', { shape: 'pointed', span: 1, rise: Math.sqrt(3) / 2 }, 0.234, 4],
    ['segmental f/s 1/4: 0.3099 s', { shape: 'segmental', span: 6, rise: 1.5 }, 0.3099, 4],
  ])('%s', (_, profile, share, digits) => {
    const depth = value(profile, 'derand-blondel');
    expect(depth! / proportionFacts(profile, null).span).toBeCloseTo(share, digits);
  });

  test('the arc is cut by length: of an outline measured unevenly, the cuts stand where a tape along it says', () => {
    // an outline of three straight runs of equal length, the outer ones at 60° to the level: the cuts are its corners
    const corners = [0, 1, 3, 4].map((x) => ({ x, y: x === 0 || x === 4 ? 0 : Math.sqrt(3) }));
    const facts: ProportionFacts = {
      ...proportionFacts(semicircle(4), null),
      pointAtShare: (share) => {
        const run = Math.min(2, Math.floor(share * 3));
        const [a, b] = [corners[run]!, corners[run + 1]!];
        const t = share * 3 - run;
        return { x: a.x + t * (b.x - a.x), y: a.y + t * (b.y - a.y) };
      },
    };
    expect(ruleOf(proportionRules(facts), 'derand-blondel').value).toBeCloseTo(1, 12);
  });

  test('a rampant arch needs a depth of its own on each side', () => {
    const rules = rulesFor({ shape: 'semicircular', span: 4, step: 1 });
    const left = ruleOf(rules, 'derand-blondel.left').value;
    const right = ruleOf(rules, 'derand-blondel.right').value;
    // the raised side is the flatter, and the flatter third of an arc reaches further out
    expect(right! - left!).toBeGreaterThan(0.1);
    expect(rules.filter(({ what }) => what === 'support depth')).toHaveLength(2);
  });

  test('a horseshoe so deep that its chord leans in gives no depth', () => {
    const rule = ruleOf(rulesFor({ shape: 'horseshoe', span: 2, rise: 5 }), 'derand-blondel');
    expect(rule.value).toBeNull();
    expect(rule.outside).toContain('does not reach');
  });
});

describe('beside the survey', () => {
  test('the ring as measured stands beside every rule for the crown, and nothing yet beside the support', () => {
    const rules = rulesFor(semicircle(4), 0.35);
    for (const { what, surveyed } of rules) expect(surveyed).toBe(what === 'crown thickness' ? 0.35 : null);
  });

  test('a ring that was not measured has nothing beside it', () => {
    expect(rulesFor(semicircle(4)).every(({ surveyed }) => surveyed === null)).toBe(true);
  });

  test('a rule is no check: it has a source and a confidence, and no status', () => {
    for (const rule of rulesFor(semicircle(4), 0.35)) {
      expect(rule).not.toHaveProperty('status');
      expect(rule.source).not.toBe('');
    }
  });

  test('the working can be followed by hand: 6 ft semicircle by Trautwine', () => {
    const { working } = ruleOf(rulesFor(semicircle(6 * FOOT)), 'trautwine');
    expect(working).toBe('√(3.00 + 3.00)/4 + 0.2 = 0.812 ft = 0.248 m');
  });

  test('a flat arch is outside every rule', () => {
    const rules = rulesFor({ shape: 'flat', span: 1.5, skewbackAngle: 70, camber: 0 }, 0.3);
    expect(rules.map(({ value: found }) => found)).toEqual(rules.map(() => null));
    for (const { outside } of rules) expect(outside).toContain('flat');
  });

  test('doubling every length doubles what the rules of pure shape give, and less than doubles the rest', () => {
    const [once, twice] = [rulesFor(semicircle(4)), rulesFor(semicircle(8))];
    once.forEach((rule, i) => {
      const ratio = twice[i]!.value! / rule.value!;
      if (rule.what === 'support depth') expect(ratio).toBeCloseTo(2, 12);
      else expect(ratio).toBeLessThan(2);
    });
  });
});
