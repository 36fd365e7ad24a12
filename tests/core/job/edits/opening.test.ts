import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { buildRing } from '../../../../core/geometry/ring.ts';
import { resolveScheme } from '../../../../core/job/defaults.ts';
import {
  crownHeightOf,
  moveCrown,
  moveExtrados,
  moveSpringing,
  setMeasuredPoints,
  setProfileShape,
  setRise,
  setShapeMeasure,
  setSpan,
  spanOf,
} from '../../../../core/job/edits.ts';
import type { DrawnShape, ShapeMeasure } from '../../../../core/job/edits.ts';
import { freshJob, freshScheme } from '../../../../core/job/fresh.ts';
import { readJob } from '../../../../core/job/read.ts';
import type { Scheme } from '../../../../core/job/schema.ts';
import { writeJob } from '../../../../core/job/write.ts';

const SHAPES: DrawnShape[] = [
  'semicircular',
  'segmental',
  'pointed',
  'three-centred',
  'four-centred',
  'horseshoe',
  'elliptical',
  'parabolic',
  'catenary',
  'flat',
];

/** What keeps the scheme from being read back or set out as a curve; empty when nothing does. */
function faults(scheme: Scheme): string[] {
  const reading = readJob(writeJob({ ...freshJob(), arches: [{ id: 'a1', schemes: [scheme] }] }));
  if (!reading.ok) return reading.problems.map(({ path, wrong }) => `${path}: ${wrong}`);
  const { profile, ring } = resolveScheme(scheme).resolved;
  try {
    // A ring far thinner than any radius, so that only the opening is judged.
    const thin = 1e-6 * Math.min(spanOf(profile), 1);
    buildRing({ profile, thickness: { crown: thin, springing: thin }, voussoirs: ring.voussoirs, joints: 'radial' });
    return [];
  } catch (error) {
    return [String(error)];
  }
}

function profileAfter(scheme: Scheme, edit: (scheme: Scheme) => Scheme): Scheme['profile'] {
  return edit(scheme).profile;
}

describe('the crown dragged', () => {
  it('raises a segmental arch, up to half its span', () => {
    const start = freshScheme('segmental');
    expect(profileAfter(start, (scheme) => moveCrown(scheme, { x: 0.2, y: 1.1 }))).toEqual({
      shape: 'segmental',
      span: 3,
      rise: 1.1,
    });
    expect(moveCrown(start, { x: 0, y: 4 }).profile).toMatchObject({ rise: 1.5 });
    expect(moveCrown(start, { x: 0, y: -1 }).profile).toMatchObject({ rise: 0.005 });
  });

  it('lowers a pointed arch down to half its span', () => {
    expect(moveCrown(freshScheme('pointed'), { x: 0, y: 0.3 }).profile).toMatchObject({ span: 3, rise: 1.5 });
  });

  it('of a semicircle takes the span with it', () => {
    expect(moveCrown(freshScheme('semicircular'), { x: 0, y: 2 }).profile).toEqual({ shape: 'semicircular', span: 4 });
  });

  it('of a flat arch gives its camber', () => {
    expect(moveCrown(freshScheme('flat'), { x: 0, y: 0.05 }).profile).toMatchObject({ camber: 0.05 });
    expect(moveCrown(freshScheme('flat'), { x: 0, y: -0.05 }).profile).toMatchObject({ camber: 0 });
  });
});

describe('a springing dragged', () => {
  it('widens the opening on both sides and keeps the rise', () => {
    const start = freshScheme('segmental');
    expect(moveSpringing(start, 'right', { x: 2, y: 0.3 }).profile).toEqual({
      shape: 'segmental',
      span: 4,
      rise: 0.75,
    });
    expect(moveSpringing(start, 'left', { x: -2, y: 0 }).profile).toEqual(
      moveSpringing(start, 'right', { x: 2, y: 0 }).profile,
    );
  });

  it('takes the rise along where the shape asks it', () => {
    expect(moveSpringing(freshScheme('segmental'), 'right', { x: 0.5, y: 0 }).profile).toMatchObject({
      span: 1,
      rise: 0.5,
    });
    expect(moveSpringing(freshScheme('pointed'), 'right', { x: 3, y: 0 }).profile).toMatchObject({ span: 6, rise: 3 });
  });

  it('stops before the opening closes', () => {
    expect(moveSpringing(freshScheme('segmental'), 'right', { x: -1, y: 0 }).profile).toMatchObject({ span: 0.05 });
  });
});

it('the extrados dragged gives the thickness at the crown', () => {
  expect(moveExtrados(freshScheme('segmental'), { x: 0, y: 1.2 }).ring.thickness).toBeCloseTo(0.45, 12);
  expect(moveExtrados(freshScheme('semicircular'), { x: 0, y: 1 }).ring.thickness).toBe(0.005);
});

