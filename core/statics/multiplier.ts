/** How far a named set of forces can be multiplied before the ring becomes a mechanism: one more unknown, its factor. */
import { minimise, type Rows } from './hinge-simplex.ts';
import { hingesOf, lineRowsWith } from './rows.ts';
import type { RingSystem, Sums } from './system.ts';
import type { TurningHinge } from './thrust.ts';

export type GreatestMultiplier =
  /** The ring becomes a mechanism with these hinges when the set is multiplied by the factor. */
  | { readonly kind: 'limit'; readonly factor: number; readonly hinges: readonly TurningHinge[] }
  /** The ring holds any multiple of the set. */
  | { readonly kind: 'unlimited' }
  /** The ring does not stand under the rest alone, nor under any positive multiple of the set. */
  | { readonly kind: 'never-stands'; readonly hinges: readonly TurningHinge[] };

/**
 * The greatest λ ≥ 0 with which a line fits under the rest of the forces plus λ times the set.
 * @param rest the ring with all other forces; @param set sums of the forces of the set, in the same frame.
 */
export function greatestMultiplier(rest: RingSystem, set: Sums): GreatestMultiplier {
  const outcome = minimise(withFactorNotNegative(lineRowsWith(rest, [set])), [0, 0, 0, -1]);
  const onRing = 2 * rest.joints;
  switch (outcome.kind) {
    case 'unbounded':
      return { kind: 'unlimited' };
    case 'infeasible':
      return { kind: 'never-stands', hinges: turning(outcome.certificate, onRing) };
    case 'optimal':
      return { kind: 'limit', factor: outcome.s[3] as number, hinges: turning(outcome.basis, onRing) };
  }
}

function withFactorNotNegative(rows: Rows): Rows {
  const a = new Float64Array(rows.a.length + 4);
  a.set(rows.a);
  a[rows.a.length + 3] = 1;
  const b = new Float64Array(rows.count + 1);
  b.set(rows.b);
  return { unknowns: 4, count: rows.count + 1, a, b };
}

function turning(multipliers: readonly { row: number; y: number }[], onRing: number): TurningHinge[] {
  return hingesOf(multipliers.filter(({ row }) => row < onRing)).map(({ hinge, rotation }) => ({ ...hinge, rotation }));
}
