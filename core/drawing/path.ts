/** Small figures that drawings are made of, as paths of lines and arcs in the scene's units. */
import type { Edge } from '../geometry/curve.ts';
import type { Outline } from '../geometry/ring-blocks.ts';
import type { Point } from '../geometry/point.ts';
import type { About, Align, Lettering, PathItem, SceneItem, TextItem } from './scene.ts';
import type { Role } from './style.ts';
import { plainText, type Face } from './text.ts';

export const linesTo = (points: readonly Point[]): Edge[] => points.map((to) => ({ kind: 'line', to }));

/** An open line through points; at least one. */
export function polyline(role: Role, points: readonly [Point, ...Point[]], about?: About): PathItem {
  const [start, ...rest] = points;
  return { kind: 'path', role, start, edges: linesTo(rest), closed: false, about };
}

/** A closed figure with straight sides; the way back to the first point is drawn too. */
export function polygon(role: Role, points: readonly [Point, ...Point[]], about?: About): PathItem {
  const [start, ...rest] = points;
  return { kind: 'path', role, start, edges: linesTo([...rest, start]), closed: true, about };
}

export function outlined(role: Role, outline: Outline, about?: About): PathItem {
  return { kind: 'path', role, start: outline.start, edges: outline.edges, closed: true, about };
}

/** A straight line between two points. */
export const stroke = (role: Role, from: Point, to: Point, about?: About): PathItem =>
  polyline(role, [from, to], about);

export function circle(role: Role, centre: Point, radius: number, about?: About): PathItem {
  const left = { x: centre.x - radius, y: centre.y };
  const right = { x: centre.x + radius, y: centre.y };
  return {
    kind: 'path',
    role,
    start: right,
    edges: [
      { kind: 'arc', to: left, centre, radius, from: 0, turn: Math.PI },
      { kind: 'arc', to: right, centre, radius, from: Math.PI, turn: Math.PI },
    ],
    closed: true,
    about,
  };
}

export function rectangle(role: Role, left: number, bottom: number, width: number, height: number): PathItem {
  return polygon(role, [
    { x: left, y: bottom },
    { x: left + width, y: bottom },
    { x: left + width, y: bottom + height },
    { x: left, y: bottom + height },
  ]);
}

/** From `point`, `length` along the direction `angle` and `aside` to its left. */
export function along(point: Point, angle: number, length: number, aside = 0): Point {
  const cos = Math.cos(angle);
  const sin = Math.sin(angle);
  return { x: point.x + length * cos - aside * sin, y: point.y + length * sin + aside * cos };
}

/** An arrowhead with its point at `tip`, pointing in the direction `angle`; `slender` times as long as it is wide. */
export function arrowhead(role: Role, tip: Point, angle: number, length: number, about?: About, slender = 3): PathItem {
  const half = length / (2 * slender);
  return polygon(role, [tip, along(tip, angle, -length, half), along(tip, angle, -length, -half)], about);
}

export interface LetteringStyle {
  readonly height?: Lettering;
  readonly face?: Face;
  readonly align?: Align;
  readonly angle?: number;
  readonly role?: Role;
  readonly about?: About | undefined;
}

/** One line of lettering, made plain and inert. */
export function lettering(text: string, at: Point, how: LetteringStyle = {}): TextItem {
  const { height = 2.5, face = 'regular', align = 'start', angle = 0, role = 'text', about } = how;
  return { kind: 'text', role, text: plainText(text), at, align, height, face, angle, about };
}

/** The same item elsewhere. */
export function shifted(item: SceneItem, by: Point): SceneItem {
  const move = ({ x, y }: Point): Point => ({ x: x + by.x, y: y + by.y });
  if (item.kind === 'text') return { ...item, at: move(item.at) };
  const edges = item.edges.map((edge) =>
    edge.kind === 'line' ? { ...edge, to: move(edge.to) } : { ...edge, to: move(edge.to), centre: move(edge.centre) },
  );
  return { ...item, start: move(item.start), edges };
}
