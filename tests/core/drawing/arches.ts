/** Arches for the drawing's tests: three that are looked at by hand, and any number that chance makes up. */
import fc from 'fast-check';
import { assessScheme, type AssessedScheme } from '../../../core/assess/assess.ts';
import type { Load, Profile, Scheme } from '../../../core/job/schema.ts';

export function assessed(
  scheme: Omit<Scheme, 'id' | 'breadth'> & Partial<Scheme>,
  name = 'North door',
): AssessedScheme {
  const full: Scheme = { id: 's1', name: 'As found', breadth: 0.6, ...scheme };
  const outcome = assessScheme({ id: 'a1', name, schemes: [full] }, full);
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
