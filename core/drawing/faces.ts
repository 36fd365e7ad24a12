/** The two faces of a ring as paths: block by block, and run together from springing to springing. */
import type { Edge } from '../geometry/curve.ts';
import type { Point } from '../geometry/point.ts';
import type { Outline } from '../geometry/ring-blocks.ts';
import type { RingGeometry } from '../geometry/ring.ts';

const samePoint = (a: Point, b: Point): boolean => a.x === b.x && a.y === b.y;

/** Where the outline of a block has gone along the soffit and turns up its right joint. */
function turning(ring: RingGeometry, block: number): { edges: readonly Edge[]; up: number } {
  const { edges } = ring.outline(block);
  const right = ring.joints[block + 1]!.extrados;
  return { edges, up: edges.findIndex((edge) => edge.kind === 'line' && samePoint(edge.to, right)) };
}

/** The soffit of one block, left to right. */
export function blockSoffit(ring: RingGeometry, block: number): Edge[] {
  const { edges, up } = turning(ring, block);
  return edges.slice(0, up);
}

/** The back of one block, left to right. */
export function blockBack(ring: RingGeometry, block: number): Edge[] {
  const { edges, up } = turning(ring, block);
  return reversed(ring.joints[block + 1]!.extrados, edges.slice(up + 1, -1));
}

/** The outline of the blocks between two joints taken as one body. */
export function bodyOutline(ring: RingGeometry, left: number, right: number): Outline {
  const blocks = Array.from({ length: right - left }, (_, i) => left + i);
  const start = ring.joints[left]!.intrados;
  const from = ring.joints[left]!.extrados;
  const to = ring.joints[right]!.extrados;
  const soffit = mergeArcs(blocks.flatMap((block) => blockSoffit(ring, block)));
  const back = mergeArcs(blocks.flatMap((block) => blockBack(ring, block)));
  return { start, edges: [...soffit, { kind: 'line', to }, ...reversed(from, back), { kind: 'line', to: start }] };
}

/** The same edges run the other way; `start` is where they began. */
function reversed(start: Point, edges: readonly Edge[]): Edge[] {
  return edges
    .map((edge, i): Edge => {
      const to = i === 0 ? start : edges[i - 1]!.to;
      return edge.kind === 'line'
        ? { kind: 'line', to }
        : { ...edge, to, from: edge.from + edge.turn, turn: -edge.turn };
    })
    .reverse();
}

/** Arcs that continue one another round the same centre become one. */
export function mergeArcs(edges: readonly Edge[]): Edge[] {
  const merged: Edge[] = [];
  for (const edge of edges) {
    const last = merged.at(-1);
    const continues =
      edge.kind === 'arc' &&
      last?.kind === 'arc' &&
      samePoint(edge.centre, last.centre) &&
      edge.radius === last.radius &&
      Math.sign(edge.turn) === Math.sign(last.turn);
    if (continues) merged[merged.length - 1] = { ...last, to: edge.to, turn: last.turn + edge.turn };
    else merged.push(edge);
  }
  return merged;
}

/** Numbers of the joints to draw so that they stand `closest` metres apart on average; first and last always. */
export function drawnJoints(ring: RingGeometry, closest: number): number[] {
  const last = ring.joints.length - 1;
  let length = 0;
  for (let k = 1; k <= last; k++) {
    const a = ring.joints[k - 1]!.intrados;
    const b = ring.joints[k]!.intrados;
    length += Math.hypot(b.x - a.x, b.y - a.y);
  }
  const step = Math.max(1, Math.ceil((closest * last) / length));
  const joints: number[] = [];
  for (let k = 0; k < last; k += step) joints.push(k);
  return [...joints, last];
}

/** Height of a face at x, m: its highest point there; null beside it. */
export function heightAt(path: { readonly start: Point; readonly edges: readonly Edge[] }, x: number): number | null {
  let from = path.start;
  let height: number | null = null;
  for (const edge of path.edges) {
    if ((from.x - x) * (edge.to.x - x) <= 0) {
      const y =
        edge.kind === 'line'
          ? lineHeight(from, edge.to, x)
          : edge.centre.y + Math.sqrt(Math.max(0, edge.radius ** 2 - (x - edge.centre.x) ** 2));
      height = Math.max(height ?? -Infinity, y);
    }
    from = edge.to;
  }
  return height;
}

function lineHeight(a: Point, b: Point, x: number): number {
  return a.x === b.x ? Math.max(a.y, b.y) : a.y + ((x - a.x) / (b.x - a.x)) * (b.y - a.y);
}
