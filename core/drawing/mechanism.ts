/**
 * How an arch that does not stand begins to move: its bodies turn about the hinges. The movement is drawn much larger
 * than it is, as a dashed outline, with the same hinges opened on the arch as it is.
 */
import { AT_REST, placedPath, placed } from '../geometry/placement.ts';
import { distance } from '../geometry/point.ts';
import { motionsOf } from '../statics/mechanism.ts';
import { put, type Draught } from './draught.ts';
import { bodyOutline } from './faces.ts';
import { drawHinge } from './hinges.ts';
import { placementsOf } from './linkage.ts';
import { factorFor } from './moved-ring.ts';
import { outlined } from './path.ts';

/** The largest movement drawn: this share of the ring's thickness, or these paper mm where that would hardly be seen. */
const LARGEST_MOVEMENT = { share: 0.45, least: 5 } as const;
/** Turns beyond this, radians, would no longer look like small ones. */
const LARGEST_TURN = 0.12;

export function drawMechanism(draught: Draught): void {
  const { ring, built, result, mm } = draught;
  const hinges = result.mechanism?.hinges ?? [];
  if (hinges.length === 0) return;
  const { intrados, extrados } = ring.joints[0]!;
  const furthest = Math.max(LARGEST_MOVEMENT.share * distance(intrados, extrados), mm(LARGEST_MOVEMENT.least));
  const motions = motionsOf(built.joints, hinges);
  const placements = placementsOf(built.joints, motions, factorFor(built.joints, motions, furthest, LARGEST_TURN) ?? 0);
  const ends = [...new Set([0, ...hinges.map(({ joint }) => joint), ring.blocks.length])].sort((a, b) => a - b);
  for (let i = 0; i + 1 < ends.length; i++) {
    const [left, right] = [ends[i]!, ends[i + 1]!];
    const placement = placements[left + 1] ?? AT_REST;
    const still = [left, right].every((joint) => {
      const point = ring.joints[joint]!.intrados;
      return distance(placed(placement, point), point) < STILL * furthest;
    });
    if (still) continue;
    const ghost = outlined('ghost', placedPath(placement, bodyOutline(ring, left, right)));
    put(draught, 'mechanism', ghost);
    draught.places.blockPath(ghost);
  }
  for (const hinge of hinges) {
    put(draught, 'hinges', ...drawHinge(draught, hinge, 'hinge-mechanism', { kind: 'joint', joint: hinge.joint }));
  }
}

/** A body that moves less than this share of the largest movement does not move. */
const STILL = 1e-9;
