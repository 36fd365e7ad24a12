/**
 * Backing over the haunches, up to its level and out to the plumb line over the springings. As mere weight it is
 * hatched with broken lines; counted as masonry it shows its bond, and the joints that are taken on through it.
 */
import { distance, type Point } from '../geometry/point.ts';
import { put, type Draught } from './draught.ts';
import { hatchLines } from './hatch.ts';
import { polygon, polyline, stroke } from './path.ts';
import type { About } from './scene.ts';

const ABOUT: About = { kind: 'field', path: 'backing.level' };

/** Paper mm; coarser where the screen is near, so that there are never more than these lines. */
const HATCH_GAP = 2;
const COURSE = 2.6;
const BRICK = 6.5;
const MOST_LINES = 80;

export function drawBacking(draught: Draught): void {
  const { backing } = draught.resolved;
  if (backing === null) return;
  const drawOne = backing.counts === 'masonry' ? drawAsMasonry : drawAsWeight;
  for (const figure of figuresOf(draught, backing.level)) {
    drawOne(draught, figure);
    const [start, ...rest] = topOf(figure);
    put(draught, 'backing', polyline('backing-edge', [start!, ...rest], ABOUT));
    draught.places.blockPath(polyline('backing-edge', [start!, ...rest]));
  }
  if (backing.counts === 'masonry') drawJointsOnward(draught);
}

type Figure = readonly [Point, ...Point[]];

/** Along the back of the ring and up to the level: one figure for each stretch of back beneath the level. */
function figuresOf({ ring, top }: Draught, level: number): Figure[] {
  const figures: Point[][] = [];
  const height = Math.min(level, top.level);
  let end: Point | null = null;
  for (let block = 0; block < ring.blocks.length; block++) {
    for (const { from, to } of ring.skyFacesBelow(block, height)) {
      const joins = end !== null && distance(end, from) < 1e-9;
      if (joins) figures.at(-1)!.push(to);
      else figures.push([from, to]);
      end = to;
    }
  }
  return figures.map((back): Figure => {
    const [first, last] = [back[0]!, back.at(-1)!];
    // the ring is painted over what of the figure lies beneath its back
    return [{ x: first.x, y: height }, ...back, { x: last.x, y: height }];
  });
}

/** The plumb ends and the level top, left to right. */
function topOf(figure: Figure): Point[] {
  const last = figure.length - 1;
  return [figure[1]!, figure[0], figure[last]!, figure[last - 1]!];
}

function gapFor({ mm }: Draught, figure: Figure, paper: number): number {
  const xs = figure.map(({ x }) => x);
  const ys = figure.map(({ y }) => y);
  const size = Math.max(Math.max(...xs) - Math.min(...xs), Math.max(...ys) - Math.min(...ys));
  return Math.max(mm(paper), size / MOST_LINES);
}

function drawAsWeight(draught: Draught, figure: Figure): void {
  put(draught, 'backing', polygon('backing', figure, ABOUT));
  for (const [from, to] of hatchLines(figure, -Math.PI / 4, gapFor(draught, figure, HATCH_GAP))) {
    put(draught, 'backing', stroke('backing-hatch', from, to));
  }
}

/** Level courses, and perpends that break joint from course to course. */
function drawAsMasonry(draught: Draught, figure: Figure): void {
  put(draught, 'backing', polygon('backing-masonry', figure, ABOUT));
  const course = gapFor(draught, figure, COURSE);
  const brick = (course * BRICK) / COURSE;
  for (const [from, to] of hatchLines(figure, 0, course)) put(draught, 'backing', stroke('backing-bond', from, to));
  hatchLines(figure, Math.PI / 2, brick / 2).forEach(([a, b]) => {
    const odd = Math.abs(Math.round(a.x / (brick / 2))) % 2;
    const [low, high] = a.y < b.y ? [a.y, b.y] : [b.y, a.y];
    for (let k = Math.floor(low / course); k * course < high; k++) {
      if (Math.abs(k) % 2 !== odd) continue;
      const from = { x: a.x, y: Math.max(low, k * course) };
      const to = { x: a.x, y: Math.min(high, (k + 1) * course) };
      if (from.y < to.y) put(draught, 'backing', stroke('backing-bond', from, to));
    }
  });
}

/** Where a joint bears beyond the back of the ring. */
function drawJointsOnward(draught: Draught): void {
  const { ring, built, joints } = draught;
  for (const joint of joints) {
    const { intrados, extrados } = ring.joints[joint]!;
    const end = built.joints[joint]!.extrados;
    if (!(distance(intrados, end) > distance(intrados, extrados) * (1 + 1e-9))) continue;
    put(draught, 'backing', stroke('joint-onward', extrados, end, { kind: 'joint', joint }));
  }
}
