/** What the rules of proportion and the road axle method ask of an intrados. Lengths in m. */
import { Arc } from '../geometry/arc.ts';
import type { Curve } from '../geometry/curve.ts';
import { flatFaces } from '../geometry/flat.ts';
import type { Point } from '../geometry/point.ts';
import { catenaryParameter, circleOver, intradosCurves, profileSpan } from '../geometry/profile.ts';
import type { Profile } from '../job/schema.ts';
import type { ProportionFacts } from './proportion-rules.ts';
import type { RoadArch } from './road-axle.ts';

/**
 * @param ringThickness of the ring at the crown; null when it was not measured.
 * @throws ProblemError when the profile cannot be built.
 */
export function proportionFacts(profile: Profile, ringThickness: number | null): ProportionFacts {
  const curves = soffit(profile);
  const rampant = profile.shape !== 'measured' && (profile.step ?? 0) !== 0;
  return {
    shape: profile.shape,
    span: profileSpan(profile),
    rise: crownRise(profile, curves),
    crownRadius: rampant ? null : crownRadius(profile, curves),
    rampant,
    ringThickness,
    pointAtShare: alongCurves(curves),
  };
}

/**
 * Span and rises over the line between the springings. Of two unlike quarter points the higher counts: it gives the
 * lower profile factor.
 * @throws ProblemError when the profile cannot be built.
 */
export function roadArchRises(profile: Profile): Pick<RoadArch, 'span' | 'rise' | 'quarterRise'> {
  const curves = soffit(profile);
  const span = profileSpan(profile);
  const left = endsOf(curves).left.x;
  const quarterRise = Math.max(...[1 / 4, 3 / 4].map((share) => riseAt(curves, left + share * span)));
  return { span, rise: crownRise(profile, curves), quarterRise };
}

function soffit(profile: Profile): readonly Curve[] {
  // the soffit of a flat arch does not depend on how thick the arch is
  return profile.shape === 'flat' ? [flatFaces(profile, 0).intrados] : intradosCurves(profile);
}

function endsOf(curves: readonly Curve[]): { left: Point; right: Point } {
  const [first, last] = [curves[0] as Curve, curves[curves.length - 1] as Curve];
  return { left: first.at(first.from), right: last.at(last.to) };
}

function aboveSpringings(curves: readonly Curve[], { x, y }: Point): number {
  const { left, right } = endsOf(curves);
  return y - left.y - ((right.y - left.y) * (x - left.x)) / (right.x - left.x);
}

/** Every drawn shape has its crown at mid-span, raised springing or not; a survey has it where it is highest. */
function crownRise(profile: Profile, curves: readonly Curve[]): number {
  if (profile.shape !== 'measured') {
    const { left, right } = endsOf(curves);
    return riseAt(curves, (left.x + right.x) / 2);
  }
  const tops = curves.map((curve) => aboveSpringings(curves, curve.at(curve.highest(curve.from, curve.to))));
  return Math.max(...tops);
}

function riseAt(curves: readonly Curve[], x: number): number {
  const curve = curves.find((each) => x <= each.at(each.to).x) ?? curves[curves.length - 1]!;
  return aboveSpringings(curves, curve.at(curve.parameterAtX(x)));
}

/** Radii of curvature at the top of each shape (plane geometry); null at a pointed crown and between measured points. */
function crownRadius(profile: Profile, curves: readonly Curve[]): number | null {
  switch (profile.shape) {
    case 'semicircular':
    case 'segmental':
    case 'horseshoe':
    case 'three-centred': {
      const crown = curves[(curves.length - 1) / 2];
      return crown instanceof Arc ? crown.radius : null;
    }
    case 'elliptical':
      return profile.span ** 2 / (4 * profile.rise);
    case 'parabolic':
      return profile.span ** 2 / (8 * profile.rise);
    case 'catenary':
      return catenaryParameter(profile.span / 2, profile.rise);
    case 'flat':
      return profile.camber === 0 ? null : circleOver(profile.span / 2, profile.camber).radius;
    case 'pointed':
    case 'four-centred':
    case 'measured':
      return null;
  }
}

/** The place at a share of the whole length, 0 at the left springing. */
function alongCurves(curves: readonly Curve[]): (share: number) => Point {
  const lengths = curves.map((curve) => curve.length(curve.from, curve.to));
  const whole = lengths.reduce((sum, length) => sum + length, 0);
  return (share) => {
    let left = share * whole;
    let index = 0;
    while (index < curves.length - 1 && left > (lengths[index] as number)) left -= lengths[index++] as number;
    const curve = curves[index] as Curve;
    return curve.at(left >= (lengths[index] as number) ? curve.to : curve.parameterAtLength(left));
  };
}
