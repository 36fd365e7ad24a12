/**
 * The ring after a movement, block by block. Blocks stay rigid, and each hinge keeps its two faces together: small
 * motions are drawn larger as turns of finite size, brought back to where the supports stand by Newton's method.
 */
import type { AssessedScheme } from '../assess/assess.ts';
import { AT_REST, placed, placedPath, type Placement } from '../geometry/placement.ts';
import { distance, midpoint, type Point } from '../geometry/point.ts';
import type { Outline } from '../geometry/ring-blocks.ts';
import type { Joint } from '../geometry/stations.ts';
import type { CrackPattern } from '../statics/crack-pattern.ts';
import type { Side } from '../statics/hinge.ts';
import { motionsOf, type Motion } from '../statics/mechanism.ts';
import type { SpreadPlace } from '../statics/remaining-spread.ts';
import type { TurningHinge } from '../statics/thrust.ts';
import { placementsOf } from './linkage.ts';

/** A joint that gapes: the faces of the parts at its two sides stand apart at the face opposite `side`. */
export interface MovedOpening {
  readonly joint: number;
  /** The face in contact. */
  readonly side: Side;
  readonly contact: Point;
  /** The two lips of the gap: of the part at the left and of the part at the right. */
  readonly lips: readonly [Point, Point];
  /** m, of the movement itself and not as drawn; null where the size of the movement is not known. */
  readonly width: number | null;
}

export interface MovedRing {
  /** Each block's outline as it stands. */
  readonly outlines: readonly Outline[];
  /** How the left support, each block from left to right, and the right support came there. */
  readonly placements: readonly Placement[];
  /** The middle of each joint's two faces, along the joint as it is drawn. */
  readonly joints: readonly Joint[];
  readonly openings: readonly MovedOpening[];
  /** How many times larger than it is the movement is drawn; null where its size is not known. */
  readonly factor: number | null;
}

/**
 * @param movement small motions of the left support, the blocks and the right support, as `motionsOf` gives them and
 * drawn `factor` times as large, or a place of the remaining spread, which is drawn as it is.
 */
export function movedRing(
  assessed: AssessedScheme,
  movement: readonly Motion[] | Pick<SpreadPlace, 'placements'>,
  factor = 1,
): MovedRing {
  if ('placements' in movement) return standing(assessed, movement.placements, 1);
  return standing(assessed, placementsOf(assessed.built.joints, movement, factor), factor);
}

/**
 * Small motions of the supports and blocks from the joints that open, as `motionsOf` has them, with the support at rest
 * that did not move.
 */
export function motionsOfOpenings(
  { built }: AssessedScheme,
  openings: readonly TurningHinge[],
  movedSide: 'left' | 'right' = 'left',
): Motion[] {
  const motions = motionsOf(built.joints, openings);
  if (movedSide === 'left') return motions;
  const { turn, dx, dy } = motions[0]!;
  return motions.map((motion) => ({ turn: motion.turn - turn, dx: motion.dx - dx, dy: motion.dy - dy }));
}

/** Of the ring's thickness: how far the furthest point goes in the last frame. */
const LAST_FRAME = 1.5;
/** Turns beyond this, radians, look like something that has long fallen. */
const LARGEST_TURN = 0.3;

/**
 * The beginning of the fall of an arch that does not stand: at `t` = 0 as it is, at 1 moved by rather more than its thickness.
 * Null where it stands, or nothing of it moves.
 */
export function mechanismFrame(assessed: AssessedScheme, t: number): MovedRing | null {
  return frameOf(assessed, motionsOfOpenings(assessed, assessed.result.mechanism?.hinges ?? []), t);
}

/** The same for a movement that may have cracked the ring; its openings are to scale with each other only. */
export function patternFrame(assessed: AssessedScheme, pattern: CrackPattern, t: number): MovedRing | null {
  const openings = pattern.openings.map(({ joint, side, opens }) => ({ joint, side, rotation: opens }));
  return frameOf(
    assessed,
    motionsOfOpenings(assessed, openings, pattern.kind.startsWith('right-') ? 'right' : 'left'),
    t,
  );
}

