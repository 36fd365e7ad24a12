/** Hinges as the joint really opens: a thin wedge from the point in contact to the face that gapes. */
import type { Hinge } from '../statics/hinge.ts';
import type { Point } from '../geometry/point.ts';
import type { Draught } from './draught.ts';
import { outerEnd } from './moved-ring.ts';
import { along, circle, polygon } from './path.ts';
import type { About, PathItem } from './scene.ts';

/** Width of a hinge's opening where the movement is not known: this share of the joint, within these paper mm. */
const OPENING = { share: 0.16, least: 0.9, most: 2.4 } as const;
/** Radius of the contact, paper mm. */
export const CONTACT = 0.6;

export type HingeRole = 'hinge-least' | 'hinge-greatest' | 'hinge-mechanism';

/** The contact lies where the joint bears: inside its face where mortar is lost, beyond it in backing that counts. */
export function drawHinge(draught: Draught, hinge: Hinge, role: HingeRole, about: About): PathItem[] {
  const ring = draught.ring.joints[hinge.joint];
  const bearing = draught.built.joints[hinge.joint];
  if (ring === undefined || bearing === undefined) return [];
  const contact = bearing[hinge.side];
  const opening = outerEnd(ring, bearing, hinge.side === 'extrados' ? 'intrados' : 'extrados');
  const length = Math.hypot(opening.x - contact.x, opening.y - contact.y);
  const across = Math.atan2(opening.y - contact.y, opening.x - contact.x);
  const { mm } = draught;
  const half = Math.min(mm(OPENING.most), Math.max(mm(OPENING.least), OPENING.share * length)) / 2;
  const corners: [Point, Point, Point] = [
    contact,
    along(contact, across, length, half),
    along(contact, across, length, -half),
  ];
  draught.places.block(corners);
  return [polygon(role, corners, about), circle(role, contact, mm(CONTACT), about)];
}
