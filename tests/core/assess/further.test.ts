/** Combinations, moving axles and the reading of cracks: against the same question asked in another way. */
import { describe, expect, test } from 'vitest';
import { combinationAnswers, crackReading, movementPatterns } from '../../../core/assess/further.ts';
import { axleEnvelope, spreadLeft } from '../../../core/assess/long-questions.ts';
import { assessJobFully } from '../../../core/assess/assess-fully.ts';
import type { Load, Scheme } from '../../../core/job/schema.ts';
import { assessed, builtFrom, schemeFrom, type SchemeDraft } from '../../support/assessed.ts';

const ARCH: SchemeDraft = {
  profile: { shape: 'segmental', span: 5, rise: 1.5 },
  ring: { thickness: 0.5, voussoirs: 25, joints: 'radial' },
  breadth: 1,
  masonry: { unitWeight: 22, friction: 0.6, strength: 4 },
  above: { kind: 'fill', height: 0.5, unitWeight: 18 },
};
const yes = (): boolean => true;

describe('combinations', () => {
  const loads: Load[] = [
    { id: 'wall', kind: 'point', x: -0.8, force: 9, action: 'permanent' },
    { id: 'cart', kind: 'point', x: 1, force: 14 },
    { id: 'crowd', kind: 'strip', from: -1, to: 2, intensity: 4, action: 'variable' },
  ];
  const answer = (combination: Omit<NonNullable<Scheme['combinations']>[number], 'id'>) => {
    const [found] = combinationAnswers(builtFrom({ ...ARCH, loads, combinations: [{ id: 'c1', ...combination }] }));
    if (!found) throw new Error('no answer');
    return found;
  };
  /** The arch entered with its weights and loads already multiplied. */
  const entered = (permanent: number, wall: number, cart: number, crowd: number) =>
    assessed({
      ...ARCH,
      masonry: { unitWeight: 22 * permanent },
      above: { kind: 'fill', height: 0.5, unitWeight: 18 * permanent },
      loads: [
        { id: 'wall', kind: 'point', x: -0.8, force: 9 * wall },
        { id: 'cart', kind: 'point', x: 1, force: 14 * cart },
        { id: 'crowd', kind: 'strip', from: -1, to: 2, intensity: 4 * crowd },
      ],
    });

  test('multiply masonry, fill and permanent loads by one factor, variable loads by the other', () => {
    const found = answer({ permanent: 1.2, variable: 1.5 });
    const same = entered(1.2, 1.2, 1.5, 1.5);
    expect(found.stands).toBe(same.thrust.stands);
    expect(found.least).toBeCloseTo(same.thrust.least?.horizontal ?? NaN, 9);
    expect(found.greatest).toBeCloseTo(same.thrust.greatest?.horizontal ?? NaN, 9);
    expect(found.geometricSafety).toBeCloseTo(same.geometricSafety ?? NaN, 9);
  });

  test('a load’s own factor goes before that of its action', () => {
    const found = answer({ permanent: 1, variable: 1.5, factors: [{ load: 'crowd', factor: 0 }] });
    expect(found.least).toBeCloseTo(entered(1, 1, 1.5, 0).thrust.least?.horizontal ?? NaN, 9);
  });

  test('the variable loads grow together, from their factored size', () => {
    const { variableFactor, hinges } = answer({ permanent: 1.1, variable: 1.3 });
    expect(hinges).toHaveLength(4);
    const factor = variableFactor ?? NaN;
    const at = (share: number): boolean => entered(1.1, 1.1, 1.3 * factor * share, 1.3 * factor * share).thrust.stands;
    expect(at(1 - 1e-7)).toBe(true);
    expect(at(1 + 1e-7)).toBe(false);
  });

  test('under no factors at all nothing is left but a ring without weight', () => {
    expect(answer({ permanent: 0, variable: 0 })).toMatchObject({ stands: true, geometricSafety: null });
  });
});

