/** The stone itself: voussoirs with their true outlines, courses, joints with mortar lost, and the supports. */
import type { Point } from '../geometry/point.ts';
import type { Outline } from '../geometry/ring-blocks.ts';
import type { Joint } from '../geometry/stations.ts';
import { drawCourses } from './courses.ts';
import { put, type Draught } from './draught.ts';
import { drawLostMortar } from './lost-mortar.ts';
import { along, linesTo, outlined, stroke } from './path.ts';
import type { About } from './scene.ts';

export function drawMasonry(draught: Draught): void {
  drawVoussoirs(draught);
  drawCourses(draught);
  drawLostMortar(draught);
  const { joints } = draught.ring;
  drawSupports(draught, joints[0]!, joints.at(-1)!);
}

function drawVoussoirs(draught: Draught): void {
  const { ring, joints, places, soffit, back } = draught;
  for (let i = 0; i + 1 < joints.length; i++) {
    const left = joints[i]!;
    const right = joints[i + 1]!;
    put(draught, 'voussoirs', outlined('stone', stone(draught, left, right), { kind: 'block', block: left }));
    places.block(corners(draught, left, right));
  }
  for (const joint of joints) {
    const { intrados, extrados } = ring.joints[joint]!;
    put(draught, 'joints', stroke('joint', intrados, extrados, { kind: 'joint', joint }));
  }
  const face = { kind: 'path', role: 'ring-edge', closed: false } as const;
  const ends = [ring.joints[0]!, ring.joints.at(-1)!];
  put(draught, 'joints', { ...face, ...soffit }, { ...face, ...back });
  for (const { intrados, extrados } of ends) put(draught, 'joints', stroke('ring-edge', intrados, extrados));
}

/** One block, or several drawn as one where their joints would run together. */
function stone(draught: Draught, left: number, right: number): Outline {
  const { ring } = draught;
  if (right === left + 1) return ring.outline(left);
  const [start, ...rest] = corners(draught, left, right);
  return { start, edges: linesTo([...rest, start]) };
}

function corners({ ring }: Draught, left: number, right: number): [Point, Point, Point, Point] {
  const a = ring.joints[left]!;
  const b = ring.joints[right]!;
  return [a.intrados, b.intrados, b.extrados, a.extrados];
}

/** Hatching at a support grows coarser rather than denser when the screen is near. */
const MOST_STROKES = 40;

/** Each springing joint as a firm line with the ground's hatching behind it, and the chain line between the springings. */
export function drawSupports(draught: Draught, left: Joint, right: Joint): void {
  const { mm, places } = draught;
  for (const [side, { intrados, extrados }] of [
    ['left', left],
    ['right', right],
  ] as const) {
    const about: About = { kind: 'support', side };
    const outwards = Math.atan2(extrados.y - intrados.y, extrados.x - intrados.x);
    const from = along(intrados, outwards, -mm(1.5));
    const length = Math.hypot(extrados.x - from.x, extrados.y - from.y) + mm(3);
    const behind = side === 'left' ? 1 : -1;
    put(draught, 'supports', stroke('support', from, along(from, outwards, length), about));
    const gap = Math.max(mm(1.5), length / MOST_STROKES);
    for (let at = gap; at <= length; at += gap) {
      const foot = along(from, outwards, at);
      put(draught, 'supports', stroke('support-hatch', foot, along(foot, outwards, -mm(1.2), behind * mm(1.8)), about));
    }
    places.block([
      from,
      along(from, outwards, length),
      along(from, outwards, length, behind * mm(1.8)),
      along(from, outwards, -mm(1.2), behind * mm(1.8)),
    ]);
  }
  const { joints } = draught.ring;
  const springing = stroke('datum', joints[0]!.intrados, joints.at(-1)!.intrados);
  put(draught, 'springing', springing);
  places.blockPath(springing);
}
