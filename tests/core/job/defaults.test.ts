import { describe, expect, it } from 'vitest';
import { classicalHaunchRadius, resolveScheme } from '../../../core/job/defaults.ts';
import { freshScheme } from '../../../core/job/fresh.ts';
import { readJob } from '../../../core/job/read.ts';
import type { Scheme } from '../../../core/job/schema.ts';
import { northDoorText } from './job-text.ts';

const bare: Scheme = freshScheme('semicircular');

function assumedFields(scheme: Scheme): string[] {
  return resolveScheme(scheme).assumed.map(({ field }) => field);
}

describe('a scheme that says only what it must', () => {
  it('is filled with the usual figures', () => {
    expect(resolveScheme(bare).resolved).toMatchObject({
      id: 's1',
      name: 'As found',
      role: 'as-found',
      profile: { shape: 'semicircular', span: 3, step: 0 },
      ring: { thickness: 0.35, voussoirs: 21, joints: 'radial' },
      breadth: 0.6,
      masonry: { name: 'not recorded', unitWeight: 22, strength: null, friction: 0.6 },
      above: { kind: 'none', height: 0, unitWeight: 0 },
      loads: [],
      sway: 0,
      supports: { left: { kind: 'rigid' }, right: { kind: 'rigid' } },
      asked: { geometricSafety: 2 },
    });
  });

  it('names each figure that weighs on the answer, with its reason in one sentence', () => {
    const { assumed } = resolveScheme(bare);
    expect(assumed.map(({ field, value }) => [field, value])).toEqual([
      ['ring.voussoirs', 21],
      ['ring.joints', 'radial'],
      ['masonry.unitWeight', 22],
      ['masonry.strength', null],
      ['masonry.friction', 0.6],
      ['above.kind', 'none'],
      ['supports', 'rigid'],
      ['asked.geometricSafety', 2],
    ]);
    for (const { because } of assumed) expect(because).toMatch(/^[A-Z].{30,}\.$/);
  });

  // Circolare 2019 (Italy), Table C8.5.I, squared ashlar: w = 22 kN/m³.
  it('gives the source of a figure taken from a table', () => {
    const unitWeight = resolveScheme(bare).assumed.find(({ field }) => field === 'masonry.unitWeight');
    expect(unitWeight?.because).toContain('Circolare 2019, Table C8.5.I');
    expect(resolveScheme(bare).assumed.find(({ field }) => field === 'masonry.friction')?.because).toContain(
      'from memory',
    );
  });
});

it('a scheme that says everything has nothing assumed but the margin', () => {
  const reading = readJob(northDoorText());
  const scheme = reading.ok ? reading.job.arches[0]!.schemes[0]! : bare;
  expect(assumedFields(scheme)).toEqual(['asked.geometricSafety']);
  expect(resolveScheme(scheme).resolved).toMatchObject(scheme);
});

describe('single gaps', () => {
  it('strength and friction that are said to be unknown stay unknown and are not assumed', () => {
    const scheme: Scheme = { ...bare, masonry: { unitWeight: 22, strength: null, friction: null } };
    expect(resolveScheme(scheme).resolved.masonry).toMatchObject({ strength: null, friction: null });
    expect(assumedFields(scheme).filter((field) => field.startsWith('masonry'))).toEqual([]);
  });

  it('a pointed ring has a joint at the crown', () => {
    expect(resolveScheme(freshScheme('pointed')).resolved.ring.voussoirs).toBe(20);
    expect(resolveScheme(freshScheme('elliptical')).resolved.ring.voussoirs).toBe(21);
  });

  it('a wall or fill without its weight has one, each its own', () => {
    const wall = resolveScheme({ ...bare, above: { kind: 'wall', height: 1.2 } });
    expect(wall.resolved.above).toMatchObject({ kind: 'wall', height: 1.2, unitWeight: 20 });
    const fill = resolveScheme({ ...bare, above: { kind: 'fill' } });
    expect(fill.resolved.above).toMatchObject({ kind: 'fill', height: 0, unitWeight: 18 });
    expect(fill.assumed.filter(({ field }) => field.startsWith('above')).map(({ field }) => field)).toEqual([
      'above.height',
      'above.unitWeight',
    ]);
  });

  it('what is said of nothing above is not used', () => {
    const { resolved, assumed } = resolveScheme({ ...bare, above: { kind: 'none', height: 2, unitWeight: 20 } });
    expect(resolved.above).toMatchObject({ kind: 'none', height: 0, unitWeight: 0 });
    expect(assumed.map(({ field }) => field)).not.toContain('above.kind');
  });

  it('a support that is described leaves the other to be assumed', () => {
    expect(assumedFields({ ...bare, supports: { left: { kind: 'rigid' } } })).toContain('supports.right');
  });

  it('a load without a name goes by its id', () => {
    const scheme: Scheme = { ...bare, loads: [{ id: 'l1', kind: 'point', x: 0, force: 10 }] };
    expect(resolveScheme(scheme).resolved.loads[0]?.name).toBe('l1');
  });

  it('a later scheme without a role is a proposal', () => {
    const { id, profile, ring, breadth } = bare;
    const unnamed: Scheme = { id, profile, ring, breadth };
    expect(resolveScheme(unnamed, 0).resolved).toMatchObject({ role: 'as-found', name: 'As found' });
    expect(resolveScheme(unnamed, 2).resolved).toMatchObject({ role: 'proposal', name: 'Proposal 2' });
  });
});

describe('the haunch radius of a three-centred arch', () => {
  // Classical setting-out, common practice: a = 2, f = 1.5 gives c = 2.5 and r = 2.5 (2.5 − 0.5) / 4 = 1.25 by hand.
  it('is set out in the classical way', () => {
    expect(classicalHaunchRadius(4, 1.5)).toBe(1.25);
  });

  it('is named among what was assumed, unless it was measured', () => {
    const scheme: Scheme = { ...bare, profile: { shape: 'three-centred', span: 4, rise: 1.5 } };
    expect(resolveScheme(scheme).assumed).toContainEqual(
      expect.objectContaining({ field: 'profile.haunchRadius', value: 1.25 }),
    );
    expect(resolveScheme(scheme).resolved.profile).toMatchObject({ haunchRadius: 1.25 });
    expect(
      assumedFields({ ...bare, profile: { shape: 'three-centred', span: 4, rise: 1.5, haunchRadius: 1 } }),
    ).not.toContain('profile.haunchRadius');
  });
});
