import { clampBetween } from './clamp.ts';
import type { Curve, Edge, OffsettableCurve, ThicknessLaw } from './curve.ts';
import type { Moments } from './moments.ts';
import type { Point } from './point.ts';
import { FOUR_POINTS, SIX_POINTS, TEN_POINTS, type GaussRule } from './quadrature.ts';

/** A point of a curve with its first and second derivatives by the parameter. */
export interface Jet {
  readonly x: number;
  readonly y: number;
  readonly dx: number;
  readonly dy: number;
  readonly ddx: number;
  readonly ddy: number;
}

/**
 * Stretches of equal parameter, one after the other from `start`; within each the curve has all its derivatives and turns
 * little. They stay where they are when only a part of the curve is taken.
 */
export interface Spans {
  readonly start: number;
  readonly step: number;
}

/** Chords in which a curve is drawn for a quarter turn of its direction: the sagitta stays under 1/3000 of the radius. */
const CHORDS_PER_QUARTER_TURN = 32;
/** Spans of quadrature over a whole face of an arch; ten Gauss points in each leave rounding as the only error. */
const SPANS_OF_A_FACE = 8;
const NEWTON_STEPS = 60;
/** Halvings that take any bracket below the rounding of its ends. */
const HALVINGS = 60;
/** Share of a span by which rounding may miss its end. */
const ON_SPAN_END = 1e-9;
/** Places looked at in each span before a highest or sharpest place is closed in on. */
const LOOKS_PER_SPAN = 8;

/** A curve given by its point and two derivatives; integrals by Gauss–Legendre, inverse questions by safeguarded Newton. */
export class SmoothCurve implements OffsettableCurve {
  private lengthTable: Float64Array | null = null;
  /** Rings of many thicknesses are tried on one soffit; its joints stay where they are. */
  private readonly lengthsFound = new Map<number, number>();
  private readonly spans: Spans;

  /** @param spans where the curve is cut for quadrature; eighths of it where nothing is said. */
  constructor(
    readonly from: number,
    readonly to: number,
    private readonly jet: (u: number) => Jet,
    spans?: Spans,
  ) {
    this.spans = spans ?? { start: from, step: (to - from) / SPANS_OF_A_FACE };
  }

