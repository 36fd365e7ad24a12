/** What a scene shows at a place: the item nearest the eye that stands for something. */
import type { Edge } from '../../core/geometry/curve.ts';
import type { Point } from '../../core/geometry/point.ts';
import { textCorners } from '../../core/drawing/extent.ts';
import type { PathItem, Scene, SceneItem, TextItem } from '../../core/drawing/scene.ts';

/**
 * The front-most item with an `about` within `tolerance` metres of `at`; null when there is none. Lettering comes
 * before lines, since it is what a person aims at.
 */
export function itemAt(scene: Scene, at: Point, tolerance: number): SceneItem | null {
  const items = scene.layers.flatMap((layer) => layer.items).filter((item) => item.about !== undefined);
  items.reverse();
  const texts = items.filter((item) => item.kind === 'text');
  return (
    texts.find((text) => isInText(text, scene.millimetresPerUnit, at, tolerance / 2)) ??
    items.find((item) => item.kind === 'path' && isOnPath(item, at, tolerance)) ??
    items.find((item) => item.kind === 'path' && item.closed && isInside(cornersOf(item), at)) ??
    null
  );
}

function isInText(text: TextItem, millimetresPerUnit: number, at: Point, margin: number): boolean {
  const corners = textCorners(text, millimetresPerUnit);
  return isInside(corners, at) || distanceToLine([...corners, corners[0]], at) <= margin;
}

function isOnPath(path: PathItem, at: Point, tolerance: number): boolean {
  return distanceToLine(cornersOf(path), at) <= tolerance;
}

/** Parts of a turn to a straight line: enough that a finger cannot tell. */
const ARC_STEP = Math.PI / 32;

function cornersOf(path: PathItem): Point[] {
  return [path.start, ...path.edges.flatMap(pointsOf)];
}

function pointsOf(edge: Edge): Point[] {
  if (edge.kind === 'line') return [edge.to];
  const parts = Math.max(1, Math.ceil(Math.abs(edge.turn) / ARC_STEP));
  return Array.from({ length: parts }, (_, i) => {
    const angle = edge.from + (edge.turn * (i + 1)) / parts;
    return { x: edge.centre.x + edge.radius * Math.cos(angle), y: edge.centre.y + edge.radius * Math.sin(angle) };
  });
}

function distanceToLine(points: readonly Point[], at: Point): number {
  let least = Infinity;
  for (let i = 1; i < points.length; i++) least = Math.min(least, distanceToStretch(points[i - 1]!, points[i]!, at));
  return least;
}

function distanceToStretch(a: Point, b: Point, at: Point): number {
  const dx = b.x - a.x;
  const dy = b.y - a.y;
  const squared = dx * dx + dy * dy;
  const share = squared === 0 ? 0 : Math.min(1, Math.max(0, ((at.x - a.x) * dx + (at.y - a.y) * dy) / squared));
  return Math.hypot(at.x - a.x - share * dx, at.y - a.y - share * dy);
}

/** Even-odd: whether a ray to the right crosses the figure's edges an odd number of times. */
function isInside(points: readonly Point[], { x, y }: Point): boolean {
  let inside = false;
  for (let i = 0, j = points.length - 1; i < points.length; j = i++) {
    const a = points[i]!;
    const b = points[j]!;
    if (a.y > y !== b.y > y && x < ((b.x - a.x) * (y - a.y)) / (b.y - a.y) + a.x) inside = !inside;
  }
  return inside;
}
