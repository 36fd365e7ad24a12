/** Rigid movements of finite size: a turn about the origin, then a shift. */
import type { Edge } from './curve.ts';
import type { Point } from './point.ts';

/** Every point p goes to R p + (dx, dy), with R the turn whose cosine and sine stand here. Metres. */
export interface Placement {
  readonly cos: number;
  readonly sin: number;
  readonly dx: number;
  readonly dy: number;
}

export const AT_REST: Placement = { cos: 1, sin: 0, dx: 0, dy: 0 };

/** A turn by `angle` radians, anticlockwise, that takes `from` to `to`. */
export function turnTaking(angle: number, from: Point, to: Point): Placement {
  const cos = Math.cos(angle);
  const sin = Math.sin(angle);
  return { cos, sin, dx: to.x - (cos * from.x - sin * from.y), dy: to.y - (sin * from.x + cos * from.y) };
}

export const placed = ({ cos, sin, dx, dy }: Placement, { x, y }: Point): Point => ({
  x: cos * x - sin * y + dx,
  y: sin * x + cos * y + dy,
});

/** First the one, then the other. */
export function afterwards(first: Placement, then: Placement): Placement {
  const { x, y } = placed(then, { x: first.dx, y: first.dy });
  return {
    cos: then.cos * first.cos - then.sin * first.sin,
    sin: then.sin * first.cos + then.cos * first.sin,
    dx: x,
    dy: y,
  };
}

/** Radians, between −π and π. */
export const turnOf = ({ cos, sin }: Placement): number => Math.atan2(sin, cos);

/** A path of lines and arcs as a rigid body takes it along. */
export function placedPath<Path extends { readonly start: Point; readonly edges: readonly Edge[] }>(
  placement: Placement,
  path: Path,
): Path {
  if (placement === AT_REST) return path;
  const turn = turnOf(placement);
  return {
    ...path,
    start: placed(placement, path.start),
    edges: path.edges.map((edge): Edge => {
      const to = placed(placement, edge.to);
      return edge.kind === 'line'
        ? { kind: 'line', to }
        : { ...edge, to, centre: placed(placement, edge.centre), from: edge.from + turn };
    }),
  };
}
