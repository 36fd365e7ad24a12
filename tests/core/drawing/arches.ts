/** Arches for the drawing's tests: three that are looked at by hand, and any number that chance makes up. */
import fc from 'fast-check';
import { assessScheme, type AssessedScheme } from '../../../core/assess/assess.ts';
import type { Load, Profile, Scheme } from '../../../core/job/schema.ts';

type Given = Omit<Scheme, 'id' | 'breadth'> & Partial<Scheme>;

function outcomeOf(scheme: Given, name: string) {
  const full: Scheme = { id: 's1', name: 'As found', breadth: 0.6, ...scheme };
  return assessScheme({ id: 'a1', name, schemes: [full] }, full);
}

export function assessed(scheme: Given, name = 'North door'): AssessedScheme {
  const outcome = outcomeOf(scheme, name);
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.problems));
  return outcome.assessed;
}

/** A door in a wall, with a beam end and a floor on it. */
export const northDoor = (): AssessedScheme =>
  assessed({
    profile: { shape: 'semicircular', span: 3.2 },
    ring: { thickness: 0.42, voussoirs: 21, joints: 'radial' },
    above: { kind: 'wall', height: 1.2, unitWeight: 21 },
    masonry: { name: 'squared sandstone', unitWeight: 22, strength: 5.8, friction: 0.6 },
    loads: [
      { id: 'l1', name: 'beam end', kind: 'point', x: 0.4, force: 12 },
      { id: 'l2', name: 'floor', kind: 'strip', from: -1, to: 0.5, intensity: 8 },
    ],
  });

/** A ring too thin for its own weight. */
export const thinRing = (): AssessedScheme =>
  assessed({ profile: { shape: 'semicircular', span: 3 }, ring: { thickness: 0.12, voussoirs: 19 } }, 'Barn door');

const profiles: fc.Arbitrary<Profile> = fc
  .record({
    shape: fc.constantFrom('semicircular', 'segmental', 'pointed'),
    span: fc.double({ min: 0.4, max: 30, noNaN: true }),
    share: fc.double({ min: 0, max: 1, noNaN: true }),
  })
  .map(({ shape, span, share }): Profile => {
    if (shape === 'semicircular') return { shape, span };
    if (shape === 'segmental') return { shape, span, rise: span * (0.06 + 0.43 * share) };
    return { shape: 'pointed', span, rise: span * (0.51 + 0.6 * share) };
  });

const names = fc.constantFrom(
  '',
  'beam end',
  'floor',
  'stored grain, as found in the loft in spring',
  'Träger',
  'ДВЕРЬ',
  'x',
);

/** Loads at shares of the span, so that they stand on any arch. */
const loads = (span: number): fc.Arbitrary<Load[]> =>
  fc
    .array(
      fc.record({
        name: names,
        point: fc.boolean(),
        a: fc.double({ min: -0.49, max: 0.49, noNaN: true }),
        b: fc.double({ min: -0.49, max: 0.49, noNaN: true }),
        amount: fc.double({ min: -3, max: 40, noNaN: true }),
      }),
      { maxLength: 14 },
    )
    .map((list) =>
      list.map(({ name, point, a, b, amount }, i): Load => {
        const id = `l${i + 1}`;
        if (point) return { id, name, kind: 'point', x: a * span, force: amount };
        return {
          id,
          name,
          kind: 'strip',
          from: Math.min(a, b) * span,
          to: Math.max(a, b) * span + 0.01 * span,
          intensity: amount,
        };
      }),
    );

export const anyArch: fc.Arbitrary<AssessedScheme> = profiles.chain((profile) => {
  const span = profile.shape === 'measured' ? 1 : profile.span;
  return fc
    .record({
      thickness: fc.double({ min: 0.03, max: 0.22, noNaN: true }),
      voussoirs: fc.integer({ min: 3, max: 90 }),
      joints: fc.constantFrom('radial' as const, 'vertical' as const),
      above: fc.option(
        fc.record({
          kind: fc.constantFrom('wall' as const, 'fill' as const),
          height: fc.double({ min: 0, max: 6, noNaN: true }),
        }),
        { nil: undefined },
      ),
      loads: loads(span),
    })
    .map(({ thickness, voussoirs, joints, above, loads }) =>
      assessed({
        profile,
        ring: { thickness: thickness * span, voussoirs, joints },
        loads,
        ...(above === undefined ? {} : { above }),
      }),
    );
});