function frameOf(assessed: AssessedScheme, motions: readonly Motion[], t: number): MovedRing | null {
  const { joints } = assessed.built;
  const factor = factorFor(joints, motions, LAST_FRAME * thinnestJoint(assessed.ring.joints), LARGEST_TURN);
  if (factor === null) return null;
  return standing(assessed, placementsOf(joints, motions, Math.min(1, Math.max(0, t)) * factor), null);
}

const thinnestJoint = (joints: readonly Joint[]): number =>
  joints.reduce((least, { intrados, extrados }) => Math.min(least, distance(intrados, extrados)), Infinity);

/** The factor at which nothing moves further than `furthest`, m, or turns more than `turn`; null where nothing moves. */
export function factorFor(
  joints: readonly Joint[],
  motions: readonly Motion[],
  furthest: number,
  turn: number,
): number | null {
  let fastest = 0;
  let quickest = 0;
  joints.forEach(({ intrados, extrados }, j) => {
    const motion = motions[j + 1]!;
    quickest = Math.max(quickest, Math.abs(motion.turn));
    fastest = Math.max(fastest, speedAt(motion, intrados), speedAt(motion, extrados));
  });
  return fastest === 0 ? null : Math.min(furthest / fastest, quickest === 0 ? Infinity : turn / quickest);
}

const speedAt = ({ turn, dx, dy }: Motion, { x, y }: Point): number => Math.hypot(dx - turn * y, dy + turn * x);

function standing({ ring, built }: AssessedScheme, placements: readonly Placement[], factor: number | null): MovedRing {
  const at = (part: number): Placement => placements[part] ?? AT_REST;
  const joints = ring.joints.map(({ intrados, extrados }, j): Joint => {
    const both = (point: Point): Point => midpoint(placed(at(j), point), placed(at(j + 1), point));
    return { intrados: both(intrados), extrados: both(extrados) };
  });
  const size = distance(ring.joints[0]!.intrados, ring.joints.at(-1)!.intrados);
  const openings = ring.joints.flatMap((joint, j): MovedOpening[] => {
    const found = openingAt(joint, built.joints[j]!, at(j), at(j + 1), size * CLOSED);
    return found === null
      ? []
      : [{ ...found, joint: j, width: factor === null || factor === 0 ? null : found.width / factor }];
  });
  const outlines = ring.blocks.map((_, block) => placedPath(at(block + 1), ring.outline(block)));
  return { outlines, placements, joints, openings, factor };
}

/** Share of the span under which a gap is rounding. */
const CLOSED = 1e-9;

interface Gap {
  readonly side: Side;
  readonly contact: Point;
  readonly lips: readonly [Point, Point];
  readonly width: number;
}

/** The stones gape from the bearing point in contact to the outer end of the joint, of ring or backing. */
function openingAt(ring: Joint, bearing: Joint, left: Placement, right: Placement, closed: number): Gap | null {
  const gapAt = (point: Point): number => distance(placed(left, point), placed(right, point));
  const side: Side = gapAt(bearing.intrados) <= gapAt(bearing.extrados) ? 'intrados' : 'extrados';
  const other: Side = side === 'intrados' ? 'extrados' : 'intrados';
  const contact = bearing[side];
  const lip = outerEnd(ring, bearing, other);
  const lips: [Point, Point] = [placed(left, lip), placed(right, lip)];
  const width = distance(...lips);
  return width <= closed
    ? null
    : { side, contact: midpoint(placed(left, contact), placed(right, contact)), lips, width };
}

/** Of the ring's joint and its bearing part, which may end short of the face or run on into backing: the end further out. */
export function outerEnd(ring: Joint, bearing: Joint, side: Side): Point {
  const from = side === 'intrados' ? bearing.extrados : bearing.intrados;
  return distance(from, bearing[side]) > distance(from, ring[side]) ? bearing[side] : ring[side];
}
