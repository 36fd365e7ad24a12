/**
 * The ring after a movement: its stones where they have gone, each joint that opens as the gap that it really is, and
 * a thin dashed outline where the ring was.
 */
import { placed } from '../geometry/placement.ts';
import { midpoint } from '../geometry/point.ts';
import type { Joint } from '../geometry/stations.ts';
import { put, type Draught } from './draught.ts';
import { entered, millimetres } from './entered.ts';
import { bodyOutline } from './faces.ts';
import { CONTACT } from './hinges.ts';
import { drawSupports } from './masonry.ts';
import type { MovedOpening, MovedRing } from './moved-ring.ts';
import { along, circle, lettering, outlined, polygon } from './path.ts';
import type { Placing } from './places.ts';
import type { About } from './scene.ts';

export interface MovedPicture {
  readonly ring: MovedRing;
  /** What moved it, in words; how much larger it is drawn is added. */
  readonly label: string;
}

export function drawMoved(draught: Draught, { ring: moved }: MovedPicture): void {
  const { ring, places } = draught;
  moved.outlines.forEach((outline, block) => {
    const stone = outlined('moved-stone', outline, { kind: 'block', block });
    put(draught, 'voussoirs', stone);
    places.block([outline.start, ...outline.edges.map(({ to }) => to)]);
  });
  for (const opening of moved.openings) drawGap(draught, opening);
  const before = outlined('as-it-was', bodyOutline(ring, 0, ring.blocks.length));
  put(draught, 'as-it-was', before);
  places.blockPath(before);
  drawSupports(draught, support(draught, 0), support(draught, ring.joints.length - 1));
}

/** How wide each joint gapes, and how much larger than it is the movement is drawn. */
export function letterMoved(draught: Draught, { ring: moved, label }: MovedPicture): void {
  for (const opening of moved.openings) letterWidth(draught, opening);
  letterFactor(draught, moved, label);
}

/** The springing joint on its support, which may have moved from under the ring. */
function support({ ring, moved }: Draught, joint: number): Joint {
  const { intrados, extrados } = ring.joints[joint]!;
  const placement = moved?.placements[joint === 0 ? 0 : joint + 1];
  if (placement === undefined) return { intrados, extrados };
  return { intrados: placed(placement, intrados), extrados: placed(placement, extrados) };
}

const aboutJoint = (joint: number): About => ({ kind: 'joint', joint });

function drawGap(draught: Draught, { joint, contact, lips }: MovedOpening): void {
  const about = aboutJoint(joint);
  put(draught, 'openings', polygon('opening-gap', [contact, lips[0], lips[1]], about));
  put(draught, 'hinges', circle('hinge-mechanism', contact, draught.mm(CONTACT), about));
  draught.places.block([contact, ...lips]);
}

/** Widths under half a millimetre are not to be measured on an old joint. */
const LEAST_WIDTH = 0.0005;

function letterWidth(draught: Draught, { joint, contact, lips, width }: MovedOpening): void {
  if (width === null || width < LEAST_WIDTH) return;
  const { mm, places } = draught;
  const mouth = midpoint(...lips);
  const outwards = Math.atan2(mouth.y - contact.y, mouth.x - contact.x);
  const text = millimetres(width);
  const placings = [4, 6.5, 9, 12].flatMap((away) =>
    [0, 0.7, -0.7, 1.3, -1.3].map((aside): Placing => {
      const at = along(mouth, outwards + aside, mm(away));
      return [
        lettering(
          text,
          { x: at.x, y: at.y - mm(1.25) },
          { align: 'middle', role: 'text-fails', about: aboutJoint(joint) },
        ),
      ];
    }),
  );
  const label = places.placeSurely(placings, mouth);
  put(draught, 'openings', ...label.texts, ...(label.leader === null ? [] : [label.leader]));
}

function letterFactor(draught: Draught, { factor }: MovedRing, label: string): void {
  const { ring, mm, places } = draught;
  const size =
    factor === null
      ? 'not to scale'
      : Math.abs(factor - 1) < 1e-9
        ? 'true size'
        : `drawn ${entered(factor)} times as large`;
  const at = { x: ring.crownIntrados.x, y: ring.crownIntrados.y - mm(14) };
  const text = (dy: number): Placing => [
    lettering(
      label === '' ? `movement ${size}` : `${label}, ${size}`,
      { x: at.x, y: at.y - mm(dy) },
      { align: 'middle' },
    ),
  ];
  const placed = places.placeSurely([0, 6, 12, 18, 24].map(text), at);
  put(draught, 'openings', ...placed.texts);
}
