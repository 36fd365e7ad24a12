/** States of the ring that are chosen rather than found: between least and greatest thrust, or through given places. */
import { momentAbout, type RingSystem } from './system.ts';
import type { State } from './line.ts';

/** A place that the line is to pass: a joint and the share of the way from its intrados to its extrados. */
export interface Passage {
  readonly joint: number;
  readonly share: number;
}

/** The state whose resultant passes three places; null when those three stand in one line. */
export function stateThrough(system: RingSystem, passages: readonly [Passage, Passage, Passage]): Float64Array | null {
  const [p, q, r] = passages.map(({ joint: j, share }) => {
    const px = (system.ix[j] as number) + share * ((system.ex[j] as number) - (system.ix[j] as number));
    const py = (system.iy[j] as number) + share * ((system.ey[j] as number) - (system.iy[j] as number));
    return { px, py, moment: -momentAbout(system.sums, j, px, py) };
  }) as [Row, Row, Row];
  // py·X − px·Y + M = moment at each place; subtracting the first removes M
  const a = q.py - p.py;
  const b = -(q.px - p.px);
  const c = r.py - p.py;
  const d = -(r.px - p.px);
  const determinant = a * d - b * c;
  if (Math.abs(determinant) < IN_ONE_LINE) return null;
  const e = q.moment - p.moment;
  const f = r.moment - p.moment;
  const x = (e * d - b * f) / determinant;
  const y = (a * f - e * c) / determinant;
  return Float64Array.of(x, y, p.moment - p.py * x + p.px * y);
}

interface Row {
  readonly px: number;
  readonly py: number;
  readonly moment: number;
}

/** Twice the area of the triangle of three places, in widths squared, under which they count as one line. */
const IN_ONE_LINE = 1e-12;

/** The state a share of the way from one to another; where both lines fit in the ring, so does every one between. */
export const stateBetween = (from: State, to: State, share: number): Float64Array =>
  Float64Array.from({ length: 3 }, (_, k) => (from[k] as number) + share * ((to[k] as number) - (from[k] as number)));
