/** Least and greatest horizontal thrust of a ring without tension, by the hinge simplex: min and max of X0. */
import type { Hinge } from './hinge.ts';
import { minimise, type Rows } from './hinge-simplex.ts';
import { hingesOf, lineRows } from './rows.ts';
import type { RingSystem } from './system.ts';

/** A hinge with the relative rotation of the ring on its two sides, from the multipliers; positive, scale free. */
export interface TurningHinge extends Hinge {
  readonly rotation: number;
}

/** One extreme of the thrust: its state, and the hinges that keep it from going further. */
export interface Extreme {
  /** X0 at the left springing, kN. */
  readonly horizontal: number;
  /** (X0, Y0, M0), scaled. */
  readonly state: Float64Array;
  readonly hinges: readonly TurningHinge[];
}

export type ThrustAnswer =
  /** `greatest` is null when the ring holds any thrust, however great. */
  | { readonly stands: true; readonly least: Extreme | null; readonly greatest: Extreme | null }
  /** No line fits: the hinges of a mechanism under which the loads do positive work. */
  | { readonly stands: false; readonly mechanism: readonly TurningHinge[] };

export function thrustRange(system: RingSystem, rows: Rows = lineRows(system)): ThrustAnswer {
  const least = extreme(system, rows, 1);
  if (Array.isArray(least)) return { stands: false, mechanism: least };
  const greatest = extreme(system, rows, -1);
  if (Array.isArray(greatest)) return { stands: false, mechanism: greatest };
  return { stands: true, least, greatest };
}

/** The extreme, null when there is none, or the mechanism's hinges when no line fits. */
function extreme(system: RingSystem, rows: Rows, sign: 1 | -1): Extreme | null | TurningHinge[] {
  const outcome = minimise(rows, [sign, 0, 0]);
  switch (outcome.kind) {
    case 'unbounded':
      return null;
    case 'infeasible':
      return turning(outcome.certificate);
    case 'optimal':
      return {
        horizontal: (outcome.s[0] as number) * system.frame.force,
        state: outcome.s,
        hinges: turning(outcome.basis),
      };
  }
}

const turning = (multipliers: Parameters<typeof hingesOf>[0]): TurningHinge[] =>
  hingesOf(multipliers).map(({ hinge, rotation }) => ({ ...hinge, rotation }));
