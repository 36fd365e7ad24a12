/**
 * How far a support can still move before the ring falls, by finite movement: take the hinges at the present place,
 * turn the parts of the ring about them until the support has moved a step, find the line and the hinges anew in the
 * moved geometry, and so on until no line fits; then halve the step onto the last place that stands (the method of
 * Ochsendorf 2002, with hinges free to move; from memory). Blocks are rigid. A joint that has opened and no longer
 * turns is taken as its middle line.
 */
import { afterwards, AT_REST, placed, turnTaking, type Placement } from '../geometry/placement.ts';
import { midpoint, type Point } from '../geometry/point.ts';
import type { Joint } from '../geometry/stations.ts';
import type { Block, BlockForce } from '../loading/forces.ts';
import type { Hinge } from './hinge.ts';
import { minimise } from './hinge-simplex.ts';
import { hingeOfRow, lineRows } from './rows.ts';
import { ringSystem } from './system.ts';

/** Where the left support goes against the right one: a direction, of unit length. Spreading is (−1, 0). */
export interface Direction {
  readonly x: number;
  readonly y: number;
}

export interface SpreadPlace {
  /** How far the support has gone, m. */
  readonly moved: number;
  /** Horizontal thrust at the left springing, kN. */
  readonly horizontal: number;
  readonly hinges: readonly Hinge[];
  /** The ring as it stands there. */
  readonly joints: readonly Joint[];
  /** How the left support, each block from left to right, and the right support came there. */
  readonly placements: readonly Placement[];
}

export interface RemainingSpread {
  /** From the present place to the last that stands, in even steps and then in halved ones. */
  readonly places: readonly SpreadPlace[];
  /** Movement at which the ring falls, m; null when it still stands at the furthest place asked for. */
  readonly collapse: number | null;
  /** Length of the even steps, m. */
  readonly step: number;
}

/** Halvings of the last step: the collapse is found to a thousandth of a thousandth of it. */
const HALVINGS = 20;

/**
 * @param furthest movement beyond which nothing is asked, m.
 * @param steps even steps on the way there.
 * @param onProgress called with the share of the way done; returning false gives up.
 * @returns null when no line fits at the present place, or `onProgress` gave up.
 */
export function remainingSpread(
  joints: readonly Joint[],
  blocks: readonly Block[],
  direction: Direction,
  furthest: number,
  steps: number,
  onProgress: (share: number) => boolean = () => true,
): RemainingSpread | null {
  const step = furthest / steps;
  let body = startingBody(joints, blocks);
  let answer = hingesNow(body, direction);
  if (answer === null) return null;
  const places: SpreadPlace[] = [placeOf(body, answer)];
  let stride = step;
  for (let halved = 0; body.moved < furthest * (1 - 1e-12) && halved <= HALVINGS;) {
    if (!onProgress(body.moved / furthest)) return null;
    const next = moveBy(body, answer.rows, direction, Math.min(stride, furthest - body.moved));
    const there = next && hingesNow(next, direction);
    if (next === null || there === null) {
      stride /= 2;
      halved++;
      continue;
    }
    [body, answer] = [next, there];
    places.push(placeOf(body, answer));
  }
  const standsToTheEnd = body.moved >= furthest * (1 - 1e-12);
  return { places, collapse: standsToTheEnd ? null : body.moved, step };
}

/** The ring on its way: each joint with the faces of the parts on its two sides, and the forces at their moved places. */
interface MovedRing {
  readonly moved: number;
  readonly leftFaces: readonly Joint[];
  readonly rightFaces: readonly Joint[];
  readonly forces: readonly (readonly BlockForce[])[];
  /** Of both supports and the blocks, as in `SpreadPlace`. */
  readonly placements: readonly Placement[];
}

interface HingesNow {
  readonly horizontal: number;
  /** The three rows of the basis, by joint from left to right. */
  readonly rows: readonly Hinge[];
}

const startingBody = (joints: readonly Joint[], blocks: readonly Block[]): MovedRing => ({
  moved: 0,
  leftFaces: joints,
  rightFaces: joints,
  forces: blocks.map((block) => block.forces),
  placements: Array.from({ length: blocks.length + 2 }, () => AT_REST),
});

