/** Supports and ties as the findings show them: from a job's scheme to its checks. */
import { describe, expect, it } from 'vitest';
import { supportEnough, supportUnder } from '../../../core/assess/supports.ts';
import { assessJobFully } from '../../../core/assess/assess-fully.ts';
import { supportDepth } from '../../../core/checks/support-depth.ts';
import { addTie, applyEnough } from '../../../core/job/edits.ts';
import type { Support, Tie } from '../../../core/job/schema.ts';
import { thrustRange } from '../../../core/statics/thrust.ts';
import { assessed, builtFrom, problemsWith, schemeFrom, type SchemeDraft } from '../../support/assessed.ts';

const ground = { name: 'dense gravel', bearing: 350, friction: 0.5 };
const buttress = (depth: number): Support => ({
  kind: 'buttress',
  courses: [
    { height: 1.2, depth },
    { height: 1.2, setOffBack: 0.2 },
  ],
  footing: { height: 0.4, projectionFront: 0.1, projectionBack: 0.1 },
  ground,
});

/** The gate to the walled garden of the Harrowmere estate. */
const gate = (left: Support, right: Support = left, ties: Tie[] = []): SchemeDraft => ({
  profile: { shape: 'segmental', span: 4, rise: 1 },
  ring: { thickness: 0.35, voussoirs: 21, joints: 'radial' },
  breadth: 0.6,
  masonry: { unitWeight: 22, strength: 5.8, friction: 0.6 },
  above: { kind: 'wall', height: 0.8, unitWeight: 20 },
  supports: { left, right },
  ...(ties.length > 0 ? { ties } : {}),
});

const statusesOf = (draft: SchemeDraft): Record<string, string> =>
  Object.fromEntries(assessed(draft).checks.map(({ id, status }) => [id, status]));

const tie: Tie = { id: 't1', level: 0, bar: { shape: 'round', diameter: 0.03 }, thread: 'M30' };

describe('a buttress', () => {
  it('deep enough holds in everything', () => {
    const statuses = statusesOf(gate(buttress(1.8)));
    for (const what of ['stands', 'sliding', 'crushing', 'overturning', 'base-sliding', 'bearing']) {
      expect([what, statuses[`support.right.${what}`]]).toEqual([what, 'holds']);
    }
  });

  it('too thin for the least thrust cannot stand with the arch, and says so plainly', () => {
    const { checks, supports } = assessed(gate(buttress(0.4)));
    const check = checks.find(({ id }) => id === 'support.left.stands')!;
    expect(check.status).toBe('fails');
    expect(check.because).toMatch(/^Arch and support cannot stand together: the arch pushes at least 22.9 kN/);
    expect(check.demand).toBeGreaterThan(check.limit!);
    expect(supports![0]!.together).toBeNull();
    expect(supports![0]!.least).toMatchObject({ stands: false, standsWhole: false });
  });

  it('reads alike on both sides', () => {
    const { supports } = assessed(gate(buttress(1)));
    const [left, right] = supports!;
    expect(left!.capacity.greatest).toBeCloseTo(right!.capacity.greatest!, 8);
    expect(left!.least!.pressure).toBeCloseTo(right!.least!.pressure!, 6);
    left!.least!.line.forEach(({ x, y }, i) => {
      expect(right!.least!.line[i]!.x).toBeCloseTo(-x, 8);
      expect(right!.least!.line[i]!.y).toBeCloseTo(y, 8);
    });
  });

  it('carries on exactly what the springing hands it', () => {
    const { supports, reactions } = assessed(gate(buttress(1)));
    const { least } = supports!.find(({ side }) => side === 'right')!;
    // 0.6 broad, 22 kN/m³: 1.2 × 1.0, 1.2 × 1.2 and 0.4 × 1.4
    const weight = 0.6 * 22 * (1.2 + 1.44 + 0.56);
    expect(least!.beds.at(-1)!.normal + least!.wedge).toBeCloseTo(reactions!.right.vertical + weight, 8);
    expect(least!.drive).toBeCloseTo(reactions!.right.horizontal, 8);
    expect(least!.line[0]!.x).toBeCloseTo(reactions!.right.x!, 8);
  });

  it('under any chosen line between least and greatest', () => {
    const built = builtFrom(gate(buttress(1)));
    const range = thrustRange(built.system);
    const under = range.stands ? supportUnder(built, 'right', range.greatest!.state) : null;
    expect(under!.horizontal).toBeCloseTo(range.stands ? range.greatest!.horizontal : NaN, 8);
    expect(under!.stands).toBe(false);
    expect(supportUnder(builtFrom({ ...gate(buttress(1)), supports: {} }), 'left', [0, 0, 0])).toBeNull();
  });

  it('under an arch that does not stand is not judged', () => {
    const draft: SchemeDraft = {
      ...gate(buttress(1)),
      profile: { shape: 'semicircular', span: 4 },
      ring: { thickness: 0.1 },
      above: { kind: 'none' },
    };
    const check = assessed(draft).checks.find(({ id }) => id === 'support.left.stands');
    expect(check).toMatchObject({ status: 'unknown', demand: null, limit: null });
  });

  it('says what is not known of the ground', () => {
    const { kind, courses } = buttress(1);
    const statuses = statusesOf(gate({ kind, courses: courses! }));
    expect(statuses['support.left.bearing']).toBe('unknown');
    expect(statuses['support.left.base-sliding']).toBe('unknown');
  });

  it('on stiff clay by name takes the presumed value, and the assumption says so', () => {
    const { assumed } = assessed(gate({ ...buttress(1), ground: { name: 'stiff clay' } }));
    const bearing = assumed.find(({ field }) => field === 'supports.left.ground.bearing')!;
    expect(bearing.value).toBe(150);
    expect(bearing.because).toContain('presumed, preliminary');
  });
});

