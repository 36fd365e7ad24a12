/**
 * One smooth stretch of a face of the ring, run from left to right as its parameter goes from `from` to `to`.
 * What a ring asks of a curve and nothing more; circles answer in closed form, other curves by quadrature.
 */
import type { Moments } from './moments.ts';
import type { Point } from './point.ts';

/** A piece of outline as it is drawn: straight to a point, or round a centre to a point. Angles in radians. */
export type Edge =
  | { readonly kind: 'line'; readonly to: Point }
  | {
      readonly kind: 'arc';
      readonly to: Point;
      readonly centre: Point;
      readonly radius: number;
      readonly from: number;
      readonly turn: number;
    };

export interface Curve {
  readonly from: number;
  readonly to: number;
  /** Bounds of the parameter within which it faces the sky, carried on past its ends; what lies above rests there only. */
  readonly skyward: { readonly from: number; readonly to: number };
  /** The parameter of the highest point between u0 and u1. */
  highest(u0: number, u1: number): number;
  at(u: number): Point;
  /** Derivative of the point by the parameter. */
  derivative(u: number): Point;
  /** Boundary integrals from u0 to u1, about `origin`. */
  moments(u0: number, u1: number, origin: Point): Moments;
  /** Length along the curve from u0 to u1, m. */
  length(u0: number, u1: number): number;
  /** The parameter at `length` metres after `from`. */
  parameterAtLength(length: number): number;
  /** The parameter at which the curve passes x, on the stretch that faces the sky; may lie beyond the ends. */
  parameterAtX(x: number): number;
  /** The edges that draw u0 to u1; the start point is not repeated. */
  edges(u0: number, u1: number): Edge[];
}

/** A curve that can be offset along its outward normal; faces of the opening are such curves. */
export interface OffsettableCurve extends Curve {
  /** Unit normal, pointing out of the opening (up at the crown). */
  normal(u: number): Point;
  /** The curve `thickness` metres outside, sharing this curve's parameter, so that joints at one u are normal to it. */
  offset(thickness: ThicknessLaw): Curve;
  /** The same curve from u0 to u1 only. */
  part(u0: number, u1: number): OffsettableCurve;
  /** The curve with every point raised by slope · x: a rampant arch. */
  sheared(slope: number): OffsettableCurve;
  /** Least radius where the curve is hollow towards the ring, m: a thicker ring would fold there. Infinite for an arch. */
  readonly hollowRadius: number;
}

/** Ring thickness along one curve, m. `rate` is its change per metre along the curve, zero for an even ring. */
export interface ThicknessLaw {
  readonly atStart: number;
  readonly rate: number;
}
