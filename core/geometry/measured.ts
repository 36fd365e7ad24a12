/** A ring as surveyed: intrados points, and extrados points where they were taken. */
import { ProblemError, type Problem } from '../job/problem.ts';
import type { Profile } from '../job/schema.ts';
import type { Point } from './point.ts';
import type { SmoothCurve } from './smooth-curve.ts';
import { splineThrough } from './spline.ts';

type Measured = Extract<Profile, { readonly shape: 'measured' }>;

/** The intrados through its points, left springing to right springing. @throws ProblemError when they do not run so. */
export function measuredIntrados({ points, step }: Measured): SmoothCurve {
  const problems = runningRight(points, 'profile.points');
  if (step !== undefined && step !== 0) {
    problems.push({
      path: 'profile.step',
      value: `${step} m`,
      wrong: 'measured points already carry the level of both springings',
      right: 'leave the step out',
    });
  }
  if (problems.length > 0) throw new ProblemError(problems);
  return splineThrough(points.map(([x, y]) => ({ x, y })));
}

/**
 * The faces of a ring measured on both sides. The springing joints join the first and the last points of the faces;
 * the others stand square on the intrados.
 */
export function measuredFaces(profile: Measured, extradosPoints: NonNullable<Measured['extrados']>) {
  const intrados = measuredIntrados(profile);
  const problems = runningRight(extradosPoints, 'profile.extrados');
  if (extradosPoints.length < 3) {
    problems.push({
      path: 'profile.extrados',
      value: `${extradosPoints.length} points`,
      wrong: 'two points do not give the back of a ring',
      right: 'give at least three, or leave the extrados out and the ring is taken as thick as entered',
    });
  }
  if (problems.length > 0) throw new ProblemError(problems);
  const extrados = splineThrough(extradosPoints.map(([x, y]) => ({ x, y })));
  const across = (u: number): number => {
    if (u <= intrados.from) return extrados.from;
    if (u >= intrados.to) return extrados.to;
    const foot = intrados.at(u);
    const tangent = intrados.derivative(u);
    const ahead = (point: Point): number => (point.x - foot.x) * tangent.x + (point.y - foot.y) * tangent.y;
    return extrados.root(
      (v) => ahead(extrados.at(v)),
      (v) => {
        const { x, y } = extrados.derivative(v);
        return x * tangent.x + y * tangent.y;
      },
    );
  };
  refuseThinned(intrados, extrados, across);
  return { intrados, extrados, across };
}

/** Places at which the two faces are held against each other. */
const LOOKS = 50;

function refuseThinned(intrados: SmoothCurve, extrados: SmoothCurve, across: (u: number) => number): void {
  for (let i = 0; i <= LOOKS; i++) {
    const u = (intrados.to * i) / LOOKS;
    const foot = intrados.at(u);
    const normal = intrados.normal(u);
    const top = extrados.at(across(u));
    if ((top.x - foot.x) * normal.x + (top.y - foot.y) * normal.y > 0) continue;
    throw new ProblemError([
      {
        path: 'profile.extrados',
        value: `near x ${Number(foot.x.toPrecision(3))} m`,
        wrong: 'the extrados falls inside the intrados',
        right: 'give the points of the back of the ring, above and outside those of the intrados',
      },
    ]);
  }
}

function runningRight(points: readonly (readonly [number, number])[], path: string): Problem[] {
  return points.flatMap(([x], i): Problem[] => {
    const before = points[i - 1];
    if (before === undefined || x > before[0]) return [];
    return [
      {
        path: `${path}[${i}]`,
        value: `x ${x} m after x ${before[0]} m`,
        wrong: 'measured points run from the left springing to the right one',
        right: 'give each point a greater x than the one before',
      },
    ];
  });
}