describe('remedies in their smallest size', () => {
  const short = schemeFrom(gate(buttress(0.9)));

  it.each(['depth', 'footing'] as const)('%s: applied as found, the buttress holds with its margins', (what) => {
    const built = builtFrom(short);
    let scheme = short;
    for (const side of ['left', 'right'] as const) {
      const { value } = supportEnough(built, side)![what];
      expect(value).not.toBeNull();
      scheme = applyEnough(scheme, side, what, value! + 1e-6);
    }
    const statuses = statusesOf(scheme);
    for (const check of ['stands', 'overturning', 'base-sliding', 'bearing']) {
      expect([check, statuses[`support.right.${check}`]]).toEqual([check, 'holds']);
    }
  });

  it('stand in the full assessment and not in the quick one', () => {
    const outcome = assessJobFully({ format: 'skewback.job', version: 1, arches: [{ id: 'a1', schemes: [short] }] });
    const supports = outcome.ok ? outcome.assessment.schemes[0]!.supports! : [];
    expect(supports[0]!.enough!.depth.value).toBeGreaterThan(0.9);
    expect(assessed(short).supports![0]!.enough).toBeUndefined();
  });

  it('of a semicircle on plain piers are of the order of the old construction, a quarter of the span', () => {
    // Derand, Blondel: depth s/4 = 1.0 m (from memory; recomputed from the construction)
    const old = supportDepth(
      (share) => ({ x: -2 * Math.cos(Math.PI * share), y: 2 * Math.sin(Math.PI * share) }),
      'right',
    );
    expect(old).toBeCloseTo(1, 10);
    const pier: Support = {
      kind: 'pier',
      courses: [{ height: 4, depth: old }],
      ground: { bearing: null, friction: null },
    };
    const built = builtFrom({
      ...gate(pier),
      profile: { shape: 'semicircular', span: 4 },
      asked: { overturning: 1, baseSliding: 1 },
    });
    const { value } = supportEnough(built, 'right')!.depth;
    expect(value! / old).toBeGreaterThan(0.6);
    expect(value! / old).toBeLessThan(1.2);
  });
});

