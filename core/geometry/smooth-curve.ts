import type { Curve, Edge, OffsettableCurve, ThicknessLaw } from './curve.ts';
import type { Moments } from './moments.ts';
import type { Point } from './point.ts';
import { eachGaussPoint } from './quadrature.ts';

/** A point of a curve with its first and second derivatives by the parameter. */
export interface Jet {
  readonly x: number;
  readonly y: number;
  readonly dx: number;
  readonly dy: number;
  readonly ddx: number;
  readonly ddy: number;
}

/** Chords in which a curve is drawn for a quarter turn of its direction: the sagitta stays under 1/3000 of the radius. */
const CHORDS_PER_QUARTER_TURN = 32;
/** Spans of quadrature over a whole curve; ten Gauss points in each leave rounding as the only error for arches. */
const SPANS = 8;
const NEWTON_STEPS = 60;
/** Halvings that take any bracket below the rounding of its ends. */
const HALVINGS = 60;
/** Places looked at before a highest point is closed in on. */
const SCAN = 64;

const clampBetween = (u: number, a: number, b: number): number =>
  Math.min(Math.max(u, Math.min(a, b)), Math.max(a, b));

/** Between a place where `holds` is true and one where it is not: the last parameter at which it still is, by halving. */
function lastWhere(holds: (u: number) => boolean, yes: number, no: number): number {
  for (let step = 0; step < HALVINGS; step++) {
    const u = (yes + no) / 2;
    if (holds(u)) yes = u;
    else no = u;
  }
  return yes;
}

/** A curve given by its point and two derivatives; integrals by Gauss–Legendre, inverse questions by safeguarded Newton. */
export class SmoothCurve implements OffsettableCurve {
  constructor(
    readonly from: number,
    readonly to: number,
    private readonly jet: (u: number) => Jet,
  ) {}

  get hollowRadius(): number {
    let least = Infinity;
    for (let i = 0; i <= SCAN; i++) {
      const { dx, dy, ddx, ddy } = this.jet(this.from + ((this.to - this.from) * i) / SCAN);
      const bend = (dx * ddy - dy * ddx) * Math.sign(this.to - this.from);
      if (bend > 0) least = Math.min(least, Math.hypot(dx, dy) ** 3 / bend);
    }
    return least;
  }

  get skyward(): { from: number; to: number } {
    const middle = (this.from + this.to) / 2;
    return { from: this.lastSkyward(middle, this.from), to: this.lastSkyward(middle, this.to) };
  }

  at(u: number): Point {
    const { x, y } = this.jet(u);
    return { x, y };
  }

  derivative(u: number): Point {
    const { dx, dy } = this.jet(u);
    return { x: dx, y: dy };
  }

  normal(u: number): Point {
    const direction = Math.sign(this.to - this.from);
    const { dx, dy } = this.jet(u);
    const speed = direction * Math.hypot(dx, dy);
    return { x: -dy / speed, y: dx / speed };
  }

  moments(u0: number, u1: number, origin: Point): Moments {
    let area = 0;
    let sx = 0;
    let sy = 0;
    this.eachSpan(u0, u1, (a, b) => {
      eachGaussPoint(a, b, (u, weight) => {
        const { x, y, dx, dy } = this.jet(u);
        const px = x - origin.x;
        const py = y - origin.y;
        area += (weight * (px * dy - py * dx)) / 2;
        sx += (weight * px * px * dy) / 2;
        sy -= (weight * py * py * dx) / 2;
      });
    });
    return { area, sx, sy };
  }

  length(u0: number, u1: number): number {
    let length = 0;
    this.eachSpan(u0, u1, (a, b) => {
      eachGaussPoint(a, b, (u, weight) => {
        const { dx, dy } = this.jet(u);
        length += Math.abs(weight) * Math.hypot(dx, dy);
      });
    });
    return length;
  }

  parameterAtLength(length: number): number {
    return this.solve(
      (u) => this.length(this.from, u) - length,
      (u) => {
        const { dx, dy } = this.jet(u);
        return Math.sign(this.to - this.from) * Math.hypot(dx, dy);
      },
    );
  }

  parameterAtX(x: number): number {
    const u = this.solve(
      (v) => this.jet(v).x - x,
      (v) => this.jet(v).dx,
    );
    // beyond an end, where a face is carried on to meet its neighbour, Newton needs no bracket: it is short and smooth
    let beyond = u;
    for (let step = 0; step < 8 && (u === this.from || u === this.to); step++) {
      const { x: at, dx } = this.jet(beyond);
      if (at === x || dx === 0) break;
      beyond -= (at - x) / dx;
    }
    return Number.isFinite(beyond) ? beyond : u;
  }

