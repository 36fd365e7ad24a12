/**
 * How an arch that does not stand begins to move: its bodies turn about the hinges. The movement is drawn much larger
 * than it is, as a dashed outline, with the same hinges opened on the arch as it is.
 */
import type { Edge } from '../geometry/curve.ts';
import type { Point } from '../geometry/point.ts';
import type { Outline } from '../geometry/ring-blocks.ts';
import { motionsOf, type Motion } from '../statics/mechanism.ts';
import { put, type Draught } from './draught.ts';
import { bodyOutline } from './faces.ts';
import { outlined } from './path.ts';
import { drawHinge } from './thrust.ts';

/** The largest movement drawn: this share of the ring's thickness, or these paper mm where that would hardly be seen. */
const LARGEST_MOVEMENT = { share: 0.45, least: 5 } as const;
/** Turns beyond this, radians, would no longer look like small ones. */
const LARGEST_TURN = 0.12;

export function drawMechanism(draught: Draught): void {
  const { ring, result } = draught;
  const hinges = result.mechanism?.hinges ?? [];
  if (hinges.length === 0) return;
  const motions = motionsOf(ring.joints, hinges);
  const scale = drawnScale(draught, motions);
  const ends = [...new Set([0, ...hinges.map(({ joint }) => joint), ring.blocks.length])].sort((a, b) => a - b);
  for (let i = 0; i + 1 < ends.length; i++) {
    const [left, right] = [ends[i]!, ends[i + 1]!];
    const motion = motions[left + 1]!;
    if (speedAt(motion, ring.joints[left]!.intrados) + speedAt(motion, ring.joints[right]!.intrados) === 0) continue;
    const ghost = outlined('ghost', moved(bodyOutline(ring, left, right), drawnMotion(motion, scale)));
    put(draught, 'mechanism', ghost);
    draught.places.blockPath(ghost);
  }
  for (const hinge of hinges) {
    put(draught, 'hinges', ...drawHinge(draught, hinge, 'hinge-mechanism', { kind: 'joint', joint: hinge.joint }));
  }
}

const speedAt = ({ turn, dx, dy }: Motion, { x, y }: Point): number => Math.hypot(dx - turn * y, dy + turn * x);

/** From the rates that the hinges give to a movement that can be seen but is still small. */
function drawnScale({ ring, mm }: Draught, motions: readonly Motion[]): number {
  let fastest = 0;
  let quickest = 0;
  ring.joints.forEach(({ intrados, extrados }, joint) => {
    const motion = motions[joint + 1]!;
    quickest = Math.max(quickest, Math.abs(motion.turn));
    fastest = Math.max(fastest, speedAt(motion, intrados), speedAt(motion, extrados));
  });
  const { intrados, extrados } = ring.joints[0]!;
  const thickness = Math.hypot(extrados.x - intrados.x, extrados.y - intrados.y);
  if (fastest === 0) return 0;
  const largest = Math.max(LARGEST_MOVEMENT.share * thickness, mm(LARGEST_MOVEMENT.least));
  return Math.min(largest / fastest, quickest === 0 ? Infinity : LARGEST_TURN / quickest);
}

/** A turn by `angle` radians about `centre`, or a shift where the body does not turn. */
type Movement =
  | { readonly kind: 'turn'; readonly centre: Point; readonly angle: number }
  | { readonly kind: 'shift'; readonly by: Point };

/** A body that turns keeps the point that has no velocity where it is. */
function drawnMotion({ turn, dx, dy }: Motion, scale: number): Movement {
  return Math.abs(turn * scale) < 1e-9
    ? { kind: 'shift', by: { x: dx * scale, y: dy * scale } }
    : { kind: 'turn', centre: { x: -dy / turn, y: dx / turn }, angle: turn * scale };
}

function moved(outline: Outline, movement: Movement): Outline {
  const place = (point: Point): Point => movePoint(point, movement);
  const turn = movement.kind === 'turn' ? movement.angle : 0;
  return {
    start: place(outline.start),
    edges: outline.edges.map((edge): Edge =>
      edge.kind === 'line'
        ? { kind: 'line', to: place(edge.to) }
        : { ...edge, to: place(edge.to), centre: place(edge.centre), from: edge.from + turn },
    ),
  };
}

function movePoint({ x, y }: Point, movement: Movement): Point {
  if (movement.kind === 'shift') return { x: x + movement.by.x, y: y + movement.by.y };
  const { centre, angle } = movement;
  const cos = Math.cos(angle);
  const sin = Math.sin(angle);
  return {
    x: centre.x + (x - centre.x) * cos - (y - centre.y) * sin,
    y: centre.y + (x - centre.x) * sin + (y - centre.y) * cos,
  };
}