/** A brick road bridge of several rings that tapers, with everything on it that can be surveyed. */
export const fordBridge = (changes: Partial<Given> = {}): AssessedScheme =>
  assessed(
    {
      profile: { shape: 'segmental', span: 6.4, rise: 1.5 },
      ring: {
        thickness: 0.46,
        springingThickness: 0.62,
        voussoirs: 41,
        joints: 'radial',
        courses: 4,
        lostMortar: [
          { face: 'intrados', depth: 0.06 },
          { face: 'extrados', depth: 0.12, joint: 20 },
        ],
      },
      breadth: 4.2,
      masonry: { name: 'brick in lime', unitWeight: 19, strength: 4.2, friction: 0.6 },
      backing: { level: 1.25, counts: 'masonry', unitWeight: 20 },
      above: {
        kind: 'fill',
        height: 0.5,
        unitWeight: 18,
        layers: [
          { name: 'sub-base', thickness: 0.2, unitWeight: 20 },
          { name: 'setts', thickness: 0.12, unitWeight: 24 },
        ],
      },
      loads: [{ id: 'cart', name: 'cart axle', kind: 'axle', x: 1.1, force: 60, patch: 0.3, dispersal: 0.5 }],
      cracks: [
        { id: 'c1', joint: 20, face: 'intrados', width: 0.003, seenOn: '2026-05-14' },
        { id: 'c2', joint: 0, face: 'extrados', width: 0.006, seenOn: '2026-05-14' },
        { id: 'c3', along: 0.8, face: 'extrados' },
      ],
      ...changes,
    },
    'Ford bridge',
  );

const share = fc.double({ min: 0, max: 1, noNaN: true });
const face = fc.constantFrom('intrados' as const, 'extrados' as const);

/** Arches with all that a survey may add: taper, courses, lost mortar, backing, layers, openings, axles and cracks. */
export const anySurveyedArch: fc.Arbitrary<AssessedScheme> = profiles
  .chain((profile) => {
    const span = profile.shape === 'measured' ? 1 : profile.span;
    const thickness = fc.double({ min: 0.06, max: 0.15, noNaN: true }).map((part) => part * span);
    const height = fc.double({ min: 0.1, max: 1.2, noNaN: true }).map((part) => part * span);
    return fc
      .record({
        thickness,
        taper: fc.option(fc.double({ min: 0.8, max: 1.6, noNaN: true }), { nil: 1 }),
        voussoirs: fc.integer({ min: 3, max: 60 }),
        courses: fc.integer({ min: 1, max: 6 }),
        lost: fc.array(fc.record({ face, depth: fc.double({ min: 0.02, max: 0.3, noNaN: true }) }), { maxLength: 2 }),
        height,
        backing: fc.option(
          fc.record({ level: share, counts: fc.constantFrom('weight' as const, 'masonry' as const) }),
          {
            nil: undefined,
          },
        ),
        layers: fc.array(fc.record({ name: names, thickness: fc.double({ min: 0.01, max: 0.4, noNaN: true }) }), {
          maxLength: 4,
        }),
        opening: fc.boolean(),
        loads: loads(span),
        axle: fc.option(fc.double({ min: -0.45, max: 0.45, noNaN: true }), { nil: undefined }),
        cracks: fc.array(
          fc.record({
            along: share,
            face,
            width: fc.option(fc.double({ min: 0.0002, max: 0.03, noNaN: true }), { nil: undefined }),
            seenOn: fc.constantFrom(undefined, '2026-05-14', 'before the flood of 1968, as told'),
          }),
          { maxLength: 9 },
        ),
      })
      .map((given) => {
        const crown = ('rise' in profile ? profile.rise : span / 2) + given.thickness;
        const axles =
          given.axle === undefined ? [] : [{ id: 'axle', kind: 'axle' as const, x: given.axle * span, force: 40 }];
        return outcomeOf(
          {
            profile,
            ring: {
              thickness: given.thickness,
              springingThickness: given.thickness * given.taper,
              voussoirs: given.voussoirs,
              courses: given.courses,
              lostMortar: given.lost.map((lost) => ({ face: lost.face, depth: lost.depth * given.thickness })),
            },
            above: {
              kind: 'fill',
              height: given.height,
              layers: given.layers.map((layer) => ({ ...layer, unitWeight: 20 })),
              openings: given.opening
                ? [
                    {
                      from: -0.1 * span,
                      to: 0.15 * span,
                      sill: crown + 0.2 * given.height,
                      head: crown + 0.8 * given.height,
                    },
                  ]
                : [],
            },
            ...(given.backing === undefined
              ? {}
              : { backing: { level: given.backing.level * crown, counts: given.backing.counts } }),
            loads: [...given.loads, ...axles],
            cracks: given.cracks.map(({ along, face: gapes, width, seenOn }, i) => ({
              id: `c${i}`,
              along,
              face: gapes,
              ...(width === undefined ? {} : { width }),
              ...(seenOn === undefined ? {} : { seenOn }),
            })),
          },
          'Any arch',
        );
      });
  })
  .filter((outcome) => outcome.ok)
  .map(({ assessed }) => assessed);

export const SHEET_TITLE = {
  owner: 'Harrowmere Estate Office',
  number: 'HM-07',
  title: 'Harrowmere Mill, undercroft',
  subtitle: 'North door / As found',
  createdBy: 'R. Ashdown',
  approvedBy: '',
  issuedOn: '2026-05-20',
  sheet: '1 of 1',
  surveyedBy: 'R. Ashdown',
  surveyedOn: '2026-05-14',
};
