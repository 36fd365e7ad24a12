/** Mortar lost from a joint, as an open slot from its face as deep as nothing carries there. */
import { distance, type Point } from '../geometry/point.ts';
import { put, type Draught } from './draught.ts';
import { along, polygon } from './path.ts';

/** Width of the slot, paper mm, and the share of the stones between two joints that it may take. */
const SLOT = { width: 0.9, share: 0.3 } as const;

export function drawLostMortar(draught: Draught): void {
  const { ring, built, joints, mm } = draught;
  if (draught.resolved.ring.lostMortar.length === 0) return;
  const first = ring.joints[joints[0]!]!.intrados;
  const second = ring.joints[joints[1]!]!.intrados;
  const half = Math.min(mm(SLOT.width), SLOT.share * distance(first, second)) / 2;
  for (const joint of joints) {
    const real = ring.joints[joint]!;
    const bearing = built.joints[joint]!;
    for (const face of ['intrados', 'extrados'] as const) {
      const other = real[face === 'intrados' ? 'extrados' : 'intrados'];
      // a bearing point beyond the face is backing, and no loss
      const lost = distance(real[face], other) - distance(bearing[face], other);
      if (!(lost > 1e-9 * distance(real[face], other))) continue;
      put(draught, 'lost-mortar', slot(joint, real[face], bearing[face], half));
    }
  }
}

function slot(joint: number, from: Point, to: Point, half: number) {
  const inwards = Math.atan2(to.y - from.y, to.x - from.x);
  const corner = (end: Point, aside: number): Point => along(end, inwards, 0, aside);
  return polygon('lost-mortar', [corner(from, half), corner(to, half), corner(to, -half), corner(from, -half)], {
    kind: 'joint',
    joint,
  });
}