  edges(u0: number, u1: number): Edge[] {
    if (u0 === u1) return [];
    const { x: ax, y: ay } = this.normal(u0);
    const { x: bx, y: by } = this.normal(u1);
    const turn = Math.abs(Math.atan2(ax * by - ay * bx, ax * bx + ay * by));
    const count = Math.max(1, Math.ceil((turn / (Math.PI / 2)) * CHORDS_PER_QUARTER_TURN));
    return Array.from({ length: count }, (_, i) => ({
      kind: 'line' as const,
      to: this.at(u0 + ((u1 - u0) * (i + 1)) / count),
    }));
  }

  offset(thickness: ThicknessLaw): Curve {
    const direction = Math.sign(this.to - this.from);
    return new SmoothCurve(this.from, this.to, (u) => {
      const { x, y, dx, dy, ddx, ddy } = this.jet(u);
      const speed = direction * Math.hypot(dx, dy);
      const nx = -dy / speed;
      const ny = dx / speed;
      // the normal turns with the tangent: dn/du = −(bend / speed²) · (dx, dy) / speed
      const bend = (dx * ddy - dy * ddx) / (speed * speed);
      const t = thickness.atStart + (thickness.rate === 0 ? 0 : thickness.rate * this.lengthTo(u));
      const dt = thickness.rate * speed;
      return {
        x: x + t * nx,
        y: y + t * ny,
        dx: dx + dt * nx - (t * bend * dx) / speed,
        dy: dy + dt * ny - (t * bend * dy) / speed,
        // an offset is never offset again, so its second derivative is not needed
        ddx: 0,
        ddy: 0,
      };
    });
  }

  part(u0: number, u1: number): SmoothCurve {
    return new SmoothCurve(u0, u1, this.jet);
  }

  sheared(slope: number): SmoothCurve {
    return new SmoothCurve(this.from, this.to, (u) => {
      const { x, y, dx, dy, ddx, ddy } = this.jet(u);
      return { x, y: y + slope * x, dx, dy: dy + slope * dx, ddx, ddy: ddy + slope * ddx };
    });
  }

  highest(u0: number, u1: number): number {
    let best = u0;
    let bestY = this.at(u0).y;
    for (let i = 1; i <= SCAN; i++) {
      const u = u0 + ((u1 - u0) * i) / SCAN;
      const { y } = this.at(u);
      if (y > bestY) [best, bestY] = [u, y];
    }
    const stride = (u1 - u0) / SCAN;
    const climbing = (u: number): boolean => this.jet(u).dy * (this.to - this.from) > 0;
    const before = clampBetween(best - stride, u0, u1);
    const after = clampBetween(best + stride, u0, u1);
    return climbing(before) && !climbing(after) ? lastWhere(climbing, before, after) : best;
  }

  /** From the middle, which faces the sky, towards an end: without bound, or to where the curve turns under itself. */
  private lastSkyward(middle: number, end: number): number {
    const faces = (u: number): boolean => this.jet(u).dx * (this.to - this.from) >= 0;
    return faces(end) ? Math.sign(end - middle) * Infinity : lastWhere(faces, middle, end);
  }

  /** Length from the start to u; negative before the start, where a face carried on past its end may lie. */
  private lengthTo(u: number): number {
    return Math.sign((u - this.from) * (this.to - this.from)) * this.length(this.from, u);
  }

  /** Cuts a stretch so that no span of quadrature is longer than an eighth of the curve. */
  private eachSpan(u0: number, u1: number, visit: (a: number, b: number) => void): void {
    const count = Math.max(1, Math.ceil((SPANS * Math.abs(u1 - u0)) / Math.abs(this.to - this.from)));
    for (let i = 0; i < count; i++) {
      visit(u0 + ((u1 - u0) * i) / count, u0 + ((u1 - u0) * (i + 1)) / count);
    }
  }

  /** Root of a function that changes sign once along the curve: Newton, and halving where Newton leaves the bracket. */
  private solve(value: (u: number) => number, slope: (u: number) => number): number {
    let low = this.from;
    let high = this.to;
    if (value(low) >= 0) return low;
    if (value(high) <= 0) return high;
    let u = (low + high) / 2;
    for (let step = 0; step < NEWTON_STEPS; step++) {
      const f = value(u);
      if (f === 0) return u;
      if (f < 0) low = u;
      else high = u;
      const next = u - f / slope(u);
      const inside = (next - low) * (next - high) < 0;
      const chosen = inside ? next : (low + high) / 2;
      if (Math.abs(chosen - u) <= Number.EPSILON * Math.abs(this.to - this.from)) return chosen;
      u = chosen;
    }
    return u;
  }
}
