import { ProblemError } from '../job/problem.ts';
import type { OffsettableCurve } from './curve.ts';
import { SmoothCurve } from './smooth-curve.ts';

/**
 * A measured intrados as a smooth curve through the survey points: a natural cubic spline over the length of the
 * chords, so that offsets and joints have a direction everywhere. Points: metres, left springing to right springing.
 */
export function measuredCurves(points: readonly (readonly [number, number])[]): OffsettableCurve[] {
  points.forEach(([x], i) => {
    const before = points[i - 1];
    if (before !== undefined && !(x > before[0])) {
      throw new ProblemError([
        {
          path: `profile.points[${i}]`,
          value: `x ${x} m after x ${before[0]} m`,
          wrong: 'measured points run from the left springing to the right one',
          right: 'give each point a greater x than the one before',
        },
      ]);
    }
  });
  const knots = [0];
  for (let i = 1; i < points.length; i++) {
    const [ax, ay] = points[i - 1] as readonly [number, number];
    const [bx, by] = points[i] as readonly [number, number];
    knots.push((knots[i - 1] as number) + Math.hypot(bx - ax, by - ay));
  }
  const x = naturalSpline(
    knots,
    points.map((point) => point[0]),
  );
  const y = naturalSpline(
    knots,
    points.map((point) => point[1]),
  );
  const whole = new SmoothCurve(0, knots[knots.length - 1] as number, (u) => {
    const px = x(u);
    const py = y(u);
    return { x: px.value, y: py.value, dx: px.first, dy: py.first, ddx: px.second, ddy: py.second };
  });
  // one curve between each two points: the third derivative jumps there, and quadrature must not run across a jump
  return knots.slice(1).map((end, i) => whole.part(knots[i] as number, end));
}

interface SplineValue {
  readonly value: number;
  readonly first: number;
  readonly second: number;
}

/** Natural cubic spline: second derivatives from the tridiagonal system of continuity (standard numerical analysis). */
function naturalSpline(knots: readonly number[], values: readonly number[]): (u: number) => SplineValue {
  const n = knots.length;
  const second = new Float64Array(n);
  const carried = new Float64Array(n);
  const at = (list: ArrayLike<number>, i: number): number => list[i] as number;
  for (let i = 1; i < n - 1; i++) {
    const before = at(knots, i) - at(knots, i - 1);
    const after = at(knots, i + 1) - at(knots, i);
    const share = before / (before + after);
    const pivot = share * at(second, i - 1) + 2;
    second[i] = (share - 1) / pivot;
    const bend = (at(values, i + 1) - at(values, i)) / after - (at(values, i) - at(values, i - 1)) / before;
    carried[i] = ((6 * bend) / (before + after) - share * at(carried, i - 1)) / pivot;
  }
  second[n - 1] = 0;
  for (let i = n - 2; i >= 0; i--) second[i] = at(second, i) * at(second, i + 1) + at(carried, i);
  return (u) => {
    let low = 0;
    let high = n - 1;
    while (high - low > 1) {
      const middle = (low + high) >> 1;
      if (at(knots, middle) > u) high = middle;
      else low = middle;
    }
    const h = at(knots, high) - at(knots, low);
    const a = (at(knots, high) - u) / h;
    const b = (u - at(knots, low)) / h;
    const low2 = at(second, low);
    const high2 = at(second, high);
    return {
      value: a * at(values, low) + b * at(values, high) + (((a ** 3 - a) * low2 + (b ** 3 - b) * high2) * h * h) / 6,
      first: (at(values, high) - at(values, low)) / h + (((3 * b * b - 1) * high2 - (3 * a * a - 1) * low2) * h) / 6,
      second: a * low2 + b * high2,
    };
  };
}
