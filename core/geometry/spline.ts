/** A smooth curve through points: a cubic spline in each coordinate, with the ends' directions from the circle there. */
import type { Point } from './point.ts';
import { SmoothCurve } from './smooth-curve.ts';

/**
 * The curve runs through the points in order; its parameter is the point's number, so that every span of it lies
 * between two points. A natural spline would run out straight at its ends and tilt the springing joints of a sparse
 * survey; here the ends take the direction of the circle through their three points.
 * @param points at least three, no two neighbours in one place, metres.
 */
export function splineThrough(points: readonly Point[]): SmoothCurve {
  const chords = points.slice(1).map((b, i) => Math.hypot(b.x - (points[i] as Point).x, b.y - (points[i] as Point).y));
  const [start, end] = endDirections(points);
  const x = clampedSpline(
    chords,
    points.map((p) => p.x),
    start.x,
    end.x,
  );
  const y = clampedSpline(
    chords,
    points.map((p) => p.y),
    start.y,
    end.y,
  );
  const last = points.length - 1;
  return new SmoothCurve(
    0,
    last,
    (u) => {
      const i = Math.min(last - 1, Math.max(0, Math.floor(u)));
      const h = chords[i] as number;
      const [px, dx, ddx] = x(i, u - i);
      const [py, dy, ddy] = y(i, u - i);
      return { x: px, y: py, dx: dx * h, dy: dy * h, ddx: ddx * h * h, ddy: ddy * h * h };
    },
    { start: 0, step: 1 },
  );
}

/** Derivatives by chord length at both ends: the circle's direction there, as long as its arc is to its chord. */
function endDirections(points: readonly Point[]): [Point, Point] {
  const n = points.length;
  const [a, b, c] = points as [Point, Point, Point];
  const [z, y, x] = [points[n - 1], points[n - 2], points[n - 3]] as [Point, Point, Point];
  const back = directionAtFirst(z, y, x);
  return [directionAtFirst(a, b, c), { x: -back.x, y: -back.y }];
}

/** Direction at a of the circle through a, b and c, towards b, times arc over chord from a to b. */
function directionAtFirst(a: Point, b: Point, c: Point): Point {
  const abx = b.x - a.x;
  const aby = b.y - a.y;
  const acx = c.x - a.x;
  const acy = c.y - a.y;
  const bcx = c.x - b.x;
  const bcy = c.y - b.y;
  // the angle at c stands on the chord ab: the tangent at a turns from the chord by it, away from c's side
  const angle = Math.atan2(abx * acy - aby * acx, acx * bcx + acy * bcy);
  const chord = Math.hypot(abx, aby);
  const stretch = angle === 0 ? 1 : angle / Math.sin(angle);
  const cos = Math.cos(-angle);
  const sin = Math.sin(-angle);
  return { x: (stretch * (cos * abx - sin * aby)) / chord, y: (stretch * (sin * abx + cos * aby)) / chord };
}

type SplineValue = readonly [value: number, first: number, second: number];

/** Cubic spline over the chords with given end slopes: second derivatives from the tridiagonal system of continuity. */
function clampedSpline(
  chords: readonly number[],
  values: readonly number[],
  startSlope: number,
  endSlope: number,
): (i: number, share: number) => SplineValue {
  const n = values.length;
  const at = (list: ArrayLike<number>, i: number): number => list[i] as number;
  const slope = (i: number): number => (at(values, i + 1) - at(values, i)) / at(chords, i);
  const above = new Float64Array(n);
  const second = new Float64Array(n);
  const solveRow = (i: number, lower: number, diagonal: number, upper: number, right: number): void => {
    const pivot = diagonal - lower * (i === 0 ? 0 : at(above, i - 1));
    above[i] = upper / pivot;
    second[i] = (right - lower * (i === 0 ? 0 : at(second, i - 1))) / pivot;
  };
  solveRow(0, 0, 2 * at(chords, 0), at(chords, 0), 6 * (slope(0) - startSlope));
  for (let i = 1; i < n - 1; i++) {
    const before = at(chords, i - 1);
    const after = at(chords, i);
    solveRow(i, before, 2 * (before + after), after, 6 * (slope(i) - slope(i - 1)));
  }
  solveRow(n - 1, at(chords, n - 2), 2 * at(chords, n - 2), 0, 6 * (endSlope - slope(n - 2)));
  for (let i = n - 2; i >= 0; i--) second[i] = at(second, i) - at(above, i) * at(second, i + 1);
  return (i, share) => {
    const h = at(chords, i);
    const rest = 1 - share;
    const low = at(second, i);
    const high = at(second, i + 1);
    return [
      rest * at(values, i) +
        share * at(values, i + 1) +
        (((rest ** 3 - rest) * low + (share ** 3 - share) * high) * h * h) / 6,
      slope(i) + (((3 * share * share - 1) * high - (3 * rest * rest - 1) * low) * h) / 6,
      rest * low + share * high,
    ];
  };
}
