/**
 * Small motions of rigid parts drawn at a finite size. Scaled as they are, parts would drift apart at their hinges by
 * the square of their turns; here each part turns about the hinge it shares with its neighbour, from the right support
 * leftwards, and the turns are corrected, as little as will do, until the chain meets the left support again.
 */
import { placed, turnOf, turnTaking, type Placement } from '../geometry/placement.ts';
import { distance, midpoint, type Point } from '../geometry/point.ts';
import type { Joint } from '../geometry/stations.ts';
import type { Motion } from '../statics/mechanism.ts';

/** How two neighbours move against each other at a joint: a turn about a point of it, or a parting. */
interface Link {
  readonly joint: number;
  /** Turn of the part at the left against that at the right, rad. */
  readonly turn: number;
  readonly about: Point;
  /** Where nothing turns: how the part at the left goes, m. */
  readonly shift: Point;
}

/** Radians and metres under which two neighbours move as one. */
const AS_ONE = 1e-12;
const NEWTON_STEPS = 30;

/** @returns placements of the left support, the blocks and the right support. */
export function placementsOf(joints: readonly Joint[], motions: readonly Motion[], factor: number): Placement[] {
  const links = linksOf(joints, motions);
  const left = abutment(joints[0]!, motions[0]!, factor);
  const right = abutment(joints.at(-1)!, motions.at(-1)!, factor);
  const ofLinks = hung(links, closedTurns(links, factor, left, right, joints[0]!), factor, right);
  return motions.map((_, part) => {
    const next = links.findIndex(({ joint }) => joint >= part);
    return next < 0 ? right : ofLinks[next]!;
  });
}

/** A support turns about the middle of its springing joint, which goes straight. */
function abutment({ intrados, extrados }: Joint, { turn, dx, dy }: Motion, factor: number): Placement {
  const { x, y } = midpoint(intrados, extrados);
  return turnTaking(turn * factor, { x, y }, { x: x + (dx - turn * y) * factor, y: y + (dy + turn * x) * factor });
}

function linksOf(joints: readonly Joint[], motions: readonly Motion[]): Link[] {
  const size = distance(joints[0]!.intrados, joints.at(-1)!.intrados);
  const largest = motions.reduce((most, { turn }) => Math.max(most, Math.abs(turn)), 0);
  return joints.flatMap(({ intrados, extrados }, joint): Link[] => {
    const [a, b] = [motions[joint]!, motions[joint + 1]!];
    const turn = a.turn - b.turn;
    const shift = { x: a.dx - b.dx, y: a.dy - b.dy };
    if (Math.abs(turn) > AS_ONE * largest) {
      const centre = { x: -shift.y / turn, y: shift.x / turn };
      // the centre is one of the joint's ends but for rounding: taking the very end keeps the hinge closed
      const [near, far] = [intrados, extrados].sort((p, q) => distance(p, centre) - distance(q, centre));
      const onEnd = distance(near!, centre) < ON_END * distance(near!, far!);
      return [{ joint, turn, about: onEnd ? near! : centre, shift: { x: 0, y: 0 } }];
    }
    const moves = Math.hypot(shift.x, shift.y) > AS_ONE * Math.max(1, largest * size);
    return moves ? [{ joint, turn: 0, about: midpoint(intrados, extrados), shift }] : [];
  });
}

/** Share of a joint within which a centre of turning counts as at its end. */
const ON_END = 1e-6;

/** Placements of the parts left of each link, hung from the right support one on the other. */
function hung(links: readonly Link[], turns: readonly number[], factor: number, right: Placement): Placement[] {
  const found: Placement[] = [];
  let placement = right;
  for (let i = links.length - 1; i >= 0; i--) {
    const { about, shift } = links[i]!;
    const { x, y } = placed(placement, about);
    placement = turnTaking(turnOf(placement) + turns[i]!, about, { x: x + shift.x * factor, y: y + shift.y * factor });
    found[i] = placement;
  }
  return found;
}

/**
 * The scaled turns, corrected by least squares at each step of Newton's method so that the left end of the chain stands
 * on the left support. Left as they are where fewer than three parts can turn: such a chain cannot be closed.
 */
function closedTurns(
  links: readonly Link[],
  factor: number,
  left: Placement,
  right: Placement,
  springing: Joint,
): number[] {
  let turns = links.map(({ turn }) => turn * factor);
  const free = links.map(({ turn }) => turn !== 0);
  if (free.filter(Boolean).length < 3) return turns;
  const middle = midpoint(springing.intrados, springing.extrados);
  const target = placed(left, middle);
  const reach = Math.max(...links.map(({ about }) => distance(about, middle)), AS_ONE);
  for (let step = 0; step < NEWTON_STEPS; step++) {
    const parts = hung(links, turns, factor, right);
    const at = placed(parts[0]!, middle);
    const error = [angleBetween(turnOf(left), turnOf(parts[0]!)) * reach, target.x - at.x, target.y - at.y];
    if (Math.hypot(...error) <= AS_ONE * reach) break;
    // a turn swings the left end about its hinge, which goes with the part at its right
    const columns = links.map(({ about }, i) => {
      const hinge = placed(parts[i + 1] ?? right, about);
      return [reach, hinge.y - at.y, at.x - hinge.x];
    });
    const correction = leastCorrection(columns, free, error);
    if (correction === null) break;
    turns = turns.map((turn, i) => turn + correction[i]!);
  }
  return turns;
}

const angleBetween = (to: number, from: number): number => Math.atan2(Math.sin(to - from), Math.cos(to - from));

/** The smallest change of the free turns that meets the error, x = Jᵀ (J Jᵀ)⁻¹ e; null where the hinges stand in line. */
function leastCorrection(
  columns: readonly (readonly number[])[],
  free: readonly boolean[],
  error: readonly number[],
): number[] | null {
  const used = columns.filter((_, i) => free[i]);
  const product = (p: number, q: number): number => used.reduce((sum, column) => sum + column[p]! * column[q]!, 0);
  const g = [0, 1, 2].map((p) => [0, 1, 2].map((q) => product(p, q)));
  const weights = solved(g, error);
  if (weights === null) return null;
  return columns.map((column, i) => (free[i] ? column.reduce((sum, value, p) => sum + value * weights[p]!, 0) : 0));
}

/** Three equations by elimination with the largest pivot; null where a pivot is rounding. */
function solved(matrix: readonly (readonly number[])[], right: readonly number[]): number[] | null {
  const rows = matrix.map((row, i) => [...row, right[i]!]);
  const size = Math.max(...matrix.flat().map(Math.abs));
  for (let k = 0; k < 3; k++) {
    const pivot = rows
      .slice(k)
      .reduce((best, row, i) => (Math.abs(row[k]!) > Math.abs(rows[best]![k]!) ? k + i : best), k);
    [rows[k], rows[pivot]] = [rows[pivot]!, rows[k]!];
    const row = rows[k]!;
    if (!(Math.abs(row[k]!) > AS_ONE * size)) return null;
    for (const other of rows) {
      if (other === row) continue;
      const share = other[k]! / row[k]!;
      for (let c = k; c < 4; c++) other[c]! -= share * row[c]!;
    }
  }
  return rows.map((row, k) => row[3]! / row[k]!);
}
