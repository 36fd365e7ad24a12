import { clampBetween } from './clamp.ts';
import type { Edge, OffsettableCurve, Curve, ThicknessLaw } from './curve.ts';
import { angleOf, arcMoments, type Angle, type Moments } from './moments.ts';
import type { Point } from './point.ts';
import { SmoothCurve } from './smooth-curve.ts';

/** Part of a circle, run clockwise: its parameter is the angle at the centre, falling from left to right. */
export class Arc implements OffsettableCurve {
  constructor(
    readonly centre: Point,
    readonly radius: number,
    readonly from: number,
    readonly to: number,
  ) {}

  private lastAngle: Angle | null = null;
  readonly hollowRadius = Infinity;
  readonly skyward = { from: Math.PI, to: 0 };

  highest(u0: number, u1: number): number {
    return clampBetween(Math.PI / 2, u0, u1);
  }

  at(u: number): Point {
    return { x: this.centre.x + this.radius * Math.cos(u), y: this.centre.y + this.radius * Math.sin(u) };
  }

  derivative(u: number): Point {
    return { x: -this.radius * Math.sin(u), y: this.radius * Math.cos(u) };
  }

  normal(u: number): Point {
    return { x: Math.cos(u), y: Math.sin(u) };
  }

  moments(u0: number, u1: number, origin: Point): Moments {
    return arcMoments(this.centre, this.radius, this.angle(u0), this.angle(u1), origin);
  }

  length(u0: number, u1: number): number {
    return this.radius * (u0 - u1);
  }

  parameterAtLength(length: number): number {
    return this.from - length / this.radius;
  }

  parameterAtX(x: number): number {
    return Math.acos(Math.min(1, Math.max(-1, (x - this.centre.x) / this.radius)));
  }

  edges(u0: number, u1: number): Edge[] {
    if (u0 === u1) return [];
    return [{ kind: 'arc', to: this.at(u1), centre: this.centre, radius: this.radius, from: u0, turn: u1 - u0 }];
  }

  offset({ atStart, rate }: ThicknessLaw): Curve {
    return rate === 0
      ? new Arc(this.centre, this.radius + atStart, this.from, this.to)
      : this.smooth().offsetBy(rate, (u) => atStart + rate * this.length(this.from, u));
  }

  part(u0: number, u1: number): Arc {
    return new Arc(this.centre, this.radius, u0, u1);
  }

  sheared(slope: number): OffsettableCurve {
    return slope === 0 ? this : this.smooth().sheared(slope);
  }

  /** A ring asks block after block: the angle at which one ends begins the next. */
  private angle(u: number): Angle {
    if (this.lastAngle?.angle !== u) this.lastAngle = angleOf(u);
    return this.lastAngle;
  }

  private smooth(): SmoothCurve {
    const { centre, radius } = this;
    return new SmoothCurve(this.from, this.to, (u) => {
      const x = radius * Math.cos(u);
      const y = radius * Math.sin(u);
      return { x: centre.x + x, y: centre.y + y, dx: -y, dy: x, ddx: -x, ddy: -y };
    });
  }
}