describe('another shape chosen', () => {
  it('keeps span and rise where the new shape can have them', () => {
    const start = setRise(freshScheme('segmental'), 0.9);
    expect(setProfileShape(start, 'elliptical').profile).toEqual({ shape: 'elliptical', span: 3, rise: 0.9 });
  });

  it('takes its usual proportion where the old rise would hide it', () => {
    const semicircle = freshScheme('semicircular');
    expect(setProfileShape(semicircle, 'segmental').profile).toEqual({ shape: 'segmental', span: 3, rise: 0.75 });
    // The equilateral: 0.866 of the span.
    expect(setProfileShape(semicircle, 'pointed').profile).toEqual({ shape: 'pointed', span: 3, rise: 2.598 });
  });

  it('keeps the step and what is unknown, and drops what only the old shape had', () => {
    const unknown = { drawnBy: 'J. Ashlar' };
    const profile = { shape: 'three-centred', span: 4, rise: 1.2, haunchRadius: 0.6, step: 0.1, ...unknown } as const;
    expect(setProfileShape({ ...freshScheme(), profile }, 'segmental').profile).toEqual({
      shape: 'segmental',
      span: 4,
      rise: 1.2,
      step: 0.1,
      ...unknown,
    });
  });

  it('goes on from what was measured', () => {
    const measured = setMeasuredPoints(freshScheme(), [
      [-1, 0],
      [0, 0.7],
      [1, 0],
    ]);
    expect(setProfileShape(measured, 'parabolic').profile).toEqual({ shape: 'parabolic', span: 2, rise: 0.7 });
  });

  it('and the same shape again is the same scheme', () => {
    const start = freshScheme('pointed');
    expect(setProfileShape(start, 'pointed')).toBe(start);
  });
});

describe('a measured profile', () => {
  const measured = setMeasuredPoints(freshScheme(), [
    [-1, 0],
    [0, 0.7],
    [1, 0],
  ]);

  it('has the span and crown of its points', () => {
    expect(spanOf(measured.profile)).toBe(2);
    expect(crownHeightOf(measured.profile)).toBe(0.7);
  });

  it('is not bent by handles', () => {
    expect(setSpan(measured, 5)).toBe(measured);
    expect(moveCrown(measured, { x: 0, y: 1 })).toBe(measured);
    expect(moveSpringing(measured, 'left', { x: -3, y: 0 })).toBe(measured);
  });

  it('needs three points at least', () => {
    expect(
      setMeasuredPoints(measured, [
        [-1, 0],
        [1, 0],
      ]),
    ).toBe(measured);
  });
});

describe('measures of single shapes', () => {
  it('are set where the shape has them and left alone where not', () => {
    expect(setShapeMeasure(freshScheme('flat'), 'skewbackAngle', 60).profile).toMatchObject({ skewbackAngle: 60 });
    const segmental = freshScheme('segmental');
    expect(setShapeMeasure(segmental, 'haunchRadius', 0.4)).toBe(segmental);
  });

  it('leave the default again when taken away, where they may be', () => {
    const start = freshScheme('three-centred');
    const set = setShapeMeasure(start, 'haunchRadius', 0.4);
    expect(set.profile).toMatchObject({ haunchRadius: 0.4 });
    expect(setShapeMeasure(set, 'haunchRadius', undefined).profile).toEqual(start.profile);
    const flat = freshScheme('flat');
    expect(setShapeMeasure(flat, 'camber', undefined)).toBe(flat);
  });

  it('keep the haunch radius of a three-centred arch below its rise', () => {
    const set = setShapeMeasure(freshScheme('three-centred'), 'haunchRadius', 5);
    expect(set.profile).toMatchObject({ rise: 1.05, haunchRadius: 0.99 * 1.05 });
  });

  it('keep the angle of a four-centred arch where it can be, and the radius with it', () => {
    const start = freshScheme('four-centred');
    const set = setShapeMeasure(start, 'haunchAngle', 50);
    expect(set.profile).toEqual({ ...start.profile, haunchAngle: 50 });
  });
});

describe('a figure that is no number', () => {
  it.each(SHAPES)('leaves %s as it is', (shape) => {
    const start = freshScheme(shape);
    expect(setSpan(start, Number.NaN)).toBe(start);
    expect(setRise(start, Infinity)).toBe(start);
    expect(moveCrown(start, { x: 0, y: Number.NaN })).toBe(start);
    expect(moveSpringing(start, 'left', { x: -Infinity, y: 0 })).toBe(start);
  });
});

describe('whatever is done to an opening', () => {
  it.each(SHAPES)('a fresh %s can be read and set out', (shape) => {
    expect(faults(freshScheme(shape))).toEqual([]);
  });

  const figure = fc.oneof(fc.double({ min: -3, max: 8, noNaN: true }), fc.double());
  const point = fc.record({ x: figure, y: figure });
  const edit = fc.oneof(
    figure.map((value) => (scheme: Scheme) => setSpan(scheme, value)),
    figure.map((value) => (scheme: Scheme) => setRise(scheme, value)),
    point.map((at) => (scheme: Scheme) => moveCrown(scheme, at)),
    fc.tuple(fc.constantFrom('left' as const, 'right' as const), point).map(
      ([side, at]) =>
        (scheme: Scheme) =>
          moveSpringing(scheme, side, at),
    ),
    fc.constantFrom(...SHAPES).map((shape) => (scheme: Scheme) => setProfileShape(scheme, shape)),
    fc
      .tuple(
        fc.constantFrom<ShapeMeasure>('haunchRadius', 'haunchAngle', 'skewbackAngle', 'camber'),
        fc.oneof(figure, fc.double({ min: 0, max: 90, noNaN: true })),
      )
      .map(
        ([measure, value]) =>
          (scheme: Scheme) =>
            setShapeMeasure(scheme, measure, value),
      ),
  );

  it('it stays one that can be read back and set out', () => {
    fc.assert(
      fc.property(fc.constantFrom(...SHAPES), fc.array(edit, { minLength: 1, maxLength: 8 }), (shape, edits) => {
        const end = edits.reduce((scheme, apply) => apply(scheme), freshScheme(shape));
        expect(faults(end)).toEqual([]);
      }),
      { numRuns: 500 },
    );
  });
});
