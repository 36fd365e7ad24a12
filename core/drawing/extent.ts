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

export function boxOf(points: readonly Point[]): Box | null {
  if (points.length === 0) return null;
  let [left, bottom, right, top] = [Infinity, Infinity, -Infinity, -Infinity];
  for (const { x, y } of points) {
    left = Math.min(left, x);
    right = Math.max(right, x);
    bottom = Math.min(bottom, y);
    top = Math.max(top, y);
  }
  return { left, bottom, right, top };
}

/** Start, ends of edges, and the points where an arc reaches furthest. */
export function pathPoints(path: { readonly start: Point; readonly edges: readonly Edge[] }): Point[] {
  return [
    path.start,
    ...path.edges.flatMap((edge) => (edge.kind === 'line' ? [edge.to] : [...arcExtremes(edge), edge.to])),
  ];
}

function arcExtremes({ centre, radius, from, turn }: Extract<Edge, { kind: 'arc' }>): Point[] {
  const low = Math.min(from, from + turn);
  const high = Math.max(from, from + turn);
  const points: Point[] = [];
  for (let quarter = Math.ceil(low / (Math.PI / 2)); quarter * (Math.PI / 2) <= high; quarter++) {
    const angle = (quarter * Math.PI) / 2;
    points.push({ x: centre.x + radius * Math.cos(angle), y: centre.y + radius * Math.sin(angle) });
  }
  return points;
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