describe('a tie', () => {
  it('between rigid supports holds the whole thrust, least and greatest', () => {
    const { ties, thrust } = assessed(gate({ kind: 'rigid' }, { kind: 'rigid' }, [tie]));
    expect(ties![0]!.least).toBeCloseTo(thrust.least!.horizontal!, 8);
    expect(ties![0]!.greatest).toBeCloseTo(thrust.greatest!.horizontal!, 8);
    expect(ties![0]!.withSupports).toBeNull();
  });

  it('lets a buttress stand that could not by itself, and says how much it holds', () => {
    const thin = buttress(0.4);
    expect(statusesOf(gate(thin))['support.right.stands']).toBe('fails');
    const { checks, supports, ties } = assessed(gate(thin, thin, [tie]));
    expect(checks.find(({ id }) => id === 'support.right.stands')).toMatchObject({ status: 'holds' });
    expect(supports![1]!.least!.heldByTies).toBeGreaterThan(10);
    // with all that the supports can take it has that much less to hold
    expect(ties![0]!.withSupports!).toBeGreaterThan(0);
    expect(ties![0]!.withSupports!).toBeLessThan(ties![0]!.least!);
  });

  it('too weak to hold it all takes what it can', () => {
    const wire: Tie = { ...tie, thread: 'M12', bar: { shape: 'round', diameter: 0.012 } };
    const thin = buttress(0.4);
    const { supports, ties, checks } = assessed(gate(thin, thin, [wire]));
    expect(checks.find(({ id }) => id === 'tie.t1.thread')).toMatchObject({ status: 'fails' });
    // 78 MPa × 84.3 mm²
    expect(ties![0]!.capacity).toBeCloseTo(78 * 84.3e-3, 8);
    expect(supports![1]!.least!.heldByTies).toBeCloseTo(78 * 84.3e-3, 8);
  });

  it('above the springing needs more than the thrust', () => {
    const low = assessed(gate({ kind: 'rigid' }, { kind: 'rigid' }, [tie])).ties![0]!;
    const raised = assessed(gate({ kind: 'rigid' }, { kind: 'rigid' }, [{ ...tie, level: 0.3 }])).ties![0]!;
    expect(raised.least).toBeGreaterThan(low.least!);
  });

  it('over the crown is refused with a reason', () => {
    expect(problemsWith(gate({ kind: 'rigid' }, { kind: 'rigid' }, [{ ...tie, level: 1.5 }]))).toEqual([
      {
        path: 'ties[0].level',
        value: '1.5 m',
        wrong: 'a tie at the crown or over it has no lever to hold the thrust',
        right: expect.stringContaining('below the crown'),
      },
    ]);
  });

  it('that slackens in the heat is named, with the spread that it lets come', () => {
    const hot = assessed(
      gate({ kind: 'rigid' }, { kind: 'rigid' }, [{ ...tie, warming: 30, pretension: 5, length: 5 }]),
    );
    const check = hot.checks.find(({ id }) => id === 'tie.t1.slack')!;
    expect(check.status).toBe('narrow');
    expect(check.because).toMatch(/^Slack: 30.0 K more .* The springings must part by 1.6 mm before it pulls/);
    expect(hot.ties![0]!.slack).toBe(true);
  });

  it('shares its force with another by their stiffness', () => {
    const other: Tie = { ...tie, id: 't2', bar: { shape: 'round', diameter: 0.015 }, thread: 'M14' };
    const { ties } = assessed(gate({ kind: 'rigid' }, { kind: 'rigid' }, [tie, other]));
    // areas as 4 to 1
    expect(ties!.map(({ share }) => share)).toEqual([expect.closeTo(0.8, 10), expect.closeTo(0.2, 10)]);
  });

  it('added as it comes is an old iron bar at the springing, and every guess is listed', () => {
    const { assumed } = assessed(addTie(schemeFrom(gate({ kind: 'rigid' }))));
    expect(assumed.map(({ field }) => field)).toEqual(
      expect.arrayContaining(['ties[0].material', 'ties[0].factors', 'ties[0].length']),
    );
  });
});
