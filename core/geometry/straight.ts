import type { Curve, Edge } from './curve.ts';
import { lineMoments, type Moments } from './moments.ts';
import { between, distance, type Point } from './point.ts';

/** A straight face from a to b; its parameter is the share of the way. */
export class Straight implements Curve {
  readonly from = 0;
  readonly to = 1;
  readonly skyward = { from: -Infinity, to: Infinity };

  constructor(
    private readonly a: Point,
    private readonly b: Point,
  ) {}

  highest(u0: number, u1: number): number {
    if (this.a.y === this.b.y) return (u0 + u1) / 2;
    return this.at(u0).y > this.at(u1).y ? u0 : u1;
  }

  at(u: number): Point {
    return between(this.a, this.b, u);
  }

  derivative(): Point {
    return { x: this.b.x - this.a.x, y: this.b.y - this.a.y };
  }

  moments(u0: number, u1: number, origin: Point): Moments {
    return lineMoments(this.at(u0), this.at(u1), origin);
  }

  length(u0: number, u1: number): number {
    return distance(this.a, this.b) * (u1 - u0);
  }

  parameterAtLength(length: number): number {
    return length / distance(this.a, this.b);
  }

  parameterAtX(x: number): number {
    return (x - this.a.x) / (this.b.x - this.a.x);
  }

  edges(u0: number, u1: number): Edge[] {
    return u0 === u1 ? [] : [{ kind: 'line', to: this.at(u1) }];
  }
}
