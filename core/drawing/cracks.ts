/**
 * Openings seen: a crack's ragged line along its joint from the face that gapes, with an open mark before that face,
 * its width and the date on which it was seen. Told by its shape, so that black and white shows it too.
 */
import { marksOf } from '../assess/marks.ts';
import type { Point } from '../geometry/point.ts';
import type { Joint } from '../geometry/stations.ts';
import type { Crack } from '../job/schema.ts';
import { put, type Draught } from './draught.ts';
import { millimetres } from './entered.ts';
import { along, lettering, polyline } from './path.ts';
import type { Placing } from './places.ts';
import type { About, PathItem } from './scene.ts';
import { cutToWidth, plainText, textWidth } from './text.ts';

interface DrawnCrack {
  readonly crack: Crack;
  readonly joint: Joint;
}

export function drawCracks(draught: Draught): DrawnCrack[] {
  const seen = draught.resolved.cracks.flatMap((crack): DrawnCrack[] => {
    const joint = jointOf(draught, crack);
    return joint === null ? [] : [{ crack, joint }];
  });
  for (const { crack, joint } of seen) {
    for (const path of crackMark(joint, crack.face, draught.mm, { kind: 'crack', crack: crack.id })) {
      put(draught, 'cracks', path);
      draught.places.blockPath(path);
    }
  }
  return seen;
}

export function letterCracks(draught: Draught, seen: readonly DrawnCrack[]): void {
  for (const { crack, joint } of seen) letterCrack(draught, crack, joint);
}

function jointOf({ ring, standing }: Draught, crack: Crack): Joint | null {
  const [mark] = marksOf([crack], ring.joints);
  return mark === undefined ? null : (standing[mark.joint] ?? null);
}

/** How far to each side a crack strays on its way, in turn, as shares of its reach. */
const COURSE = [0, 0.7, -0.5, 0.9, -0.8, 0.5, -0.9, 0.4, 0] as const;
/** Paper mm. */
const STRAY = 0.55;
const MOUTH = { depth: 2.2, half: 1.5 } as const;
/** Share of the joint that the line runs along. */
const REACH = 0.62;

/** The ragged line and the open mark before the face. */
export function crackMark(
  joint: Joint,
  face: Crack['face'],
  mm: (millimetres: number) => number,
  about?: About,
): PathItem[] {
  const from = joint[face];
  const to = joint[face === 'intrados' ? 'extrados' : 'intrados'];
  const inwards = Math.atan2(to.y - from.y, to.x - from.x);
  const reach = REACH * Math.hypot(to.x - from.x, to.y - from.y);
  const [start, ...rest] = COURSE.map((stray, i): Point =>
    along(from, inwards, (reach * i) / (COURSE.length - 1), stray * mm(STRAY)),
  );
  const lip = (side: 1 | -1): Point => along(from, inwards, -mm(MOUTH.depth), side * mm(MOUTH.half));
  return [
    // parts the line from a hinge or a joint that it lies on
    polyline('crack-ground', [start!, ...rest], about),
    polyline('crack', [start!, ...rest], about),
    polyline('crack', [lip(1), along(from, inwards, -mm(0.4)), lip(-1)], about),
  ];
}

const LETTERS = 1.8;
const LONGEST_DATE = 24;

/** `3 mm, 2026-05-14`; nothing where neither is known. */
function wordsOf({ width, seenOn }: Crack): string {
  const measured = width === undefined ? '' : millimetres(width);
  const date = cutToWidth(plainText(seenOn ?? ''), LONGEST_DATE, LETTERS);
  return [measured, date].filter((text) => text !== '').join(', ');
}

function letterCrack(draught: Draught, crack: Crack, joint: Joint): void {
  const words = wordsOf(crack);
  if (words === '') return;
  const { mm, places } = draught;
  const from = joint[crack.face];
  const back = joint[crack.face === 'intrados' ? 'extrados' : 'intrados'];
  const outwards = Math.atan2(from.y - back.y, from.x - back.x);
  const half = textWidth(words, LETTERS) / 2;
  const placings = [0, 0.5, -0.5, 0.9, -0.9].flatMap((aside) =>
    [1.2, 3, 5].map((gap): Placing => {
      const direction = outwards + aside;
      // clear of the mark whatever way the words lie to it
      const away =
        MOUTH.depth + gap + Math.abs(Math.cos(direction)) * half + (Math.abs(Math.sin(direction)) * LETTERS) / 2;
      const { x, y } = along(from, direction, mm(away));
      return [
        lettering(
          words,
          { x, y: y - mm(LETTERS / 2) },
          { height: LETTERS, align: 'middle', role: 'text-fails', about: { kind: 'crack', crack: crack.id } },
        ),
      ];
    }),
  );
  const placed = places.placeSurely(placings, from);
  put(draught, 'cracks', ...placed.texts, ...(placed.leader === null ? [] : [placed.leader]));
}
