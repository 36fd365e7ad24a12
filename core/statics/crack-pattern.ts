/** The hinge patterns of the movements that commonly crack an arch, each found by the same programmes as the thrust. */
import type { Joint } from '../geometry/stations.ts';
import type { Hinge } from './hinge.ts';
import { greatestMultiplier } from './multiplier.ts';
import { answerToMovement, type Opening, type SupportMovement } from './support-movement.ts';
import type { RingSystem, Sums } from './system.ts';

export type MovementKind =
  | 'spreading'
  | 'closing'
  | 'left-sinks'
  | 'right-sinks'
  | 'left-turns-out'
  | 'left-turns-in'
  | 'right-turns-out'
  | 'right-turns-in'
  | 'overload'
  | 'pushed-left'
  | 'pushed-right';

export interface CrackPattern {
  readonly kind: MovementKind;
  /** Place of an overload, m; null for the others. */
  readonly x: number | null;
  /** Hinges left to right with a measure of how far each opens against the others. */
  readonly openings: readonly (Hinge & { readonly opens: number })[];
}

/** A metre and a radian: patterns are linear in the movement, so its size does not matter. */
const SUPPORT_MOVEMENTS: readonly (readonly [MovementKind, SupportMovement])[] = [
  ['spreading', { side: 'left', dx: -1, dy: 0, turn: 0 }],
  ['closing', { side: 'left', dx: 1, dy: 0, turn: 0 }],
  ['left-sinks', { side: 'left', dx: 0, dy: -1, turn: 0 }],
  ['right-sinks', { side: 'right', dx: 0, dy: -1, turn: 0 }],
  ['left-turns-out', { side: 'left', dx: 0, dy: 0, turn: 1 }],
  ['left-turns-in', { side: 'left', dx: 0, dy: 0, turn: -1 }],
  ['right-turns-out', { side: 'right', dx: 0, dy: 0, turn: -1 }],
  ['right-turns-in', { side: 'right', dx: 0, dy: 0, turn: 1 }],
];

/**
 * @param swayRight sums of the forces of a sideways acceleration to the right; @param overloads unit loads by place, m.
 * @returns the patterns of all movements that the ring can answer by opening.
 */
export function crackPatterns(
  system: RingSystem,
  joints: readonly Joint[],
  swayRight: Sums,
  overloads: readonly { readonly x: number; readonly sums: Sums }[],
): CrackPattern[] {
  const patterns: CrackPattern[] = [];
  for (const [kind, movement] of SUPPORT_MOVEMENTS) {
    const answer = answerToMovement(system, joints, movement);
    if (answer.kind === 'opens') patterns.push({ kind, x: null, openings: answer.openings.map(opening) });
  }
  const pushed = (kind: MovementKind, x: number | null, set: Sums): void => {
    const answer = greatestMultiplier(system, set);
    if (answer.kind !== 'limit') return;
    patterns.push({
      kind,
      x,
      openings: answer.hinges.map(({ joint, side, rotation }) => ({ joint, side, opens: rotation })),
    });
  };
  pushed('pushed-right', null, swayRight);
  pushed('pushed-left', null, reversed(swayRight));
  for (const { x, sums } of overloads) pushed('overload', x, sums);
  return patterns;
}

const opening = ({ joint, side, rotation }: Opening) => ({ joint, side, opens: rotation });

const reversed = ({ fx, fy, m }: Sums): Sums => ({ fx: fx.map((v) => -v), fy: fy.map((v) => -v), m: m.map((v) => -v) });
