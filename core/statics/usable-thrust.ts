/** Least and greatest thrust of a ring whose joints take no tension, may slide and may crush. */
import { crushingLimit, minimiseUncrushed } from './crushing.ts';
import { minimise, type SimplexOutcome } from './hinge-simplex.ts';
import { joined, lineRows } from './rows.ts';
import { slidingRows } from './sliding.ts';
import type { RingSystem } from './system.ts';

export interface JointLimits {
  /** Coefficient of friction; null leaves sliding out. */
  readonly friction: number | null;
  /** Compressive strength, MPa; null leaves crushing out. */
  readonly strength: number | null;
  /** m */
  readonly breadth: number;
}

export interface UsableThrust {
  /** Horizontal thrust at the left springing, kN; null when it has no bound. */
  readonly least: number | null;
  readonly greatest: number | null;
}

/** The usable range, or null when no line obeys all the limits. */
export function usableThrust(system: RingSystem, limits: JointLimits): UsableThrust | null {
  const { friction, strength, breadth } = limits;
  const rows = friction === null ? lineRows(system) : joined(lineRows(system), slidingRows(system, friction));
  const crushing = strength === null ? null : crushingLimit(system, strength, breadth);
  const solve = (c: number[]): SimplexOutcome =>
    crushing === null ? minimise(rows, c) : minimiseUncrushed(rows, crushing, c);
  const least = solve([1, 0, 0]);
  if (least.kind === 'infeasible') return null;
  const greatest = solve([-1, 0, 0]);
  if (greatest.kind === 'infeasible') return null;
  const horizontal = (outcome: SimplexOutcome): number | null =>
    outcome.kind === 'optimal' ? (outcome.s[0] as number) * system.frame.force : null;
  return { least: horizontal(least), greatest: horizontal(greatest) };
}
