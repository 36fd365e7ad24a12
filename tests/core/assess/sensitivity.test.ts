import { describe, expect, test } from 'vitest';
import { assessScheme } from '../../../core/assess/assess.ts';
import type { SchemeAssessment } from '../../../core/assess/assessment.ts';
import { influences, TRIED_SHARE } from '../../../core/assess/sensitivity.ts';
import type { Arch, Scheme } from '../../../core/job/schema.ts';
import { schemeFrom } from '../../support/assessed.ts';

const safety = ({ geometricSafety }: SchemeAssessment): number | null => geometricSafety;
const least = ({ thrust }: SchemeAssessment): number | null => thrust.least?.horizontal ?? null;
const archOf = (scheme: Scheme): Arch => ({ id: 'a1', schemes: [scheme] });

const semicircle = schemeFrom({
  profile: { shape: 'semicircular', span: 4 },
  ring: { thickness: 0.5, voussoirs: 20 },
  masonry: { unitWeight: 20 },
});

describe('what an answer hangs on', () => {
  test('the thrust of a ring that carries itself alone goes with the weight of its stone, in proportion', () => {
    const found = influences(archOf(semicircle), semicircle, least);
    const stone = found.filter(({ field }) => field === 'masonry.unitWeight');
    expect(stone.map(({ share }) => share).sort()).toEqual([-TRIED_SHARE, TRIED_SHARE]);
    for (const { share, from, to } of stone) expect(to! / from!).toBeCloseTo(1 + share, 9);
  });

  test('its safety does not go with the weight of its stone at all, but with span and thickness, as it must by proportion alone', () => {
    const found = influences(archOf(semicircle), semicircle, safety);
    expect(found.map(({ field }) => field)).not.toContain('masonry.unitWeight');
    expect(
      found
        .slice(0, 2)
        .map(({ field }) => field)
        .sort(),
    ).toEqual(['profile.span', 'ring.thickness']);
  });

  test('each answer is that of the arch built with the measure so changed', () => {
    const loaded = schemeFrom({
      profile: { shape: 'segmental', span: 3, rise: 0.8 },
      ring: { thickness: 0.35, voussoirs: 15 },
      above: { kind: 'fill', height: 0.6, unitWeight: 18 },
      loads: [{ id: 'l1', name: 'post', kind: 'point', x: 0.5, force: 20 }],
    });
    const found = influences(archOf(loaded), loaded, safety);
    const load = found.find(({ field, share }) => field === 'loads.l1.force' && share > 0);
    expect(load?.name).toBe('load from post');
    const heavier = { ...loaded, loads: [{ ...loaded.loads![0]!, force: 21 }] } as Scheme;
    const outcome = assessScheme(archOf(heavier), heavier);
    expect(load?.to).toBe(outcome.ok && outcome.assessed.result.geometricSafety);
  });

  test('what makes a ring stand that does not goes before all else', () => {
    const thin = schemeFrom({ profile: { shape: 'semicircular', span: 4 }, ring: { thickness: 0.22, voussoirs: 200 } });
    // a semicircle needs about 0.107 of its middle radius: 0.227 m here (from memory; Milankovitch)
    const found = influences(archOf(thin), thin, safety);
    const first = found.find(({ field }) => field === 'ring.thickness');
    expect(first?.share).toBe(TRIED_SHARE);
    expect(found.every(({ from, to }) => from === null && to !== null)).toBe(true);
    expect(first?.from).toBeNull();
    expect(first?.to).toBeGreaterThan(1);
  });
});
