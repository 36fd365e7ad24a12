/** What lies above the ring: wall or fill with its layers and openings, and the backing over the haunches. */
import { drawBacking } from './backing.ts';
import { put, type Draught } from './draught.ts';
import { polygon, polyline, rectangle, stroke } from './path.ts';
import type { Point } from '../geometry/point.ts';
import type { About, PathItem } from './scene.ts';

export function drawAbove(draught: Draught): void {
  if (draught.resolved.above.kind !== 'none') {
    drawBody(draught);
    drawLayers(draught);
    drawOpenings(draught);
  }
  drawBacking(draught);
}

function drawBody(draught: Draught): void {
  const { ring, sky, top, joints, mm } = draught;
  const about: About = { kind: 'field', path: 'above.height' };
  const topLeft = { x: sky.left.x, y: top.level };
  const topRight = { x: sky.right.x, y: top.level };
  // The ring is painted over the lower edge of this figure, so mid-ring is near enough for it.
  const midRing = joints.map((joint) => {
    const { intrados, extrados } = ring.joints[joint]!;
    return { x: (intrados.x + extrados.x) / 2, y: (intrados.y + extrados.y) / 2 };
  });
  put(draught, 'above', polygon('above', [sky.left, topLeft, topRight, sky.right, ...midRing.reverse()], about));
  putEdges(draught, [
    polyline('above-edge', [sky.left, topLeft]),
    polyline('above-edge', [sky.right, topRight]),
    top.broken ? breakLine(topLeft, topRight, mm) : stroke('above-edge', topLeft, topRight, about),
  ]);
}

function putEdges(draught: Draught, edges: readonly PathItem[]): void {
  for (const edge of edges) {
    put(draught, 'above', edge);
    draught.places.blockPath(edge);
  }
}

/** A level line with two zigzags: the wall goes on beyond the paper. */
function breakLine(from: Point, to: Point, mm: (millimetres: number) => number): PathItem {
  const points: [Point, ...Point[]] = [from];
  for (const share of [0.25, 0.75]) {
    const x = from.x + share * (to.x - from.x);
    points.push({ x: x - mm(1.5), y: from.y }, { x: x - mm(0.5), y: from.y + mm(2) });
    points.push({ x: x + mm(0.5), y: from.y - mm(2) }, { x: x + mm(1.5), y: from.y });
  }
  return polyline('above-edge', [...points, to]);
}

export interface DrawnLayer {
  readonly index: number;
  /** m */
  readonly bottom: number;
  readonly top: number;
}

export function drawnLayers({ resolved, top }: Draught): DrawnLayer[] {
  let level = top.level;
  return resolved.above.layers.map(({ thickness }, index) => {
    const bottom = level;
    level += thickness * top.layerScale;
    return { index, bottom, top: level };
  });
}

/** Layers drawn closer than this, paper mm, would be one line. */
const THINNEST_LAYER = 0.3;

function drawLayers(draught: Draught): void {
  const { sky, mm, top } = draught;
  const layers = drawnLayers(draught);
  if (layers.length === 0) return;
  const width = sky.right.x - sky.left.x;
  put(draught, 'above', rectangle('above', sky.left.x, top.level, width, top.surface - top.level));
  let last = top.level;
  const edges: PathItem[] = [
    stroke('above-edge', { x: sky.left.x, y: top.level }, { x: sky.left.x, y: top.surface }),
    stroke('above-edge', { x: sky.right.x, y: top.level }, { x: sky.right.x, y: top.surface }),
  ];
  for (const { index, top: y } of layers) {
    if (y - last < mm(THINNEST_LAYER) && index < layers.length - 1) continue;
    last = y;
    const about: About = { kind: 'field', path: `above.layers[${index}].thickness` };
    edges.push(stroke('above-edge', { x: sky.left.x, y }, { x: sky.right.x, y }, about));
  }
  putEdges(draught, edges);
}

/** Each opening as far as the drawn wall reaches, with the thin diagonals of a void. */
function drawOpenings(draught: Draught): void {
  const { resolved, top, places } = draught;
  resolved.above.openings.forEach(({ from, to, sill, head }, i) => {
    const lintel = Math.min(head, top.level);
    if (!(sill < lintel)) return;
    const about: About = { kind: 'field', path: `above.openings[${i}]` };
    const outline = { ...rectangle('opening', from, sill, to - from, lintel - sill), about };
    const diagonals = [
      stroke('opening-cross', { x: from, y: sill }, { x: to, y: lintel }),
      stroke('opening-cross', { x: from, y: lintel }, { x: to, y: sill }),
    ];
    put(draught, 'above', outline, ...diagonals);
    for (const path of [outline, ...diagonals]) places.blockPath(path);
  });
}
