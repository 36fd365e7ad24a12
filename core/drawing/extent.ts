/** How far drawn things reach: boxes of paths with true arcs, and the four corners of a line of lettering. */
import type { Edge } from '../geometry/curve.ts';
import type { Point } from '../geometry/point.ts';
import { ASCENT, descentOf, emOf, textWidth, type Face } from './text.ts';

export interface Box {
  readonly left: number;
  readonly bottom: number;
  readonly right: number;
  readonly top: number;
}

/** Grows round point after point. */
export class Extent {
  private left = Infinity;
  private bottom = Infinity;
  private right = -Infinity;
  private top = -Infinity;

  add({ x, y }: Point): void {
    if (x < this.left) this.left = x;
    if (x > this.right) this.right = x;
    if (y < this.bottom) this.bottom = y;
    if (y > this.top) this.top = y;
  }

  /** Null while there is nothing in it. */
  box(): Box | null {
    const { left, bottom, right, top } = this;
    return left <= right ? { left, bottom, right, top } : null;
  }
}

export function boxOf(points: readonly Point[]): Box | null {
  const extent = new Extent();
  for (const point of points) extent.add(point);
  return extent.box();
}

/** Start, ends of edges, and the points where an arc reaches furthest. */
export function pathPoints(path: { readonly start: Point; readonly edges: readonly Edge[] }): Point[] {
  const points = [path.start];
  for (const edge of path.edges) {
    if (edge.kind === 'arc') addArcExtremes(points, edge);
    points.push(edge.to);
  }
  return points;
}

const QUARTER = Math.PI / 2;

function addArcExtremes(points: Point[], { centre, radius, from, turn }: Extract<Edge, { kind: 'arc' }>): void {
  const high = Math.max(from, from + turn);
  for (let quarter = Math.ceil(Math.min(from, from + turn) / QUARTER); quarter * QUARTER <= high; quarter++) {
    const angle = quarter * QUARTER;
    points.push({ x: centre.x + radius * Math.cos(angle), y: centre.y + radius * Math.sin(angle) });
  }
}

export interface Lettered {
  readonly text: string;
  readonly at: Point;
  readonly align: 'start' | 'middle' | 'end';
  readonly height: number;
  readonly face: Face;
  readonly angle: number;
}

/** Share of the text's length that lies left of the point it hangs from. */
const ALIGNED = { start: 0, middle: 0.5, end: 1 } as const;

/** Corners of the ink of a line of text, from its lower left anticlockwise, in the scene's units. */
export function textCorners(text: Lettered, millimetresPerUnit: number): [Point, Point, Point, Point] {
  const em = emOf(text.height) / millimetresPerUnit;
  const length = textWidth(text.text, text.height, text.face) / millimetresPerUnit;
  const low = -descentOf(text.text) * em;
  const start = -ALIGNED[text.align] * length;
  const cos = Math.cos(text.angle);
  const sin = Math.sin(text.angle);
  const corner = (along: number, up: number): Point => ({
    x: text.at.x + along * cos - up * sin,
    y: text.at.y + along * sin + up * cos,
  });
  return [
    corner(start, low),
    corner(start + length, low),
    corner(start + length, ASCENT * em),
    corner(start, ASCENT * em),
  ];
}