/** Each joint as one line: where it has opened, the middle line of its two faces. */
const middleLines = (ring: MovedRing): Joint[] =>
  ring.leftFaces.map((left, j) => {
    const right = ring.rightFaces[j] as Joint;
    return left === right
      ? left
      : { intrados: midpoint(left.intrados, right.intrados), extrados: midpoint(left.extrados, right.extrados) };
  });

function hingesNow(ring: MovedRing, { x, y }: Direction): HingesNow | null {
  const joints = middleLines(ring);
  const system = ringSystem(
    joints,
    ring.forces.map((forces) => ({ forces })),
  );
  const outcome = minimise(lineRows(system), [-x, -y, 0]);
  if (outcome.kind !== 'optimal' || outcome.basis.length < 3) return null;
  const rows = outcome.basis.map(({ row }) => hingeOfRow(row)).sort((p, q) => p.joint - q.joint);
  return { horizontal: (outcome.s[0] as number) * system.frame.force, rows };
}

function placeOf(ring: MovedRing, answer: HingesNow): SpreadPlace {
  const { moved, placements } = ring;
  return { moved, horizontal: answer.horizontal, hinges: answer.rows, joints: middleLines(ring), placements };
}

/** The ring after the left support has gone one stride further; null when the two middle parts cannot reach. */
function moveBy(ring: MovedRing, hinges: readonly Hinge[], direction: Direction, stride: number): MovedRing | null {
  const lines = middleLines(ring);
  const [first, second, third] = hinges.map(({ joint, side }) => (lines[joint] as Joint)[side]) as [
    Point,
    Point,
    Point,
  ];
  const [j1, j2, j3] = hinges.map(({ joint }) => joint) as [number, number, number];
  const shifted = { x: first.x + direction.x * stride, y: first.y + direction.y * stride };
  const apex = thirdCorner(shifted, third, first, second, third);
  if (apex === null) return null;
  const left = turnTaking(0, first, shifted);
  const between12 = turned(first, second, shifted, apex);
  const between23 = turned(second, third, apex, third);
  // blocks left of the first hinge go with the left support, those right of the third stay
  const of = (block: number): Placement | null =>
    block < j1 ? left : block < j2 ? between12 : block < j3 ? between23 : null;
  const face = (joint: Joint, placement: Placement | null): Joint =>
    placement === null
      ? joint
      : { intrados: placed(placement, joint.intrados), extrados: placed(placement, joint.extrados) };
  return {
    moved: ring.moved + stride,
    leftFaces: ring.leftFaces.map((joint, j) => face(joint, of(j - 1))),
    rightFaces: ring.rightFaces.map((joint, j) => face(joint, of(j))),
    forces: ring.forces.map((forces, k) => {
      const placement = of(k);
      return placement === null ? forces : forces.map((force) => ({ ...force, ...placed(placement, force) }));
    }),
    placements: ring.placements.map((before, k) => {
      const placement = of(k - 1);
      return placement === null ? before : afterwards(before, placement);
    }),
  };
}

/** The rigid movement that takes a to a2 and the direction of b with it. */
function turned(a: Point, b: Point, a2: Point, b2: Point): Placement {
  const angle = Math.atan2(b2.y - a2.y, b2.x - a2.x) - Math.atan2(b.y - a.y, b.x - a.x);
  return turnTaking(angle, a, a2);
}

/** The corner over a2–c2 that keeps its distances |ab| and |bc| and its side; null when the two ends stand too far apart. */
function thirdCorner(a2: Point, c2: Point, a: Point, b: Point, c: Point): Point | null {
  const ab = Math.hypot(b.x - a.x, b.y - a.y);
  const bc = Math.hypot(c.x - b.x, c.y - b.y);
  const dx = c2.x - a2.x;
  const dy = c2.y - a2.y;
  const base = Math.hypot(dx, dy);
  const along = (ab * ab - bc * bc + base * base) / (2 * base);
  const height2 = ab * ab - along * along;
  if (!(height2 >= 0)) return null;
  const side = Math.sign((c.x - a.x) * (b.y - a.y) - (c.y - a.y) * (b.x - a.x)) || 1;
  const height = side * Math.sqrt(height2);
  return { x: a2.x + (along * dx - height * dy) / base, y: a2.y + (along * dy + height * dx) / base };
}