describe('a moving axle', () => {
  const axle = { force: 60, patch: 0.3, dispersal: 0.5 };

  test('has at each place the load factor of an axle that stands there', () => {
    const envelope = axleEnvelope(builtFrom(ARCH), axle, 9, yes);
    expect(envelope?.places).toHaveLength(9);
    for (const { x, factor } of envelope?.places ?? []) {
      const { loadFactors } = assessed({ ...ARCH, loads: [{ id: 'a', kind: 'axle', x, ...axle }] });
      const standing = loadFactors?.[0]?.factor ?? null;
      // near the springings the ring holds any axle
      if (factor === null) expect(standing).toBeNull();
      else expect(factor).toBeCloseTo(standing ?? NaN, 7);
    }
  });

  test('is worst where the factor is least, and at either hand alike on a symmetric arch', () => {
    const envelope = axleEnvelope(builtFrom(ARCH), axle, 40, yes);
    const factors = (envelope?.places ?? []).map(({ factor }) => factor ?? Infinity);
    expect(envelope?.worst?.factor).toBe(Math.min(...factors));
    factors.forEach((factor, i) => expect(factor).toBeCloseTo(factors.at(-1 - i) ?? NaN, 6));
  });

  test('the axle of the job crosses in place of itself, not beside itself', () => {
    const scheme = schemeFrom({ ...ARCH, loads: [{ id: 'a', kind: 'axle', x: 1.1, ...axle }] });
    const outcome = assessJobFully({ format: 'skewback.job', version: 1, arches: [{ id: 'a1', schemes: [scheme] }] });
    if (!outcome.ok) throw new Error('the job was refused');
    const [answer] = outcome.assessment.schemes[0]?.axles ?? [];
    const alone = axleEnvelope(builtFrom(ARCH), axle, answer?.places ?? 0, yes);
    expect(answer?.worst?.factor).toBeCloseTo(alone?.worst?.factor ?? NaN, 9);
  });

  test('reports how far it is, and can be given up', () => {
    const seen: number[] = [];
    expect(axleEnvelope(builtFrom(ARCH), axle, 10, (share) => seen.push(share) < 4)).toBeNull();
    expect(seen).toEqual([0, 0.1, 0.2, 0.3]);
  });

  test('over a ring that does not stand there is none', () => {
    expect(axleEnvelope(builtFrom({ ...ARCH, ring: { ...ARCH.ring, thickness: 0.02 } }), axle, 5, yes)).toBeNull();
  });
});

describe('remaining spread', () => {
  test('can be given up', () => {
    expect(spreadLeft(builtFrom(ARCH), { x: -1, y: 0 }, 1, (share) => share < 0.02)).toBeNull();
  });
});

describe('reading the cracks', () => {
  const patterns = movementPatterns(builtFrom(ARCH));

  /** Marks exactly where a movement would open the ring: at the face across from each hinge. */
  const marksOf = (kind: string): NonNullable<Scheme['cracks']> => {
    const pattern = patterns.find((each) => each.kind === kind);
    return (pattern?.openings ?? []).map(({ joint, side }, i) => ({
      id: `c${i}`,
      joint,
      face: side === 'intrados' ? 'extrados' : 'intrados',
    }));
  };
  const read = (cracks: NonNullable<Scheme['cracks']>) => crackReading(builtFrom({ ...ARCH, cracks }));

  test.each(['spreading', 'left-sinks', 'right-turns-out', 'pushed-right'])(
    'marks where %s opens the ring are explained by it best, and in full',
    (kind) => {
      const { ranking } = read(marksOf(kind));
      const [best] = ranking;
      expect([best?.pattern, ...(best?.alike ?? [])].map((pattern) => pattern?.kind)).toContain(kind);
      expect(best?.score).toBeCloseTo(1, 12);
      expect(best?.unseen).toBe(0);
    },
  );

  test('marks on the wrong faces are not explained so', () => {
    const turned = marksOf('spreading').map((mark) => ({
      ...mark,
      face: mark.face === 'intrados' ? ('extrados' as const) : ('intrados' as const),
    }));
    const spreading = read(turned).ranking.find(({ pattern }) => pattern.kind === 'spreading');
    expect(spreading?.score ?? 0).toBeLessThan(0.01);
  });

  test('one mark is too few to read a movement from', () => {
    expect(read(marksOf('spreading').slice(0, 1)).verdict).toBe('too-few-marks');
    expect(read([]).verdict).toBe('too-few-marks');
  });

  test('a mark placed along the intrados counts at the nearest joint', () => {
    const along = marksOf('spreading').map(({ joint, ...mark }) => ({ ...mark, along: ((joint ?? 0) + 0.3) / 25 }));
    const within = along.map((mark) => ({ ...mark, along: Math.min(1, mark.along) }));
    expect(read(within).ranking[0]?.score).toBeCloseTo(1, 12);
  });

  test('the spreading of a segmental arch opens its soffit at the crown and its back at the haunches', () => {
    const openings = patterns.find(({ kind }) => kind === 'spreading')?.openings ?? [];
    expect(openings.map(({ side }) => side)).toEqual(['intrados', 'extrados', 'intrados']);
    expect(Math.abs((openings[1]?.joint ?? 0) - 12.5)).toBeLessThanOrEqual(1);
  });
});