  get hollowRadius(): number {
    let least = Infinity;
    const looks = this.partsOf(this.from, this.to) * LOOKS_PER_SPAN;
    for (let i = 0; i <= looks; i++) {
      const { dx, dy, ddx, ddy } = this.jet(this.from + ((this.to - this.from) * i) / looks);
      const bend = (dx * ddy - dy * ddx) * this.direction;
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
    const { dx, dy } = this.jet(u);
    const speed = this.direction * Math.hypot(dx, dy);
    return { x: -dy / speed, y: dx / speed };
  }

  moments(u0: number, u1: number, origin: Point): Moments {
    let area = 0;
    let sx = 0;
    let sy = 0;
    for (let a = u0; a !== u1;) {
      const b = this.withinSpan(a, u1);
      const rule = this.ruleFor(b - a);
      const half = (b - a) / 2;
      for (let i = 0; i < rule.points; i++) {
        const { x, y, dx, dy } = this.jet(a + half + half * (rule.nodes[i] as number));
        const weight = half * (rule.weights[i] as number);
        const px = x - origin.x;
        const py = y - origin.y;
        area += (weight * (px * dy - py * dx)) / 2;
        sx += (weight * px * px * dy) / 2;
        sy -= (weight * py * py * dx) / 2;
      }
      a = b;
    }
    return { area, sx, sy };
  }

  length(u0: number, u1: number): number {
    return Math.abs(this.lengthTo(u1) - this.lengthTo(u0));
  }

  parameterAtLength(length: number): number {
    const held = this.lengthsFound.get(length);
    if (held !== undefined) return held;
    const found = this.root(
      (u) => this.lengthTo(u) - length,
      (u) => {
        const { dx, dy } = this.jet(u);
        return this.direction * Math.sqrt(dx * dx + dy * dy);
      },
    );
    this.lengthsFound.set(length, found);
    return found;
  }

  parameterAtX(x: number): number {
    const u = this.root(
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
    const { atStart, rate } = thickness;
    return this.offsetBy(rate, rate === 0 ? () => atStart : (u) => atStart + rate * this.lengthTo(u));
  }

  /** The offset curve for a thickness given at each u, changing by `rate` for each metre along this curve. */
  offsetBy(rate: number, thicknessAt: (u: number) => number): SmoothCurve {
    const offsetJet = (u: number): Jet => {
      const { x, y, dx, dy, ddx, ddy } = this.jet(u);
      const speed = this.direction * Math.hypot(dx, dy);
      const nx = -dy / speed;
      const ny = dx / speed;
      // the normal turns with the tangent: dn/du = −(bend / speed²) · (dx, dy) / speed
      const bend = (dx * ddy - dy * ddx) / (speed * speed);
      const t = thicknessAt(u);
      const dt = rate * speed;
      return {
        x: x + t * nx,
        y: y + t * ny,
        dx: dx + dt * nx - (t * bend * dx) / speed,
        dy: dy + dt * ny - (t * bend * dy) / speed,
        // an offset is never offset again, so its second derivative is not needed
        ddx: 0,
        ddy: 0,
      };
    };
    return new SmoothCurve(this.from, this.to, offsetJet, this.spans);
  }

  part(u0: number, u1: number): SmoothCurve {
    return new SmoothCurve(u0, u1, this.jet, this.spans);
  }

  sheared(slope: number): SmoothCurve {
    const shearedJet = (u: number): Jet => {
      const { x, y, dx, dy, ddx, ddy } = this.jet(u);
      return { x, y: y + slope * x, dx, dy: dy + slope * dx, ddx, ddy: ddy + slope * ddx };
    };
    return new SmoothCurve(this.from, this.to, shearedJet, this.spans);
  }

  highest(u0: number, u1: number): number {
    const looks = LOOKS_PER_SPAN * this.partsOf(u0, u1);
    let best = u0;
    let bestY = this.at(u0).y;
    for (let i = 1; i <= looks; i++) {
      const u = u0 + ((u1 - u0) * i) / looks;
      const { y } = this.at(u);
      if (y > bestY) [best, bestY] = [u, y];
    }
    const stride = (u1 - u0) / looks;
    const climbing = (u: number): boolean => this.jet(u).dy * this.direction > 0;
    const before = clampBetween(best - stride, u0, u1);
    const after = clampBetween(best + stride, u0, u1);
    return climbing(before) && !climbing(after) ? lastWhere(climbing, before, after) : best;
  }

  private get direction(): number {
    return Math.sign(this.to - this.from);
  }

  /** From the middle, which faces the sky, towards an end: without bound, or to where the curve turns under itself. */
  private lastSkyward(middle: number, end: number): number {
    const faces = (u: number): boolean => this.jet(u).dx * this.direction >= 0;
    return faces(end) ? Math.sign(end - middle) * Infinity : lastWhere(faces, middle, end);
  }

  /** Length from the start to u; negative before the start, where a face carried on past its end may lie. */
  private lengthTo(u: number): number {
    const table = (this.lengthTable ??= this.makeLengthTable());
    const first = this.spanOf(this.from);
    const index = Math.min(table.length - 1, Math.max(0, this.spanOf(u) - first));
    return (table[index] as number) + this.stretchLength(this.spanStart(first + index), u);
  }

  /** Length from the start to the beginning of each span that the curve enters. */
  private makeLengthTable(): Float64Array {
    const first = this.spanOf(this.from);
    const count = Math.max(1, Math.ceil((this.to - this.spans.start) / this.spans.step - ON_SPAN_END) - first);
    const table = new Float64Array(count);
    for (let i = 1; i < count; i++) {
      table[i] =
        (table[i - 1] as number) + this.stretchLength(this.spanStart(first + i - 1), this.spanStart(first + i));
    }
    return table;
  }

  private spanOf(u: number): number {
    return Math.floor((u - this.spans.start) / this.spans.step + ON_SPAN_END);
  }

  /** Where a span begins within the curve: its own beginning, or the curve's. */
  private spanStart(index: number): number {
    const start = this.spans.start + index * this.spans.step;
    return (start - this.from) * this.direction > 0 ? start : this.from;
  }

  /** Length of a stretch no longer than a span, negative when it runs against the curve. */
  private stretchLength(u0: number, u1: number): number {
    const rule = this.ruleFor(u1 - u0);
    const middle = (u0 + u1) / 2;
    const half = (u1 - u0) / 2;
    let length = 0;
    for (let i = 0; i < rule.points; i++) {
      const { dx, dy } = this.jet(middle + half * (rule.nodes[i] as number));
      length += (rule.weights[i] as number) * Math.sqrt(dx * dx + dy * dy);
    }
    return this.direction * half * length;
  }

  /** How many spans' worth of parameter lies between two places, one at least. */
  private partsOf(u0: number, u1: number): number {
    return Math.max(1, Math.ceil(Math.abs((u1 - u0) / this.spans.step) - ON_SPAN_END));
  }

  /** From `a` towards `b`: `b` itself, or the nearest end of a span on the way. */
  private withinSpan(a: number, b: number): number {
    const { start, step } = this.spans;
    const here = (a - start) / step;
    const there = (b - start) / step;
    const next = there > here ? Math.floor(here + ON_SPAN_END) + 1 : Math.ceil(here - ON_SPAN_END) - 1;
    const onTheWay = there > here ? next < there - ON_SPAN_END : next > there + ON_SPAN_END;
    return onTheWay ? start + next * step : b;
  }

  private ruleFor(stretch: number): GaussRule {
    const share = Math.abs(stretch / this.spans.step);
    return share <= 1 / 6 ? FOUR_POINTS : share <= 1 / 2 ? SIX_POINTS : TEN_POINTS;
  }

  /** Where a function that rises through zero once along the curve is zero, or the end beyond which it is. */
  root(value: (u: number) => number, slope: (u: number) => number): number {
    let low = this.from;
    let high = this.to;
    const atLow = value(low);
    const atHigh = value(high);
    if (atLow >= 0) return low;
    if (atHigh <= 0) return high;
    let u = low + (high - low) * (atLow / (atLow - atHigh));
    for (let step = 0; step < NEWTON_STEPS; step++) {
      const f = value(u);
      if (f === 0) return u;
      if (f < 0) low = u;
      else high = u;
      const next = u - f / slope(u);
      const inside = (next - low) * (next - high) < 0;
      const chosen = inside ? next : (low + high) / 2;
      if (Math.abs(chosen - u) <= 2 * Number.EPSILON * Math.abs(this.to - this.from)) return chosen;
      u = chosen;
    }
    return u;
  }
}

/** Between a place where `holds` is true and one where it is not: the last parameter at which it still is, by halving. */
function lastWhere(holds: (u: number) => boolean, yes: number, no: number): number {
  for (let step = 0; step < HALVINGS; step++) {
    const u = (yes + no) / 2;
    if (holds(u)) yes = u;
    else no = u;
  }
  return yes;
}
